import { Z95, chisquareUpper } from '#analysis/maths/distributions.ts';
import { conditionalOf, exactOddsRatio, exactTest, sumOf } from './conditional.ts';
import { checkTable, tableSize } from './two-by-two.ts';
import type { TwoByTwo } from './two-by-two.ts';

export interface StratifiedAnswer {
  kind: 'answer';
  oddsRatio: { estimate: number; lower: number; upper: number };
  riskRatio: number;
  /** Difference in shares, −1..1, with Sato's standard error. */
  riskDifference: { difference: number; standardError: number; lower: number; upper: number };
  chisquare: number;
  p: number;
  chisquareCorrected: number;
  pCorrected: number;
  /** Whether some expected count lies below 5, so that the exact test is to be quoted. */
  sparse: boolean;
}

/** Strata with nothing to compare: one group absent everywhere, or none found, or none clear. */
export interface NoContrast {
  kind: 'no-variation';
}

/**
 * One odds ratio and one difference over strata, each stratum compared only with itself.
 *
 * @param strata tables; empty ones and those with one group only carry nothing and are passed over
 * @throws RangeError when a count is negative or no integer
 *
 * Source: N. Mantel and W. Haenszel, J. Natl. Cancer Inst. 22 (1959) 719; variance J. Robins, N. Breslow and
 * S. Greenland, Biometrics 42 (1986) 311; difference T. Sato, Biometrics 45 (1989) 1323. Cost: O(strata).
 */
export function mantelHaenszel(strata: readonly TwoByTwo[]): StratifiedAnswer | NoContrast {
  let [r, s, pr, psqr, qs] = [0, 0, 0, 0, 0];
  let [excess, variance] = [0, 0];
  let [weights, differences, satoP, satoQ] = [0, 0, 0, 0];
  let [exposedRisk, unexposedRisk] = [0, 0];
  let sparse = false;
  for (const table of strata) {
    checkTable('mantelHaenszel', table);
    const n = tableSize(table);
    const { exposedFound: a, exposedClear: b, unexposedFound: c, unexposedClear: d } = table;
    const [n1, n0, m1, m0] = [a + b, c + d, a + c, b + d];
    if (n1 === 0 || n0 === 0) continue;
    const [R, S, P, Q] = [(a * d) / n, (b * c) / n, (a + d) / n, (b + c) / n];
    r += R; s += S; pr += P * R; psqr += P * S + Q * R; qs += Q * S;
    excess += a - (n1 * m1) / n;
    if (n > 1) variance += (n1 * n0 * m1 * m0) / (n * n * (n - 1));
    if (Math.min(n1, n0) * Math.min(m1, m0) < 5 * n) sparse = true;
    weights += (n1 * n0) / n;
    differences += (a * n0 - c * n1) / n;
    exposedRisk += (a * n0) / n; unexposedRisk += (c * n1) / n;
    satoP += (n1 * n1 * c - n0 * n0 * a + (n1 * n0 * (n0 - n1)) / 2) / (n * n);
    satoQ += (a * (n0 - c) + c * (n1 - a)) / (2 * n);
  }
  if (variance === 0 || r === 0 || s === 0) return { kind: 'no-variation' };
  const log = Math.log(r / s);
  const half = Z95 * Math.sqrt(pr / (2 * r * r) + psqr / (2 * r * s) + qs / (2 * s * s));
  const difference = differences / weights;
  const standardError = Math.sqrt(difference * satoP + satoQ) / weights;
  const chisquare = (excess * excess) / variance;
  const chisquareCorrected = Math.max(0, Math.abs(excess) - 0.5) ** 2 / variance;
  return {
    kind: 'answer',
    oddsRatio: { estimate: Math.exp(log), lower: Math.exp(log - half), upper: Math.exp(log + half) },
    riskRatio: exposedRisk / unexposedRisk,
    riskDifference: { difference, standardError, lower: difference - Z95 * standardError, upper: difference + Z95 * standardError },
    chisquare, p: chisquareUpper(chisquare, 1),
    chisquareCorrected, pCorrected: chisquareUpper(chisquareCorrected, 1),
    sparse,
  };
}

/**
 * Exact conditional test and odds ratio over strata, for sparse tables.
 *
 * Source: exact conditional inference on the sum over strata, J. Gart, Biometrika 57 (1970) 471. Cost: product of neighbouring supports.
 */
export function exactStrata(strata: readonly TwoByTwo[]): { estimate: number | null; lower: number; upper: number | null; p: number; midP: number } {
  for (const table of strata) checkTable('exactStrata', table);
  const law = sumOf(strata.map(conditionalOf));
  const seen = strata.reduce((sum, table) => sum + table.exposedFound, 0);
  return { ...exactOddsRatio(law, seen), ...exactTest(law, seen) };
}
