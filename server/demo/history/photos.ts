import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { type Stage, stageOrder } from '#shared/words/stages.ts';
import { type Random, randomOf } from '../random.ts';
import { offsetMinutes } from './calendar.ts';
import { allShowingAt } from './looks.ts';
import type { HistoryInspection, HistoryPhoto, TrueFault } from './types.ts';

/** Faults that no picture shows. */
const unseen = new Set<CatalogueSlug>(['scent-fade', 'off-smell', 'acceleration', 'soft-sticky', 'lye-heavy', 'false-trace', 'customer-reaction']);

/** Each person's phone, as it signs its pictures. */
const cameras: Readonly<Record<string, string>> = {
  ilse: 'Halvorsen P5', tomasz: 'Brightmoor X2', priya: 'Halvorsen P5 mini', benedikt: 'Corrie One', noor: 'Brightmoor S', maren: 'Corrie One', jory: 'Brightmoor X2',
};

export interface Photographed {
  seed: number;
  code: string;
  truth: readonly TrueFault[];
  inspections: readonly HistoryInspection[];
  timeZone: string;
}

/**
 * Pictures of a batch: the cut always, other stages when a fault shows there,
 * the same loaf again in week 4, and now and then a clear one.
 */
export function drawPhotos(batch: Photographed): HistoryPhoto[] {
  const visible = batch.truth.filter((f) => !unseen.has(f.fault));
  return batch.inspections.flatMap((look) => {
    const r = randomOf(batch.seed, 'photo', batch.code, look.stage);
    const shows = allShowingAt(batch.truth, look.stage);
    if (!r.chance(wish(look.stage, visible, shows))) return [];
    const day = look.at.slice(0, 10);
    return [{
      stage: look.stage, takenAt: minutesLater(look.at, r), offsetMinutes: offsetMinutes(day, batch.timeZone),
      camera: cameras[look.inspector] ?? 'Corrie One', uploadedBy: look.inspector, hasGreyCard: r.chance(0.8),
      shows: shows.map(({ fault, severity, bars }) => ({ fault, severity, bars })),
      marks: look.findings.map((finding) => finding.fault).filter((fault) => !unseen.has(fault)),
    }];
  });
}

function wish(stage: Stage, visible: readonly TrueFault[], shows: readonly TrueFault[]): number {
  if (stage === 'cut' || stage === 'in-use') return 1;
  const seen = shows.filter((f) => !unseen.has(f.fault));
  const isFirst = seen.some((f) => f.from === stage);
  if (isFirst) return 1;
  const isFaulty = visible.some((f) => stageOrder(f.from) <= stageOrder(stage));
  if (stage === 'cure-w4') return isFaulty ? 0.75 : 0.08;
  if (stage === 'pour') return 0.13;
  if (stage === 'cure-w1' || stage === 'cure-w2') return seen.some((f) => f.grows) ? 0.4 : 0.05;
  return stage === 'release' ? (seen.length > 0 ? 0.25 : 0.04) : seen.length > 0 ? 0.15 : 0.04;
}

function minutesLater(at: string, r: Random): string {
  return new Date(Date.parse(at) + r.whole(1, 9) * 60_000 + r.whole(0, 59) * 1000).toISOString();
}
