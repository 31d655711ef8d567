import { gammaPoint, gammaUpper } from '#analysis/maths/distributions.ts';

/** Found and expected of one lot for one fault. */
export interface FoundAgainstExpected {
  found: number;
  expected: number;
}

/** How many times as often as its peers' a lot's batches have the fault, pulled towards 1 by how little is known. */
export interface ShrunkRatio {
  mean: number;
  lower: number;
  upper: number;
  /** P(at least twice as bad as its peers). */
  chanceTwice: number;
}

const LEAST_PRIOR = 0.3;
const MOST_PRIOR = 20;

/**
 * Posterior of one lot's rate ratio under a Gamma(a, a) prior, whose mean is 1.
 *
 * Why not the raw rate: 2 of 3 looks like 67 % and means 9 to 94 %.
 *
 * @param found batches with the fault, an integer ≥ 0
 * @param expected batches that would have it at its peers' rates, ≥ 0
 * @param a prior shape and rate, > 0; large a means lots hardly differ
 * @throws RangeError outside those ranges
 *
 * Source: W. DuMouchel, Am. Stat. 53 (1999) 177; G. N. Norén, J. Hopstadius and A. Bate, Stat. Methods Med. Res. 22 (2013) 57.
 */
export function shrunkRatio(found: number, expected: number, a: number): ShrunkRatio {
  check(found, expected);
  if (!(a > 0)) throw new RangeError(`shrunkRatio: a must be above 0, got ${a}`);
  const [shape, rate] = [a + found, a + expected];
  return {
    mean: shape / rate, lower: gammaPoint(0.025, shape, rate), upper: gammaPoint(0.975, shape, rate),
    chanceTwice: gammaUpper(2, shape, rate),
  };
}

function check(found: number, expected: number): void {
  if (!Number.isInteger(found) || found < 0) throw new RangeError(`found must be an integer of 0 or more, got ${found}`);
  if (!(expected >= 0)) throw new RangeError(`expected must be 0 or more, got ${expected}`);
}

/** Log probability of the seen counts under a, up to what does not depend on a. */
function logMarginal(lots: readonly FoundAgainstExpected[], a: number): number {
  let sum = 0;
  for (const { found, expected } of lots) {
    for (let i = 0; i < found; i++) sum += Math.log(a + i) - Math.log(a + expected);
    sum += a * (Math.log(a) - Math.log(a + expected));
  }
  return sum;
}

/**
 * The prior that the lots themselves speak for: the a in 0.3..20 of highest marginal likelihood over all lots of a kind.
 *
 * @param lots found and expected of each; those with nothing expected say nothing; none gives 20 (lots taken as alike)
 *
 * Source: DuMouchel 1999, with one Gamma for the two of the paper. Cost: O(60 · (lots + found)).
 */
export function priorFromLots(lots: readonly FoundAgainstExpected[]): number {
  const telling = lots.filter(({ found, expected }) => { check(found, expected); return expected > 0; });
  if (telling.length === 0) return MOST_PRIOR;
  let [low, high] = [Math.log(LEAST_PRIOR), Math.log(MOST_PRIOR)];
  const at = (logA: number) => logMarginal(telling, Math.exp(logA));
  // A coarse grid first: with few lots the likelihood may have its top at either end.
  const step = (high - low) / 20;
  let best = low;
  for (let k = 0; k <= 20; k++) if (at(low + k * step) > at(best)) best = low + k * step;
  [low, high] = [Math.max(low, best - step), Math.min(high, best + step)];
  const golden = (Math.sqrt(5) - 1) / 2;
  while (high - low > 1e-6) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (at(left) >= at(right)) high = right;
    else low = left;
  }
  return Math.exp((low + high) / 2);
}
