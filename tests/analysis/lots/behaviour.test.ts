import { describe, expect, it } from 'vitest';
import type { BatchRow, Outcome } from '#analysis/causes/board-rows.ts';
import { causesBoard } from '#analysis/causes/board.ts';
import { lotsBehaviour } from '#analysis/lots/behaviour.ts';
import { BAD_LOT, INNOCENT_LOT, inputs, namedFaults, simulatedWorkshop } from '#tests/analysis/causes/simulated-workshop.ts';

let made = 0;
function batches(count: number, lot: string, family: 'cold' | 'hot', outcome: Outcome | null): BatchRow[] {
  const outcomes: Record<string, Outcome> = outcome === null ? {} : { ricing: outcome };
  return Array.from({ length: count }, () => ({
    id: `b${String(made++).padStart(4, '0')}`, method: family, family, nominal: { maker: 'ilse', formula: 'everyday' }, numbers: {},
    holds: { fragranceLot: [lot] }, outcomes,
  }));
}

/** A lot bad in cold, fine in hot; its peers; one lot of which one in three riced. */
const rows = Object.freeze([
  ...batches(8, 'bad', 'cold', 2), ...batches(2, 'bad', 'cold', 0), ...batches(6, 'bad', 'hot', 0),
  ...batches(40, 'peer-a', 'cold', 0), ...batches(2, 'peer-a', 'cold', 1), ...batches(20, 'peer-a', 'hot', 0),
  ...batches(40, 'peer-b', 'cold', 0), ...batches(2, 'peer-b', 'cold', 1),
  ...batches(1, 'few', 'cold', 1), ...batches(2, 'few', 'cold', 0),
]);
const question = { rows, lotInput: 'fragranceLot', faults: ['ricing'], cells: [] };
const of = (lot: string, answers = lotsBehaviour(question)) => answers.find((answer) => answer.lot === lot)!;

describe('lotsBehaviour', () => {
  it('says which lot misbehaves, and that hot batches are still fine with it', () => {
    const bad = of('bad');
    expect(bad.verdict).toBe('misbehaves');
    expect(bad.faults[0]!.cold).toMatchObject({ n: 10, events: 8 });
    expect(bad.faults[0]!.cold.chanceTwice).toBeGreaterThan(0.99);
    expect(bad.suggestedStanding).toBe('hot-process-only');
    expect(bad.because[0]).toMatchObject({ fault: 'ricing', hotN: 6, hotEvents: 0 });
    // Wilson's upper bound of 0 of 6.
    expect(bad.because[0]!.hotUpper).toBeCloseTo(0.39033, 5);
  });

  it('suggests nothing about hot where too few hot batches were checked', () => {
    const fewer = rows.filter((row) => !(row.family === 'hot' && row.holds['fragranceLot']!.includes('bad'))).concat(batches(4, 'bad', 'hot', 0));
    expect(of('bad', lotsBehaviour({ ...question, rows: fewer })).suggestedStanding).toBeNull();
  });

  it('suggests holding a lot that misbehaves in both families', () => {
    const worse = rows.concat(batches(5, 'bad', 'hot', 2));
    expect(of('bad', lotsBehaviour({ ...question, rows: worse })).suggestedStanding).toBe('on-hold');
  });

  it('does not condemn one in three', () => {
    const few = of('few');
    expect(few.verdict).toBe('too-few');
    expect(few.faults[0]!.all.rate!.upper).toBeGreaterThan(0.75);
    expect(few.faults[0]!.all.shownRate!).toBeLessThan(few.faults[0]!.all.rate!.share);
  });

  it('changes no rate when batches come in that were not checked', () => {
    const more = of('bad', lotsBehaviour({ ...question, rows: rows.concat(batches(7, 'bad', 'cold', null)) }));
    expect(more.faults[0]!.cold).toEqual({ ...of('bad').faults[0]!.cold, notChecked: 7 });
  });

  it('gives the same digits whatever the order of the batches', () => {
    expect(lotsBehaviour({ ...question, rows: [...rows].reverse() })).toEqual(lotsBehaviour(question));
  });

  it('leaves rebatch out and says so', () => {
    const rebatch: BatchRow = { ...batches(1, 'bad', 'cold', 3)[0]!, method: 'rebatch', family: 'rebatch' };
    const answer = of('bad', lotsBehaviour({ ...question, rows: rows.concat(rebatch) }));
    expect(answer.n).toBe(16);
    expect(answer.leftOut).toEqual([{ reason: 'rebatch', count: 1 }]);
  });

  it('answers nothing about no lots', () => {
    expect(lotsBehaviour({ ...question, rows: [] })).toEqual([]);
    expect(lotsBehaviour({ ...question, lotInput: 'fatLot' })).toEqual([]);
  });

  it('does not accuse on counts alone what the board clears', () => {
    const workshop = simulatedWorkshop({ seed: 11, batches: 400 });
    const { cells } = causesBoard({ rows: workshop, inputs, faults: namedFaults });
    const answers = lotsBehaviour({ rows: workshop, lotInput: 'fragranceLot', faults: namedFaults.map((fault) => fault.slug), cells });
    expect(answers.find((answer) => answer.lot === BAD_LOT)!.faults.find((answer) => answer.fault === 'acceleration')!.verdict).toBe('misbehaves');
    // Mostly poured by the maker who uses more water: more ash than its peers, by no fault of the lot.
    expect(answers.find((answer) => answer.lot === INNOCENT_LOT)!.faults.find((answer) => answer.fault === 'soda-ash')!.verdict).not.toBe('misbehaves');
  });
});
