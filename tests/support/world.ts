import { Client } from 'pg';
import request from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { hashPassword } from '#server/features/session/password.ts';
import type { Role } from '#shared/words/roles.ts';
import type { RunningApp } from './app.ts';

export const PASSWORD = 'a test loaf of soap';
let passwordHash: Promise<string> | undefined;

/** Somebody signed in: requests carry their cookie. */
export interface Person {
  memberId: string;
  accountId: string;
  email: string;
  role: Role;
  get(path: string): request.Test;
  post(path: string, body?: unknown): request.Test;
  put(path: string, body: unknown, version?: number): request.Test;
  patch(path: string, body: unknown, version?: number): request.Test;
  delete(path: string): request.Test;
  /** A request with the cookie set and nothing else, e.g. for uploads. */
  raw(method: 'get' | 'post' | 'put' | 'patch' | 'delete', path: string): request.Test;
  cookie: string;
}

export interface World {
  workshopId: string;
  owner: Person;
  /** Signs in a new member of this workshop with the role. */
  member(role: Role): Promise<Person>;
  /** Runs SQL as the owning role with this workshop set. */
  sql<Row = Record<string, unknown>>(statement: string, parameters?: unknown[]): Promise<Row[]>;
}

async function asWorkshop<T>(app: RunningApp, workshopId: string, work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: app.database.ownerUrl });
  await client.connect();
  try {
    await client.query(`select set_config('app.workshop_id', $1, false)`, [workshopId]);
    return await work(client);
  } finally {
    await client.end();
  }
}

/** The session's cookie in an answer, as a request sends it back. */
export function sessionCookie(answer: request.Response): string {
  return /(?:^|,)((?:__Host-)?lm=[^;]+)/.exec(String(answer.headers['set-cookie']))?.[1] ?? '';
}

let people = 0;

async function aPerson(app: RunningApp, client: Client, workshopId: string, role: Role): Promise<Person> {
  const [accountId, memberId] = [uuidv7(), uuidv7()];
  const email = `person${(people += 1)}-${accountId.slice(-6)}@test.example`;
  passwordHash ??= hashPassword(PASSWORD);
  await client.query('insert into account (id, email, name, password_hash) values ($1, $2, $3, $4)', [accountId, email, `Test ${role}`, await passwordHash]);
  await client.query('insert into member (workshop_id, id, account_id, name, role) values ($1, $2, $3, $4, $5)', [workshopId, memberId, accountId, `Test ${role}`, role]);
  const answer = await request(app.url).post('/api/session').send({ email, password: PASSWORD });
  if (answer.status !== 200) throw new Error(`sign-in of a test person answered ${answer.status}: ${answer.text}`);
  const cookie = sessionCookie(answer);
  const raw = (method: 'get' | 'post' | 'put' | 'patch' | 'delete', path: string) => request(app.url)[method](path).set('Cookie', cookie);
  const write = (method: 'put' | 'patch', path: string, body: unknown, version?: number) => {
    const test = raw(method, path);
    return (version === undefined ? test : test.set('If-Match', `"${version}"`)).send(body as object);
  };
  return {
    memberId, accountId, email, role, cookie, raw,
    get: (path) => raw('get', path),
    post: (path, body) => raw('post', path).send(body as object),
    put: (path, body, version) => write('put', path, body, version),
    patch: (path, body, version) => write('patch', path, body, version),
    delete: (path) => raw('delete', path),
  };
}

/** A workshop of its own with its owner signed in; every test makes one, so nothing is cleaned up. */
export async function aWorkshop(app: RunningApp): Promise<World> {
  const workshopId = uuidv7();
  const owner = await asWorkshop(app, workshopId, async (client) => {
    await client.query(`insert into workshop (id, name, batch_prefix) values ($1, 'Test workshop', 'T')`, [workshopId]);
    return aPerson(app, client, workshopId, 'owner');
  });
  return {
    workshopId,
    owner,
    member: (role) => asWorkshop(app, workshopId, (client) => aPerson(app, client, workshopId, role)),
    sql: <Row>(statement: string, parameters: unknown[] = []) =>
      asWorkshop(app, workshopId, async (client) => (await client.query(statement, parameters)).rows as Row[]),
  };
}
