import type { z } from 'zod';
import type { FindingView, InspectionView, MarkView } from '#shared/inspections.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { checklistOrder } from './checklist-order.ts';

type Looked = z.input<typeof InspectionView>;
type Found = z.input<typeof FindingView>;
type Dated<T> = Omit<T, 'createdAt' | 'updatedAt'> & { createdAt: Date; updatedAt: Date };
type LookRow = Dated<Omit<Looked, 'inspectedAt' | 'answers' | 'findings' | 'readings'>> & { inspectedAt: Date };
type FindingRow = Dated<Omit<Found, 'marks'>> & { marks: MarkView[] };

const LOOKS = `
  select i.id, i.version, i.created_at "createdAt", i.updated_at "updatedAt", i.batch_id "batchId", i.stage, i.inspected_at "inspectedAt",
    i.inspector_id "inspectorId", m.name "inspectorName", i.bars_looked_at "barsLookedAt", i.note, b.state "batchState", b.hold_reason "batchHoldReason"
  from inspection i
  join batch b on b.workshop_id = i.workshop_id and b.id = i.batch_id
  left join member m on m.workshop_id = i.workshop_id and m.id = i.inspector_id`;

const FINDINGS = `
  select f.id, f.version, f.created_at "createdAt", f.updated_at "updatedAt", f.inspection_id "inspectionId", f.batch_id "batchId", f.fault, f.severity, f.bars,
    f.bars_affected "barsAffected", f.bars_looked_at "barsLookedAt", f.note, f.withdrawn_at is not null "isWithdrawn", b.hold_reason "batchHoldReason",
    coalesce((select jsonb_agg(jsonb_build_object('id', k.id, 'photoId', k.photo_id, 'shape', k.shape, 'x', k.x, 'y', k.y,
        'width', k.width, 'height', k.height, 'outline', k.outline) order by k.id)
      from mark k where k.workshop_id = f.workshop_id and k.finding_id = f.id), '[]') marks
  from finding f
  join batch b on b.workshop_id = f.workshop_id and b.id = f.batch_id`;

const BY_BATCH = `${LOOKS} where i.batch_id = $1 order by i.inspected_at, i.id`;
const BY_ID = `${LOOKS} where i.id = $1`;
const FINDINGS_OF_BATCH = `${FINDINGS} where f.batch_id = $1 order by f.created_at, f.id`;
const FINDING_BY_ID = `${FINDINGS} where f.id = $1`;

const dated = <T extends { createdAt: Date; updatedAt: Date }>(row: T) => ({ ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString() });

/** One finding, taken back or not. @throws Problem 404 */
export async function readFinding(tx: WorkshopTransaction, findingId: string): Promise<Found> {
  const row = await tx.row<FindingRow>(FINDING_BY_ID, [findingId]);
  if (!row) throw notFound('finding');
  return dated(row);
}

/** One inspection with its answers in checklist order, findings (those taken back too) and readings. @throws Problem 404 */
export async function readInspection(tx: WorkshopTransaction, inspectionId: string): Promise<Looked> {
  const row = await tx.row<LookRow>(BY_ID, [inspectionId]);
  if (!row) throw notFound('inspection');
  const [view] = await withParts(tx, row.batchId, [row]);
  return view as Looked;
}

/** All inspections of a batch, oldest first. @throws Problem 404 */
export async function listInspections(tx: WorkshopTransaction, batchId: string): Promise<{ items: Looked[] }> {
  if (!(await tx.row('select 1 from batch where id = $1', [batchId]))) throw notFound('batch');
  return { items: await withParts(tx, batchId, await tx.rows<LookRow>(BY_BATCH, [batchId])) };
}

async function withParts(tx: WorkshopTransaction, batchId: string, looks: LookRow[]): Promise<Looked[]> {
  const findings = await tx.rows<FindingRow>(FINDINGS_OF_BATCH, [batchId]);
  const answers = await tx.rows<Looked['answers'][number] & { inspectionId: string }>(
    'select inspection_id "inspectionId", fault, answer from checklist_answer where batch_id = $1', [batchId],
  );
  const readings = await tx.rows<Looked['readings'][number] & { inspectionId: string }>(
    'select inspection_id "inspectionId", id, kind, value, bar from reading where batch_id = $1 and inspection_id is not null order by kind, bar, id', [batchId],
  );
  return looks.map((look) => {
    const mine = <T extends { inspectionId: string }>(rows: T[]) => rows.filter((row) => row.inspectionId === look.id);
    return {
      ...dated(look),
      inspectedAt: look.inspectedAt.toISOString(),
      answers: mine(answers).sort((a, b) => checklistOrder(a.fault) - checklistOrder(b.fault)),
      findings: mine(findings).map(dated),
      readings: mine(readings),
    };
  });
}
