import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { Stage } from '#shared/words/stages.ts';
import { randomOf } from '../random.ts';
import { instantAt, storyStart } from './calendar.ts';
import { drawDispositions } from './dispositions.ts';
import { drawInputs } from './inputs.ts';
import { drawInspections } from './inspections.ts';
import { batchNote } from './notes.ts';
import { drawPhotos } from './photos.ts';
import { type Pin, quernbyPins, type StoryPart, suitsTheStory } from './pins.ts';
import { quernbyFormulas } from './quernby-formulas.ts';
import { quernbySchedule, type Slot } from './schedule.ts';
import { afterTheFact, joinEmbeds, joinRebatches } from './set-pieces.ts';
import { stateOf } from './states.ts';
import { asTheStorySays, storyNotes, tracesOf } from './story.ts';
import { timesOf } from './times.ts';
import { drawTruth } from './truth.ts';
import type { BatchInputs, HistoryBatch } from './types.ts';

/** Where a batch of the story ended early. */
const endedAt: Readonly<Partial<Record<StoryPart, Stage>>> = {
  'seized-in-the-pot': 'pour', 'power-cut': 'pour', 'seized-then-rebatched': 'cut', 'castor-left-out': 'cure-w1',
  'soft-then-rebatched': 'cure-w2', 'soft-milk-then-rebatched': 'cure-w2',
};

export function codeOf(place: number): string {
  return `QL-${String(place + 1).padStart(4, '0')}`;
}

/**
 * The 180 batches of the story, with all that was seen of them before `today`;
 * null when the days this seed draws leave the story's named batches no fitting place.
 */
export function quernbyStory(seed: number, today: string, timeZone: string): HistoryBatch[] | null {
  const slots = quernbySchedule(seed, storyStart(today));
  if (!suitsTheStory(slots)) return null;
  const pins = quernbyPins(seed, slots);
  const drafts = slots.map((slot, place) => {
    const pin = pins.get(place);
    return { slot, place, code: codeOf(place), pin, inputs: asTheStorySays(drawInputs(seed, slot, codeOf(place), pin), pin?.part) };
  });
  const embedded = joinEmbeds(seed, drafts);
  const batches = drafts.map((draft) => {
    const donors = embedded.get(draft.code);
    const inputs = donors ? { ...draft.inputs, hasEmbeds: true } : draft.inputs;
    return { ...complete({ ...draft, inputs }, seed, today, timeZone), holdsBarsOf: donors ?? [] };
  });
  joinRebatches(batches, pins);
  afterTheFact(batches, { seed, today, timeZone });
  return batches;
}

interface Draft { slot: Slot; code: string; pin: Pin | undefined; inputs: BatchInputs }

function complete(draft: Draft, seed: number, today: string, timeZone: string): HistoryBatch {
  const { slot, code, pin } = draft;
  const truth = drawTruth(seed, code, draft.inputs, pin);
  const times = timesOf(randomOf(seed, 'times', code), slot.madeOn, draft.inputs);
  const inputs = { ...draft.inputs, mouldHours: times.mouldHours, ...tracesOf(seed, code, draft.inputs, truth) };
  const lastStage = pin?.part ? endedAt[pin.part] : undefined;
  const cureWeeks = quernbyFormulas.find((f) => f.key === inputs.formula)?.cureWeeks;
  const inspections = drawInspections({
    seed, code, madeOn: slot.madeOn, times, inputs, truth, today, timeZone, cureWeeks, lastStage,
    settled: new Set(Object.keys(pin?.faults ?? {}) as CatalogueSlug[]),
  });
  const isGivenUp = lastStage === 'pour';
  const state = isGivenUp ? 'abandoned' : lastStage ? 'closed' : stateOf({ times, madeOn: slot.madeOn, today, inspections, method: inputs.method });
  const dispositions = state === 'closed' ? drawDispositions(seed, code, inputs.bars, inspections) : [];
  return {
    code, week: slot.week, madeOn: slot.madeOn,
    pouredAt: pin?.part === 'power-cut' ? null : instantAt(slot.madeOn, times.pourMinutes, timeZone),
    unmouldedOn: isGivenUp || times.unmouldedOn >= today ? null : times.unmouldedOn,
    cutOn: isGivenUp || times.cutOn >= today ? null : times.cutOn,
    state, inputs, truth, inspections: pin?.part === 'power-cut' ? [] : inspections, dispositions, holdsBarsOf: [],
    note: pin?.part ? storyNotes[pin.part] : batchNote(randomOf(seed, 'note', code), inputs, truth),
    photos: pin?.part === 'power-cut' ? [] : drawPhotos({ seed, code, truth, inspections, timeZone }),
  };
}
