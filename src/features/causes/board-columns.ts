import type { CauseCell, CausesBoard, BoardInput } from '#shared/causes.ts';
import { columnWords, type BoardNames } from './cause-words.ts';
import { byGrade, isFirm } from './standing-cells.ts';

export interface BoardColumn {
  key: string;
  input: BoardInput;
  level: string | null;
  label: string;
  detail: string | null;
}

export const GROUP_WORDS: Readonly<Record<BoardInput['group'], string>> = { making: 'Making', lots: 'Lots', 'who-and-what': 'Who, with what' };

/** So many columns stand on the board until all are asked for. */
const MOST_COLUMNS = 16;
/** Always there: everybody looks for them first. */
const ALWAYS = ['methodFamily', 'waterToLye'];

/** Cells by fault and column; where an input comes after a fault there is one cell for all its levels. */
export class CellIndex {
  private readonly cells: ReadonlyMap<string, CauseCell>;

  constructor(board: CausesBoard) {
    this.cells = new Map(board.cells.map((cell) => [`${cell.fault}\n${cell.input}\n${cell.level ?? ''}`, cell]));
  }

  at(fault: string, column: BoardColumn): CauseCell | undefined {
    const own = this.cells.get(`${fault}\n${column.input.input}\n${column.level ?? ''}`);
    if (own) return own;
    const whole = this.cells.get(`${fault}\n${column.input.input}\n`);
    return whole?.grade === 'comes-after' ? whole : undefined;
  }
}

/** The board's columns in their order: those that say most, or all. */
export function boardColumns(board: CausesBoard, names: BoardNames, all: boolean): { columns: BoardColumn[]; total: number } {
  const best = new Map<string, CauseCell>();
  for (const cell of board.cells) {
    if (cell.grade === 'comes-after') continue;
    const key = `${cell.input}\n${cell.level ?? ''}`;
    const known = best.get(key);
    if (!known || byGrade(cell, known) < 0) best.set(key, cell);
  }
  const chosen = new Set([...best].sort(([, a], [, b]) => byGrade(a, b)).filter(([, cell]) => isFirm(cell)).slice(0, MOST_COLUMNS).map(([key]) => key));
  const columns = board.inputs.flatMap((input) => {
    const levels = input.kind === 'number' ? [null] : input.levels.map(({ level }) => level);
    return levels.flatMap((level): BoardColumn[] => {
      const key = `${input.input}\n${level ?? ''}`;
      const cell = best.get(key);
      if (!cell) return [];
      return [{ key, input, level, ...columnWords(input, level, cell.range, names) }];
    });
  });
  return { columns: all ? columns : columns.filter(({ key, input }) => chosen.has(key) || ALWAYS.includes(input.input)), total: columns.length };
}
