import 'reflect-metadata';
import { DataSource, type EntityTarget, type ObjectLiteral } from 'typeorm';

/** Time limits of the app's connections, in milliseconds. */
const LIMITS = { statement: 5_000, lock: 2_000, idleInTransaction: 10_000 };

export interface DataSourceOptions {
  url: string;
  poolSize: number;
  /** Longest time one statement may take, ms. */
  statementMs?: number;
  entities: EntityTarget<ObjectLiteral>[];
}

/** The pool the server works with; it never synchronises and never logs parameters. */
export function makeDataSource({ url, poolSize, statementMs = LIMITS.statement, entities }: DataSourceOptions): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities: entities as never[],
    synchronize: false,
    logging: false,
    installExtensions: false,
    poolSize,
    connectTimeoutMS: 2_000,
    extra: {
      statement_timeout: statementMs,
      lock_timeout: LIMITS.lock,
      idle_in_transaction_session_timeout: Math.max(LIMITS.idleInTransaction, statementMs),
      application_name: 'loafmark',
    },
  });
}

/**
 * Refuses a role that could walk around the wall between workshops.
 *
 * @throws Error when the role is superuser, bypasses row security or owns a table
 */
export async function refuseStrongRole(source: DataSource): Promise<void> {
  const [role] = await source.query<{ rolsuper: boolean; rolbypassrls: boolean; owned: number }[]>(
    `select rolsuper, rolbypassrls,
       (select count(*)::int from pg_class c where c.relowner = r.oid and c.relkind = 'r' and c.relnamespace = 'public'::regnamespace) owned
     from pg_roles r where rolname = current_user`,
  );
  if (!role || role.rolsuper || role.rolbypassrls || role.owned > 0) {
    throw new Error('DATABASE_URL must name a role that owns no table, is no superuser and does not bypass row security');
  }
}
