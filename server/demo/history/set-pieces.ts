import { daysBetween } from '#shared/units/days.ts';
import { familyOf } from '#shared/words/methods.ts';
import { randomOf } from '../random.ts';
import { complaintsAbout } from './complaints.ts';
import type { Pin, StoryPart } from './pins.ts';
import type { BatchInputs, HistoryBatch } from './types.ts';

interface Draft { place: number; code: string; slot: { madeOn: string; week: number }; pin: Pin | undefined; inputs: BatchInputs }

const embeddedBatches = 5;
const embedBars = 2;

/**
 * Which Charcoal batches hold embeds, and cut from which Everyday batch.
 * One of the five takes them from a batch that holds the bad lot, which a recall must follow.
 */
export function joinEmbeds(seed: number, drafts: readonly Draft[]): Map<string, string[]> {
  const donor = drafts.find((d) => d.pin?.part === 'donor');
  const hosts = drafts.filter((d) => d.inputs.formula === 'charcoal' && d.pin === undefined && familyOf(d.inputs.method) === 'cold'
    && donor !== undefined && daysBetween(donor.slot.madeOn, d.slot.madeOn) > 28);
  const donors = drafts.filter((d) => d.inputs.formula === 'everyday' && d.pin === undefined && familyOf(d.inputs.method) === 'cold');
  const r = randomOf(seed, 'embeds');
  const chosen = [hosts[0], ...r.shuffle(hosts.slice(1)).slice(0, embeddedBatches - 1)];
  const joined = new Map<string, string[]>();
  chosen.forEach((host, n) => {
    if (!host) return;
    const old = donors.filter((d) => {
      const age = daysBetween(d.slot.madeOn, host.slot.madeOn);
      return age > 28 && age < 120 && ![...joined.values()].flat().includes(d.code);
    });
    const from = n === 0 ? donor : old.length > 0 ? r.pick(old) : undefined;
    if (from) joined.set(host.code, [from.code]);
  });
  return joined;
}

/** Which batch each rebatch, in order, was made of. */
const sources: readonly StoryPart[] = ['soft-then-rebatched', 'seized-then-rebatched', 'castor-left-out', 'soft-milk-then-rebatched'];

/** Ties rebatches and embeds to the bars they are made of, on both sides. */
export function joinRebatches(batches: HistoryBatch[], pins: ReadonlyMap<number, Pin>): void {
  batches.filter((batch) => batch.inputs.method === 'rebatch').forEach((rebatch, n) => {
    const part = sources[n];
    const source = batches.find((_, place) => part !== undefined && pins.get(place)?.part === part);
    if (!source) return;
    rebatch.holdsBarsOf = [source.code];
    rebatch.note = `Rebatch R${n + 1}, from ${source.code}. Grated fine, a splash of water, cooked until it slid off the spoon.`;
    const fault = source.truth.find((f) => f.severity === 3)?.fault ?? 'seizing';
    const kept = source.inputs.bars > 2 ? 1 : 0;
    source.dispositions = [{ kind: 'rebatch', bars: source.inputs.bars - kept, fault }, { kind: 'kept', bars: kept, fault: null }];
  });
  for (const host of batches.filter((batch) => batch.inputs.hasEmbeds)) {
    for (const code of host.holdsBarsOf) {
      const donor = batches.find((batch) => batch.code === code);
      if (donor) giveBars(donor);
    }
  }
}

function giveBars(donor: HistoryBatch): void {
  for (const kind of ['seconds', 'firsts'] as const) {
    const row = donor.dispositions.find((d) => d.kind === kind && d.bars > embedBars);
    if (!row) continue;
    row.bars -= embedBars;
    donor.dispositions.push({ kind: 'embeds', bars: embedBars, fault: row.fault, note: 'Cut up for a Charcoal.' });
    return;
  }
}

/** What came in after bars were sold, and what stays held. */
export function afterTheFact(batches: HistoryBatch[], when: { seed: number; today: string; timeZone: string }): void {
  complaintsAbout(batches, when);
}
