import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { Stage } from '#shared/words/stages.ts';
import type { Random } from '../random.ts';
import { quernbyScentLots } from './quernby-scent-lots.ts';
import type { BatchInputs, HistoryFinding, TrueFault } from './types.ts';

const ofFault: Readonly<Partial<Record<CatalogueSlug, readonly string[]>>> = {
  'soda-ash': ['Mostly along the window side.', 'White on the crests of the swirl only.', 'Wiped with a damp cloth, came back overnight.', 'Steamed the worst ones.', 'Top looks frosted.'],
  'glycerin-rivers': ['Like cracked glaze, only in the white part.', 'Have to tilt it to see them.', 'Pretty, if you like that sort of thing.'],
  ricing: ['Grains came a minute after the scent.', 'Looks like cottage cheese.', 'Stick blended it out, mostly.', 'Same as the last one with this drum.'],
  acceleration: ['Thick trace in under a minute.', 'No time for the swirl, spooned it in.', 'Moved as soon as the scent went in.', 'Had to bang it down hard to get it into the corners.'],
  seizing: ['Stood like a brick.', 'Pressed it in by hand, double gloves.'],
  'partial-gel-ring': ['Dark oval, goes right through.', 'Ring in the middle bars, ends are clear.'],
  'air-pockets': ['Big one behind the second bar.', 'Packed too cool, did not flow together.', 'Pinholes, tapped it too little.'],
  'vanilla-browning': ['Darker than last week.', 'Brown from the rim inwards, as expected.', 'Colour of toast.'],
  'scent-fade': ['Have to scratch it to smell anything.', 'Against the kept bar: half, at most.', 'Benedikt and I both said nothing.'],
  'overheating-crack': ['Split along the top two hours after the pour.', 'Hairline, closed by morning.'],
  'soft-sticky': ['Thumb print stays.', 'Gave it another day.', 'Sticks to the glove.'],
  'orange-spots': ['One on the edge, smells of crayons.', 'Three on the same bar.', 'Small and round, were not there last time.'],
  sweating: ['Beads all over, humid week.', 'Fan on.'],
  'drag-marks': ['Wire needs tightening.', 'Wipes off with a thumb.', 'Plane took most of it.'],
  'stearic-spots': ['Little white dots, waxy.', 'Fats were barely clear when I mixed.'],
  'stuck-in-mould': ['Corner stayed behind.', 'Froze it for an hour.'],
  'off-smell': ['Wet cardboard under the rose.', 'Not what is on the bottle.'],
  'lye-heavy': ['Strong pink on the drop.'],
};

/** A few words beside a finding; most findings have none. */
export function findingNote(r: Random, fault: CatalogueSlug, stage: Stage): string | undefined {
  const words = ofFault[fault];
  if (!words || !r.chance(stage === 'pour' || stage === 'cut' ? 0.45 : 0.25)) return undefined;
  return r.pick(words);
}

const whenClear: Readonly<Partial<Record<Stage, readonly string[]>>> = {
  pour: ['Poured like cream.', 'Nice and slow.', 'As drawn.'],
  unmould: ['Came out clean.', 'Firm, sharp edges.'],
  cut: ['Clean cut, good colour.', 'Best of the month.', 'Even bars.'],
  'cure-w1': ['Turned.', 'Turned, all dry.'],
  'cure-w4': ['Smells right.', 'Hard and dry.'],
  release: ['Wrapped.', 'Ready for the market.'],
};

export function inspectionNote(r: Random, stage: Stage, findings: readonly HistoryFinding[]): string | undefined {
  const words = whenClear[stage];
  return words && findings.length === 0 && r.chance(0.16) ? r.pick(words) : undefined;
}

/** What the maker wrote on the card, in the maker's own way. */
export function batchNote(r: Random, inputs: BatchInputs, truth: readonly TrueFault[]): string | null {
  const has = (fault: CatalogueSlug) => truth.some((f) => f.fault === fault);
  const lot = quernbyScentLots.find((l) => l.code === inputs.fragranceLot);
  const said: string[] = [];
  const say = (chance: number, ...words: string[]) => { if (r.chance(chance)) said.push(r.pick(words)); };
  if (has('acceleration') || has('seizing')) say(0.8, `${inputs.fragranceLot ?? 'Scent'} again: thick the moment it went in.`, 'Went from soup to porridge in twenty seconds.', 'Next time by whisk only.');
  if (inputs.hasEmbeds) say(1, 'Embeds roughened and warmed first.');
  if (inputs.roomTemperatureC < 15.5) say(0.5, 'Loft was freezing this morning.', 'Could see my breath.');
  if (inputs.humidityFraction > 0.68) say(0.4, 'Damp all day, windows running.');
  if (inputs.oilTemperatureC < 33 && inputs.method.startsWith('cold')) say(0.5, 'Fats a bit cool, a little cloudy.');
  if (inputs.waterToLye > 2.4 && inputs.method.startsWith('cold')) say(0.35, 'Extra water to have time for the swirl.');
  if (inputs.method === 'hot') say(0.2, 'Packed it in layers and knocked it down.', 'Cook went quickly today.', 'A bit dry by the time the scent was in.');
  if (inputs.method === 'hot-fluid') say(0.25, 'Poured almost like cold.', 'Lactate does help.');
  if (inputs.method === 'cold-oven') say(0.25, 'Oven at 70, off after an hour.');
  if (inputs.isSprayed) say(0.08, 'Three sprays right after the pour.');
  if (lot?.scent === 'bakehouse') say(0.25, 'Will go brown, poured it all one colour.');
  if (inputs.formula === 'hotel') say(0.3, 'For Fennick House.');
  if (inputs.formula === 'milk-and-oat') say(0.25, 'Milk was frozen hard, lye in by the spoon.');
  say(0.12, 'Market batch.', 'Shop is low on these.', 'New liner.', 'Scale checked.', 'Two hours all told.');
  return said.length > 0 ? said.slice(0, 2).join(' ') : null;
}
