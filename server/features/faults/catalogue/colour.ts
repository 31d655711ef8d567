import type { FaultDefinition } from './fault-definition.ts';

export const colourFaults: readonly FaultDefinition[] = [
  {
    slug: 'colour-shift', name: 'Colour shift', otherNames: ['discolouration', 'morphing'],
    kind: 'cosmetic', family: 'colour', firstSeen: 'unmould', extentUnit: 'loaf-then-bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Plainly another colour than planned, or than the last good batch of the formula: a difference above 5 ΔE00 with a grey card in the picture (2 to 5 is slight), or two people agree by eye. Moves until week 2 or later.',
    severity: { 1: 'ΔE 2 to 5, or only beside the old bar', 2: 'ΔE 5 to 10, or the design reads differently', 3: 'ΔE above 10, or ugly' },
    lookAlikes: [
      { fault: 'vanilla-browning', name: 'Vanilla browning', howToTell: 'Brown, from the scent, deeper for weeks.' },
      { fault: 'partial-gel-ring', name: 'Partial-gel ring', howToTell: 'Only in the middle.' },
      { fault: 'orange-spots', name: 'Rancidity', howToTell: 'Spots.' },
      { name: 'Fading in light', howToTell: 'Only on the outside.' },
    ],
    suspects: [
      { input: 'fragranceLot', direction: 'either', which: 'vanillin, eugenol, yellow citrus' },
      { input: 'colourant', direction: 'either', which: 'pigments that lye changes' }, { input: 'colourantLot', direction: 'either' },
      { input: 'gel', direction: 'up', which: 'darker' }, { input: 'additive', direction: 'up', which: 'milk or sugar with heat' },
      { input: 'fatLot', direction: 'either', which: 'old oils yellow' }, { input: 'oilTemperatureC', direction: 'up' },
    ],
    prevention: 'Colours that stand lye, cooler, no gel for light designs, some white pigment, a test pour.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'embeds' },
  },
  {
    slug: 'vanilla-browning', name: 'Vanilla browning', otherNames: ['browning'],
    kind: 'cosmetic', family: 'colour', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Even tan to dark brown wherever the scent is, starting at the surface and deepening for 2 to 14 days after the cut; full by week 4. May stain cloths.',
    severity: { 1: 'Cream to tan, and planned for', 2: 'Brown, design darkened', 3: 'Dark brown against a light design' },
    lookAlikes: [
      { name: 'Overheated milk or sugar', howToTell: 'From the first day, in unscented parts as well.' },
      { fault: 'orange-spots', name: 'Rancidity', howToTell: 'Orange spots and a smell.' },
    ],
    suspects: [
      { input: 'vanillinPct', direction: 'up', which: 'share in the scent times load' }, { input: 'fragrancePct', direction: 'up' },
      { input: 'fragranceLot', direction: 'either' }, { input: 'gel', direction: 'up' },
    ],
    prevention: 'Ask the supplier for the vanillin share, plan for brown or leave a part unscented, use less.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
  },
  {
    slug: 'colour-bleed', name: 'Bleeding', otherNames: ['migration', 'halo'],
    kind: 'cosmetic', worsensTo: 'functional', family: 'colour', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'A colour leaves its layer: a fuzzy halo along a line or a tinted neighbour, wider by the day until week 6; or the lather is coloured.',
    severity: { 1: 'Edge blurred, under 1 mm', 2: '1 to 3 mm, or the neighbour tinted', 3: 'Design lost, lather coloured, or it stains' },
    lookAlikes: [
      { fault: 'glycerin-rivers', name: 'Glycerin rivers', howToTell: 'Do not follow the line.' },
      { name: 'Swirl', howToTell: 'The same in both photos, no growth.' },
    ],
    suspects: [
      { input: 'colourant', direction: 'either', which: 'water-soluble dyes, some lakes' }, { input: 'colourantLot', direction: 'either' },
      { input: 'waterToLye', direction: 'up' }, { input: 'humidityPct', direction: 'up' },
    ],
    prevention: 'Oxides, ultramarines and micas that stand lye; dry cure; a bleed test.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'discarded' },
  },
  {
    slug: 'orange-spots', name: 'Orange spots', otherNames: ['DOS', 'dreaded orange spots', 'rancidity'],
    kind: 'functional', family: 'colour', firstSeen: 'cure-w4', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Round orange to brown spots with a fuzzy edge, at or just below the surface, growing; often with a smell of crayons, nuts or old oil. Most come after week 8 and in use.',
    severity: { 1: 'One spot under 3 mm, on 1 bar in 10 at most', 2: 'Several, or it smells', 3: 'Plain smell, or over 10 % of the face' },
    lookAlikes: [
      { name: 'Iron or spice specks', howToTell: 'Do not grow.' },
      { fault: 'vanilla-browning', name: 'Scent browning', howToTell: 'Even, not in spots.' },
      { name: 'Water marks', howToTell: 'No smell.' },
    ],
    suspects: [
      { input: 'fatLot', direction: 'either', which: 'old, or open for long' }, { input: 'formula', direction: 'either', which: 'linoleic-rich oils' },
      { input: 'superfatPct', direction: 'up' }, { input: 'additive', direction: 'either', which: 'chelator and antioxidant lower it' },
      { input: 'season', direction: 'either', which: 'warm, bright storage' },
    ],
    prevention: 'Fresh oil with a date, the high-oleic kind, less superfat, a chelator, a cool dark cure.',
    usually: { 1: 'rebatch', 2: 'discarded', 3: 'discarded' },
  },
  {
    slug: 'colour-specks', name: 'Colour specks', otherNames: ['undispersed colour', 'specks'],
    kind: 'cosmetic', family: 'colour', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Points of pure colour in the face that streak when rubbed.',
    severity: { 1: 'A few', 2: 'All over', 3: 'Streaks hands' },
    lookAlikes: [
      { name: 'Exfoliants', howToTell: 'Meant to be there, do not streak.' },
      { fault: 'stearic-spots', name: 'Stearic spots', howToTell: 'White and waxy.' },
    ],
    suspects: [
      { input: 'colourant', direction: 'either', which: 'white pigment, ultramarine, charcoal that clump' }, { input: 'colourantLot', direction: 'either' },
      { input: 'trace', direction: 'either', which: 'thick trace' }, { input: 'maker', direction: 'either', which: 'dry powder into the batter' },
    ],
    prevention: 'Stir the powder into oil, water or glycerine first and strain it.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
  },
];
