import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { APPEND_ONLY, GRANT_SQL, MAY_DELETE } from './grants.ts';
import { MIGRATIONS } from './migrations/index.ts';

/** Any number, the same everywhere: two servers that start at once migrate one after the other. */
const MIGRATION_LOCK = 727_302;

/**
 * Brings the schema up to date as its owner and gives the app's role its grants.
 *
 * @param ownerUrl PostgreSQL address of the role that owns the tables
 * @param appRole name of the role that the server signs in with
 * @returns names of the migrations that were applied now
 */
export async function migrate(ownerUrl: string, appRole: string): Promise<string[]> {
  const source = new DataSource({
    type: 'postgres',
    url: ownerUrl,
    migrations: MIGRATIONS,
    migrationsTableName: 'migration',
    installExtensions: false,
    logging: false,
  });
  await source.initialize();
  const lock = source.createQueryRunner();
  try {
    await lock.connect();
    await lock.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    const applied = await source.runMigrations({ transaction: 'each' });
    await lock.startTransaction();
    await lock.query(
      `select set_config('app.granted_role', $1, true), set_config('app.append_only', $2, true), set_config('app.may_delete', $3, true)`,
      [appRole, APPEND_ONLY.join(','), MAY_DELETE.join(',')],
    );
    await lock.query(GRANT_SQL);
    await lock.commitTransaction();
    return applied.map((migration) => migration.name);
  } finally {
    await lock.query('select pg_advisory_unlock($1)', [MIGRATION_LOCK]).catch(() => undefined);
    await lock.release();
    await source.destroy();
  }
}
