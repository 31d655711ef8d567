import { z } from 'zod';
import { batchFields } from './batch-fields.ts';
import { endpoint } from './http/endpoint.ts';
import { changeOf, count, day, id, optionalMeasure, recordFields, text } from './http/fields.ts';
import { pageOf, pageQuery } from './http/page.ts';
import { BatchState, CookStage, Cover, DispositionKind, Gel, Palette, Trace } from './words/batch-words.ts';
import { FaultSlug, Severity } from './words/fault-words.ts';
import { LotStanding, MaterialKind } from './words/lot-words.ts';
import { Method, MethodFamily } from './words/methods.ts';

export const NewBatch = z.strictObject({
  id,
  /** Left out: the workshop's next number. */
  code: text('Batch code', 40).optional(),
  madeOn: day('Made on'),
  method: Method,
  state: BatchState.default('making'),
  ...batchFields,
});
export type NewBatch = z.infer<typeof NewBatch>;
export type NewBatchInput = z.input<typeof NewBatch>;

export const ChangeBatch = changeOf({ madeOn: day('Made on'), method: Method, state: BatchState, ...batchFields });
export type ChangeBatch = z.infer<typeof ChangeBatch>;

/** A fault that was found on a batch, with the worst severity over all its inspections. */
export const FoundFault = z.object({ fault: FaultSlug, severity: Severity });

export const BatchLot = z.object({ lotId: z.string(), code: z.string(), materialName: z.string(), kind: MaterialKind, standing: LotStanding });

/** One row of the log. */
export const BatchRow = z.object({
  id: z.string(),
  version: z.int(),
  code: z.string(),
  madeOn: z.string(),
  method: Method,
  family: MethodFamily,
  state: BatchState,
  formulaName: z.string().nullable(),
  makerName: z.string().nullable(),
  mouldName: z.string().nullable(),
  waterToLye: z.number().nullable(),
  oilTemperatureC: z.number().nullable(),
  fragranceFraction: z.number().nullable(),
  lots: z.array(BatchLot),
  found: z.array(FoundFault),
  /** Faults answered clear; those neither found nor clear were not looked at. */
  clear: z.array(FaultSlug),
  bars: z.int().nullable(),
  dispositions: z.array(z.object({ kind: DispositionKind, bars: z.int() })),
  lostMinor: z.int(),
  palette: Palette.nullable(),
  coverPhotoId: z.string().nullable(),
});
export type BatchRow = z.infer<typeof BatchRow>;

const Ingredient = z.object({
  id: z.string(),
  materialId: z.string(),
  materialName: z.string(),
  kind: MaterialKind,
  lotId: z.string().nullable(),
  lotCode: z.string().nullable(),
  lotStanding: LotStanding.nullable(),
});

const batchView = {
  ...recordFields,
  code: z.string(),
  madeOn: z.string(),
  pouredAt: z.string().nullable(),
  method: Method,
  family: MethodFamily,
  state: BatchState,
  formulaId: z.string().nullable(),
  formulaName: z.string().nullable(),
  formulaVersionId: z.string().nullable(),
  formulaVersionNumber: z.int().nullable(),
  makerId: z.string().nullable(),
  makerName: z.string().nullable(),
  mouldId: z.string().nullable(),
  mouldName: z.string().nullable(),
  bars: z.int().nullable(),
  waterToLye: z.number().nullable(),
  lyeConcentrationFraction: z.number().nullable(),
  superfatFraction: z.number().nullable(),
  superfatWeighedFraction: z.number().nullable(),
  oilTemperatureC: z.number().nullable(),
  lyeTemperatureC: z.number().nullable(),
  batterTemperatureC: z.number().nullable(),
  scentTemperatureC: z.number().nullable(),
  roomTemperatureC: z.number().nullable(),
  humidityFraction: z.number().nullable(),
  blendSeconds: z.int().nullable(),
  traceAtScent: Trace.nullable(),
  traceAtPour: Trace.nullable(),
  minutesToPour: z.number().nullable(),
  cover: Cover.nullable(),
  isSprayed: z.boolean().nullable(),
  gel: Gel.nullable(),
  cookTemperatureC: z.number().nullable(),
  cookMinutes: z.number().nullable(),
  cookLossFraction: z.number().nullable(),
  mouldHours: z.number().nullable(),
  cutHours: z.number().nullable(),
  unmouldedOn: z.string().nullable(),
  cutOn: z.string().nullable(),
  fragranceFraction: z.number().nullable(),
  palette: Palette.nullable(),
  hasEmbeds: z.boolean(),
  note: z.string().nullable(),
  holdReason: z.string().nullable(),
  found: z.array(FoundFault),
  clear: z.array(FaultSlug),
  dispositions: z.array(z.object({ kind: DispositionKind, bars: z.int(), fault: FaultSlug.nullable() })),
  lostMinor: z.int(),
  cookStages: z.array(z.object({ stage: CookStage, minutesFromStart: z.number() })),
};

/** For those who may read formula quantities: masses and shares beside each ingredient. */
export const BatchView = z.object({
  ...batchView,
  oilMassG: z.number().nullable(),
  ingredients: z.array(Ingredient.extend({ massG: z.number().nullable(), shareOfOilsFraction: z.number().nullable() })),
  seesQuantities: z.literal(true),
});
export type BatchView = z.infer<typeof BatchView>;

/** For the others: the fragrances' load in all (it is on the claim), no grams, no shares. */
export const BatchOutline = z.object({
  ...batchView,
  ingredients: z.array(Ingredient),
  seesQuantities: z.literal(false),
});
export type BatchOutline = z.infer<typeof BatchOutline>;

export const AnyBatchView = z.discriminatedUnion('seesQuantities', [BatchView, BatchOutline]);
export type AnyBatchView = z.infer<typeof AnyBatchView>;

export const BATCH_SORTS = ['made', 'code', 'water', 'oils', 'load', 'worst'] as const;

const list = <Item extends z.ZodType<unknown, string>>(item: Item) =>
  z.string().max(2000).transform((value) => value.split(',').filter(Boolean)).pipe(z.array(item).max(40)).optional();

/** The sentence filter of the log: "Show cold batches made since … holding … where … was found". */
export const BatchesFilter = z.object({
  ...pageQuery,
  method: list(Method),
  family: MethodFamily.optional(),
  state: list(BatchState),
  /** Batches that hold any of these lots. */
  lot: list(z.uuid()),
  maker: list(z.uuid()),
  formula: list(z.uuid()),
  from: z.iso.date().optional(),
  to: z.iso.date().optional(),
  /** With `answer`: the fault that was found, clear, or not looked at. */
  fault: FaultSlug.optional(),
  answer: z.enum(['found', 'clear', 'not-checked', 'answered']).optional(),
  /** Part of a batch code, a note, a lot code or a formula's name. */
  find: z.string().max(80).optional(),
  sort: z.enum(BATCH_SORTS).default('made'),
  order: z.enum(['asc', 'desc']).default('desc'),
});
export type BatchesFilter = z.infer<typeof BatchesFilter>;

export const Mould = z.object({ ...recordFields, name: z.string(), oilMassG: z.number().nullable(), bars: z.int().nullable() });
export type Mould = z.infer<typeof Mould>;
export const NewMould = z.strictObject({
  id,
  name: text('Mould name', 80),
  oilMassG: optionalMeasure('Oil mass', 1, 500_000, 'g'),
  bars: count('Bars', 1, 500).nullable().default(null),
});
export type NewMould = z.infer<typeof NewMould>;

const params = z.object({ batchId: z.uuid() });
const { cursor: _cursor, limit: _limit, ...unpaged } = BatchesFilter.shape;
/** The filter without its page: for the count and the export. */
export const BatchesChoice = z.object(unpaged);
export type BatchesChoice = z.infer<typeof BatchesChoice>;

export const batchesApi = {
  list: endpoint({ method: 'get', path: '/api/batches', summary: 'The log', right: 'workshop.read', query: BatchesFilter, reply: pageOf(BatchRow) }),
  count: endpoint({ method: 'get', path: '/api/batches/count', summary: 'How many batches a filter finds, and how many there are', right: 'workshop.read', query: BatchesChoice, reply: z.object({ found: z.int(), all: z.int() }) }),
  read: endpoint({ method: 'get', path: '/api/batches/:batchId', summary: 'One batch', right: 'workshop.read', params, reply: AnyBatchView }),
  create: endpoint({ method: 'post', path: '/api/batches', summary: 'Log a batch', right: 'batch.write', body: NewBatch, reply: BatchView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/batches/:batchId', summary: 'Change a batch', right: 'batch.write', params, body: ChangeBatch, reply: BatchView, versioned: true }),
  moulds: endpoint({ method: 'get', path: '/api/moulds', summary: 'Moulds by name', right: 'workshop.read', reply: z.object({ items: z.array(Mould) }) }),
  addMould: endpoint({ method: 'post', path: '/api/moulds', summary: 'Add a mould', right: 'batch.write', body: NewMould, reply: Mould, creates: true }),
};
