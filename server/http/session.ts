import { createHash, randomBytes } from 'node:crypto';
import connectPgSimple from 'connect-pg-simple';
import type { Request, RequestHandler } from 'express';
import session from 'express-session';
import type { Pool } from 'pg';
import type { Config } from '../config.ts';

const DAY_MS = 24 * 60 * 60 * 1000;
/** Wet gloves at the bench: seven days idle, thirty in all. */
export const SESSION_IDLE_MS = 7 * DAY_MS;
export const SESSION_TOTAL_MS = 30 * DAY_MS;

declare module 'express-session' {
  interface SessionData {
    accountId: string;
    workshopId: string;
    memberId: string;
    /** When the person signed in, ms since 1970; sessions end thirty days later. */
    signedInAt: number;
    /** Device's own words for itself, shown in the list of sessions. */
    device: string;
  }
}

/** Only the SHA-256 of a session's id is stored: a stolen dump opens no session. */
export function sessionKey(id: string): string {
  return createHash('sha256').update(id).digest('hex');
}

const PgStore = connectPgSimple(session);

class HashedStore extends PgStore {
  override get(sid: string, callback: (error: unknown, data?: session.SessionData | null) => void): void {
    super.get(sessionKey(sid), callback);
  }
  override set(sid: string, data: session.SessionData, callback?: (error?: unknown) => void): void {
    super.set(sessionKey(sid), data, callback as () => void);
  }
  override destroy(sid: string, callback?: (error?: unknown) => void): void {
    super.destroy(sessionKey(sid), callback as () => void);
  }
  override touch(sid: string, data: session.SessionData, callback?: () => void): void {
    super.touch(sessionKey(sid), data, callback);
  }
}

/** Cookie sessions kept in PostgreSQL. */
export function sessions(config: Config, pool: Pool): RequestHandler {
  const secure = config.publicUrl.startsWith('https:');
  return session({
    store: new HashedStore({ pool, tableName: 'web_session', createTableIfMissing: false, ttl: SESSION_IDLE_MS / 1000, pruneSessionInterval: 15 * 60 }),
    secret: config.sessionSecret,
    // A plain name on plain-http loopback: browsers refuse the __Host- prefix without Secure.
    name: secure ? '__Host-lm' : 'lm',
    genid: () => randomBytes(32).toString('base64url'),
    resave: false,
    rolling: true,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure, path: '/', maxAge: SESSION_IDLE_MS },
  });
}

/** A new id for whoever the session belongs to from now on; a made-up or earlier id is never taken over. */
async function renewSession(request: Request, data: Pick<session.SessionData, 'accountId' | 'workshopId' | 'memberId' | 'signedInAt' | 'device'>): Promise<void> {
  await new Promise<void>((resolve, reject) => request.session.regenerate((error: unknown) => (error ? reject(error) : resolve())));
  Object.assign(request.session, data);
  await new Promise<void>((resolve, reject) => request.session.save((error: unknown) => (error ? reject(error) : resolve())));
}

interface Belonging {
  accountId: string;
  workshopId: string;
  memberId: string;
}

/** Gives the request a session with a new id that belongs to this membership. */
export async function openSession(request: Request, who: Belonging, now: Date): Promise<void> {
  await renewSession(request, { ...who, signedInAt: now.getTime(), device: (request.get('User-Agent') ?? 'unknown device').slice(0, 200) });
}

/** A new id for the same sign-in, e.g. in another workshop or after a new password; its thirty days run on. */
export async function moveSession(request: Request, who: Belonging): Promise<void> {
  const { signedInAt, device } = request.session;
  await renewSession(request, { ...who, signedInAt: signedInAt ?? 0, device: device ?? 'unknown device' });
}

export async function endSession(request: Request): Promise<void> {
  await new Promise<void>((resolve, reject) => request.session.destroy((error: unknown) => (error ? reject(error) : resolve())));
}
