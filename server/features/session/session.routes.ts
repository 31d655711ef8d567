import type { Request } from 'express';
import { sessionApi } from '#shared/session.ts';
import type { Config } from '#server/config.ts';
import type { Api } from '#server/http/api.ts';
import { isKnownDevice, rememberDevice } from '#server/http/known-device.ts';
import { atPace } from '#server/http/pace.ts';
import type { Throttle } from '#server/http/rate-limit.ts';
import { endSession, moveSession, openSession, sessionKey } from '#server/http/session.ts';
import { notFound } from '#server/problem.ts';
import { demoAccounts, openSessions } from './open-sessions.read.ts';
import { askReset, changePassword, proveCurrentPassword, resetPassword } from './password.service.ts';
import { membershipsOf, sessionView } from './session.read.ts';
import { checkSignIn } from './session.service.ts';
import { signUp } from './sign-up.service.ts';

/** Longer than a mail takes to write, so that a known address answers no later than an unknown one. */
const MAIL_PACE_MS = 250;
const ACCEPTED = { accepted: true as const };
const addressOf = (request: Request) => request.ip ?? 'unknown';

interface SessionSurroundings {
  throttle: Throttle;
  config: Config;
  demoPassword: string;
}

export function sessionRoutes(api: Api, { throttle, config, demoPassword }: SessionSurroundings): void {
  api.open(sessionApi.signIn, async ({ body, request, response, lobby, now }) => {
    const device = { address: addressOf(request), isKnown: isKnownDevice(config, request, body.email, now) };
    const who = await checkSignIn(lobby, throttle, device, body);
    await openSession(request, who, now);
    rememberDevice(config, response, body.email, now);
    return lobby((tx) => sessionView(tx, who.accountId, who.workshopId));
  });
  api.account(sessionApi.whoAmI, ({ member, lobby }) => lobby((tx) => sessionView(tx, member.accountId, member.workshopId)));
  api.account(sessionApi.signOut, ({ request }) => endSession(request));
  api.account(sessionApi.switchWorkshop, async ({ member, body, request, lobby }) => {
    const memberships = await lobby((tx) => membershipsOf(tx, member.accountId));
    const chosen = memberships.find((membership) => membership.workshop_id === body.workshopId);
    if (!chosen) throw notFound('workshop of yours');
    await moveSession(request, { accountId: member.accountId, workshopId: chosen.workshop_id, memberId: chosen.member_id });
    return lobby((tx) => sessionView(tx, member.accountId, chosen.workshop_id));
  });
  api.open(sessionApi.signUp, async ({ body, request, lobby }) => {
    await throttle.take('address', `sign-up|${addressOf(request)}`);
    await throttle.take('mail', `sign-up|${body.email.toLowerCase()}`);
    await atPace(MAIL_PACE_MS, () => signUp(lobby, config.publicUrl, body));
    return ACCEPTED;
  });
  api.open(sessionApi.askReset, async ({ body, request, lobby }) => {
    await throttle.take('address', `reset|${addressOf(request)}`);
    await throttle.take('mail', body.email.toLowerCase());
    await atPace(MAIL_PACE_MS, () => askReset(lobby, config.publicUrl, body.email));
    return ACCEPTED;
  });
  api.open(sessionApi.resetPassword, async ({ body, request, lobby }) => {
    await throttle.take('address', `reset|${addressOf(request)}`);
    const email = await resetPassword(lobby, config.publicUrl, body.token, body.password);
    // Whoever reads the mail is the person: earlier wrong tries shut nobody out.
    await Promise.all([throttle.forget('account', email.toLowerCase()), throttle.forget('addressAndAccount', `${addressOf(request)}|${email.toLowerCase()}`)]);
    return ACCEPTED;
  });
  api.account(sessionApi.changePassword, async ({ member, body, request, lobby }) => {
    await throttle.take('addressAndAccount', `change|${member.accountId}`);
    const { email } = await proveCurrentPassword(lobby, member.accountId, body.current);
    await throttle.forget('addressAndAccount', `change|${member.accountId}`);
    await changePassword(lobby, config.publicUrl, { id: member.accountId, email }, sessionKey(request.sessionID), body.password);
    await moveSession(request, { accountId: member.accountId, workshopId: member.workshopId, memberId: member.id });
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
    return lobby((tx) => demoAccounts(tx, demoPassword));
  });
}
