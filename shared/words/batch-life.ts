import type { BatchState } from './batch-words.ts';

/** The states of a batch in the order of its life; abandoned stands beside it. */
export const BATCH_LIFE: readonly BatchState[] = ['planned', 'making', 'in-mould', 'curing', 'cured', 'closed'];

/**
 * Whether a batch may pass from one state to another: forward along its life, also several steps at
 * once (a notebook is often typed in late), or abandoned from anywhere before closed. Never back.
 */
export function mayPass(from: BatchState, to: BatchState): boolean {
  if (from === to) return true;
  if (from === 'closed' || from === 'abandoned') return false;
  return to === 'abandoned' || BATCH_LIFE.indexOf(to) > BATCH_LIFE.indexOf(from);
}
