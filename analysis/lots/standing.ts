import { wilsonInterval } from '#analysis/intervals/wilson-interval.ts';
import type { LotFault } from './behaviour.ts';

export type SuggestedStanding = 'hot-process-only' | 'on-hold';

/** The fault that speaks for a standing, and what the hot batches say about it. */
export interface StandingReason {
  fault: string;
  coldN: number;
  coldEvents: number;
  hotN: number;
  hotEvents: number;
  /** Upper 95 % bound of the rate in hot batches; null when none was checked. */
  hotUpper: number | null;
}

/** So many hot batches must have been checked, all clear, before "hot process only" is suggested (our rule). */
const HOT_CHECKED = 5;

function reason({ fault, cold, hot }: LotFault): StandingReason {
  return {
    fault, coldN: cold.n, coldEvents: cold.events, hotN: hot.n, hotEvents: hot.events,
    hotUpper: hot.n === 0 ? null : wilsonInterval(hot.events, hot.n).upper,
  };
}

/**
 * The standing a lot's behaviour speaks for; the people decide.
 *
 * On hold when a fault misbehaves in the cold and in the hot family. Hot process only when
 * some misbehave in cold and each of those was found in none of at least 5 hot batches.
 */
export function suggestStanding(faults: readonly LotFault[]): { suggestedStanding: SuggestedStanding | null; because: StandingReason[] } {
  const cold = faults.filter((answer) => answer.cold.verdict === 'misbehaves');
  const both = cold.filter((answer) => answer.hot.verdict === 'misbehaves');
  if (both.length > 0) return { suggestedStanding: 'on-hold', because: both.map(reason) };
  if (cold.length > 0 && cold.every(({ hot }) => hot.n >= HOT_CHECKED && hot.events === 0)) return { suggestedStanding: 'hot-process-only', because: cold.map(reason) };
  return { suggestedStanding: null, because: cold.map(reason) };
}
