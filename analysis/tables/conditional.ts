import type { TwoByTwo } from './two-by-two.ts';

/**
 * Distribution of the number found among the exposed, given both margins, for
 * one table or the sum over several, at odds ratio 1 up to a factor:
 * `logWeight[i]` belongs to `lowest + i`. At odds ratio ω each gains `(lowest + i) · log ω`.
 */
export interface Conditional {
  lowest: number;
  logWeight: Float64Array;
}

/**
 * The conditional distribution of one table, by the ratio of neighbouring terms
 * (no package keeps the non-central family these weights serve).
 */
export function conditionalOf(table: TwoByTwo): Conditional {
  const exposed = table.exposedFound + table.exposedClear;
  const found = table.exposedFound + table.unexposedFound;
  const unexposed = table.unexposedFound + table.unexposedClear;
  const lowest = Math.max(0, found - unexposed);
  const highest = Math.min(exposed, found);
  const logWeight = new Float64Array(highest - lowest + 1);
  for (let k = lowest; k < highest; k++) {
    logWeight[k - lowest + 1] = logWeight[k - lowest]! + Math.log(((exposed - k) * (found - k)) / ((k + 1) * (unexposed - found + k + 1)));
  }
  return { lowest, logWeight };
}

/** The distribution of the sum over independent tables. Cost: product of the lengths. */
export function sumOf(parts: readonly Conditional[]): Conditional {
  let lowest = 0;
  let weights = Float64Array.of(1);
  let logScale = 0;
  for (const part of parts) {
    lowest += part.lowest;
    const top = part.logWeight.reduce((a, b) => Math.max(a, b), -Infinity);
    const own = part.logWeight.map((w) => Math.exp(w - top));
    const next = new Float64Array(weights.length + own.length - 1);
    for (let i = 0; i < weights.length; i++) for (let j = 0; j < own.length; j++) next[i + j]! += weights[i]! * own[j]!;
    const largest = next.reduce((a, b) => Math.max(a, b), 0);
    logScale += top + Math.log(largest);
    weights = next.map((w) => w / largest);
  }
  return { lowest, logWeight: weights.map((w) => Math.log(w) + logScale) };
}

/** Probabilities at log odds ratio `t`; `probability[i]` belongs to `lowest + i`. */
export function probabilitiesAt(law: Conditional, t: number): Float64Array {
  const shifted = law.logWeight.map((w, i) => w + i * t);
  const top = shifted.reduce((a, b) => Math.max(a, b), -Infinity);
  let sum = 0;
  for (let i = 0; i < shifted.length; i++) {
    shifted[i] = Math.exp(shifted[i]! - top);
    sum += shifted[i]!;
  }
  for (let i = 0; i < shifted.length; i++) shifted[i]! /= sum;
  return shifted;
}

/** Log odds ratios beyond this are as good as 0 or without bound. */
const REACH = 40;

/** The t in −40..40 where a rising function of t passes `target`. */
function passes(rising: (t: number) => number, target: number): number {
  let low = -REACH;
  let high = REACH;
  while (high - low > 2) {
    const middle = (low + high) / 2;
    if (rising(middle) < target) low = middle;
    else high = middle;
  }
  // Illinois' false position: the curve is nearly straight by now.
  let [below, over] = [rising(low) - target, rising(high) - target];
  let side = 0;
  for (let round = 0; round < 60 && high - low > 1e-10; round++) {
    const at = below === over ? (low + high) / 2 : (low * over - high * below) / (over - below);
    const value = rising(at) - target;
    if (Math.abs(value) < 1e-13) return at;
    if (value < 0) {
      low = at;
      below = value;
      if (side === -1) over /= 2;
      side = -1;
    } else {
      high = at;
      over = value;
      if (side === 1) below /= 2;
      side = 1;
    }
  }
  return (low + high) / 2;
}

function above(law: Conditional, from: number, t: number): number {
  const probability = probabilitiesAt(law, t);
  let sum = 0;
  for (let i = probability.length - 1; i >= from; i--) sum += probability[i]!;
  return sum;
}

function mean(law: Conditional, t: number): number {
  return probabilitiesAt(law, t).reduce((sum, p, i) => sum + p * i, 0);
}

/**
 * Conditional maximum likelihood odds ratio with its exact 95 % interval.
 *
 * @param seen number found among the exposed
 * @returns odds ratios; `estimate` and `upper` are null where there is no upper bound (every found one that could be exposed is)
 *
 * Source: R. A. Fisher, J. R. Stat. Soc. 98 (1935) 39; exact limits as C. Clopper and E. Pearson, Biometrika 26 (1934) 404.
 */
export function exactOddsRatio(law: Conditional, seen: number): { estimate: number | null; lower: number; upper: number | null } {
  const at = seen - law.lowest;
  const last = law.logWeight.length - 1;
  if (last === 0) return { estimate: null, lower: 0, upper: null };
  return {
    estimate: at === 0 ? 0 : at === last ? null : Math.exp(passes((t) => mean(law, t), at)),
    lower: at === 0 ? 0 : Math.exp(passes((t) => above(law, at, t), 0.025)),
    upper: at === last ? null : Math.exp(passes((t) => above(law, at + 1, t), 0.975)),
  };
}

/**
 * Two-sided p: the chance of all outcomes no likelier than the seen one (relative
 * tolerance 1e-7), and the mid-p, which counts outcomes as likely as it half.
 *
 * Source: R. A. Fisher 1935; mid-p H. O. Lancaster, J. Am. Stat. Assoc. 56 (1961) 223.
 */
export function exactTest(law: Conditional, seen: number): { p: number; midP: number } {
  const probability = probabilitiesAt(law, 0);
  const own = probability[seen - law.lowest]!;
  let p = 0;
  let ties = 0;
  for (const value of probability) {
    if (value > own * (1 + 1e-7)) continue;
    p += value;
    if (value >= own * (1 - 1e-7)) ties += value;
  }
  return { p: Math.min(1, p), midP: Math.min(1, p) - ties / 2 };
}
