import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import type { Role } from '#shared/words/roles.ts';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();

async function aMaterial(owner: Person, over: object = {}): Promise<string> {
  const id = uuidv7();
  await owner.post('/api/materials', { id, kind: 'fragrance', name: 'Harbour Fog', ...over }).expect(201);
  return id;
}

async function aLot(owner: Person, over: object = {}): Promise<string> {
  const id = uuidv7();
  await owner.post('/api/lots', { id, materialId: await aMaterial(owner), code: `HF-${id.slice(-4)}`, ...over }).expect(201);
  return id;
}

const hold = { standing: 'on-hold', reason: 'Two batches riced' };

describe('PUT /api/lots/:lotId/standing', () => {
  it('lets an inspector hold a lot, gives the new version, and keeps who, when and why', async () => {
    const world = await aWorkshop(app());
    const inspector = await world.member('inspector');
    const lotId = await aLot(world.owner);
    const { body, headers } = await inspector.put(`/api/lots/${lotId}/standing`, hold, 1).expect(200);
    expect(body).toMatchObject({ standing: 'on-hold', version: 2 });
    expect(headers['etag']).toBe('"2"');
    const changes = await inspector.get(`/api/lots/${lotId}/standing-changes`).expect(200);
    expect(changes.body.items).toMatchObject([{ before: 'in-use', after: 'on-hold', reason: 'Two batches riced', memberName: 'Test inspector' }]);
  });

  it('refuses a viewer before looking at what was sent', async () => {
    const world = await aWorkshop(app());
    const lotId = await aLot(world.owner);
    await (await world.member('viewer')).put(`/api/lots/${lotId}/standing`, { nonsense: true }, 1).expect(403);
  });

  // Brief: a held or returned lot is given back by an owner alone.
  it.each<[Role, string, number]>([
    ['owner', 'in-use', 200], ['owner', 'hot-process-only', 200],
    ['maker', 'in-use', 403], ['maker', 'hot-process-only', 403], ['maker', 'returned', 200],
    ['inspector', 'in-use', 403], ['inspector', 'used-up', 403], ['inspector', 'on-hold', 200],
  ])('answers a %s who moves a held lot to %s with %i', async (role, standing, status) => {
    const world = await aWorkshop(app());
    const lotId = await aLot(world.owner);
    await world.owner.put(`/api/lots/${lotId}/standing`, hold, 1).expect(200);
    const person = role === 'owner' ? world.owner : await world.member(role);
    await person.put(`/api/lots/${lotId}/standing`, { standing, reason: 'Asked again' }, 2).expect(status);
  });

  it('changes nothing when the standing is the same', async () => {
    const { owner } = await aWorkshop(app());
    const lotId = await aLot(owner);
    const { body } = await owner.put(`/api/lots/${lotId}/standing`, { standing: 'in-use', reason: 'Still fine' }, 1).expect(200);
    expect(body.version).toBe(1);
    expect((await owner.get(`/api/lots/${lotId}/standing-changes`)).body.items).toEqual([]);
  });

  it('refuses a stale version with the lot as it stands and a missing one with 428', async () => {
    const { owner } = await aWorkshop(app());
    const lotId = await aLot(owner);
    await owner.put(`/api/lots/${lotId}/standing`, hold, 1).expect(200);
    const { body } = await owner.put(`/api/lots/${lotId}/standing`, hold, 1).expect(412);
    expect(body.current).toMatchObject({ standing: 'on-hold', version: 2 });
    await owner.put(`/api/lots/${lotId}/standing`, hold).expect(428);
  });

  it('hides the lot of another workshop behind 404', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const lotId = await aLot(here.owner);
    await there.owner.put(`/api/lots/${lotId}/standing`, hold, 1).expect(404);
    await there.owner.get(`/api/lots/${lotId}`).expect(404);
  });
});

describe('lots', () => {
  it('keeps the same code twice for two materials, once for one', async () => {
    const { owner } = await aWorkshop(app());
    const [one, two] = [await aMaterial(owner), await aMaterial(owner, { name: 'Other' })];
    await owner.post('/api/lots', { id: uuidv7(), materialId: one, code: 'A-1' }).expect(201);
    await owner.post('/api/lots', { id: uuidv7(), materialId: two, code: 'A-1' }).expect(201);
    const { body } = await owner.post('/api/lots', { id: uuidv7(), materialId: one, code: 'A-1' }).expect(409);
    expect(body.detail).toMatch(/already has this name or code/);
  });

  it('names the field when material, supplier or the order of days is wrong', async () => {
    const { owner } = await aWorkshop(app());
    const materialId = await aMaterial(owner);
    const wrong = async (over: object) => (await owner.post('/api/lots', { id: uuidv7(), materialId, code: 'B-1', ...over }).expect(422)).body.errors[0];
    expect(await wrong({ materialId: uuidv7() })).toMatchObject({ pointer: '#/materialId' });
    expect(await wrong({ supplierId: uuidv7() })).toMatchObject({ pointer: '#/supplierId' });
    expect(await wrong({ receivedOn: '2026-05-02', openedOn: '2026-05-01' })).toMatchObject({ pointer: '#/openedOn' });
    expect(await wrong({ certificateMaxFraction: 5.2 })).toMatchObject({ pointer: '#/certificateMaxFraction', detail: expect.stringMatching(/between 0 and 1/) });
  });

  it('finds by code or material, also with signs that mean something to the database', async () => {
    const { owner } = await aWorkshop(app());
    await aLot(owner, { code: '50%_MIX' });
    await aLot(owner, { code: '50XYMIX' });
    const codes = async (find: string) => (await owner.get(`/api/lots?find=${encodeURIComponent(find)}`)).body.items.map((lot: { code: string }) => lot.code);
    expect(await codes('50%_')).toEqual(['50%_MIX']);
    expect(await codes('harbour')).toHaveLength(2);
  });

  it('pages newest first without losing one, also among lots never dated', async () => {
    const { owner } = await aWorkshop(app());
    const days = ['2026-01-01', '2026-02-01', '2026-02-01', null, null];
    for (const [index, receivedOn] of days.entries()) await aLot(owner, { code: `P-${index}`, receivedOn });
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { items: { code: string }[]; next: string | null } = (await owner.get(`/api/lots?limit=2${cursor ? `&cursor=${cursor}` : ''}`).expect(200)).body;
      seen.push(...page.items.map((lot) => lot.code));
      cursor = page.next;
    }
    expect([...seen].sort()).toEqual(['P-0', 'P-1', 'P-2', 'P-3', 'P-4']);
    expect(seen.slice(0, 2).sort()).toEqual(['P-1', 'P-2']);
  });

  it('changes what is named and leaves the rest', async () => {
    const { owner } = await aWorkshop(app());
    const lotId = await aLot(owner, { code: 'C-1', quantityG: 1000, flashPointC: 82 });
    const { body } = await owner.patch(`/api/lots/${lotId}`, { vanillinFraction: 0.01 }, 1).expect(200);
    expect(body).toMatchObject({ code: 'C-1', quantityG: 1000, quantityLeftG: 1000, flashPointC: 82, vanillinFraction: 0.01, version: 2 });
  });
});
