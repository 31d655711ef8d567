import { Z95 } from '#analysis/maths/distributions.ts';
import { firthFit, standardError } from '#analysis/maths/firth.ts';
import type { Design, FirthFit } from '#analysis/maths/firth.ts';
import { profileInterval, ratioTest } from '#analysis/maths/profile.ts';
import type { Estimate } from './board-rows.ts';
import type { Column } from './columns.ts';

/** Term of the asked input in every cell's design. */
export const ASKED = 1;

/** Only promising cells get profiled ends; the others keep the cheap ones, and say so. */
const PROFILE_BELOW_P = 0.3;
const PROFILE_UP_TO = 5000;

/** A step of 1e-6 in log odds is beyond anything shown; the rest of the default's way would be a quarter of the board's time. */
const ARRIVED = 1e-6;

/** Log odds of the asked input: for a level, or for one reference spread of a number. */
export interface LogOdds {
  estimate: number;
  lower: number | null;
  upper: number | null;
}

export interface CellFit {
  design: Design;
  fit: FirthFit;
  logOdds: LogOdds;
  p: number;
  method: 'firth-profile' | 'firth-wald';
  adjusters: readonly Column[];
}

/**
 * Fits one cell, giving up the weakest adjusters one by one where they repeat the others.
 *
 * @param make the design for a set of adjusters, strongest first
 * @param harmOnly one-sided p for more of the fault
 * @returns null when even without adjusters there is no single answer or no convergence
 */
export function fitCell(make: (adjusters: readonly Column[]) => Design, chosen: readonly Column[], harmOnly: boolean, batches: number): CellFit | null {
  for (let keep = chosen.length; keep >= 0; keep--) {
    const adjusters = chosen.slice(0, keep);
    const design = make(adjusters);
    const fit = firthFit(design, { start: atBaseRate(design), tolerance: ARRIVED });
    if (fit === null || !fit.converged) continue;
    const test = ratioTest(design, fit, ASKED);
    if (test === null || !test.converged) continue;
    const profiled = test.twoSided < PROFILE_BELOW_P && batches <= PROFILE_UP_TO;
    const interval = profiled ? profileInterval(design, fit, ASKED) : waldInterval(fit);
    return {
      design, fit, adjusters,
      logOdds: { estimate: fit.beta[ASKED]!, ...interval },
      p: harmOnly ? test.oneSidedMore : test.twoSided,
      method: profiled ? 'firth-profile' : 'firth-wald',
    };
  }
  return null;
}

/** Starting from the overall rate saves the first steps. */
function atBaseRate(design: Design): Float64Array {
  const start = new Float64Array(design.terms);
  const found = design.found.reduce((sum, count) => sum + count, 0);
  const all = design.weight.reduce((sum, count) => sum + count, 0);
  start[0] = Math.log((found + 0.5) / (all - found + 0.5));
  return start;
}

function waldInterval(fit: FirthFit): { lower: number; upper: number } {
  const half = Z95 * standardError(fit, ASKED);
  return { lower: fit.beta[ASKED]! - half, upper: fit.beta[ASKED]! + half };
}

/** Odds ratio for `times` units of the asked term; an end without bound stays null. */
export function asOddsRatio({ estimate, lower, upper }: LogOdds, times = 1): Estimate {
  const end = (value: number | null) => (value === null ? null : Math.exp(value * times));
  return times < 0 ? { estimate: end(estimate), lower: end(upper), upper: end(lower) } : { estimate: end(estimate), lower: end(lower), upper: end(upper) };
}

/** Unadjusted odds ratio of a number, for one reference spread. */
export function fitAlone(design: Design): LogOdds | null {
  const fit = firthFit(design);
  return fit === null || !fit.converged ? null : { estimate: fit.beta[ASKED]!, ...waldInterval(fit) };
}
