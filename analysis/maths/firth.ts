import { factorise, inverseDiagonal, solveWith } from './cholesky.ts';

/** Batches as weighted groups: group i stands for `weight[i]` batches, `found[i]` of them with the fault. */
export interface Design {
  groups: number;
  /** Number of terms; term 0 is by custom the intercept. */
  terms: number;
  /** `x[i * terms + j]`. */
  x: Float64Array;
  weight: Float64Array;
  found: Float64Array;
  /** Known part of the log odds of each group. */
  offset: Float64Array;
}

export interface FirthFit {
  beta: Float64Array;
  /** Penalised log-likelihood, with the binomial constant left out. */
  penalisedLogLikelihood: number;
  /** Cholesky factor of the information at `beta` (terms × terms). */
  factor: Float64Array;
  converged: boolean;
  iterations: number;
}

export interface FirthOptions {
  /** Where to start; zeros when absent. */
  start?: Float64Array;
  /** Hold this term at the value it has in `start`. */
  fixed?: number;
  maxIterations?: number;
  /** Largest step at which it has arrived; 1e-8 when absent. */
  tolerance?: number;
}

const TOLERANCE = 1e-8;
const MAX_STEP = 5;

/** Work space of one fit, so that a Newton step makes no garbage. */
interface Bench {
  information: Float64Array;
  score: Float64Array;
  expected: Float64Array;
  working: Float64Array;
  row: Float64Array;
}

/** Penalised log-likelihood at beta; leaves the factored information in `bench`. Null when the information is singular. */
function evaluate(design: Design, beta: Float64Array, bench: Bench): number | null {
  const { groups, terms: p, x, weight, found, offset } = design;
  const { information, expected, working } = bench;
  information.fill(0);
  let logLikelihood = 0;
  for (let i = 0, at = 0; i < groups; i++, at += p) {
    let eta = offset[i]!;
    for (let j = 0; j < p; j++) eta += x[at + j]! * beta[j]!;
    // log(1 + e^eta) without overflow at either end.
    const small = Math.exp(-Math.abs(eta));
    const probability = eta >= 0 ? 1 / (1 + small) : small / (1 + small);
    logLikelihood += found[i]! * eta - weight[i]! * (Math.max(eta, 0) + Math.log1p(small));
    const w = weight[i]! * probability * (1 - probability);
    expected[i] = probability;
    working[i] = w;
    for (let j = 0; j < p; j++) {
      const wx = w * x[at + j]!;
      if (wx === 0) continue;
      for (let k = 0; k <= j; k++) information[j * p + k]! += wx * x[at + k]!;
    }
  }
  const logDeterminant = factorise(information, p);
  return logDeterminant === null ? null : logLikelihood + logDeterminant / 2;
}

/** Firth's modified score, with the hat values taken from the factor. */
function modifiedScore(design: Design, bench: Bench): void {
  const { groups, terms: p, x, weight, found } = design;
  const { information: factor, score, expected, working, row } = bench;
  score.fill(0);
  for (let i = 0, at = 0; i < groups; i++, at += p) {
    let leverage = 0;
    for (let j = 0; j < p; j++) {
      let value = x[at + j]!;
      for (let k = 0; k < j; k++) value -= factor[j * p + k]! * row[k]!;
      value /= factor[j * p + j]!;
      row[j] = value;
      leverage += value * value;
    }
    const residual = found[i]! - weight[i]! * expected[i]! + working[i]! * leverage * (0.5 - expected[i]!);
    for (let j = 0; j < p; j++) score[j]! += residual * x[at + j]!;
  }
}

/** Newton step for the free terms; a fixed term keeps its place, its row and column leave the information. */
function newtonStep(design: Design, bench: Bench, fixed: number | undefined): Float64Array | null {
  const p = design.terms;
  const step = new Float64Array(bench.score);
  if (fixed === undefined) {
    solveWith(bench.information, p, step);
    return step;
  }
  // With U the inverse information, the free block's inverse times the score is
  // U s corrected so that the fixed term does not move.
  const unit = new Float64Array(p);
  unit[fixed] = 1;
  solveWith(bench.information, p, unit);
  step[fixed] = 0;
  solveWith(bench.information, p, step);
  const ratio = step[fixed]! / unit[fixed]!;
  for (let j = 0; j < p; j++) step[j]! -= ratio * unit[j]!;
  step[fixed] = 0;
  return step;
}

/**
 * Logistic regression with Firth's penalty: finite even where a level has all or none of the fault.
 *
 * Maximises log-likelihood + ½ log|information| by Newton steps with halving
 * (largest step 5, tolerance 1e-8, 100 iterations). A fit that does not get
 * there says so in `converged`.
 *
 * With a fixed term the penalty is still that of the whole design, as profile
 * intervals and the penalised likelihood ratio test need it.
 *
 * @returns null when the columns repeat one another, so that no single answer exists
 *
 * Source: D. Firth, Biometrika 80 (1993) 27; G. Heinze and M. Schemper, Stat. Med. 21 (2002) 2409. Cost: O(groups · terms²) a step.
 */
export function firthFit(design: Design, options: FirthOptions = {}): FirthFit | null {
  const { terms: p, groups } = design;
  const { fixed, maxIterations = 100, tolerance = TOLERANCE } = options;
  const bench: Bench = {
    information: new Float64Array(p * p), score: new Float64Array(p),
    expected: new Float64Array(groups), working: new Float64Array(groups), row: new Float64Array(p),
  };
  let beta: Float64Array = options.start ? Float64Array.from(options.start) : new Float64Array(p);
  let value = evaluate(design, beta, bench);
  if (value === null && options.start && fixed === undefined) {
    beta = new Float64Array(p);
    value = evaluate(design, beta, bench);
  }
  if (value === null) return null;
  let converged = false;
  let iterations = 0;
  while (iterations < maxIterations && !converged) {
    iterations++;
    modifiedScore(design, bench);
    const step = newtonStep(design, bench, fixed);
    if (step === null) return null;
    let largest = 0;
    for (const part of step) largest = Math.max(largest, Math.abs(part));
    if (largest > MAX_STEP) for (let j = 0; j < p; j++) step[j]! *= MAX_STEP / largest;
    const moved = climb(design, bench, beta, step, value);
    if (moved === null) {
      // No halving climbs any further: at the top as far as the digits go.
      value = evaluate(design, beta, bench)!;
      converged = largest < 1e-4;
      break;
    }
    beta = moved.beta;
    value = moved.value;
    converged = largest < tolerance;
  }
  return { beta, penalisedLogLikelihood: value, factor: bench.information, converged, iterations };
}

function climb(design: Design, bench: Bench, from: Float64Array, step: Float64Array, value: number): { beta: Float64Array; value: number } | null {
  let share = 1;
  for (let halving = 0; halving < 12; halving++, share /= 2) {
    const beta = from.map((b, j) => b + share * step[j]!);
    const next = evaluate(design, beta, bench);
    if (next !== null && next >= value - 1e-10) return { beta, value: next };
  }
  return null;
}

/** Standard error of a term from the penalised fit's information. */
export function standardError(fit: FirthFit, term: number): number {
  return Math.sqrt(inverseDiagonal(fit.factor, fit.beta.length, term));
}
