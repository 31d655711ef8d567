import { createHash } from 'node:crypto';
import type { EntityTarget, ObjectLiteral } from 'typeorm';
import { conflict, idReused, notFound, stale } from '../problem.ts';
import type { WorkshopTransaction } from './workshop-transaction.ts';

/** Columns that every versioned record has. */
export interface VersionedRecord extends ObjectLiteral {
  workshopId: string;
  id: string;
  version: number;
  updatedAt: Date;
}

/** SHA-256 over the body with its keys in order, so that the same wish gives the same print. */
export function fingerprint(body: unknown): string {
  return createHash('sha256').update(JSON.stringify(ordered(body))).digest('hex');
}

function ordered(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(ordered);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)).map(([key, inner]) => [key, ordered(inner)]));
}

/**
 * Inserts a record under the id its client made; the same request again changes nothing.
 *
 * @param body the whole request, by which a repeat is told from another wish with the same id
 * @returns true when this was a repeat
 * @throws Problem 409 when the id holds something else, or another record already has the same name or code
 */
export async function insertOnce<E extends VersionedRecord>(
  tx: WorkshopTransaction,
  entity: EntityTarget<E>,
  what: string,
  values: Partial<E> & { id: string },
  body: unknown,
): Promise<boolean> {
  const print = fingerprint(body);
  const row = { ...values, workshopId: tx.workshopId, createdFrom: print };
  const inserted = await tx.manager.createQueryBuilder().insert().into(entity).values(row as never).orIgnore().returning('id').execute();
  if ((inserted.raw as unknown[]).length > 0) return false;
  const existing = (await tx.manager.findOne(entity, { where: { id: values.id } as never })) as (E & { createdFrom?: string | null }) | null;
  if (!existing) throw conflict(`Another ${what} already has this name or code`);
  if (existing.createdFrom !== print) throw idReused(what);
  return true;
}

/**
 * Loads a record under a row lock for a change by somebody who saw `version`.
 *
 * @throws Problem 404 when there is none, 412 with the current view when it has moved on
 */
export async function lockForChange<E extends VersionedRecord>(
  tx: WorkshopTransaction,
  entity: EntityTarget<E>,
  what: string,
  id: string,
  version: number,
  currentView: (record: E) => Promise<unknown> | unknown,
): Promise<E> {
  const record = await tx.manager.findOne(entity, { where: { id } as never, lock: { mode: 'pessimistic_write' } });
  if (!record) throw notFound(what);
  if (record.version !== version) throw stale(await currentView(record));
  return record;
}

/** Writes a changed record with its version moved on. */
export async function saveChange<E extends VersionedRecord>(tx: WorkshopTransaction, entity: EntityTarget<E>, record: E): Promise<E> {
  record.version += 1;
  record.updatedAt = tx.now;
  return tx.manager.save(entity, record as never) as unknown as Promise<E>;
}
