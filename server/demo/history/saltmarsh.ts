import { addDays, weekday } from '#shared/units/days.ts';
import { randomOf } from '../random.ts';
import { instantAt, storyStart } from './calendar.ts';
import { drawDispositions } from './dispositions.ts';
import { drawInspections } from './inspections.ts';
import { fats, otherMaterials } from './materials.ts';
import { batchNote } from './notes.ts';
import { drawPhotos } from './photos.ts';
import { saltmarshInputs, saltmarshScents } from './saltmarsh-inputs.ts';
import { saltmarshFormulas, saltmarshLots, saltmarshMoulds, saltmarshPeople, saltmarshSuppliers } from './saltmarsh-stock.ts';
import { stateOf } from './states.ts';
import { tracesOf } from './story.ts';
import { timesOf } from './times.ts';
import { drawTruth } from './truth.ts';
import type { HistoryBatch, WorkshopHistory } from './types.ts';

const seed = 41;
const timeZone = 'Europe/Amsterdam';
const batchCount = 12;
/** Days between two pours of this workshop. */
const every = 19;

/** The second, small workshop, which stands beside the first so that the wall between them can be tried. */
export function saltmarshKettle(today: string): WorkshopHistory {
  const startsOn = storyStart(today);
  const batches = Array.from({ length: batchCount }, (_, n) => batchOf(n, workingDay(addDays(today, -every * (batchCount - n))), today));
  return {
    name: 'Saltmarsh Kettle', timeZone, currency: 'EUR', batchPrefix: 'SK', nextBatchNumber: batchCount + 1, firstPriceMinor: 680, secondPriceMinor: 350,
    startsOn, people: saltmarshPeople, suppliers: saltmarshSuppliers, materials: [...fats, ...otherMaterials, ...saltmarshScents],
    lots: saltmarshLots(today, batches), formulas: saltmarshFormulas, moulds: saltmarshMoulds, batches,
  };
}

function batchOf(n: number, madeOn: string, today: string): HistoryBatch {
  const code = `SK-${String(n + 1).padStart(4, '0')}`;
  const drawn = saltmarshInputs(seed, n, code, madeOn);
  const truth = drawTruth(seed, code, drawn, undefined);
  const times = timesOf(randomOf(seed, 'times', code), madeOn, drawn);
  const inputs = { ...drawn, mouldHours: times.mouldHours, ...tracesOf(seed, code, drawn, truth) };
  const byName = (key: string) => (key === 'benedikt' || key === 'noor' || key === 'ilse' ? 'maren' : key);
  const inspections = drawInspections({ seed, code, madeOn, times, inputs, truth, today, timeZone, settled: new Set() })
    .map((look) => ({ ...look, inspector: byName(look.inspector) }));
  const state = stateOf({ times, madeOn, today, inspections, method: inputs.method });
  return {
    code, week: n + 1, madeOn, pouredAt: instantAt(madeOn, times.pourMinutes, timeZone),
    unmouldedOn: times.unmouldedOn < today ? times.unmouldedOn : null, cutOn: times.cutOn < today ? times.cutOn : null,
    state, inputs, truth, inspections, photos: drawPhotos({ seed, code, truth, inspections, timeZone }),
    dispositions: state === 'closed' ? drawDispositions(seed, code, inputs.bars, inspections) : [], holdsBarsOf: [],
    note: batchNote(randomOf(seed, 'note', code), inputs, truth),
  };
}

function workingDay(day: string): string {
  return weekday(day) <= 5 ? day : workingDay(addDays(day, -1));
}
