import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import type { Role } from '#shared/words/roles.ts';
import { appForFile } from '#tests/support/app.ts';
import { aBatch, aBatchWish, aLook, aLot, aMaterial } from '#tests/support/records.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();
const pointers = (body: { errors: { pointer: string }[] }) => body.errors.map(({ pointer }) => pointer).sort();

/** A batch with every kind of field filled in. */
async function aFullWish(owner: Person) {
  const [scent, olive] = [await aMaterial(owner), await aMaterial(owner, { kind: 'fat', name: 'Olive' })];
  const [lotId, oliveLot] = [await aLot(owner, { materialId: scent, code: 'HF-1' }), await aLot(owner, { materialId: olive, code: 'OL-1' })];
  return aBatchWish({
    method: 'hot', state: 'curing', oilMassG: 1000, waterToLye: 2, superfatFraction: 0.05, oilTemperatureC: 75, note: '  Smelled sharp  ',
    ingredients: [
      { id: uuidv7(), materialId: olive, lotId: oliveLot, massG: 1000, shareOfOilsFraction: 1 },
      { id: uuidv7(), materialId: scent, lotId, massG: 30 },
    ],
    cookStages: [{ stage: 'taffy', minutesFromStart: 90 }, { stage: 'separating', minutesFromStart: 20 }],
  });
}

describe('POST /api/batches', () => {
  it('logs a batch under the next code and works out concentration and fragrance', async () => {
    const { owner } = await aWorkshop(app());
    const { body, headers } = await owner.post('/api/batches', await aFullWish(owner)).expect(201);
    expect(headers['etag']).toBe('"1"');
    expect(body).toMatchObject({ code: 'T-0001', family: 'hot', state: 'curing', madeOn: '2026-03-14', note: 'Smelled sharp', seesQuantities: true, found: [], clear: [], lostMinor: 0 });
    expect(body.lyeConcentrationFraction).toBeCloseTo(1 / 3, 12);
    expect(body.fragranceFraction).toBeCloseTo(0.03, 12);
    expect(body.ingredients.map((line: { materialName: string; lotCode: string; massG: number }) => [line.materialName, line.lotCode, line.massG])).toEqual([['Olive', 'OL-1', 1000], ['Harbour Fog', 'HF-1', 30]]);
    expect(body.cookStages.map(({ stage }: { stage: string }) => stage)).toEqual(['separating', 'taffy']);
    expect((await owner.get(`/api/batches/${body.id}`).expect(200)).body).toEqual(body);
  });

  it('numbers on, past codes that were typed in', async () => {
    const { owner } = await aWorkshop(app());
    await aBatch(owner, { code: 'T-0002' });
    const codes = [];
    for (let made = 0; made < 2; made += 1) codes.push((await owner.post('/api/batches', aBatchWish())).body.code);
    expect(codes).toEqual(['T-0001', 'T-0003']);
  });

  it('gives ten makers at once ten different numbers', async () => {
    const { owner } = await aWorkshop(app());
    const made = await Promise.all(Array.from({ length: 10 }, () => owner.post('/api/batches', aBatchWish())));
    expect(made.map(({ status }) => status)).toEqual(Array.from({ length: 10 }, () => 201));
    expect(new Set(made.map(({ body }) => body.code)).size).toBe(10);
  });

  it('answers a repeat with the same batch and takes no second number', async () => {
    const { owner } = await aWorkshop(app());
    const wish = await aFullWish(owner);
    const first = await owner.post('/api/batches', wish).expect(201);
    const again = await owner.post('/api/batches', wish).expect(200);
    expect(again.body).toEqual(first.body);
    expect((await owner.post('/api/batches', aBatchWish()).expect(201)).body.code).toBe('T-0002');
    await owner.post('/api/batches', { ...wish, bars: 12 }).expect(409);
  });

  it('refuses a code that another batch has', async () => {
    const { owner } = await aWorkshop(app());
    await aBatch(owner, { code: 'QL-7' });
    const { body } = await owner.post('/api/batches', aBatchWish({ code: 'QL-7' })).expect(409);
    expect(body.detail).toMatch(/already has this name or code/);
  });

  it('names every field that is outside its hard limits, with what would be right', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.post('/api/batches', aBatchWish({ waterToLye: 0.9, lyeTemperatureC: 130, humidityFraction: 45, blendSeconds: 1.5, gel: 'maybe', madeOn: '14.3.2026' })).expect(422);
    expect(pointers(body)).toEqual(['#/blendSeconds', '#/gel', '#/humidityFraction', '#/lyeTemperatureC', '#/madeOn', '#/waterToLye']);
    expect(body.errors.find((error: { pointer: string }) => error.pointer === '#/lyeTemperatureC').detail).toBe('Lye temperature must lie between 5 and 120 °C');
  });

  it('names every reference that is not in this workshop', async () => {
    const [{ owner }, other] = [await aWorkshop(app()), await aWorkshop(app())];
    const [materialId, foreignLot] = [await aMaterial(owner), await aLot(other.owner)];
    const wish = aBatchWish({
      formulaId: uuidv7(), makerId: other.owner.memberId, mouldId: uuidv7(),
      ingredients: [{ id: uuidv7(), materialId: uuidv7() }, { id: uuidv7(), materialId, lotId: foreignLot }],
    });
    const { body } = await owner.post('/api/batches', wish).expect(422);
    expect(pointers(body)).toEqual(['#/formulaId', '#/ingredients/0/materialId', '#/ingredients/1/lotId', '#/makerId', '#/mouldId']);
  });

  it('refuses a lot of another material, and fragrances above 12 % of the oils, at their fields', async () => {
    const { owner } = await aWorkshop(app());
    const [scent, other] = [await aMaterial(owner), await aMaterial(owner, { name: 'Other' })];
    const lotId = await aLot(owner, { materialId: other });
    const wrong = async (ingredients: object[], over: object = {}) => pointers((await owner.post('/api/batches', aBatchWish({ ingredients, ...over })).expect(422)).body);
    expect(await wrong([{ id: uuidv7(), materialId: scent, lotId }])).toEqual(['#/ingredients/0/lotId']);
    expect(await wrong([{ id: uuidv7(), materialId: scent, shareOfOilsFraction: 0.08 }, { id: uuidv7(), materialId: other, shareOfOilsFraction: 0.05 }])).toEqual(['#/ingredients/1/shareOfOilsFraction']);
    expect(await wrong([{ id: uuidv7(), materialId: scent, massG: 130 }], { oilMassG: 1000 })).toEqual(['#/ingredients/0/massG']);
    await aBatch(owner, { ingredients: [{ id: uuidv7(), materialId: scent, shareOfOilsFraction: 0.06 }, { id: uuidv7(), materialId: other, shareOfOilsFraction: 0.06 }] });
  });

  it('refuses days out of order', async () => {
    const { owner } = await aWorkshop(app());
    expect(pointers((await owner.post('/api/batches', aBatchWish({ unmouldedOn: '2026-03-13' })).expect(422)).body)).toEqual(['#/unmouldedOn']);
    expect(pointers((await owner.post('/api/batches', aBatchWish({ unmouldedOn: '2026-03-16', cutOn: '2026-03-15' })).expect(422)).body)).toEqual(['#/cutOn']);
  });

  it('freezes the formula version it used and refuses a version of another formula', async () => {
    const { owner } = await aWorkshop(app());
    const [one, two] = await Promise.all(['Kitchen', 'Hotel'].map(async (name) => (await owner.post('/api/formulas', { id: uuidv7(), name }).expect(201)).body));
    await aBatch(owner, { formulaId: one.id, formulaVersionId: one.versions[0].id });
    expect((await owner.get(`/api/formulas/${one.id}`)).body.versions[0].isFrozen).toBe(true);
    expect(pointers((await owner.post('/api/batches', aBatchWish({ formulaId: one.id, formulaVersionId: two.versions[0].id })).expect(422)).body)).toEqual(['#/formulaVersionId']);
  });

  it.each<[Role, number]>([['maker', 201], ['inspector', 403], ['viewer', 403]])('answers a %s with %i', async (role, status) => {
    const world = await aWorkshop(app());
    await (await world.member(role)).post('/api/batches', aBatchWish()).expect(status);
  });
});

describe('GET /api/batches/:batchId', () => {
  it('hides grams and shares from those who may not read formulas', async () => {
    const world = await aWorkshop(app());
    const wish = await aFullWish(world.owner);
    await world.owner.post('/api/batches', wish).expect(201);
    for (const role of ['inspector', 'viewer'] as const) {
      const { body } = await (await world.member(role)).get(`/api/batches/${wish.id}`).expect(200);
      expect(body).toMatchObject({ seesQuantities: false, fragranceFraction: 0.03 });
      expect(JSON.stringify(body)).not.toMatch(/massG|shareOfOils|oilMassG/);
      expect(body.ingredients.map((line: { materialName: string }) => line.materialName)).toEqual(['Olive', 'Harbour Fog']);
    }
    expect((await (await world.member('maker')).get(`/api/batches/${wish.id}`)).body.oilMassG).toBe(1000);
  });

  it('hides the batch of another workshop behind 404', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const id = await aBatch(here.owner);
    await there.owner.get(`/api/batches/${id}`).expect(404);
    await there.owner.patch(`/api/batches/${id}`, { bars: 3 }, 1).expect(404);
    await there.owner.get('/api/batches/not-an-id').expect(422);
  });

  it('tells what was found, what is clear, where the bars went and what that cost', async () => {
    const world = await aWorkshop(app());
    await world.sql('update workshop set first_price_minor = 750, second_price_minor = 400 where id = $1', [world.workshopId]);
    const id = await aBatch(world.owner, { bars: 12 });
    await aLook(world, id, { ricing: 1, 'soda-ash': 0 });
    await aLook(world, id, { ricing: 2, 'air-pockets': 3, 'soda-ash': 0 }, '2026-03-27T09:00:00Z');
    for (const [kind, bars] of [['firsts', 3], ['seconds', 4], ['embeds', 2], ['kept', 2], ['discarded', 1]] as const) {
      await world.sql('insert into disposition (workshop_id, id, batch_id, kind, bars) values ($1, $2, $3, $4, $5)', [world.workshopId, uuidv7(), id, kind, bars]);
    }
    const { body } = await world.owner.get(`/api/batches/${id}`).expect(200);
    expect(body.found).toEqual([{ fault: 'air-pockets', severity: 3 }, { fault: 'ricing', severity: 2 }]);
    expect(body.clear).toEqual(['soda-ash']);
    expect(body.lostMinor).toBe(4 * 350 + 3 * 750);
    await world.sql('update workshop set second_price_minor = null, first_price_minor = null where id = $1', [world.workshopId]);
    expect((await world.owner.get(`/api/batches/${id}`)).body.lostMinor).toBe(0);
  });
});

describe('PATCH /api/batches/:batchId', () => {
  it('changes what is named and leaves the rest, also what went in', async () => {
    const { owner } = await aWorkshop(app());
    const wish = await aFullWish(owner);
    await owner.post('/api/batches', wish).expect(201);
    const changed = await owner.patch(`/api/batches/${wish.id}`, { bars: 11, waterToLye: 3 }, 1).expect(200);
    expect(changed.body).toMatchObject({ version: 2, bars: 11, lyeConcentrationFraction: 0.25, oilTemperatureC: 75, note: 'Smelled sharp' });
    expect(changed.body.ingredients).toHaveLength(2);
    expect(changed.body.fragranceFraction).toBeCloseTo(0.03, 12);
    const emptied = await owner.patch(`/api/batches/${wish.id}`, { ingredients: [], cookStages: [{ stage: 'taffy', minutesFromStart: 80 }] }, 2).expect(200);
    expect(emptied.body).toMatchObject({ ingredients: [], fragranceFraction: null, cookStages: [{ stage: 'taffy', minutesFromStart: 80 }] });
  });

  it('works the fragrance out anew when the oils change', async () => {
    const { owner } = await aWorkshop(app());
    const wish = await aFullWish(owner);
    await owner.post('/api/batches', wish).expect(201);
    expect((await owner.patch(`/api/batches/${wish.id}`, { oilMassG: 1500 }, 1).expect(200)).body.fragranceFraction).toBeCloseTo(0.02, 12);
    expect(pointers((await owner.patch(`/api/batches/${wish.id}`, { oilMassG: 200 }, 2).expect(422)).body)).toEqual(['#/ingredients/1/massG']);
  });

  it('refuses a stale version with the batch as it stands and a missing one with 428', async () => {
    const { owner } = await aWorkshop(app());
    const id = await aBatch(owner);
    await owner.patch(`/api/batches/${id}`, { bars: 11 }, 1).expect(200);
    const { body } = await owner.patch(`/api/batches/${id}`, { bars: 12 }, 1).expect(412);
    expect(body.current).toMatchObject({ version: 2, bars: 11, seesQuantities: true });
    await owner.patch(`/api/batches/${id}`, { bars: 12 }).expect(428);
    await owner.patch(`/api/batches/${id}`, { colour: 'red' }, 2).expect(422);
  });

  it.each([
    ['making', 'in-mould', 200], ['planned', 'cured', 200], ['curing', 'making', 409], ['cured', 'abandoned', 200],
    ['closed', 'abandoned', 409], ['abandoned', 'making', 409], ['cured', 'closed', 200],
  ])('answers a batch that is %s and shall be %s with %i', async (state, next, status) => {
    const { owner } = await aWorkshop(app());
    const id = await aBatch(owner, { state });
    await owner.patch(`/api/batches/${id}`, { state: next }, 1).expect(status);
  });

  it('lets only an owner close over an open safety finding', async () => {
    const world = await aWorkshop(app());
    const maker = await world.member('maker');
    const [held, mended] = [await aBatch(world.owner, { state: 'cured' }), await aBatch(world.owner, { state: 'cured' })];
    for (const id of [held, mended]) await aLook(world, id, { 'lye-pockets': 2 }, '2026-03-20T09:00:00Z');
    await aLook(world, mended, { 'lye-pockets': 0 }, '2026-03-30T09:00:00Z');
    await maker.patch(`/api/batches/${held}`, { state: 'closed' }, 1).expect(403);
    await maker.patch(`/api/batches/${mended}`, { state: 'closed' }, 1).expect(200);
    await world.owner.patch(`/api/batches/${held}`, { state: 'closed' }, 1).expect(200);
  });

  it('refuses an inspector before looking at what was sent', async () => {
    const world = await aWorkshop(app());
    await (await world.member('inspector')).patch(`/api/batches/${await aBatch(world.owner)}`, { nonsense: 1 }, 1).expect(403);
  });
});

describe('moulds', () => {
  it('keeps a mould, lists by name, and answers a repeat with the same one', async () => {
    const world = await aWorkshop(app());
    const wish = { id: uuidv7(), name: 'M2 silicone', oilMassG: 1000, bars: 12 };
    await world.owner.post('/api/moulds', wish).expect(201);
    await world.owner.post('/api/moulds', wish).expect(200);
    await world.owner.post('/api/moulds', { id: uuidv7(), name: 'M1 wood' }).expect(201);
    await world.owner.post('/api/moulds', { id: uuidv7(), name: 'm1 WOOD' }).expect(409);
    expect((await (await world.member('viewer')).get('/api/moulds').expect(200)).body.items.map(({ name }: { name: string }) => name)).toEqual(['M1 wood', 'M2 silicone']);
    expect((await world.owner.post('/api/moulds', { id: uuidv7(), name: '', bars: 0 }).expect(422)).body.errors).toHaveLength(2);
    await (await world.member('viewer')).post('/api/moulds', { id: uuidv7(), name: 'Mine' }).expect(403);
    expect((await (await aWorkshop(app())).owner.get('/api/moulds')).body.items).toEqual([]);
  });
});
