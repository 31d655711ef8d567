import type { Palette } from '#shared/words/batch-words.ts';
import { paletteOf } from '../history/palettes.ts';
import { randomOf } from '../random.ts';

/** Typical colours and design of a formula with a scent, such as `('charcoal', 'tideflat')`. */
export function photoPalette(formula: string, scent: string | null): Palette {
  return paletteOf(randomOf(7, 'palette', formula, scent ?? 'unscented'), scent, formula);
}
