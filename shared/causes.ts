import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { FaultSlug } from './words/fault-words.ts';
import { Method, MethodFamily } from './words/methods.ts';
import { Stage } from './words/stages.ts';

/** How much is behind an answer, the firmest first; what cannot be answered comes last and says why. */
export const CAUSE_GRADES = ['settled', 'likely', 'hint', 'no-difference', 'too-few', 'not-told-apart', 'comes-after', 'no-variation'] as const;
export const CauseGrade = z.enum(CAUSE_GRADES);
export type CauseGrade = z.infer<typeof CauseGrade>;

/** Groups of inputs, in the order of the board's columns. */
export const INPUT_GROUPS = ['making', 'lots', 'who-and-what'] as const;
export const InputSlug = z.string().min(1).max(40).regex(/^[a-z][a-zA-Z]*$/, 'Input must be a slug such as waterToLye');

/** Which batches are counted; days are of the workshop's zone, both included. */
export const CausesFilter = z.object({
  from: z.iso.date({ error: 'From must be a day such as 2026-03-14' }).optional(),
  to: z.iso.date({ error: 'To must be a day such as 2026-03-14' }).optional(),
  family: z.enum(['cold', 'hot'], { error: 'Family must be cold or hot' }).optional(),
  formula: z.uuid({ error: 'Formula must be an id' }).optional(),
});
export type CausesFilter = z.infer<typeof CausesFilter>;

export const LeftOutCount = z.object({ reason: z.string(), count: z.int() });
/** An odds ratio with its 95 % interval; null where there is no bound or no answer. */
export const OddsRatio = z.object({ estimate: z.number().nullable(), lower: z.number().nullable(), upper: z.number().nullable() });
/** A share 0..1 with its 95 % interval. */
export const ShareRange = z.object({ share: z.number(), lower: z.number(), upper: z.number() });
/** An input, or one level of it, with what people call it. */
export const CauseTerm = z.object({ input: z.string(), level: z.string().nullable(), label: z.string() });
export type CauseTerm = z.infer<typeof CauseTerm>;

export const GeneratedFrom = z.object({
  /** Batches that count. */
  batches: z.int(),
  leftOut: z.array(LeftOutCount),
  filter: z.object({ from: z.string().nullable(), to: z.string().nullable(), family: z.enum(['cold', 'hot']).nullable(), formula: z.object({ id: z.string(), name: z.string() }).nullable() }),
  /** Days of the first and the last batch that counts. */
  firstMadeOn: z.string().nullable(),
  lastMadeOn: z.string().nullable(),
  /** Rises with every change of what the answers rest on. */
  dataRevision: z.int(),
  computedAt: z.string(),
  computedMs: z.int(),
  /** Questions that entered when false discoveries were held down. */
  questions: z.object({ lots: z.int(), others: z.int() }),
});
export type GeneratedFrom = z.infer<typeof GeneratedFrom>;

export const BoardFault = z.object({
  fault: FaultSlug,
  name: z.string(),
  firstSeen: Stage,
  checked: z.int(),
  found: z.int(),
  notChecked: z.int(),
  /** Too young for the stage at which the fault can first be seen. */
  notYet: z.int(),
});
export type BoardFault = z.infer<typeof BoardFault>;

export const BoardInput = z.object({
  input: InputSlug,
  name: z.string(),
  group: z.enum(INPUT_GROUPS),
  kind: z.enum(['nominal', 'number', 'held']),
  /** Unit of a number, such as `°C`; empty for none. */
  unit: z.string(),
  levels: z.array(z.object({ level: z.string(), label: z.string(), /** What the label alone does not say, such as the material of a lot. */ detail: z.string().nullable() })),
});
export type BoardInput = z.infer<typeof BoardInput>;

export const CauseCell = z.object({
  fault: FaultSlug,
  input: InputSlug,
  /** The level asked about against all others; null for numbers and for inputs that come after the fault. */
  level: z.string().nullable(),
  grade: CauseGrade,
  direction: z.enum(['more', 'less', 'none']),
  n: z.int(),
  events: z.int(),
  notChecked: z.int(),
  exposedN: z.int(),
  exposedEvents: z.int(),
  unexposedN: z.int(),
  unexposedEvents: z.int(),
  /** Adjusted odds ratio; numbers: of `range.high` against `range.low`. */
  estimate: z.number().nullable(),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
  rawEstimate: z.number().nullable(),
  q: z.number().nullable(),
  method: z.string(),
  range: z.object({ low: z.number(), high: z.number() }).nullable(),
  /** What it cannot be told apart from. */
  tiedWith: z.array(z.object({ input: z.string(), level: z.string().nullable() })),
  onThePath: z.array(z.string()),
  meltsAway: z.boolean(),
  moreNeeded: z.int().nullable(),
});
export type CauseCell = z.infer<typeof CauseCell>;

export const CausesBoard = z.object({ generatedFrom: GeneratedFrom, faults: z.array(BoardFault), inputs: z.array(BoardInput), cells: z.array(CauseCell) });
export type CausesBoard = z.infer<typeof CausesBoard>;

export const CauseDetail = z.object({
  generatedFrom: GeneratedFrom,
  fault: BoardFault,
  input: BoardInput,
  levelLabel: z.string().nullable(),
  cell: CauseCell,
  raw: OddsRatio,
  p: z.number().nullable(),
  leftOut: z.array(LeftOutCount),
  adjustedFor: z.array(CauseTerm),
  onThePath: z.array(z.object({ input: z.string(), name: z.string() })),
  tiedWith: z.array(CauseTerm),
  /** Numbers: odds ratio for one standard deviation inside a method family. */
  perSpread: OddsRatio.extend({ spread: z.number() }).nullable(),
  strata: z.array(z.object({
    method: Method, maker: z.string().nullable(), makerName: z.string().nullable(),
    exposedN: z.int(), exposedEvents: z.int(), unexposedN: z.int(), unexposedEvents: z.int(),
    exposedRate: ShareRange.nullable(), unexposedRate: ShareRange.nullable(),
  })),
  mantelHaenszel: OddsRatio.nullable(),
  homogeneityP: z.number().nullable(),
  differs: z.boolean(),
  without: z.array(OddsRatio.extend({ term: CauseTerm })),
  leaveOneOut: z.object({ lowest: z.number(), highest: z.number() }).nullable(),
  bins: z.array(ShareRange.extend({ from: z.number(), to: z.number(), n: z.int(), events: z.int() })),
  /** Numbers: exposed are the batches above it. */
  above: z.number().nullable(),
  /** Other inputs that looked like causes of this fault by raw count and melt away once adjusted. */
  meltedAway: z.array(CauseTerm.extend({ exposedN: z.int(), exposedEvents: z.int(), unexposedN: z.int(), unexposedEvents: z.int() })),
});
export type CauseDetail = z.infer<typeof CauseDetail>;

export const BehindOutcome = z.enum(['found', 'clear', 'not-checked', 'not-yet']);
export const BatchBehind = z.object({
  id: z.string(),
  code: z.string(),
  madeOn: z.string(),
  method: Method,
  family: MethodFamily,
  outcome: BehindOutcome,
  severity: z.int().nullable(),
  /** Null when the batch's record does not say. */
  group: z.enum(['exposed', 'unexposed']).nullable(),
  value: z.number().nullable(),
});
export type BatchBehind = z.infer<typeof BatchBehind>;

const params = z.object({ fault: FaultSlug, input: InputSlug });
const level = z.string().min(1).max(80).optional();

export const BehindFilter = CausesFilter.extend({ level, group: z.enum(['exposed', 'unexposed']).optional(), outcome: BehindOutcome.optional() });

export const causesApi = {
  board: endpoint({ method: 'get', path: '/api/causes', summary: 'Faults against inputs, each with its evidence', right: 'workshop.read', heavy: true, query: CausesFilter, reply: CausesBoard }),
  one: endpoint({ method: 'get', path: '/api/causes/:fault/:input', summary: 'One cause in detail', right: 'workshop.read', heavy: true, params, query: CausesFilter.extend({ level }), reply: CauseDetail }),
  batches: endpoint({
    method: 'get', path: '/api/causes/:fault/:input/batches', summary: 'The batches behind a figure, newest first, at most 1,000', right: 'workshop.read', heavy: true, params, query: BehindFilter,
    reply: z.object({ items: z.array(BatchBehind), total: z.int() }),
  }),
};
