import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { passwordChangedLetter, resetLetter } from '#server/mail/letters.ts';
import { putMail } from '#server/mail/outbox.ts';
import { invalidField, notFound } from '#server/problem.ts';
import { makeToken, tokenHash } from './one-time-token.ts';
import { hashPassword, passwordFits, refuseWeakPassword } from './password.ts';

type Lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>;

const RESET_MINUTES = 30;

/** Mails a link to set a new password to a known address; an unknown one gets nothing. */
export async function askReset(lobby: Lobby, publicUrl: string, email: string): Promise<void> {
  const { token, hash } = makeToken();
  await lobby(async (tx) => {
    const account = await tx.row<{ id: string; email: string }>('select id, email from account where lower(email) = lower($1)', [email]);
    if (!account) return;
    await tx.rows(
      `insert into one_time_token (token_hash, purpose, account_id, email, expires_at) values ($1, 'reset', $2, $3, $4::timestamptz + make_interval(mins => $5))`,
      [hash, account.id, account.email, tx.now, RESET_MINUTES],
    );
    await putMail(tx, { workshopId: null, recipient: account.email, ...resetLetter(publicUrl, { token, minutes: RESET_MINUTES }) });
  });
}

const goneLink = () => notFound('link; it may be used or past its time. Ask for a new one');

/** Sets the password, tells its owner by mail, and ends every session but the one given. */
async function setPassword(tx: LobbyTransaction, publicUrl: string, accountId: string, passwordHash: string, exceptKey: string | null): Promise<string> {
  const account = await tx.row<{ email: string }>('update account set password_hash = $2, updated_at = $3 where id = $1 returning email', [accountId, passwordHash, tx.now]);
  if (!account) throw goneLink();
  await tx.rows(`delete from web_session where sess ->> 'accountId' = $1 and sid is distinct from $2`, [accountId, exceptKey]);
  // Links that were asked for before lead nowhere any more.
  await tx.rows(`update one_time_token set used_at = $2 where purpose = 'reset' and account_id = $1 and used_at is null`, [accountId, tx.now]);
  await putMail(tx, { workshopId: null, recipient: account.email, ...passwordChangedLetter(publicUrl) });
  return account.email;
}

/**
 * Sets a new password by a mailed link; the link is used up and all sessions end.
 *
 * @returns the account's address
 * @throws Problem 404 for a link that is unknown, used or past its time (the same for each), 422 for a weak password
 */
export async function resetPassword(lobby: Lobby, publicUrl: string, token: string, password: string): Promise<string> {
  const hash = tokenHash(token);
  // Before the slow hash: made-up links cost nothing.
  const open = await lobby((tx) => tx.row<{ email: string }>(`select email from one_time_token where token_hash = $1 and purpose = 'reset' and used_at is null and expires_at > $2`, [hash, tx.now]));
  if (!open) throw goneLink();
  refuseWeakPassword(password, [open.email.split('@')[0] ?? '']);
  const passwordHash = await hashPassword(password);
  return lobby(async (tx) => {
    const used = await tx.row<{ account_id: string }>(
      `update one_time_token set used_at = $2 where token_hash = $1 and purpose = 'reset' and used_at is null and expires_at > $2 returning account_id`,
      [hash, tx.now],
    );
    if (!used) throw goneLink();
    return setPassword(tx, publicUrl, used.account_id, passwordHash, null);
  });
}

/** @throws Problem 422 when this is not the person's password */
export async function proveCurrentPassword(lobby: Lobby, accountId: string, current: string): Promise<{ email: string }> {
  const account = await lobby((tx) => tx.row<{ password_hash: string; email: string }>('select password_hash, email from account where id = $1', [accountId]));
  if (!(await passwordFits(account?.password_hash, current)) || !account) throw invalidField('#/current', 'This is not your current password');
  return account;
}

/** Changes one's own password after the current one was proven. @param sessionKey the stored key of the session that stays */
export async function changePassword(lobby: Lobby, publicUrl: string, account: { id: string; email: string }, sessionKey: string, password: string): Promise<void> {
  refuseWeakPassword(password, [account.email.split('@')[0] ?? '']);
  const passwordHash = await hashPassword(password);
  await lobby((tx) => setPassword(tx, publicUrl, account.id, passwordHash, sessionKey));
}
