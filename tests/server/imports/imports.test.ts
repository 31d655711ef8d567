import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();

const HEAD = 'batch_code,made_on,method,formula,maker,mould,oil_temperature_c,lye_temperature_c,room_temperature_c,humidity_pct,water_to_lye,lye_concentration_pct,superfat_pct,fragrance_pct,fragrance_lots,colourants,gel,blend_seconds,cut_hours,bars,notes,fault:soda-ash,fault:ricing';
const GOOD = [
  'H-1,2025-03-01,cold,Plain,Ada,Wood,38,36,19,55,2.1,,5,3,"NL-1;NL-2",Blue,none,45,24,12,First,2,clear',
  'H-2,2025-03-02,"cold, oven-gelled",Plain,Ada,Wood,39,37,20,50,,33.3333,5,2.5,NL-1,,full,40,24,12,,clear,',
  'H-3,2025-03-03,hot,Plain,Bo,Wood,72,70,21,45,2.5,,5,3,,,full,60,20,12,,,',
];
const sheet = (...rows: string[]) => [HEAD, ...rows].join('\r\n');

async function upload(person: Person, content: string | Buffer, name = 'history.csv') {
  return person.raw('post', '/api/imports').field('id', uuidv7()).attach('file', Buffer.from(content), name);
}

describe('importing a batch history', () => {
  it('maps its own format by itself, checks without writing, and commits all of it', async () => {
    const { owner, sql } = await aWorkshop(app());
    const uploaded = (await upload(owner, sheet(...GOOD))).body;
    expect(uploaded).toMatchObject({ state: 'uploaded', rowCount: 3, encoding: 'UTF-8', delimiter: 'comma' });
    expect(uploaded.columns.every((column: { target: string | null }) => column.target !== null)).toBe(true);

    const checked = await owner.post(`/api/imports/${uploaded.id}/check`, {}).expect(200);
    expect(checked.body.report).toMatchObject({
      rows: 3, good: 3, problemCount: 0, alreadyThere: 0,
      creates: { lots: ['NL-1', 'NL-2'], formulas: ['Plain'], people: ['Ada', 'Bo'], moulds: ['Wood'], colourants: ['Blue'] },
      answers: { found: 1, clear: 2, notChecked: 3 },
    });
    expect(await sql('select 1 from batch')).toHaveLength(0);

    const committed = await owner.post(`/api/imports/${uploaded.id}/commit`, {}).expect(200);
    expect(committed.body).toMatchObject({ state: 'committed', batchesMade: 3 });
    expect((await owner.get(`/api/imports/${uploaded.id}/progress`)).body).toEqual({ done: 3, of: 3 });
    const batches = await sql<{ code: string; ratio: string; superfat_fraction: number; humidity_fraction: number }>(
      `select code, method, round(water_to_lye::numeric, 3)::text ratio, superfat_fraction, humidity_fraction, bars, gel from batch order by code`);
    expect(batches).toMatchObject([
      { code: 'H-1', method: 'cold', ratio: '2.100', superfat_fraction: 0.05, humidity_fraction: 0.55, bars: 12 },
      { code: 'H-2', method: 'cold-oven', ratio: '2.000' },
      { code: 'H-3', method: 'hot', gel: 'full' },
    ]);
  });

  it('keeps found, clear and not checked apart', async () => {
    const { owner, sql } = await aWorkshop(app());
    const { id } = (await upload(owner, sheet(...GOOD))).body;
    await owner.post(`/api/imports/${id}/commit`, {}).expect(200);
    const outcomes = await sql('select b.code, o.outcomes from batch b left join batch_outcome o on o.batch_id = b.id order by b.code');
    expect(outcomes).toEqual([
      { code: 'H-1', outcomes: { 'soda-ash': 2, ricing: 0 } },
      { code: 'H-2', outcomes: { 'soda-ash': 0 } },
      { code: 'H-3', outcomes: {} },
    ]);
  });

  it('names every problem by line and column and then writes nothing at all', async () => {
    const { owner, sql } = await aWorkshop(app());
    const rows = [
      ...GOOD,
      'H-4,2025-13-01,cold,,,,38,,,,2.1,,,,,,,,,,,,',
      'H-5,2025-03-05,boiled,,,,380,,,,2.1,,,,,,,,,,,5,',
      'H-1,2025-03-06,cold,,,,warm,,,,2.1,25,,,,,,,,,,,',
      'H-1,2025-03-07,cold,,,,38,,,,2.1,,,,,,,,,,,,',
    ];
    const { id } = (await upload(owner, sheet(...rows))).body;
    const { report } = (await owner.post(`/api/imports/${id}/check`, {}).expect(200)).body;
    const told = report.problems.map(({ line, column, detail }: { line: number; column: string; detail: string }) => `${line} ${column}: ${detail}`);
    expect(told).toEqual([
      expect.stringMatching(/^5 made_on: Made on must be a day/),
      '6 fault:soda-ash: “5” must be clear, 1, 2, 3 or nothing (not checked)',
      expect.stringMatching(/^6 method: Method must be one of/),
      '6 oil_temperature_c: Oil temperature must lie between 5 and 120 °C',
      '7 oil_temperature_c: “warm” is not a number',
      expect.stringMatching(/^7 lye_concentration_pct: Water to lye 2.1 and lye concentration 25.0 % disagree/),
      '8 batch_code: Batch H-1 stands on line 2 already',
    ]);
    const refused = await owner.post(`/api/imports/${id}/commit`, {}).expect(422);
    expect(refused.body.errors[0]).toMatchObject({ pointer: '#/rows/5/made_on', detail: expect.stringMatching(/^Line 5, made_on/) });
    expect(await sql('select 1 from batch')).toHaveLength(0);
    expect(await sql('select 1 from lot')).toHaveLength(0);
  });

  it('reads another person’s sheet: semicolons, decimal commas, °F, days first, a byte-order mark, Western letters', async () => {
    const { owner, sql } = await aWorkshop(app());
    const text = 'Batch no;Date;Process;Oil temp;Made by;Soda ash;Mood\r\nX1;03.04.2025;CP;100,4;Zoë;clear;happy\r\n';
    for (const [bytes, encoding] of [
      [Buffer.from(`\uFEFF${text}`), 'UTF-8'], [Buffer.from(text, 'latin1'), 'Windows-1252'], [Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(text, 'utf16le')]), 'UTF-16'],
    ] as const) {
      const uploaded = (await upload(owner, bytes)).body;
      expect(uploaded).toMatchObject({ encoding, delimiter: 'semicolon' });
      expect(uploaded.columns.map((column: { target: string | null }) => column.target)).toEqual(['batch_code', 'made_on', 'method', 'oil_temperature_c', 'maker', 'fault:soda-ash', null]);
    }
    const { id, mapping } = (await upload(owner, Buffer.from(text, 'latin1'))).body;
    const units = { temperature: 'fahrenheit', share: 'percent', day: 'day-month-year', decimal: 'comma' };
    await owner.post(`/api/imports/${id}/commit`, { mapping: { ...mapping, units } }).expect(200);
    expect(await sql(`select code, made_on::text, oil_temperature_c, m.name from batch b join member m on m.id = b.maker_id`)).toEqual([
      { code: 'X1', made_on: '2025-04-03', oil_temperature_c: 38, name: 'Zoë' },
    ]);
  });

  it('takes the sheet as plain text/csv too, and finds what is already there', async () => {
    const world = await aWorkshop(app());
    const send = () => world.owner.raw('post', '/api/imports').set('Content-Type', 'text/csv').send(sheet(...GOOD));
    const first = (await send().expect(200)).body;
    await world.owner.post(`/api/imports/${first.id}/commit`, {}).expect(200);
    const second = (await send().expect(200)).body;
    const { report } = (await world.owner.post(`/api/imports/${second.id}/check`, {})).body;
    expect(report).toMatchObject({ alreadyThere: 3, good: 0, problemCount: 0 });
    await world.owner.post(`/api/imports/${first.id}/commit`, {}).expect(409);
  });

  it('does not make what it was told not to', async () => {
    const { owner } = await aWorkshop(app());
    const { id, mapping } = (await upload(owner, sheet(...GOOD))).body;
    const { report } = (await owner.post(`/api/imports/${id}/check`, { mapping: { ...mapping, create: { ...mapping.create, lots: false } } })).body;
    expect(report.problems[0]).toEqual({ line: 2, column: 'fragrance_lots', detail: expect.stringMatching(/no lot “NL-1”/) });
  });

  it.each<[string, string | Buffer, number, RegExp]>([
    ['an empty file', '', 422, /empty/],
    ['a head without rows', HEAD, 422, /nothing below/],
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 1]), 422, /no CSV text/],
    ['a quotation mark that never closes', sheet('H-1,2025-03-01,"cold'), 422, /line \d+: a quotation mark is opened and never closed/],
    ['301 columns', Array.from({ length: 301 }, (_x, index) => `c${index}`).join(',') + '\r\n1', 413, /At most 300 columns/],
    ['more rows than allowed', sheet(...Array.from({ length: 20_001 }, (_x, index) => `R-${index},2025-01-01,cold`)), 413, /At most 20000 rows/],
  ])('refuses %s clearly', async (_name, content, status, words) => {
    const { owner } = await aWorkshop(app());
    const answer = await upload(owner, content);
    expect(answer.status).toBe(status);
    expect(answer.body.detail).toMatch(words);
  });

  it('names the line of a row with too many cells, and accepts a short one', async () => {
    const { owner } = await aWorkshop(app());
    const { id } = (await upload(owner, sheet('H-1,2025-03-01,cold', `${GOOD[1]},extra,cells`))).body;
    const { report } = (await owner.post(`/api/imports/${id}/check`, {})).body;
    expect(report.problems).toEqual([{ line: 3, column: 'fault:ricing', detail: 'The row has 25 cells, the head has 23' }]);
    expect(report.good).toBe(1);
  });

  it('says so when no column holds the batch code', async () => {
    const { owner } = await aWorkshop(app());
    const { id } = (await upload(owner, 'when,what\r\n2025-01-01,cold\r\n')).body;
    const { report } = (await owner.post(`/api/imports/${id}/check`, {})).body;
    expect(report.problems.map(({ detail }: { detail: string }) => detail)).toContain('No column is matched to Batch code; every batch needs it');
  });

  it('is for owners and makers, and another workshop’s import is not there', async () => {
    const [here, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const { id } = (await upload(here.owner, sheet(...GOOD))).body;
    for (const role of ['inspector', 'viewer'] as const) {
      expect((await upload(await here.member(role), sheet(...GOOD))).status).toBe(403);
    }
    await there.owner.get(`/api/imports/${id}`).expect(404);
    await there.owner.post(`/api/imports/${id}/commit`, {}).expect(404);
    expect((await here.owner.get('/api/imports').expect(200)).body.items).toHaveLength(1);
    expect((await here.owner.get('/api/imports/targets').expect(200)).body.items.length).toBeGreaterThan(50);
  });
});
