import { BATCH_HISTORY_COLUMNS } from '#shared/batch-history.ts';
import type { ImportMapping, ImportProblem, ImportReport } from '#shared/imports.ts';
import { COLUMN_OF, missingOf, notKnown, type Creatable, type KnownThings } from './known-things.ts';
import { readRow, readerOf, type HistoryRow } from './read-row.ts';
import type { Sheet } from './sheet.ts';

/** Problems beyond these are counted, not listed: nobody reads ten thousand lines. */
const LISTED = 500;
/** Rows between two breaths, so that other requests are served meanwhile. */
const BREATH = 500;

export interface DryRun {
  report: ImportReport;
  /** Rows to write, in the sheet's order; complete only when the report has no problems. */
  rows: HistoryRow[];
}

/** What the mapping itself lacks, told once and not for every row. */
function mappingProblems(mapping: ImportMapping, heads: readonly string[]): ImportProblem[] {
  const targets = mapping.targets.filter((target) => target !== null);
  const missing = BATCH_HISTORY_COLUMNS.filter(({ name, required }) => required && !targets.includes(name));
  const twice = [...new Set(targets.filter((target, index) => targets.indexOf(target) !== index))];
  return [
    ...missing.map(({ holds }) => ({ line: 1, column: holds, detail: `No column is matched to ${holds}; every batch needs it` })),
    ...twice.map((target) => ({ line: 1, column: heads[mapping.targets.indexOf(target)] ?? target, detail: `Two columns are matched to ${target}; choose one` })),
  ];
}

/**
 * Reads every row and says what would happen, writing nothing.
 *
 * Cost: O(rows × columns); gives way to other requests every 500 rows.
 */
export async function dryRun(sheet: Sheet, mapping: ImportMapping, known: KnownThings): Promise<DryRun> {
  const problems: ImportProblem[] = mappingProblems(mapping, sheet.heads);
  let problemCount = problems.length;
  const tell = (problem: ImportProblem) => {
    problemCount += 1;
    if (problems.length < LISTED) problems.push(problem);
  };
  const creates: Record<Creatable, Map<string, string>> = { lots: new Map(), formulas: new Map(), people: new Map(), moulds: new Map(), colourants: new Map() };
  const answers = { found: 0, clear: 0, notChecked: 0 };
  const rows: HistoryRow[] = [];
  const lineOfCode = new Map<string, number>();
  const reader = readerOf(sheet.heads, mapping.targets, mapping.units);
  const faultColumns = reader.columns.filter(({ fault }) => fault !== undefined).length;
  const headOf = (target: string) => sheet.heads[mapping.targets.indexOf(target)] ?? target;
  let alreadyThere = 0;
  if (problems.length === 0) {
    for (const [index, sheetRow] of sheet.rows.entries()) {
      if (index % BREATH === BREATH - 1) await new Promise((resolve) => setImmediate(resolve));
      const read = readRow(reader, sheetRow);
      if ('problems' in read) {
        read.problems.forEach(tell);
        continue;
      }
      const { row } = read;
      const earlier = lineOfCode.get(row.code);
      if (earlier !== undefined) {
        tell({ line: sheetRow.line, column: headOf('batch_code'), detail: `Batch ${row.code} stands on line ${earlier} already` });
        continue;
      }
      lineOfCode.set(row.code, sheetRow.line);
      if (known.batchCodes.has(row.code)) {
        alreadyThere += 1;
        continue;
      }
      for (const { kind, name } of missingOf(row, known)) {
        if (mapping.create[kind]) creates[kind].set(name.toLowerCase(), creates[kind].get(name.toLowerCase()) ?? name);
        else tell({ line: sheetRow.line, column: headOf(COLUMN_OF[kind]), detail: notKnown(kind, name) });
      }
      for (const severity of row.answers.values()) answers[severity > 0 ? 'found' : 'clear'] += 1;
      answers.notChecked += faultColumns - row.answers.size;
      rows.push(row);
    }
  }
  const names = (kind: Creatable) => [...creates[kind].values()];
  return {
    rows,
    report: {
      rows: sheet.rows.length, good: rows.length, alreadyThere, problems, problemCount, answers,
      creates: { lots: names('lots'), formulas: names('formulas'), people: names('people'), moulds: names('moulds'), colourants: names('colourants') },
    },
  };
}
