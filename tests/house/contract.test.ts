import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { Validator } from '@seriousme/openapi-schema-validator';
import fc from 'fast-check';
import request from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { RIGHTS } from '#shared/words/rights.ts';
import { ROLES, type Role } from '#shared/words/roles.ts';
import type { AnyEndpoint } from '#server/http/api.ts';
import { appForFile } from '#tests/support/app.ts';
import { recordsOfEachKind } from '#tests/support/one-of-each.ts';
import { aWorkshop, type Person, type World } from '#tests/support/world.ts';

const app = appForFile();

/** The brief's table of rights, copied by hand a second time. */
const BY_THE_BRIEF: Record<string, readonly Role[]> = {
  'workshop.read': ['owner', 'maker', 'inspector', 'viewer'],
  'formula.read': ['owner', 'maker'],
  'batch.write': ['owner', 'maker'],
  'lot.write': ['owner', 'maker'],
  'formula.write': ['owner', 'maker'],
  'inspection.write': ['owner', 'maker', 'inspector'],
  'photo.write': ['owner', 'maker', 'inspector'],
  'disposition.write': ['owner', 'maker', 'inspector'],
  'lot.hold': ['owner', 'maker', 'inspector'],
  'lot.release': ['owner'],
  'batch.close-unsafe': ['owner'],
  'claim.draft': ['owner', 'maker'],
  'claim.send': ['owner'],
  'import.write': ['owner', 'maker'],
  'member.manage': ['owner'],
  'workshop.manage': ['owner'],
  'export.full': ['owner'],
  'audit.read': ['owner'],
};

let here: World;
let people: Record<Role, Person>;
let foreign: World;
let ids: Record<string, string>;
const served = (): readonly AnyEndpoint[] => app().loafmark.api.served;
const nameOf = (entry: AnyEndpoint) => `${entry.method.toUpperCase()} ${entry.path}`;

/** Values that are no record's id: fixed words of a path. */
const WORDS: Record<string, string> = { size: 'thumb', kind: 'batches', fault: 'soda-ash', input: 'waterToLye', token: 'x'.repeat(43), key: 'a'.repeat(64) };

function addressOf(entry: AnyEndpoint, values: Record<string, string>): string {
  return entry.path.replaceAll(/:(\w+)/g, (_all, name: string) => values[name] ?? WORDS[name] ?? uuidv7());
}

function ask(entry: AnyEndpoint, address: string, cookie?: string): request.Test {
  const test = request(app().url)[entry.method](address);
  if (cookie) test.set('Cookie', cookie);
  if (entry.versioned) test.set('If-Match', '"1"');
  if (entry.accepts) return test.field('none', 'none');
  return entry.body ? test.send({}) : test;
}

beforeAll(async () => {
  here = await aWorkshop(app());
  people = { owner: here.owner, maker: await here.member('maker'), inspector: await here.member('inspector'), viewer: await here.member('viewer') };
  foreign = await aWorkshop(app());
  ids = await recordsOfEachKind(here);
});

describe('who may do what', () => {
  it('is the brief’s table, right by right', () => {
    expect(Object.fromEntries(Object.entries(RIGHTS).map(([right, roles]) => [right, [...roles].sort()]))).toEqual(
      Object.fromEntries(Object.entries(BY_THE_BRIEF).map(([right, roles]) => [right, [...roles].sort()])),
    );
  });

  it('holds for every endpoint, every role, and nobody signed in', async () => {
    const wrong: string[] = [];
    let tested = 0;
    for (const entry of served()) {
      // Signing out or ending a session would take the person away from the rest of this test.
      const isOwnSession = entry.method === 'delete' && entry.path === '/api/session';
      const stranger = await ask(entry, addressOf(entry, ids));
      tested += 1;
      if (entry.right === 'public' ? stranger.status === 403 || (stranger.status === 401 && entry.path !== '/api/session') : stranger.status !== 401) wrong.push(`${nameOf(entry)} answered a stranger ${stranger.status}`);
      if (entry.right === 'public' || isOwnSession) continue;
      for (const role of ROLES) {
        const may = entry.right === 'account' || BY_THE_BRIEF[entry.right]?.includes(role) === true;
        const { status } = await ask(entry, addressOf(entry, ids), people[role].cookie);
        tested += 1;
        if (may ? status === 401 || status === 403 || status >= 500 : status !== 403) wrong.push(`${nameOf(entry)} answered ${role} ${status}`);
      }
    }
    console.log(`contract: ${served().length} endpoints × ${ROLES.length + 1} kinds of caller, ${tested} requests, ${wrong.length} wrong`);
    expect(wrong).toEqual([]);
    expect(tested).toBeGreaterThan(150);
  });

  it('hides every record from the owner of another workshop, and shows it at home', async () => {
    const leaks: string[] = [];
    const withRecord = served().filter((entry) => [...entry.path.matchAll(/:(\w+)/g)].some(([, name = '']) => name in ids));
    for (const entry of withRecord) {
      const address = addressOf(entry, ids);
      const away = await ask(entry, address, foreign.owner.cookie);
      // A body that is refused before the record is looked for tells nothing about the record.
      if (away.status !== 404 && !(away.status === 422 && entry.body)) leaks.push(`${nameOf(entry)} answered a foreign owner ${away.status}`);
      const home = await ask(entry, address, people.owner.cookie);
      if (home.status === 404 || home.status === 403 || home.status >= 500) leaks.push(`${nameOf(entry)} answered its own owner ${home.status}`);
    }
    console.log(`contract: ${withRecord.length} endpoints by record, ${leaks.length} leaks`);
    expect(leaks).toEqual([]);
    expect(withRecord.length).toBeGreaterThan(15);
  });

  it('lists nothing of one workshop to another', async () => {
    const needles = Object.values(ids);
    for (const entry of served().filter(({ method, path: route, right }) => method === 'get' && !route.includes(':') && right !== 'public')) {
      const { text } = await ask(entry, entry.path, foreign.owner.cookie);
      expect(needles.filter((id) => (text ?? '').includes(id)), nameOf(entry)).toEqual([]);
    }
  });
});

describe('writes from elsewhere', () => {
  it('are refused whatever another site sends', async () => {
    const accepted: string[] = [];
    const writes = served().filter(({ method }) => method !== 'get');
    for (const entry of writes) {
      const address = addressOf(entry, ids);
      for (const headers of [{ 'Sec-Fetch-Site': 'cross-site' }, { 'Sec-Fetch-Site': 'same-site' }, { Origin: 'https://evil.example' }, { Origin: 'null' }]) {
        const { status } = await ask(entry, address, people.owner.cookie).set(headers);
        if (status !== 403) accepted.push(`${nameOf(entry)} with ${JSON.stringify(headers)} answered ${status}`);
      }
      if (!entry.body) continue;
      for (const type of ['text/plain', 'application/x-www-form-urlencoded']) {
        const { status } = await request(app().url)[entry.method](address).set('Cookie', people.owner.cookie).set('If-Match', '"1"').set('Content-Type', type).send('a=1');
        if (status !== 415) accepted.push(`${nameOf(entry)} as ${type} answered ${status}`);
      }
    }
    expect(accepted).toEqual([]);
    expect(writes.length).toBeGreaterThan(20);
  });
});

describe('the description', () => {
  it('is a valid OpenAPI 3.1 document that names every endpoint served', async () => {
    const { body } = await request(app().url).get('/api/openapi.json').expect(200);
    const { valid, errors } = await new Validator().validate(body as Record<string, unknown>);
    expect(errors ?? []).toEqual([]);
    expect(valid).toBe(true);
    const described = Object.entries(body.paths as Record<string, object>).flatMap(([route, methods]) => Object.keys(methods).map((method) => `${method} ${route}`));
    expect(described.sort()).toEqual(served().map(({ method, path: route }) => `${method} ${route.replaceAll(/:(\w+)/g, '{$1}')}`).sort());
  });

  it('has a test of its own for every endpoint', () => {
    const folder = 'tests/server';
    const text = readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.name.endsWith('.ts')).map((entry) => readFileSync(path.join(entry.parentPath, entry.name), 'utf8')).join('\n');
    const untested = served().filter(({ path: route }) => {
      const pattern = route.split('/').map((part) => (part.startsWith(':') ? '[^/\'"`?]+' : part.replaceAll('.', '\\.'))).join('/');
      return !new RegExp(`${pattern}(?=['"\`?]|\\$\\{)`).test(text);
    });
    expect(untested.map(nameOf)).toEqual([]);
  });
});

describe('hostile requests', () => {
  it('never bring a 500, and every refusal is a problem that names what is wrong', async () => {
    const writes = served().filter(({ method, body, path: route }) => method !== 'get' && body && route !== '/api/session/password' && route !== '/api/session/workshop');
    const odd: string[] = [];
    const value = fc.oneof(fc.jsonValue({ maxDepth: 2 }), fc.constantFrom('\u0000', '\uD800', '__proto__', '=1+1', '9'.repeat(400), -1, 1e308, null, [], {}), fc.string({ maxLength: 300 }));
    const body = fc.dictionary(fc.constantFrom('id', 'name', 'code', 'madeOn', 'method', 'answers', 'findings', 'email', 'password', 'ingredients', 'stage', 'constructor', '__proto__', 'mapping'), value, { maxKeys: 6 });
    await fc.assert(
      fc.asyncProperty(fc.constantFrom(...writes), body, async (entry, sent) => {
        const answer = await request(app().url)[entry.method](addressOf(entry, ids)).set('Cookie', people.maker.cookie).set('If-Match', '"1"').send(sent);
        const isProblem = answer.status < 400 || String(answer.headers['content-type']).startsWith('application/problem+json');
        const namesField = answer.status !== 422 || (answer.body.errors?.length ?? 0) > 0;
        if (answer.status >= 500 || !isProblem || !namesField) odd.push(`${nameOf(entry)} ${answer.status} ${JSON.stringify(sent).slice(0, 120)}`);
      }),
      { numRuns: 500, seed: 20_261_201 },
    );
    expect(odd).toEqual([]);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  }, 120_000);

  it('are answered with the strict headers, also when they are errors', async () => {
    for (const address of ['/api/session', '/api/nothing-here', '/api/health/live']) {
      const { headers } = await request(app().url).get(address);
      expect(headers['content-security-policy'], address).toContain("script-src 'self'");
      expect(headers['content-security-policy']).not.toMatch(/unsafe-inline|unsafe-eval/);
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['x-powered-by']).toBeUndefined();
    }
  });
});

describe('many at once', () => {
  it('make one record of twenty equal creations, and one change of twenty edits on one version', async () => {
    const wish = { id: uuidv7(), name: 'Same wish' };
    const made = await Promise.all(Array.from({ length: 20 }, () => here.owner.post('/api/suppliers', wish)));
    expect(made.filter(({ status }) => status === 201)).toHaveLength(1);
    expect(made.filter(({ status }) => status === 200)).toHaveLength(19);
    const edits = await Promise.all(Array.from({ length: 20 }, (_edit, index) => here.owner.patch(`/api/suppliers/${wish.id}`, { note: `edit ${index}` }, 1)));
    expect(edits.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(edits.filter(({ status }) => status === 412)).toHaveLength(19);
    expect(await here.sql(`select 1 from audit_entry where record_id = $1 and deed = 'update'`, [wish.id])).toHaveLength(1);
  });
});

describe('two connections for many workshops', () => {
  const narrow = appForFile({ POOL_SIZE: '2' });

  it('never show one workshop’s rows to another, also with errors thrown in the middle', async () => {
    const worlds = await Promise.all(Array.from({ length: 6 }, () => aWorkshop(narrow())));
    for (const [index, { owner }] of worlds.entries()) await owner.post('/api/suppliers', { id: uuidv7(), name: `Supplier of ${index}` }).expect(201);
    const answers = await Promise.all(Array.from({ length: 300 }, (_ask, at) => {
      const index = at % worlds.length;
      const { owner } = worlds[index] as World;
      if (at % 7 === 0) return owner.post('/api/suppliers', { id: 'broken' }).then(() => true);
      return owner.get('/api/suppliers').then(({ status, body }) => status === 503 || (body.items as { name: string }[]).every(({ name }) => name === `Supplier of ${index}`));
    }));
    expect(answers.filter((isOwn) => !isOwn)).toEqual([]);
  });
});
