import { mkdir, mkdtemp, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { startApp } from '#tests/support/app.ts';
import { aWorkshop } from '#tests/support/world.ts';

async function aClient(): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), 'loafmark-client-'));
  await mkdir(path.join(folder, 'assets'));
  await writeFile(path.join(folder, 'index.html'), '<!doctype html><title>Loafmark</title>');
  await writeFile(path.join(folder, 'assets', 'app-1234.js'), 'export {}');
  return folder;
}

describe('every answer', () => {
  it('carries the strict headers: page, asset, not modified, missing, refused, wrong and down', async () => {
    const app = await startApp({ CLIENT_DIR: await aClient() });
    try {
      const http = request(app.url);
      const asset = await http.get('/assets/app-1234.js').expect(200);
      const answers = [
        asset,
        await http.get('/assets/app-1234.js').set('If-None-Match', String(asset.headers['etag'])).expect(304),
        await http.get('/batches/some-address').expect(200),
        await http.get('/assets/missing.js').expect(404),
        await http.get('/api/nothing').expect(404),
        await http.get('/api/batches').expect(401),
        await http.post('/api/session').send('{').set('Content-Type', 'application/json').expect(400),
        await http.post('/api/session').send({}).expect(422),
        await http.post('/api/session').set('Origin', 'https://elsewhere.example').send({}).expect(403),
      ];
      app.loafmark.startStopping();
      answers.push(await http.get('/api/health/ready').expect(503));
      for (const { headers, status } of answers) {
        expect(headers['content-security-policy'], String(status)).toContain("default-src 'none'");
        expect(headers['content-security-policy']).not.toMatch(/unsafe-inline|unsafe-eval|\*/);
        expect(headers['content-security-policy']).toContain("frame-ancestors 'none'");
        expect(headers['x-content-type-options']).toBe('nosniff');
        expect(headers['cross-origin-opener-policy']).toBe('same-origin');
        expect(headers['permissions-policy']).toContain('camera=(self)');
        expect(headers['x-powered-by']).toBeUndefined();
      }
      // A missing script must not be answered with the page.
      expect((await http.get('/assets/missing.js')).text).not.toContain('<!doctype html>');
    } finally {
      await app.stop();
    }
  });
});

describe('behind https', () => {
  it('hardens the cookie with its prefix and Secure, and asks for https for a year', async () => {
    const app = await startApp({ PUBLIC_URL: 'https://loafmark.example', TRUSTED_PROXIES: '1' });
    try {
      // Signed up over the API: the helper that signs people in knows plain http only.
      const wish = { workshopId: '0197a000-0000-7000-8000-000000000001', workshopName: 'Secure Soap', name: 'Ada', email: 'ada@test.example', password: 'four unrelated words' };
      await request(app.url).post('/api/sign-up').send(wish).expect(200);
      const answer = await request(app.url).post('/api/session').set('X-Forwarded-Proto', 'https').send({ email: wish.email, password: wish.password }).expect(200);
      expect(String(answer.headers['set-cookie'])).toMatch(/__Host-lm=[^;]+; Path=\/; Expires=[^;]+; HttpOnly; Secure; SameSite=Lax/);
      expect(String(answer.headers['set-cookie'])).toMatch(/lm-device=[^;]+;[^,]*(?:,[^,]*)?; HttpOnly; Secure; SameSite=Lax/);
      expect(answer.headers['strict-transport-security']).toContain('max-age=31536000');
    } finally {
      await app.stop();
    }
  });
});

describe('in production', () => {
  it('has no page of development and starts without accounts', async () => {
    const app = await startApp({ NODE_ENV: 'production', PUBLIC_URL: 'http://127.0.0.1:4800' });
    try {
      const { owner, sql } = await aWorkshop(app);
      await owner.get('/api/outbox').expect(404);
      await request(app.url).get('/api/demo-accounts').expect(404);
      expect(await sql('select email from account')).toEqual([{ email: owner.email }]);
    } finally {
      await app.stop();
    }
  });
});
