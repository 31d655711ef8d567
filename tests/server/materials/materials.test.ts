import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();

describe('materials', () => {
  it('are listed by kind and name', async () => {
    const { owner } = await aWorkshop(app());
    await owner.post('/api/materials', { id: uuidv7(), kind: 'fat', name: 'Shea', isHardFat: true }).expect(201);
    await owner.post('/api/materials', { id: uuidv7(), kind: 'fat', name: 'Coconut', isHardFat: true, isLauric: true }).expect(201);
    await owner.post('/api/materials', { id: uuidv7(), kind: 'colourant', name: 'Titanium dioxide', isWhitePigment: true }).expect(201);
    const { body } = await owner.get('/api/materials?kind=fat').expect(200);
    expect(body.items.map((material: { name: string }) => material.name)).toEqual(['Coconut', 'Shea']);
    expect(body.items[0]).toMatchObject({ isLauric: true, isAnimal: false });
  });

  it('refuse a saponification value in the wrong unit, with the right one', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.post('/api/materials', { id: uuidv7(), kind: 'fat', name: 'Olive', saponificationKohMgPerG: 0.19 }).expect(422);
    expect(body.errors).toEqual([{ pointer: '#/saponificationKohMgPerG', detail: 'Saponification value must lie between 50 and 300 mg KOH per g' }]);
  });

  it('keep their flags when something else is changed', async () => {
    const { owner } = await aWorkshop(app());
    const id = uuidv7();
    await owner.post('/api/materials', { id, kind: 'fat', name: 'Tallow', isHardFat: true, isAnimal: true }).expect(201);
    const { body } = await owner.patch(`/api/materials/${id}`, { note: 'From the butcher' }, 1).expect(200);
    expect(body).toMatchObject({ isHardFat: true, isAnimal: true, note: 'From the butcher' });
    await owner.patch(`/api/materials/${id}`, { kind: 'fragrance' }, 2).expect(422);
  });

  it('of another workshop are not there', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const id = uuidv7();
    await here.owner.post('/api/materials', { id, kind: 'fat', name: 'Olive' }).expect(201);
    await there.owner.get(`/api/materials/${id}`).expect(404);
    expect((await there.owner.get('/api/materials')).body.items).toEqual([]);
  });
});
