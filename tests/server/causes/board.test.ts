import { v7 as uuidv7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { CauseCell, CauseDetail, CausesBoard } from '#shared/causes.ts';
import { ROLES } from '#shared/words/roles.ts';
import { appForFile } from '#tests/support/app.ts';
import { plantedHistory, type PlantedHistory } from '#tests/support/planted.ts';
import { aBatch, aLook } from '#tests/support/records.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';

const app = appForFile();
let world: World;
let planted: PlantedHistory;
const board = async (query = '') => (await world.owner.get(`/api/causes${query}`).expect(200)).body as CausesBoard;
const cellOf = (answer: CausesBoard, fault: string, input: string, level: string | null): CauseCell =>
  answer.cells.find((cell) => cell.fault === fault && cell.input === input && cell.level === level)!;

beforeAll(async () => {
  world = await aWorkshop(app());
  planted = await plantedHistory(world);
});

describe('GET /api/causes', () => {
  it('names the bad lot and not the maker who poured most of it', async () => {
    const answer = await board();
    expect(cellOf(answer, 'acceleration', 'fragranceLot', planted.badLot)).toMatchObject({ grade: 'settled', direction: 'more', exposedN: 18, exposedEvents: 9 });
    const makers = answer.cells.filter((cell) => cell.fault === 'acceleration' && cell.input === 'maker');
    expect(makers.length).toBeGreaterThan(0);
    expect(makers.map((cell) => cell.grade).filter((grade) => grade === 'settled' || grade === 'likely')).toEqual([]);
    expect(answer.generatedFrom).toMatchObject({ batches: 156, leftOut: [], firstMadeOn: '2025-01-06', filter: { from: null, to: null, family: null, formula: null } });
    expect(answer.inputs.find(({ input }) => input === 'fragranceLot')?.levels.map(({ label, detail }) => [label, detail])).toContainEqual(['HF-100', 'Harbour Fog']);
  });

  it('counts what was not looked at apart: it changes no rate', async () => {
    const before = await board();
    for (let i = 0; i < 8; i++) {
      await world.sql(`insert into batch (workshop_id, id, code, made_on, method, state, maker_id) values ($1, $2, $3, '2025-03-01', 'cold', 'closed', $4)`, [world.workshopId, uuidv7(), `U-${i}`, planted.unlucky]);
    }
    const after = await board();
    expect(after.generatedFrom.batches).toBe(before.generatedFrom.batches + 8);
    expect(after.generatedFrom.dataRevision).toBeGreaterThan(before.generatedFrom.dataRevision);
    const [old, now] = [before, after].map((answer) => answer.faults.find(({ fault }) => fault === 'acceleration')!);
    expect(now).toMatchObject({ checked: old!.checked, found: old!.found, notChecked: old!.notChecked + 8 });
    const [oldCell, newCell] = [before, after].map((answer) => cellOf(answer, 'acceleration', 'maker', answer.cells.find((cell) => cell.input === 'maker')!.level));
    expect([newCell!.n, newCell!.events, newCell!.exposedN, newCell!.exposedEvents, newCell!.rawEstimate]).toEqual([oldCell!.n, oldCell!.events, oldCell!.exposedN, oldCell!.exposedEvents, oldCell!.rawEstimate]);
    expect(newCell!.notChecked).toBe(oldCell!.notChecked + 8);
  });

  it('says which batches are left out and why, and which are too young', async () => {
    const own = await aWorkshop(app());
    const today = new Date().toISOString().slice(0, 10);
    await aBatch(own.owner, { method: 'rebatch', state: 'curing' });
    await aBatch(own.owner, { state: 'planned' });
    await aBatch(own.owner, { madeOn: today, state: 'in-mould' });
    const dropped = await aBatch(own.owner, {});
    await own.sql(`update batch set state = 'abandoned' where id = $1`, [dropped]);
    const answer = (await own.owner.get('/api/causes').expect(200)).body as CausesBoard;
    expect(answer.generatedFrom).toMatchObject({ batches: 1, leftOut: [{ reason: 'abandoned', count: 1 }, { reason: 'not-made-yet', count: 1 }, { reason: 'rebatch', count: 1 }] });
    expect(answer.faults.find(({ fault }) => fault === 'orange-spots')).toMatchObject({ checked: 0, notChecked: 0, notYet: 1 });
    expect(answer.faults.find(({ fault }) => fault === 'acceleration')).toMatchObject({ notChecked: 1, notYet: 0 });
  });

  it('follows a finding made in between', async () => {
    const own = await aWorkshop(app());
    const batch = await aBatch(own.owner, { state: 'curing' });
    const ash = async () => ((await own.owner.get('/api/causes').expect(200)).body as CausesBoard).faults.find(({ fault }) => fault === 'soda-ash');
    expect(await ash()).toMatchObject({ checked: 0, found: 0 });
    await aLook(own, batch, { 'soda-ash': 2 });
    expect(await ash()).toMatchObject({ checked: 1, found: 1 });
  });

  it('counts what the filter says, and says it back', async () => {
    const hot = await board('?family=hot');
    expect(hot.generatedFrom).toMatchObject({ batches: 36, filter: { family: 'hot' } });
    expect(hot.faults.find(({ fault }) => fault === 'acceleration')).toMatchObject({ checked: 36, found: 0 });
    const some = await board('?from=2025-01-06&to=2025-01-15');
    expect(some.generatedFrom).toMatchObject({ batches: 10, firstMadeOn: '2025-01-06', lastMadeOn: '2025-01-15' });
    await world.owner.get('/api/causes?from=2025-02-01&to=2025-01-01').expect(422);
    await world.owner.get('/api/causes?from=soon').expect(422);
    await world.owner.get(`/api/causes?formula=${uuidv7()}`).expect(422);
  });

  it('works one answer out for all who ask at once, and keeps it', async () => {
    const answers = await Promise.all(Array.from({ length: 5 }, () => board('?from=2025-01-07')));
    expect(new Set(answers.map((answer) => answer.generatedFrom.computedAt)).size).toBe(1);
    expect((await board('?from=2025-01-07')).generatedFrom.computedAt).toBe(answers[0]!.generatedFrom.computedAt);
  });

  it('is read by every role and nobody else, and never shows another workshop', async () => {
    for (const role of ROLES) await (await world.member(role)).get('/api/causes').expect(200);
    const stranger = (await aWorkshop(app())).owner;
    const theirs = (await stranger.get('/api/causes').expect(200)).body as CausesBoard;
    expect(theirs.generatedFrom.batches).toBe(0);
    expect(JSON.stringify(theirs)).not.toContain(planted.badLot);
    await stranger.get(`/api/causes/acceleration/fragranceLot?level=${planted.badLot}`).expect(404);
    await stranger.get(`/api/lots/${planted.badLot}/behaviour`).expect(404);
  });
});

describe('GET /api/causes/:fault/:input', () => {
  it('shows what one cause rests on', async () => {
    const cause = (await world.owner.get(`/api/causes/acceleration/fragranceLot?level=${planted.badLot}`).expect(200)).body as CauseDetail;
    expect(cause).toMatchObject({ levelLabel: 'Harbour Fog HF-100', cell: { grade: 'settled' }, fault: { name: 'Acceleration' } });
    expect(cause.raw.estimate!).toBeGreaterThan(5);
    expect(cause.leaveOneOut!.lowest).toBeLessThan(cause.leaveOneOut!.highest);
    expect(cause.strata.reduce((sum, stratum) => sum + stratum.exposedEvents, 0)).toBe(9);
    expect(cause.strata.every((stratum) => stratum.makerName !== null)).toBe(true);
    const water = (await world.owner.get('/api/causes/acceleration/waterToLye').expect(200)).body as CauseDetail;
    expect(water.bins.reduce((sum, bin) => sum + bin.n, 0)).toBe(water.cell.n);
    expect(water.above).toBeGreaterThan(1.7);
  });

  it('opens every figure into its batches', async () => {
    const at = `/api/causes/acceleration/fragranceLot/batches?level=${planted.badLot}`;
    const cell = cellOf(await board(), 'acceleration', 'fragranceLot', planted.badLot);
    for (const [group, n, events] of [['exposed', cell.exposedN, cell.exposedEvents], ['unexposed', cell.unexposedN, cell.unexposedEvents]] as const) {
      const found = (await world.owner.get(`${at}&group=${group}&outcome=found`).expect(200)).body;
      const clear = (await world.owner.get(`${at}&group=${group}&outcome=clear`).expect(200)).body;
      expect([found.total, found.total + clear.total]).toEqual([events, n]);
      expect(found.items.every((batch: { severity: number }) => batch.severity > 0)).toBe(true);
    }
  });

  it('knows no fault, input or level that is not on the board', async () => {
    await world.owner.get('/api/causes/moon-phase/maker').expect(404);
    await world.owner.get('/api/causes/acceleration/moonPhase').expect(404);
    await world.owner.get(`/api/causes/acceleration/maker?level=${uuidv7()}`).expect(404);
    await world.owner.get('/api/causes/Not%20a%20fault/maker').expect(422);
  });
});

describe('lots and methods', () => {
  it('suggests hot process only for the bad lot and leaves its peers alone', async () => {
    const { items } = (await world.owner.get('/api/lots/behaviour?kind=fragrance').expect(200)).body;
    expect(items).toHaveLength(5);
    expect(items[0]).toMatchObject({ code: 'HF-100', verdict: 'misbehaves', suggestedStanding: 'hot-process-only', worst: { fault: 'acceleration', cold: { n: 12, events: 9 }, hot: { n: 6, events: 0 } } });
    expect(items.slice(1).map((lot: { verdict: string }) => lot.verdict)).not.toContain('misbehaves');
    const one = (await world.owner.get(`/api/lots/${planted.badLot}/behaviour`).expect(200)).body;
    expect(one).toMatchObject({ code: 'HF-100', peers: 4, n: 18, coldBatches: 12, hotBatches: 6 });
    expect(one.batches).toHaveLength(18);
    expect(one.sameMaterial).toHaveLength(4);
    await world.owner.get('/api/lots/behaviour?kind=packaging').expect(422);
  });

  it('has an answer for a lot nothing was made with', async () => {
    const lot = uuidv7();
    await world.sql(`insert into lot (workshop_id, id, material_id, code) select $1, $2, id, 'HF-NEW' from material limit 1`, [world.workshopId, lot]);
    expect((await world.owner.get(`/api/lots/${lot}/behaviour`).expect(200)).body).toMatchObject({ n: 0, verdict: 'too-few', suggestedStanding: null, batches: [] });
  });

  it('puts hot beside cold with their counts', async () => {
    const answer = (await world.owner.get('/api/methods/comparison').expect(200)).body;
    expect(answer.batches).toEqual({ hot: 36, cold: 128 });
    expect(answer.faults.find(({ fault }: { fault: string }) => fault === 'acceleration')).toMatchObject({ hot: { n: 36, events: 0 }, cold: { n: 120 } });
  });
});
