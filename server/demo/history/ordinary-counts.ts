import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { HistoryBatch } from './types.ts';

/** Batches found with each fault in nine of ten such workshops (5th to 95th of a hundred), over all batches but rebatches. */
export const ordinaryCounts: Readonly<Partial<Record<CatalogueSlug, readonly [number, number]>>> = {
  'soda-ash': [22, 38], 'glycerin-rivers': [17, 29], 'air-pockets': [19, 33], 'drag-marks': [19, 33], 'scent-fade': [13, 24], 'vanilla-browning': [13, 22],
  'partial-gel-ring': [11, 22], acceleration: [11, 19], sweating: [7, 18], 'soft-sticky': [6, 17], ricing: [7, 13], 'overheating-crack': [3, 12],
  'orange-spots': [3, 10], seizing: [4, 7], 'stearic-spots': [2, 10], crumbly: [1, 7],
};

/** In how many of these batches each fault was found at some look; rebatches are left out. */
export function foundCounts(batches: readonly HistoryBatch[]): Map<CatalogueSlug, number> {
  const counts = new Map<CatalogueSlug, number>();
  for (const batch of batches) {
    if (batch.inputs.method === 'rebatch') continue;
    const found = new Set(batch.inspections.flatMap((look) => look.findings.map((finding) => finding.fault)));
    for (const fault of found) counts.set(fault, (counts.get(fault) ?? 0) + 1);
  }
  return counts;
}

/** Whether a draw of the story shows its faults about as often as such workshops do. */
export function isOrdinary(batches: readonly HistoryBatch[]): boolean {
  const counts = foundCounts(batches);
  return Object.entries(ordinaryCounts).every(([fault, [lower, upper]]) => {
    const n = counts.get(fault as CatalogueSlug) ?? 0;
    return n >= lower && n <= upper;
  });
}
