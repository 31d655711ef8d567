import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import { type CatalogueSlug, catalogueFault } from '#server/features/faults/catalogue.ts';
import { type Stage, stageOrder } from '#shared/words/stages.ts';
import type { Random } from '../random.ts';
import { findingNote } from './notes.ts';
import type { HistoryFinding, TrueFault } from './types.ts';

/** A true fault as it looks at a stage: not yet there, milder at first, or gone again. */
export function showsAt(truth: readonly TrueFault[], fault: CatalogueSlug, stage: Stage): TrueFault | null {
  const found = truth.find((f) => f.fault === fault);
  if (!found || stageOrder(stage) < stageOrder(found.from)) return null;
  return found.until && stageOrder(stage) > stageOrder(found.until) ? null : { ...found, severity: severityAt(found, stage), bars: barsAt(found, stage) };
}

/** All that a picture of the batch at a stage must show. */
export function allShowingAt(truth: readonly TrueFault[], stage: Stage): TrueFault[] {
  return truth.flatMap((f) => showsAt(truth, f.fault, stage) ?? []);
}

/** Growing faults start a grade milder, when that grade exists for them. */
function severityAt(fault: TrueFault, stage: Stage): SeverityGrade {
  const milder = fault.severity - 1;
  const isYoung = fault.grows && stageOrder(stage) <= stageOrder(fault.from);
  if (!isYoung || milder < 1) return fault.severity;
  const grades = catalogueFault(fault.fault).severity;
  return milder === 1 ? (grades[1] ? 1 : fault.severity) : (grades[2] ? 2 : fault.severity);
}

function barsAt(fault: TrueFault, stage: Stage): number[] {
  const isYoung = fault.grows && stageOrder(stage) <= stageOrder(fault.from);
  return isYoung ? fault.bars.slice(0, Math.max(1, Math.ceil(fault.bars.length / 2))) : fault.bars;
}

/** A look in a hurry takes the bars that show it before any others, up to those looked at. */
export function findingOf(stage: Stage, r: Random, shows: TrueFault, barsLookedAt: number | null): HistoryFinding {
  const note = findingNote(r, shows.fault, stage);
  return { fault: shows.fault, severity: shows.severity, bars: barsLookedAt === null ? null : shows.bars.slice(0, barsLookedAt), ...(note ? { note } : {}) };
}
