import { membersApi } from '#shared/members.ts';
import type { Config } from '#server/config.ts';
import type { Api } from '#server/http/api.ts';
import type { Throttle } from '#server/http/rate-limit.ts';
import { listMembers } from './members.read.ts';
import { acceptInvitation, changeMember, inviteMember, readInvitation, type Door } from './members.service.ts';

const ACCEPTED = { accepted: true as const };

export function membersRoutes(api: Api, { config, throttle, door }: { config: Config; throttle: Throttle; door: Door }): void {
  api.serve(membersApi.list, ({ tx }) => listMembers(tx));
  api.serve(membersApi.details, ({ tx }) => listMembers(tx));
  api.serve(membersApi.invite, async ({ tx, body }) => {
    // By workshop too: one workshop's mails must not use up another's.
    await throttle.take('mail', `${tx.workshopId}|${body.email.toLowerCase()}`);
    await throttle.take('address', `invite|${tx.workshopId}`);
    await inviteMember(tx, door, config.publicUrl, body);
    return ACCEPTED;
  });
  api.open(membersApi.readInvitation, ({ lobby, params }) => readInvitation(lobby, door, params.token));
  api.open(membersApi.accept, async ({ lobby, body, request }) => {
    await throttle.take('address', `join|${request.ip ?? 'unknown'}`);
    await throttle.take('addressAndAccount', `join|${door.tokenHash(body.token)}`);
    return { ...ACCEPTED, workshopId: await acceptInvitation(lobby, door, body) };
  });
  api.serve(membersApi.change, ({ tx, params, body, version }) => changeMember(tx, params.memberId, body, version));
}
