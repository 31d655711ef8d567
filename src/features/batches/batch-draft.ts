import { v7 as uuidv7 } from 'uuid';
import type { z } from 'zod';
import { NewBatch, type BatchView, type ChangeBatch } from '#shared/batches.ts';
import type { BatchState } from '#shared/words/batch-words.ts';

/** What the form holds: every field of a batch, SI inside. */
export type BatchDraft = z.output<typeof NewBatch>;
type DraftField = keyof Omit<BatchDraft, 'id' | 'code'>;

/** Fields of one making: a duplicate starts without them, since they are of this pour alone. */
const OF_ONE_MAKING = { pouredAt: null, unmouldedOn: null, cutOn: null, note: null } as const satisfies Partial<BatchDraft>;

export function emptyDraft(id: string, madeOn: string): BatchDraft {
  return NewBatch.parse({ id, madeOn, method: 'cold' });
}

/** A batch as the form holds it. */
export function draftOf(batch: BatchView): BatchDraft {
  const blank = emptyDraft(uuidv7(), batch.madeOn);
  const values = Object.fromEntries(Object.keys(NewBatch.shape).map((field) => [field, batch[field as keyof BatchView] ?? blank[field as keyof BatchDraft] ?? null]));
  return {
    ...(values as BatchDraft),
    ingredients: batch.ingredients.map(({ id, materialId, lotId, massG, shareOfOilsFraction }) => ({ id, materialId, lotId, massG, shareOfOilsFraction })),
    cookStages: batch.cookStages.map(({ stage, minutesFromStart }) => ({ stage: stage as BatchDraft['cookStages'][number]['stage'], minutesFromStart })),
  };
}

/** The next batch made the same way: all inputs, a new id, today, no code and no outcome. */
export function duplicateOf(batch: BatchView, id: string, madeOn: string): BatchDraft {
  const { code: _code, ...draft } = draftOf(batch);
  return { ...draft, ...OF_ONE_MAKING, id, madeOn, state: 'planned' satisfies BatchState, ingredients: draft.ingredients.map((line) => ({ ...line, id: uuidv7() })) };
}

/** What a person changed: each field of `now` that differs from `before`. */
export function changeBetween(before: BatchDraft, now: BatchDraft): ChangeBatch {
  const fields = (Object.keys(now) as (keyof BatchDraft)[]).filter((field): field is DraftField => field !== 'id' && field !== 'code');
  return Object.fromEntries(fields.filter((field) => JSON.stringify(before[field]) !== JSON.stringify(now[field])).map((field) => [field, now[field]])) as ChangeBatch;
}

export interface Meeting {
  /** Fields that only the other one changed; they go into the form as they are. */
  theirs: ChangeBatch;
  /** Fields that both changed: the form keeps mine, and says so. */
  both: DraftField[];
}

/** Two people changed the same batch from the same start: what can be taken over, and what must be chosen. */
export function meet(start: BatchDraft, mine: BatchDraft, current: BatchDraft): Meeting {
  const [my, their] = [changeBetween(start, mine), changeBetween(start, current)];
  const both = (Object.keys(their) as DraftField[]).filter((field) => field in my && JSON.stringify(mine[field]) !== JSON.stringify(current[field]));
  const theirs = Object.fromEntries(Object.entries(their).filter(([field]) => !(field in my))) as ChangeBatch;
  return { theirs, both };
}
