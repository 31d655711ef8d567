import type { ChangeWorkshop, WorkshopView } from '#shared/workshop.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound, stale } from '#server/problem.ts';
import { Workshop } from './workshop.entity.ts';

function workshopView({ createdAt, updatedAt, ...workshop }: Workshop): WorkshopView {
  return { ...workshop, createdAt: createdAt.toISOString(), updatedAt: updatedAt.toISOString() };
}

/** The workshop of this transaction. */
export async function readWorkshop(tx: WorkshopTransaction): Promise<WorkshopView> {
  const workshop = await tx.manager.findOne(Workshop, { where: { id: tx.workshopId } });
  if (!workshop) throw notFound('workshop');
  return workshopView(workshop);
}

/** Changes the settings. @throws Problem 412 when somebody else changed them meanwhile */
export async function changeWorkshop(tx: WorkshopTransaction, change: ChangeWorkshop, version: number): Promise<WorkshopView> {
  const workshop = await tx.manager.findOne(Workshop, { where: { id: tx.workshopId }, lock: { mode: 'pessimistic_write' } });
  if (!workshop) throw notFound('workshop');
  if (workshop.version !== version) throw stale(workshopView(workshop));
  Object.assign(workshop, change, { version: workshop.version + 1, updatedAt: tx.now });
  return workshopView(await tx.manager.save(workshop));
}
