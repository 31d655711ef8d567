import type { AuditEntry } from '#shared/audit.ts';

const TABLES: Record<string, string> = {
  batch: 'batch', batch_ingredient: 'what went into a batch', cook_stage: 'cook stage', checklist_answer: 'checklist answer', finding: 'finding', formula: 'formula',
  formula_line: 'formula line', formula_version: 'formula version', import: 'import', inspection: 'inspection', lot: 'lot', mark: 'mark', material: 'material', member: 'person',
  mould: 'mould', photo: 'photo', reading: 'reading', supplier: 'supplier', workshop: 'settings', claim: 'claim', disposition: 'disposition',
};

/** Tables to choose from, by their words. */
export const TABLE_OPTIONS = Object.entries(TABLES).map(([value, label]) => ({ value, label })).sort((a, b) => a.label.localeCompare(b.label));

export function tableWords(table: string): string {
  return TABLES[table] ?? table.replaceAll('_', ' ');
}

const DEEDS: Record<string, string> = { insert: 'added', update: 'changed', delete: 'took away' };

export function deedWords(deed: string): string {
  return DEEDS[deed] ?? deed.replaceAll('.', ' ');
}

/** What a record is called among people: its code, else its name. */
export function calledIn({ before, after }: AuditEntry): string | undefined {
  const record = after ?? before ?? {};
  return ['code', 'name', 'fault', 'file_name', 'stage', 'email'].map((key) => record[key]).find((value): value is string => typeof value === 'string' && value !== '');
}

/** Columns that say nothing to a person. */
const SILENT = new Set(['id', 'workshop_id', 'version', 'created_at', 'updated_at', 'created_from', 'member_id']);

export interface FieldChange {
  field: string;
  before: string;
  after: string;
}

function asText(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing';
  if (Array.isArray(value) && value.every((item) => typeof item !== 'object')) return value.join(', ').slice(0, 120) || 'nothing';
  if (typeof value === 'object') return JSON.stringify(value).slice(0, 120);
  return String(value).slice(0, 120);
}

/** Fields that a change made different, in words; of what was added or taken away, its filled fields. */
export function changesIn({ before, after }: AuditEntry): FieldChange[] {
  const fields = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])].filter((field) => !SILENT.has(field) && !field.endsWith('_id'));
  return fields
    .map((field) => ({ field: field.replaceAll('_', ' '), before: asText(before?.[field]), after: asText(after?.[field]) }))
    .filter((change) => change.before !== change.after);
}
