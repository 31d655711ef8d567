import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { demoAccountsQuery } from './session.queries.ts';

/** After something was mailed; a machine without a mail server says where the mail waits. */
export function MailIsOnItsWay({ children }: { children: ReactNode }) {
  const keepsMailsHere = useQuery(demoAccountsQuery).isSuccess;
  return (
    <div role="status" className="grid gap-2">
      <p>{children}</p>
      {keepsMailsHere && <p className="border-l-4 border-line-firm bg-tray px-3 py-2 text-note text-ink-2">This machine sends no mail. Mails wait in the outbox, which an owner reads under Workshop, Outbox.</p>}
    </div>
  );
}
