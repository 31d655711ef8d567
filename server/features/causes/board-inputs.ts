import type { InputSpec } from '#analysis/causes/board-rows.ts';
import type { Moment } from '#analysis/causes/what-comes-first.ts';
import type { INPUT_GROUPS } from '#shared/causes.ts';

export interface BoardInputSpec extends InputSpec {
  name: string;
  group: (typeof INPUT_GROUPS)[number];
  unit: string;
}

const number = (slug: string, name: string, unit: string, knownAt: Moment): BoardInputSpec => ({ slug, name, unit, knownAt, kind: 'number', class: 'other', group: 'making' });
const choice = (slug: string, name: string, group: BoardInputSpec['group'], knownAt: Moment): BoardInputSpec => ({ slug, name, unit: '', knownAt, kind: 'nominal', class: 'other', group });
const thing = (slug: string, name: string): BoardInputSpec => ({ slug, name, unit: '', knownAt: 'plan', kind: 'held', class: 'other', group: 'who-and-what' });
const lot = (slug: string, name: string, knownAt: Moment): BoardInputSpec => ({ slug, name, unit: '', knownAt, kind: 'held', class: 'lot', group: 'lots' });

/**
 * What the board asks about, in the order of its columns, each with the moment it is known.
 * Lye concentration is not here: it is the same quantity as the ratio of water to lye.
 */
export const BOARD_INPUTS: readonly BoardInputSpec[] = [
  choice('methodFamily', 'Hot or cold', 'making', 'plan'),
  choice('method', 'Method', 'making', 'plan'),
  number('waterToLye', 'Water to lye', '', 'weigh'),
  number('superfatPct', 'Superfat', '%', 'weigh'),
  number('oilTemperatureC', 'Oil temperature', '°C', 'blend'),
  number('lyeTemperatureC', 'Lye temperature', '°C', 'blend'),
  number('blendSeconds', 'Blending', 's', 'blend'),
  number('cookMinutes', 'Cook', 'min', 'scent-in'),
  number('scentTemperatureC', 'Scent temperature', '°C', 'scent-in'),
  number('fragrancePct', 'Scent load', '%', 'scent-in'),
  number('vanillinPct', 'Vanillin', '%', 'scent-in'),
  number('roomTemperatureC', 'Room temperature', '°C', 'pour'),
  number('humidityPct', 'Humidity', '%', 'pour'),
  // How thick it was poured is known once it is poured: it cannot be behind what is seen in the pot.
  choice('trace', 'Trace at pour', 'making', 'mould'),
  choice('spray', 'Alcohol spray', 'making', 'pour'),
  choice('cover', 'Cover', 'making', 'mould'),
  choice('gel', 'Gel', 'making', 'mould'),
  number('mouldHours', 'Hours in the mould', 'h', 'unmould'),
  number('cutHours', 'Hours to the cut', 'h', 'cut'),
  lot('fragranceLot', 'Scent lot', 'scent-in'),
  lot('fatLot', 'Fat lot', 'weigh'),
  lot('alkaliLot', 'Alkali lot', 'weigh'),
  lot('colourantLot', 'Colourant lot', 'weigh'),
  choice('maker', 'Maker', 'who-and-what', 'plan'),
  choice('formula', 'Formula', 'who-and-what', 'plan'),
  choice('mould', 'Mould', 'who-and-what', 'pour'),
  choice('season', 'Season', 'who-and-what', 'plan'),
  choice('embeds', 'Embeds', 'who-and-what', 'plan'),
  thing('colourant', 'Colourant'),
  thing('additive', 'Additive'),
  thing('liquid', 'Liquid'),
];

export const inputOf = (slug: string): BoardInputSpec | undefined => BOARD_INPUTS.find((input) => input.slug === slug);

/** Slug of the input that says which lots of a kind a batch holds. */
export const LOT_INPUTS = { fragrance: 'fragranceLot', fat: 'fatLot', alkali: 'alkaliLot', colourant: 'colourantLot' } as const;
