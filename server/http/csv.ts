import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { stringify } from 'csv-stringify';
import type { Response } from 'express';

export type Cell = string | number | null;

interface CsvFile {
  fileName: string;
  head: readonly string[];
  /** Read one after the other, no faster than the receiver takes them. */
  records: AsyncIterable<readonly Cell[]>;
  /** A byte-order mark, for spreadsheets that guess wrong without it. */
  hasByteOrderMark?: boolean;
}

/**
 * Writes a CSV (RFC 4180, CRLF, header row) as it is read, so memory stays the same however long it is.
 * Cells that a spreadsheet would take for a formula are neutralised. Headers go out after the first record
 * was read, so an error before it is still told as a problem.
 */
export async function sendCsv(response: Response, { fileName, head, records, hasByteOrderMark = false }: CsvFile): Promise<void> {
  const iterator = records[Symbol.asyncIterator]();
  let step = await iterator.next();
  response.status(200).set({ 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': `attachment; filename="${fileName}"`, 'Cache-Control': 'no-store' });
  async function* lines() {
    yield head;
    for (; !step.done; step = await iterator.next()) yield step.value;
  }
  const writer = stringify({ escape_formulas: true, record_delimiter: 'windows', bom: hasByteOrderMark });
  await pipeline(Readable.from(lines()), writer, response).catch((error: NodeJS.ErrnoException) => {
    // The receiver went away: nobody is left to be told.
    if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  });
}
