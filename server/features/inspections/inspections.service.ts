import type { ChangeInspection, NewInspection, ReadingWish } from '#shared/inspections.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { conflict, invalid, invalidField } from '#server/problem.ts';
import { type BatchUnderLook, holdForSafety, lockBatch, lockedLook, moveBatchOn, refuseWrongMoment } from './batch-under-look.ts';
import { problemsOfAnswers, wholeChecklist } from './checklist-answers.ts';
import { storeAnswers } from './answers.ts';
import { completeFinding, problemsOfFinding } from './finding-rules.ts';
import { insertFinding } from './findings.service.ts';
import { Inspection } from './inspection.entity.ts';
import { readInspection } from './inspections.read.ts';
import { problemsOfMarks } from './marks.ts';

type View = Awaited<ReturnType<typeof readInspection>>;

/**
 * Records a look at a batch with all it brought: every fault of the stage's checklist gets an answer,
 * those that nobody answered `not-checked`. The same request again gives the same inspection.
 *
 * @throws Problem 404, 409 for a planned batch or an id in use, 422 with every field that is wrong
 */
export async function recordInspection(tx: WorkshopTransaction, batchId: string, wish: NewInspection): Promise<{ view: View; again: boolean }> {
  const batch = await lockBatch(tx, batchId);
  const again = await insertOnce(
    tx, Inspection, 'inspection',
    { id: wish.id, batchId, stage: wish.stage, inspectedAt: new Date(wish.inspectedAt), inspectorId: tx.member.id, barsLookedAt: wish.barsLookedAt, note: wish.note, version: 1, updatedAt: tx.now },
    { batchId, ...wish },
  );
  if (again) return { view: await readInspection(tx, wish.id), again };
  await refuseWrongMoment(tx, batch, new Date(wish.inspectedAt));
  await refuseWrongLook(tx, batch, wish);

  const found = new Set(wish.findings.map((finding) => finding.fault));
  await storeAnswers(tx, { inspectionId: wish.id, batchId }, wholeChecklist(wish.answers, wish.stage, batch.method, found));
  for (const finding of wish.findings) await insertFinding(tx, { id: wish.id, batchId, barsLookedAt: wish.barsLookedAt }, finding);
  await storeReadings(tx, { inspectionId: wish.id, batchId, readAt: wish.inspectedAt }, wish.readings);
  await moveBatchOn(tx, batch, wish.stage, new Date(wish.inspectedAt));
  await holdForSafety(tx, batch);
  return { view: await readInspection(tx, wish.id), again };
}

/** All problems of answers, findings and marks together, each at its field. */
async function refuseWrongLook(tx: WorkshopTransaction, batch: BatchUnderLook, wish: NewInspection): Promise<void> {
  const look = { stage: wish.stage, method: batch.method, bars: batch.bars, barsLookedAt: wish.barsLookedAt };
  const found = new Set(wish.findings.map((finding) => finding.fault));
  const problems = problemsOfAnswers(wish.answers, wish.stage, batch.method, found);
  if (batch.bars !== null && (wish.barsLookedAt ?? 0) > batch.bars) problems.push(tooManyBars(batch.bars));
  const seen = new Set<string>();
  for (const [index, finding] of wish.findings.entries()) {
    const at = `#/findings/${index}`;
    problems.push(...problemsOfFinding(completeFinding(finding, look), look, at));
    problems.push(...(await problemsOfMarks(tx, batch.id, finding.marks, `${at}/marks`)));
    if (seen.has(finding.fault)) problems.push({ pointer: `${at}/fault`, detail: 'Each fault has one finding at an inspection' });
    seen.add(finding.fault);
  }
  for (const [index, { bar }] of wish.readings.entries()) {
    if (bar !== null && batch.bars !== null && bar > batch.bars) problems.push({ pointer: `#/readings/${index}/bar`, detail: `The batch has bars 1 to ${batch.bars}` });
  }
  if (problems.length > 0) throw invalid(problems);
}

const tooManyBars = (bars: number) => ({ pointer: '#/barsLookedAt', detail: `Bars looked at must be at most ${bars}, the bars of the batch` });

async function storeReadings(tx: WorkshopTransaction, look: { inspectionId: string; batchId: string; readAt: string }, readings: readonly ReadingWish[]): Promise<void> {
  if (readings.length === 0) return;
  const kept = await tx.rows(
    `insert into reading (workshop_id, id, batch_id, inspection_id, kind, value, bar, read_at)
     select $1, id, $2, $3, kind, value, bar, $4 from jsonb_to_recordset($5::jsonb) as r (id uuid, kind text, value float8, bar int)
     on conflict do nothing returning id`,
    [tx.workshopId, look.batchId, look.inspectionId, look.readAt, JSON.stringify(readings)],
  );
  if (kept.length < readings.length) throw conflict('Another reading already has one of these ids');
}

/**
 * Answers more of the checklist, or mends when, how many bars, and the note. Faults not named keep their answer.
 *
 * @param version version the caller last saw
 * @throws Problem 404, 412 stale, 422 for an answer that this stage cannot give
 */
export async function changeInspection(tx: WorkshopTransaction, inspectionId: string, change: ChangeInspection, version: number): Promise<View> {
  const { batch } = await lockedLook(tx, inspectionId);
  const inspection = await lockForChange(tx, Inspection, 'inspection', inspectionId, version, () => readInspection(tx, inspectionId));
  const { answers = [], inspectedAt, ...fields } = change;
  if (inspectedAt !== undefined) {
    await refuseWrongMoment(tx, batch, new Date(inspectedAt));
    inspection.inspectedAt = new Date(inspectedAt);
  }
  if (batch.bars !== null && (fields.barsLookedAt ?? 0) > batch.bars) throw invalidField(tooManyBars(batch.bars).pointer, tooManyBars(batch.bars).detail);
  const live = await tx.rows<{ fault: string }>('select fault from finding where inspection_id = $1 and withdrawn_at is null', [inspectionId]);
  const found = new Set(live.map(({ fault }) => fault));
  const problems = problemsOfAnswers(answers, inspection.stage, batch.method, found);
  if (problems.length > 0) throw invalid(problems);

  Object.assign(inspection, fields);
  const onTheList = new Set(wholeChecklist([], inspection.stage, batch.method, found).map(({ fault }) => fault as string));
  await storeAnswers(tx, { inspectionId, batchId: batch.id }, answers.filter(({ fault }) => onTheList.has(fault)));
  await saveChange(tx, Inspection, inspection);
  return readInspection(tx, inspectionId);
}
