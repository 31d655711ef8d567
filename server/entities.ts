import type { EntityTarget, ObjectLiteral } from 'typeorm';
import { Batch } from './features/batches/batch.entity.ts';
import { BatchIngredient, CookStageRow } from './features/batches/ingredient.entity.ts';
import { MouldRecord } from './features/batches/mould.entity.ts';
import { Formula, FormulaLine, FormulaVersion } from './features/formulas/formula.entity.ts';
import { Import } from './features/imports/import.entity.ts';
import { LotStandingChangeRow } from './features/lots/lot-standing-change.entity.ts';
import { Claim } from './features/claims/claim.entity.ts';
import { Finding } from './features/inspections/finding.entity.ts';
import { Inspection } from './features/inspections/inspection.entity.ts';
import { Lot } from './features/lots/lot.entity.ts';
import { Material } from './features/materials/material.entity.ts';
import { Member } from './features/members/member.entity.ts';
import { Photo } from './features/photos/photo.entity.ts';
import { Account } from './features/session/account.entity.ts';
import { Supplier } from './features/suppliers/supplier.entity.ts';
import { Workshop } from './features/workshop/workshop.entity.ts';

/** Every entity; TypeORM takes classes, not globs. */
export const ENTITIES: EntityTarget<ObjectLiteral>[] = [
  Account,
  Batch,
  BatchIngredient,
  Claim,
  CookStageRow,
  Finding,
  Formula,
  FormulaLine,
  FormulaVersion,
  Import,
  Inspection,
  Lot,
  LotStandingChangeRow,
  Material,
  MouldRecord,
  Member,
  Photo,
  Supplier,
  Workshop,
];
