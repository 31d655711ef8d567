import type { EntityTarget, ObjectLiteral } from 'typeorm';
import { Account } from './features/session/account.entity.ts';
import { Supplier } from './features/suppliers/supplier.entity.ts';

/** Every entity; TypeORM takes classes, not globs. */
export const ENTITIES: EntityTarget<ObjectLiteral>[] = [Account, Supplier];
