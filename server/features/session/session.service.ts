import type { SignIn } from '#shared/session.ts';
import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import type { Throttle } from '#server/http/rate-limit.ts';
import { Problem } from '#server/problem.ts';
import { passwordFits } from './password.ts';
import { membershipsOf } from './session.read.ts';

interface Credentials {
  id: string;
  password_hash: string;
}

const wrong = () => new Problem('not-signed-in', 'E-mail address or password is wrong');

/**
 * Checks who signs in and picks the workshop: the one asked for, else the oldest membership.
 * Known and unknown addresses take as long and hear the same.
 *
 * @param address network address of the device
 * @throws Problem 401 when wrong, 429 when tried too often
 */
export async function checkSignIn(
  lobby: <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>,
  throttle: Throttle,
  address: string,
  { email, password, workshopId }: SignIn,
): Promise<{ accountId: string; workshopId: string; memberId: string }> {
  const account = email.toLowerCase();
  const both = `${address}|${account}`;
  await throttle.refuseIfSpent('addressAndAccount', both);
  await throttle.refuseIfSpent('address', address);
  await throttle.refuseIfSpent('account', account);
  const found = await lobby((tx) => tx.row<Credentials>('select id, password_hash from account where lower(email) = $1', [account]));
  // Outside any transaction: hashing takes long and would hold a connection.
  if (!(await passwordFits(found?.password_hash, password)) || !found) {
    await Promise.all([throttle.miss('addressAndAccount', both), throttle.miss('address', address), throttle.miss('account', account)]);
    throw wrong();
  }
  const memberships = await lobby((tx) => membershipsOf(tx, found.id));
  const chosen = workshopId === undefined ? memberships[0] : memberships.find((membership) => membership.workshop_id === workshopId);
  if (!chosen) throw wrong();
  await throttle.forget('addressAndAccount', both);
  return { accountId: found.id, workshopId: chosen.workshop_id, memberId: chosen.member_id };
}
