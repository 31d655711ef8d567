import { Z95, normalPoint } from '#analysis/maths/distributions.ts';

/**
 * Batches needed in all to tell two rates apart, two-sided at 0.05.
 *
 * @param rate0 rate without, in 0..1
 * @param rate1 rate with, in 0..1, different from rate0
 * @param power chance to see the difference, in 0..1
 * @param exposedShare share of the batches that have the exposure, strictly between 0 and 1
 * @throws RangeError when a rate lies outside 0..1, the rates are equal, or the share is 0 or 1
 *
 * Source: J. Fleiss, Statistical Methods for Rates and Proportions (1981), without continuity correction.
 */
export function batchesNeeded(rate0: number, rate1: number, power: number, exposedShare = 0.5): number {
  for (const [name, rate] of [['rate0', rate0], ['rate1', rate1]] as const) {
    if (!(rate >= 0 && rate <= 1)) throw new RangeError(`batchesNeeded: ${name} must lie in 0..1, got ${rate}`);
  }
  if (rate0 === rate1) throw new RangeError('batchesNeeded: rate0 and rate1 must differ');
  if (!(exposedShare > 0 && exposedShare < 1)) throw new RangeError(`batchesNeeded: exposedShare must lie between 0 and 1, got ${exposedShare}`);
  const unexposedShare = 1 - exposedShare;
  const pooled = exposedShare * rate1 + unexposedShare * rate0;
  const atNone = Math.sqrt((pooled * (1 - pooled)) / (exposedShare * unexposedShare));
  const atSome = Math.sqrt((rate1 * (1 - rate1)) / exposedShare + (rate0 * (1 - rate0)) / unexposedShare);
  return ((Z95 * atNone + normalPoint(power) * atSome) / (rate1 - rate0)) ** 2;
}
