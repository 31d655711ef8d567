import { storyStart } from './calendar.ts';
import { quernbyLots } from './lots.ts';
import { fats, otherMaterials, scents } from './materials.ts';
import { isOrdinary } from './ordinary-counts.ts';
import { quernbyStory } from './quernby-batches.ts';
import { quernbyFormulas } from './quernby-formulas.ts';
import { quernbyMoulds, quernbyPeople, quernbySuppliers } from './quernby-people.ts';
import type { HistoryBatch, WorkshopHistory } from './types.ts';
import { quernbyUnfinished } from './unfinished.ts';

/** First seed that is tried. */
const firstSeed = 94;
const triedSeeds = 400;
const timeZone = 'Europe/London';

/**
 * The first invented workshop: two years of batches that end on the day before `today` (YYYY-MM-DD).
 *
 * Days of the week and seasons move with `today`, so one seed cannot suit every day: the
 * first is taken whose draw gives the named batches a fitting place and shows the faults
 * as often as such workshops do. The same day always gives the same workshop.
 */
export function quernbyLoft(today: string): WorkshopHistory {
  for (let seed = firstSeed; seed < firstSeed + triedSeeds; seed += 1) {
    const story = quernbyStory(seed, today, timeZone);
    if (story && isOrdinary(story)) return quernbyOf(seed, today, story);
  }
  throw new RangeError(`none of ${triedSeeds} seeds gives an ordinary workshop on ${today}`);
}

function quernbyOf(seed: number, today: string, story: HistoryBatch[]): WorkshopHistory {
  const startsOn = storyStart(today);
  const batches = [...story, ...quernbyUnfinished(seed, today, timeZone, story.length)];
  return {
    name: 'Quernby Loft Soapworks', timeZone, currency: 'EUR', batchPrefix: 'QL', nextBatchNumber: batches.length + 1,
    firstPriceMinor: 750, secondPriceMinor: 400, startsOn, people: quernbyPeople, suppliers: quernbySuppliers,
    materials: [...fats, ...otherMaterials, ...scents], lots: quernbyLots(startsOn, batches), formulas: quernbyFormulas, moulds: quernbyMoulds, batches,
  };
}
