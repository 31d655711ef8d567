import request from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, PASSWORD, sessionCookie, type World } from '#tests/support/world.ts';

const app = appForFile({ TRUSTED_PROXIES: '1' });
const http = () => request(app().url);
/** Behind the one trusted proxy every caller has an address of their own. */
const from = (address: string, body: object) => http().post('/api/session').set('X-Forwarded-For', address).send(body);
const signUpWish = (over: object = {}) => ({ workshopId: uuidv7(), workshopName: 'Gull Street Soap', name: 'Ada Penrose', email: `ada${uuidv7().slice(-8)}@test.example`, password: 'four unrelated words', ...over });

async function resetToken({ owner, sql }: World): Promise<string> {
  await http().post('/api/password-reset').send({ email: owner.email }).expect(200);
  const [mail] = await sql<{ body: string }>(`select body from outbox_mail where recipient = $1 and subject = 'Set a new password' order by created_at desc`, [owner.email]);
  return /token=([\w-]+)/.exec(mail?.body ?? '')?.[1] ?? '';
}

describe('signing up with somebody else’s ids', () => {
  it('never enters a workshop whose id was guessed, and answers as to a fresh id', async () => {
    const victim = await aWorkshop(app());
    const wish = signUpWish({ workshopId: victim.workshopId });
    await http().post('/api/sign-up').send(wish).expect(200, { accepted: true });
    const session = await http().post('/api/session').send({ email: wish.email, password: wish.password }).expect(200);
    expect(session.body.workshop.id).not.toBe(victim.workshopId);
    expect(session.body.workshop.name).toBe('Gull Street Soap');
    expect(await victim.sql('select id from member')).toHaveLength(1);
    expect(await victim.sql('select name from workshop')).toEqual([{ name: 'Test workshop' }]);
  });
});

describe('signing up with an address that has an account', () => {
  it('adds a workshop for its owner, once for the same request', async () => {
    const { owner } = await aWorkshop(app());
    const wish = signUpWish({ email: owner.email, password: PASSWORD });
    await http().post('/api/sign-up').send(wish).expect(200, { accepted: true });
    await http().post('/api/sign-up').send(wish).expect(200, { accepted: true });
    const { workshops } = (await owner.get('/api/session')).body as { workshops: { name: string }[] };
    expect(workshops.map(({ name }) => name).sort()).toEqual(['Gull Street Soap', 'Test workshop']);
  });

  it('adds nothing for somebody who does not know the password', async () => {
    const { owner } = await aWorkshop(app());
    await http().post('/api/sign-up').send(signUpWish({ email: owner.email })).expect(200, { accepted: true });
    expect((await owner.get('/api/session')).body.workshops).toHaveLength(1);
  });
});

describe('a mailed link to set a new password', () => {
  it('is won by one of two at once, and tells the person by mail', async () => {
    const world = await aWorkshop(app());
    const token = await resetToken(world);
    const answers = await Promise.all(['first four good words', 'second four good words'].map((password) => http().put('/api/password-reset').send({ token, password })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 404]);
    expect(await world.sql(`select 1 from outbox_mail where recipient = $1 and subject = 'Your password was changed'`, [world.owner.email])).toHaveLength(1);
  });

  it('is dead once a later one was used, when its time is over, or when a letter of it was changed', async () => {
    const world = await aWorkshop(app());
    const [earlier, later] = [await resetToken(world), await resetToken(world)];
    const password = 'quite another four words';
    const altered = (later.startsWith('a') ? 'b' : 'a') + later.slice(1);
    const wrong = await http().put('/api/password-reset').send({ token: altered, password }).expect(404);
    await http().put('/api/password-reset').send({ token: later, password }).expect(200);
    const used = await http().put('/api/password-reset').send({ token: earlier, password }).expect(404);
    const late = await resetToken(world);
    await world.sql(`update one_time_token set expires_at = now() - interval '1 second' where email = $1 and used_at is null`, [world.owner.email]);
    const over = await http().put('/api/password-reset').send({ token: late, password }).expect(404);
    expect(new Set([wrong, used, over].map(({ body }) => body.detail)).size).toBe(1);
  });

  it('lets somebody in again whom others’ tries had shut out', async () => {
    const world = await aWorkshop(app());
    for (let miss = 0; miss < 10; miss += 1) await from('10.1.1.1', { email: world.owner.email, password: 'wrong wrong wrong' }).expect(401);
    await from('10.1.1.1', { email: world.owner.email, password: PASSWORD }).expect(429);
    const token = await resetToken(world);
    await http().put('/api/password-reset').set('X-Forwarded-For', '10.1.1.1').send({ token, password: 'words after a reset' }).expect(200);
    await from('10.1.1.1', { email: world.owner.email, password: 'words after a reset' }).expect(200);
  });
});

describe('guessing passwords', () => {
  it('has ten tries also when they come at once', async () => {
    const { owner } = await aWorkshop(app());
    const answers = await Promise.all(Array.from({ length: 30 }, () => from('10.2.2.2', { email: owner.email, password: 'wrong wrong wrong' })));
    expect(answers.filter(({ status }) => status === 401).length).toBeLessThanOrEqual(10);
    expect(answers.every(({ status }) => [401, 429, 503].includes(status))).toBe(true);
    expect(answers.filter(({ status }) => status === 429).every(({ headers }) => Number(headers['retry-after']) > 0)).toBe(true);
  });

  it('from many addresses never shuts out a device that signed in before, nor others for long', async () => {
    const { owner, sql } = await aWorkshop(app());
    const first = await from('10.3.0.1', { email: owner.email, password: PASSWORD }).expect(200);
    const device = /lm-device=[^;]+/.exec(String(first.headers['set-cookie']))?.[0] ?? '';
    expect(String(first.headers['set-cookie'])).toMatch(/lm-device=[^;]+; Max-Age=\d+; Path=\/api\/session; Expires=[^;]+; HttpOnly; SameSite=Lax/);
    // A hundred misses are already on the account.
    await sql(`insert into throttle (key, points, expire) values ($1, 100, $2) on conflict (key) do update set points = 100, expire = excluded.expire`, [`account:${owner.email}`, Date.now() + 3_600_000]);
    await from('10.3.0.2', { email: owner.email, password: 'wrong wrong wrong' }).expect(401);
    await from('10.3.0.3', { email: owner.email, password: PASSWORD }).expect(429).expect('Retry-After', /^(?:[1-9]|[1-5]\d|60)$/);
    await from('10.3.0.4', { email: owner.email, password: PASSWORD }).set('Cookie', device).expect(200);
    await from('10.3.0.5', { email: owner.email, password: PASSWORD }).set('Cookie', device.replace(/\.[\w-]{4}/, '.AAAA')).expect(429);
  });
});

describe('a session', () => {
  it('gets a new id in another workshop and with a new password, and its thirty days run on', async () => {
    const [one, two] = [await aWorkshop(app()), await aWorkshop(app())];
    await two.sql(`insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, 'Guest', 'viewer')`, [two.workshopId, uuidv7(), one.owner.accountId]);
    const signedIn = 'select (sess ->> $$signedInAt$$)::float8 at from web_session where sess ->> $$accountId$$ = $1';
    const [before] = await one.sql(signedIn, [one.owner.accountId]);
    const switched = await one.owner.put('/api/session/workshop', { workshopId: two.workshopId }).expect(200);
    const cookie = sessionCookie(switched);
    expect(cookie).not.toBe(one.owner.cookie);
    await one.owner.get('/api/session').expect(401);
    const changed = await http().put('/api/session/password').set('Cookie', cookie).send({ current: PASSWORD, password: 'five quite new words' }).expect(200);
    await http().get('/api/session').set('Cookie', cookie).expect(401);
    const seen = await http().get('/api/session').set('Cookie', sessionCookie(changed)).expect(200);
    expect(seen.body.workshop.id).toBe(two.workshopId);
    expect(await one.sql(signedIn, [one.owner.accountId])).toEqual([before]);
  });

  it('ends thirty days after signing in, however often it was used', async () => {
    const { owner, sql } = await aWorkshop(app());
    await sql(`update web_session set sess = jsonb_set(sess::jsonb, '{signedInAt}', to_jsonb($2::float8))::json where sess ->> 'accountId' = $1`, [owner.accountId, Date.now() - 30 * 86_400_000 - 1000]);
    await owner.get('/api/session').expect(401);
  });

  it('ends after seven days without use', async () => {
    const { owner, sql } = await aWorkshop(app());
    await sql(`update web_session set expire = now() - interval '1 second' where sess ->> 'accountId' = $1`, [owner.accountId]);
    await owner.get('/api/session').expect(401);
  });
});
