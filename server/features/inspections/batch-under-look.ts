import type { BatchState } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';
import { STAGE_IN_WORDS, type Stage } from '#shared/words/stages.ts';
import { dayIn } from '#shared/units/zones.ts';
import { catalogueFault } from '#server/features/faults/catalogue.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { conflict, invalidField, notFound } from '#server/problem.ts';
import { isCatalogueSlug } from './checklist-answers.ts';
import { isOfSafety } from './finding-rules.ts';

/** What a look needs to know of its batch. */
export interface BatchUnderLook {
  id: string;
  method: Method;
  state: BatchState;
  bars: number | null;
  madeOn: string;
  unmouldedOn: string | null;
  cutOn: string | null;
  holdReason: string | null;
}

/** The look that a finding belongs to. */
export interface LookedAt {
  id: string;
  batchId: string;
  stage: Stage;
  barsLookedAt: number | null;
}

/** A phone's clock may run this far ahead. */
const CLOCK_SLACK_MS = 24 * 3_600_000;

/**
 * The batch of a look, locked until the commit: rules that span its findings, bars and photos hold.
 *
 * @throws Problem 404
 */
export async function lockBatch(tx: WorkshopTransaction, batchId: string): Promise<BatchUnderLook> {
  const batch = await tx.row<BatchUnderLook>(
    `select id, method, state, bars, made_on::text "madeOn", unmoulded_on::text "unmouldedOn", cut_on::text "cutOn", hold_reason "holdReason"
     from batch where id = $1 for update`,
    [batchId],
  );
  if (!batch) throw notFound('batch');
  return batch;
}

/** The look and its batch, the batch locked until the commit. @throws Problem 404 */
export async function lockedLook(tx: WorkshopTransaction, inspectionId: string): Promise<{ look: LookedAt; batch: BatchUnderLook }> {
  const look = await tx.row<LookedAt>('select id, batch_id "batchId", stage, bars_looked_at "barsLookedAt" from inspection where id = $1', [inspectionId]);
  if (!look) throw notFound('inspection');
  return { look, batch: await lockBatch(tx, look.batchId) };
}

export async function timeZoneOf(tx: WorkshopTransaction): Promise<string> {
  const workshop = await tx.row<{ zone: string }>('select time_zone zone from workshop where id = $1', [tx.workshopId]);
  if (!workshop) throw notFound('workshop');
  return workshop.zone;
}

/** @throws Problem 409 for a batch not poured yet, 422 for a moment before the pour or still to come */
export async function refuseWrongMoment(tx: WorkshopTransaction, batch: BatchUnderLook, inspectedAt: Date): Promise<void> {
  if (batch.state === 'planned') throw conflict('This batch is only planned; there is nothing to look at before the pour');
  if (inspectedAt.getTime() > tx.now.getTime() + CLOCK_SLACK_MS) throw invalidField('#/inspectedAt', 'The inspection lies in the future; say when somebody looked');
  if (dayIn(await timeZoneOf(tx), inspectedAt) < batch.madeOn) throw invalidField('#/inspectedAt', `The inspection lies before the batch was made (${batch.madeOn})`);
}

/**
 * What a look at unmoulding or the cut says about the batch: the mould was empty, or the loaf was cut, by that
 * day, so the batch cures. Days that somebody entered stay as they are.
 */
export async function moveBatchOn(tx: WorkshopTransaction, batch: BatchUnderLook, stage: Stage, inspectedAt: Date): Promise<void> {
  if (stage !== 'unmould' && stage !== 'cut') return;
  const day = dayIn(await timeZoneOf(tx), inspectedAt);
  const { unmouldedOn, cutOn } = batch;
  if (stage === 'unmould') batch.unmouldedOn ??= cutOn !== null && cutOn < day ? cutOn : day;
  else batch.cutOn ??= unmouldedOn !== null && unmouldedOn > day ? unmouldedOn : day;
  const state = batch.state === 'making' || batch.state === 'in-mould' ? 'curing' : batch.state;
  if (state === batch.state && batch.unmouldedOn === unmouldedOn && batch.cutOn === cutOn) return;
  batch.state = state;
  await tx.rows('update batch set unmoulded_on = $2, cut_on = $3, state = $4, version = version + 1, updated_at = $5 where id = $1', [
    batch.id, batch.unmouldedOn, batch.cutOn, state, tx.now,
  ]);
}

interface SafetyFinding {
  fault: string;
  severity: number;
  stage: Stage;
}

/** Why a batch is held, in the words the batch shows. */
export function holdReasonOf({ fault, stage }: { fault: string; stage: Stage }): string {
  const name = isCatalogueSlug(fault) ? catalogueFault(fault).name : fault;
  return stage === 'in-use' ? `${name} reported by a customer` : `${name} found at ${STAGE_IN_WORDS[stage]}`;
}

/**
 * Holds the batch while a safety finding stands. A reason that a person wrote is never replaced; one of ours
 * goes when the last finding behind it was taken back.
 */
export async function holdForSafety(tx: WorkshopTransaction, batch: BatchUnderLook): Promise<void> {
  const live = await tx.rows<SafetyFinding & { isLive: boolean }>(
    `select f.fault, f.severity, i.stage, f.withdrawn_at is null "isLive"
     from finding f join inspection i on i.workshop_id = f.workshop_id and i.id = f.inspection_id
     where f.batch_id = $1 order by i.inspected_at, f.created_at, f.id`,
    [batch.id],
  );
  const standing = live.filter((finding) => finding.isLive && isOfSafety(finding.fault, finding.severity)).map(holdReasonOf);
  const ours = new Set(live.map(holdReasonOf));
  const isOurs = batch.holdReason === null || ours.has(batch.holdReason);
  if (!isOurs || (batch.holdReason !== null && standing.includes(batch.holdReason))) return;
  const reason = standing[0] ?? null;
  if (reason === batch.holdReason) return;
  batch.holdReason = reason;
  await tx.rows('update batch set hold_reason = $2, version = version + 1, updated_at = $3 where id = $1', [batch.id, reason, tx.now]);
}
