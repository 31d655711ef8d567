import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { batchesApi, type BatchesChoice, type ChangeBatch, type NewBatchInput } from '#shared/batches.ts';
import { exportsApi } from '#shared/exports.ts';
import { addressOf, call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

/** A filter as it stands in an address: only what was chosen. */
export type BatchesAsk = Partial<BatchesChoice>;

/** What travels: lists as one text. */
function sent({ method, state, lot, maker, formula, ...rest }: BatchesAsk) {
  const joined = (list: readonly string[] | undefined) => (list && list.length > 0 ? list.join(',') : undefined);
  return { ...rest, method: joined(method), state: joined(state), lot: joined(lot), maker: joined(maker), formula: joined(formula) };
}

/** The log, page after page. */
export function batchesQuery(ask: BatchesAsk) {
  return infiniteQueryOptions({
    queryKey: ['batches', 'list', ask],
    queryFn: ({ pageParam, signal }) => call(batchesApi.list, { query: { ...sent(ask), ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
    initialPageParam: '',
    getNextPageParam: (page) => page.next ?? undefined,
  });
}

export function batchCountQuery(ask: BatchesAsk) {
  return queryOptions({ queryKey: ['batches', 'count', ask], queryFn: ({ signal }) => call(batchesApi.count, { query: sent(ask), signal }) });
}

export function batchQuery(batchId: string) {
  return queryOptions({ queryKey: ['batches', 'one', batchId], queryFn: ({ signal }) => call(batchesApi.read, { params: { batchId }, signal }) });
}

export const mouldsQuery = queryOptions({
  queryKey: ['batches', 'moulds'],
  queryFn: async ({ signal }) => (await call(batchesApi.moulds, { signal })).items,
});

/** Address of the same rows as CSV. */
export function batchesCsvAddress(ask: BatchesAsk): string {
  return addressOf(exportsApi.batches, {}, sent(ask));
}

export function useLogBatch() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: NewBatchInput) => call(batchesApi.create, { body: wish }),
    onSuccess: (batch) => {
      client.setQueryData(batchQuery(batch.id).queryKey, batch);
      return invalidateAfter(client, 'batches');
    },
  });
}

export function useChangeBatch(batchId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ change, version }: { change: ChangeBatch; version: number }) => call(batchesApi.change, { params: { batchId }, body: change, version }),
    onSuccess: (batch) => {
      client.setQueryData(batchQuery(batch.id).queryKey, batch);
      return invalidateAfter(client, 'batches');
    },
  });
}
