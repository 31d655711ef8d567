import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { loadDemo } from '#server/demo/load.ts';
import { quernbyLoft } from '#server/demo/history/quernby.ts';
import { aDatabase, type TestDatabase } from '#tests/support/database.ts';

const today = '2026-08-31';
let database: TestDatabase;
let client: Client;
let workshopId: string;
let uploadsDir: string;
const lines: string[] = [];

const count = async (table: 'batch' | 'batch_outcome' | 'checklist_answer' | 'finding' | 'lot') => {
  const { rows } = await client.query<{ n: number }>({
    batch: 'select count(*)::int n from batch', batch_outcome: 'select count(*)::int n from batch_outcome', finding: 'select count(*)::int n from finding',
    checklist_answer: 'select count(*)::int n from checklist_answer', lot: 'select count(*)::int n from lot',
  }[table]);
  return rows[0]?.n;
};

beforeAll(async () => {
  database = await aDatabase();
  uploadsDir = await mkdtemp(path.join(tmpdir(), 'demo-photos-'));
  expect(await loadDemo(database.ownerUrl, { today, report: (line) => lines.push(line), uploadsDir, mostPhotos: 6 })).toEqual({ loaded: true });
  client = new Client({ connectionString: database.appUrl });
  await client.connect();
  const account = await client.query<{ id: string }>(`select set_config('app.account_id', id::text, false) id from account where email = 'ilse@quernbyloft.example'`);
  const { rows } = await client.query<{ id: string }>('select workshop_id id from member where account_id = $1', [account.rows[0]?.id]);
  workshopId = rows[0]?.id ?? '';
  await client.query(`select set_config('app.workshop_id', $1, false)`, [workshopId]);
});
afterAll(async () => {
  await client.end();
  await database.drop();
  await rm(uploadsDir, { recursive: true, force: true });
});

describe('demo loader', () => {
  it('writes every batch, lot, answer and finding of the story', async () => {
    const story = quernbyLoft(today);
    const looks = story.batches.flatMap((batch) => batch.inspections);
    expect(await count('batch')).toBe(185);
    expect(await count('lot')).toBe(story.lots.length);
    expect(await count('checklist_answer')).toBe(looks.reduce((sum, look) => sum + look.answers.length, 0));
    expect(await count('finding')).toBe(looks.reduce((sum, look) => sum + look.findings.length, 0));
  });

  it('has the database itself count the bad lot: 8 of 10 cold batches moved fast, none of 6 hot', async () => {
    const { rows } = await client.query<{ cold: boolean; found: number; checked: number }>(
      `select b.method in ('cold', 'cold-oven') cold, count(*) filter (where 'acceleration' = any (o.found))::int found, count(*)::int checked
       from batch b join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
       where 'acceleration' = any (o.checked) and exists (
         select 1 from batch_ingredient i join lot l on l.workshop_id = i.workshop_id and l.id = i.lot_id
         where i.workshop_id = b.workshop_id and i.batch_id = b.id and l.code = 'EF-7802')
       group by 1 order by 1`,
    );
    expect(rows).toEqual([{ cold: false, found: 0, checked: 6 }, { cold: true, found: 8, checked: 10 }]);
  });

  it('gives a plan no temperatures and an uncut loaf no hours to its cut', async () => {
    const { rows } = await client.query<{ code: string; oil: number | null; cut: number | null; gel: string | null }>(
      `select code, oil_temperature_c oil, cut_hours cut, gel from batch where state in ('planned', 'making', 'in-mould') order by code`,
    );
    expect(rows.map((row) => [row.code, row.oil === null, row.cut === null, row.gel])).toEqual([
      ['QL-0181', false, true, null], ['QL-0182', false, true, null], ['QL-0183', true, true, null], ['QL-0184', true, true, null], ['QL-0185', true, true, null],
    ]);
  });

  it('keeps each photo in the store, with its moment and its marks', async () => {
    const { rows } = await client.query<{ id: string; taken: Date; media: string; looks: number; strayed: number }>(
      `select p.id, p.taken_at taken, p.media_type media, count(m.id)::int looks, count(m.id) filter (where i.batch_id <> p.batch_id or i.stage <> p.stage)::int strayed
       from photo p left join mark m on m.workshop_id = p.workshop_id and m.photo_id = p.id
       left join finding f on f.workshop_id = m.workshop_id and f.id = m.finding_id
       left join inspection i on i.workshop_id = f.workshop_id and i.id = f.inspection_id
       group by p.workshop_id, p.id order by p.taken_at`,
    );
    const story = quernbyLoft(today).batches.flatMap((batch) => batch.photos).slice(0, 6);
    expect(rows.map((row) => row.taken.getTime())).toEqual(story.map((photo) => Math.floor(Date.parse(photo.takenAt) / 1000) * 1000).sort((a, b) => a - b));
    expect(rows.reduce((sum, row) => sum + row.looks, 0)).toBe(story.reduce((sum, photo) => sum + photo.marks.length, 0));
    expect(rows.every((row) => row.strayed === 0 && row.media === 'image/jpeg')).toBe(true);
    for (const { id } of rows) expect((await readdir(path.join(uploadsDir, workshopId, id))).map((name) => name.split('-')[1]).sort()).toEqual(['display', 'original', 'thumb']);
  });

  it('leaves a database alone that anybody uses already', async () => {
    expect(await loadDemo(database.ownerUrl, { today, report: () => undefined, uploadsDir: '/nowhere' })).toEqual({ loaded: false });
    expect(await count('batch')).toBe(185);
    expect(lines[0]).toContain('Quernby Loft Soapworks');
  });
});
