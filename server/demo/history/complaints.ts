import { addDays } from '#shared/units/days.ts';
import { randomOf } from '../random.ts';
import { instantAt, storyStart, weekOf } from './calendar.ts';
import type { HistoryBatch, HistoryInspection } from './types.ts';

const smells = ['Customer at the Saturday market: no smell at all.', 'By mail: smells of soap and nothing else.', 'Shop: two people asked whether we forgot the lime.', 'By mail: lovely bar, no scent.', 'Brought back one bar, wanted the lavender instead.', 'Market: could not smell it, kept the bar.'];
const reactionWeek = 88;

/** Complaints are looks at stage "in use", kept apart from the inspections of the workshop. */
export function complaintsAbout(batches: HistoryBatch[], { seed, today, timeZone }: { seed: number; today: string; timeZone: string }): void {
  const r = randomOf(seed, 'complaints');
  const add = (batch: HistoryBatch, day: string, look: Omit<HistoryInspection, 'at' | 'stage' | 'readings' | 'barsLookedAt'>) => {
    if (day < today) batch.inspections.push({ stage: 'in-use', at: instantAt(day, r.whole(600, 1000), timeZone), barsLookedAt: 1, readings: [], ...look });
  };
  const soldOn = (batch: HistoryBatch) => batch.inspections.find((look) => look.stage === 'release')?.at.slice(0, 10);

  const faded = batches.filter((b) => b.state === 'closed' && b.inputs.fragranceLot?.startsWith('LS-') && b.truth.some((f) => f.fault === 'scent-fade'));
  const old = faded.filter((b) => addDays(soldOn(b) ?? today, 40) < today);
  smells.forEach((note, n) => {
    const batch = old[n % Math.max(1, old.length)];
    const sold = batch && soldOn(batch);
    if (!batch || !sold) return;
    add(batch, addDays(sold, r.whole(8, 38)), {
      inspector: 'noor', note, answers: [{ fault: 'scent-fade', answer: 'found' }], findings: [{ fault: 'scent-fade', severity: r.chance(0.5) ? 3 : 2, bars: null }],
    });
  });

  const complained = weekOf(storyStart(today), reactionWeek);
  const clove = batches.filter((b) => b.inputs.fragranceLot === 'CS-6001' && b.state === 'closed' && (soldOn(b) ?? today) < complained).at(-1);
  if (!clove) return;
  add(clove, addDays(complained, 1), {
    inspector: 'ilse', note: 'By phone: red, itching hands after washing with the clove bar, gone in two days. Sale of all clove batches stopped the same day.',
    answers: [{ fault: 'customer-reaction', answer: 'found' }], findings: [{ fault: 'customer-reaction', severity: 3, bars: null, note: 'Her words, not ours. Asked her to see a doctor if it comes back.' }],
  });
  add(clove, addDays(complained, 3), {
    inspector: 'benedikt', note: 'Kept bars of all clove batches checked. Closed: no excess alkali, allergen named on the label.',
    answers: [{ fault: 'lye-heavy', answer: 'clear' }, { fault: 'lye-pockets', answer: 'clear' }], findings: [],
  });
}
