import type { BoardFault, BoardInput, CauseCell, CausesBoard } from '#shared/causes.ts';
import type { GradeCode } from '#src/components/Grade.tsx';
import { formatNumber } from '#src/lib/format.ts';

/** Names of what a board speaks of, looked up once. */
export interface BoardNames {
  fault(slug: string): BoardFault | undefined;
  input(slug: string): BoardInput | undefined;
  level(input: string, level: string): { label: string; detail: string | null } | undefined;
}

export function boardNames(board: Pick<CausesBoard, 'faults' | 'inputs'>): BoardNames {
  const faults = new Map(board.faults.map((fault) => [fault.fault, fault]));
  const inputs = new Map(board.inputs.map((input) => [input.input, input]));
  const levels = new Map(board.inputs.flatMap((input) => input.levels.map((level) => [`${input.input}\n${level.level}`, level] as const)));
  return { fault: (slug) => faults.get(slug), input: (slug) => inputs.get(slug), level: (input, level) => levels.get(`${input}\n${level}`) };
}

/** A measure as the board says it: two figures for ratios, none for hours. */
export function measureWords(value: number, unit: string): string {
  const decimals = Math.abs(value) >= 20 || unit === 's' || unit === 'h' || unit === 'min' ? 0 : 1;
  return `${formatNumber(value, decimals)}${unit ? `\u202F${unit}` : ''}`;
}

const NUMBER_NOUN: Readonly<Record<string, { more: string; less: string }>> = {
  waterToLye: { more: 'More water to lye', less: 'Less water to lye' },
  superfatPct: { more: 'More superfat', less: 'Less superfat' },
  oilTemperatureC: { more: 'Warmer oils', less: 'Cooler oils' },
  lyeTemperatureC: { more: 'Warmer lye', less: 'Cooler lye' },
  scentTemperatureC: { more: 'Scent added warmer', less: 'Scent added cooler' },
  roomTemperatureC: { more: 'A warmer room', less: 'A cooler room' },
  humidityPct: { more: 'Moister air', less: 'Drier air' },
  fragrancePct: { more: 'More scent', less: 'Less scent' },
  vanillinPct: { more: 'More vanillin', less: 'Less vanillin' },
  blendSeconds: { more: 'Longer blending', less: 'Shorter blending' },
  cookMinutes: { more: 'A longer cook', less: 'A shorter cook' },
  mouldHours: { more: 'Longer in the mould', less: 'Shorter in the mould' },
  cutHours: { more: 'A later cut', less: 'An earlier cut' },
};

/** What a cell asks about, as the subject of a sentence. */
export function subjectOf(cell: CauseCell, names: BoardNames): string {
  const input = names.input(cell.input);
  if (cell.level === null) return NUMBER_NOUN[cell.input]?.[cell.direction === 'less' ? 'less' : 'more'] ?? input?.name ?? cell.input;
  const { label, detail } = names.level(cell.input, cell.level) ?? { label: 'Something no longer known', detail: null };
  if (cell.input === 'methodFamily') return cell.level === 'hot' ? 'Hot process' : 'Cold process';
  switch (cell.input) {
    case 'maker': return `${label}’s batches`;
    case 'formula': return `The formula ${label}`;
    case 'mould': return `The mould ${label}`;
    default: return input?.group === 'lots' ? `${detail ? `${detail} ` : 'Lot '}${label}` : label;
  }
}

/** "goes with soda ash", "goes with less soda ash"; a number's subject turns instead of its verb. */
export function predicateOf(cell: CauseCell, names: BoardNames): string {
  const fault = (names.fault(cell.fault)?.name ?? cell.fault).toLowerCase();
  const goes = cell.input === 'maker' ? 'go' : 'goes';
  if (cell.direction === 'none') return `${goes} with ${fault} no more and no less`;
  return cell.level !== null && cell.direction === 'less' ? `${goes} with less ${fault}` : `${goes} with ${fault}`;
}

/** Head of a column: what is compared, over which values. */
export function columnWords(input: BoardInput, level: string | null, range: CauseCell['range'], names: BoardNames): { label: string; detail: string | null } {
  if (level === null) return { label: input.name, detail: range ? `${measureWords(range.high, '')} not ${measureWords(range.low, input.unit)}` : null };
  const found = names.level(input.input, level);
  if (!found) return { label: 'No longer known', detail: null };
  return found.detail ? { label: found.label, detail: found.detail } : found;
}

/** Found of looked at, on both sides where there are two: "8 of 10, others 6 of 104". */
export function countWords(cell: CauseCell): string {
  if (cell.level === null) return `${cell.events} of ${cell.n} batches`;
  const others = cell.input === 'methodFamily' ? (cell.level === 'hot' ? 'cold' : 'hot') : 'others';
  return `${cell.exposedEvents} of ${cell.exposedN}, ${others} ${cell.unexposedEvents} of ${cell.unexposedN}`;
}

const DIRECTION_WORDS = { more: 'more', less: 'less', none: 'no direction' } as const;
const GRADE_IN_NAME: Record<GradeCode, string> = {
  settled: 'settled', likely: 'likely', hint: 'hint', 'too-few': 'too few', 'no-difference': 'no difference seen', 'not-told-apart': 'cannot be told apart',
  'comes-after': 'comes after', 'no-variation': 'always the same', 'shown-by-trial': 'shown by trial',
};

/** A cell read out: "Soda ash, water to lye, 2.3 not 1.7: settled, more; 29 of 117 found". */
export function cellName(cell: CauseCell, head: { label: string; detail: string | null }, names: BoardNames): string {
  const what = `${names.fault(cell.fault)?.name ?? cell.fault}, ${head.label}${head.detail ? `, ${head.detail}` : ''}`;
  if (cell.grade === 'comes-after') return `${what}: comes after the fault can be seen`;
  const points = ['settled', 'likely', 'hint', 'too-few'].includes(cell.grade) ? `, ${DIRECTION_WORDS[cell.direction]}` : '';
  return `${what}: ${GRADE_IN_NAME[cell.grade]}${points}; ${countWords(cell)} found`;
}

/** Why batches are left out, in words. */
export const LEFT_OUT_WORDS: Readonly<Record<string, string>> = {
  rebatch: 'rebatched from other batches', abandoned: 'given up', 'not-made-yet': 'not made yet', 'no-value': 'without this written down',
};
