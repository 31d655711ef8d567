import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { APPEND_ONLY, MAY_DELETE } from '#server/db/grants.ts';
import { aDatabase, type TestDatabase } from '#tests/support/database.ts';

/** Reached before a workshop is chosen; every other table stands behind the wall. */
const BEFORE_ANY_WORKSHOP = ['account', 'migration', 'one_time_token', 'outbox_mail', 'throttle', 'web_session'];
/** Behind the wall, but with a policy of their own: the workshop itself and who belongs to it. */
const OWN_POLICY = ['member', 'workshop'];

interface TableFacts {
  name: string;
  is_enabled: boolean;
  is_forced: boolean;
  has_workshop_id: boolean;
  policies: string | null;
  owner: string;
}

let database: TestDatabase;
let owner: Client;
let app: Client;
let tables: TableFacts[];

beforeAll(async () => {
  database = await aDatabase();
  owner = new Client({ connectionString: database.ownerUrl });
  app = new Client({ connectionString: database.appUrl });
  await Promise.all([owner.connect(), app.connect()]);
  const { rows } = await owner.query<TableFacts>(`
    select c.relname name, c.relrowsecurity is_enabled, c.relforcerowsecurity is_forced, r.rolname owner,
      exists (select 1 from pg_attribute a where a.attrelid = c.oid and a.attname = 'workshop_id' and a.attnotnull) has_workshop_id,
      (select string_agg(coalesce(pg_get_expr(p.polqual, p.polrelid), '') || ' / ' || coalesce(pg_get_expr(p.polwithcheck, p.polrelid), ''), ';' order by p.polname) from pg_policy p where p.polrelid = c.oid) policies
    from pg_class c join pg_roles r on r.oid = c.relowner
    where c.relkind in ('r', 'p') and c.relnamespace = 'public'::regnamespace order by 1`);
  tables = rows;
});

afterAll(async () => {
  await Promise.all([owner.end(), app.end()]);
  await database.drop();
});

const tenantTables = () => tables.filter(({ name }) => !BEFORE_ANY_WORKSHOP.includes(name));

describe('the wall between workshops', () => {
  it('stands before every table but a short, named list', () => {
    expect(BEFORE_ANY_WORKSHOP.length).toBeLessThan(10);
    expect(tables.map(({ name }) => name)).toEqual(expect.arrayContaining([...BEFORE_ANY_WORKSHOP, 'batch', 'lot', 'finding', 'photo']));
    expect(tenantTables().filter(({ is_enabled, is_forced }) => !is_enabled || !is_forced)).toEqual([]);
  });

  it('is one policy, for reading and for writing, on the workshop of the transaction', () => {
    const wall = '(workshop_id = app.workshop_id()) / (workshop_id = app.workshop_id())';
    const odd = tenantTables().filter(({ name, policies }) => !OWN_POLICY.includes(name) && policies !== wall);
    expect(odd).toEqual([]);
    expect(tenantTables().filter(({ name, has_workshop_id }) => name !== 'workshop' && !has_workshop_id)).toEqual([]);
  });

  it('is out of the app role’s hands: it owns nothing, is no superuser and makes nothing', async () => {
    const { rows } = await app.query('select rolsuper, rolbypassrls, rolcreatedb, rolcreaterole, current_user name from pg_roles where rolname = current_user');
    expect(rows[0]).toMatchObject({ rolsuper: false, rolbypassrls: false, rolcreatedb: false, rolcreaterole: false });
    expect(tables.filter((table) => table.owner === rows[0].name)).toEqual([]);
    await expect(app.query('create table sneaky (id int)')).rejects.toThrow(/permission denied/);
    await expect(app.query('alter table lot disable row level security')).rejects.toThrow(/must be owner/);
  });

  it('answers a query without a workshop with an error, also on a connection that had one before', async () => {
    await app.query('begin');
    await app.query(`select set_config('app.workshop_id', '01890000-0000-7000-8000-000000000001', true)`);
    expect((await app.query('select * from lot')).rows).toEqual([]);
    await app.query('commit');
    for (const { name } of tenantTables().filter((table) => !OWN_POLICY.includes(table.name))) {
      await expect(app.query(`select * from ${name}`), name).rejects.toThrow(/invalid input syntax for type uuid/);
      await expect(app.query(`insert into ${name} (workshop_id) values ('01890000-0000-7000-8000-000000000001')`), name).rejects.toThrow();
    }
  });
});

describe('what the app role may not do', () => {
  it('deletes only lines that are replaced and what runs out by itself', async () => {
    const { rows } = await owner.query<{ name: string; may_delete: boolean; may_update: boolean }>(
      `select relname name, has_table_privilege($1, oid, 'delete') may_delete, has_table_privilege($1, oid, 'update') may_update
       from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace`, [new URL(database.appUrl).username]);
    expect(rows.filter(({ may_delete }) => may_delete).map(({ name }) => name).sort()).toEqual([...MAY_DELETE].sort());
    expect(rows.filter(({ may_update }) => !may_update).map(({ name }) => name).sort()).toEqual([...APPEND_ONLY, 'migration'].sort());
  });

  it('never changes, deletes or empties the audit trail', async () => {
    await app.query(`select set_config('app.workshop_id', '01890000-0000-7000-8000-000000000001', false)`);
    for (const statement of ['update audit_entry set deed = deed', 'delete from audit_entry', 'truncate audit_entry']) {
      await expect(app.query(statement), statement).rejects.toThrow(/permission denied/);
    }
    // Not even the owner, by accident.
    await expect(owner.query('truncate audit_entry')).rejects.toThrow(/append-only/);
  });
});
