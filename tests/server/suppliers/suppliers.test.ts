import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();
const aSupplier = (over: object = {}) => ({ id: uuidv7(), name: 'Quarrel Hill Oils', contactName: 'Ada Penrose', ...over });

describe('suppliers', () => {
  it('keeps a supplier and lists it by name', async () => {
    const { owner } = await aWorkshop(app());
    const made = await owner.post('/api/suppliers', aSupplier()).expect(201);
    expect(made.headers['etag']).toBe('"1"');
    await owner.post('/api/suppliers', aSupplier({ name: 'Barrow Scents' })).expect(201);
    const { body } = await owner.get('/api/suppliers').expect(200);
    expect(body.items.map((supplier: { name: string }) => supplier.name)).toEqual(['Barrow Scents', 'Quarrel Hill Oils']);
  });

  it('pages by keyset without losing or repeating one', async () => {
    const { owner } = await aWorkshop(app());
    for (const name of ['A', 'B', 'C', 'D', 'E']) await owner.post('/api/suppliers', aSupplier({ name })).expect(201);
    const first = await owner.get('/api/suppliers?limit=2');
    const second = await owner.get(`/api/suppliers?limit=2&cursor=${first.body.next}`);
    const third = await owner.get(`/api/suppliers?limit=2&cursor=${second.body.next}`);
    const names = [first, second, third].flatMap(({ body }) => body.items.map((supplier: { name: string }) => supplier.name));
    expect(names).toEqual(['A', 'B', 'C', 'D', 'E']);
    expect(third.body.next).toBeNull();
  });

  it('answers a repeated creation with the record and another wish under the same id with 409', async () => {
    const { owner } = await aWorkshop(app());
    const wish = aSupplier();
    await owner.post('/api/suppliers', wish).expect(201);
    const again = await owner.post('/api/suppliers', wish).expect(200);
    expect(again.body.id).toBe(wish.id);
    await owner.post('/api/suppliers', { ...wish, name: 'Someone else' }).expect(409);
    expect((await owner.get('/api/suppliers')).body.items).toHaveLength(1);
  });

  it('names every field that is wrong', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.post('/api/suppliers', { id: 'x', name: '', colour: 'red' }).expect(422);
    expect(body.type).toBe('/problems/invalid');
    expect(body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual(['#/colour', '#/id', '#/name']);
  });

  it('refuses a stale version with the current record, and a missing version', async () => {
    const { owner } = await aWorkshop(app());
    const wish = aSupplier();
    await owner.post('/api/suppliers', wish);
    const changed = await owner.patch(`/api/suppliers/${wish.id}`, { phone: '555' }, 1).expect(200);
    expect(changed.body).toMatchObject({ version: 2, phone: '555', contactName: 'Ada Penrose' });
    const stale = await owner.patch(`/api/suppliers/${wish.id}`, { phone: '777' }, 1).expect(412);
    expect(stale.body.current).toMatchObject({ version: 2, phone: '555' });
    await owner.patch(`/api/suppliers/${wish.id}`, { phone: '777' }).expect(428);
  });

  it('hides the supplier of another workshop behind 404', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const wish = aSupplier();
    await here.owner.post('/api/suppliers', wish).expect(201);
    await there.owner.get(`/api/suppliers/${wish.id}`).expect(404);
    await there.owner.patch(`/api/suppliers/${wish.id}`, { name: 'Mine' }, 1).expect(404);
    expect((await here.owner.get(`/api/suppliers/${wish.id}`)).body.name).toBe('Quarrel Hill Oils');
  });

  it('leaves who, when, before and after in the trail', async () => {
    const { owner, sql } = await aWorkshop(app());
    const wish = aSupplier();
    await owner.post('/api/suppliers', wish);
    await owner.patch(`/api/suppliers/${wish.id}`, { name: 'New name' }, 1);
    const trail = await sql<{ deed: string; member_id: string; before: { name: string } | null; after: { name: string } }>(
      'select deed, member_id, before, after from audit_entry where record_id = $1 order by id', [wish.id]);
    expect(trail.map(({ deed, before, after }) => [deed, before?.name, after.name])).toEqual([
      ['insert', undefined, 'Quarrel Hill Oils'],
      ['update', 'Quarrel Hill Oils', 'New name'],
    ]);
    expect(trail.every((entry) => entry.member_id === owner.memberId)).toBe(true);
  });
});
