import { daysBetween } from '#shared/units/days.ts';
import type { BatchState } from '#shared/words/batch-words.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';
import type { BatchTimes } from './times.ts';
import type { HistoryInspection } from './types.ts';

/** Bars are counted and sold within days of their release. */
const daysToClose = 4;
const curedAfterDays = { cold: 42, hot: 28, rebatch: 28 } as const;

/** How far a batch has come by a day. */
export function stateOf(batch: { times: BatchTimes; madeOn: string; today: string; inspections: readonly HistoryInspection[]; method: Method }): BatchState {
  const { times, today } = batch;
  if (times.cutOn >= today) return 'in-mould';
  const release = batch.inspections.find((look) => look.stage === 'release');
  if (release && daysBetween(release.at.slice(0, 10), today) > daysToClose) return 'closed';
  const isOld = daysBetween(batch.madeOn, today) >= curedAfterDays[familyOf(batch.method)];
  return release || isOld ? 'cured' : 'curing';
}
