import { Client } from 'pg';
import { hashPassword } from '#server/features/session/password.ts';
import { addDays } from '#shared/units/days.ts';
import { quernbyLoft } from './history/quernby.ts';
import { saltmarshKettle } from './history/saltmarsh.ts';
import type { WorkshopHistory } from './history/types.ts';
import { loadPhotos } from './load-photos.ts';
import { batchRows } from './rows/batch-rows.ts';
import { insertRows } from './rows/insert.ts';
import { demoPassword } from './password.ts';
import { idAt, Keys } from './rows/keys.ts';
import { lookRows } from './rows/look-rows.ts';
import { stockRows } from './rows/stock-rows.ts';

export interface LoadDemo {
  /** The day the demo is shown, YYYY-MM-DD; the story ends the day before. */
  today: string;
  report: (line: string) => void;
  uploadsDir: string;
  /** At most so many photos of each workshop; all of them when absent. */
  mostPhotos?: number;
}

/**
 * Fills an empty database with the two invented workshops, each in one transaction.
 * Does nothing when anybody has an account already.
 *
 * @param ownerUrl address of the role that owns the tables
 */
export async function loadDemo(ownerUrl: string, { today, ...around }: LoadDemo): Promise<{ loaded: boolean }> {
  const client = new Client({ connectionString: ownerUrl, application_name: 'loafmark demo' });
  await client.connect();
  try {
    const { rows } = await client.query<{ taken: boolean }>('select exists (select 1 from account) taken');
    if (rows[0]?.taken) return { loaded: false };
    const passwordHash = await hashPassword(demoPassword);
    for (const history of [quernbyLoft(today), saltmarshKettle(today)]) {
      around.report(`${history.name}: ${history.batches.length} batches`);
      await loadWorkshop(client, history, passwordHash, around);
    }
    return { loaded: true };
  } finally {
    await client.end();
  }
}

async function loadWorkshop(client: Client, history: WorkshopHistory, passwordHash: string, around: Omit<LoadDemo, 'today'>): Promise<void> {
  const opened = `${addDays(history.startsOn, -90)}T08:00:00Z`;
  const workshopId = idAt(opened);
  const keys = new Keys();
  await client.query('begin');
  try {
    await client.query(`select set_config('app.workshop_id', $1, true)`, [workshopId]);
    await client.query(
      `insert into workshop (id, name, time_zone, currency, batch_prefix, next_batch_number, first_price_minor, second_price_minor, is_demo, created_at)
       values ($1, $2, $3, $4, $5, $6, $7, $8, true, $9)`,
      [workshopId, history.name, history.timeZone, history.currency, history.batchPrefix, history.nextBatchNumber, history.firstPriceMinor, history.secondPriceMinor, opened],
    );
    for (const person of history.people) {
      const accountId = idAt(opened);
      const memberId = keys.make('member', person.key, opened);
      await client.query('insert into account (id, email, name, password_hash) values ($1, $2, $3, $4)', [accountId, person.email, person.name, passwordHash]);
      await client.query('insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, $4, $5)', [workshopId, memberId, accountId, person.name, person.role]);
    }
    for (const rows of [...stockRows(history, keys), ...batchRows(history, keys), ...lookRows(history, keys)]) {
      await insertRows(client, workshopId, rows);
    }
    await loadPhotos(client, { workshopId, history, keys, ...around });
    await client.query('commit');
  } catch (error) {
    await client.query('rollback');
    throw error;
  }
}
