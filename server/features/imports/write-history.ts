import { v7 as uuidv7 } from 'uuid';
import type { ImportReport } from '#shared/imports.ts';
import { addDays } from '#shared/units/days.ts';
import { stageOrder, type Stage } from '#shared/words/stages.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { catalogueFault, type CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { findPerson, type KnownThings } from './known-things.ts';
import type { HistoryRow } from './read-row.ts';

/** Rows written with one statement each. */
const CHUNK = 500;
/** Days from the pour to each stage, for looks whose own date a history does not tell. */
const STAGE_DAYS: Record<Stage, number> = { pour: 0, unmould: 1, cut: 2, 'cure-w1': 7, 'cure-w2': 14, 'cure-w4': 28, 'cure-w6': 42, release: 42, 'in-use': 60 };
/** An imported batch older than this is taken as closed. */
const CLOSED_AFTER_DAYS = 70;
const LOOK_NOTE = 'From the batch history';

/** Adds what the dry run said it would, so that every name of a row is known. */
async function makeMissing(tx: WorkshopTransaction, creates: ImportReport['creates'], known: KnownThings): Promise<void> {
  const scent = creates.lots.length > 0 ? await importedScent(tx) : '';
  for (const code of creates.lots) {
    const id = uuidv7();
    await tx.rows(`insert into lot (workshop_id, id, material_id, code, standing, note) values ($1, $2, $3, $4, 'in-use', $5)`, [tx.workshopId, id, scent, code, LOOK_NOTE]);
    known.lots.set(code.toLowerCase(), { id, materialId: scent });
  }
  const make = async (names: string[], into: Map<string, string>, statement: string) => {
    for (const name of names) {
      const id = uuidv7();
      await tx.rows(statement, [tx.workshopId, id, name]);
      into.set(name.toLowerCase(), id);
    }
  };
  await make(creates.formulas, known.formulas, 'insert into formula (workshop_id, id, name) values ($1, $2, $3)');
  await make(creates.people, known.people, `insert into member (workshop_id, id, name, role) values ($1, $2, $3, 'maker')`);
  await make(creates.moulds, known.moulds, 'insert into mould (workshop_id, id, name) values ($1, $2, $3)');
  await make(creates.colourants, known.colourants, `insert into material (workshop_id, id, kind, name) values ($1, $2, 'colourant', $3)`);
}

/** The material of lots that a history names by code only. */
async function importedScent(tx: WorkshopTransaction): Promise<string> {
  const name = 'Fragrance from history';
  const there = await tx.row<{ id: string }>(`select id from material where kind = 'fragrance' and name = $1`, [name]);
  if (there) return there.id;
  const id = uuidv7();
  await tx.rows(`insert into material (workshop_id, id, kind, name, note) values ($1, $2, 'fragrance', $3, $4)`, [tx.workshopId, id, name, 'Lots that came with an imported batch history; give each its own material when you know it']);
  return id;
}

interface Lines {
  batches: unknown[];
  ingredients: unknown[];
  inspections: unknown[];
  answers: unknown[];
  findings: unknown[];
}

/** The database's rows of one batch of the history. */
function addLines(lines: Lines, row: HistoryRow, known: KnownThings, now: Date, importedBy: string): void {
  const batchId = uuidv7();
  const { answers, code, madeOn, formulaName, makerName, mouldName, fragranceLots, colourants, ...measures } = row;
  const today = now.toISOString().slice(0, 10);
  lines.batches.push({
    id: batchId, code, madeOn, ...measures, importedBy,
    formulaId: formulaName ? known.formulas.get(formulaName.toLowerCase()) : null,
    makerId: makerName ? findPerson(known.people, makerName) : null,
    mouldId: mouldName ? known.moulds.get(mouldName.toLowerCase()) : null,
    state: addDays(madeOn, CLOSED_AFTER_DAYS) < today ? 'closed' : 'curing',
  });
  // Several lots in one cell share a load whose split the sheet does not tell.
  const share = fragranceLots.length === 1 ? row.fragranceFraction : null;
  const lots = [...new Set(fragranceLots.map((lotCode) => lotCode.toLowerCase()))].map((lotCode) => known.lots.get(lotCode));
  lots.forEach((lot, position) => lines.ingredients.push({ id: uuidv7(), batchId, materialId: lot?.materialId, lotId: lot?.id, share, position }));
  const dyes = [...new Set(colourants.map((name) => name.toLowerCase()))];
  dyes.forEach((name, index) => lines.ingredients.push({ id: uuidv7(), batchId, materialId: known.colourants.get(name), lotId: null, share: null, position: lots.length + index }));

  const looks = new Map<Stage, [string, number][]>();
  for (const [fault, severity] of answers) {
    const stage = catalogueFault(fault as CatalogueSlug).firstSeen;
    looks.set(stage, [...(looks.get(stage) ?? []), [fault, severity]]);
  }
  for (const [stage, faults] of [...looks].sort(([a], [b]) => stageOrder(a) - stageOrder(b))) {
    const inspectionId = uuidv7();
    const lookedOn = addDays(madeOn, STAGE_DAYS[stage]);
    const inspectedAt = lookedOn <= today ? `${lookedOn}T12:00:00Z` : now.toISOString();
    lines.inspections.push({ id: inspectionId, batchId, stage, inspectedAt, note: LOOK_NOTE });
    for (const [fault, severity] of faults) {
      lines.answers.push({ id: uuidv7(), inspectionId, batchId, fault, answer: severity > 0 ? 'found' : 'clear' });
      if (severity > 0) lines.findings.push({ id: uuidv7(), inspectionId, batchId, fault, severity, note: LOOK_NOTE });
    }
  }
}

const INSERT_BATCHES = `
  insert into batch (workshop_id, id, code, made_on, method, state, formula_id, maker_id, mould_id, bars, water_to_lye, superfat_fraction, oil_temperature_c, lye_temperature_c, room_temperature_c, humidity_fraction, blend_seconds, gel, cut_hours, fragrance_fraction, note, imported_by)
  select $1, id, code, "madeOn", method, state, "formulaId", "makerId", "mouldId", bars, "waterToLye", "superfatFraction", "oilTemperatureC", "lyeTemperatureC", "roomTemperatureC", "humidityFraction", "blendSeconds", gel, "cutHours", "fragranceFraction", note, "importedBy"
  from jsonb_to_recordset($2::jsonb) as r (id uuid, code text, "madeOn" date, method text, state text, "formulaId" uuid, "makerId" uuid, "mouldId" uuid, bars int, "waterToLye" float8, "superfatFraction" float8, "oilTemperatureC" float8, "lyeTemperatureC" float8, "roomTemperatureC" float8, "humidityFraction" float8, "blendSeconds" int, gel text, "cutHours" float8, "fragranceFraction" float8, note text, "importedBy" uuid)`;
const INSERT_INGREDIENTS = `
  insert into batch_ingredient (workshop_id, id, batch_id, material_id, lot_id, share_of_oils_fraction, position)
  select $1, id, "batchId", "materialId", "lotId", share, position
  from jsonb_to_recordset($2::jsonb) as r (id uuid, "batchId" uuid, "materialId" uuid, "lotId" uuid, share float8, position int)`;
const INSERT_INSPECTIONS = `
  insert into inspection (workshop_id, id, batch_id, stage, inspected_at, note)
  select $1, id, "batchId", stage, "inspectedAt", note from jsonb_to_recordset($2::jsonb) as r (id uuid, "batchId" uuid, stage text, "inspectedAt" timestamptz, note text)`;
const INSERT_FINDINGS = `
  insert into finding (workshop_id, id, inspection_id, batch_id, fault, severity, note)
  select $1, id, "inspectionId", "batchId", fault, severity, note
  from jsonb_to_recordset($2::jsonb) as r (id uuid, "inspectionId" uuid, "batchId" uuid, fault text, severity smallint, note text)`;
const INSERT_ANSWERS = `
  insert into checklist_answer (workshop_id, id, inspection_id, batch_id, fault, answer)
  select $1, id, "inspectionId", "batchId", fault, answer
  from jsonb_to_recordset($2::jsonb) as r (id uuid, "inspectionId" uuid, "batchId" uuid, fault text, answer text)`;

/**
 * Writes every row in the transaction it is given: all or nothing.
 *
 * Faults are answered at the earliest stage each can be seen, since a history does not say when somebody looked.
 *
 * @param report the dry run's report, whose `creates` are made first
 * @param onProgress told the number of batches written so far
 */
export async function writeHistory(
  tx: WorkshopTransaction,
  rows: readonly HistoryRow[],
  report: ImportReport,
  known: KnownThings,
  onProgress: (done: number) => Promise<void>,
): Promise<void> {
  await makeMissing(tx, report.creates, known);
  for (let start = 0; start < rows.length; start += CHUNK) {
    const lines: Lines = { batches: [], ingredients: [], inspections: [], answers: [], findings: [] };
    for (const row of rows.slice(start, start + CHUNK)) addLines(lines, row, known, tx.now, tx.member.id);
    const write = (statement: string, records: unknown[]) => (records.length > 0 ? tx.rows(statement, [tx.workshopId, JSON.stringify(records)]) : Promise.resolve([]));
    await write(INSERT_BATCHES, lines.batches);
    await write(INSERT_INGREDIENTS, lines.ingredients);
    await write(INSERT_INSPECTIONS, lines.inspections);
    // Findings first: the outcome of a batch is then worked out once, when its answers come.
    await write(INSERT_FINDINGS, lines.findings);
    await write(INSERT_ANSWERS, lines.answers);
    await onProgress(Math.min(rows.length, start + CHUNK));
  }
}

