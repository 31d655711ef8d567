import AxeBuilder from '@axe-core/playwright';
import { beforeAll, describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { browserForFile, signedInPage } from '#tests/support/browser.ts';
import { recordsOfEachKind } from '#tests/support/one-of-each.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';

const app = appForFile();
const browser = browserForFile();
const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

let full: World;
let empty: World;
let addresses: string[];

beforeAll(async () => {
  full = await aWorkshop(app());
  empty = await aWorkshop(app());
  const ids = await recordsOfEachKind(full);
  addresses = [
    '/', '/inspect', `/inspect/${ids['batchId']}?stage=cut`, '/batches', `/batches/${ids['batchId']}`, '/batches/new', `/batches/${ids['batchId']}/change`,
    '/causes', '/methods', '/lots', `/lots/${ids['lotId']}`, '/claims', `/claims/${ids['claimId']}`, '/claims/new', '/import', `/import/${ids['importId']}`, '/workshop', '/pieces',
  ];
}, 120_000);

describe.each([
  { width: 1280, room: 'day' as const }, { width: 390, room: 'evening' as const },
])('every page at $width px by $room', ({ width, room }) => {
  it('breaks no rule of WCAG 2.2 A and AA, no content policy, and never scrolls sideways', async () => {
    const { page, complaints, context } = await signedInPage(browser(), app(), full.owner, { width, room });
    const broken: string[] = [];
    for (const address of addresses) {
      await page.goto(address, { waitUntil: 'networkidle' });
      await page.locator('h1').first().waitFor();
      const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
      broken.push(...violations.map(({ id, nodes }) => `${address}: ${id} at ${nodes[0]?.target.join(' ')} (${nodes.length})`));
      const sideways = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
      if (sideways > 0) broken.push(`${address}: ${sideways} px too wide`);
    }
    console.log(`every page: ${addresses.length} pages at ${width} px, ${broken.length} broken rules, ${complaints.length} complaints`);
    expect(broken).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  }, 400_000);

  it('says what to do next where there is nothing yet', async () => {
    const { page, context } = await signedInPage(browser(), app(), empty.owner, { width, room });
    for (const address of ['/', '/inspect', '/batches', '/causes', '/methods', '/lots', '/claims', '/import']) {
      await page.goto(address, { waitUntil: 'networkidle' });
      await page.locator('h1').first().waitFor();
      const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
      expect(violations.map(({ id }) => id), address).toEqual([]);
    }
    await context.close();
  }, 400_000);
});

describe('the door', () => {
  it.each(['/sign-in', '/sign-up', '/reset'])('at %s breaks no rule', async (address) => {
    const context = await browser().newContext({ baseURL: app().url });
    const page = await context.newPage();
    await page.goto(address, { waitUntil: 'networkidle' });
    const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
    expect(violations.map(({ id, nodes }) => `${id} ${nodes[0]?.target.join(' ')}`)).toEqual([]);
    await context.close();
  });
});

