import type { Moment } from './what-comes-first.ts';

/**
 * What was found of one fault on one batch: 0 checked and clear, 1–3 found with
 * that severity (the highest seen). A fault that was not checked, or not yet at
 * its stage, has no entry at all: not checked is never clear.
 */
export type Outcome = 0 | 1 | 2 | 3;

/** One batch as the analysis sees it. */
export interface BatchRow {
  /** Rows are put in the order of their ids, so the order they come in changes no digit. */
  id: string;
  /** Method code: `cold`, `cold-oven`, `hot`, `hot-fluid`, `rebatch`. */
  method: string;
  family: 'cold' | 'hot' | 'rebatch';
  /** Reason code when the batch must not count, such as `abandoned`. Rebatch is left out by itself. */
  leftOut?: string;
  /** One value each: `{ maker: 'm1', gel: 'full', mould: 'wood' }`. Absent means not recorded. */
  nominal: Readonly<Record<string, string>>;
  /** Measures in SI units: `{ oilTemperatureC: 38.5, waterToLye: 2.05 }`. Absent means not recorded. */
  numbers: Readonly<Record<string, number>>;
  /** Things a batch may hold several of: `{ fragranceLot: ['id1', 'id2'], colourant: [] }`. Absent means not recorded. */
  holds: Readonly<Record<string, readonly string[]>>;
  /** `outcomes[fault slug]`. */
  outcomes: Readonly<Record<string, Outcome>>;
}

/** One input of the board. Its slug is the key in the rows' `nominal`, `numbers` or `holds`. */
export interface InputSpec {
  /** As in the catalogue's suspects: `fragranceLot`, `waterToLye`, `maker`, `methodFamily` … */
  slug: string;
  /** `nominal` one value a batch, `number` a measure, `held` none, one or several. `method` and `methodFamily` need no entry in `nominal`. */
  kind: 'nominal' | 'number' | 'held';
  /** Lots are tested for harm only and form a family of questions of their own. */
  class: 'lot' | 'other';
  knownAt: Moment;
}

/** One suspected input of a fault, fixed beforehand; it weighs 4 against 1 when false discoveries are held down. */
export interface SuspectSpec {
  input: string;
}

export interface FaultSpec {
  slug: string;
  /** Stage code, such as `pour`, `unmould`, `cure-w4`. */
  firstSeen: string;
  suspects: readonly SuspectSpec[];
}

/** Why batches do not count in an answer, and how many. */
export interface LeftOut {
  /** `rebatch`, `no-value` (the asked number or value was not recorded), or the row's own reason. */
  reason: string;
  count: number;
}

/** An odds ratio with its 95 % interval; an end that runs off is `null` (no bound), never Infinity or NaN. */
export interface Estimate {
  estimate: number | null;
  lower: number | null;
  upper: number | null;
}

export const CELL_GRADES = [
  'settled', 'likely', 'hint', 'no-difference', 'too-few', 'not-told-apart', 'comes-after', 'no-variation',
] as const;
export type CellGrade = (typeof CELL_GRADES)[number];

/** An input, or one of its levels. */
export interface Term {
  input: string;
  level: string | null;
}

/** The answer to: does this input go with this fault? */
export interface BoardCell extends Estimate {
  fault: string;
  input: string;
  /** The level asked about against all others; null for numbers, and for inputs that come after the fault. */
  level: string | null;
  grade: CellGrade;
  /** Whether the fault is seen more or less often with this level (numbers: with higher values). */
  direction: 'more' | 'less' | 'none';
  /** Checked batches that count here, and those of them with the fault found. */
  n: number;
  events: number;
  /** Batches that would count but where the fault was not checked: outside every denominator. */
  notChecked: number;
  leftOut: readonly LeftOut[];
  /** Numbers: exposed are the batches above the median of the checked ones. */
  exposedN: number;
  exposedEvents: number;
  unexposedN: number;
  unexposedEvents: number;
  /** Unadjusted odds ratio (numbers: over `range`, unadjusted). */
  raw: Estimate;
  /** Two-sided, lots one-sided for harm; null when not tested. */
  p: number | null;
  /** False discovery rate at which this cell would be named; null when it could not enter. */
  q: number | null;
  /** `firth-profile`, `firth-wald` (end not profiled: p at or above 0.3, or more than 5,000 batches), or `none`. */
  method: 'firth-profile' | 'firth-wald' | 'none';
  /** Numbers: the odds ratio is quoted for `high` not `low`, the 90 and 10 % points of the family with most checked batches. */
  range: { low: number; high: number } | null;
  /** Numbers: odds ratio for one reference spread (standard deviation inside a method family). */
  perSpread: (Estimate & { spread: number }) | null;
  adjustedFor: readonly Term[];
  /** What could have been adjusted for but lies between this input and the fault. */
  onThePath: readonly string[];
  /** `not-told-apart`: with what. */
  tiedWith: readonly Term[];
  /** `too-few`: about how many more checked batches; null when no figure can be given. */
  moreNeeded: number | null;
  /** Raw interval excludes 1 and the adjusted one does not. */
  meltsAway: boolean;
}

export interface Board {
  generatedFrom: { batches: number; leftOut: readonly LeftOut[] };
  faults: readonly string[];
  inputs: readonly string[];
  cells: readonly BoardCell[];
  /** How many questions entered each family when false discoveries were held down. */
  questions: { lots: number; others: number };
}
