import Papa from 'papaparse';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { BATCH_HISTORY_COLUMNS } from '#shared/batch-history.ts';
import { appForFile } from '#tests/support/app.ts';
import { aBatch, aLook, aLot, aMaterial } from '#tests/support/records.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();

async function exported(person: Person, query = ''): Promise<{ text: string; rows: Record<string, string>[]; fields: string[] }> {
  const { text, headers } = await person.get(`/api/exports/batches.csv${query}`).expect(200);
  expect(headers['content-type']).toBe('text/csv; charset=utf-8');
  expect(headers['content-disposition']).toBe('attachment; filename="batches.csv"');
  const parsed = Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true });
  expect(parsed.errors).toEqual([]);
  return { text, rows: parsed.data, fields: parsed.meta.fields ?? [] };
}

describe('GET /api/exports/batches.csv', () => {
  it('reads back in another parser: units, lists, quotes, line breaks, every answer', async () => {
    const world = await aWorkshop(app());
    const [scent, mica] = [await aMaterial(world.owner), await aMaterial(world.owner, { kind: 'colourant', name: 'Mica; "plum"' })];
    const lots = [await aLot(world.owner, { materialId: scent, code: 'L1' }), await aLot(world.owner, { materialId: scent, code: 'L2' })];
    const id = await aBatch(world.owner, {
      method: 'hot-fluid', waterToLye: 2, superfatFraction: 0.07, humidityFraction: 0.55, oilTemperatureC: 71.5, roomTemperatureC: -2, bars: 12, note: 'Said "no",\nthen poured',
      ingredients: [...lots.map((lotId) => ({ id: uuidv7(), materialId: scent, lotId, shareOfOilsFraction: 0.01 })), { id: uuidv7(), materialId: mica }],
    });
    await aLook(world, id, { ricing: 3, 'soda-ash': 0 });
    const { text, rows, fields } = await exported(world.owner);
    expect(fields.slice(0, BATCH_HISTORY_COLUMNS.length)).toEqual(BATCH_HISTORY_COLUMNS.map(({ name }) => name));
    expect(fields.slice(BATCH_HISTORY_COLUMNS.length).every((field) => field.startsWith('fault:'))).toBe(true);
    expect(text.split('\r\n').length).toBe(3);
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      batch_code: 'T-0001', made_on: '2026-03-14', method: 'hot, fluid', water_to_lye: '2', superfat_pct: '7', humidity_pct: '55', oil_temperature_c: '71.5', room_temperature_c: '-2',
      lye_concentration_pct: '33.3333333333', fragrance_pct: '2', fragrance_lots: 'L1;L2', colourants: 'Mica; "plum"', bars: '12', notes: 'Said "no",\nthen poured',
      'fault:ricing': '3', 'fault:soda-ash': 'clear', 'fault:acceleration': '',
    });
  });

  it('neutralises what a spreadsheet would run, and leaves numbers alone', async () => {
    const { owner } = await aWorkshop(app());
    await aBatch(owner, { note: '=HYPERLINK("http://x.example")', roomTemperatureC: -4 });
    const { rows } = await exported(owner);
    expect(rows[0]).toMatchObject({ notes: '\'=HYPERLINK("http://x.example")', room_temperature_c: '-4' });
  });

  it('takes the same filter and order as the log', async () => {
    const { owner } = await aWorkshop(app());
    await aBatch(owner, { code: 'A', method: 'hot', waterToLye: 2 });
    await aBatch(owner, { code: 'B', method: 'cold', waterToLye: 3 });
    await aBatch(owner, { code: 'C', method: 'cold', waterToLye: 2.5 });
    expect((await exported(owner, '?family=cold&sort=water&order=asc')).rows.map((row) => row['batch_code'])).toEqual(['C', 'B']);
    expect((await owner.get('/api/exports/batches.csv?method=tepid').expect(422)).headers['content-type']).toMatch(/problem\+json/);
  });

  it('gives a viewer the history without any quantity of a formula, and strangers nothing', async () => {
    const world = await aWorkshop(app());
    const olive = await aMaterial(world.owner, { kind: 'fat', name: 'Olive' });
    await aBatch(world.owner, { oilMassG: 1234, ingredients: [{ id: uuidv7(), materialId: olive, massG: 987 }] });
    const { text } = await exported(await world.member('viewer'));
    expect(text).not.toMatch(/1234|987|Olive/);
    expect((await exported((await aWorkshop(app())).owner)).rows).toEqual([]);
  });

  it('streams several pages of the cursor in order', async () => {
    const world = await aWorkshop(app());
    await world.sql(
      `insert into batch (workshop_id, id, code, made_on, method) select $1, gen_random_uuid(), 'G-' || lpad(n::text, 5, '0'), date '2020-01-01' + n / 4, 'cold' from generate_series(1, 1203) n`, [world.workshopId],
    );
    const { rows } = await exported(world.owner, '?sort=code&order=asc');
    expect(rows.map((row) => row['batch_code'])).toEqual(Array.from({ length: 1203 }, (_, index) => `G-${String(index + 1).padStart(5, '0')}`));
  });
});
