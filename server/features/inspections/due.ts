import { addDays, daysBetween } from '#shared/units/days.ts';
import type { BatchState } from '#shared/words/batch-words.ts';
import { stageOrder, type Stage } from '#shared/words/stages.ts';
import { type PlanFor, type PlannedInspection, inspectionPlan } from './plan.ts';

/** How far ahead a coming look is told, days; the next one of a batch is always told. */
const AHEAD_DAYS = 7;

export interface BatchToLookAt extends PlanFor {
  state: BatchState;
  /** Stages that somebody looked at already. */
  looked: readonly Stage[];
}

export interface DueLook {
  stage: Stage;
  dueOn: string;
  daysLate: number;
  standing: 'coming' | 'due' | 'late' | 'overdue';
}

/**
 * The looks a batch wants on a day: those whose time has come, those of the coming week, and the next one.
 * A look that was missed is no longer asked for once a later one was made, or once the week of the next
 * cure check has begun: nobody can see week 1 in week 4. It stays missed in the records.
 *
 * @param today YYYY-MM-DD in the workshop's zone
 */
export function dueLooks(batch: BatchToLookAt, today: string): DueLook[] {
  if (batch.state === 'planned' || batch.state === 'closed' || batch.state === 'abandoned') return [];
  const latest = Math.max(-1, ...batch.looked.filter((stage) => stage !== 'in-use').map(stageOrder));
  const plan = inspectionPlan(batch);
  const open = plan.filter((look) => stageOrder(look.stage) > latest && !isPast(look, plan, today));
  const asked = open.map((look): DueLook => ({ stage: look.stage, dueOn: look.dueOn, daysLate: Math.max(0, daysBetween(look.to, today)), standing: standingOf(look, today) }));
  const next = asked.find(({ standing }) => standing === 'coming');
  return asked.filter((look) => look.standing !== 'coming' || look === next || look.dueOn <= addDays(today, AHEAD_DAYS));
}

function isPast(look: PlannedInspection, plan: readonly PlannedInspection[], today: string): boolean {
  return look.week !== undefined && plan.some((other) => other.week !== undefined && other.week > (look.week ?? 0) && other.from <= today);
}

function standingOf(look: PlannedInspection, today: string): DueLook['standing'] {
  if (today < look.from) return 'coming';
  if (today <= look.to) return 'due';
  return today <= look.overdueAfter ? 'late' : 'overdue';
}
