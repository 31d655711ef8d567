import { queryOptions } from '@tanstack/react-query';
import { inspectionsApi } from '#shared/inspections.ts';
import { call } from '#src/lib/call.ts';

/** Inspections of a batch, oldest first. */
export function inspectionsOfBatchQuery(batchId: string) {
  return queryOptions({
    queryKey: ['inspections', 'of-batch', batchId],
    queryFn: async ({ signal }) => (await call(inspectionsApi.ofBatch, { params: { batchId }, signal })).items,
  });
}
