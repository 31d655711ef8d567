import { z } from 'zod';
import { CauseGrade, GeneratedFrom, LeftOutCount, ShareRange } from './causes.ts';
import { endpoint } from './http/endpoint.ts';
import { FaultSlug } from './words/fault-words.ts';
import { LotStanding } from './words/lot-words.ts';

/** `disagrees`: the counts accuse the lot; the board, which knows what else moved with it, does not. */
export const LotVerdict = z.enum(['misbehaves', 'watch', 'disagrees', 'too-few', 'as-its-peers']);
export type LotVerdict = z.infer<typeof LotVerdict>;

/** Kinds of material whose lots are compared with their peers. */
export const BEHAVING_KINDS = ['fragrance', 'fat', 'alkali', 'colourant'] as const;
export const BehavingKind = z.enum(BEHAVING_KINDS, { error: `Kind must be one of ${BEHAVING_KINDS.join(', ')}` });
export type BehavingKind = z.infer<typeof BehavingKind>;

export const LotRate = z.object({
  n: z.int(),
  events: z.int(),
  notChecked: z.int(),
  rate: ShareRange.nullable(),
  /** Batches that would be found at the rates of its peers, and the same as a share. */
  expected: z.number(),
  expectedRate: z.number().nullable(),
  /** Shrunken rate against its peers, with its 95 % interval. */
  ratio: z.object({ mean: z.number(), lower: z.number(), upper: z.number() }).nullable(),
  /** Chance 0..1 that the lot is at least twice as bad as its peers. */
  chanceTwice: z.number().nullable(),
  shownRate: z.number().nullable(),
  verdict: LotVerdict,
});
export type LotRate = z.infer<typeof LotRate>;

export const LotFaultRate = z.object({ fault: FaultSlug, name: z.string(), verdict: LotVerdict, all: LotRate, cold: LotRate, hot: LotRate, boardGrade: CauseGrade.nullable() });
export type LotFaultRate = z.infer<typeof LotFaultRate>;

/** One batch that holds the lot: what was found of each of the fault columns, worst first. */
export const LotBatch = z.object({
  id: z.string(), code: z.string(), madeOn: z.string(), family: z.enum(['cold', 'hot', 'rebatch']), counts: z.boolean(),
  found: z.array(z.object({ fault: FaultSlug, severity: z.int() })),
  clear: z.array(FaultSlug),
});
export type LotBatch = z.infer<typeof LotBatch>;

const behaviour = {
  lotId: z.string(),
  code: z.string(),
  materialName: z.string(),
  standing: LotStanding,
  /** Batches that hold it and count. */
  n: z.int(),
  coldBatches: z.int(),
  hotBatches: z.int(),
  verdict: LotVerdict,
  suggestedStanding: LotStanding.nullable(),
  because: z.array(z.object({ fault: FaultSlug, coldN: z.int(), coldEvents: z.int(), hotN: z.int(), hotEvents: z.int(), hotUpper: z.number().nullable() })),
  leftOut: z.array(LeftOutCount),
  method: z.literal('gamma-poisson'),
};

/** A lot in the list, with the one fault that speaks loudest. */
export const LotBehaviourRow = z.object({ ...behaviour, worst: LotFaultRate.nullable() });
export type LotBehaviourRow = z.infer<typeof LotBehaviourRow>;

export const LotBehaviourView = z.object({
  ...behaviour,
  generatedFrom: GeneratedFrom,
  faults: z.array(LotFaultRate),
  /** Other lots of the kind. */
  peers: z.int(),
  /** Other lots of the same material, which tell the lot from the scent. */
  sameMaterial: z.array(z.object({ lotId: z.string(), code: z.string(), verdict: LotVerdict, n: z.int() })),
  batches: z.array(LotBatch),
});
export type LotBehaviourView = z.infer<typeof LotBehaviourView>;

export const lotBehaviourApi = {
  all: endpoint({
    method: 'get', path: '/api/lots/behaviour', summary: 'How the lots of a kind behave against each other, the gravest first', right: 'workshop.read', heavy: true,
    query: z.object({ kind: BehavingKind.default('fragrance') }),
    reply: z.object({ generatedFrom: GeneratedFrom, kind: BehavingKind, items: z.array(LotBehaviourRow) }),
  }),
  one: endpoint({ method: 'get', path: '/api/lots/:lotId/behaviour', summary: 'How one lot behaves against its peers', right: 'workshop.read', heavy: true, params: z.object({ lotId: z.uuid() }), reply: LotBehaviourView }),
};
