import { localSecret, startCluster } from './cluster.mjs';

const APP_ROLE = 'loafmark_app';
const OWNER_ROLE = 'loafmark_owner';
const DATABASE = 'loafmark';

async function connect(url) {
  const { default: pg } = await import('pg');
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 5_000 });
  await client.connect();
  return client;
}

function addressFor(url, role, password, database) {
  const address = new URL(url);
  address.username = role;
  address.password = password;
  if (database) address.pathname = `/${database}`;
  return address.href;
}

/** Makes or renews a role that may sign in and no more; names come from this file, passwords are base64url. */
async function makeRole(client, role, password) {
  const { rowCount } = await client.query('select 1 from pg_roles where rolname = $1', [role]);
  await client.query(`${rowCount ? 'alter' : 'create'} role ${role} with login nosuperuser nobypassrls nocreatedb nocreaterole password '${password}'`);
}

/**
 * The database and its two roles: one owns the tables and migrates, the other serves and owns nothing.
 *
 * @returns addresses for both, the app role's name, and `stop` for what was started here
 */
export async function prepareDatabase() {
  return process.env.DATABASE_URL ? givenDatabase(process.env.DATABASE_URL) : localDatabase();
}

async function localDatabase() {
  const cluster = await startCluster('main');
  const client = await connect(cluster.url);
  try {
    await makeRole(client, OWNER_ROLE, localSecret('owner'));
    await makeRole(client, APP_ROLE, localSecret('app'));
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [DATABASE]);
    if (!rowCount) await client.query(`create database ${DATABASE} owner ${OWNER_ROLE}`);
  } finally {
    await client.end();
  }
  const inside = await connect(addressFor(cluster.url, 'postgres', decodeURIComponent(new URL(cluster.url).password), DATABASE));
  await inside.query(`alter schema public owner to ${OWNER_ROLE}`).finally(() => inside.end());
  return {
    ownerUrl: addressFor(cluster.url, OWNER_ROLE, localSecret('owner'), DATABASE),
    appUrl: addressFor(cluster.url, APP_ROLE, localSecret('app'), DATABASE),
    appRole: APP_ROLE,
    isLocal: true,
    stop: cluster.stop,
  };
}

/** A server that is there already: its role owns the tables; the serving role is made beside it where we may. */
async function givenDatabase(ownerUrl) {
  const client = await connect(ownerUrl).catch((error) => {
    throw new Error(`DATABASE_URL cannot be reached: ${error.message}`);
  });
  try {
    if (process.env.APP_DATABASE_URL) {
      return { ownerUrl, appUrl: process.env.APP_DATABASE_URL, appRole: decodeURIComponent(new URL(process.env.APP_DATABASE_URL).username), isLocal: false, stop: async () => undefined };
    }
    await makeRole(client, APP_ROLE, localSecret('app')).catch(() => {
      throw new Error('The role in DATABASE_URL may not create roles.\nMake a role that may sign in and no more, and set APP_DATABASE_URL to the same database as that role; it serves, the role in DATABASE_URL migrates.');
    });
  } finally {
    await client.end();
  }
  return { ownerUrl, appUrl: addressFor(ownerUrl, APP_ROLE, localSecret('app')), appRole: APP_ROLE, isLocal: false, stop: async () => undefined };
}

/** Drops the local database with all that is in it. */
export async function dropLocalDatabase() {
  const cluster = await startCluster('main');
  const client = await connect(cluster.url);
  await client.query(`drop database if exists ${DATABASE} with (force)`).finally(() => client.end());
}
