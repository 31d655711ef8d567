import { sessionApi } from '#shared/session.ts';
import type { Api } from '#server/http/api.ts';
import type { Throttle } from '#server/http/rate-limit.ts';
import { endSession, openSession } from '#server/http/session.ts';
import { sessionView } from './session.read.ts';
import { checkSignIn } from './session.service.ts';

export function sessionRoutes(api: Api, throttle: Throttle): void {
  api.open(sessionApi.signIn, async ({ body, request, lobby, now }) => {
    const who = await checkSignIn(lobby, throttle, request.ip ?? 'unknown', body);
    await openSession(request, who, now);
    return lobby((tx) => sessionView(tx, who.accountId, who.workshopId));
  });
  api.account(sessionApi.whoAmI, ({ member, lobby }) => lobby((tx) => sessionView(tx, member.accountId, member.workshopId)));
  api.account(sessionApi.signOut, ({ request }) => endSession(request));
}
