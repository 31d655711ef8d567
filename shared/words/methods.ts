import { z } from 'zod';

export const METHODS = ['cold', 'cold-oven', 'hot', 'hot-fluid', 'rebatch'] as const;
export const Method = z.enum(METHODS, { error: `Method must be one of ${METHODS.join(', ')}` });
export type Method = z.infer<typeof Method>;

export const METHOD_FAMILIES = ['cold', 'hot', 'rebatch'] as const;
export const MethodFamily = z.enum(METHOD_FAMILIES);
export type MethodFamily = z.infer<typeof MethodFamily>;

/** Cold and oven-gelled are the cold family, hot and fluid the hot family; rebatch stands alone. */
export function familyOf(method: Method): MethodFamily {
  if (method === 'rebatch') return 'rebatch';
  return method === 'hot' || method === 'hot-fluid' ? 'hot' : 'cold';
}
