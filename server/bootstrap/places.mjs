import { createHash } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
/** What belongs to this checkout on this machine: cluster, passwords, stamps. Ignored by git. */
export const LOCAL = path.join(ROOT, '.local');
/** A short name for this checkout, for folders outside it. */
export const CHECKOUT = createHash('sha256').update(ROOT).digest('hex').slice(0, 10);
export const isRoot = process.getuid?.() === 0;

export function makeLocal() {
  mkdirSync(LOCAL, { recursive: true });
}
