import type { ImportReport } from '#shared/imports.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { HistoryRow } from './read-row.ts';

/** What the workshop already has, by the name a sheet would use; names meet whatever their case. */
export interface KnownThings {
  batchCodes: Set<string>;
  lots: Map<string, { id: string; materialId: string }>;
  formulas: Map<string, string>;
  people: Map<string, string>;
  moulds: Map<string, string>;
  colourants: Map<string, string>;
}

export type Creatable = keyof ImportReport['creates'];

interface Named {
  id: string;
  name: string;
}

const byName = (rows: Named[]) => new Map(rows.map(({ id, name }) => [name.toLowerCase(), id]));

/** Reads all that rows may refer to, with one statement a kind. */
export async function knownThings(tx: WorkshopTransaction): Promise<KnownThings> {
  const batches = await tx.rows<{ code: string }>('select code from batch');
  const lots = await tx.rows<{ id: string; code: string; materialId: string }>(
    `select l.id, l.code, l.material_id "materialId" from lot l join material m on m.workshop_id = l.workshop_id and m.id = l.material_id
     where m.kind = 'fragrance' order by l.received_on nulls first, l.id`,
  );
  return {
    batchCodes: new Set(batches.map(({ code }) => code)),
    lots: new Map(lots.map(({ id, code, materialId }) => [code.toLowerCase(), { id, materialId }])),
    formulas: byName(await tx.rows<Named>('select id, name from formula')),
    people: byName(await tx.rows<Named>('select id, name from member order by ended_at nulls last')),
    moulds: byName(await tx.rows<Named>('select id, name from mould')),
    colourants: byName(await tx.rows<Named>(`select id, name from material where kind = 'colourant'`)),
  };
}

/** A maker is found by the whole name, or by the first name where only one member has it. */
export function findPerson(people: ReadonlyMap<string, string>, name: string): string | undefined {
  const wanted = name.toLowerCase();
  const whole = people.get(wanted);
  if (whole !== undefined) return whole;
  const byFirstName = [...people].filter(([full]) => full.split(/\s+/)[0] === wanted);
  return byFirstName.length === 1 ? byFirstName[0]?.[1] : undefined;
}

/** Names of a row that the workshop does not have yet, by kind. */
export function missingOf(row: HistoryRow, known: KnownThings): { kind: Creatable; name: string }[] {
  const missing: { kind: Creatable; name: string }[] = [];
  for (const code of row.fragranceLots) if (!known.lots.has(code.toLowerCase())) missing.push({ kind: 'lots', name: code });
  if (row.formulaName && !known.formulas.has(row.formulaName.toLowerCase())) missing.push({ kind: 'formulas', name: row.formulaName });
  if (row.makerName && findPerson(known.people, row.makerName) === undefined) missing.push({ kind: 'people', name: row.makerName });
  if (row.mouldName && !known.moulds.has(row.mouldName.toLowerCase())) missing.push({ kind: 'moulds', name: row.mouldName });
  for (const name of row.colourants) if (!known.colourants.has(name.toLowerCase())) missing.push({ kind: 'colourants', name });
  return missing;
}

const IN_WORDS: Record<Creatable, string> = { lots: 'lot', formulas: 'formula', people: 'member', moulds: 'mould', colourants: 'colourant' };

/** Why a thing that may not be made stands in the way. */
export function notKnown(kind: Creatable, name: string): string {
  return `There is no ${IN_WORDS[kind]} “${name.slice(0, 60)}” in this workshop; let the import add it, or write it as the workshop does`;
}

/** The field each kind's names stand in. */
export const COLUMN_OF: Record<Creatable, string> = { lots: 'fragrance_lots', formulas: 'formula', people: 'maker', moulds: 'mould', colourants: 'colourants' };
