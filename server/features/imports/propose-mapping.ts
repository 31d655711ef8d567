import { BATCH_HISTORY_COLUMNS, faultColumn, faultOfColumn } from '#shared/batch-history.ts';
import type { ImportMapping } from '#shared/imports.ts';
import { ImportMapping as MappingSchema } from '#shared/imports.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';

/** Every field a column can fill, the fixed ones first, then one per fault. */
export function importTargets(): { name: string; holds: string; isFault: boolean; isRequired: boolean }[] {
  return [
    ...BATCH_HISTORY_COLUMNS.map(({ name, holds, required }) => ({ name, holds, isFault: false, isRequired: required })),
    ...faultCatalogue.map(({ slug, name }) => ({ name: faultColumn(slug), holds: name, isFault: true, isRequired: false })),
  ];
}

/** Letters and digits only, so that "Oil temp (°C)" and "oil_temp_c" meet. */
function plain(head: string): string {
  return head.toLowerCase().normalize('NFKD').replaceAll(/[^a-z\d]/g, '');
}

/** What people call the columns in their own sheets. */
const OTHER_HEADS: Record<string, string> = {
  batch: 'batch_code', code: 'batch_code', batchno: 'batch_code', batchnumber: 'batch_code', loaf: 'batch_code',
  date: 'made_on', made: 'made_on', day: 'made_on', madedate: 'made_on', datemade: 'made_on', pourdate: 'made_on',
  process: 'method', recipe: 'formula', soap: 'formula', madeby: 'maker', who: 'maker', mold: 'mould',
  oiltemp: 'oil_temperature_c', oiltempc: 'oil_temperature_c', oiltemperature: 'oil_temperature_c', oils: 'oil_temperature_c',
  lyetemp: 'lye_temperature_c', lyetempc: 'lye_temperature_c', lyetemperature: 'lye_temperature_c',
  roomtemp: 'room_temperature_c', roomtempc: 'room_temperature_c', roomtemperature: 'room_temperature_c', room: 'room_temperature_c',
  humidity: 'humidity_pct', rh: 'humidity_pct', waterlye: 'water_to_lye', waterlyeratio: 'water_to_lye', ratio: 'water_to_lye',
  lyeconcentration: 'lye_concentration_pct', lyestrength: 'lye_concentration_pct', superfat: 'superfat_pct', sf: 'superfat_pct',
  fragrance: 'fragrance_pct', fragranceload: 'fragrance_pct', load: 'fragrance_pct', scentload: 'fragrance_pct',
  fragrancelot: 'fragrance_lots', lot: 'fragrance_lots', lots: 'fragrance_lots', scentlot: 'fragrance_lots',
  colourant: 'colourants', colorant: 'colourants', colorants: 'colourants', colour: 'colourants', color: 'colourants',
  gelphase: 'gel', blend: 'blend_seconds', blendtime: 'blend_seconds', cut: 'cut_hours', cutafter: 'cut_hours', note: 'notes', remarks: 'notes',
};

/** A first mapping by the heads alone; the person has the last word. No target is proposed twice. */
export function proposeMapping(heads: readonly string[]): ImportMapping {
  const byPlain = new Map<string, string>(Object.entries(OTHER_HEADS));
  for (const { name } of BATCH_HISTORY_COLUMNS) byPlain.set(plain(name), name);
  for (const { slug, name } of faultCatalogue) {
    byPlain.set(plain(slug), faultColumn(slug));
    byPlain.set(plain(name), faultColumn(slug));
  }
  const known = new Set(faultCatalogue.map(({ slug }) => slug as string));
  const used = new Set<string>();
  const targets = heads.map((head) => {
    const slug = faultOfColumn(head);
    const target = slug === undefined ? byPlain.get(plain(head)) : known.has(slug) ? faultColumn(slug) : undefined;
    if (target === undefined || used.has(target)) return null;
    used.add(target);
    return target;
  });
  return MappingSchema.parse({ targets });
}
