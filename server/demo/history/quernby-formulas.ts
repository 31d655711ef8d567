import type { FormulaLine, HistoryFormula } from './types.ts';

/** Fats in per cent of the oils, as people say them. */
function oils(shares: Record<string, number>): FormulaLine[] {
  return Object.entries(shares).map(([material, percent]) => ({ material, shareOfOils: percent / 100 }));
}

export const quernbyFormulas: HistoryFormula[] = [
  {
    key: 'everyday', name: 'Everyday', versions: [
      { number: 1, superfatFraction: 0.05, lines: oils({ olive: 40, coconut: 27, shea: 15, sunflower: 10, castor: 8 }) },
      { number: 2, superfatFraction: 0.05, note: 'High-oleic sunflower.', lines: oils({ olive: 40, coconut: 27, shea: 15, 'sunflower-ho': 10, castor: 8 }) },
    ],
  },
  {
    key: 'kitchen', name: 'Kitchen', note: 'The one with animal fat: say so on the label.', versions: [
      { number: 1, superfatFraction: 0.03, lines: oils({ tallow: 50, coconut: 25, rapeseed: 25 }) },
    ],
  },
  {
    key: 'milk-and-oat', name: 'Milk and Oat', note: 'Half the liquid is goat milk, frozen.', versions: [
      { number: 1, superfatFraction: 0.06, lines: [...oils({ olive: 40, coconut: 25, shea: 15, rapeseed: 15, castor: 5 }), ...oils({ honey: 1.5, oat: 1 })] },
      { number: 2, superfatFraction: 0.06, note: 'Less honey, less heat.', lines: [...oils({ olive: 40, coconut: 25, shea: 15, rapeseed: 15, castor: 5 }), ...oils({ honey: 1, oat: 1 })] },
    ],
  },
  {
    key: 'salt', name: 'Salt', note: 'Single cut at 4 to 8 hours. Cold only.', versions: [
      { number: 1, superfatFraction: 0.16, lines: [...oils({ coconut: 80, olive: 15, castor: 5 }), ...oils({ salt: 60 })] },
    ],
  },
  {
    key: 'high-olive', name: 'High Olive', note: 'Cures ten weeks.', cureWeeks: 10, versions: [
      { number: 1, superfatFraction: 0.05, lines: oils({ olive: 75, coconut: 10, sunflower: 10, castor: 5 }) },
      { number: 2, superfatFraction: 0.05, note: 'High-oleic sunflower.', lines: oils({ olive: 75, coconut: 10, 'sunflower-ho': 10, castor: 5 }) },
    ],
  },
  {
    key: 'charcoal', name: 'Charcoal', versions: [
      { number: 1, superfatFraction: 0.05, lines: [...oils({ olive: 35, coconut: 30, rapeseed: 20, sunflower: 10, castor: 5 }), ...oils({ charcoal: 1, 'mica-pearl': 0.4 })] },
      { number: 2, superfatFraction: 0.05, note: 'High-oleic sunflower.', lines: [...oils({ olive: 35, coconut: 30, rapeseed: 20, 'sunflower-ho': 10, castor: 5 }), ...oils({ charcoal: 1, 'mica-pearl': 0.4 })] },
    ],
  },
  {
    key: 'hotel', name: 'Hotel', note: 'Fennick House. No colour; the scent goes with the season.', versions: [
      { number: 1, superfatFraction: 0.05, lines: oils({ palm: 40, coconut: 30, rapeseed: 20, castor: 10 }) },
    ],
  },
];

/** Version in force in a week of the story. */
export function versionInWeek(formula: string, week: number): number {
  if (formula === 'milk-and-oat') return week >= 60 ? 2 : 1;
  return ['everyday', 'high-olive', 'charcoal'].includes(formula) && week >= 79 ? 2 : 1;
}
