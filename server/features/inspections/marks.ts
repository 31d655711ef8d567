import type { MarkWish } from '#shared/inspections.ts';
import type { FieldProblem } from '#shared/http/problem.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { conflict } from '#server/problem.ts';

/**
 * Marks that sit on no photo of the batch.
 *
 * @param at pointer to the marks, e.g. `#/marks`
 */
export async function problemsOfMarks(tx: WorkshopTransaction, batchId: string, marks: readonly MarkWish[], at: string): Promise<FieldProblem[]> {
  if (marks.length === 0) return [];
  const photos = await tx.rows<{ id: string }>('select id from photo where batch_id = $1 and id = any($2::uuid[])', [batchId, marks.map((mark) => mark.photoId)]);
  const known = new Set(photos.map(({ id }) => id));
  const seen = new Set<string>();
  return marks.flatMap((mark, index): FieldProblem[] => {
    if (!known.has(mark.photoId)) return [{ pointer: `${at}/${index}/photoId`, detail: 'A mark must sit on a photo of the same batch' }];
    if (seen.has(mark.id)) return [{ pointer: `${at}/${index}/id`, detail: 'Each mark needs an id of its own' }];
    seen.add(mark.id);
    return [];
  });
}

/** Puts these marks in place of the finding's. @throws Problem 409 when an id belongs to another finding's mark */
export async function replaceMarks(tx: WorkshopTransaction, findingId: string, marks: readonly MarkWish[]): Promise<void> {
  await tx.rows('delete from mark where finding_id = $1', [findingId]);
  if (marks.length === 0) return;
  const rows = marks.map((mark) => ({
    ...mark, width: mark.shape === 'box' ? mark.width : null, height: mark.shape === 'box' ? mark.height : null, outline: mark.shape === 'outline' ? mark.outline : null,
  }));
  const kept = await tx.rows(
    `insert into mark (workshop_id, id, finding_id, photo_id, shape, x, y, width, height, outline)
     select $1, id, $2, "photoId", shape, x, y, width, height, outline
     from jsonb_to_recordset($3::jsonb) as r (id uuid, "photoId" uuid, shape text, x float8, y float8, width float8, height float8, outline jsonb)
     on conflict do nothing returning id`,
    [tx.workshopId, findingId, JSON.stringify(rows)],
  );
  if (kept.length < marks.length) throw conflict('A mark of another finding already has this id');
}
