import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { readConfig } from '#server/config.ts';
import { appForFile } from '#tests/support/app.ts';

// Throw-away clusters run without fsync, which a real server must not: readiness says so.
const app = appForFile();

describe('health', () => {
  it('is alive without touching anything', async () => {
    await request(app().url).get('/api/health/live').expect(200, { live: true });
  });

  it('is not ready over a database that may lose what it acknowledged', async () => {
    const [{ fsync }] = await app().loafmark.source.query<[{ fsync: string }]>('show fsync');
    const { status, headers } = await request(app().url).get('/api/health/ready');
    expect(status).toBe(fsync === 'on' ? 200 : 503);
    if (status === 503) expect(headers['retry-after']).toBeDefined();
  });

  it('says no while it stops', async () => {
    app().loafmark.startStopping();
    await request(app().url).get('/api/health/ready').expect(503);
    await request(app().url).get('/api/health/live').expect(200);
  });
});

describe('the configuration', () => {
  const good = { DATABASE_URL: 'postgres://a@localhost/b', SESSION_SECRET: 'x'.repeat(32) };

  it('names each wrong variable', () => {
    expect(() => readConfig({ ...good, PORT: '99999' })).toThrow(/PORT: /);
    expect(() => readConfig({ ...good, SESSION_SECRET: 'short' })).toThrow(/SESSION_SECRET must have at least 32/);
    expect(() => readConfig({ SESSION_SECRET: good.SESSION_SECRET })).toThrow(/DATABASE_URL/);
  });

  it('wants a public address in production', () => {
    expect(() => readConfig({ ...good, NODE_ENV: 'production' })).toThrow(/PUBLIC_URL/);
    expect(readConfig({ ...good, NODE_ENV: 'production', PUBLIC_URL: 'https://soap.example' }).mode).toBe('production');
  });
});
