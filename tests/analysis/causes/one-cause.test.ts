import { describe, expect, it } from 'vitest';
import { causesBoard } from '#analysis/causes/board.ts';
import { oneCause } from '#analysis/causes/one-cause.ts';
import { BAD_LOT, inputs, namedFaults, simulatedWorkshop } from './simulated-workshop.ts';

const question = { rows: simulatedWorkshop({ seed: 21, batches: 300 }), inputs, faults: namedFaults };
const { cells } = causesBoard(question);

describe('oneCause', () => {
  it('opens a lot: the board\'s cell, its strata, and what one batch more or less does', () => {
    const detail = oneCause(question, { fault: 'acceleration', input: 'fragranceLot', level: BAD_LOT }, cells)!;
    expect(detail.cell).toEqual(cells.find((cell) => cell.fault === 'acceleration' && cell.level === BAD_LOT));
    expect(detail.strata.reduce((sum, stratum) => sum + stratum.exposedN + stratum.unexposedN, 0)).toBe(detail.cell.n);
    expect(detail.strata.reduce((sum, stratum) => sum + stratum.exposedEvents + stratum.unexposedEvents, 0)).toBe(detail.cell.events);
    expect(detail.mantelHaenszel!.lower!).toBeGreaterThan(1);
    expect(detail.leaveOneOut!.lowest).toBeLessThan(detail.cell.estimate!);
    expect(detail.leaveOneOut!.highest).toBeGreaterThan(detail.cell.estimate!);
  });

  it('opens a number: bins of at least eight, rising with the water', () => {
    const detail = oneCause(question, { fault: 'soda-ash', input: 'waterToLye', level: null }, cells)!;
    expect(detail.bins.length).toBeGreaterThan(3);
    expect(Math.min(...detail.bins.map((bin) => bin.n))).toBeGreaterThanOrEqual(8);
    expect(detail.bins.reduce((sum, bin) => sum + bin.n, 0)).toBe(detail.cell.n);
    expect(detail.without).toHaveLength(detail.cell.adjustedFor.length);
  });

  it('asks the board itself when it is not given one', () => {
    const faults = namedFaults.filter((fault) => fault.slug === 'ricing');
    const alone = oneCause({ ...question, faults }, { fault: 'ricing', input: 'maker', level: 'ilse' })!;
    expect(alone.cell.q).not.toBeNull();
  });

  it('answers an input that comes after, and null for what the board does not know', () => {
    expect(oneCause(question, { fault: 'ricing', input: 'cutHours', level: null }, cells)).toMatchObject({ cell: { grade: 'comes-after' }, strata: [], bins: [] });
    expect(oneCause(question, { fault: 'ricing', input: 'moon', level: null }, cells)).toBeNull();
  });
});
