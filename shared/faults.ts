import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { FaultSlug } from './words/fault-words.ts';
import { MethodFamily } from './words/methods.ts';
import { Stage } from './words/stages.ts';

export const FAULT_KINDS = ['cosmetic', 'functional', 'process', 'safety'] as const;
export const FaultKind = z.enum(FAULT_KINDS);
export const FAULT_FAMILIES = ['surface', 'structure', 'pour', 'colour', 'scent', 'safety'] as const;
export const FaultFamily = z.enum(FAULT_FAMILIES);

/** A fault of the catalogue, with all that an inspector needs to tell it from another. */
export const FaultView = z.object({
  slug: FaultSlug,
  name: z.string(),
  otherNames: z.array(z.string()),
  kind: FaultKind,
  family: FaultFamily,
  methodFamilies: z.array(MethodFamily),
  firstSeen: Stage,
  definition: z.string(),
  /** Criteria of severity 1, 2 and 3; null where that severity does not exist for the fault. */
  criteria: z.tuple([z.string().nullable(), z.string().nullable(), z.string().nullable()]),
  extentUnit: z.enum(['bars', 'loaves']),
  lookAlikes: z.array(z.object({ name: z.string(), howToTell: z.string() })),
  prevention: z.string(),
  disposition: z.string(),
  /** Per stage: must be answered, may be, or cannot be judged. */
  checklist: z.array(z.object({ stage: Stage, answer: z.enum(['must', 'may', 'cannot']) })),
});
export type FaultView = z.infer<typeof FaultView>;

export const faultsApi = {
  list: endpoint({ method: 'get', path: '/api/faults', summary: 'The fault catalogue, in the order faults are first seen', right: 'workshop.read', reply: z.object({ items: z.array(FaultView) }) }),
};
