import { CAUSE_GRADES, type CauseCell } from '#shared/causes.ts';

/** So many sentences a person reads before the board. */
const MOST = 8;

const FIRM: readonly CauseCell['grade'][] = ['settled', 'likely', 'hint'];

export function isFirm(cell: CauseCell): boolean {
  return FIRM.includes(cell.grade);
}

/** Firmest first; of one grade what is least likely to be chance. */
export function byGrade(a: CauseCell, b: CauseCell): number {
  return CAUSE_GRADES.indexOf(a.grade) - CAUSE_GRADES.indexOf(b.grade) || (a.q ?? 2) - (b.q ?? 2) || b.events - a.events;
}

/**
 * The cells that become sentences. A maker never heads a sentence while a condition explains the fault,
 * and the same thing is not said twice: hot process and its methods, a thing and the lot it came from.
 */
export function standingCells(cells: readonly CauseCell[], most = MOST): CauseCell[] {
  const firm = cells.filter(isFirm).sort(byGrade);
  const chosen: CauseCell[] = [];
  for (const cell of firm) {
    const same = firm.filter((other) => other.fault === cell.fault && other !== cell);
    if (cell.input === 'maker' && same.some((other) => other.input !== 'maker')) continue;
    if (cell.input === 'method' && same.some((other) => other.input === 'methodFamily')) continue;
    if (cell.grade === 'hint' && cell.direction === 'less') continue;
    chosen.push(cell);
    if (chosen.length === most) break;
  }
  return chosen;
}
