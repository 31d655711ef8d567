import type { ClaimPreview, ClaimView } from '#shared/claims.ts';
import { dayIn } from '#shared/units/zones.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { claimComparison } from './claim-comparison.read.ts';
import { claimCells, claimColumns, claimRows } from './claim-rows.read.ts';
import { Claim } from './claim.entity.ts';

/** Rows shown before anything goes out. */
const PREVIEWED = 30;

/** Views of claims, with the names of their suppliers and lots read by two statements, however many there are. */
async function claimViews(tx: WorkshopTransaction, claims: readonly Claim[]): Promise<ClaimView[]> {
  const suppliers = await tx.rows<{ id: string; name: string }>('select id, name from supplier where id = any($1::uuid[])', [claims.map(({ supplierId }) => supplierId)]);
  const lots = await tx.rows<{ id: string; code: string; materialName: string }>(
    `select l.id, l.code, m.name "materialName" from lot l join material m on m.workshop_id = l.workshop_id and m.id = l.material_id where l.id = any($1::uuid[]) order by l.code`,
    [claims.flatMap(({ lotIds }) => lotIds)],
  );
  const names = new Map(suppliers.map(({ id, name }) => [id, name]));
  return claims.map((claim) => ({
    ...claim, createdAt: claim.createdAt.toISOString(), updatedAt: claim.updatedAt.toISOString(),
    supplierName: names.get(claim.supplierId) ?? '', lots: lots.filter(({ id }) => claim.lotIds.includes(id)),
  }));
}

export async function claimView(tx: WorkshopTransaction, claim: Claim): Promise<ClaimView> {
  return (await claimViews(tx, [claim]))[0] as ClaimView;
}

/** A claim as it is kept. @throws Problem 404 */
export async function findClaim(tx: WorkshopTransaction, claimId: string): Promise<Claim> {
  const claim = await tx.manager.findOne(Claim, { where: { id: claimId } });
  if (!claim) throw notFound('claim');
  return claim;
}

export async function readClaim(tx: WorkshopTransaction, claimId: string): Promise<ClaimView> {
  return claimView(tx, await findClaim(tx, claimId));
}

/** The last two hundred claims, newest first. */
export async function listClaims(tx: WorkshopTransaction): Promise<{ items: ClaimView[] }> {
  const claims = await tx.manager.find(Claim, { order: { number: 'DESC' }, take: 200 });
  return { items: await claimViews(tx, claims) };
}

/** Today in the workshop's zone. */
export async function workshopToday(tx: WorkshopTransaction): Promise<string> {
  const workshop = await tx.row<{ time_zone: string }>('select time_zone from workshop where id = $1', [tx.workshopId]);
  return dayIn(workshop?.time_zone ?? 'UTC', tx.now);
}

/** The first rows, how many there are, and the comparison. */
export async function previewClaim(tx: WorkshopTransaction, claimId: string): Promise<ClaimPreview> {
  const claim = await findClaim(tx, claimId);
  const [columns, today] = [claimColumns(claim), await workshopToday(tx)];
  const rows: ClaimPreview['rows'] = [];
  const batches = new Set<string>();
  let rowCount = 0;
  for await (const row of claimRows(tx, claim)) {
    rowCount += 1;
    batches.add(row.batch);
    if (rows.length < PREVIEWED) rows.push(claimCells(row, claim, columns, today));
  }
  return { head: columns, rows, rowCount, batches: batches.size, comparison: await claimComparison(tx, claim) };
}
