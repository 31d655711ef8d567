import type { Request } from 'express';
import { sessionApi } from '#shared/session.ts';
import type { Config } from '#server/config.ts';
import type { Api } from '#server/http/api.ts';
import type { Throttle } from '#server/http/rate-limit.ts';
import { endSession, openSession, sessionKey } from '#server/http/session.ts';
import { notFound } from '#server/problem.ts';
import { demoAccounts, openSessions } from './open-sessions.read.ts';
import { askReset, changePassword, resetPassword } from './password.service.ts';
import { membershipsOf, sessionView } from './session.read.ts';
import { checkSignIn } from './session.service.ts';
import { signUp } from './sign-up.service.ts';

/** Password of the demo's accounts; there is no demo in production. */
const DEMO_PASSWORD = 'grey-board-demo';
const ACCEPTED = { accepted: true as const };
const addressOf = (request: Request) => request.ip ?? 'unknown';

export function sessionRoutes(api: Api, throttle: Throttle, config: Config): void {
  api.open(sessionApi.signIn, async ({ body, request, lobby, now }) => {
    const who = await checkSignIn(lobby, throttle, addressOf(request), body);
    await openSession(request, who, now);
    return lobby((tx) => sessionView(tx, who.accountId, who.workshopId));
  });
  api.account(sessionApi.whoAmI, ({ member, lobby }) => lobby((tx) => sessionView(tx, member.accountId, member.workshopId)));
  api.account(sessionApi.signOut, ({ request }) => endSession(request));
  api.account(sessionApi.switchWorkshop, async ({ member, body, request, lobby, now }) => {
    const memberships = await lobby((tx) => membershipsOf(tx, member.accountId));
    const chosen = memberships.find((membership) => membership.workshop_id === body.workshopId);
    if (!chosen) throw notFound('workshop of yours');
    await openSession(request, { accountId: member.accountId, workshopId: chosen.workshop_id, memberId: chosen.member_id }, now);
    return lobby((tx) => sessionView(tx, member.accountId, chosen.workshop_id));
  });
  api.open(sessionApi.signUp, async ({ body, request, lobby }) => {
    await throttle.take('mail', addressOf(request));
    await signUp(lobby, config.publicUrl, body);
    return ACCEPTED;
  });
  api.open(sessionApi.askReset, async ({ body, lobby }) => {
    await throttle.take('mail', body.email.toLowerCase());
    await askReset(lobby, config.publicUrl, body.email);
    return ACCEPTED;
  });
  api.open(sessionApi.resetPassword, async ({ body, lobby }) => {
    await resetPassword(lobby, body.token, body.password);
    return ACCEPTED;
  });
  api.account(sessionApi.changePassword, async ({ member, body, request, lobby }) => {
    await throttle.refuseIfSpent('account', member.accountId);
    await changePassword(lobby, member.accountId, sessionKey(request.sessionID), body).catch(async (error: unknown) => {
      await throttle.miss('account', member.accountId);
      throw error;
    });
    return ACCEPTED;
  });
  api.account(sessionApi.setPreferences, ({ member, body, lobby }) =>
    lobby(async (tx) => {
      await tx.rows('update account set temperature_unit = $2, mass_unit = $3, single_keys = $4, updated_at = now() where id = $1', [member.accountId, body.temperatureUnit, body.massUnit, body.singleKeys]);
      return sessionView(tx, member.accountId, member.workshopId);
    }));
  api.account(sessionApi.openSessions, ({ member, request, lobby }) => lobby((tx) => openSessions(tx, member.accountId, sessionKey(request.sessionID))));
  api.account(sessionApi.endSession, ({ member, params, lobby }) =>
    lobby(async (tx) => {
      const ended = await tx.rows(`delete from web_session where sid = $1 and sess ->> 'accountId' = $2 returning sid`, [params.key, member.accountId]);
      if (ended.length === 0) throw notFound('session of yours');
    }));
  api.open(sessionApi.demoAccounts, ({ lobby }) => {
    if (config.mode === 'production') throw notFound('demo');
    return lobby((tx) => demoAccounts(tx, DEMO_PASSWORD));
  });
}
