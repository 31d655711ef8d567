import { chisquareUpper } from '#analysis/maths/distributions.ts';
import { checkTable } from './two-by-two.ts';
import type { TwoByTwo } from './two-by-two.ts';

export interface Homogeneity {
  /** Breslow and Day's own statistic. */
  statistic: number;
  /** With Tarone's correction, the one p belongs to. */
  corrected: number;
  df: number;
  p: number;
}

/** Found among the exposed that this odds ratio would give with the table's margins. */
function expectedFound(n1: number, n0: number, m1: number, ratio: number): number {
  if (Math.abs(ratio - 1) < 1e-12) return (n1 * m1) / (n1 + n0);
  const b = n0 - m1 + ratio * (n1 + m1);
  const root = Math.sqrt(b * b - 4 * (ratio - 1) * ratio * n1 * m1);
  return (2 * ratio * n1 * m1) / (b + root);
}

/**
 * Whether one odds ratio fits all strata. A small p says the effect differs from stratum to stratum.
 *
 * @param strata tables; those without contrast are passed over
 * @param commonRatio Mantel-Haenszel odds ratio of the same strata, > 0
 * @returns null when fewer than two strata carry anything
 * @throws RangeError when the ratio is not positive or a count is no count
 *
 * Source: N. Breslow and N. Day, Statistical Methods in Cancer Research I (1980); R. E. Tarone, Biometrika 72 (1985) 91. Cost: O(strata).
 */
export function breslowDay(strata: readonly TwoByTwo[], commonRatio: number): Homogeneity | null {
  if (!(commonRatio > 0)) throw new RangeError(`breslowDay: commonRatio must be above 0, got ${commonRatio}`);
  let [statistic, gap, spread, used] = [0, 0, 0, 0];
  for (const table of strata) {
    checkTable('breslowDay', table);
    const n1 = table.exposedFound + table.exposedClear;
    const n0 = table.unexposedFound + table.unexposedClear;
    const m1 = table.exposedFound + table.unexposedFound;
    if (n1 === 0 || n0 === 0 || m1 === 0 || m1 === n1 + n0) continue;
    const a = expectedFound(n1, n0, m1, commonRatio);
    const variance = 1 / (1 / a + 1 / (n1 - a) + 1 / (m1 - a) + 1 / (n0 - m1 + a));
    statistic += (table.exposedFound - a) ** 2 / variance;
    gap += table.exposedFound - a;
    spread += variance;
    used++;
  }
  if (used < 2) return null;
  const corrected = statistic - (gap * gap) / spread;
  return { statistic, corrected, df: used - 1, p: chisquareUpper(corrected, used - 1) };
}
