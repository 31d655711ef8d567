import { CHI2_95, chisquareUpper, normalUpper } from './distributions.ts';
import { firthFit, standardError } from './firth.ts';
import type { Design, FirthFit } from './firth.ts';

/** Of a held fit only the likelihood is used, whose error is the square of the step's. */
const HELD = 1e-4;

/** Whether a term matters, by the penalised likelihood ratio. */
export interface RatioTest {
  /** Twice the drop in penalised log-likelihood when the term is held at 0; chi-square, 1 df. */
  statistic: number;
  twoSided: number;
  /** P of so much or more on the side of a positive term. */
  oneSidedMore: number;
  converged: boolean;
}

/**
 * Penalised likelihood ratio test of one term being 0.
 *
 * @returns null when the held fit has no answer
 *
 * Source: G. Heinze and M. Schemper, Stat. Med. 21 (2002) 2409.
 */
export function ratioTest(design: Design, fit: FirthFit, term: number): RatioTest | null {
  const start = Float64Array.from(fit.beta);
  start[term] = 0;
  const held = firthFit(design, { start, fixed: term, tolerance: HELD });
  if (held === null) return null;
  const statistic = Math.max(0, 2 * (fit.penalisedLogLikelihood - held.penalisedLogLikelihood));
  const root = Math.sqrt(statistic) * Math.sign(fit.beta[term]!);
  return { statistic, twoSided: chisquareUpper(statistic, 1), oneSidedMore: normalUpper(root), converged: held.converged && fit.converged };
}

/** Interval of a term in log odds; an end is null when the likelihood never falls far enough (it runs off). */
export interface TermInterval {
  lower: number | null;
  upper: number | null;
}

/** The penalised log-likelihood's drop below its top, times two, less the 95 % point: negative inside the interval. */
function excess(design: Design, fit: FirthFit, term: number, at: number, near: Float64Array): { value: number; beta: Float64Array } | null {
  const start = Float64Array.from(near);
  start[term] = at;
  const held = firthFit(design, { start, fixed: term, tolerance: HELD });
  if (held === null) return null;
  return { value: 2 * (fit.penalisedLogLikelihood - held.penalisedLogLikelihood) - CHI2_95, beta: held.beta };
}

/** Ends beyond these log odds from the estimate are as good as no bound. */
const RUNS_OFF = 30;

function end(design: Design, fit: FirthFit, term: number, side: -1 | 1): number | null {
  const centre = fit.beta[term]!;
  let reach = Math.max(1.96 * standardError(fit, term), 1e-6);
  let inside = 0;
  let insideValue = -CHI2_95;
  let near = fit.beta;
  let outside: number | null = null;
  let outsideValue = 0;
  // Secant on the signed root of the drop, which is nearly straight; the bracket keeps it safe.
  for (let round = 0; round < 40; round++) {
    const point = excess(design, fit, term, centre + side * reach, near);
    if (point === null) return null;
    if (Math.abs(point.value) < 1e-7) return centre + side * reach;
    if (point.value < 0) {
      inside = reach;
      insideValue = point.value;
      near = point.beta;
    } else {
      outside = reach;
      outsideValue = point.value;
      near = point.beta;
    }
    if (outside === null) {
      const root = Math.sqrt(Math.max(point.value + CHI2_95, 1e-3) / CHI2_95);
      reach = Math.min(reach / Math.max(root, 0.4) * 1.02, reach * 2.5);
      if (reach > RUNS_OFF) return null;
    } else {
      const low = Math.sqrt(Math.max(insideValue + CHI2_95, 0));
      const high = Math.sqrt(outsideValue + CHI2_95);
      const share = (Math.sqrt(CHI2_95) - low) / (high - low);
      reach = inside + (outside - inside) * Math.min(0.98, Math.max(0.02, share));
      if (outside - inside < 1e-8) return centre + side * reach;
    }
  }
  return centre + side * reach;
}

/**
 * 95 % interval of one term by its profile penalised likelihood: the values whose
 * held fit drops by no more than the chi-square's 95 % point.
 *
 * Source: G. Heinze and M. Schemper, Stat. Med. 21 (2002) 2409. Cost: some 4 to 8 held fits an end.
 */
export function profileInterval(design: Design, fit: FirthFit, term: number): TermInterval {
  return { lower: end(design, fit, term, -1), upper: end(design, fit, term, 1) };
}
