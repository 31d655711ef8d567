import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { familyOf } from '#shared/words/methods.ts';
import { randomOf } from '../random.ts';
import type { StoryPart } from './pins.ts';
import type { BatchInputs, Ingredient, TrueFault } from './types.ts';
import { kohDemandG, superfatFraction } from './weighing.ts';

/** How thick the batter was follows from what went wrong in it. */
export function tracesOf(seed: number, code: string, inputs: BatchInputs, truth: readonly TrueFault[]): Pick<BatchInputs, 'traceAtScent' | 'traceAtPour' | 'minutesToPour'> {
  if (familyOf(inputs.method) !== 'cold') return { traceAtScent: null, traceAtPour: null, minutesToPour: null };
  const r = randomOf(seed, 'trace', code);
  const has = (fault: CatalogueSlug) => truth.some((f) => f.fault === fault);
  const calm = Math.round(r.between(3, 14));
  const atScent = r.weighted([['emulsion', 0.35], ['light', 0.65]] as const);
  if (has('seizing')) return { traceAtScent: atScent, traceAtPour: 'seized', minutesToPour: 1 };
  if (has('acceleration')) return { traceAtScent: atScent, traceAtPour: 'thick', minutesToPour: r.whole(1, 2) };
  return { traceAtScent: atScent, traceAtPour: r.weighted([['light', 0.45], ['medium', 0.5], ['thick', 0.05]] as const), minutesToPour: calm };
}

/** Grams of a line, to the gram the card says. */
function withMass(inputs: BatchInputs, masses: Readonly<Record<string, number>>): BatchInputs {
  const ingredients = inputs.ingredients.map((line): Ingredient => {
    const massG = masses[line.material];
    return massG === undefined ? line : { ...line, massG, shareOfOils: massG / inputs.oilMassG };
  });
  return { ...inputs, ingredients };
}

/** The card of the Everyday formula for 1000 g of oils. */
const everydayCard = { olive: 400, coconut: 270, shea: 150, sunflower: 100, castor: 80, naoh: 141.4 };

/**
 * 151.0 g of alkali were weighed where 141.4 g were due. The owner had 73.57 g
 * more olive oil added, which brings the free fat back to 5.0 %.
 */
function redStop(inputs: BatchInputs): BatchInputs {
  const mended = withMass(inputs, { ...everydayCard, olive: 473.57, naoh: 151, water: Math.round(151 * inputs.waterToLye) });
  return { ...mended, superfatWeighedFraction: superfatFraction(kohDemandG(mended.ingredients), 151) };
}

/** The castor oil was ticked and never added: the card says 5.0 %, the pot had alkali left over. */
function castorLeftOut(inputs: BatchInputs): BatchInputs {
  const card = withMass(inputs, { ...everydayCard, water: Math.round(141.4 * inputs.waterToLye) });
  return { ...card, superfatWeighedFraction: superfatFraction(kohDemandG(card.ingredients), 141.4) };
}

export function asTheStorySays(inputs: BatchInputs, part: StoryPart | undefined): BatchInputs {
  if (part === 'red-stop') return redStop(inputs);
  return part === 'castor-left-out' ? castorLeftOut(inputs) : inputs;
}

/** What the story has people write on a batch. */
export const storyNotes: Readonly<Record<StoryPart, string>> = {
  'red-stop': 'Red stop at weighing: 151.0 g of lye instead of 141.4 g, superfat would have been -1.5 %. Ilse decided: 73.6 g more olive, back to 5.0 %. Made to version 1 to use up the last regular sunflower.',
  'castor-left-out': 'The castor was ticked and stood on the shelf all the time. The card says 5 %, the pot had -2.2 %. Fails alkalinity at the cut, held, goes to rebatch.',
  donor: 'Went thick at once. Two bars cut up as embeds for the next Charcoal.',
  'seized-in-the-pot': 'Solid in the pot before I had the spatula out. Could not get it into the mould. Treated as caustic and given up.',
  'seized-then-rebatched': 'Pressed it in with a potato masher. Inside all pockets. Rebatched in week 41.',
  'power-cut': 'Power cut forty minutes into the cook, mass went cold and parted. Given up.',
  'soft-then-rebatched': 'Still took a thumb print after two weeks. Grated for the rebatch.',
  'soft-milk-then-rebatched': 'Never set up properly, middle like butter at week 2. Grated for the rebatch.',
};
