import type { Request } from 'express';
import type { DataSource } from 'typeorm';
import type { Role } from '#shared/words/roles.ts';
import { inLobby, type ActingMember } from '../db/workshop-transaction.ts';
import { endSession, SESSION_TOTAL_MS } from './session.ts';

/**
 * The member behind the request's session, read anew each time: a removal or a change of
 * role counts from the next request on. Undefined without a valid session.
 */
export async function actingMember(source: DataSource, request: Request, now: Date): Promise<ActingMember | undefined> {
  const { accountId, workshopId, memberId, signedInAt } = request.session ?? {};
  if (!accountId || !workshopId || !memberId || !signedInAt) return undefined;
  if (now.getTime() - signedInAt > SESSION_TOTAL_MS) {
    await endSession(request);
    return undefined;
  }
  const found = await inLobby(source, { requestId: String(request.id), now, kind: 'read' }, async (tx) => {
    await tx.asAccount(accountId);
    return tx.row<{ name: string; role: Role }>(
      'select name, role from member where workshop_id = $1 and id = $2 and account_id = $3 and ended_at is null',
      [workshopId, memberId, accountId],
    );
  });
  return found && { id: memberId, accountId, workshopId, name: found.name, role: found.role };
}
