import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();

describe('the workshop’s settings', () => {
  it('are read by all and changed by the owner against the version they saw', async () => {
    const world = await aWorkshop(app());
    const viewer = await world.member('viewer');
    expect((await viewer.get('/api/workshop').expect(200)).body).toMatchObject({ name: 'Test workshop', currency: 'EUR', version: 1 });
    await viewer.patch('/api/workshop', { name: 'Mine' }, 1).expect(403);
    const { body } = await world.owner.patch('/api/workshop', { firstPriceMinor: 750, timeZone: 'Europe/Paris' }, 1).expect(200);
    expect(body).toMatchObject({ name: 'Test workshop', firstPriceMinor: 750, timeZone: 'Europe/Paris', version: 2 });
    expect((await world.owner.patch('/api/workshop', { name: 'Late' }, 1).expect(412)).body.current).toMatchObject({ version: 2 });
  });

  it('refuse a zone or currency that does not exist, at the field', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.patch('/api/workshop', { timeZone: 'Mars/Base', currency: 'euro' }, 1).expect(422);
    expect(body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual(['#/currency', '#/timeZone']);
  });
});

describe('the trail', () => {
  it('is the owner’s to read, by record, newest first, and never holds a password', async () => {
    const world = await aWorkshop(app());
    await world.owner.patch('/api/workshop', { name: 'One' }, 1).expect(200);
    await world.owner.patch('/api/workshop', { name: 'Two' }, 2).expect(200);
    const { body, text } = await world.owner.get(`/api/audit?recordId=${world.workshopId}&limit=2`).expect(200);
    expect(body.items.map((entry: { before: { name: string }; after: { name: string } }) => [entry.before.name, entry.after.name])).toEqual([['One', 'Two'], ['Test workshop', 'One']]);
    expect(body.next).not.toBeNull();
    expect(text).not.toMatch(/argon2|password_hash/);
    for (const role of ['maker', 'inspector', 'viewer'] as const) await (await world.member(role)).get('/api/audit').expect(403);
  });
});

describe('the outbox', () => {
  it('shows the owner the workshop’s own mails', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    await here.owner.post('/api/invitations', { email: 'someone@test.example', name: 'Someone\nBcc: x@test.example', role: 'viewer' }).expect(200);
    const { items } = (await here.owner.get('/api/outbox').expect(200)).body;
    expect(items).toHaveLength(1);
    expect(items[0].recipient).toBe('someone@test.example');
    expect((await there.owner.get('/api/outbox')).body.items).toEqual([]);
  });
});
