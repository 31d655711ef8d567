import type { DemoAccounts, OpenSession } from '#shared/session.ts';
import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { SESSION_IDLE_MS } from '#server/http/session.ts';

/** A person's open sessions, the newest first. */
export async function openSessions(tx: LobbyTransaction, accountId: string, thisKey: string): Promise<{ items: OpenSession[] }> {
  const rows = await tx.rows<{ sid: string; device: string | null; signed_in: string; expire: Date }>(
    `select sid, sess ->> 'device' device, sess ->> 'signedInAt' signed_in, expire from web_session where sess ->> 'accountId' = $1 and expire > now() order by expire desc limit 50`,
    [accountId],
  );
  return {
    items: rows.map(({ sid, device, signed_in, expire }) => ({
      key: sid, device: device ?? 'unknown device', signedInAt: new Date(Number(signed_in)).toISOString(),
      lastSeenAt: new Date(expire.getTime() - SESSION_IDLE_MS).toISOString(), isThisOne: sid === thisKey,
    })),
  };
}

/** Accounts of the demo workshops, as the sign-in page shows them. Reads each workshop with its wall set. */
export async function demoAccounts(tx: LobbyTransaction, password: string): Promise<DemoAccounts> {
  const accounts = await tx.rows<{ id: string; email: string }>(`select id, email from account where email like '%.example' order by created_at, email limit 20`);
  const shown: DemoAccounts['accounts'] = [];
  for (const { id, email } of accounts) {
    await tx.asAccount(id);
    const row = await tx.row<DemoAccounts['accounts'][number]>(
      `select $2::text email, m.name, m.role, w.name workshop from member m join workshop w on w.id = m.workshop_id where m.account_id = $1 and m.ended_at is null and w.is_demo`,
      [id, email],
    );
    if (row) shown.push(row);
  }
  return { password, accounts: shown };
}
