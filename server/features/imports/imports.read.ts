import type { ImportView } from '#shared/imports.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { Import } from './import.entity.ts';

const DELIMITER_WORDS: Record<string, string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab' };

export function importView(sheet: Import): ImportView {
  return {
    id: sheet.id, version: sheet.version, createdAt: sheet.createdAt.toISOString(), updatedAt: sheet.updatedAt.toISOString(),
    fileName: sheet.fileName, state: sheet.state, encoding: sheet.encoding, delimiter: DELIMITER_WORDS[sheet.delimiter] ?? sheet.delimiter, rowCount: sheet.rowCount,
    columns: sheet.heads.map((head, index) => ({ index, head, samples: sheet.samples[index] ?? [], target: sheet.mapping.targets[index] ?? null })),
    mapping: sheet.mapping, report: sheet.report,
    committedAt: sheet.committedAt?.toISOString() ?? null, batchesMade: sheet.batchesMade,
  };
}

/** One import. @throws Problem 404 */
export async function readImport(tx: WorkshopTransaction, importId: string): Promise<ImportView> {
  const sheet = await tx.manager.findOne(Import, { where: { id: importId } });
  if (!sheet) throw notFound('import');
  return importView(sheet);
}

/** The last fifty imports, newest first. */
export async function listImports(tx: WorkshopTransaction): Promise<{ items: ImportView[] }> {
  const sheets = await tx.manager.find(Import, { order: { createdAt: 'DESC', id: 'DESC' }, take: 50 });
  return { items: sheets.map(importView) };
}

/** How many batches a running commit has written. @throws Problem 404 */
export async function readProgress(tx: WorkshopTransaction, importId: string): Promise<{ done: number; of: number }> {
  const sheet = await readImport(tx, importId);
  const progress = await tx.row<{ done: number; of: number }>('select done, of_rows "of" from import_progress where import_id = $1', [importId]);
  return progress ?? { done: sheet.batchesMade ?? 0, of: sheet.rowCount };
}
