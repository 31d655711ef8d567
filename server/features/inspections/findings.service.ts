import type { ChangeFinding, MarkWish, NewFinding } from '#shared/inspections.ts';
import type { FieldProblem } from '#shared/http/problem.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { catalogueFault } from '#server/features/faults/catalogue.ts';
import { conflict, invalid, notFound } from '#server/problem.ts';
import { storeAnswers } from './answers.ts';
import { type BatchUnderLook, type LookedAt, holdForSafety, lockedLook } from './batch-under-look.ts';
import { isCatalogueSlug } from './checklist-answers.ts';
import { type FindingFacts, completeFinding, problemsOfFinding } from './finding-rules.ts';
import { Finding } from './finding.entity.ts';
import { readFinding } from './inspections.read.ts';
import { problemsOfMarks, replaceMarks } from './marks.ts';

type View = Awaited<ReturnType<typeof readFinding>>;

/** Writes a finding that has passed all rules, with its marks. */
export async function insertFinding(tx: WorkshopTransaction, look: Pick<LookedAt, 'id' | 'batchId' | 'barsLookedAt'>, wish: NewFinding): Promise<boolean> {
  const { marks, ...fields } = completeFinding(wish, look);
  const again = await insertOnce(tx, Finding, 'finding', { ...fields, inspectionId: look.id, batchId: look.batchId, withdrawnAt: null, version: 1, updatedAt: tx.now }, { inspectionId: look.id, ...wish });
  if (!again) await replaceMarks(tx, wish.id, marks);
  return again;
}

/**
 * Keeps a finding: the fault's answer becomes `found`, and a finding of safety holds the batch.
 * The same request again gives the same finding.
 *
 * @throws Problem 404, 409 when the fault has a finding at this inspection already, 422
 */
export async function keepFinding(tx: WorkshopTransaction, inspectionId: string, wish: NewFinding): Promise<{ view: View; again: boolean }> {
  const { look, batch } = await lockedLook(tx, inspectionId);
  // A repeat gets its answer whatever has changed since; only a new finding is judged.
  if (!(await tx.row('select 1 from finding where id = $1', [wish.id]))) {
    await refuseSecond(tx, inspectionId, wish.fault, wish.id);
    await refuseWrong(tx, batch, look, completeFinding(wish, look), wish.marks);
  }
  const again = await insertFinding(tx, look, wish);
  if (!again) {
    await storeAnswers(tx, { inspectionId, batchId: batch.id }, [{ fault: wish.fault, answer: 'found' }]);
    await holdForSafety(tx, batch);
  }
  return { view: await readFinding(tx, wish.id), again };
}

/**
 * Changes what is named; marks are replaced whole when they are.
 *
 * @param version version the caller last saw
 * @throws Problem 404, 412 stale, 409 for one that was taken back, 422
 */
export async function changeFinding(tx: WorkshopTransaction, findingId: string, change: ChangeFinding, version: number): Promise<View> {
  const { look, batch } = await lookOfFinding(tx, findingId);
  const finding = await lockForChange(tx, Finding, 'finding', findingId, version, () => readFinding(tx, findingId));
  if (finding.withdrawnAt) throw conflict('This finding was taken back; keep it again before changing it');
  const { marks, ...fields } = change;
  // Other bars without a word on their number: the number follows them.
  const countFollows = fields.bars !== undefined && fields.barsAffected === undefined;
  Object.assign(finding, completeFinding({ ...finding, ...fields, ...(countFollows ? { barsAffected: null } : {}) }, look));
  await refuseWrong(tx, batch, look, finding, marks ?? []);
  if (marks) await replaceMarks(tx, findingId, marks);
  await saveChange(tx, Finding, finding);
  await holdForSafety(tx, batch);
  return readFinding(tx, findingId);
}

/**
 * Takes a finding back, so that its fault is not checked any more, or keeps it again.
 *
 * @throws Problem 404, 412 stale, 409 when the fault has another finding by now
 */
export async function withdrawFinding(tx: WorkshopTransaction, findingId: string, isWithdrawn: boolean, version: number): Promise<View> {
  const { look, batch } = await lookOfFinding(tx, findingId);
  const finding = await lockForChange(tx, Finding, 'finding', findingId, version, () => readFinding(tx, findingId));
  if ((finding.withdrawnAt !== null) === isWithdrawn) return readFinding(tx, findingId);
  if (!isWithdrawn) {
    await refuseSecond(tx, look.id, finding.fault, findingId);
    await refuseWrong(tx, batch, look, finding, []);
  }
  finding.withdrawnAt = isWithdrawn ? tx.now : null;
  await saveChange(tx, Finding, finding);
  await storeAnswers(tx, { inspectionId: look.id, batchId: batch.id }, [{ fault: finding.fault, answer: isWithdrawn ? 'not-checked' : 'found' }]);
  await holdForSafety(tx, batch);
  return readFinding(tx, findingId);
}

async function lookOfFinding(tx: WorkshopTransaction, findingId: string) {
  const finding = await tx.row<{ inspectionId: string }>('select inspection_id "inspectionId" from finding where id = $1', [findingId]);
  if (!finding) throw notFound('finding');
  return lockedLook(tx, finding.inspectionId);
}

/** The batch is locked, so the second of two at once sees the first one's finding. */
async function refuseSecond(tx: WorkshopTransaction, inspectionId: string, fault: string, ownId: string): Promise<void> {
  const other = await tx.row('select 1 from finding where inspection_id = $1 and fault = $2 and id <> $3 and withdrawn_at is null', [inspectionId, fault, ownId]);
  if (other) throw conflict(`${isCatalogueSlug(fault) ? catalogueFault(fault).name : fault} is already kept at this inspection; change that finding instead`);
}

async function refuseWrong(tx: WorkshopTransaction, batch: BatchUnderLook, look: LookedAt, finding: FindingFacts, marks: readonly MarkWish[]): Promise<void> {
  const problems: FieldProblem[] = problemsOfFinding(finding, { stage: look.stage, method: batch.method, bars: batch.bars, barsLookedAt: look.barsLookedAt }, '#');
  problems.push(...(await problemsOfMarks(tx, batch.id, marks, '#/marks')));
  if (problems.length > 0) throw invalid(problems);
}
