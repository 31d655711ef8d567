import { familyOf, METHODS, type Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';
import { answerable, appliesTo } from '#server/features/faults/checklist.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { byLikelihood } from './likely.ts';

/** Looks that count, the latest first: what was likely years ago need not be so now, and the answer stays quick. */
const LATEST_LOOKS = 600;

const COUNTS = `
  with look as materialized (
    select i.id, i.batch_id from inspection i where i.stage = $1 order by i.inspected_at desc limit $2
  ), marked as materialized (
    select look.id, b.method = any($3::text[]) same_method,
      exists (select 1 from batch_ingredient g where g.workshop_id = b.workshop_id and g.batch_id = b.id and g.lot_id = any($4::uuid[])) same_lots
    from look join batch b on b.id = look.batch_id
  )
  select a.fault,
    count(*) filter (where a.answer = 'found')::int found, count(*)::int checked,
    count(*) filter (where a.answer = 'found' and m.same_method)::int "methodFound", count(*) filter (where m.same_method)::int "methodChecked",
    count(*) filter (where a.answer = 'found' and m.same_lots)::int "lotFound", count(*) filter (where m.same_lots)::int "lotChecked"
  from marked m join checklist_answer a on a.inspection_id = m.id
  where a.answer <> 'not-checked'
  group by a.fault`;

interface Row { fault: string; found: number; checked: number; methodFound: number; methodChecked: number; lotFound: number; lotChecked: number }

/**
 * The faults that can be answered at a stage, the likeliest first: by what this workshop found at that stage,
 * with the batch's fragrance lots and method weighing most. Counts are those of the whole workshop.
 *
 * @throws Problem 404 for a batch that is not there
 */
export async function listLikelyFaults(tx: WorkshopTransaction, stage: Stage, batchId?: string) {
  const batch = batchId === undefined ? undefined : await lotsAndMethod(tx, batchId);
  const methods = batch ? METHODS.filter((method) => familyOf(method) === familyOf(batch.method)) : [];
  const rows = await tx.rows<Row>(COUNTS, [stage, LATEST_LOOKS, methods, batch?.lots ?? []]);
  const counted = new Map(rows.map((row) => [row.fault, row]));
  const faults = faultCatalogue
    .filter(({ slug }) => answerable(slug, stage) !== 'cannot' && (!batch || appliesTo(slug, batch.method)))
    .map(({ slug }) => {
      const row = counted.get(slug);
      return {
        fault: slug as string,
        all: { found: row?.found ?? 0, checked: row?.checked ?? 0 },
        sameMethod: { found: row?.methodFound ?? 0, checked: row?.methodChecked ?? 0 },
        sameLots: { found: row?.lotFound ?? 0, checked: row?.lotChecked ?? 0 },
      };
    });
  return { items: byLikelihood(faults).map(({ fault, all }) => ({ fault, ...all })) };
}

/** Fragrance lots only: fats are in nearly every batch and tell nothing apart. */
async function lotsAndMethod(tx: WorkshopTransaction, batchId: string): Promise<{ method: Method; lots: string[] }> {
  const batch = await tx.row<{ method: Method; lots: string[] }>(
    `select b.method, array(select i.lot_id from batch_ingredient i join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
       where i.workshop_id = b.workshop_id and i.batch_id = b.id and i.lot_id is not null and t.kind in ('fragrance', 'colourant')) lots
     from batch b where b.id = $1`,
    [batchId],
  );
  if (!batch) throw notFound('batch');
  return batch;
}
