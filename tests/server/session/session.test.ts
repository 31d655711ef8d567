import request from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, PASSWORD, sessionCookie } from '#tests/support/world.ts';

const app = appForFile();
const http = () => request(app().url);
const signIn = (email: string, password = PASSWORD) => http().post('/api/session').send({ email, password });
const signUpWish = (over: object = {}) => ({ workshopId: uuidv7(), workshopName: 'Gull Street Soap', name: 'Ada Penrose', email: `ada${uuidv7().slice(-8)}@test.example`, password: 'four unrelated words', ...over });

describe('signing in', () => {
  it('gives a hardened cookie and says who and where', async () => {
    const { owner } = await aWorkshop(app());
    const answer = await signIn(owner.email.toUpperCase()).expect(200);
    expect(answer.body).toMatchObject({ member: { role: 'owner' }, workshop: { name: 'Test workshop' }, account: { temperatureUnit: 'celsius' } });
    expect(String(answer.headers['set-cookie'])).toMatch(/lm=.*; Path=\/; Expires=.*; HttpOnly; SameSite=Lax/);
    expect(JSON.stringify(answer.body)).not.toMatch(/argon2|password/i);
  });

  it('says the same to a wrong password and to an unknown address', async () => {
    const { owner } = await aWorkshop(app());
    const wrong = await signIn(owner.email, 'not this one at all').expect(401);
    const unknown = await signIn('nobody-at-all@test.example').expect(401);
    expect(unknown.body.detail).toBe(wrong.body.detail);
  });

  it('never takes over an id that the browser brought', async () => {
    const { owner } = await aWorkshop(app());
    const first = sessionCookie(await signIn(owner.email));
    const second = await http().post('/api/session').set('Cookie', first).send({ email: owner.email, password: PASSWORD }).expect(200);
    expect(sessionCookie(second)).not.toBe(first);
    await http().get('/api/session').set('Cookie', first).expect(401);
    const made = await http().get('/api/session').set('Cookie', 'lm=s%3Amade-up.signature').expect(401);
    expect(made.headers['set-cookie']).toBeUndefined();
  });

  it('ends with sign-out, and at once when the membership ends', async () => {
    const world = await aWorkshop(app());
    const maker = await world.member('maker');
    await maker.get('/api/session').expect(200);
    await world.sql('update member set ended_at = now() where id = $1', [maker.memberId]);
    await maker.get('/api/batches').expect(401);
    await world.owner.delete('/api/session').expect(204);
    await world.owner.get('/api/session').expect(401);
  });

  it('keeps only a print of the session’s id', async () => {
    const { owner, sql } = await aWorkshop(app());
    const id = decodeURIComponent(owner.cookie.split('=')[1] ?? '').slice(2).split('.')[0] ?? '';
    expect(id.length).toBeGreaterThan(40);
    expect(await sql('select 1 from web_session where sid = $1 or sess::text like $2', [id, `%${id}%`])).toEqual([]);
  });

  it('refuses the eleventh try from one device with a time to wait, and other people go on', async () => {
    const [victim, other] = [await aWorkshop(app()), await aWorkshop(app())];
    const answers = [];
    for (let tryNumber = 0; tryNumber < 11; tryNumber += 1) answers.push((await signIn(victim.owner.email, 'wrong wrong wrong')).status);
    expect(answers.slice(0, 10)).toEqual(Array.from({ length: 10 }, () => 401));
    expect(answers[10]).toBe(429);
    const refused = await signIn(victim.owner.email);
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    expect(Number(refused.headers['retry-after'])).toBeLessThanOrEqual(900);
    await signIn(other.owner.email).expect(200);
  });
});

describe('signing up', () => {
  it('makes a workshop whose owner can sign in, with nobody else’s data', async () => {
    const wish = signUpWish();
    await http().post('/api/sign-up').send(wish).expect(200);
    const answer = await signIn(wish.email, wish.password).expect(200);
    expect(answer.body).toMatchObject({ member: { role: 'owner', name: 'Ada Penrose' }, workshop: { id: wish.workshopId, name: 'Gull Street Soap' } });
    expect((await http().get('/api/batches').set('Cookie', sessionCookie(answer)).expect(200)).body.items).toEqual([]);
  });

  it('answers a known address the same, makes nothing, and mails it', async () => {
    const { owner, sql } = await aWorkshop(app());
    const answer = await http().post('/api/sign-up').send(signUpWish({ email: owner.email })).expect(200);
    expect(answer.body).toEqual({ accepted: true });
    const mails = await sql<{ subject: string }>('select subject from outbox_mail where recipient = $1', [owner.email]);
    expect(mails).toEqual([{ subject: 'You already have an account' }]);
  });

  it('refuses short, common and own-name passwords at the field', async () => {
    for (const password of ['short', 'passwordpassword', 'aaaaaaaaaaaaaaa', 'Gull Street Soap1']) {
      const { body } = await http().post('/api/sign-up').send(signUpWish({ password })).expect(422);
      expect(body.errors[0].pointer, password).toBe('#/password');
    }
  });
});

describe('setting a new password', () => {
  it('works once by the mailed link, which names our own address whatever the request says, and ends all sessions', async () => {
    const { owner, sql } = await aWorkshop(app());
    await http().post('/api/password-reset').set('X-Forwarded-Host', 'evil.example').send({ email: owner.email }).expect(200);
    await http().post('/api/password-reset').send({ email: 'nobody-here@test.example' }).expect(200, { accepted: true });
    const [mail] = await sql<{ body: string }>('select body from outbox_mail where recipient = $1', [owner.email]);
    expect(mail?.body).toContain('http://127.0.0.1:4800/reset?token=');
    expect(mail?.body).not.toContain('evil');
    const token = /token=([\w-]+)/.exec(mail?.body ?? '')?.[1] ?? '';
    expect(await sql('select 1 from one_time_token where token_hash = $1', [token])).toEqual([]);
    await http().put('/api/password-reset').send({ token, password: 'another four words' }).expect(200);
    await http().put('/api/password-reset').send({ token, password: 'yet another four words' }).expect(404);
    await owner.get('/api/session').expect(401);
    await signIn(owner.email).expect(401);
    await signIn(owner.email, 'another four words').expect(200);
  });

  it('is changed by somebody who knows the current one; other sessions end', async () => {
    const { owner } = await aWorkshop(app());
    const elsewhere = sessionCookie(await signIn(owner.email));
    await owner.put('/api/session/password', { current: 'wrong', password: 'five more unrelated words' }).expect(422);
    const changed = await owner.put('/api/session/password', { current: PASSWORD, password: 'five more unrelated words' }).expect(200);
    await http().get('/api/session').set('Cookie', elsewhere).expect(401);
    await http().get('/api/session').set('Cookie', sessionCookie(changed)).expect(200);
  });
});

describe('my sessions and settings', () => {
  it('lists what is open and ends one of mine, never another’s', async () => {
    const [one, two] = [await aWorkshop(app()), await aWorkshop(app())];
    await signIn(one.owner.email);
    const { items } = (await one.owner.get('/api/session/all').expect(200)).body as { items: { key: string; isThisOne: boolean }[] };
    expect(items).toHaveLength(2);
    const other = items.find((item) => !item.isThisOne);
    await two.owner.delete(`/api/session/all/${other?.key}`).expect(404);
    await one.owner.delete(`/api/session/all/${other?.key}`).expect(204);
    expect((await one.owner.get('/api/session/all')).body.items).toHaveLength(1);
  });

  it('keeps how I like my units', async () => {
    const { owner } = await aWorkshop(app());
    await owner.put('/api/session/preferences', { temperatureUnit: 'fahrenheit', massUnit: 'ounce', singleKeys: false }).expect(200);
    expect((await owner.get('/api/session')).body.account).toMatchObject({ temperatureUnit: 'fahrenheit', massUnit: 'ounce', singleKeys: false });
  });

  it('switches only to a workshop of mine', async () => {
    const [one, two] = [await aWorkshop(app()), await aWorkshop(app())];
    await one.owner.put('/api/session/workshop', { workshopId: two.workshopId }).expect(404);
    await two.sql(`insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, 'Guest', 'viewer')`, [two.workshopId, uuidv7(), one.owner.accountId]);
    const switched = await one.owner.put('/api/session/workshop', { workshopId: two.workshopId }).expect(200);
    expect(switched.body).toMatchObject({ member: { role: 'viewer' }, workshop: { id: two.workshopId } });
  });

  it('shows the demo’s accounts outside production, and none where there is no demo', async () => {
    await http().get('/api/demo-accounts').expect(200, { password: 'grey-board-demo', accounts: [] });
  });
});
