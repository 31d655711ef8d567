import { quernbyLoft } from '#server/demo/history/quernby.ts';
import type { HistoryBatch } from '#server/demo/history/types.ts';
import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { familyOf } from '#shared/words/methods.ts';

/** The day on which the story is shown in tests; week 1 starts on Monday 2024-09-02. */
export const demoDay = '2026-08-31';
export const quernby = quernbyLoft(demoDay);
/** The 180 batches of the two years; what is on the bench today comes after them. */
export const story = quernby.batches.filter((batch) => batch.week <= 104);
export const withLot = (code: string): HistoryBatch[] => story.filter((batch) => batch.inputs.fragranceLot === code);
export const isCold = (batch: HistoryBatch): boolean => familyOf(batch.inputs.method) === 'cold';
export const isHot = (batch: HistoryBatch): boolean => familyOf(batch.inputs.method) === 'hot';

/** What the looks at a batch say of a fault: the worst answer given, or that nobody looked. */
export function answerOf(batch: HistoryBatch, fault: CatalogueSlug): 'found' | 'clear' | 'not-checked' {
  const answers = batch.inspections.flatMap((look) => look.answers.filter((a) => a.fault === fault).map((a) => a.answer));
  return answers.includes('found') ? 'found' : answers.includes('clear') ? 'clear' : 'not-checked';
}

/** `8 of 10`: found of checked. */
export function foundOf(batches: readonly HistoryBatch[], fault: CatalogueSlug): string {
  const answers = batches.map((batch) => answerOf(batch, fault)).filter((answer) => answer !== 'not-checked');
  return `${answers.filter((answer) => answer === 'found').length} of ${answers.length}`;
}
