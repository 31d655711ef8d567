import { v7 as uuidv7 } from 'uuid';
import type { SignUp } from '#shared/session.ts';
import { TimeZone } from '#shared/workshop.ts';
import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { knownAddressLetter, secondWorkshopLetter, welcomeLetter } from '#server/mail/letters.ts';
import { putMail } from '#server/mail/outbox.ts';
import { hashPassword, passwordFits, refuseWeakPassword } from './password.ts';
import { membershipsOf } from './session.read.ts';

type Lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>;

/** "QL" from "Quernby Loft": what batch codes begin with until the owner says otherwise. */
function prefixFrom(name: string): string {
  const letters = name.split(/\s+/).map((word) => word[0] ?? '').join('').replaceAll(/[^a-z\d]/gi, '').toUpperCase();
  return letters.slice(0, 3) || 'B';
}

/** Inserts the workshop and its owner. An id that is in use next door is never entered: the workshop then gets a fresh one. */
async function makeWorkshop(tx: LobbyTransaction, wish: SignUp, accountId: string): Promise<void> {
  const timeZone = TimeZone.safeParse(wish.timeZone).success ? wish.timeZone : 'Europe/London';
  for (const workshopId of [wish.workshopId, uuidv7()]) {
    const memberId = uuidv7();
    await tx.enterWorkshop(workshopId, memberId);
    const made = await tx.rows(
      'insert into workshop (id, name, time_zone, batch_prefix) values ($1, $2, $3, $4) on conflict do nothing returning id',
      [workshopId, wish.workshopName, timeZone, prefixFrom(wish.workshopName)],
    );
    if (made.length === 0) continue;
    await tx.rows(`insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, $4, 'owner')`, [workshopId, memberId, accountId, wish.name]);
    return;
  }
}

/**
 * Makes a workshop with its owner. Somebody with an account gets a second workshop when the password
 * is theirs; otherwise nothing is made and a mail tells them. The answer is the same each time.
 *
 * @throws Problem 422 for a weak password
 */
export async function signUp(lobby: Lobby, publicUrl: string, wish: SignUp): Promise<void> {
  refuseWeakPassword(wish.password, [wish.workshopName, ...wish.workshopName.split(/\s+/), wish.email.split('@')[0] ?? '']);
  const known = await lobby((tx) => tx.row<{ id: string; password_hash: string }>('select id, password_hash from account where lower(email) = lower($1)', [wish.email]));
  // One slow step in either case, so that the time tells nothing.
  const isTheirs = known ? await passwordFits(known.password_hash, wish.password) : false;
  const passwordHash = known ? '' : await hashPassword(wish.password);
  await lobby(async (tx) => {
    const accountId = known?.id ?? uuidv7();
    const isNew = !known && (await tx.rows('insert into account (id, email, name, password_hash) values ($1, $2, $3, $4) on conflict do nothing returning id', [accountId, wish.email, wish.name, passwordHash])).length > 0;
    if (!isNew && !isTheirs) {
      await putMail(tx, { workshopId: null, recipient: wish.email, ...knownAddressLetter(publicUrl) });
      return;
    }
    const isRepeat = isTheirs && (await membershipsOf(tx, accountId)).some(({ workshop_id }) => workshop_id === wish.workshopId);
    if (isRepeat) return;
    await makeWorkshop(tx, wish, accountId);
    await putMail(tx, { workshopId: null, recipient: wish.email, ...(isNew ? welcomeLetter(publicUrl, wish) : secondWorkshopLetter(publicUrl, wish)) });
  });
}
