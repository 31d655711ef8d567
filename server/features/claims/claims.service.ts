import type { ChangeClaim, ClaimView, NewClaim } from '#shared/claims.ts';
import type { FieldProblem } from '#shared/http/problem.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';
import { invalid } from '#server/problem.ts';
import { Claim } from './claim.entity.ts';
import { claimView, readClaim } from './claims.read.ts';

/** Claims are numbered by workshop; two drafted at once wait for one another. */
async function nextNumber(tx: WorkshopTransaction): Promise<number> {
  await tx.rows('select id from workshop where id = $1 for update', [tx.workshopId]);
  const row = await tx.row<{ number: number }>('select coalesce(max(number), 0)::int + 1 number from claim');
  return row?.number ?? 1;
}

/** Drafts a claim; the same request again gives the same draft. @throws Problem 409, 422 */
export async function draftClaim(tx: WorkshopTransaction, wish: NewClaim): Promise<{ view: ClaimView; again: boolean }> {
  await refuseWrongChoice(tx, wish);
  const number = await nextNumber(tx);
  const again = await insertOnce(tx, Claim, 'claim', { ...wish, number, state: 'draft', version: 1, updatedAt: tx.now }, wish);
  return { view: await readClaim(tx, wish.id), again };
}

/** Changes what a draft asks and what stays at home. @throws Problem 404, 412, 422 */
export async function changeClaim(tx: WorkshopTransaction, claimId: string, change: ChangeClaim, version: number): Promise<ClaimView> {
  const claim = await lockForChange(tx, Claim, 'claim', claimId, version, (current) => claimView(tx, current));
  Object.assign(claim, change);
  await refuseWrongChoice(tx, claim);
  return claimView(tx, await saveChange(tx, Claim, claim));
}

async function refuseWrongChoice(tx: WorkshopTransaction, { supplierId, lotIds, faults, from, to }: Pick<Claim, 'supplierId' | 'lotIds' | 'faults' | 'from' | 'to'>): Promise<void> {
  const errors: FieldProblem[] = [];
  if (!(await tx.row('select 1 from supplier where id = $1', [supplierId]))) errors.push({ pointer: '#/supplierId', detail: 'There is no such supplier in this workshop' });
  const theirs = new Set((await tx.rows<{ id: string }>('select id from lot where id = any($1::uuid[]) and supplier_id = $2', [lotIds, supplierId])).map(({ id }) => id));
  lotIds.forEach((lotId, index) => {
    if (!theirs.has(lotId)) errors.push({ pointer: `#/lotIds/${index}`, detail: 'This lot did not come from this supplier' });
  });
  const known = new Set<string>(faultCatalogue.map(({ slug }) => slug));
  faults.forEach((fault, index) => {
    if (!known.has(fault)) errors.push({ pointer: `#/faults/${index}`, detail: `There is no fault ${fault} in the catalogue` });
  });
  if (from && to && from > to) errors.push({ pointer: '#/to', detail: `To must not lie before from (${from})` });
  if (errors.length > 0) throw invalid(errors);
}
