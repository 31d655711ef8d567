import type { FAULT_FAMILIES, FAULT_KINDS } from '#shared/faults.ts';
import type { Stage } from '#shared/words/stages.ts';

export type FaultKind = (typeof FAULT_KINDS)[number];
/** Families share one outline on screen and in print. */
export type FaultFamily = (typeof FAULT_FAMILIES)[number];

/** How ordinary a fault is in a family of methods; `never` keeps it off that family's checklist. */
export type Occurrence = 'usual' | 'rare' | 'never';

/**
 * What the extent counts. `loaf-then-bars` counts the loaf until it is cut and
 * bars from then on; tested and weighed bars have only those as denominator.
 */
export const EXTENT_UNITS = ['bars', 'loaf', 'loaf-then-bars', 'tested-bars', 'weighed-bars'] as const;
export type ExtentUnit = (typeof EXTENT_UNITS)[number];

/** Everything known about a batch that people suspect; the analysis may contradict each of them. */
export const SUSPECT_INPUTS = [
  'method', 'formula', 'maker', 'season', 'mould', 'cover', 'spray', 'gel', 'trace', 'cutter',
  'additive', 'colourant', 'embeds', 'liquid',
  'fragranceLot', 'fatLot', 'alkaliLot', 'colourantLot',
  'waterToLye', 'lyeConcentration', 'superfatPct', 'fragrancePct', 'vanillinPct',
  'oilTemperatureC', 'lyeTemperatureC', 'scentTemperatureC', 'roomTemperatureC', 'humidityPct',
  'blendSeconds', 'cookMinutes', 'mouldHours', 'cutHours',
] as const;
export type SuspectInput = (typeof SUSPECT_INPUTS)[number];

export interface Suspect {
  input: SuspectInput;
  /** `up`: more of it, or having it, raises the risk. `down`: it lowers it. `either`: it depends which one. */
  direction: 'up' | 'down' | 'either';
  /** Which values people mean, when not all. */
  which?: string;
}

export interface LookAlike {
  /** Slug, when the look-alike is a fault of this catalogue. */
  fault?: string;
  name: string;
  howToTell: string;
}

export type SeverityGrade = 1 | 2 | 3;
export const USUAL_DISPOSITIONS = ['firsts', 'seconds', 'rebatch', 'embeds', 'discarded', 'hold'] as const;
export type UsualDisposition = (typeof USUAL_DISPOSITIONS)[number];

/** Keys of the caution texts; the words themselves live with the safety texts. */
export type FaultCaution = 'raw' | 'lye-heavy' | 'volcano' | 'hot-splash' | 'reaction';

export interface FaultDefinition {
  /** Stable code, on the wire, in CSV columns and in tables. */
  slug: string;
  name: string;
  otherNames: readonly string[];
  kind: FaultKind;
  /** A bad case stops being what `kind` says and becomes this. */
  worsensTo?: FaultKind;
  family: FaultFamily;
  occursIn: { cold: Occurrence; hot: Occurrence; rebatch: Occurrence };
  /** Earliest stage at which it can truly be seen; before it the answer is "not checked". */
  firstSeen: Stage;
  definition: string;
  /** Criteria as the picker shows them. A grade that does not exist for this fault is absent. */
  severity: Partial<Record<SeverityGrade, string>>;
  extentUnit: ExtentUnit;
  lookAlikes: readonly LookAlike[];
  suspects: readonly Suspect[];
  prevention: string;
  /** Where the bars usually go at each severity that exists. */
  usually: Partial<Record<SeverityGrade, UsualDisposition>>;
  mayHurt?: { caution: FaultCaution; why: string };
}
