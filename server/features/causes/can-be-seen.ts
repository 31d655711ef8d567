import { addDays } from '#shared/units/days.ts';
import type { BatchFacts } from './batch-facts.ts';

/** Days after the pour on which a stage is first reached, at the earliest. */
const REACHED_AFTER: Readonly<Record<string, number>> = { pour: 0, unmould: 1, cut: 2, 'cure-w1': 5, 'cure-w2': 12, 'cure-w4': 26, 'cure-w6': 40, release: 28, 'in-use': 28 };
const REACHED_AFTER_HOT: Readonly<Record<string, number>> = { ...REACHED_AFTER, cut: 1, release: 7, 'in-use': 7 };

/** Whether a batch is old enough on a day for a fault that shows at a stage; before that it is "not yet", later "not looked at". */
export function canBeSeenBy(today: string, { madeOn, method }: Pick<BatchFacts, 'madeOn' | 'method'>, firstSeen: string): boolean {
  const days = (method === 'hot' || method === 'hot-fluid' ? REACHED_AFTER_HOT : REACHED_AFTER)[firstSeen] ?? 0;
  return today >= addDays(madeOn, days);
}
