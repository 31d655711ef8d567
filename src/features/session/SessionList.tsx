import { useQuery } from '@tanstack/react-query';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { formatCount, formatInstant } from '#src/lib/format.ts';
import { deviceWords } from './device-words.ts';
import { openSessionsQuery, useEndSession, useSession } from './session.queries.ts';

/** Devices signed in as me; any of the others can be ended. */
export function SessionList() {
  const { workshop } = useSession();
  const sessions = useQuery(openSessionsQuery);
  const end = useEndSession();
  const { tell } = useToasts();
  return (
    <section>
      <Rail heading="Where I am signed in" aside={sessions.data && formatCount(sessions.data.length, 'device')} />
      {sessions.isPending && <LoadingShape says="Reading where you are signed in" rows={2} rowClassName="h-14" />}
      {sessions.isError && <ErrorState error={sessions.error} onRetry={() => void sessions.refetch()} />}
      <ul>
        {sessions.data?.map(({ key, device, signedInAt, lastSeenAt, isThisOne }) => (
          <li key={key} className="flex min-h-14 items-center gap-3 border-b border-line py-1.5">
            <span className="min-w-0">
              <span className="font-[600]">{deviceWords(device)}</span>
              <br />
              <span className="text-note text-ink-2">{isThisOne ? 'this device' : `last seen ${formatInstant(lastSeenAt, workshop.timeZone)}`}; signed in {formatInstant(signedInAt, workshop.timeZone)}</span>
            </span>
            {!isThisOne && <Block kind="quiet" className="ml-auto" onClick={() => end.mutate(key, { onSuccess: () => tell(`${deviceWords(device)} is signed out`), onError: ({ message }) => tell(message) })}>Sign out there</Block>}
          </li>
        ))}
      </ul>
    </section>
  );
}
