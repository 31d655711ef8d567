import type { FaultDefinition } from './fault-definition.ts';

/** Faults of the inside of the bar, seen on the cut face. */
export const insideFaults: readonly FaultDefinition[] = [
  {
    slug: 'glycerin-rivers', name: 'Glycerin rivers', otherNames: ['mottling', 'crackle'],
    kind: 'cosmetic', family: 'structure', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'rare', rebatch: 'rare' },
    definition: 'Translucent, slightly darker veins or a net like cracked glaze in the body of the bar, best seen in light or white soap, running on across the cut face and smooth to the touch. Does not grow.',
    severity: { 1: 'Only when tilted to the light, or under 5 % of the face', 2: 'Plain at arm’s length, under half the face', 3: 'Over most of a face meant to be even' },
    lookAlikes: [
      { fault: 'colour-bleed', name: 'Bleeding', howToTell: 'A coloured halo along a line of the design.' },
      { fault: 'partial-gel-ring', name: 'Partial-gel ring', howToTell: 'One round boundary, no veins.' },
      { fault: 'overheating-crack', name: 'Cracks', howToTell: 'A nail catches in them.' },
      { name: 'Thin swirl', howToTell: 'Follows the swirl.' },
    ],
    suspects: [
      { input: 'gel', direction: 'up', which: 'full gel' }, { input: 'waterToLye', direction: 'up' }, { input: 'lyeConcentration', direction: 'down' },
      { input: 'colourant', direction: 'either', which: 'white pigment shows them' }, { input: 'oilTemperatureC', direction: 'up', which: 'above 43 °C' },
      { input: 'cover', direction: 'up', which: 'slow cooling' },
    ],
    prevention: 'Stronger lye (35 % or more), cooler, no gel or quick cooling, pigment stirred into oil or water first, less white pigment.',
    usually: { 1: 'firsts', 2: 'firsts', 3: 'seconds' },
  },
  {
    slug: 'partial-gel-ring', name: 'Partial-gel ring', otherNames: ['partial gel', 'ring', 'bull’s eye'],
    kind: 'cosmetic', family: 'structure', firstSeen: 'unmould', extentUnit: 'loaf-then-bars',
    occursIn: { cold: 'usual', hot: 'rare', rebatch: 'never' },
    definition: 'A darker, glassier oval in the middle of the cut face whose edge runs parallel to the mould; the same texture on both sides. Seen at the ends first.',
    severity: { 1: 'Only against the light', 2: 'A plain ring', 3: 'Spoils the design, or soft middle and crumbly edge' },
    lookAlikes: [
      { fault: 'glycerin-rivers', name: 'Glycerin rivers', howToTell: 'Veins.' },
      { name: 'Layer or swirl', howToTell: 'Not parallel to the walls.' },
      { fault: 'heat-tunnels', name: 'Overheating', howToTell: 'Cracks and holes.' },
    ],
    suspects: [
      { input: 'gel', direction: 'either', which: 'partial gel' }, { input: 'roomTemperatureC', direction: 'down' },
      { input: 'mould', direction: 'either', which: 'slab, tall narrow loaf' }, { input: 'cover', direction: 'either', which: 'weak insulation' },
      { input: 'additive', direction: 'up', which: 'milk, sugar' }, { input: 'lyeConcentration', direction: 'down' },
      { input: 'method', direction: 'either', which: 'oven-gelled hardly ever' },
    ],
    prevention: 'All or nothing: insulate or use the oven, or cool it quickly.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
  },
  {
    slug: 'heat-tunnels', name: 'Heat tunnels', otherNames: ['tunnels', 'wrinkled', 'alien brain'],
    kind: 'cosmetic', family: 'structure', firstSeen: 'unmould', extentUnit: 'loaf-then-bars',
    occursIn: { cold: 'usual', hot: 'rare', rebatch: 'never' },
    definition: 'A glossy, wrinkled top, and inside long smooth-walled channels or soft folds. The top shows at unmoulding, the inside at the cut.',
    severity: { 1: 'Top only', 2: 'Channels under 3 mm', 3: 'Channels through the bar; it breaks' },
    lookAlikes: [
      { fault: 'air-pockets', name: 'Air pockets', howToTell: 'Round, with dull walls.' },
      { fault: 'lye-pockets', name: 'Lye pockets', howToTell: 'Wet, and pink with the indicator drop.' },
    ],
    suspects: [
      { input: 'method', direction: 'either', which: 'oven-gelled: too hot or too long' }, { input: 'mould', direction: 'either', which: 'silicone under thick insulation' },
      { input: 'cover', direction: 'up' }, { input: 'additive', direction: 'up', which: 'sugar, milk' }, { input: 'waterToLye', direction: 'up' },
    ],
    prevention: 'A cooler oven, out earlier, less cover.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
    mayHurt: { caution: 'raw', why: 'Liquid in a channel may be lye: check it.' },
  },
  {
    slug: 'stearic-spots', name: 'Stearic spots', otherNames: ['white specks'],
    kind: 'cosmetic', family: 'structure', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'rare', rebatch: 'never' },
    definition: 'Small round waxy white dots inside the bar, as hard as the rest, that neither smear nor wash off.',
    severity: { 1: 'Under 10 on a face', 2: 'All over', 3: 'Feels grainy' },
    lookAlikes: [
      { fault: 'soda-ash', name: 'Soda ash', howToTell: 'On the outside only.' },
      { fault: 'ricing', name: 'Ricing', howToTell: 'Came with the scent, irregular grains.' },
      { fault: 'colour-specks', name: 'Undispersed white pigment', howToTell: 'Bright white, smears.' },
      { fault: 'lye-pockets', name: 'Lye grain', howToTell: 'Pink with the indicator drop.' },
    ],
    suspects: [
      { input: 'oilTemperatureC', direction: 'down', which: 'below 34 °C' }, { input: 'formula', direction: 'either', which: 'tallow, palm, shea, cocoa butter' },
      { input: 'fatLot', direction: 'either', which: 'grainy shea' }, { input: 'gel', direction: 'down' }, { input: 'lyeTemperatureC', direction: 'down' },
    ],
    prevention: 'Melt everything fully, mix warmer, let it gel.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
  },
  {
    slug: 'air-pockets', name: 'Air pockets', otherNames: ['air bubbles', 'voids'],
    kind: 'cosmetic', family: 'structure', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Dry holes, round or irregular, with dull walls: pinholes from blending, larger voids from spooning in a thick mass.',
    severity: { 1: 'Under 5 pinholes on a face', 2: 'One above 3 mm, or many pinholes', 3: 'A void above 10 mm, or bar under weight' },
    lookAlikes: [
      { fault: 'heat-tunnels', name: 'Heat tunnels', howToTell: 'Glossy channels.' },
      { fault: 'lye-pockets', name: 'Lye pockets', howToTell: 'Wet.' },
    ],
    suspects: [
      { input: 'method', direction: 'either', which: 'hot most, fluid less, cold least' }, { input: 'trace', direction: 'up', which: 'thick at pour' },
      { input: 'mould', direction: 'either', which: 'single cavities' }, { input: 'blendSeconds', direction: 'up' },
      { input: 'additive', direction: 'either', which: 'sodium lactate, sugar, yoghurt lower it' }, { input: 'maker', direction: 'either', which: 'tapping, packing' },
    ],
    prevention: 'Let the air out of the blender head, tap the mould, pack in layers; sodium lactate, sugar or yoghurt in hot process.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'embeds' },
  },
  {
    slug: 'embed-detachment', name: 'Embeds falling out', otherNames: ['layers parting', 'embed detachment'],
    kind: 'functional', family: 'structure', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'A chunk or layer comes apart when the bar is bent by hand or cut, or a gap can be seen along it.',
    severity: { 1: 'A hairline gap', 2: 'It moves', 3: 'It falls out' },
    lookAlikes: [{ fault: 'overheating-crack', name: 'Crack', howToTell: 'Within one body of soap.' }],
    suspects: [
      { input: 'embeds', direction: 'up', which: 'fully cured, dry or glossy ones' }, { input: 'colourant', direction: 'either', which: 'thick mica line' },
      { input: 'oilTemperatureC', direction: 'either', which: 'gap in temperature between layers' }, { input: 'spray', direction: 'down', which: 'alcohol between layers' },
    ],
    prevention: 'Roughen and warm the embeds, pour while the lower layer still gives, keep lines thin.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'embeds' },
  },
];
