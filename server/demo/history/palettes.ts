import type { Design, Palette } from '#shared/words/batch-words.ts';
import { type Random, within } from '../random.ts';

interface Look { base: string; second: string; third: string; designs: readonly (readonly [Design, number])[] }

const byScent: Readonly<Record<string, Look>> = {
  'ember-fig': { base: '#cdb7a6', second: '#7d3f4a', third: '#e6d8c8', designs: [['swirl', 7], ['layers', 2], ['plain', 1]] },
  tideflat: { base: '#d3d8d0', second: '#4f6d86', third: '#8fa9b3', designs: [['layers', 5], ['swirl', 5]] },
  bakehouse: { base: '#c9a36e', second: '#8a5a34', third: '#e2cda4', designs: [['swirl', 6], ['layers', 2], ['plain', 2]] },
  'lime-shrub': { base: '#dbe0b2', second: '#86a545', third: '#f0efd6', designs: [['layers', 6], ['swirl', 4]] },
  'hedgerow-lavender': { base: '#ded8df', second: '#77668f', third: '#b3a6c0', designs: [['swirl', 6], ['layers', 2], ['specks', 2]] },
  'loft-amber': { base: '#dcb76c', second: '#a5661d', third: '#efdcae', designs: [['plain', 4], ['swirl', 4], ['layers', 2]] },
  'clove-stove': { base: '#bb8a6c', second: '#6f3a22', third: '#d9b79c', designs: [['specks', 7], ['swirl', 3]] },
  'arbour-rose': { base: '#e8c9c5', second: '#b05f69', third: '#f4e4df', designs: [['swirl', 7], ['layers', 3]] },
};
const plain: Look = { base: '#e6dfc8', second: '#d8cfb2', third: '#f1ecdc', designs: [['plain', 6], ['swirl', 2], ['specks', 2]] };

/** Formulas whose own look is stronger than the scent's. */
const byFormula: Readonly<Record<string, (scent: Look) => Look>> = {
  charcoal: (scent) => ({ base: '#55565a', second: '#d3cec4', third: scent.second, designs: [['swirl', 8], ['layers', 2]] }),
  salt: (scent) => ({ base: '#e9e8e3', second: scent.third, third: '#bfc9c8', designs: [['specks', 8], ['plain', 2]] }),
  'milk-and-oat': (scent) => ({ base: '#d9c6a3', second: '#9a7b4f', third: scent.base, designs: [['specks', 7], ['layers', 3]] }),
  kitchen: (scent) => ({ base: '#ece7d8', second: '#cfc7ae', third: scent.base, designs: [['plain', 8], ['specks', 2]] }),
  hotel: () => ({ base: '#ebe3cb', second: '#ddd2b2', third: '#f4efe0', designs: [['plain', 1]] }),
  'high-olive': (scent) => ({ base: '#d9d7ad', second: scent.second, third: '#ecebd0', designs: [['plain', 5], ['swirl', 3], ['layers', 2]] }),
};

/** Colours of a batch's cut face: its scent's or formula's, a little different in every batch. */
export function paletteOf(random: Random, scent: string | null, formula: string): Palette {
  const ofScent = (scent === null ? undefined : byScent[scent]) ?? plain;
  const look = byFormula[formula]?.(ofScent) ?? ofScent;
  const shift = random.normal(0, 5);
  return {
    base: shade(look.base, shift, random), second: shade(look.second, shift, random), third: shade(look.third, shift, random),
    design: random.weighted(look.designs),
  };
}

function shade(colour: string, shift: number, random: Random): string {
  const channels = [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16));
  return `#${channels.map((value) => Math.round(within(value + shift + random.normal(0, 3), 0, 255)).toString(16).padStart(2, '0')).join('')}`;
}
