import { inputOf } from './board-inputs.ts';
import type { Names } from './names.read.ts';

/** What a level of an input is called: alone in a cell's head, and with what tells it from others. */
export interface LevelLabel {
  label: string;
  detail: string | null;
}

const WORDS: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  methodFamily: { hot: 'Hot, not cold', cold: 'Cold, not hot' },
  method: { cold: 'Cold', 'cold-oven': 'Cold, oven-gelled', hot: 'Hot', 'hot-fluid': 'Hot, fluid', rebatch: 'Rebatch' },
  trace: { emulsion: 'Poured at emulsion', light: 'Poured at light trace', medium: 'Poured at medium trace', thick: 'Poured at thick trace', seized: 'Poured seized' },
  spray: { yes: 'Alcohol spray', no: 'No alcohol spray' },
  cover: { open: 'Left open', board: 'Covered by a board', 'board-and-towel': 'Board and towel', oven: 'In the oven', fridge: 'In the fridge', 'heat-mat': 'On a heat mat' },
  gel: { none: 'No gel', partial: 'Partial gel', full: 'Full gel' },
  season: { 'dec-feb': 'December to February', 'mar-may': 'March to May', 'jun-aug': 'June to August', 'sep-nov': 'September to November' },
  embeds: { yes: 'With embeds', no: 'Without embeds' },
};

/** Words for a level; an id nobody knows any more says so. */
export function levelLabel(names: Names, input: string, level: string): LevelLabel {
  const word = WORDS[input]?.[level];
  if (word) return { label: word, detail: null };
  const lot = names.lots.get(level);
  if (lot) return { label: lot.code, detail: lot.materialName };
  const named = { maker: names.members, formula: names.formulas, mould: names.moulds }[input]?.get(level) ?? names.materials.get(level);
  return { label: named ?? 'No longer known', detail: null };
}

/** An input with one of its levels as a person says it: `Lot EF-7802`, `Water to lye`, `Full gel`. */
export function termLabel(names: Names, { input, level }: { input: string; level: string | null }): string {
  const spec = inputOf(input);
  if (level === null) return spec?.name ?? input;
  const { label, detail } = levelLabel(names, input, level);
  if (spec?.class === 'lot') return `${detail ? `${detail} ` : ''}${label}`;
  return label;
}
