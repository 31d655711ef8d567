import { queryOptions } from '@tanstack/react-query';
import { outboxApi } from '#shared/outbox.ts';
import { call } from '#src/lib/call.ts';

/** Mails kept on this machine; the page is not there in production. */
export const outboxQuery = queryOptions({
  queryKey: ['outbox', 'list'],
  queryFn: async ({ signal }) => (await call(outboxApi.list, { signal })).items,
  retry: false,
});
