import { Z95 } from '#analysis/maths/distributions.ts';

/** A share of batches with its interval, all in 0..1. */
export interface ShareInterval {
  share: number;
  lower: number;
  upper: number;
}

/**
 * Score interval for a share of batches, honest when few were looked at.
 *
 * Unlike estimate ± 1.96 s.e., it never leaves 0..1 and does not shrink to
 * nothing at 0 of n: 0 of 5 found still allows a true share of 43 %.
 *
 * @param events batches with the fault found; an integer, 0 ≤ events ≤ n
 * @param n batches where the fault was checked (found + clear, never "not checked"); an integer ≥ 1
 * @param z standard normal quantile; 1.96 gives 95 % coverage
 * @throws RangeError when n < 1, events lies outside 0..n, or either is not an integer
 *
 * Source: E. B. Wilson, J. Am. Stat. Assoc. 22 (1927) 209–212. Cost: O(1).
 */
export function wilsonInterval(events: number, n: number, z = Z95): ShareInterval {
  if (!Number.isInteger(n) || n < 1) throw new RangeError(`wilsonInterval: n must be an integer of 1 or more, got ${n}`);
  if (!Number.isInteger(events) || events < 0 || events > n) {
    throw new RangeError(`wilsonInterval: events must be an integer in 0..${n}, got ${events}`);
  }
  const share = events / n;
  const z2n = (z * z) / n;
  const centre = (share + z2n / 2) / (1 + z2n);
  const half = (z / (1 + z2n)) * Math.sqrt((share * (1 - share)) / n + z2n / (4 * n));
  // Exact at the ends, where rounding would leave 1e-17 instead of 0.
  return { share, lower: events === 0 ? 0 : centre - half, upper: events === n ? 1 : centre + half };
}

/** The same, or null where nothing was checked: a share of nothing is no number. */
export function wilsonOrNone(events: number, n: number): ShareInterval | null {
  return n === 0 ? null : wilsonInterval(events, n);
}
