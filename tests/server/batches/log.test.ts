import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aBatch, aLook, aLot, aMaterial } from '#tests/support/records.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();
interface Row { id: string; code: string; [field: string]: unknown }

async function codes(person: Person, query: string): Promise<string[]> {
  return (await person.get(`/api/batches?${query}`).expect(200)).body.items.map(({ code }: Row) => code);
}

/** Every page of a query, in one list. */
async function allPages(person: Person, query: string): Promise<string[]> {
  const seen: string[] = [];
  let cursor: string | null = '';
  while (cursor !== null) {
    const page: { items: Row[]; next: string | null } = (await person.get(`/api/batches?${query}${cursor ? `&cursor=${cursor}` : ''}`).expect(200)).body;
    seen.push(...page.items.map(({ code }) => code));
    cursor = page.next;
  }
  return seen;
}

describe('GET /api/batches', () => {
  it('shows a row with its lots, faults worst first, what is clear, bars and money', async () => {
    const world = await aWorkshop(app());
    await world.sql('update workshop set first_price_minor = 750, second_price_minor = 400 where id = $1', [world.workshopId]);
    const [scent, olive] = [await aMaterial(world.owner), await aMaterial(world.owner, { kind: 'fat', name: 'Olive' })];
    const [scentLot, oliveLot] = [await aLot(world.owner, { materialId: scent, code: 'HF-1' }), await aLot(world.owner, { materialId: olive, code: 'OL-1' })];
    const id = await aBatch(world.owner, {
      bars: 12, makerId: world.owner.memberId, waterToLye: 2.28,
      ingredients: [{ id: uuidv7(), materialId: olive, lotId: oliveLot, massG: 900 }, { id: uuidv7(), materialId: scent, lotId: scentLot, shareOfOilsFraction: 0.03 }],
    });
    await aLook(world, id, { ricing: 1, acceleration: 3, 'soda-ash': 0 });
    for (const bars of [2, 3]) await world.sql(`insert into disposition (workshop_id, id, batch_id, kind, bars) values ($1, $2, $3, 'seconds', $4)`, [world.workshopId, uuidv7(), id, bars]);
    const { body } = await (await world.member('viewer')).get('/api/batches').expect(200);
    expect(body.next).toBeNull();
    expect(body.items).toMatchObject([{
      code: 'T-0001', makerName: 'Test owner', waterToLye: 2.28, fragranceFraction: 0.03, lostMinor: 1750, clear: ['soda-ash'],
      found: [{ fault: 'acceleration', severity: 3 }, { fault: 'ricing', severity: 1 }],
      lots: [{ code: 'HF-1', kind: 'fragrance' }, { code: 'OL-1', kind: 'fat' }],
      dispositions: [{ kind: 'seconds', bars: 5 }], coverPhotoId: null,
    }]);
    expect(JSON.stringify(body)).not.toMatch(/massG|shareOfOils/);
  });

  it('filters by method, family, state, maker, formula, lot and days', async () => {
    const { owner } = await aWorkshop(app());
    const lotId = await aLot(owner);
    const materialId = (await owner.get(`/api/lots/${lotId}`)).body.materialId;
    const formula = (await owner.post('/api/formulas', { id: uuidv7(), name: 'Kitchen' })).body.id;
    await aBatch(owner, { code: 'A', method: 'cold', madeOn: '2026-01-01', makerId: owner.memberId });
    await aBatch(owner, { code: 'B', method: 'cold-oven', madeOn: '2026-02-01', state: 'curing', formulaId: formula });
    await aBatch(owner, { code: 'C', method: 'hot', madeOn: '2026-03-01', ingredients: [{ id: uuidv7(), materialId, lotId }] });
    await aBatch(owner, { code: 'D', method: 'rebatch', madeOn: '2026-04-01', state: 'closed' });
    expect(await codes(owner, 'method=cold,hot')).toEqual(['C', 'A']);
    expect(await codes(owner, 'family=cold')).toEqual(['B', 'A']);
    expect(await codes(owner, 'state=curing,closed')).toEqual(['D', 'B']);
    expect(await codes(owner, `maker=${owner.memberId}`)).toEqual(['A']);
    expect(await codes(owner, `formula=${formula}`)).toEqual(['B']);
    expect(await codes(owner, `lot=${lotId},${uuidv7()}`)).toEqual(['C']);
    expect(await codes(owner, 'from=2026-02-01&to=2026-03-01')).toEqual(['C', 'B']);
    expect(await codes(owner, 'family=cold&from=2026-01-15')).toEqual(['B']);
    expect((await owner.get('/api/batches/count?family=cold').expect(200)).body).toEqual({ found: 2, all: 4 });
    expect((await owner.get('/api/batches/count').expect(200)).body).toEqual({ found: 4, all: 4 });
  });

  it('filters by what a fault was: found, clear, not checked, answered', async () => {
    const world = await aWorkshop(app());
    const looks: Record<string, Record<string, number> | null> = { A: { ricing: 2, 'soda-ash': 0 }, B: { ricing: 0 }, C: { 'soda-ash': 1 }, D: null };
    for (const [code, answers] of Object.entries(looks)) {
      const id = await aBatch(world.owner, { code });
      if (answers) await aLook(world, id, answers);
    }
    const found = async (query: string) => (await codes(world.owner, query)).sort().join('');
    expect(await found('fault=ricing')).toBe('A');
    expect(await found('fault=ricing&answer=found')).toBe('A');
    expect(await found('fault=ricing&answer=clear')).toBe('B');
    expect(await found('fault=ricing&answer=not-checked')).toBe('CD');
    expect(await found('fault=ricing&answer=answered')).toBe('AB');
    expect(await found('answer=found')).toBe('AC');
    expect(await found('answer=clear')).toBe('B');
    expect(await found('answer=not-checked')).toBe('D');
    expect(await found('answer=answered')).toBe('ABC');
  });

  it('finds part of a code, note, lot code or formula, also signs that mean something to the database', async () => {
    const { owner } = await aWorkshop(app());
    const lotId = await aLot(owner, { code: 'EF-78_02' });
    const materialId = (await owner.get(`/api/lots/${lotId}`)).body.materialId;
    const formula = (await owner.post('/api/formulas', { id: uuidv7(), name: 'Milk and Oat' })).body.id;
    await aBatch(owner, { code: 'QL-1', note: 'Smelled 50% off' });
    await aBatch(owner, { code: 'QL-2', formulaId: formula });
    await aBatch(owner, { code: 'QL-3', ingredients: [{ id: uuidv7(), materialId, lotId }] });
    expect(await codes(owner, 'find=ql-2')).toEqual(['QL-2']);
    expect(await codes(owner, 'find=50%25')).toEqual(['QL-1']);
    expect(await codes(owner, 'find=oat')).toEqual(['QL-2']);
    expect(await codes(owner, 'find=78_0')).toEqual(['QL-3']);
    expect(await codes(owner, 'find=7__0')).toEqual([]);
  });

  it.each(['made', 'code', 'water', 'oils', 'load', 'worst'])('pages by %s both ways without losing or repeating one, also among equal and missing values', async (sort) => {
    const world = await aWorkshop(app());
    const materialId = await aMaterial(world.owner);
    const values = [2, 2, 2, 1.8, 2.5, null, null];
    for (const [index, waterToLye] of values.entries()) {
      const id = await aBatch(world.owner, {
        code: `C-${index}`, madeOn: index < 4 ? '2026-03-01' : '2026-03-02', waterToLye, oilTemperatureC: waterToLye && waterToLye * 20,
        ingredients: waterToLye ? [{ id: uuidv7(), materialId, shareOfOilsFraction: waterToLye / 100 }] : [],
      });
      if (index > 3) await aLook(world, id, { ricing: index === 4 ? 2 : 0 });
    }
    const falling = await allPages(world.owner, `sort=${sort}&order=desc&limit=2`);
    const rising = await allPages(world.owner, `sort=${sort}&order=asc&limit=2`);
    expect([...falling].sort()).toEqual(['C-0', 'C-1', 'C-2', 'C-3', 'C-4', 'C-5', 'C-6']);
    expect([...rising].sort()).toEqual([...falling].sort());
    if (sort === 'water' || sort === 'oils' || sort === 'load') {
      expect([falling[0], ...falling.slice(5).sort()]).toEqual(['C-4', 'C-5', 'C-6']);
      expect([rising[0], ...rising.slice(5).sort()]).toEqual(['C-3', 'C-5', 'C-6']);
    }
    if (sort === 'worst') expect([falling[0], falling.slice(1, 3).sort()]).toEqual(['C-4', ['C-5', 'C-6']]);
    if (sort === 'code') expect(rising).toEqual([...rising].sort());
  });

  it('names what is wrong with a filter and refuses a cursor that is not ours', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.get('/api/batches?method=lukewarm&limit=1000&from=yesterday&lot=7').expect(422);
    expect(body.errors.map(({ pointer }: { pointer: string }) => pointer).sort()).toEqual(['#/from', '#/limit', '#/lot/0', '#/method/0']);
    await owner.get('/api/batches?cursor=bm90LWpzb24').expect(422);
    await owner.get(`/api/batches?cursor=${Buffer.from('["x","y"]').toString('base64url')}`).expect(422);
  });

  it('shows nothing of another workshop, in rows, counts or by its lots', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    await aBatch(here.owner);
    expect(await codes(there.owner, '')).toEqual([]);
    expect((await there.owner.get('/api/batches/count?family=cold')).body).toEqual({ found: 0, all: 0 });
  });
});
