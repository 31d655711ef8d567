import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { putMail } from '#server/mail/outbox.ts';
import { invalidField, notFound } from '#server/problem.ts';
import { makeToken, tokenHash } from './one-time-token.ts';
import { hashPassword, passwordFits, refuseWeakPassword } from './password.ts';

type Lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>;

const RESET_MINUTES = 30;

/** Mails a link to set a new password to a known address; an unknown one hears the same answer and gets nothing. */
export async function askReset(lobby: Lobby, publicUrl: string, email: string): Promise<void> {
  const { token, hash } = makeToken();
  await lobby(async (tx) => {
    const account = await tx.row<{ id: string; email: string }>('select id, email from account where lower(email) = lower($1)', [email]);
    if (!account) return;
    await tx.rows(
      `insert into one_time_token (token_hash, purpose, account_id, email, expires_at) values ($1, 'reset', $2, $3, now() + make_interval(mins => $4))`,
      [hash, account.id, account.email, RESET_MINUTES],
    );
    await putMail(tx, { workshopId: null, recipient: account.email, subject: 'Set a new password', body: `Open this link within ${RESET_MINUTES} minutes to set a new password:\n${publicUrl}/reset?token=${token}\nIf you did not ask for it, do nothing.` });
  });
}

/** Ends every session of an account, but the one given. */
async function endSessions(tx: LobbyTransaction, accountId: string, exceptKey: string | null): Promise<void> {
  await tx.rows(`delete from web_session where sess ->> 'accountId' = $1 and sid is distinct from $2`, [accountId, exceptKey]);
}

/**
 * Sets a new password by a mailed link; the link is used up and all sessions end.
 *
 * @throws Problem 404 for a link that is unknown, used or past its time (the same for each)
 */
export async function resetPassword(lobby: Lobby, token: string, password: string): Promise<void> {
  refuseWeakPassword(password, []);
  const passwordHash = await hashPassword(password);
  await lobby(async (tx) => {
    const used = await tx.row<{ account_id: string }>(
      `update one_time_token set used_at = now() where token_hash = $1 and purpose = 'reset' and used_at is null and expires_at > now() returning account_id`,
      [tokenHash(token)],
    );
    if (!used) throw notFound('link; it may be used or past its time. Ask for a new one');
    await tx.rows('update account set password_hash = $2, updated_at = now() where id = $1', [used.account_id, passwordHash]);
    await endSessions(tx, used.account_id, null);
  });
}

/** Changes one's own password. @param sessionKey the stored key of the session that stays @throws Problem 422 when the current one is wrong */
export async function changePassword(lobby: Lobby, accountId: string, sessionKey: string, { current, password }: { current: string; password: string }): Promise<void> {
  const account = await lobby((tx) => tx.row<{ password_hash: string; email: string }>('select password_hash, email from account where id = $1', [accountId]));
  if (!(await passwordFits(account?.password_hash, current))) throw invalidField('#/current', 'This is not your current password');
  refuseWeakPassword(password, [account?.email.split('@')[0] ?? '']);
  const passwordHash = await hashPassword(password);
  await lobby(async (tx) => {
    await tx.rows('update account set password_hash = $2, updated_at = now() where id = $1', [accountId, passwordHash]);
    await endSessions(tx, accountId, sessionKey);
  });
}
