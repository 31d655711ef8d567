import { v7 as uuidv7 } from 'uuid';
import type { ImportMapping, ImportView } from '#shared/imports.ts';
import { insertOnce, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { Work } from '#server/http/api.ts';
import { conflict, invalid, notFound } from '#server/problem.ts';
import { dryRun } from './dry-run.ts';
import { Import } from './import.entity.ts';
import { importView, readImport } from './imports.read.ts';
import { knownThings } from './known-things.ts';
import { importTargets, proposeMapping } from './propose-mapping.ts';
import { decodeSheet, delimiterOf, readSheet } from './sheet.ts';
import { writeHistory } from './write-history.ts';

/** Cells shown beside each head in the mapping. */
const SAMPLES = 3;

/** Takes in a sheet and proposes a mapping; the log is not touched. @throws Problem 409, 413, 422 */
export async function uploadSheet(work: Work, upload: { id?: string; fileName: string; bytes: Buffer }): Promise<ImportView> {
  const { text, encoding } = decodeSheet(upload.bytes);
  const delimiter = delimiterOf(text);
  const { heads, rows } = await readSheet(text, delimiter);
  const samples = heads.map((_head, index) => [...new Set(rows.slice(0, 50).map(({ cells }) => (cells[index] ?? '').trim().slice(0, 60)).filter(Boolean))].slice(0, SAMPLES));
  const id = upload.id ?? uuidv7();
  return work(async (tx) => {
    await insertOnce(tx, Import, 'import', {
      id, fileName: upload.fileName, state: 'uploaded', encoding, delimiter, content: text, heads, samples, rowCount: rows.length,
      mapping: proposeMapping(heads), report: null, committedAt: null, batchesMade: null, version: 1, updatedAt: tx.now,
    }, { fileName: upload.fileName, text });
    return readImport(tx, id);
  });
}

async function loadForWork(tx: WorkshopTransaction, importId: string, mapping: ImportMapping | undefined): Promise<Import> {
  const sheet = await tx.manager.createQueryBuilder(Import, 'sheet').addSelect('sheet.content').where('sheet.id = :importId', { importId }).setLock('pessimistic_write').getOne();
  if (!sheet) throw notFound('import');
  if (sheet.state === 'committed') throw conflict('This sheet is in the log already');
  if (mapping) {
    refuseUnknownTargets(mapping, sheet.heads);
    sheet.mapping = mapping;
  }
  return sheet;
}

function refuseUnknownTargets(mapping: ImportMapping, heads: readonly string[]): void {
  const known = new Set(importTargets().map(({ name }) => name));
  const errors = mapping.targets.flatMap((target, index) =>
    target !== null && (!known.has(target) || index >= heads.length) ? [{ pointer: `#/mapping/targets/${index}`, detail: `${target} is not a field that a column can fill` }] : [],
  );
  if (errors.length > 0) throw invalid(errors);
}

/** The dry run: every problem by line and column, and what would be made. @throws Problem 404, 409 once committed */
export async function checkImport(tx: WorkshopTransaction, importId: string, mapping?: ImportMapping): Promise<ImportView> {
  const sheet = await loadForWork(tx, importId, mapping);
  const { report } = await dryRun(await readSheet(sheet.content, sheet.delimiter), sheet.mapping, await knownThings(tx));
  Object.assign(sheet, { report, state: 'checked' });
  return importView(await saveChange(tx, Import, sheet));
}

/**
 * Writes the whole sheet, or nothing where one row has a problem.
 *
 * Progress goes through transactions of its own, so that it shows before the commit.
 *
 * @throws Problem 404, 409 once committed, 422 with the first problems by line and column
 */
export async function commitImport(work: Work, aside: Work, importId: string, mapping?: ImportMapping): Promise<ImportView> {
  return work(async (tx) => {
    const sheet = await loadForWork(tx, importId, mapping);
    const known = await knownThings(tx);
    const { report, rows } = await dryRun(await readSheet(sheet.content, sheet.delimiter), sheet.mapping, known);
    if (report.problemCount > 0) {
      throw invalid(report.problems.slice(0, 50).map(({ line, column, detail }) => ({ pointer: `#/rows/${line}/${column.replaceAll('~', '~0').replaceAll('/', '~1')}`, detail: `Line ${line}, ${column}: ${detail}` })));
    }
    await writeHistory(tx, rows, report, known, (done) => tellProgress(aside, importId, done, rows.length));
    Object.assign(sheet, { report, state: 'committed', committedAt: tx.now, batchesMade: rows.length });
    return importView(await saveChange(tx, Import, sheet));
  });
}

async function tellProgress(aside: Work, importId: string, done: number, of: number): Promise<void> {
  await aside((tx) => tx.rows(
    `insert into import_progress (workshop_id, import_id, done, of_rows) values ($1, $2, $3, $4)
     on conflict (workshop_id, import_id) do update set done = excluded.done, of_rows = excluded.of_rows`,
    [tx.workshopId, importId, done, of],
  ));
}
