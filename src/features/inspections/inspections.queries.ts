import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { inspectionsApi, type InspectionView } from '#shared/inspections.ts';
import type { Stage } from '#shared/words/stages.ts';
import { call } from '#src/lib/call.ts';

/** Inspections of a batch, oldest first. */
export function inspectionsOfBatchQuery(batchId: string) {
  return queryOptions({
    queryKey: ['inspections', 'of-batch', batchId],
    queryFn: async ({ signal }) => (await call(inspectionsApi.ofBatch, { params: { batchId }, signal })).items,
  });
}

/** What wants looking at, most overdue first. */
export const dueQuery = queryOptions({
  queryKey: ['inspections', 'due'],
  queryFn: async ({ signal }) => (await call(inspectionsApi.due, { query: {}, signal })).items,
});

/** Faults likely at a stage of a batch, likeliest first. */
export function likelyFaultsQuery(batchId: string, stage: Stage) {
  return queryOptions({
    queryKey: ['inspections', 'likely', batchId, stage],
    queryFn: async ({ signal }) => (await call(inspectionsApi.likely, { query: { stage, batchId }, signal })).items,
    staleTime: 5 * 60_000,
  });
}

/** Writes one inspection, as the server answered it, into the list of its batch. */
export function putInspection(client: QueryClient, inspection: InspectionView): void {
  client.setQueryData(inspectionsOfBatchQuery(inspection.batchId).queryKey, (list: InspectionView[] | undefined) => {
    if (!list) return [inspection];
    return list.some(({ id }) => id === inspection.id) ? list.map((other) => (other.id === inspection.id ? inspection : other)) : [...list, inspection];
  });
}
