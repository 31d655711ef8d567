import { parse } from 'papaparse';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';

const app = appForFile();

/** A supplier with one lot: batch C-1 riced on 3 of 10 bars, C-2 was looked at and clear, C-3 was not looked at; C-4 holds another lot of the scent. */
async function aStory(world: World) {
  const { workshopId, sql, owner } = world;
  const ids = { supplier: uuidv7(), scent: uuidv7(), fat: uuidv7(), lot: uuidv7(), other: uuidv7() };
  await owner.post('/api/suppliers', { id: ids.supplier, name: 'Gannet Aromas' }).expect(201);
  await owner.post('/api/materials', { id: ids.scent, kind: 'fragrance', name: '=Harbour Fog' }).expect(201);
  await owner.post('/api/materials', { id: ids.fat, kind: 'fat', name: 'Secret tallow', isHardFat: true, isAnimal: true }).expect(201);
  await owner.post('/api/lots', { id: ids.lot, materialId: ids.scent, supplierId: ids.supplier, code: 'GA-77', receivedOn: '2026-01-02' }).expect(201);
  await owner.post('/api/lots', { id: ids.other, materialId: ids.scent, supplierId: ids.supplier, code: 'GA-78' }).expect(201);
  const batch = async (code: string, lot: string, answer: 'found' | 'clear' | null, madeOn = '2026-02-03') => {
    const [batchId, inspectionId] = [uuidv7(), uuidv7()];
    await sql(`insert into batch (workshop_id, id, code, made_on, method, state, bars, oil_mass_g, water_to_lye, superfat_fraction, fragrance_fraction) values ($1, $2, $3, $4, 'cold', 'curing', 10, 1000, 2, 0.05, 0.03)`, [workshopId, batchId, code, madeOn]);
    await sql(`insert into batch_ingredient (workshop_id, id, batch_id, material_id, lot_id, mass_g, share_of_oils_fraction, position) values ($1, $2, $3, $4, null, 1000, 1, 0), ($1, $5, $3, $6, $7, 30, 0.03, 1)`, [workshopId, uuidv7(), batchId, ids.fat, uuidv7(), ids.scent, lot]);
    if (!answer) return;
    await sql(`insert into inspection (workshop_id, id, batch_id, stage, inspected_at) values ($1, $2, $3, 'pour', '2026-02-03T10:00:00Z')`, [workshopId, inspectionId, batchId]);
    await sql(`insert into checklist_answer (workshop_id, id, inspection_id, batch_id, fault, answer) values ($1, $2, $3, $4, 'ricing', $5)`, [workshopId, uuidv7(), inspectionId, batchId, answer]);
    if (answer === 'found') await sql(`insert into finding (workshop_id, id, inspection_id, batch_id, fault, severity, bars_affected, bars_looked_at) values ($1, $2, $3, $4, 'ricing', 2, 3, 10)`, [workshopId, uuidv7(), inspectionId, batchId]);
  };
  await batch('C-1', ids.lot, 'found');
  await batch('C-2', ids.lot, 'clear');
  await batch('C-3', ids.lot, null);
  await batch('C-4', ids.other, 'clear');
  return ids;
}

const aClaim = (ids: { supplier: string; lot: string }, over: object = {}) => ({ id: uuidv7(), supplierId: ids.supplier, title: 'Ricing', lotIds: [ids.lot], faults: ['ricing'], ...over });
const rowsOf = (text: string) => parse<Record<string, string>>(text, { header: true, skipEmptyLines: true });

describe('the supplier’s CSV', () => {
  it('has one row per batch that used the lot, the good and the unchecked ones too', async () => {
    const world = await aWorkshop(app());
    const ids = await aStory(world);
    const claim = aClaim(ids);
    await world.owner.post('/api/claims', claim).expect(201);
    const { text, headers } = await world.owner.get(`/api/claims/${claim.id}/rows.csv`).expect(200);
    expect(headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(headers['content-disposition']).toBe('attachment; filename="claim-1-rows.csv"');
    const { data, errors } = rowsOf(text);
    expect(errors).toEqual([]);
    expect(data.map((row) => [row['batch code'], row['fault found'], row['severity 1 to 3'], row['bars affected'], row['bars looked at']])).toEqual([
      ['C-1', 'found', '2', '3', '10'], ['C-2', 'clear', '', '', ''], ['C-3', 'not checked', '', '', ''],
    ]);
    expect(data[0]).toMatchObject({ 'claim number': '1', supplier: 'Gannet Aromas', 'lot code': 'GA-77', 'received on': '2026-01-02', 'lye concentration percent': '33.3', 'fragrance percent of oils': '3', 'first seen at': 'pour', 'first seen on': '2026-02-03' });
  });

  it('never names a fat nor gives a gram, only the class of the formula', async () => {
    const world = await aWorkshop(app());
    const claim = aClaim(await aStory(world));
    await world.owner.post('/api/claims', claim).expect(201);
    const { text } = await world.owner.get(`/api/claims/${claim.id}/rows.csv`);
    expect(text).not.toMatch(/tallow|1000|Secret/i);
    expect(rowsOf(text).data[0]?.['formula class']).toBe('animal, hard fats 100 %, lauric oils 0 %');
  });

  it('neutralises what a spreadsheet would take for a formula, and carries a byte-order mark when asked', async () => {
    const world = await aWorkshop(app());
    const claim = aClaim(await aStory(world), { remarks: '@SUM(A1)' });
    await world.owner.post('/api/claims', claim).expect(201);
    const plain = await world.owner.get(`/api/claims/${claim.id}/rows.csv`);
    const [first] = rowsOf(plain.text).data;
    expect(first?.['fragrance name']).toBe("'=Harbour Fog");
    expect(first?.['remarks']).toBe("'@SUM(A1)");
    expect(plain.text.split('\r\n').length).toBe(5);
    const marked = await world.owner.raw('get', `/api/claims/${claim.id}/rows.csv?bom=yes`).buffer(true).parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
    expect((marked.body as Buffer).subarray(0, 3)).toEqual(Buffer.from([0xef, 0xbb, 0xbf]));
  });

  it('leaves out the columns that stay at home, and refuses to leave out what a row needs', async () => {
    const world = await aWorkshop(app());
    const ids = await aStory(world);
    const claim = aClaim(ids, { leaveOut: ['superfat percent', 'remarks'] });
    await world.owner.post('/api/claims', claim).expect(201);
    const { text } = await world.owner.get(`/api/claims/${claim.id}/rows.csv`);
    expect(text.split('\r\n')[0]).not.toMatch(/superfat|remarks/);
    const refused = await world.owner.post('/api/claims', aClaim(ids, { leaveOut: ['fault found'] })).expect(422);
    expect(refused.body.errors[0]).toMatchObject({ pointer: '#/leaveOut/0', detail: 'This column cannot be left out' });
  });

  it('says "not yet" of a batch too young to show the fault', async () => {
    const world = await aWorkshop(app());
    const ids = await aStory(world);
    await world.sql(`update batch set made_on = current_date where code = 'C-3'`);
    const claim = aClaim(ids, { faults: ['orange-spots'] });
    await world.owner.post('/api/claims', claim).expect(201);
    const { data } = rowsOf((await world.owner.get(`/api/claims/${claim.id}/rows.csv`)).text);
    expect(data.map((row) => [row['batch code'], row['fault found']])).toEqual([['C-1', 'not checked'], ['C-2', 'not checked'], ['C-3', 'not yet']]);
  });
});

describe('a claim', () => {
  it('shows before it goes out what would go, and how other lots did', async () => {
    const world = await aWorkshop(app());
    const claim = aClaim(await aStory(world));
    await world.owner.post('/api/claims', claim).expect(201);
    const { body } = await world.owner.get(`/api/claims/${claim.id}/preview`).expect(200);
    expect(body).toMatchObject({ rowCount: 3, batches: 3 });
    const of = (group: string) => body.comparison.find((row: { group: string }) => row.group === group);
    expect(of('this lot, cold')).toMatchObject({ batchesMade: 3, batchesChecked: 2, batchesWithFault: 1, rate: 0.5 });
    expect(of('other lots of this fragrance, cold')).toMatchObject({ batchesMade: 1, batchesChecked: 1, batchesWithFault: 0 });
    // Wilson 1927, 0 of 1 at 95 %: upper bound 0.7935 (recomputed: z²/(1+z²), z = 1.959964).
    expect(of('other lots of this fragrance, cold').upper).toBeCloseTo(0.7935, 4);
    expect(of('all other fragrances, hot')).toMatchObject({ batchesMade: 0, batchesChecked: 0, rate: null });
    const csv = rowsOf((await world.owner.get(`/api/claims/${claim.id}/comparison.csv`).expect(200)).text).data;
    expect(csv[0]).toMatchObject({ fault: 'ricing', group: 'this lot, cold', 'batches checked': '2', 'rate percent': '50' });
  });

  it('names the lot of another supplier, an unknown fault and a turned period at their fields', async () => {
    const world = await aWorkshop(app());
    const ids = await aStory(world);
    const { body } = await world.owner.post('/api/claims', aClaim(ids, { lotIds: [ids.lot, uuidv7()], faults: ['no-such-fault'], from: '2026-03-01', to: '2026-02-01' })).expect(422);
    expect(body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(['#/lotIds/1', '#/faults/0', '#/to']);
  });

  it('is numbered, listed, changed against the version seen, and drafted once', async () => {
    const world = await aWorkshop(app());
    const ids = await aStory(world);
    const [first, second] = [aClaim(ids), aClaim(ids)];
    await world.owner.post('/api/claims', first).expect(201);
    await world.owner.post('/api/claims', first).expect(200);
    await world.owner.post('/api/claims', second).expect(201);
    expect((await world.owner.get('/api/claims').expect(200)).body.items.map((claim: { number: number }) => claim.number)).toEqual([2, 1]);
    await world.owner.patch(`/api/claims/${first.id}`, { title: 'Ricing in February' }, 1).expect(200);
    expect((await world.owner.patch(`/api/claims/${first.id}`, { title: 'Late' }, 1).expect(412)).body.current).toMatchObject({ title: 'Ricing in February', number: 1 });
    expect((await world.owner.get(`/api/claims/${first.id}`).expect(200)).body.lots).toMatchObject([{ code: 'GA-77' }]);
  });

  it('is for owners and makers to draft and take out, and hidden from other workshops', async () => {
    const [world, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const ids = await aStory(world);
    const claim = aClaim(ids);
    await world.owner.post('/api/claims', claim).expect(201);
    for (const role of ['inspector', 'viewer'] as const) {
      const person = await world.member(role);
      await person.post('/api/claims', aClaim(ids)).expect(403);
      await person.get(`/api/claims/${claim.id}/rows.csv`).expect(403);
      await person.get(`/api/claims/${claim.id}/preview`).expect(200);
    }
    await there.owner.get(`/api/claims/${claim.id}/rows.csv`).expect(404);
    await there.owner.post('/api/claims', aClaim(ids)).expect(422);
  });
});
