import { describe, expect, it } from 'vitest';
import type { BatchRow, BoardCell } from '#analysis/causes/board-rows.ts';
import { causesBoard } from '#analysis/causes/board.ts';
import { randomFrom, shuffled } from '#analysis/maths/random.ts';
import { BAD_FAT, BAD_LOT, INNOCENT_LOT, faultsUpTo, inputs, namedFaults, simulatedWorkshop } from './simulated-workshop.ts';

const rows = simulatedWorkshop({ seed: 21, batches: 400 });
const board = causesBoard({ rows, inputs, faults: namedFaults });
const cellOf = (fault: string, input: string, level: string | null, among: readonly BoardCell[] = board.cells) =>
  among.find((cell) => cell.fault === fault && cell.input === input && cell.level === level)!;
const firm = (cell: BoardCell) => cell.grade === 'settled' || cell.grade === 'likely';

describe('causesBoard on a workshop with known truth', () => {
  it('names the bad lot', () => {
    const cell = cellOf('acceleration', 'fragranceLot', BAD_LOT);
    expect(cell).toMatchObject({ grade: 'settled', direction: 'more' });
    expect(cell.lower!).toBeGreaterThan(2);
    expect(cell.q!).toBeLessThan(0.001);
  });

  it('does not blame the maker who poured most of the bad lot', () => {
    expect(firm(cellOf('acceleration', 'maker', 'tomasz'))).toBe(false);
    expect(cellOf('acceleration', 'maker', 'tomasz').raw.estimate!).toBeGreaterThan(cellOf('acceleration', 'maker', 'tomasz').estimate!);
  });

  it('does not blame the innocent lot for the ash of the maker who poured it, in twenty-four workshops', () => {
    let rawBlames = 0;
    let blames = 0;
    for (let seed = 1; seed <= 24; seed++) {
      const { cells } = causesBoard({ rows: simulatedWorkshop({ seed: 100 + seed, batches: 200 }), inputs, faults: namedFaults.filter((fault) => fault.slug === 'soda-ash') });
      const cell = cellOf('soda-ash', 'fragranceLot', INNOCENT_LOT, cells);
      if (cell.raw.lower! > 1) rawBlames++;
      if (firm(cell)) blames++;
    }
    expect(rawBlames).toBeGreaterThanOrEqual(3);
    expect(blames).toBeLessThanOrEqual(1);
  }, 60_000);

  it('finds water behind ash, and quotes it over the workshop\'s own range', () => {
    const cell = cellOf('soda-ash', 'waterToLye', null);
    expect(firm(cell)).toBe(true);
    expect(cell.direction).toBe('more');
    expect(cell.range!.low).toBeGreaterThan(1.6);
    expect(cell.range!.high).toBeLessThan(2.6);
    expect(cell.perSpread!.estimate!).toBeLessThan(cell.estimate!);
  });

  it('keeps the gel between water and ash out of the adjustment, and says so', () => {
    const cell = cellOf('soda-ash', 'waterToLye', null);
    expect(cell.onThePath).toContain('gel');
    expect(cell.adjustedFor.map((term) => term.input)).not.toContain('gel');
  });

  it('finds hot batches behind air pockets, and the old fat behind orange spots', () => {
    expect(cellOf('air-pockets', 'methodFamily', 'hot')).toMatchObject({ direction: 'more' });
    expect(firm(cellOf('air-pockets', 'methodFamily', 'hot'))).toBe(true);
    expect(cellOf('orange-spots', 'fatLot', BAD_FAT)).toMatchObject({ direction: 'more' });
  });

  it('does not ask what came after the fault', () => {
    expect(cellOf('ricing', 'cutHours', null)).toMatchObject({ grade: 'comes-after', p: null, q: null });
    expect(cellOf('drag-marks', 'cutHours', null).grade).not.toBe('comes-after');
    expect(cellOf('ricing', 'gel', null).grade).toBe('comes-after');
  });

  it('never praises a lot', () => {
    const lots = board.cells.filter((cell) => cell.input.endsWith('Lot') && (firm(cell) || cell.grade === 'hint'));
    expect(lots.length).toBeGreaterThan(0);
    expect(lots.every((cell) => cell.direction === 'more')).toBe(true);
  });

  it('answers in finite numbers or null throughout', () => {
    for (const cell of board.cells) {
      for (const value of [cell.estimate, cell.lower, cell.upper, cell.p, cell.q, cell.raw.estimate, cell.raw.lower, cell.raw.upper, cell.moreNeeded]) {
        if (value !== null) expect(Number.isFinite(value)).toBe(true);
      }
      expect(cell.exposedN + cell.unexposedN).toBe(cell.grade === 'comes-after' ? 0 : cell.n);
    }
  });
});

describe('causesBoard, its promises', () => {
  const small = simulatedWorkshop({ seed: 7, batches: 120 });
  const question = { rows: small, inputs, faults: namedFaults };
  const plain = causesBoard(question);

  it('gives the same digits whatever the order of batches and inputs', () => {
    const mixed = causesBoard({ ...question, rows: shuffled(small, randomFrom(9)), inputs: [...inputs].reverse() });
    const key = (cell: BoardCell) => `${cell.fault} ${cell.input} ${cell.level}`;
    const sorted = (cells: readonly BoardCell[]) => [...cells].sort((a, b) => (key(a) < key(b) ? -1 : 1));
    expect(sorted(mixed.cells)).toEqual(sorted(plain.cells));
  });

  it('counts unchecked batches apart: they change no count of checked ones', () => {
    const unchecked: BatchRow[] = small.slice(0, 25).map((row) => ({ ...row, id: `${row.id}-again`, outcomes: {} }));
    const more = causesBoard({ ...question, rows: [...small, ...unchecked] });
    for (const cell of plain.cells) {
      if (cell.grade === 'comes-after') continue;
      const other = cellOf(cell.fault, cell.input, cell.level, more.cells);
      if (!other) continue;
      expect([other.n, other.events]).toEqual([cell.n, cell.events]);
      // A number's batches are split at the median of the checked ones, which did not change.
      expect([other.exposedN, other.exposedEvents, other.unexposedEvents]).toEqual([cell.exposedN, cell.exposedEvents, cell.unexposedEvents]);
      if (cell.level !== null) expect(other.raw).toEqual(cell.raw);
    }
  });

  it('finds almost nothing where nothing goes with anything', () => {
    let settled = 0;
    let firmCells = 0;
    const faults = faultsUpTo(12);
    for (let seed = 1; seed <= 12; seed++) {
      const { cells } = causesBoard({ rows: simulatedWorkshop({ seed, batches: 150, faults, permuted: true }), inputs, faults });
      settled += cells.filter((cell) => cell.grade === 'settled').length;
      firmCells += cells.filter(firm).length;
    }
    // At most 0.2 settled a board is promised.
    expect(settled / 12).toBeLessThanOrEqual(0.2);
    expect(firmCells / 12).toBeLessThanOrEqual(0.5);
  }, 60_000);

  it('leaves rebatch and what is marked out, and says how many', () => {
    const out: BatchRow[] = [{ ...small[0]!, id: 'r', method: 'rebatch', family: 'rebatch' }, { ...small[1]!, id: 'a', leftOut: 'abandoned' }];
    const answer = causesBoard({ ...question, rows: [...small, ...out] });
    expect(answer.generatedFrom).toEqual({ batches: 120, leftOut: [{ reason: 'abandoned', count: 1 }, { reason: 'rebatch', count: 1 }] });
    expect(cellOf('ricing', 'maker', 'ilse', answer.cells).estimate).toBe(cellOf('ricing', 'maker', 'ilse', plain.cells).estimate);
  });

  it('counts batches without the asked number as left out of that cell only', () => {
    const withValue = small.filter((row) => row.numbers['humidityPct'] !== undefined).length;
    const cell = cellOf('sweating', 'humidityPct', null, plain.cells);
    expect(cell.leftOut).toEqual([{ reason: 'no-value', count: 120 - withValue }]);
    expect(cell.n + cell.notChecked).toBe(withValue);
  });

  it('answers an empty workshop and a fault nobody found', () => {
    expect(causesBoard({ rows: [], inputs, faults: namedFaults }).cells.every((cell) => cell.n === 0)).toBe(true);
    const clear = small.map((row) => ({ ...row, outcomes: { ricing: 0 as const } }));
    const { cells } = causesBoard({ rows: clear, inputs, faults: namedFaults.filter((fault) => fault.slug === 'ricing') });
    expect(new Set(cells.map((cell) => cell.grade))).toEqual(new Set(['no-variation', 'comes-after']));
  });

  it('refuses two rows with one id and a stage it does not know', () => {
    expect(() => causesBoard({ ...question, rows: [small[0]!, small[0]!] })).toThrow(/id of its own/);
    expect(() => causesBoard({ ...question, faults: [{ slug: 'x', firstSeen: 'someday', suspects: [] }] })).toThrow(/unknown stage someday/);
  });
});
