import type { DataSource, EntityManager, QueryRunner } from 'typeorm';
import type { Right } from '#shared/words/rights.ts';
import { roleHas } from '#shared/words/rights.ts';
import type { Role } from '#shared/words/roles.ts';
import { forbidden } from '../problem.ts';

/** The person who acts, as a member of one workshop. */
export interface ActingMember {
  id: string;
  accountId: string;
  workshopId: string;
  name: string;
  role: Role;
}

/**
 * The only way to a workshop's tables: one request or job, one transaction, one workshop.
 * Row-level security reads the workshop from the transaction, so a forgotten `where` leaks nothing.
 */
export class WorkshopTransaction {
  constructor(
    readonly manager: EntityManager,
    readonly member: ActingMember,
    readonly requestId: string,
    /** The moment the request came in; "now" is never asked for again. */
    readonly now: Date,
  ) {}

  get workshopId(): string {
    return this.member.workshopId;
  }

  /** @throws Problem 403 unless the member's role has the right */
  require(right: Right): void {
    if (!roleHas(this.member.role, right)) throw forbidden(right);
  }

  may(right: Right): boolean {
    return roleHas(this.member.role, right);
  }

  /** Rows of a parameterised statement inside this transaction. */
  async rows<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row[]> {
    const result: unknown = await this.manager.query(sql, [...parameters]);
    return rowsOf<Row>(result);
  }

  /** The one row of a statement, or undefined. */
  async row<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row | undefined> {
    return (await this.rows<Row>(sql, parameters))[0];
  }

  /** Notes a deed that changes no row of its own, e.g. an export. */
  async noteDeed(deed: string, table: string, recordId: string | null, details: unknown): Promise<void> {
    await this.manager.query(
      `insert into audit_entry (workshop_id, member_id, request_id, deed, table_name, record_id, after) values ($1, $2, $3, $4, $5, $6, $7)`,
      [this.workshopId, this.member.id, this.requestId, deed, table, recordId, JSON.stringify(details)],
    );
  }
}

/** TypeORM answers `[rows, count]` to an update or delete, plain rows to all else. */
function rowsOf<Row>(result: unknown): Row[] {
  if (Array.isArray(result) && result.length === 2 && Array.isArray(result[0]) && typeof result[1] === 'number') return result[0] as Row[];
  return result as Row[];
}

export type TransactionKind = 'write' | 'read' | 'analysis';

/**
 * Runs `work` in one transaction of one workshop and commits before it returns.
 *
 * @throws whatever `work` throws, after rolling back
 */
export async function inWorkshop<T>(
  source: DataSource,
  member: ActingMember,
  context: { requestId: string; now: Date; kind: TransactionKind },
  work: (tx: WorkshopTransaction) => Promise<T>,
): Promise<T> {
  return inTransaction(source, context.kind, async (runner) => {
    await runner.query(
      `select set_config('app.workshop_id', $1, true), set_config('app.member_id', $2, true), set_config('app.request_id', $3, true)`,
      [member.workshopId, member.id, context.requestId],
    );
    return work(new WorkshopTransaction(runner.manager, member, context.requestId, context.now));
  });
}

/** A transaction before any workshop is chosen: sign-in, sign-up, invitations, sessions. */
export class LobbyTransaction {
  constructor(
    readonly manager: EntityManager,
    readonly requestId: string,
    readonly now: Date,
  ) {}

  async rows<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row[]> {
    return rowsOf<Row>(await this.manager.query(sql, [...parameters]));
  }

  async row<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row | undefined> {
    return (await this.rows<Row>(sql, parameters))[0];
  }

  /** From here on the transaction sees this person's memberships and the names of their workshops. */
  async asAccount(accountId: string): Promise<void> {
    await this.manager.query(`select set_config('app.account_id', $1, true)`, [accountId]);
  }

  /** From here on the transaction works in this workshop, e.g. the one just signed up. */
  async enterWorkshop(workshopId: string, memberId: string): Promise<void> {
    await this.manager.query(
      `select set_config('app.workshop_id', $1, true), set_config('app.member_id', $2, true), set_config('app.request_id', $3, true)`,
      [workshopId, memberId, this.requestId],
    );
  }
}

export async function inLobby<T>(
  source: DataSource,
  context: { requestId: string; now: Date; kind?: TransactionKind },
  work: (tx: LobbyTransaction) => Promise<T>,
): Promise<T> {
  return inTransaction(source, context.kind ?? 'write', (runner) => work(new LobbyTransaction(runner.manager, context.requestId, context.now)));
}

async function inTransaction<T>(source: DataSource, kind: TransactionKind, work: (runner: QueryRunner) => Promise<T>): Promise<T> {
  const runner = source.createQueryRunner();
  await runner.connect();
  try {
    await runner.startTransaction(kind === 'analysis' ? 'REPEATABLE READ' : 'READ COMMITTED');
    if (kind !== 'write') await runner.query('set transaction read only');
    const result = await work(runner);
    await runner.commitTransaction();
    return result;
  } catch (error) {
    if (runner.isTransactionActive) await runner.rollbackTransaction().catch(() => undefined);
    throw error;
  } finally {
    await runner.release();
  }
}
