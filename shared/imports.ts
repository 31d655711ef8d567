import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { recordFields } from './http/fields.ts';

/** What an import may weigh. */
export const IMPORT_LIMITS = { bytes: 10 * 1024 * 1024, rows: 20_000, columns: 300, cellCharacters: 10_000 } as const;

export const ImportUnits = z.strictObject({
  temperature: z.enum(['celsius', 'fahrenheit']).default('celsius'),
  /** `percent`: 33 means 33 %; `fraction`: 0.33 does. */
  share: z.enum(['percent', 'fraction']).default('percent'),
  day: z.enum(['year-month-day', 'day-month-year', 'month-day-year']).default('year-month-day'),
  decimal: z.enum(['point', 'comma']).default('point'),
});
export type ImportUnits = z.infer<typeof ImportUnits>;

/** Which column of the sheet fills which field: `targets[i]` belongs to column i; null leaves it out. */
export const ImportMapping = z.strictObject({
  targets: z.array(z.string().max(80).nullable()).max(IMPORT_LIMITS.columns),
  units: ImportUnits.prefault({}),
  /** What may be made on the way; a thing that is not there and may not be made is a problem of its cell. */
  create: z.strictObject({ lots: z.boolean().default(true), formulas: z.boolean().default(true), people: z.boolean().default(true), moulds: z.boolean().default(true), colourants: z.boolean().default(true) }).prefault({}),
});
export type ImportMapping = z.infer<typeof ImportMapping>;

export const ImportColumn = z.object({ index: z.int(), head: z.string(), samples: z.array(z.string()), target: z.string().nullable() });

/** A cell that stands in the way: line as the sheet counts (the head is line 1), column by its head. */
export const ImportProblem = z.object({ line: z.int(), column: z.string(), detail: z.string() });
export type ImportProblem = z.infer<typeof ImportProblem>;

/** What a dry run found; nothing was written. */
export const ImportReport = z.object({
  rows: z.int(),
  good: z.int(),
  /** Batches whose code is already in the log; they are left as they are. */
  alreadyThere: z.int(),
  problems: z.array(ImportProblem),
  problemCount: z.int(),
  creates: z.object({ lots: z.array(z.string()), formulas: z.array(z.string()), people: z.array(z.string()), moulds: z.array(z.string()), colourants: z.array(z.string()) }),
  answers: z.object({ found: z.int(), clear: z.int(), notChecked: z.int() }),
});
export type ImportReport = z.infer<typeof ImportReport>;

export const IMPORT_STATES = ['uploaded', 'checked', 'committed'] as const;

export const ImportView = z.object({
  ...recordFields,
  fileName: z.string(),
  state: z.enum(IMPORT_STATES),
  encoding: z.string(),
  delimiter: z.string(),
  rowCount: z.int(),
  columns: z.array(ImportColumn),
  mapping: ImportMapping.extend({ units: ImportUnits }),
  report: ImportReport.nullable(),
  committedAt: z.string().nullable(),
  batchesMade: z.int().nullable(),
});
export type ImportView = z.infer<typeof ImportView>;

/** Fields that a column can fill. */
export const ImportTarget = z.object({ name: z.string(), holds: z.string(), isFault: z.boolean(), isRequired: z.boolean() });

const params = z.object({ importId: z.uuid() });

export const importsApi = {
  /** Multipart with `id` (UUID v7) and one file named `file`, or the CSV itself as `text/csv`. */
  upload: endpoint({ method: 'post', path: '/api/imports', summary: 'Upload a batch history; nothing is written to the log yet', right: 'import.write', accepts: 'multipart/form-data', query: z.object({ id: z.uuidv7().optional(), fileName: z.string().max(200).optional() }), reply: ImportView }),
  list: endpoint({ method: 'get', path: '/api/imports', summary: 'Imports, newest first', right: 'workshop.read', reply: z.object({ items: z.array(ImportView.omit({ columns: true, mapping: true, report: true })) }) }),
  targets: endpoint({ method: 'get', path: '/api/imports/targets', summary: 'Fields that a column can fill', right: 'workshop.read', reply: z.object({ items: z.array(ImportTarget) }) }),
  read: endpoint({ method: 'get', path: '/api/imports/:importId', summary: 'One import', right: 'import.write', params, reply: ImportView }),
  /** The dry run. Without a body's mapping the proposed one is used. */
  check: endpoint({ method: 'post', path: '/api/imports/:importId/check', summary: 'Dry run: every problem by line and column', right: 'import.write', params, body: z.strictObject({ mapping: ImportMapping.optional() }), reply: ImportView, heavy: true }),
  commit: endpoint({ method: 'post', path: '/api/imports/:importId/commit', summary: 'All or nothing: write the whole sheet into the log', right: 'import.write', params, body: z.strictObject({ mapping: ImportMapping.optional() }), reply: ImportView, heavy: true }),
  progress: endpoint({ method: 'get', path: '/api/imports/:importId/progress', summary: 'How far a commit has come', right: 'import.write', params, reply: z.object({ done: z.int(), of: z.int() }) }),
};
