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

/** The device that asks: its network address, and whether it signed in with this account before. */
export interface AskingDevice {
  address: string;
  isKnown: boolean;
}

const wrong = () => new Problem('not-signed-in', 'E-mail address or password is wrong');

/**
 * Checks who signs in and picks the workshop: the one asked for, else the oldest membership.
 * Known and unknown addresses take as long and hear the same.
 *
 * @throws Problem 401 when wrong, 429 when tried too often
 */
export async function checkSignIn(
  lobby: <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>,
  throttle: Throttle,
  device: AskingDevice,
  { email, password, workshopId }: SignIn,
): Promise<{ accountId: string; workshopId: string; memberId: string }> {
  const account = email.toLowerCase();
  const both = `${device.address}|${account}`;
  await throttle.take('addressAndAccount', both);
  await throttle.take('address', device.address);
  await throttle.takeAccount(account, device.isKnown);
  const found = await lobby((tx) => tx.row<Credentials>('select id, password_hash from account where lower(email) = $1', [account]));
  // Outside any transaction: hashing takes long and would hold a connection.
  if (!(await passwordFits(found?.password_hash, password)) || !found) throw wrong();
  const memberships = await lobby((tx) => membershipsOf(tx, found.id));
  const chosen = workshopId === undefined ? memberships[0] : memberships.find((membership) => membership.workshop_id === workshopId);
  if (!chosen) throw wrong();
  await Promise.all([throttle.forget('addressAndAccount', both), throttle.giveBack('address', device.address), ...(device.isKnown ? [] : [throttle.giveBack('account', account)])]);
  return { accountId: found.id, workshopId: chosen.workshop_id, memberId: chosen.member_id };
}
