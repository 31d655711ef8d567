import { readFile } from 'node:fs/promises';
import { parse } from 'papaparse';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { browserForFile, signedInPage } from '#tests/support/browser.ts';
import { aBatch, aLook, aLot, aMaterial } from '#tests/support/records.ts';
import { aWorkshop } from '#tests/support/world.ts';
import { v7 as uuidv7 } from 'uuid';

const app = appForFile();
const browser = browserForFile();

describe('handing the supplier a CSV', () => {
  it('goes from supplier, lot and fault to a file with the good batches in it', async () => {
    const world = await aWorkshop(app());
    const [supplierId, materialId] = [uuidv7(), await aMaterial(world.owner, { name: 'Harbour Fog' })];
    await world.owner.post('/api/suppliers', { id: supplierId, name: 'Gannet Aromas' }).expect(201);
    const lotId = await aLot(world.owner, { materialId, supplierId, code: 'GA-77' });
    for (const [index, severity] of [2, 0, 0].entries()) {
      const batchId = await aBatch(world.owner, { code: `C-${index + 1}`, ingredients: [{ id: uuidv7(), materialId, lotId, shareOfOilsFraction: 0.03 }] });
      await aLook(world, batchId, { 'air-pockets': severity });
    }
    const { page, complaints, context } = await signedInPage(browser(), app(), world.owner);
    await page.goto('/claims/new');
    await page.getByRole('combobox', { name: 'Supplier' }).selectOption({ label: 'Gannet Aromas' });
    await page.getByRole('textbox', { name: 'Title' }).fill('Air pockets');
    await page.getByLabel(/GA-77/).check();
    await page.getByLabel('Air pockets', { exact: true }).check();
    await page.getByRole('button', { name: 'Draft the claim' }).click();
    await page.getByText('1 of 3').first().waitFor();
    const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: 'Rows as CSV' }).click()]);
    expect(download.suggestedFilename()).toBe('claim-1-rows.csv');
    const text = await readFile(await download.path(), 'utf8');
    // Read by an independent parser (Papa Parse).
    const { data, errors } = parse<Record<string, string>>(text.replace(/^\uFEFF/, ''), { header: true, skipEmptyLines: true });
    expect(errors).toEqual([]);
    expect(data.map((row) => [row['batch code'], row['fault found']])).toEqual([['C-1', 'found'], ['C-2', 'clear'], ['C-3', 'clear']]);
    expect(complaints).toEqual([]);
    await context.close();
  });
});
