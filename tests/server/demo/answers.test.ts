import request from 'supertest';
import { beforeAll, describe, expect, it } from 'vitest';
import { loadDemo } from '#server/demo/load.ts';
import { demoPassword } from '#server/demo/password.ts';
import type { CauseCell, CausesBoard } from '#shared/causes.ts';
import type { LotBehaviourRow, LotBehaviourView } from '#shared/lot-behaviour.ts';
import type { MethodComparison } from '#shared/method-comparison.ts';
import { appForFile } from '#tests/support/app.ts';
import { sessionCookie } from '#tests/support/world.ts';

const app = appForFile();
let cookie: string;
let whole: CausesBoard;
let cold: CausesBoard;

async function read<T>(path: string): Promise<T> {
  const answer = await request(app().url).get(path).set('Cookie', cookie);
  expect(answer.status, answer.text.slice(0, 300)).toBe(200);
  return answer.body as T;
}

/** The cell of a level by what it is called, e.g. a lot's code or a maker's first name. */
function cellNamed(board: CausesBoard, fault: string, input: string, name: string | null): CauseCell {
  const level = name === null ? null : board.inputs.find((one) => one.input === input)?.levels.find(({ label }) => label.startsWith(name))?.level;
  const cell = board.cells.find((one) => one.fault === fault && one.input === input && one.level === level);
  expect(cell, `${fault}, ${input}, ${name}`).toBeDefined();
  return cell!;
}
const leans = (cell: CauseCell) => (['settled', 'likely', 'hint'].includes(cell.grade) ? cell.direction : cell.grade);
const isFirm = (cell: CauseCell) => cell.grade === 'settled' || cell.grade === 'likely';

beforeAll(async () => {
  await loadDemo(app().database.ownerUrl, { today: '2026-08-31', report: () => undefined, uploadsDir: app().uploadsDir, mostPhotos: 0 });
  const signedIn = await request(app().url).post('/api/session').send({ email: 'ilse@quernbyloft.example', password: demoPassword });
  cookie = sessionCookie(signedIn);
  [whole, cold] = [await read<CausesBoard>('/api/causes'), await read<CausesBoard>('/api/causes?family=cold')];
}, 90_000);

describe('the causes of the invented workshop, as the API tells them', () => {
  it('accuses EF-7802 of acceleration in cold batches and not in hot ones', async () => {
    expect(cellNamed(whole, 'acceleration', 'fragranceLot', 'EF-7802')).toMatchObject({ grade: 'settled', direction: 'more', exposedN: 16, exposedEvents: 8 });
    expect(cellNamed(cold, 'acceleration', 'fragranceLot', 'EF-7802')).toMatchObject({ direction: 'more', exposedN: 10, exposedEvents: 8 });
    expect(isFirm(cellNamed(cold, 'acceleration', 'fragranceLot', 'EF-7802'))).toBe(true);
    const hot = await read<CausesBoard>('/api/causes?family=hot');
    expect(cellNamed(hot, 'acceleration', 'fragranceLot', 'EF-7802')).toMatchObject({ exposedN: 6, exposedEvents: 0, grade: 'too-few' });
    for (const other of ['EF-7731', 'EF-7860']) expect(isFirm(cellNamed(whole, 'acceleration', 'fragranceLot', other))).toBe(false);
  });

  it('does not blame Tomasz for acceleration or for ash', () => {
    expect(cellNamed(whole, 'acceleration', 'maker', 'Tomasz')).toMatchObject({ grade: 'too-few' });
    expect(isFirm(cellNamed(whole, 'soda-ash', 'maker', 'Tomasz'))).toBe(false);
    const ash = cellNamed(whole, 'soda-ash', 'maker', 'Tomasz');
    expect(ash.estimate!).toBeLessThan(ash.rawEstimate!);
  });

  it('finds more water with more ash, and keeps the gel on the path out of it', () => {
    const water = cellNamed(whole, 'soda-ash', 'waterToLye', null);
    expect(leans(water)).toBe('more');
    expect(water.estimate! / water.rawEstimate!).toBeGreaterThan(1);
    expect(water.onThePath).toContain('gel');
  });

  it('does not credit the silicone mould with less ash', () => {
    const mould = cellNamed(whole, 'soda-ash', 'mould', 'M2');
    expect(mould.rawEstimate!).toBeLessThan(0.65);
    expect(isFirm(mould)).toBe(false);
    expect(leans(mould)).not.toBe('less');
  });

  it('finds air pockets with hot process and not with Priya, who makes most of it', async () => {
    expect(leans(cellNamed(whole, 'air-pockets', 'methodFamily', 'Hot'))).toBe('more');
    const priya = cellNamed(whole, 'air-pockets', 'maker', 'Priya');
    expect(isFirm(priya)).toBe(false);
    const { faults, batches, onlyIn } = await read<MethodComparison>('/api/methods/comparison');
    expect(batches.hot + batches.cold).toBe(whole.generatedFrom.batches);
    expect(faults.find(({ fault }) => fault === 'air-pockets')!.difference!.lower).toBeGreaterThan(0.05);
    expect(onlyIn.map(({ label }) => label)).toEqual(expect.arrayContaining(['CS-6001', 'Salt']));
  });

  it('names vanillin and both Bakehouse lots for browning', () => {
    expect(cellNamed(whole, 'vanilla-browning', 'vanillinPct', null)).toMatchObject({ grade: 'settled', direction: 'more' });
    for (const lot of ['BK-0415', 'BK-0459']) expect(cellNamed(whole, 'vanilla-browning', 'fragranceLot', lot)).toMatchObject({ grade: 'settled', direction: 'more' });
  });

  it('leans to the old sunflower oil for orange spots', async () => {
    expect(leans(cellNamed(whole, 'orange-spots', 'fatLot', 'SU-884'))).toBe('more');
    const { items } = await read<{ items: LotBehaviourRow[] }>('/api/lots/behaviour?kind=fat');
    const sunflower = items.find(({ code }) => code === 'SU-884');
    expect(sunflower).toMatchObject({ worst: { fault: 'orange-spots' } });
    expect(['misbehaves', 'watch']).toContain(sunflower!.verdict);
  });

  it('cannot tell Clove Stove from its maker and its method', () => {
    const cells = whole.cells.filter((cell) => cell.input === 'fragranceLot' && cell.level === cellNamed(whole, 'air-pockets', 'fragranceLot', 'CS-6001').level);
    expect(cells.filter(isFirm)).toEqual([]);
    const tied = cellNamed(whole, 'air-pockets', 'fragranceLot', 'CS-6001');
    expect(tied.grade).toBe('not-told-apart');
    expect(tied.tiedWith.map(({ input }) => input).sort()).toEqual(['maker', 'methodFamily']);
  });

  it('has too little to tell of the Arbour Rose lot', () => {
    expect(cellNamed(whole, 'ricing', 'fragranceLot', 'GR-4120')).toMatchObject({ grade: 'too-few', exposedN: 3, exposedEvents: 1 });
  });
});

describe('the lots of the invented workshop', () => {
  it('suggests hot process only for EF-7802, and says how far none of six goes', async () => {
    const { items } = await read<{ items: LotBehaviourRow[] }>('/api/lots/behaviour?kind=fragrance');
    const lot = items.find(({ code }) => code === 'EF-7802')!;
    expect(lot).toMatchObject({ verdict: 'misbehaves', suggestedStanding: 'hot-process-only', standing: 'hot-process-only' });
    const one = await read<LotBehaviourView>(`/api/lots/${lot.lotId}/behaviour`);
    expect(one.because.find(({ fault }) => fault === 'acceleration')).toMatchObject({ coldN: 10, coldEvents: 8, hotN: 6, hotEvents: 0 });
    expect(one.because[0]!.hotUpper!).toBeCloseTo(0.39, 2);
    expect(one.sameMaterial.map(({ code }) => code).sort()).toEqual(['EF-7731', 'EF-7860']);
    expect(items.find(({ code }) => code === 'GR-4120')).toMatchObject({ verdict: 'too-few', suggestedStanding: null });
    expect(items.find(({ code }) => code === 'CS-6001')).toMatchObject({ verdict: 'too-few' });
  });
});
