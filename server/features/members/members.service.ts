import { v7 as uuidv7 } from 'uuid';
import type { z } from 'zod';
import type { AcceptInvitation, ChangeMember, Invitation, Invite, MemberDetails } from '#shared/members.ts';
import type { Role } from '#shared/words/roles.ts';
import { lockForChange, saveChange } from '#server/db/records.ts';
import type { LobbyTransaction, WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { invitationLetter } from '#server/mail/letters.ts';
import { putMail } from '#server/mail/outbox.ts';
import { conflict, invalidField, notFound } from '#server/problem.ts';
import { Member } from './member.entity.ts';
import { listMembers } from './members.read.ts';

type Lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>;

/** What the door offers to those who join: hashing and checking passwords, making tokens. Given by the session feature. */
export interface Door {
  makeToken(): { token: string; hash: string };
  tokenHash(token: string): string;
  hashPassword(password: string): Promise<string>;
  passwordFits(hash: string | undefined, password: string): Promise<boolean>;
  refuseWeakPassword(password: string, ownWords: readonly string[]): void;
}

const INVITATION_DAYS = 7;

/**
 * Mails an invitation; one still open to the same address is replaced. Whether the address has an account shows only in the mail's page.
 *
 * @throws Problem 409 when somebody with this address is a member already
 */
export async function inviteMember(tx: WorkshopTransaction, door: Door, publicUrl: string, { email, name, role }: Invite): Promise<void> {
  const already = await tx.row(
    'select 1 from member m join account a on a.id = m.account_id where m.workshop_id = $1 and lower(a.email) = lower($2) and m.ended_at is null', [tx.workshopId, email],
  );
  if (already) throw conflict('Somebody with this address is a member already');
  const { token, hash } = door.makeToken();
  const workshop = await tx.row<{ name: string }>('select name from workshop where id = $1', [tx.workshopId]);
  await tx.rows(`update one_time_token set used_at = $3 where purpose = 'invitation' and workshop_id = $1 and lower(email) = lower($2) and used_at is null`, [tx.workshopId, email, tx.now]);
  await tx.rows(
    `insert into one_time_token (token_hash, purpose, workshop_id, email, name, role, expires_at) values ($1, 'invitation', $2, $3, $4, $5, $6::timestamptz + make_interval(days => $7))`,
    [hash, tx.workshopId, email, name, role, tx.now, INVITATION_DAYS],
  );
  await putMail(tx, { workshopId: tx.workshopId, recipient: email, ...invitationLetter(publicUrl, { token, from: tx.member.name, workshop: workshop?.name ?? 'a workshop', name, role, days: INVITATION_DAYS }) });
  await tx.noteDeed('invite', 'member', null, { email, name, role });
}

interface InvitationRow {
  workshop_id: string;
  email: string;
  name: string;
  role: Role;
  account_id: string | null;
  password_hash: string | null;
}

const goneLink = () => notFound('invitation; it may be used or past its time. Ask for a new one');

async function findInvitation(tx: LobbyTransaction, hash: string): Promise<InvitationRow> {
  const row = await tx.row<InvitationRow>(
    `select t.workshop_id, t.email, t.name, t.role, a.id account_id, a.password_hash from one_time_token t left join account a on lower(a.email) = lower(t.email)
     where t.token_hash = $1 and t.purpose = 'invitation' and t.used_at is null and t.expires_at > now()`,
    [hash],
  );
  if (!row) throw goneLink();
  return row;
}

/** What an invitation offers. @throws Problem 404 when unknown, used or past its time */
export async function readInvitation(lobby: Lobby, door: Door, token: string): Promise<z.input<typeof Invitation>> {
  return lobby(async (tx) => {
    const row = await findInvitation(tx, door.tokenHash(token));
    await tx.enterWorkshop(row.workshop_id, '');
    const workshop = await tx.row<{ name: string }>('select name from workshop where id = $1', [row.workshop_id]);
    return { workshopName: workshop?.name ?? '', name: row.name, email: row.email, role: row.role, hasAccount: row.account_id !== null };
  });
}

/**
 * Joins by an invitation; somebody with an account proves it with their password.
 *
 * @returns id of the workshop that was joined
 * @throws Problem 404 for a link that is no more, 422 for a wrong or weak password
 */
export async function acceptInvitation(lobby: Lobby, door: Door, { token, name, password }: z.output<typeof AcceptInvitation>): Promise<string> {
  const hash = door.tokenHash(token);
  const offered = await lobby((tx) => findInvitation(tx, hash));
  if (offered.account_id) {
    if (!(await door.passwordFits(offered.password_hash ?? undefined, password))) throw invalidField('#/password', 'This is not the password of the account with this address');
  } else {
    door.refuseWeakPassword(password, [offered.email.split('@')[0] ?? '']);
  }
  const passwordHash = offered.account_id ? '' : await door.hashPassword(password);
  return lobby(async (tx) => {
    const used = await tx.rows('update one_time_token set used_at = now() where token_hash = $1 and used_at is null and expires_at > now() returning token_hash', [hash]);
    if (used.length === 0) throw goneLink();
    const accountId = offered.account_id ?? uuidv7();
    const memberId = uuidv7();
    if (!offered.account_id) await tx.rows('insert into account (id, email, name, password_hash) values ($1, $2, $3, $4)', [accountId, offered.email, name, passwordHash]);
    await tx.enterWorkshop(offered.workshop_id, memberId);
    await tx.rows(
      `insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, $4, $5)
       on conflict (workshop_id, account_id) do update set name = excluded.name, role = excluded.role, ended_at = null, version = member.version + 1, updated_at = now()
         where member.ended_at is not null`,
      [offered.workshop_id, memberId, accountId, name, offered.role],
    );
    return offered.workshop_id;
  });
}

async function detailsOf(tx: WorkshopTransaction, memberId: string): Promise<MemberDetails> {
  const { items } = await listMembers(tx);
  const found = items.find((member) => member.id === memberId);
  if (!found) throw notFound('member');
  return found;
}

/**
 * Renames a member, changes the role, ends the membership or takes it up again.
 *
 * @throws Problem 404, 412, 409 when the workshop would be left without an owner
 */
export async function changeMember(tx: WorkshopTransaction, memberId: string, { name, role, hasEnded }: ChangeMember, version: number): Promise<MemberDetails> {
  // All owners' rows are locked first, so that two owners cannot remove one another at once.
  await tx.rows(`select id from member where workshop_id = $1 and role = 'owner' order by id for update`, [tx.workshopId]);
  const member = await lockForChange(tx, Member, 'member', memberId, version, () => detailsOf(tx, memberId));
  if (name !== undefined) member.name = name;
  if (role !== undefined) member.role = role;
  if (hasEnded !== undefined) member.endedAt = hasEnded ? (member.endedAt ?? tx.now) : null;
  await saveChange(tx, Member, member);
  const owner = await tx.row(`select 1 from member where workshop_id = $1 and role = 'owner' and ended_at is null and account_id is not null`, [tx.workshopId]);
  if (!owner) throw conflict('A workshop needs an owner; make somebody else owner first');
  return detailsOf(tx, memberId);
}
