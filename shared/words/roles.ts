import { z } from 'zod';

export const ROLES = ['owner', 'maker', 'inspector', 'viewer'] as const;
export const Role = z.enum(ROLES, { error: `Role must be one of ${ROLES.join(', ')}` });
export type Role = z.infer<typeof Role>;
