import type { BatchesChoice } from '#shared/batches.ts';
import { METHODS, familyOf } from '#shared/words/methods.ts';
import { escapeLike } from '#server/db/like.ts';

/** A `where` over `batch b` joined to its `batch_outcome o`, with its parameters. */
export interface Where {
  sql: string;
  parameters: unknown[];
}

/** What the sentence filter says, as SQL; every value travels as a parameter. */
export function whereOf(filter: BatchesChoice): Where {
  const parameters: unknown[] = [];
  const conditions: string[] = [];
  const value = (given: unknown) => `$${parameters.push(given)}`;
  const when = (given: unknown, condition: () => string) => {
    if (given !== undefined && given !== '' && !(Array.isArray(given) && given.length === 0)) conditions.push(condition());
  };

  when(filter.method, () => `b.method = any(${value(filter.method)}::text[])`);
  when(filter.family, () => `b.method = any(${value(METHODS.filter((method) => familyOf(method) === filter.family))}::text[])`);
  when(filter.state, () => `b.state = any(${value(filter.state)}::text[])`);
  when(filter.maker, () => `b.maker_id = any(${value(filter.maker)}::uuid[])`);
  when(filter.formula, () => `b.formula_id = any(${value(filter.formula)}::uuid[])`);
  when(filter.lot, () => `b.id in (select i.batch_id from batch_ingredient i where i.lot_id = any(${value(filter.lot)}::uuid[]))`);
  when(filter.from, () => `b.made_on >= ${value(filter.from)}::date`);
  when(filter.to, () => `b.made_on <= ${value(filter.to)}::date`);
  when(filter.fault ?? filter.answer, () => answered(filter, value));
  when(filter.find?.trim(), () => {
    const part = `${value(`%${escapeLike((filter.find ?? '').trim())}%`)}::text`;
    return `(b.code ilike ${part} or b.note ilike ${part}
      or b.formula_id in (select f.id from formula f where f.name ilike ${part})
      or b.id in (select i.batch_id from batch_ingredient i join lot l on l.workshop_id = i.workshop_id and l.id = i.lot_id where l.code ilike ${part}))`;
  });
  return { sql: conditions.length > 0 ? conditions.join('\n    and ') : 'true', parameters };
}

/** "Where … was …": of one fault, or of anything. A fault without an answer means found. */
function answered({ fault, answer = 'found' }: BatchesChoice, value: (given: unknown) => string): string {
  if (fault === undefined) {
    return { found: 'o.worst > 0', clear: 'o.worst = 0', 'not-checked': 'o.worst < 0', answered: 'o.worst >= 0' }[answer];
  }
  const one = value([fault]);
  switch (answer) {
    case 'found':
      return `o.found @> ${one}::text[]`;
    case 'clear':
      return `o.checked @> ${one}::text[] and not o.found @> ${one}::text[]`;
    case 'not-checked':
      return `not o.checked @> ${one}::text[]`;
    case 'answered':
      return `o.checked @> ${one}::text[]`;
  }
}
