import { z } from 'zod';

export const LOT_STANDINGS = ['in-use', 'hot-process-only', 'on-hold', 'returned', 'used-up'] as const;
export const LotStanding = z.enum(LOT_STANDINGS, { error: `Standing must be one of ${LOT_STANDINGS.join(', ')}` });
export type LotStanding = z.infer<typeof LotStanding>;

export const MATERIAL_KINDS = ['fat', 'alkali', 'liquid', 'fragrance', 'colourant', 'additive', 'packaging'] as const;
export const MaterialKind = z.enum(MATERIAL_KINDS, { error: `Kind must be one of ${MATERIAL_KINDS.join(', ')}` });
export type MaterialKind = z.infer<typeof MaterialKind>;
