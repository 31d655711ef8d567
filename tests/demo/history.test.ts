import { describe, expect, it, test } from 'vitest';
import { foundCounts, ordinaryCounts } from '#server/demo/history/ordinary-counts.ts';
import { quernbyLoft } from '#server/demo/history/quernby.ts';
import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { answerOf, demoDay, foundOf, isCold, isHot, quernby, story, withLot } from './history-support.ts';

describe('invented workshop', () => {
  it('makes 126 cold, 50 hot and 4 rebatches in two years, and has five on the bench', () => {
    expect([story.filter(isCold).length, story.filter(isHot).length, story.filter((b) => b.inputs.method === 'rebatch').length]).toEqual([126, 50, 4]);
    expect(quernby.batches.slice(180).map((b) => b.state)).toEqual(['in-mould', 'in-mould', 'making', 'planned', 'planned']);
    expect(story.filter((b) => b.state === 'abandoned')).toHaveLength(2);
    expect(new Set(quernby.batches.map((b) => b.code)).size).toBe(185);
  });

  test.each([
    ['EF-7731', 9, 3, 1, 23], ['EF-7802', 10, 6, 24, 50], ['EF-7860', 12, 4, 51, 104], ['TF-2204', 12, 3, 1, 52], ['TF-2251', 10, 3, 53, 104],
    ['BK-0415', 9, 3, 1, 55], ['BK-0459', 8, 3, 56, 104], ['LS-3310', 6, 6, 1, 50], ['LS-3365', 7, 6, 51, 104], ['HL-1102', 24, 3, 1, 104],
    ['LA-5560', 6, 2, 20, 82], ['CS-6001', 0, 7, 10, 104], ['GR-4120', 3, 0, 35, 45], ['GR-4188', 3, 1, 70, 80],
  ])('pours %s %i times cold and %i times hot, in weeks %i to %i', (code, cold, hot, first, last) => {
    const batches = withLot(code);
    expect([batches.filter(isCold).length, batches.filter(isHot).length]).toEqual([cold, hot]);
    for (const batch of batches) expect(batch.week >= first && batch.week <= last, `${batch.code} in week ${batch.week}`).toBe(true);
  });

  it('keeps what cannot be told apart together: who made what with which lot', () => {
    expect(withLot('EF-7802').filter((b) => isCold(b) && b.inputs.maker === 'tomasz')).toHaveLength(8);
    expect(withLot('EF-7802').filter(isCold).every((b) => b.week >= 24 && b.week <= 38)).toBe(true);
    expect(withLot('TF-2204').filter((b) => isCold(b) && b.inputs.maker === 'tomasz')).toHaveLength(7);
    expect(withLot('CS-6001').every((b) => isHot(b) && b.inputs.maker === 'priya')).toBe(true);
  });

  it('shows the pinned faults exactly, of all the batches they are pinned in', () => {
    const bad = withLot('EF-7802').filter(isCold);
    expect([foundOf(bad, 'acceleration'), foundOf(bad, 'ricing'), foundOf(bad, 'seizing')]).toEqual(['8 of 10', '4 of 10', '2 of 10']);
    const badHot = withLot('EF-7802').filter(isHot);
    expect([foundOf(badHot, 'acceleration'), foundOf(badHot, 'ricing'), foundOf(badHot, 'seizing')]).toEqual(['0 of 6', '0 of 6', '0 of 6']);
    expect(foundOf(withLot('LA-5560').filter(isCold), 'seizing')).toBe('2 of 6');
    expect(foundOf(withLot('GR-4120'), 'ricing')).toBe('1 of 3');
    expect(foundOf(withLot('GR-4188'), 'off-smell')).toBe('3 of 4');
  });

  test.each(Object.entries(ordinaryCounts))('finds %s in an ordinary number of batches', (fault, [lower, upper]) => {
    const n = foundCounts(story).get(fault as CatalogueSlug) ?? 0;
    expect(n).toBeGreaterThanOrEqual(lower);
    expect(n).toBeLessThanOrEqual(upper);
  });

  it('plants the causes so that they can be seen', () => {
    const share = (batches: typeof story, fault: CatalogueSlug) => {
      const looked = batches.filter((b) => answerOf(b, fault) !== 'not-checked');
      return looked.filter((b) => answerOf(b, fault) === 'found').length / looked.length;
    };
    const cold = story.filter(isCold);
    expect(share(cold.filter((b) => b.week < 53), 'soda-ash')).toBeGreaterThan(2 * share(cold.filter((b) => b.week >= 53), 'soda-ash'));
    expect(share(story.filter(isHot), 'air-pockets')).toBeGreaterThan(2 * share(cold, 'air-pockets'));
    expect(share(withLot('BK-0459'), 'vanilla-browning')).toBeGreaterThan(0.6);
    const old = story.filter((b) => b.inputs.ingredients.some((line) => line.lot === 'SU-884'));
    expect(share(old, 'orange-spots')).toBeGreaterThan(0.15);
    expect(old.every((b) => b.week >= 60 && b.week <= 78)).toBe(true);
  });

  it('is the same each time, and another on another day', () => {
    expect(quernbyLoft(demoDay)).toEqual(quernby);
    expect(quernbyLoft('2026-12-01').batches[0]?.madeOn).not.toBe(quernby.batches[0]?.madeOn);
  });

  test.each(['2025-02-28', '2026-05-09', '2026-12-01', '2027-03-07', '2028-02-29'])('can be told on %s as well', (day) => {
    const told = quernbyLoft(day);
    expect(told.batches).toHaveLength(185);
    for (const batch of told.batches) for (const look of batch.inspections) expect(look.at < `${day}T00:00`).toBe(true);
  });
});
