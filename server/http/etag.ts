import type { Request } from 'express';
import { malformed, versionNeeded } from '../problem.ts';

/** The version a writer last saw, from `If-Match: "3"`. @throws Problem 428 when missing, 400 when not one of ours */
export function versionSeen(request: Request): number {
  const header = request.get('If-Match');
  if (header === undefined) throw versionNeeded();
  const match = /^(?:W\/)?"(\d{1,9})"$/.exec(header.trim());
  if (!match) throw malformed('If-Match must be a version in quotes, for example "3"');
  return Number(match[1]);
}

export function etagOf(version: number): string {
  return `"${version}"`;
}
