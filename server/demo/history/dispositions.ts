import { type CatalogueSlug, catalogueFault } from '#server/features/faults/catalogue.ts';
import type { DispositionKind } from '#shared/words/batch-words.ts';
import { randomOf } from '../random.ts';
import type { HistoryDisposition, HistoryInspection } from './types.ts';

/** Two bars of each batch stay, one wrapped, one open. */
const keptBars = 2;
const rank: readonly DispositionKind[] = ['firsts', 'seconds', 'embeds', 'rebatch', 'discarded'];

/** Where every bar of a batch went, by the worst that was found on it; a bar goes with the fault that settled its way. */
export function drawDispositions(seed: number, code: string, bars: number, inspections: readonly HistoryInspection[]): HistoryDisposition[] {
  const ways = Array.from({ length: bars }, (): { kind: DispositionKind; fault: CatalogueSlug | null } => ({ kind: 'firsts', fault: null }));
  for (const [fault, worst] of worstFindings(inspections)) {
    const kind = wayOf(seed, code, fault, worst.severity);
    for (const bar of worst.bars ?? ways.map((_, n) => n + 1)) {
      const way = ways[bar - 1];
      if (way && rank.indexOf(kind) > rank.indexOf(way.kind)) ways[bar - 1] = { kind, fault };
    }
  }
  const good = ways.filter((way) => way.kind === 'firsts').length;
  const kept = Math.min(keptBars, good > 0 ? good : 0);
  const counts = new Map<string, HistoryDisposition>();
  let left = kept;
  for (const way of ways) {
    const isKept = way.kind === 'firsts' && left > 0;
    if (isKept) left -= 1;
    const kind = isKept ? 'kept' : way.kind;
    const fault = isKept ? null : way.fault;
    const had = counts.get(`${kind}/${fault ?? ''}`);
    counts.set(`${kind}/${fault ?? ''}`, { kind, fault, bars: (had?.bars ?? 0) + 1 });
  }
  return [...counts.values()];
}

type Worst = { severity: 1 | 2 | 3; bars: number[] | null };

function worstFindings(inspections: readonly HistoryInspection[]): Map<CatalogueSlug, Worst> {
  const worst = new Map<CatalogueSlug, Worst>();
  for (const { stage, findings } of inspections) {
    if (stage === 'in-use') continue;
    for (const { fault, severity, bars } of findings) {
      const had = worst.get(fault);
      // Later looks count bars, earlier ones only the loaf.
      if (!had || severity > had.severity || had.bars === null) worst.set(fault, { severity: had && had.severity > severity ? had.severity : severity, bars });
    }
  }
  return worst;
}

/** What a batter did does not send a bar anywhere by itself; what it left in the bars does. */
function wayOf(seed: number, code: string, fault: CatalogueSlug, severity: 1 | 2 | 3): DispositionKind {
  const { kind, usually } = catalogueFault(fault);
  if (fault === 'orange-spots') return severity === 1 ? 'rebatch' : 'discarded';
  if (severity === 1 || kind === 'process') return 'firsts';
  if (severity === 2) return randomOf(seed, 'second', code, fault).chance(0.8) ? 'seconds' : 'firsts';
  const way = usually[3] ?? 'discarded';
  return way === 'hold' ? 'discarded' : way;
}
