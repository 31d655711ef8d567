import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { browserForFile, signedInPage, signInByHand } from '#tests/support/browser.ts';
import { aJpeg, aPhoto } from '#tests/support/pictures.ts';
import { aBatch } from '#tests/support/records.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';

const app = appForFile();
const browser = browserForFile();

/** A cut batch of twelve bars with one photo of it. */
async function aPhotographedBatch(world: World): Promise<string> {
  const batchId = await aBatch(world.owner, { bars: 12, state: 'curing', madeOn: '2026-03-14', cutOn: '2026-03-16' });
  await aPhoto(world.owner, { batchId, stage: 'cut' }, await aJpeg(1200, 800));
  return batchId;
}

interface Kept {
  fault: string;
  severity: number;
  bars: number[] | null;
  shape: string;
  x: number;
  withdrawn_at: Date | null;
}

const keptFindings = (world: World) => world.sql<Kept>('select f.fault, f.severity, f.bars, m.shape, m.x, f.withdrawn_at from finding f left join mark m on m.finding_id = f.id');

describe('marking a fault on a phone', () => {
  it('takes two touches for the likely fault and three for another, without typing', async () => {
    const world = await aWorkshop(app());
    const batchId = await aPhotographedBatch(world);
    const { page, complaints } = await signedInPage(browser(), app(), await world.member('inspector'), { width: 390, height: 844, hasTouch: true });
    await page.goto(`/inspect/${batchId}?stage=cut`);
    const photo = page.getByRole('group', { name: /^Photo: / });
    await photo.locator('img').waitFor();

    const opened = Date.now();
    const box = await photo.boundingBox();
    if (!box) throw new Error('the photo has no place on the page');
    let touches = 0;
    const touch = async (deed: () => Promise<void>) => { touches += 1; await deed(); };
    await touch(() => page.touchscreen.tap(box.x + box.width * 0.5, box.y + box.height * 0.5));
    const others = page.getByRole('radiogroup', { name: /^Fault/ }).getByRole('radio', { checked: false });
    const second = (await others.first().textContent())?.trim();
    await touch(() => others.first().tap());
    await touch(() => page.getByRole('button', { name: 'Keep', exact: true }).tap());
    await expect.poll(async () => (await keptFindings(world)).length, { timeout: 15_000 }).toBe(1);
    console.log(`mark a fault: ${touches} touches, ${((Date.now() - opened) / 1000).toFixed(1)} s from the open photo to the stored finding (${second})`);

    const [finding] = await keptFindings(world);
    expect(touches).toBeLessThanOrEqual(3);
    expect(finding).toMatchObject({ severity: expect.any(Number), shape: 'point', withdrawn_at: null });
    expect(finding?.x).toBeCloseTo(0.5, 1);
    expect(finding?.bars?.length).toBe(1);
    expect(complaints).toEqual([]);
  });

  it('can be undone, and the fault is not checked again, never clear', async () => {
    const world = await aWorkshop(app());
    const batchId = await aPhotographedBatch(world);
    const { page } = await signedInPage(browser(), app(), world.owner, { width: 390, height: 844, hasTouch: true });
    await page.goto(`/inspect/${batchId}?stage=cut`);
    const photo = page.getByRole('group', { name: /^Photo: / });
    await photo.tap({ position: { x: 120, y: 120 } });
    await page.getByRole('button', { name: 'Keep', exact: true }).tap();
    await expect.poll(async () => (await keptFindings(world)).length, { timeout: 15_000 }).toBe(1);
    await page.getByRole('button', { name: 'Undo' }).tap();
    await expect.poll(async () => (await keptFindings(world))[0]?.withdrawn_at ?? null, { timeout: 15_000 }).not.toBeNull();
    const answers = await world.sql<{ answer: string }>('select distinct answer from checklist_answer');
    expect(answers).toEqual([{ answer: 'not-checked' }]);
  });

  it('keeps all the rest as clear with one touch, and nothing that cannot be seen yet', async () => {
    const world = await aWorkshop(app());
    const batchId = await aPhotographedBatch(world);
    const { page } = await signedInPage(browser(), app(), world.owner, { width: 390, height: 844, hasTouch: true });
    await page.goto(`/inspect/${batchId}?stage=cut`);
    await page.getByRole('button', { name: /^All the rest clear/ }).tap();
    await expect.poll(async () => (await world.sql(`select 1 from checklist_answer where answer = 'clear'`)).length, { timeout: 15_000 }).toBeGreaterThan(10);
    const clear = await world.sql<{ fault: string }>(`select fault from checklist_answer where answer = 'clear'`);
    // Trade guide 5.1: neither can be judged at the cut.
    expect(clear.map(({ fault }) => fault)).not.toContain('orange-spots');
    expect(clear.map(({ fault }) => fault)).not.toContain('sweating');
  });
});

describe('marking a fault with the keyboard alone', () => {
  it('goes from the door to a kept finding and moves the mark with the arrows', async () => {
    const world = await aWorkshop(app());
    const batchId = await aPhotographedBatch(world);
    const context = await browser().newContext({ viewport: { width: 1280, height: 900 }, baseURL: app().url });
    const page = await context.newPage();
    page.setDefaultTimeout(20_000);
    await page.goto(`/sign-in?back=${encodeURIComponent(`/inspect/${batchId}?stage=cut`)}`);
    await page.getByLabel('E-mail address').focus();
    await page.keyboard.type(world.owner.email);
    await page.keyboard.press('Tab');
    await page.keyboard.type('a test loaf of soap');
    await page.keyboard.press('Enter');
    const photo = page.getByRole('group', { name: /^Photo: / });
    await photo.waitFor();
    await photo.focus();
    await page.keyboard.press('Enter');
    const pin = page.getByRole('button', { name: /, point$/ });
    await pin.focus();
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('Shift+ArrowRight');
    await page.getByRole('button', { name: 'Keep', exact: true }).focus();
    await page.keyboard.press('Enter');
    await expect.poll(async () => (await keptFindings(world)).length, { timeout: 15_000 }).toBe(1);
    expect((await keptFindings(world))[0]?.x).toBeCloseTo(0.56, 2);
    await context.close();
  });

  it('signs in by hand and finds its way back to where it was going', async () => {
    const world = await aWorkshop(app());
    const context = await browser().newContext({ baseURL: app().url });
    const page = await context.newPage();
    await signInByHand(page, world.owner);
    await page.getByRole('link', { name: 'Batches' }).first().waitFor();
    await context.close();
  });
});
