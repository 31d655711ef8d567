import type { SessionView } from '#shared/session.ts';
import type { Role } from '#shared/words/roles.ts';
import type { LobbyTransaction } from '#server/db/workshop-transaction.ts';
import { notSignedIn } from '#server/problem.ts';

interface Membership {
  workshop_id: string;
  member_id: string;
  role: Role;
  workshop_name: string;
  member_name: string;
  time_zone: string;
  currency: string;
  is_demo: boolean;
}

/** A person's open memberships, oldest first. */
export async function membershipsOf(tx: LobbyTransaction, accountId: string): Promise<Membership[]> {
  await tx.asAccount(accountId);
  return tx.rows<Membership>(
    `select m.workshop_id, m.id member_id, m.role, m.name member_name, w.name workshop_name, w.time_zone, w.currency, w.is_demo
     from member m join workshop w on w.id = m.workshop_id
     where m.account_id = $1 and m.ended_at is null order by m.created_at, m.workshop_id`,
    [accountId],
  );
}

/** What the signed-in person sees of themselves. @throws Problem 401 when the membership has ended */
export async function sessionView(tx: LobbyTransaction, accountId: string, workshopId: string): Promise<SessionView> {
  const memberships = await membershipsOf(tx, accountId);
  const here = memberships.find((membership) => membership.workshop_id === workshopId);
  const account = await tx.row<SessionView['account']>(
    `select id, email, name, temperature_unit "temperatureUnit", mass_unit "massUnit", single_keys "singleKeys" from account where id = $1`,
    [accountId],
  );
  if (!here || !account) throw notSignedIn();
  return {
    member: { id: here.member_id, name: here.member_name, role: here.role },
    account,
    workshop: { id: here.workshop_id, name: here.workshop_name, timeZone: here.time_zone, currency: here.currency, isDemo: here.is_demo },
    workshops: memberships.map((membership) => ({ id: membership.workshop_id, name: membership.workshop_name, role: membership.role })),
  };
}
