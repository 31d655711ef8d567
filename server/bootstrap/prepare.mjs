import { buildClient } from './client-build.mjs';
import { prepareDatabase } from './database.mjs';
import { installPackages } from './packages.mjs';
import { makeLocal } from './places.mjs';
import { step } from './progress.mjs';
import { runScript, serverEnvironment } from './server-process.mjs';
import { onEnd } from './shutdown.mjs';

/** Everything before the server itself: packages, PostgreSQL, schema, demo, client. */
export async function prepare({ withClient = true } = {}) {
  makeLocal();
  await step('Packages', installPackages);
  let database;
  await step('PostgreSQL', async () => {
    database = await prepareDatabase();
    onEnd(database.stop);
    return database.isLocal ? 'on loopback' : 'from DATABASE_URL';
  });
  const owner = { MIGRATION_DATABASE_URL: database.ownerUrl, APP_ROLE: database.appRole };
  const env = { ...serverEnvironment({ appUrl: database.appUrl, port: 0 }), ...owner };
  await step('Schema', () => runScript('migrate.ts', env));
  if (process.env.NODE_ENV !== 'production') await step('Demo workshop', () => runScript('load-demo.ts', env));
  if (withClient) await step('Client', buildClient);
  return database;
}
