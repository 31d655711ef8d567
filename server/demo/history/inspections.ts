import { type CatalogueSlug, catalogueFault } from '#server/features/faults/catalogue.ts';
import { checklistFor } from '#server/features/faults/checklist.ts';
import { inspectionPlan } from '#server/features/inspections/plan.ts';
import { addDays } from '#shared/units/days.ts';
import { type Stage, stageOrder } from '#shared/words/stages.ts';
import { randomOf } from '../random.ts';
import { instantAt } from './calendar.ts';
import { isLinoleicRich } from './inputs.ts';
import { findingOf, showsAt } from './looks.ts';
import { inspectionNote } from './notes.ts';
import { readingsAt } from './readings.ts';
import { type BatchTimes, lookMinutes, rackDay } from './times.ts';
import type { BatchInputs, HistoryFinding, HistoryInspection, TrueFault } from './types.ts';

/** Chance that nobody came at all, by stage. Before a bar is sold somebody always looks. */
const missed: Readonly<Record<Stage, number>> = {
  pour: 0.03, unmould: 0.05, cut: 0.04, 'cure-w1': 0.2, 'cure-w2': 0.3, 'cure-w4': 0.12, 'cure-w6': 0.18, release: 0, 'in-use': 1,
};
/** Share of looks that also answer what may be answered. */
const thorough = 0.35;

export interface LookedAt {
  seed: number;
  code: string;
  madeOn: string;
  times: BatchTimes;
  inputs: BatchInputs;
  truth: readonly TrueFault[];
  /** Nothing is dated on or after this day. */
  today: string;
  timeZone: string;
  cureWeeks?: number | undefined;
  /** Faults the story settles: somebody looks for them without fail. */
  settled: ReadonlySet<CatalogueSlug>;
  /** The batch ended at this stage. */
  lastStage?: Stage | undefined;
}

/** Every look at a batch that was really taken, in order, with its answers. A missed look leaves nothing behind. */
export function drawInspections(batch: LookedAt): HistoryInspection[] {
  const { times, inputs } = batch;
  const plan = inspectionPlan({
    method: inputs.method, madeOn: batch.madeOn, unmouldedOn: times.unmouldedOn, cutOn: times.cutOn,
    linoleicRich: isLinoleicRich(inputs), cureWeeks: batch.cureWeeks,
  });
  return plan.flatMap((look) => {
    if (batch.lastStage && stageOrder(look.stage) > stageOrder(batch.lastStage)) return [];
    const r = randomOf(batch.seed, 'look', batch.code, look.stage);
    const isMissed = r.chance(missed[look.stage]) && !mustLook(batch, look.stage);
    const when = whenLooked(batch, look, r);
    if (isMissed || when.day >= batch.today) return [];
    const minutes = when.minutes ?? lookMinutes(r);
    const isThorough = r.chance(thorough);
    const barsLookedAt = barsAt(look.stage, inputs.bars, r.unit());
    const { answers, findings } = answersAt(batch, look.stage, isThorough, barsLookedAt);
    const note = inspectionNote(randomOf(batch.seed, 'look-note', batch.code, look.stage), look.stage, findings);
    return [{
      stage: look.stage, at: instantAt(when.day, minutes, batch.timeZone), inspector: when.inspector,
      barsLookedAt, answers, findings,
      readings: readingsAt(randomOf(batch.seed, 'readings', batch.code, look.stage), look.stage, inputs), ...(note ? { note } : {}),
    }];
  });
}

/** Looks that show what the story depends on are never missed. */
function mustLook(batch: LookedAt, stage: Stage): boolean {
  return [...batch.settled].some((fault) => catalogueFault(fault).firstSeen === stage || (fault === 'lye-heavy' && (stage === 'cut' || stage === 'cure-w1')));
}

function whenLooked(batch: LookedAt, look: { stage: Stage; from: string; to: string }, r: ReturnType<typeof randomOf>): { day: string; minutes?: number; inspector: string } {
  const { times, inputs, madeOn } = batch;
  if (look.stage === 'pour') return { day: madeOn, minutes: times.pourMinutes + r.whole(6, 30), inspector: inputs.maker };
  if (look.stage === 'unmould') return { day: times.unmouldedOn, minutes: times.unmouldMinutes + r.whole(2, 12), inspector: inputs.maker };
  if (look.stage === 'cut') return { day: times.cutOn, minutes: times.cutMinutes + r.whole(4, 25), inspector: inputs.maker };
  const span = look.stage === 'release' ? { from: addDays(look.to, 1), to: addDays(look.to, 6) } : look;
  const rack = rackDay(r, span.from, span.to);
  const wraps = look.stage === 'release' ? 'noor' : 'ilse';
  return { day: rack.day, inspector: rack.isInspectorIn ? 'benedikt' : wraps };
}

/** No bars before the cut; then mostly all of them, in a hurry the ends, a few between and the worst. */
function barsAt(stage: Stage, bars: number, draw: number): number | null {
  if (stage === 'pour' || stage === 'unmould') return null;
  return stage !== 'release' && draw < 0.12 ? Math.min(bars, Math.max(6, Math.round(bars / 3))) : bars;
}

function answersAt(batch: LookedAt, stage: Stage, isThorough: boolean, barsLookedAt: number | null): Pick<HistoryInspection, 'answers' | 'findings'> {
  const skips = batch.inputs.maker === 'tomasz' ? 0.12 : 0.04;
  const answers: HistoryInspection['answers'] = [];
  const findings: HistoryFinding[] = [];
  for (const { fault, answer } of checklistFor(stage, batch.inputs.method)) {
    if (answer === 'may' && !isThorough) continue;
    const r = randomOf(batch.seed, 'answer', batch.code, stage, fault);
    const isSkipped = r.chance(skips) && !batch.settled.has(fault);
    const shows = showsAt(batch.truth, fault, stage);
    if (isSkipped) answers.push({ fault, answer: 'not-checked' });
    else if (!shows) answers.push({ fault, answer: 'clear' });
    else {
      answers.push({ fault, answer: 'found' });
      findings.push(findingOf(stage, randomOf(batch.seed, 'finding', batch.code, stage, fault), shows, barsLookedAt));
    }
  }
  return { answers, findings };
}
