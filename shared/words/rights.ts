import type { Role } from './roles.ts';

/** Who may do what, once for server, client and tests. */
export const RIGHTS = {
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
} as const satisfies Record<string, readonly Role[]>;

export type Right = keyof typeof RIGHTS;

/** `public` needs no session; `account` a session, whatever the role. */
export type Access = Right | 'public' | 'account';

export function roleHas(role: Role, right: Right): boolean {
  return (RIGHTS[right] as readonly Role[]).includes(role);
}
