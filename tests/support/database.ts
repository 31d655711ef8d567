import { createHash, randomUUID } from 'node:crypto';
import { Client } from 'pg';
import { migrate } from '#server/db/migrate.ts';
import { MIGRATIONS } from '#server/db/migrations/index.ts';

const APP_ROLE = 'loafmark_test_app';
const OWNER_ROLE = 'loafmark_test_owner';
const PASSWORD = 'only-for-throw-away-clusters';
const TEMPLATE_LOCK = 727_303;

export interface TestDatabase {
  /** Address of the app's restricted role. */
  appUrl: string;
  /** Address of the role that owns the tables. */
  ownerUrl: string;
  drop(): Promise<void>;
}

/** @throws Error when no throw-away cluster is named */
function superuserUrl(): string {
  const url = process.env['TEST_DATABASE_URL'];
  if (!url) throw new Error('TEST_DATABASE_URL must name a throw-away PostgreSQL cluster; npm test starts one');
  return url;
}

function addressOf(database: string, role: string): string {
  const url = new URL(superuserUrl());
  url.pathname = `/${database}`;
  url.username = role;
  url.password = PASSWORD;
  return url.href;
}

async function asSuperuser<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: superuserUrl() });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** The migrated template, made once per cluster and schema, whichever worker comes first. */
async function makeTemplate(client: Client, name: string): Promise<void> {
  await client.query('select pg_advisory_lock($1)', [TEMPLATE_LOCK]);
  try {
    for (const role of [OWNER_ROLE, APP_ROLE]) {
      const { rowCount } = await client.query('select 1 from pg_roles where rolname = $1', [role]);
      if (!rowCount) await client.query(`create role ${role} login password '${PASSWORD}' nosuperuser nobypassrls`);
    }
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name]);
    if (rowCount) return;
    const fresh = `${name}_making_${process.pid}`;
    await client.query(`create database ${fresh} owner ${OWNER_ROLE}`);
    const onFresh = new Client({ connectionString: new URL(`/${fresh}`, superuserUrl()).href });
    await onFresh.connect();
    await onFresh.query(`alter schema public owner to ${OWNER_ROLE}`);
    await onFresh.end();
    await migrate(addressOf(fresh, OWNER_ROLE), APP_ROLE);
    await client.query(`alter database ${fresh} rename to ${name}`);
  } finally {
    await client.query('select pg_advisory_unlock($1)', [TEMPLATE_LOCK]);
  }
}

/** A database of its own with the schema of today, for one test file. */
export async function aDatabase(): Promise<TestDatabase> {
  const schema = createHash('sha256').update(MIGRATIONS.map((migration) => migration.toString()).join()).digest('hex').slice(0, 12);
  const template = `loafmark_template_${schema}`;
  const name = `loafmark_test_${randomUUID().replaceAll('-', '')}`;
  await asSuperuser(async (client) => {
    await makeTemplate(client, template);
    await client.query(`create database ${name} template ${template} owner ${OWNER_ROLE}`);
  });
  return {
    appUrl: addressOf(name, APP_ROLE),
    ownerUrl: addressOf(name, OWNER_ROLE),
    drop: () => asSuperuser((client) => client.query(`drop database if exists ${name} with (force)`).then(() => undefined)),
  };
}
