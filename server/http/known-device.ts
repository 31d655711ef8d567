import { createHmac, timingSafeEqual } from 'node:crypto';
import type { Request, Response } from 'express';
import type { Config } from '../config.ts';

const NAME = 'lm-device';
const KEPT_MS = 180 * 24 * 60 * 60 * 1000;

function print(config: Config, email: string, until: number): Buffer {
  return createHmac('sha256', config.sessionSecret).update(`device|${email.toLowerCase()}|${until}`).digest();
}

/** Remembers that this device signed in with this address, so that others' wrong tries cannot shut it out. */
export function rememberDevice(config: Config, response: Response, email: string, now: Date): void {
  const until = now.getTime() + KEPT_MS;
  response.cookie(NAME, `${until}.${print(config, email, until).toString('base64url')}`, {
    httpOnly: true, sameSite: 'lax', secure: config.publicUrl.startsWith('https:'), path: '/api/session', maxAge: KEPT_MS,
  });
}

/** Whether this device signed in with this address before, as a cookie of our own signing says. */
export function isKnownDevice(config: Config, request: Request, email: string, now: Date): boolean {
  const value = /(?:^|;\s*)lm-device=(\d{1,15})\.([\w-]{43})(?:;|$)/.exec(request.get('Cookie') ?? '');
  if (!value) return false;
  const until = Number(value[1]);
  const given = Buffer.from(String(value[2]), 'base64url');
  const right = print(config, email, until);
  return until > now.getTime() && given.length === right.length && timingSafeEqual(given, right);
}
