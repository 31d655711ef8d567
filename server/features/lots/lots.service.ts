import { v7 as uuidv7 } from 'uuid';
import type { ChangeLot, LotView, NewLot, SetLotStanding } from '#shared/lots.ts';
import type { LotStanding } from '#shared/words/lot-words.ts';
import type { Right } from '#shared/words/rights.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { invalidField } from '#server/problem.ts';
import { LotStandingChangeRow } from './lot-standing-change.entity.ts';
import { Lot } from './lot.entity.ts';
import { readLot } from './lots.read.ts';

/** Adds a lot of a material; the same request again gives the same lot. @throws Problem 409, 422 for an unknown material or supplier */
export async function addLot(tx: WorkshopTransaction, wish: NewLot): Promise<{ view: LotView; again: boolean }> {
  const material = await tx.row<{ kind: string }>('select kind from material where id = $1', [wish.materialId]);
  if (!material) throw invalidField('#/materialId', 'There is no such material in this workshop');
  await refuseUnknownSupplier(tx, wish.supplierId);
  refuseWrongOrder(wish);
  const quantityLeftG = wish.quantityLeftG ?? wish.quantityG;
  const again = await insertOnce(tx, Lot, 'lot of this material', { ...wish, quantityLeftG, standing: 'in-use', version: 1, updatedAt: tx.now }, wish);
  return { view: await readLot(tx, wish.id), again };
}

/** Changes what is named in `change`; the standing has its own deed. @throws Problem 404, 412, 422 */
export async function changeLot(tx: WorkshopTransaction, lotId: string, change: ChangeLot, version: number): Promise<LotView> {
  const lot = await lockForChange(tx, Lot, 'lot', lotId, version, () => readLot(tx, lotId));
  await refuseUnknownSupplier(tx, change.supplierId);
  Object.assign(lot, change);
  refuseWrongOrder(lot);
  await saveChange(tx, Lot, lot);
  return readLot(tx, lotId);
}

/** Holding a lot is every inspector's duty; giving it back is the owner's alone. */
function rightToChange(from: LotStanding, to: LotStanding): Right {
  if (to === 'on-hold') return 'lot.hold';
  const wasStopped = from === 'on-hold' || from === 'returned';
  if (wasStopped && (to === 'in-use' || to === 'hot-process-only')) return 'lot.release';
  return 'lot.write';
}

/**
 * Puts a lot into another standing and keeps who, when and why. The same standing again changes nothing.
 *
 * @param version version the caller last saw
 * @throws Problem 404 not-found, 412 stale, 403 forbidden
 */
export async function setLotStanding(tx: WorkshopTransaction, lotId: string, { standing, reason }: SetLotStanding, version: number): Promise<LotView> {
  const lot = await lockForChange(tx, Lot, 'lot', lotId, version, () => readLot(tx, lotId));
  tx.require(rightToChange(lot.standing, standing));
  if (lot.standing === standing) return readLot(tx, lotId);
  await tx.manager.insert(LotStandingChangeRow, {
    workshopId: tx.workshopId, id: uuidv7(), lotId, before: lot.standing, after: standing, reason, memberId: tx.member.id, changedAt: tx.now,
  });
  lot.standing = standing;
  await saveChange(tx, Lot, lot);
  return readLot(tx, lotId);
}

async function refuseUnknownSupplier(tx: WorkshopTransaction, supplierId: string | null | undefined): Promise<void> {
  if (supplierId && !(await tx.row('select 1 from supplier where id = $1', [supplierId]))) {
    throw invalidField('#/supplierId', 'There is no such supplier in this workshop');
  }
}

/** A lot is received before it is opened, and opened before it is finished. */
function refuseWrongOrder({ receivedOn, openedOn, finishedOn }: { receivedOn: string | null; openedOn: string | null; finishedOn: string | null }): void {
  if (receivedOn && openedOn && openedOn < receivedOn) throw invalidField('#/openedOn', `Opened on must not lie before the day it was received (${receivedOn})`);
  if (openedOn && finishedOn && finishedOn < openedOn) throw invalidField('#/finishedOn', `Finished on must not lie before the day it was opened (${openedOn})`);
}
