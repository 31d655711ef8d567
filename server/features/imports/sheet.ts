import { CsvError, parse } from 'csv-parse';
import iconv from 'iconv-lite';
import { IMPORT_LIMITS } from '#shared/imports.ts';
import { Problem, invalidField, tooLarge } from '#server/problem.ts';

export interface SheetRow {
  /** Line of the sheet on which the row begins; the head is line 1. */
  line: number;
  cells: string[];
}

export interface Sheet {
  heads: string[];
  rows: SheetRow[];
}

const notASheet = (detail: string) => invalidField('#/file', detail);

/**
 * Text of an uploaded sheet: UTF-8 or UTF-16 by its mark, UTF-8 where it is valid, else the
 * Western single-byte encoding that spreadsheets write.
 *
 * @throws Problem 422 for something that is no text
 */
export function decodeSheet(bytes: Buffer): { text: string; encoding: string } {
  if (bytes.length === 0) throw notASheet('The file is empty');
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { text: iconv.decode(bytes, 'utf16le'), encoding: 'UTF-16' };
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { text: iconv.decode(bytes, 'utf16be'), encoding: 'UTF-16' };
  if (bytes.includes(0)) throw notASheet('This is no CSV text; save the sheet as CSV (UTF-8) and upload that');
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return { text, encoding: 'UTF-8' };
  } catch {
    return { text: iconv.decode(bytes, 'windows-1252'), encoding: 'Windows-1252' };
  }
}

/** The sign between cells: whichever of comma, semicolon and tab stands most often in the head, outside quotes. */
export function delimiterOf(text: string): ',' | ';' | '\t' {
  const counts = { ',': 0, ';': 0, '\t': 0 };
  let isQuoted = false;
  for (const sign of text) {
    if (sign === '"') isQuoted = !isQuoted;
    else if (isQuoted) continue;
    else if (sign === '\n' || sign === '\r') break;
    else if (sign === ',' || sign === ';' || sign === '\t') counts[sign] += 1;
  }
  if (counts['\t'] > counts[','] && counts['\t'] > counts[';']) return '\t';
  return counts[';'] > counts[','] ? ';' : ',';
}

/** A cell as it was meant: the one sign that exports put before a formula is taken off again. */
function unguard(cell: string): string {
  return /^'[=+\-@\t\r＝＋－＠]/.test(cell) ? cell.slice(1) : cell;
}

/**
 * Reads a sheet, letting other requests in between.
 *
 * @throws Problem 422 naming the line where the CSV is broken, 413 past the limits
 */
export async function readSheet(text: string, delimiter: string): Promise<Sheet> {
  const parser = parse(text, { delimiter, bom: true, info: true, relax_column_count: true, skip_empty_lines: true, max_record_size: 1024 * 1024, record_delimiter: ['\r\n', '\n', '\r'] });
  const rows: SheetRow[] = [];
  let heads: string[] | undefined;
  let lastLine = 0;
  try {
    for await (const { record, info } of parser as AsyncIterable<{ record: string[]; info: { lines: number } }>) {
      const line = lastLine + 1;
      lastLine = info.lines;
      if (!heads) heads = readHeads(record);
      else if (record.some((cell) => cell.trim() !== '')) rows.push({ line, cells: record.map(unguard) });
      if (rows.length > IMPORT_LIMITS.rows) throw tooLarge(`At most ${IMPORT_LIMITS.rows} rows at once; split the sheet`);
    }
  } catch (error) {
    if (error instanceof Problem) throw error;
    if (error instanceof CsvError) throw notASheet(`The CSV is broken near line ${Number(error['lines'] ?? lastLine + 1)}: ${inWords(error.code)}`);
    throw error;
  }
  if (!heads) throw notASheet('The file has no head row');
  if (rows.length === 0) throw notASheet('The file has a head row and nothing below it');
  return { heads, rows };
}

function readHeads(record: string[]): string[] {
  if (record.length > IMPORT_LIMITS.columns) throw tooLarge(`At most ${IMPORT_LIMITS.columns} columns; this sheet has ${record.length}`);
  return record.map((head, index) => unguard(head).trim().slice(0, 200) || `column ${index + 1}`);
}

function inWords(code: string): string {
  if (code === 'CSV_QUOTE_NOT_CLOSED') return 'a quotation mark is opened and never closed';
  if (code === 'CSV_INVALID_CLOSING_QUOTE') return 'text stands after a closing quotation mark';
  if (code === 'INVALID_OPENING_QUOTE') return 'a quotation mark stands in the middle of a cell';
  if (code === 'CSV_MAX_RECORD_SIZE') return 'a row is longer than 1 MiB';
  return 'it cannot be read as rows and cells';
}
