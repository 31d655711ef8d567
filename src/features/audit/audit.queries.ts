import { infiniteQueryOptions } from '@tanstack/react-query';
import { auditApi } from '#shared/audit.ts';
import { call } from '#src/lib/call.ts';

export interface TrailFilter {
  recordId?: string | undefined;
  memberId?: string | undefined;
  table?: string | undefined;
}

/** The trail of changes, newest first, fifty at a time. */
export function trailQuery(filter: TrailFilter) {
  return infiniteQueryOptions({
    queryKey: ['audit', 'trail', filter],
    queryFn: ({ signal, pageParam }) => call(auditApi.list, { query: { ...filter, cursor: pageParam ?? undefined }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
  });
}
