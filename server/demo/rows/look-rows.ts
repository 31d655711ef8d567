import type { HistoryBatch, HistoryInspection, WorkshopHistory } from '../history/types.ts';
import { idAt, type Keys, type TableRows } from './keys.ts';

interface Look { batch: HistoryBatch; look: HistoryInspection; key: string }

/** How a look and its findings are named while rows are made. */
export function lookKey(batch: HistoryBatch, look: HistoryInspection): string {
  return `${batch.code} ${look.stage} ${look.at}`;
}

/** Rows of the looks: inspections, their readings, answers and findings. */
export function lookRows(history: WorkshopHistory, keys: Keys): TableRows[] {
  const looks = history.batches.flatMap((batch) => batch.inspections.map((look): Look => ({ batch, look, key: lookKey(batch, look) })));
  const inspections = looks.map(({ batch, look, key }) => ({
    id: keys.make('inspection', key, look.at), batch_id: keys.of('batch', batch.code), stage: look.stage, inspected_at: look.at,
    inspector_id: keys.of('member', look.inspector), bars_looked_at: look.barsLookedAt, note: look.note ?? null, created_at: look.at, updated_at: look.at,
  }));
  return [
    { table: 'inspection', rows: inspections },
    { table: 'reading', rows: looks.flatMap((l) => readingRows(l, keys)) },
    { table: 'checklist_answer', rows: looks.flatMap((l) => answerRows(l, keys)) },
    { table: 'finding', rows: looks.flatMap((l) => findingRows(l, keys)) },
  ];
}

function readingRows({ batch, look, key }: Look, keys: Keys): Record<string, unknown>[] {
  return look.readings.map((reading) => ({
    id: idAt(look.at), batch_id: keys.of('batch', batch.code), inspection_id: keys.of('inspection', key), kind: reading.kind, value: reading.value,
    bar: reading.bar ?? null, read_at: look.at,
  }));
}

function answerRows({ batch, look, key }: Look, keys: Keys): Record<string, unknown>[] {
  return look.answers.map(({ fault, answer }) => ({
    id: idAt(look.at), inspection_id: keys.of('inspection', key), batch_id: keys.of('batch', batch.code), fault, answer,
  }));
}

function findingRows({ batch, look, key }: Look, keys: Keys): Record<string, unknown>[] {
  return look.findings.map((finding) => ({
    id: keys.make('finding', `${key} ${finding.fault}`, look.at), inspection_id: keys.of('inspection', key), batch_id: keys.of('batch', batch.code),
    fault: finding.fault, severity: finding.severity, bars: finding.bars, bars_looked_at: look.barsLookedAt,
    // A complaint counts the one bar it is about.
    bars_affected: finding.bars?.length ?? (look.barsLookedAt === null ? null : 1), note: finding.note ?? null, created_at: look.at, updated_at: look.at,
  }));
}
