/**
 * Quantile by linear interpolation between order statistics (type 7 of R).
 *
 * @param sorted ascending numbers, at least one
 * @param p share in 0..1
 * @throws RangeError when nothing is given or p lies outside 0..1
 *
 * Source: R. Hyndman and Y. Fan, Am. Stat. 50 (1996) 361, definition 7. Cost: O(1).
 */
export function quantileOf(sorted: ArrayLike<number>, p: number): number {
  if (sorted.length === 0) throw new RangeError('quantileOf: needs at least one number');
  if (!(p >= 0 && p <= 1)) throw new RangeError(`quantileOf: p must lie in 0..1, got ${p}`);
  const at = (sorted.length - 1) * p;
  const below = Math.floor(at);
  const low = sorted[below]!;
  const high = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return low + (at - below) * (high - low);
}
