import { createHash, randomBytes } from 'node:crypto';

/** A token for a mailed link: 256 random bits; only its SHA-256 is kept. */
export function makeToken(): { token: string; hash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: tokenHash(token) };
}

export function tokenHash(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
