import { v7 as uuidv7 } from 'uuid';
import type { SignUp } from '#shared/session.ts';
import { TimeZone } from '#shared/workshop.ts';
import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { putMail } from '#server/mail/outbox.ts';
import { hashPassword, refuseWeakPassword } from './password.ts';

type Lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>;

/** "QL" from "Quernby Loft": what batch codes begin with until the owner says otherwise. */
function prefixFrom(name: string): string {
  const letters = name.split(/\s+/).map((word) => word[0] ?? '').join('').replaceAll(/[^a-z\d]/gi, '').toUpperCase();
  return letters.slice(0, 3) || 'B';
}

/**
 * Makes a workshop with its owner. An address that is known already gets a mail instead and
 * nothing is made; the answer is the same either way.
 *
 * @throws Problem 422 for a weak password
 */
export async function signUp(lobby: Lobby, publicUrl: string, wish: SignUp): Promise<void> {
  refuseWeakPassword(wish.password, [wish.workshopName, wish.email.split('@')[0] ?? '']);
  const timeZone = TimeZone.safeParse(wish.timeZone).success ? wish.timeZone : 'Europe/London';
  const passwordHash = await hashPassword(wish.password);
  await lobby(async (tx) => {
    const [accountId, memberId] = [uuidv7(), uuidv7()];
    const made = await tx.rows('insert into account (id, email, name, password_hash) values ($1, $2, $3, $4) on conflict do nothing returning id', [accountId, wish.email, wish.name, passwordHash]);
    if (made.length === 0) {
      await putMail(tx, { workshopId: null, recipient: wish.email, subject: 'You already have an account', body: `Somebody, perhaps you, tried to sign up with this address. You have an account: sign in at ${publicUrl}/sign-in, or set a new password at ${publicUrl}/reset.` });
      return;
    }
    await tx.enterWorkshop(wish.workshopId, memberId);
    await tx.rows('insert into workshop (id, name, time_zone, batch_prefix) values ($1, $2, $3, $4)', [wish.workshopId, wish.workshopName, timeZone, prefixFrom(wish.workshopName)]);
    await tx.rows(`insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, $4, 'owner')`, [wish.workshopId, memberId, accountId, wish.name]);
  });
}
