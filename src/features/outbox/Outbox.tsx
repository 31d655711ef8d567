import { useQuery } from '@tanstack/react-query';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatCount, formatInstant } from '#src/lib/format.ts';
import { MailBody } from './MailBody.tsx';
import { outboxQuery } from './outbox.queries.ts';

/** Mails that a machine without a mail server keeps; for development, never in production. */
export function Outbox() {
  const { workshop } = useSession();
  const mails = useQuery(outboxQuery);
  if (mails.isPending) return <LoadingShape says="Reading the outbox" rows={4} rowClassName="h-24" />;
  if (mails.isError) return <ErrorState error={mails.error} onRetry={() => void mails.refetch()} />;
  return (
    <section className="grid max-w-3xl gap-6">
      <Rail heading="Outbox" aside={formatCount(mails.data.length, 'mail')} />
      <p className="text-ink-2">This machine sends no mail: what would leave waits here. The page is not there in production.</p>
      {mails.data.length === 0 && <EmptyState title="No mails yet.">Invite somebody, or ask for a new password at the door.</EmptyState>}
      {mails.data.map(({ id, recipient, subject, body, createdAt }) => (
        <article key={id} className="grid gap-2 border-b border-line pb-5">
          <h3 className="text-rail">{subject}</h3>
          <p className="text-note text-ink-2">To {recipient}, {formatInstant(createdAt, workshop.timeZone)}</p>
          <MailBody body={body} />
        </article>
      ))}
    </section>
  );
}
