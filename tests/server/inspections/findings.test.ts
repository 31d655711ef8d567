import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aFinding, aLook } from '#tests/support/looks.ts';
import { aBatchRow, aPhotoRow } from '#tests/support/rows.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';

const app = appForFile();
const pointers = (body: { errors: { pointer: string }[] }) => body.errors.map(({ pointer }) => pointer);

async function lookedAt(over: object = {}, batch: Record<string, unknown> = {}) {
  const world = await aWorkshop(app());
  const batchId = await aBatchRow(world, batch);
  const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook(over)).expect(201);
  return { world, batchId, lookId: body.id as string };
}
const answerOf = async (world: World, lookId: string, fault: string) =>
  (await world.owner.get(`/api/inspections/${lookId}`)).body.answers.find((answer: { fault: string }) => answer.fault === fault)?.answer;

describe('findings', () => {
  it('makes the answer found when kept, not checked when taken back, and found when kept again', async () => {
    const { world, batchId, lookId } = await lookedAt({ answers: [{ fault: 'soda-ash', answer: 'clear' }] });
    const { body: kept } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ bars: [4, 2, 2] })).expect(201);
    expect(kept).toMatchObject({ bars: [2, 4], barsAffected: 2, barsLookedAt: 10, inspectionId: lookId, batchId });
    expect(await answerOf(world, lookId, 'soda-ash')).toBe('found');
    const back = await world.owner.put(`/api/findings/${kept.id}/withdrawal`, { isWithdrawn: true }, 1).expect(200);
    expect(back.body).toMatchObject({ isWithdrawn: true, version: 2 });
    expect(await answerOf(world, lookId, 'soda-ash')).toBe('not-checked');
    expect(await world.sql('select found, checked from batch_outcome where batch_id = $1', [batchId])).toEqual([{ found: [], checked: [] }]);
    await world.owner.patch(`/api/findings/${kept.id}`, { severity: 1 }, 2).expect(409);
    await world.owner.put(`/api/findings/${kept.id}/withdrawal`, { isWithdrawn: false }, 2).expect(200);
    expect(await answerOf(world, lookId, 'soda-ash')).toBe('found');
    expect(await world.sql(`select outcomes ->> 'soda-ash' worst from batch_outcome where batch_id = $1`, [batchId])).toEqual([{ worst: '2' }]);
  });

  it('gives the same finding to a repeat', async () => {
    const { world, lookId } = await lookedAt();
    const wish = aFinding();
    const first = await world.owner.post(`/api/inspections/${lookId}/findings`, wish).expect(201);
    expect((await world.owner.post(`/api/inspections/${lookId}/findings`, wish).expect(200)).body).toEqual(first.body);
    await world.owner.post(`/api/inspections/${lookId}/findings`, { ...wish, severity: 3 }).expect(409);
  });

  it('lets one of two people win who keep the same fault at once', async () => {
    const { world, lookId } = await lookedAt();
    const [maker, inspector] = [await world.member('maker'), await world.member('inspector')];
    for (const fault of ['soda-ash', 'glycerin-rivers', 'ricing', 'air-pockets', 'drag-marks']) {
      const both = await Promise.all([maker, inspector].map((person) => person.post(`/api/inspections/${lookId}/findings`, aFinding({ fault }))));
      expect(both.map(({ status }) => status).sort()).toEqual([201, 409]);
      expect(both.find(({ status }) => status === 409)?.body.detail).toMatch(/already kept at this inspection; change that finding instead/);
    }
    const { body } = await world.owner.get(`/api/inspections/${lookId}`);
    expect(body.findings).toHaveLength(5);
  });

  it('refuses to keep a withdrawn finding again once the fault has another', async () => {
    const { world, lookId } = await lookedAt();
    const { body: first } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding());
    await world.owner.put(`/api/findings/${first.id}/withdrawal`, { isWithdrawn: true }, 1).expect(200);
    await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ severity: 1 })).expect(201);
    await world.owner.put(`/api/findings/${first.id}/withdrawal`, { isWithdrawn: false }, 2).expect(409);
  });

  it('knows only the severities that a fault has', async () => {
    const { world, lookId } = await lookedAt();
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'lye-pockets', severity: 2 })).expect(422);
    expect(body.errors).toEqual([{ pointer: '#/severity', detail: 'Lye pockets always has severity 3' }]);
    const low = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'lye-heavy', severity: 1 })).expect(422);
    expect(low.body.errors[0].detail).toBe('Lye heavy has severity 2 or 3 only');
  });

  it('refuses a finding of what cannot be seen at the stage', async () => {
    const { world, lookId } = await lookedAt();
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'wrap-marks' })).expect(422);
    expect(body.errors).toEqual([{ pointer: '#/fault', detail: 'Wrap marks cannot be seen yet at the cut, only from release on' }]);
  });

  it('counts no bars that the batch does not have, and never more affected than looked at', async () => {
    const { world, lookId } = await lookedAt();
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ bars: [1, 11, 12] })).expect(422);
    expect(body.errors).toEqual([{ pointer: '#/bars', detail: 'The batch has bars 1 to 10; there is no bar 11, 12' }]);
    const more = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ barsAffected: 5, barsLookedAt: 4 })).expect(422);
    expect(more.body.errors).toEqual([{ pointer: '#/barsAffected', detail: 'Bars affected must be at most 4, the bars looked at' }]);
    const fewer = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ bars: [1, 2, 3], barsAffected: 2 })).expect(422);
    expect(pointers(fewer.body)).toEqual(['#/barsAffected']);
    await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ barsAffected: 10 })).expect(201);
  });

  it('changes what is named, keeps the rest, and lets the count follow the bars', async () => {
    const { world, lookId } = await lookedAt();
    const { body: kept } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ bars: [1, 2], note: 'corners' }));
    const { body } = await world.owner.patch(`/api/findings/${kept.id}`, { severity: 3, bars: [1, 2, 3] }, 1).expect(200);
    expect(body).toMatchObject({ version: 2, severity: 3, bars: [1, 2, 3], barsAffected: 3, note: 'corners' });
    await world.owner.patch(`/api/findings/${kept.id}`, { note: 'x' }, 1).expect(412);
    const wrong = await world.owner.patch(`/api/findings/${kept.id}`, { bars: [99] }, 2).expect(422);
    expect(pointers(wrong.body)).toEqual(['#/bars']);
  });
});

describe('marks', () => {
  const point = (photoId: string, over: object = {}) => ({ id: uuidv7(), photoId, shape: 'point', x: 0.25, y: 0.75, ...over });

  it('keeps points, boxes and outlines on photos of the batch, and replaces them whole', async () => {
    const { world, batchId, lookId } = await lookedAt();
    const photoId = await aPhotoRow(world, batchId);
    const marks = [point(photoId), point(photoId, { shape: 'box', width: 0.5, height: 0.25 }), point(photoId, { shape: 'outline', outline: [[0.1, 0.1], [0.2, 0.1], [0.2, 0.3]] })];
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ marks })).expect(201);
    expect(body.marks).toEqual([
      { ...marks[0], width: null, height: null, outline: null }, { ...marks[1], outline: null }, { ...marks[2], width: null, height: null },
    ]);
    const { body: changed } = await world.owner.patch(`/api/findings/${body.id}`, { marks: [marks[1]] }, 1).expect(200);
    expect(changed.marks).toEqual([{ ...marks[1], outline: null }]);
    expect((await world.owner.patch(`/api/findings/${body.id}`, { note: 'kept' }, 2).expect(200)).body.marks).toHaveLength(1);
  });

  it('refuses photos of another batch, of no batch, and of another workshop alike', async () => {
    const { world, lookId } = await lookedAt();
    const there = await aWorkshop(app());
    const others = [await aPhotoRow(world, await aBatchRow(world)), await aPhotoRow(world, null), await aPhotoRow(there, await aBatchRow(there)), uuidv7()];
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ marks: others.map((photoId) => point(photoId)) })).expect(422);
    expect(body.errors).toEqual(others.map((_photo, index) => ({ pointer: `#/marks/${index}/photoId`, detail: 'A mark must sit on a photo of the same batch' })));
  });

  it('stays inside the picture and takes no id of another finding', async () => {
    const { world, batchId, lookId } = await lookedAt();
    const photoId = await aPhotoRow(world, batchId);
    const outside = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ marks: [point(photoId, { x: 1.2 }), point(photoId, { shape: 'box', x: 0.8, width: 0.4, height: 0.1 })] })).expect(422);
    expect(pointers(outside.body)).toEqual(['#/marks/0/x', '#/marks/1']);
    const mark = point(photoId);
    await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ marks: [mark] })).expect(201);
    await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'ricing', marks: [mark] })).expect(409);
  });
});

describe('a finding of safety', () => {
  const holdOf = async (world: World, batchId: string) => (await world.sql<{ hold_reason: string | null }>('select hold_reason from batch where id = $1', [batchId]))[0]?.hold_reason;

  it('holds the batch, says so, and lets it go only with the last one taken back', async () => {
    const { world, batchId, lookId } = await lookedAt();
    const { body: pockets } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'lye-pockets', severity: 3 })).expect(201);
    expect(pockets.batchHoldReason).toBe('Lye pockets found at the cut');
    await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'foreign-matter', severity: 3 })).expect(201);
    expect((await world.owner.get(`/api/inspections/${lookId}`)).body.batchHoldReason).toBe('Lye pockets found at the cut');
    await world.owner.put(`/api/findings/${pockets.id}/withdrawal`, { isWithdrawn: true }, 1).expect(200);
    expect(await holdOf(world, batchId)).toBe('Foreign matter found at the cut');
  });

  it('holds at once when recorded with its look, and when separation shows watery lye', async () => {
    const one = await lookedAt({ findings: [aFinding({ fault: 'lye-heavy', severity: 3 })] });
    expect(await holdOf(one.world, one.batchId)).toBe('Lye heavy found at the cut');
    const two = await lookedAt();
    const { body } = await two.world.owner.post(`/api/inspections/${two.lookId}/findings`, aFinding({ fault: 'separation', severity: 2 })).expect(201);
    expect(body.batchHoldReason).toBeNull();
    const worse = await two.world.owner.patch(`/api/findings/${body.id}`, { severity: 3 }, 1).expect(200);
    expect(worse.body.batchHoldReason).toBe('Separation found at the cut');
  });

  it('leaves a reason that a person wrote', async () => {
    const { world, batchId, lookId } = await lookedAt({}, { hold_reason: 'Castor forgotten' });
    const { body } = await world.owner.post(`/api/inspections/${lookId}/findings`, aFinding({ fault: 'lye-heavy', severity: 2 })).expect(201);
    await world.owner.put(`/api/findings/${body.id}/withdrawal`, { isWithdrawn: true }, 1).expect(200);
    expect(await holdOf(world, batchId)).toBe('Castor forgotten');
  });
});
