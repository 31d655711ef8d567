import { describe, expect, it } from 'vitest';
import { causesBoard } from '#analysis/causes/board.ts';
import type { BatchRow } from '#analysis/causes/board-rows.ts';
import { compareMethods } from '#analysis/methods/compare.ts';
import { inputs, namedFaults, simulatedWorkshop } from '#tests/analysis/causes/simulated-workshop.ts';

const rows = simulatedWorkshop({ seed: 3, batches: 400 });
const faults = namedFaults.map((fault) => fault.slug);

function one(maker: string, family: 'cold' | 'hot', found: number, clear: number): BatchRow[] {
  return Array.from({ length: found + clear }, (_, i) => ({
    id: `${maker}-${family}-${i}`, method: family, family, nominal: { maker }, numbers: {}, holds: {}, outcomes: { 'drag-marks': i < found ? 1 : 0 },
  }));
}

describe('compareMethods', () => {
  it('takes away a difference that only the makers made', () => {
    // One maker finds it in half of hers, the other in a tenth of his, whatever the method; she makes the hot ones.
    const confounded = [...one('priya', 'hot', 20, 20), ...one('priya', 'cold', 5, 5), ...one('tomasz', 'hot', 1, 9), ...one('tomasz', 'cold', 4, 36)];
    const [answer] = compareMethods({ rows: confounded, faults: ['drag-marks'], cells: [] }).faults;
    expect(answer!.difference!.difference).toBeCloseTo(21 / 50 - 9 / 50, 12);
    expect(answer!.difference!.lower).toBeGreaterThan(0);
    expect(answer!.standardisedDifference!.difference).toBeCloseTo(0, 12);
  });

  it('names where hot and cold never met', () => {
    const [answer] = compareMethods({ rows: [...one('priya', 'hot', 3, 7), ...one('ilse', 'cold', 1, 9), ...one('ilse', 'hot', 1, 3)], faults: ['drag-marks'], cells: [] }).faults;
    expect(answer!.neverMet).toEqual([{ stratum: { maker: 'priya' }, hotN: 10, coldN: 0 }]);
    expect(answer!.hot.standardised!.share).toBeCloseTo(0.25, 12);
  });

  it('finds the planted difference and gives the board\'s grade', () => {
    const { cells } = causesBoard({ rows, inputs, faults: namedFaults });
    const answer = compareMethods({ rows, faults, cells }).faults.find(({ fault }) => fault === 'air-pockets')!;
    expect(answer.standardisedDifference!.lower).toBeGreaterThan(0);
    expect(['settled', 'likely']).toContain(answer.grade);
    expect(answer.cell!.level).toBe('hot');
  });

  it('counts what was not checked apart, and rebatch as left out', () => {
    const unchecked: BatchRow = { ...rows[0]!, id: 'unchecked', outcomes: {} };
    const rebatch: BatchRow = { ...rows[0]!, id: 'again', method: 'rebatch', family: 'rebatch' };
    const before = compareMethods({ rows, faults, cells: [] });
    const after = compareMethods({ rows: [...rows, unchecked, rebatch], faults, cells: [] });
    expect(after.leftOut).toEqual([{ reason: 'rebatch', count: 1 }]);
    for (const [i, answer] of after.faults.entries()) expect(answer).toEqual({ ...before.faults[i]!, notChecked: before.faults[i]!.notChecked + 1 });
  });

  it('gives the same digits whatever the order of the batches', () => {
    expect(compareMethods({ rows: [...rows].reverse(), faults, cells: [] })).toEqual(compareMethods({ rows, faults, cells: [] }));
  });

  it('answers with nulls, not NaN, where nothing was made', () => {
    const [answer] = compareMethods({ rows: [], faults: ['ricing'], cells: [] }).faults;
    expect(answer).toMatchObject({ hot: { n: 0, raw: null, standardised: null }, difference: null, grade: 'too-few' });
  });
});
