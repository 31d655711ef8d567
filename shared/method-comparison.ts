import { z } from 'zod';
import { CauseCell, CauseGrade, CausesFilter, GeneratedFrom, ShareRange } from './causes.ts';
import { endpoint } from './http/endpoint.ts';
import { FaultSlug } from './words/fault-words.ts';

/** Hot minus cold as a difference of shares, with its 95 % interval. */
const Difference = z.object({ difference: z.number(), lower: z.number(), upper: z.number() });

export const FamilyRate = z.object({ n: z.int(), events: z.int(), raw: ShareRange.nullable(), standardised: ShareRange.nullable() });
export type FamilyRate = z.infer<typeof FamilyRate>;

export const FaultComparison = z.object({
  fault: FaultSlug,
  name: z.string(),
  hot: FamilyRate,
  cold: FamilyRate,
  notChecked: z.int(),
  difference: Difference.nullable(),
  /** With the same mix of makers in both. */
  standardisedDifference: Difference.nullable(),
  neverMet: z.array(z.object({ makerName: z.string().nullable(), hotN: z.int(), coldN: z.int() })),
  grade: CauseGrade,
  cell: CauseCell.nullable(),
});
export type FaultComparison = z.infer<typeof FaultComparison>;

export const MethodComparison = z.object({
  generatedFrom: GeneratedFrom,
  batches: z.object({ hot: z.int(), cold: z.int() }),
  /** Inputs whose mix both families are given. */
  by: z.array(z.string()),
  faults: z.array(FaultComparison),
  /** What was made in one family only, so that nothing can be compared. */
  onlyIn: z.array(z.object({ input: z.string(), level: z.string(), label: z.string(), detail: z.string().nullable(), family: z.enum(['hot', 'cold']), batches: z.int() })),
});
export type MethodComparison = z.infer<typeof MethodComparison>;

export const methodComparisonApi = {
  compare: endpoint({ method: 'get', path: '/api/methods/comparison', summary: 'Hot against cold, fault by fault', right: 'workshop.read', heavy: true, query: CausesFilter.omit({ family: true }), reply: MethodComparison }),
};
