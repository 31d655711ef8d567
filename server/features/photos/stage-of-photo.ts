import { daysBetween } from '#shared/units/days.ts';
import { stageOrder, type Stage } from '#shared/words/stages.ts';
import { type PlanFor, inspectionPlan } from '#server/features/inspections/plan.ts';

/** A photo this far from every look of the plan belongs to none of them, days. */
const FAR_DAYS = 5;

/**
 * The stage that a photo most likely shows, by the day it was taken: that of the planned look nearest to it,
 * the later one where two are as near. Undefined before the pour and far from every look.
 *
 * @param takenOn YYYY-MM-DD on the clock of the camera
 */
export function proposedStage(batch: PlanFor, takenOn: string): Stage | undefined {
  if (takenOn < batch.madeOn) return undefined;
  const looks = inspectionPlan(batch)
    .map(({ stage, dueOn }) => ({ stage, away: Math.abs(daysBetween(dueOn, takenOn)) }))
    .filter(({ away }) => away <= FAR_DAYS)
    // An empty mould or a cut says more of the day than the week of a cure; release is proposed only when nothing else fits.
    .sort((a, b) => a.away - b.away || rank(b.stage) - rank(a.stage));
  return looks[0]?.stage;
}

function rank(stage: Stage): number {
  return stage === 'release' ? -1 : stageOrder(stage);
}
