import { batchesNeeded } from '#analysis/tables/sample-size.ts';
import type { CellGrade } from './board-rows.ts';
import type { LogOdds } from './fit-cell.ts';

/** What a grade rests on. */
export interface Evidence {
  q: number;
  p: number;
  isNumber: boolean;
  /** Lots are never praised: fewer faults with a lot is no grade of its own. */
  harmOnly: boolean;
  /** Adjusted log odds: of the level, or of a number over the middle range. */
  overRange: LogOdds;
  /** Numbers: per reference spread. Levels: the same as `overRange`. */
  perSpread: LogOdds;
  exposedN: number;
  exposedEvents: number;
  events: number;
  /** Asked only where it matters: both cost refits. */
  survivesAnyBatch: () => boolean;
  noStratumPointsBack: () => boolean;
}

const SETTLED_Q = 0.05;
const LIKELY_Q = 0.1;
const HINT_Q = 0.2;
const HINT_P = 0.05;
const LOG_2 = Math.log(2);
const LOG_1_5 = Math.log(1.5);

function excludesNone({ lower, upper }: LogOdds): boolean {
  return (lower !== null && lower > 0) || (upper !== null && upper < 0);
}

/**
 * The evidence grade of one cell (our rule): how sure, never how bad.
 *
 * Settled: q ≤ 0.05 and all five checks (size, interval, any one batch, counts, strata).
 * Likely: q ≤ 0.10 and at most one check short. Hint: q ≤ 0.20 or p ≤ 0.05, with an odds
 * ratio of 1.5 or more or its inverse. No difference: the interval lies inside (½, 2),
 * numbers inside (1/1.5, 1.5) per spread. All else: too few.
 */
export function gradeOf(evidence: Evidence): Extract<CellGrade, 'settled' | 'likely' | 'hint' | 'no-difference' | 'too-few'> {
  const { q, p, isNumber, overRange, perSpread } = evidence;
  const more = overRange.estimate > 0;
  const praisesALot = evidence.harmOnly && !more;
  if (!praisesALot && q <= LIKELY_Q) {
    const checks = [
      () => (isNumber ? Math.abs(perSpread.estimate) >= LOG_1_5 : Math.abs(overRange.estimate) >= LOG_2),
      () => excludesNone(overRange),
      () => (isNumber ? evidence.events >= 5 : evidence.exposedN >= 5 && (!more || evidence.exposedEvents >= 3)),
      evidence.survivesAnyBatch,
      evidence.noStratumPointsBack,
    ];
    let short = 0;
    for (const holds of checks) {
      if (!holds()) short++;
      if (short > 1) break;
    }
    if (short === 0 && q <= SETTLED_Q) return 'settled';
    if (short <= 1) return 'likely';
  }
  if (!praisesALot && (q <= HINT_Q || p <= HINT_P) && Math.abs(overRange.estimate) >= LOG_1_5) return 'hint';
  const bound = isNumber ? LOG_1_5 : LOG_2;
  if (perSpread.lower !== null && perSpread.upper !== null && perSpread.lower > -bound && perSpread.upper < bound) return 'no-difference';
  return 'too-few';
}

/**
 * About how many more checked batches it would take to see the fault twice as
 * often as at the base rate: 80 % power, two-sided 0.05, exposed share as seen.
 *
 * @returns null when no figure can be given: one group absent, nothing checked, or there are enough already
 */
export function moreNeeded(exposedN: number, unexposedN: number, unexposedEvents: number, events: number): number | null {
  const n = exposedN + unexposedN;
  if (exposedN === 0 || unexposedN === 0) return null;
  const base = unexposedEvents > 0 && unexposedEvents < unexposedN ? unexposedEvents / unexposedN : (events + 0.5) / (n + 1);
  const twice = Math.min(2 * base, 0.99);
  if (twice <= base) return null;
  const missing = Math.ceil(batchesNeeded(base, twice, 0.8, exposedN / n) - n);
  return missing > 0 ? missing : null;
}
