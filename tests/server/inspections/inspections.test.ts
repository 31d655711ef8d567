import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { checklistFor } from '#server/features/faults/checklist.ts';
import { appForFile } from '#tests/support/app.ts';
import { aFinding, aLook } from '#tests/support/looks.ts';
import { aBatchRow } from '#tests/support/rows.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();
const answersOf = (body: { answers: { fault: string; answer: string }[] }) => new Map(body.answers.map(({ fault, answer }) => [fault, answer]));
const pointers = (body: { errors: { pointer: string }[] }) => body.errors.map(({ pointer }) => pointer);

describe('recording an inspection', () => {
  it('keeps every fault of the checklist, those nobody answered as not checked, never clear', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ answers: [{ fault: 'ricing', answer: 'clear' }], findings: [aFinding()] })).expect(201);
    const answers = answersOf(body);
    expect([...answers.keys()]).toEqual(checklistFor('cut', 'cold').map(({ fault }) => fault));
    expect(answers.get('soda-ash')).toBe('found');
    expect(answers.get('ricing')).toBe('clear');
    expect([...answers.values()].filter((answer) => answer === 'not-checked')).toHaveLength(answers.size - 2);
    expect(body).toMatchObject({ stage: 'cut', barsLookedAt: 10, inspectorName: 'Test owner', version: 1 });
    expect(body.findings).toMatchObject([{ fault: 'soda-ash', severity: 2, barsLookedAt: 10, isWithdrawn: false }]);
    const [outcome] = await world.sql<{ found: string[]; checked: string[] }>('select found, checked from batch_outcome where batch_id = $1', [batchId]);
    expect(outcome).toEqual({ found: ['soda-ash'], checked: ['ricing', 'soda-ash'] });
  });

  it('answers the same look again with the same inspection, and another under its id with 409', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const look = aLook({ findings: [aFinding()] });
    const first = await world.owner.post(`/api/batches/${batchId}/inspections`, look).expect(201);
    const again = await world.owner.post(`/api/batches/${batchId}/inspections`, look).expect(200);
    expect(again.body).toEqual(first.body);
    await world.owner.post(`/api/batches/${batchId}/inspections`, { ...look, note: 'other' }).expect(409);
    const at = await Promise.all(Array.from({ length: 8 }, () => world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ id: '01890000-0000-7000-8000-00000000aaaa' }))));
    expect(at.map(({ status }) => status).sort()).toEqual([200, 200, 200, 200, 200, 200, 200, 201]);
    expect((await world.owner.get(`/api/batches/${batchId}/inspections`)).body.items).toHaveLength(2);
  });

  it('refuses an answer for what cannot be seen yet, at its field, and says from when it can', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ answers: [{ fault: 'ricing', answer: 'clear' }, { fault: 'orange-spots', answer: 'clear' }] })).expect(422);
    expect(body.errors).toEqual([{ pointer: '#/answers/1/answer', detail: 'Orange spots cannot be seen yet at the cut, only from week 4 on' }]);
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ answers: [{ fault: 'orange-spots', answer: 'not-checked' }] })).expect(201);
  });

  it('refuses an answer for what can no longer be judged, and for what the method does not bring', async () => {
    const world = await aWorkshop(app());
    const hot = await aBatchRow(world, { method: 'hot' });
    const late = await world.owner.post(`/api/batches/${hot}/inspections`, aLook({ answers: [{ fault: 'acceleration', answer: 'clear' }] })).expect(422);
    expect(late.body.errors[0].detail).toBe('Acceleration cannot be judged at the cut, only at the pour');
    const wrong = await world.owner.post(`/api/batches/${hot}/inspections`, aLook({ stage: 'pour', answers: [{ fault: 'false-trace', answer: 'clear' }], findings: [aFinding({ fault: 'false-trace', severity: 1 })] })).expect(422);
    expect(pointers(wrong.body)).toEqual(['#/answers/0/answer', '#/findings/0/fault']);
    expect(wrong.body.errors[1].detail).toBe('False trace does not occur in hot process');
  });

  it('names every answer and finding that contradict each other', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({
      barsLookedAt: 11,
      answers: [{ fault: 'soda-ash', answer: 'clear' }, { fault: 'ricing', answer: 'found' }, { fault: 'ricing', answer: 'clear' }, { fault: 'no-such', answer: 'clear' }],
      findings: [aFinding(), aFinding({ severity: 1 })],
    })).expect(422);
    expect(pointers(body)).toEqual(['#/answers/0/answer', '#/answers/1/answer', '#/answers/2/fault', '#/answers/3/fault', '#/barsLookedAt', '#/findings/0/barsLookedAt', '#/findings/1/barsLookedAt', '#/findings/1/fault']);
    expect((await world.owner.get(`/api/batches/${batchId}/inspections`)).body.items).toEqual([]);
  });

  it('takes the day of the cut and of an empty mould from the look, and lets the batch cure', async () => {
    const world = await aWorkshop(app());
    await world.sql(`update workshop set time_zone = 'Pacific/Auckland' where id = $1`, [world.workshopId]);
    const batchId = await aBatchRow(world);
    // 23:30 UTC on the 3rd is noon of the 4th in the workshop.
    const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ stage: 'unmould', inspectedAt: '2026-03-03T23:30:00Z' })).expect(201);
    expect(body.batchState).toBe('curing');
    const read = () => world.sql('select unmoulded_on::text unmoulded, cut_on::text cut, state, version from batch where id = $1', [batchId]);
    expect(await read()).toEqual([{ unmoulded: '2026-03-04', cut: null, state: 'curing', version: 2 }]);
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ inspectedAt: '2026-03-04T20:00:00Z' })).expect(201);
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ inspectedAt: '2026-03-09T20:00:00Z' })).expect(201);
    expect(await read()).toEqual([{ unmoulded: '2026-03-04', cut: '2026-03-05', state: 'curing', version: 3 }]);
  });

  it('keeps days that somebody entered, and states further on', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world, { state: 'cured', unmoulded_on: '2026-03-03', cut_on: '2026-03-03' });
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ inspectedAt: '2026-03-05T10:00:00Z' })).expect(201);
    expect(await world.sql('select cut_on::text cut, state, version from batch where id = $1', [batchId])).toEqual([{ cut: '2026-03-03', state: 'cured', version: 1 }]);
  });

  it('refuses a look before the pour, in the future, or at a batch that is only planned', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const before = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ inspectedAt: '2026-03-01T10:00:00Z' })).expect(422);
    expect(before.body.errors).toEqual([{ pointer: '#/inspectedAt', detail: 'The inspection lies before the batch was made (2026-03-02)' }]);
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ inspectedAt: '2090-03-01T10:00:00Z' })).expect(422);
    const planned = await aBatchRow(world, { state: 'planned' });
    await world.owner.post(`/api/batches/${planned}/inspections`, aLook()).expect(409);
  });

  it('keeps readings with the look and refuses those out of range or of a bar that is not there', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const reading = { id: uuidv7(), kind: 'bar-mass-g', value: 118.5, bar: 3 };
    const { body } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ stage: 'cure-w1', readings: [reading] })).expect(201);
    expect(body.readings).toEqual([reading]);
    const wrong = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ readings: [{ id: uuidv7(), kind: 'humidity-fraction', value: 62 }] })).expect(422);
    expect(pointers(wrong.body)).toEqual(['#/readings/0/value']);
    const noBar = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ readings: [{ ...reading, id: uuidv7(), bar: 11 }] })).expect(422);
    expect(pointers(noBar.body)).toEqual(['#/readings/0/bar']);
  });

  it('is for inspectors too, not for viewers, and for nobody of another workshop', async () => {
    const world = await aWorkshop(app());
    const [inspector, viewer] = [await world.member('inspector'), await world.member('viewer')];
    const batchId = await aBatchRow(world);
    const made = await inspector.post(`/api/batches/${batchId}/inspections`, aLook()).expect(201);
    await viewer.post(`/api/batches/${batchId}/inspections`, aLook()).expect(403);
    await viewer.get(`/api/inspections/${made.body.id}`).expect(200);
    const there = await aWorkshop(app());
    await there.owner.post(`/api/batches/${batchId}/inspections`, aLook()).expect(404);
    await there.owner.get(`/api/batches/${batchId}/inspections`).expect(404);
    await there.owner.get(`/api/inspections/${made.body.id}`).expect(404);
    await there.owner.patch(`/api/inspections/${made.body.id}`, { note: 'x' }, 1).expect(404);
    await there.owner.post(`/api/inspections/${made.body.id}/findings`, aFinding()).expect(404);
  });
});

describe('answering more of a checklist', () => {
  it('changes the answers named and leaves the others', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const { body: look } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ answers: [{ fault: 'ricing', answer: 'clear' }], note: 'by the window' })).expect(201);
    const { body } = await world.owner.patch(`/api/inspections/${look.id}`, { answers: [{ fault: 'glycerin-rivers', answer: 'clear' }] }, 1).expect(200);
    expect(body).toMatchObject({ version: 2, note: 'by the window' });
    expect([answersOf(body).get('ricing'), answersOf(body).get('glycerin-rivers'), answersOf(body).get('soda-ash')]).toEqual(['clear', 'clear', 'not-checked']);
    const stale = await world.owner.patch(`/api/inspections/${look.id}`, { note: 'other' }, 1).expect(412);
    expect(stale.body.current).toMatchObject({ id: look.id, version: 2 });
    await world.owner.patch(`/api/inspections/${look.id}`, { note: 'other' }).expect(428);
  });

  it('never clears a fault over its finding, and finds none without one', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const { body: look } = await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ findings: [aFinding()] })).expect(201);
    const { body } = await world.owner.patch(`/api/inspections/${look.id}`, { answers: [{ fault: 'soda-ash', answer: 'clear' }, { fault: 'ricing', answer: 'found' }] }, 1).expect(422);
    expect(body.errors.map(({ detail }: { detail: string }) => detail)).toEqual([
      'Soda ash has a finding at this inspection; take the finding back first', 'Ricing is found once its finding says how severe it is',
    ]);
  });
});
