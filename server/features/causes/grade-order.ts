import type { BoardCell } from '#analysis/causes/board-rows.ts';
import { CAUSE_GRADES } from '#shared/causes.ts';

/** Firmest first; of the same grade what is least likely to be chance, then what rests on most batches. */
export function firmestFirst(a: BoardCell, b: BoardCell): number {
  return CAUSE_GRADES.indexOf(a.grade) - CAUSE_GRADES.indexOf(b.grade) || (a.q ?? 2) - (b.q ?? 2) || b.exposedN - a.exposedN || ((a.level ?? '') < (b.level ?? '') ? -1 : 1);
}
