import { solveLower, solveWith } from '#analysis/maths/cholesky.ts';
import { CHI2_95 } from '#analysis/maths/distributions.ts';
import { firthFit } from '#analysis/maths/firth.ts';
import type { Design, FirthFit } from '#analysis/maths/firth.ts';
import { ratioTest } from '#analysis/maths/profile.ts';
import { ASKED } from './fit-cell.ts';

interface Omission {
  group: number;
  found: 0 | 1;
  /** Change of the asked term when one such batch is left out, to first order. */
  shift: number;
}

/** Every kind of batch that could be left out, the one that would weaken the answer most first. */
function omissions(design: Design, fit: FirthFit): Omission[] {
  const { groups, terms: p, x, weight, found, offset } = design;
  const direction = new Float64Array(p);
  direction[ASKED] = 1;
  solveWith(fit.factor, p, direction);
  const out: Omission[] = [];
  const row = new Float64Array(p);
  for (let i = 0; i < groups; i++) {
    let [eta, along] = [offset[i]!, 0];
    for (let j = 0; j < p; j++) {
      row[j] = x[i * p + j]!;
      eta += row[j]! * fit.beta[j]!;
      along += row[j]! * direction[j]!;
    }
    const probability = 1 / (1 + Math.exp(-eta));
    solveLower(fit.factor, p, row);
    const leverage = row.reduce((sum, part) => sum + part * part, 0) * probability * (1 - probability);
    const shift = (y: 0 | 1) => (-along * (y - probability)) / Math.max(1 - leverage, 0.05);
    if (found[i]! > 0) out.push({ group: i, found: 1, shift: shift(1) });
    if (weight[i]! > found[i]!) out.push({ group: i, found: 0, shift: shift(0) });
  }
  const sign = Math.sign(fit.beta[ASKED]!);
  return out.sort((a, b) => sign * (a.shift - b.shift) || a.group - b.group);
}

function without(design: Design, { group, found }: Omission): Design {
  const smaller = { ...design, weight: Float64Array.from(design.weight), found: Float64Array.from(design.found) };
  smaller.weight[group]!--;
  smaller.found[group]! -= found;
  return smaller;
}

/**
 * Whether the interval still excludes 1 with any one batch left out.
 *
 * The batches are ranked by their first-order influence, and only the `most`
 * strongest ones against the answer are refitted: the rest weaken it less.
 */
export function survivesAnyBatch(design: Design, fit: FirthFit, most: number): boolean {
  const sign = Math.sign(fit.beta[ASKED]!);
  return omissions(design, fit).slice(0, most).every((omission) => {
    const smaller = without(design, omission);
    const refit = firthFit(smaller, { start: fit.beta });
    if (refit === null || Math.sign(refit.beta[ASKED]!) !== sign) return false;
    const test = ratioTest(smaller, refit, ASKED);
    return test !== null && test.statistic > CHI2_95;
  });
}

/** Lowest and highest log odds of the asked term with any one batch left out (all kinds of batches refitted). */
export function leaveOneOutRange(design: Design, fit: FirthFit): { lowest: number; highest: number } | null {
  const values = omissions(design, fit).flatMap((omission) => firthFit(without(design, omission), { start: fit.beta })?.beta[ASKED] ?? []);
  return values.length === 0 ? null : { lowest: Math.min(...values), highest: Math.max(...values) };
}
