import { addDays, weekday } from '#shared/units/days.ts';
import { randomOf } from '../random.ts';
import { instantAt } from './calendar.ts';
import { drawInputs } from './inputs.ts';
import { drawInspections } from './inspections.ts';
import { drawPhotos } from './photos.ts';
import { codeOf } from './quernby-batches.ts';
import type { Slot } from './schedule.ts';
import { timesOf } from './times.ts';
import type { BatchInputs, HistoryBatch } from './types.ts';

/** What is on the bench while the demo is looked at: two planned, one being made, two in the mould. */
export function quernbyUnfinished(seed: number, today: string, timeZone: string, place: number): HistoryBatch[] {
  const yesterday = workingDayBefore(today);
  const tomorrow = workingDayAfter(today);
  const slot = (madeOn: string, lot: string | null, family: Slot['family'], maker: string): Slot => ({ family, lot, madeOn, week: 105, maker });
  const inMould = [slot(yesterday, 'HL-1102', 'cold', 'tomasz'), slot(yesterday, null, 'cold', 'ilse')].map((s, n) => poured(s, place + n));
  const making = opened(slot(today, 'TF-2251', 'cold', 'tomasz'), place + 2, 'everyday');
  const planned = [slot(tomorrow, 'LS-3365', 'hot', 'priya'), slot(addDays(tomorrow, 0), 'EF-7860', 'cold', 'ilse')].map((s, n) => foreseen(s, place + 3 + n));
  return [...inMould, making, ...planned];

  function base(s: Slot, at: number, inputs: BatchInputs): HistoryBatch {
    return {
      code: codeOf(at), week: 105, madeOn: s.madeOn, pouredAt: null, unmouldedOn: null, cutOn: null, state: 'planned', inputs,
      truth: [], inspections: [], photos: [], dispositions: [], holdsBarsOf: [], note: null,
    };
  }

  function poured(s: Slot, at: number): HistoryBatch {
    const code = codeOf(at);
    const inputs = drawInputs(seed, s, code, { formula: at % 2 === 0 ? 'everyday' : 'high-olive' });
    const times = timesOf(randomOf(seed, 'times', code), s.madeOn, inputs);
    const inspections = drawInspections({ seed, code, madeOn: s.madeOn, times, inputs, truth: [], today, timeZone, settled: new Set(['acceleration']), lastStage: 'pour' });
    return {
      ...base(s, at, { ...inputs, traceAtScent: 'light', traceAtPour: 'medium', minutesToPour: 8, gel: 'not-seen' }), state: 'in-mould', inspections,
      pouredAt: instantAt(s.madeOn, times.pourMinutes, timeZone), photos: drawPhotos({ seed, code, truth: [], inspections, timeZone }),
    };
  }

  function opened(s: Slot, at: number, formula: string): HistoryBatch {
    const inputs = drawInputs(seed, s, codeOf(at), { formula });
    return { ...base(s, at, { ...inputs, gel: 'not-seen' }), state: 'making', note: 'Fats are melting.' };
  }

  function foreseen(s: Slot, at: number): HistoryBatch {
    return base(s, at, { ...drawInputs(seed, s, codeOf(at), { formula: at % 2 === 0 ? 'everyday' : 'charcoal' }), gel: 'not-seen' });
  }
}

function workingDayBefore(day: string): string {
  const before = addDays(day, -1);
  return weekday(before) <= 5 ? before : workingDayBefore(before);
}

function workingDayAfter(day: string): string {
  const after = addDays(day, 1);
  return weekday(after) <= 5 ? after : workingDayAfter(after);
}
