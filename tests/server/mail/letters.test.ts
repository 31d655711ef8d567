import { Client } from 'pg';
import request from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { invitationLetter, plainName } from '#server/mail/letters.ts';
import { appForFile } from '#tests/support/app.ts';

const app = appForFile({ PUBLIC_URL: 'https://loafmark.example' });

describe('names in mails', () => {
  it.each([
    ['Quernby Loft', 'Quernby Loft'],
    ['Pay now: https://evil.example/x', 'Pay now https evil. example x'],
    ['line\r\nBcc: x@evil.example', 'line Bcc x evil. example'],
    ['\u202Ereversed\u200B', 'reversed'],
  ])('makes %j one line without a link', (name, plain) => {
    expect(plainName(name)).toBe(plain);
  });

  it('never leave a link but our own in an invitation', () => {
    const { subject, body } = invitationLetter('https://loafmark.example', { token: 't', from: 'www.evil.example', workshop: 'http://evil.example\nx', name: 'a@b.example', role: 'viewer', days: 7 });
    expect(subject).not.toMatch(/[\r\n]/);
    expect(body.match(/https?:\/\/\S+/g)).toEqual(['https://loafmark.example/invitation/t']);
    expect(body).not.toMatch(/www\.evil|@/);
  });
});

async function sql<Row>(statement: string, parameters: unknown[] = []): Promise<Row[]> {
  const client = new Client({ connectionString: app().database.ownerUrl });
  await client.connect();
  try {
    return (await client.query(statement, parameters)).rows as Row[];
  } finally {
    await client.end();
  }
}

describe('links in mails', () => {
  it('name our own address whatever host the request claims', async () => {
    const http = request(app().url);
    const email = 'ada.letters@test.example';
    await http.post('/api/sign-up').send({ workshopId: uuidv7(), workshopName: 'Letters', name: 'Ada', email, password: 'four unrelated words' }).expect(200);
    for (const header of ['Host', 'X-Forwarded-Host']) await http.post('/api/password-reset').set(header, 'evil.example').send({ email }).expect(200);
    const mails = await sql<{ body: string }>(`select body from outbox_mail where recipient = $1 and subject = 'Set a new password'`, [email]);
    expect(mails).toHaveLength(2);
    for (const { body } of mails) expect(body.match(/https?:\/\/[^/\s]+/g)).toEqual(['https://loafmark.example']);
  });
});
