import { formatDay, formatNumber } from '#src/lib/format.ts';
import { showQuantity, type UnitChoice } from '#src/lib/units.ts';
import type { BatchDraft } from './batch-draft.ts';

const LABELS: Record<keyof Omit<BatchDraft, 'id'>, string> = {
  code: 'Batch code', madeOn: 'Made on', method: 'Method', state: 'Where it stands', pouredAt: 'Poured at', formulaId: 'Formula', formulaVersionId: 'Version', makerId: 'Maker', mouldId: 'Mould',
  bars: 'Bars', oilMassG: 'All oils together', waterToLye: 'Water to lye', superfatFraction: 'Superfat', oilTemperatureC: 'Oils at mixing', lyeTemperatureC: 'Lye at mixing',
  batterTemperatureC: 'Batter at pour', scentTemperatureC: 'When the scent went in', roomTemperatureC: 'Room', humidityFraction: 'Humidity', blendSeconds: 'Blended',
  traceAtScent: 'Trace when the scent went in', traceAtPour: 'Trace at pour', minutesToPour: 'From trace to pour', cover: 'Covered with', isSprayed: 'Sprayed with alcohol', gel: 'Gel phase',
  cookTemperatureC: 'Cook temperature', cookMinutes: 'Cook time', cookLossFraction: 'Lost in the cook', mouldHours: 'In the mould', cutHours: 'From pour to cut', unmouldedOn: 'Unmoulded on',
  cutOn: 'Cut on', palette: 'Face', hasEmbeds: 'Holds an earlier batch', note: 'Note', ingredients: 'What went in', cookStages: 'Cook stages',
};

/** A field's name as the form says it. */
export function fieldLabel(field: string): string {
  return LABELS[field as keyof typeof LABELS] ?? field;
}

/** A field's value in words, in the person's units; for setting two versions side by side. */
export function fieldWords(field: string, value: unknown, units: UnitChoice): string {
  if (value === null || value === undefined) return 'not recorded';
  if (typeof value === 'number') {
    if (field.endsWith('C')) return showQuantity(value, 'temperature', units);
    if (field.endsWith('G')) return showQuantity(value, 'mass', units);
    if (field.endsWith('Fraction')) return showQuantity(value, 'percent', units);
    return formatNumber(value, Number.isInteger(value) ? 0 : 2);
  }
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return value.length === 1 ? '1 line' : `${value.length} lines`;
  if (typeof value !== 'string') return 'other colours';
  if (/^\d{4}-\d\d-\d\d$/.test(value)) return formatDay(value);
  return /^[\da-f]{8}-/.test(value) ? 'another choice' : value.replaceAll('-', ' ');
}
