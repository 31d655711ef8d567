import { addDays } from '#shared/units/days.ts';
import { type Method, familyOf } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';

export interface PlanFor {
  method: Method;
  /** Day of the pour, YYYY-MM-DD. */
  madeOn: string;
  unmouldedOn?: string | undefined;
  cutOn?: string | undefined;
  /** Formula rich in linoleic oil: spots come late, so hot batches are looked at in week 6 too. */
  linoleicRich: boolean;
  /** Cure of the formula in weeks, when it is longer than the method's shortest. */
  cureWeeks?: number | undefined;
}

export interface PlannedInspection {
  stage: Stage;
  /** Week of the cure, for cure stages. */
  week?: number;
  dueOn: string;
  /** First and last day on which the look counts as on time. */
  from: string;
  to: string;
  /** Late from the day after this one; a missed look stays missed and is never taken off the plan. */
  overdueAfter: string;
  /** The mould is not emptied, or the loaf not cut, yet: the day is what the method usually takes. */
  expected: boolean;
}

const graceDays = 5;
const windowDays = 2;

/** Usual days from pour to empty mould and to the cut. */
const usualDays = { cold: { unmould: 1, cut: 2 }, hot: { unmould: 1, cut: 1 }, rebatch: { unmould: 1, cut: 1 } } as const;

/** Nothing is sold earlier than this after the pour. */
const earliestRelease = { cold: 28, hot: 7, rebatch: 7 } as const;

/**
 * The looks a batch needs and when: pour, unmould and cut on their day, cure checks
 * in weeks 1, 2, 4 and 6 (two days either way), and one before anything is sold.
 * Pure: what is done already is for the caller to strike out.
 */
export function inspectionPlan(batch: PlanFor): PlannedInspection[] {
  const family = familyOf(batch.method);
  const onDay = (stage: Stage, day: string, expected: boolean): PlannedInspection =>
    ({ stage, dueOn: day, from: day, to: day, overdueAfter: addDays(day, graceDays), expected });

  const cut = batch.cutOn ?? addDays(batch.madeOn, usualDays[family].cut);
  const unmould = batch.unmouldedOn ?? batch.cutOn ?? addDays(batch.madeOn, usualDays[family].unmould);
  const weeks = family === 'cold' || batch.linoleicRich ? cureWeeks : cureWeeks.slice(0, 3);
  const cure = weeks.map(({ stage, week }): PlannedInspection => {
    const dueOn = addDays(batch.madeOn, week * 7);
    const to = addDays(dueOn, windowDays);
    return { stage, week, dueOn, from: addDays(dueOn, -windowDays), to, overdueAfter: addDays(dueOn, graceDays), expected: false };
  });

  const mayBeSold = addDays(batch.madeOn, Math.max(earliestRelease[family], (batch.cureWeeks ?? 0) * 7));
  const lastCheck = cure.at(-1)?.dueOn ?? mayBeSold;
  const release = mayBeSold > lastCheck ? mayBeSold : lastCheck;
  return [
    onDay('pour', batch.madeOn, false),
    onDay('unmould', unmould, batch.unmouldedOn === undefined && batch.cutOn === undefined),
    onDay('cut', cut, batch.cutOn === undefined),
    ...cure,
    { stage: 'release', dueOn: release, from: mayBeSold, to: release, overdueAfter: addDays(release, graceDays), expected: false },
  ];
}

const cureWeeks: readonly { stage: Stage; week: number }[] = [
  { stage: 'cure-w1', week: 1 }, { stage: 'cure-w2', week: 2 }, { stage: 'cure-w4', week: 4 }, { stage: 'cure-w6', week: 6 },
];
