import { type Client, escapeIdentifier } from 'pg';
import type { TableRows } from './keys.ts';

/** Rows sent in one statement; JSON of a few megabytes at most. */
const atOnce = 5000;

/** Writes rows of one workshop, thousands to a statement; columns that are not named take their defaults. */
export async function insertRows(client: Client, workshopId: string, { table, rows }: TableRows): Promise<void> {
  const columns = Object.keys(rows[0] ?? {});
  if (columns.length === 0) return;
  const names = ['workshop_id', ...columns].map((name) => escapeIdentifier(name)).join(', ');
  const name = escapeIdentifier(table);
  const sql = `insert into ${name} (${names}) select ${names} from jsonb_populate_recordset(null::${name}, $1::jsonb)`;
  for (let from = 0; from < rows.length; from += atOnce) {
    const some = rows.slice(from, from + atOnce).map((row) => ({ workshop_id: workshopId, ...row }));
    await client.query(sql, [JSON.stringify(some)]);
  }
}
