import type { HistoryMaterial } from './types.ts';

/** Working values in mg KOH per g, as workshops commonly use them; a lot's own paper beats any of them. */
export const fats: HistoryMaterial[] = [
  { key: 'olive', kind: 'fat', name: 'Olive oil', inciName: 'Olea Europaea Fruit Oil', saponificationKohMgPerG: 190 },
  { key: 'coconut', kind: 'fat', name: 'Coconut oil', inciName: 'Cocos Nucifera Oil', saponificationKohMgPerG: 257, isHardFat: true, isLauric: true },
  { key: 'shea', kind: 'fat', name: 'Shea butter', inciName: 'Butyrospermum Parkii Butter', saponificationKohMgPerG: 179, isHardFat: true },
  { key: 'castor', kind: 'fat', name: 'Castor oil', inciName: 'Ricinus Communis Seed Oil', saponificationKohMgPerG: 180 },
  { key: 'sunflower', kind: 'fat', name: 'Sunflower oil', inciName: 'Helianthus Annuus Seed Oil', saponificationKohMgPerG: 190, isLinoleicRich: true, note: 'The regular kind, not high oleic.' },
  { key: 'sunflower-ho', kind: 'fat', name: 'Sunflower oil, high oleic', inciName: 'Helianthus Annuus Seed Oil', saponificationKohMgPerG: 189 },
  { key: 'rapeseed', kind: 'fat', name: 'Rapeseed oil', inciName: 'Brassica Napus Seed Oil', saponificationKohMgPerG: 186 },
  { key: 'tallow', kind: 'fat', name: 'Tallow', inciName: 'Adeps Bovis', saponificationKohMgPerG: 197, isHardFat: true, isAnimal: true },
  { key: 'palm', kind: 'fat', name: 'Palm oil', inciName: 'Elaeis Guineensis Oil', saponificationKohMgPerG: 199, isHardFat: true },
];

export const otherMaterials: HistoryMaterial[] = [
  { key: 'naoh', kind: 'alkali', name: 'Sodium hydroxide, beads', inciName: 'Sodium Hydroxide', alkali: 'naoh' },
  { key: 'water', kind: 'liquid', name: 'Water', inciName: 'Aqua' },
  { key: 'goat-milk', kind: 'liquid', name: 'Goat milk, frozen', inciName: 'Caprae Lac' },
  { key: 'titanium-dioxide', kind: 'colourant', name: 'White pigment', inciName: 'CI 77891', isWhitePigment: true, note: 'Stir into water first.' },
  { key: 'charcoal', kind: 'colourant', name: 'Charcoal powder', inciName: 'Charcoal Powder' },
  { key: 'mica-pearl', kind: 'colourant', name: 'Pearl mica', inciName: 'Mica, CI 77891' },
  { key: 'ultramarine', kind: 'colourant', name: 'Ultramarine blue', inciName: 'CI 77007' },
  { key: 'red-clay', kind: 'colourant', name: 'Red clay', inciName: 'Kaolin, CI 77491' },
  { key: 'green-oxide', kind: 'colourant', name: 'Chromium oxide green', inciName: 'CI 77288' },
  { key: 'salt', kind: 'additive', name: 'Fine sea salt', inciName: 'Sodium Chloride' },
  { key: 'honey', kind: 'additive', name: 'Honey', inciName: 'Mel' },
  { key: 'oat', kind: 'additive', name: 'Ground oat', inciName: 'Avena Sativa Kernel Flour' },
  { key: 'sodium-lactate', kind: 'additive', name: 'Sodium lactate, 60 %', inciName: 'Sodium Lactate' },
];

/** Scents of the first workshop; Hedgerow Lavender is an essential oil, the others are compounds. */
export const scents: HistoryMaterial[] = [
  { key: 'ember-fig', kind: 'fragrance', name: 'Ember Fig' },
  { key: 'tideflat', kind: 'fragrance', name: 'Tideflat' },
  { key: 'bakehouse', kind: 'fragrance', name: 'Bakehouse' },
  { key: 'lime-shrub', kind: 'fragrance', name: 'Lime Shrub' },
  { key: 'hedgerow-lavender', kind: 'fragrance', name: 'Hedgerow Lavender', isEssentialOil: true },
  { key: 'loft-amber', kind: 'fragrance', name: 'Loft Amber' },
  { key: 'clove-stove', kind: 'fragrance', name: 'Clove Stove' },
  { key: 'arbour-rose', kind: 'fragrance', name: 'Arbour Rose' },
];
