/**
 * Lye concentration from the water to lye ratio, both by mass as weighed.
 *
 * @param ratio grams of water per gram of alkali as weighed (not purified); above 0
 * @returns fraction of the lye that is alkali, 0..1
 * @throws RangeError when the ratio is not a number above 0
 *
 * Source: definition of the two; common practice.
 */
export function concentrationOfRatio(ratio: number): number {
  if (!(ratio > 0)) throw new RangeError(`concentrationOfRatio: ratio must be above 0, got ${ratio}`);
  return 1 / (1 + ratio);
}

/**
 * Water to lye ratio from the lye concentration; undoes `concentrationOfRatio`.
 *
 * @param concentration fraction of the lye that is alkali as weighed, above 0 and below 1
 * @returns grams of water per gram of alkali
 * @throws RangeError when the concentration does not lie between 0 and 1
 */
export function ratioOfConcentration(concentration: number): number {
  if (!(concentration > 0 && concentration < 1)) throw new RangeError(`ratioOfConcentration: concentration must lie between 0 and 1, got ${concentration}`);
  return (1 - concentration) / concentration;
}
