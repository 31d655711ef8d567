import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, PASSWORD, type World } from '#tests/support/world.ts';

const app = appForFile();
const http = () => request(app().url);

async function invited({ owner, sql }: World, email: string, role = 'maker'): Promise<string> {
  await owner.post('/api/invitations', { email, name: 'Bo Tarrant', role }).expect(200);
  const [mail] = await sql<{ body: string }>('select body from outbox_mail where recipient = $1 order by created_at desc', [email]);
  return /invitation\/([\w-]+)/.exec(mail?.body ?? '')?.[1] ?? '';
}

describe('inviting', () => {
  it('lets somebody new join once with the role that was offered', async () => {
    const world = await aWorkshop(app());
    const token = await invited(world, 'bo.new@test.example', 'inspector');
    const offer = await http().get(`/api/invitations/${token}`).expect(200);
    expect(offer.body).toEqual({ workshopName: 'Test workshop', name: 'Bo Tarrant', email: 'bo.new@test.example', role: 'inspector', hasAccount: false });
    const join = { token, name: 'Bo', password: 'soap is slippery stuff' };
    await http().post('/api/invitations/accept').send(join).expect(200);
    await http().post('/api/invitations/accept').send(join).expect(404);
    const session = await http().post('/api/session').send({ email: 'bo.new@test.example', password: join.password }).expect(200);
    expect(session.body.member).toMatchObject({ name: 'Bo', role: 'inspector' });
  });

  it('asks somebody with an account for their own password', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const token = await invited(here, there.owner.email);
    await http().post('/api/invitations/accept').send({ token, name: 'T', password: 'some other password' }).expect(422);
    await http().post('/api/invitations/accept').send({ token, name: 'T', password: PASSWORD }).expect(200);
    expect((await there.owner.get('/api/session')).body.workshops).toHaveLength(2);
  });

  it('is the owner’s alone', async () => {
    const world = await aWorkshop(app());
    for (const role of ['maker', 'inspector', 'viewer'] as const) {
      await (await world.member(role)).post('/api/invitations', { email: 'x@test.example', name: 'X', role: 'viewer' }).expect(403);
    }
  });
});

describe('members', () => {
  it('are known by name to all, by address to the owner alone', async () => {
    const world = await aWorkshop(app());
    const viewer = await world.member('viewer');
    expect((await viewer.get('/api/members').expect(200)).text).not.toContain('@');
    expect((await world.owner.get('/api/members/details').expect(200)).body.items.map((member: { email: string }) => member.email)).toContain(viewer.email);
    await viewer.get('/api/members/details').expect(403);
  });

  it('change role, and lose their way in when they leave', async () => {
    const world = await aWorkshop(app());
    const maker = await world.member('maker');
    await world.owner.patch(`/api/members/${maker.memberId}`, { role: 'viewer' }, 1).expect(200);
    expect((await maker.get('/api/session')).body.member.role).toBe('viewer');
    await world.owner.patch(`/api/members/${maker.memberId}`, { hasEnded: true }, 2).expect(200);
    await maker.get('/api/session').expect(401);
    await world.owner.patch(`/api/members/${maker.memberId}`, { hasEnded: false }, 2).expect(412);
  });

  it('never leave a workshop without an owner, also not when two owners act at once', async () => {
    const world = await aWorkshop(app());
    await world.owner.patch(`/api/members/${world.owner.memberId}`, { role: 'maker' }, 1).expect(409);
    for (let round = 0; round < 8; round += 1) {
      const other = await world.member('owner');
      const [a, b] = await Promise.all([
        world.owner.patch(`/api/members/${other.memberId}`, { hasEnded: true }, 1),
        other.patch(`/api/members/${world.owner.memberId}`, { hasEnded: true }, 1),
      ]);
      expect([a.status, b.status].filter((status) => status === 200).length).toBeLessThanOrEqual(1);
      const owners = await world.sql(`select id from member where role = 'owner' and ended_at is null`);
      expect(owners.length).toBeGreaterThanOrEqual(1);
      await world.sql('update member set ended_at = null, version = 1 where id = $1', [world.owner.memberId]);
      await world.sql('update member set ended_at = now() where id = $1', [other.memberId]);
    }
  });

  it('of another workshop are not there', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    await there.owner.patch(`/api/members/${here.owner.memberId}`, { name: 'X' }, 1).expect(404);
  });
});

describe('an invitation', () => {
  const join = (token: string) => http().post('/api/invitations/accept').send({ token, name: 'Bo', password: 'soap is slippery stuff' });

  it('is won by one of two who accept at once, and leaves its line in the trail', async () => {
    const world = await aWorkshop(app());
    const token = await invited(world, 'bo.twice@test.example');
    const answers = await Promise.all([join(token), join(token)]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(answers.every(({ status }) => [200, 404, 409].includes(status))).toBe(true);
    const trail = await world.sql<{ deed: string }>(`select deed from audit_entry where table_name = 'member' order by id`);
    expect(trail.map(({ deed }) => deed)).toEqual(['insert', 'invite', 'insert']);
  });

  it('is replaced by a later one, and dead after seven days', async () => {
    const world = await aWorkshop(app());
    const [earlier, later] = [await invited(world, 'bo.again@test.example'), await invited(world, 'bo.again@test.example')];
    await http().get(`/api/invitations/${earlier}`).expect(404);
    await http().get(`/api/invitations/${later}`).expect(200);
    await world.sql(`update one_time_token set expires_at = now() - interval '1 second' where email = 'bo.again@test.example' and used_at is null`);
    await http().get(`/api/invitations/${later}`).expect(404);
    await join(later).expect(404);
  });

  it('is not needed by a member, and takes somebody who left back in', async () => {
    const world = await aWorkshop(app());
    const maker = await world.member('maker');
    await world.owner.post('/api/invitations', { email: maker.email.toUpperCase(), name: 'X', role: 'viewer' }).expect(409);
    await world.owner.patch(`/api/members/${maker.memberId}`, { hasEnded: true }, 1).expect(200);
    const token = await invited(world, maker.email, 'inspector');
    await http().post('/api/invitations/accept').send({ token, name: 'Back again', password: PASSWORD }).expect(200);
    const session = await http().post('/api/session').send({ email: maker.email, password: PASSWORD }).expect(200);
    expect(session.body.member).toEqual({ id: maker.memberId, name: 'Back again', role: 'inspector' });
  });
});
