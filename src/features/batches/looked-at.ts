import type { BatchRow } from '#shared/batches.ts';
import type { FaultView } from '#shared/faults.ts';
import { DISPOSITIONS, type BatchState } from '#shared/words/batch-words.ts';
import type { Stage } from '#shared/words/stages.ts';
import type { Piece } from '#src/components/Strip.tsx';

/** Stages that a batch has behind it, by its state; the looks of the cure are spread over its weeks. */
export const STAGES_DONE: Record<BatchState, readonly Stage[]> = {
  planned: [],
  making: [],
  'in-mould': ['pour'],
  curing: ['pour', 'unmould', 'cut'],
  cured: ['pour', 'unmould', 'cut', 'cure-w1', 'cure-w2', 'cure-w4', 'cure-w6'],
  closed: ['pour', 'unmould', 'cut', 'cure-w1', 'cure-w2', 'cure-w4', 'cure-w6', 'release'],
  abandoned: ['pour'],
};

export interface LookedAt {
  pieces: Piece[];
  label: string;
}

/**
 * One piece per fault that was answered or had to be by now: found with its severity, clear, or not looked
 * at. A gap is a gap: never drawn as clear.
 */
export function lookedAt({ found, clear, state, family }: Pick<BatchRow, 'found' | 'clear' | 'state' | 'family'>, catalogue: readonly FaultView[]): LookedAt {
  const answered = new Set([...found.map(({ fault }) => fault), ...clear]);
  const done = STAGES_DONE[state];
  const missing = catalogue.filter((fault) =>
    !answered.has(fault.slug) && fault.methodFamilies.includes(family) && fault.checklist.some(({ stage, answer }) => answer === 'must' && done.includes(stage)));
  const kindOf = new Map(catalogue.map(({ slug, kind }) => [slug, kind]));
  return {
    pieces: [
      ...found.map(({ fault, severity }): Piece => (kindOf.get(fault) === 'safety' ? { kind: 'safety' } : { kind: 'found', severity })),
      ...clear.map((): Piece => ({ kind: 'clear' })),
      ...missing.map((): Piece => ({ kind: 'not-checked' })),
    ],
    label: `${found.length} found, ${clear.length} clear, ${missing.length} not looked at`,
  };
}

/** One piece per bar by where it went; those not yet gone are on the rack. */
export function barsOf({ bars, dispositions }: Pick<BatchRow, 'bars' | 'dispositions'>): LookedAt {
  const gone = DISPOSITIONS.map((kind) => ({ kind, bars: dispositions.filter((part) => part.kind === kind).reduce((sum, part) => sum + part.bars, 0) })).filter((part) => part.bars > 0);
  const left = Math.max(0, (bars ?? 0) - gone.reduce((sum, part) => sum + part.bars, 0));
  return {
    pieces: [...gone.flatMap(({ kind, bars: count }) => Array.from({ length: count }, (): Piece => ({ kind }))), ...Array.from({ length: left }, (): Piece => ({ kind: 'rack' }))],
    label: [...gone.map((part) => `${part.bars} ${part.kind}`), ...(left > 0 ? [`${left} on the rack`] : [])].join(', ') || 'bars not counted yet',
  };
}
