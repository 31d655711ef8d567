import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, count, id, instant, measure, optionalText, recordFields } from './http/fields.ts';
import { Answer, FaultSlug, Severity } from './words/fault-words.ts';
import { BatchState, Palette } from './words/batch-words.ts';
import { Stage } from './words/stages.ts';

const share = z.number().min(0, 'Coordinates lie between 0 and 1').max(1, 'Coordinates lie between 0 and 1');

/** Sums of decimals such as 0.1 + 0.9 may end a hair beyond the edge. */
const EDGE = 1e-9;

/** A point, box or outline on a photo, in 0..1 of the upright picture. */
export const MarkWish = z.discriminatedUnion('shape', [
  z.strictObject({ id, photoId: z.uuid(), shape: z.literal('point'), x: share, y: share }),
  z
    .strictObject({ id, photoId: z.uuid(), shape: z.literal('box'), x: share, y: share, width: share, height: share })
    .refine((box) => box.x + box.width <= 1 + EDGE && box.y + box.height <= 1 + EDGE, 'A box must lie inside the picture'),
  z.strictObject({ id, photoId: z.uuid(), shape: z.literal('outline'), x: share, y: share, outline: z.array(z.tuple([share, share])).min(3).max(200) }),
]);
export type MarkWish = z.infer<typeof MarkWish>;

export const MarkView = z.object({
  id: z.string(),
  photoId: z.string(),
  shape: z.enum(['point', 'box', 'outline']),
  x: z.number(),
  y: z.number(),
  width: z.number().nullable(),
  height: z.number().nullable(),
  outline: z.array(z.tuple([z.number(), z.number()])).nullable(),
});
export type MarkView = z.infer<typeof MarkView>;

const findingFields = {
  severity: Severity,
  /** Numbers of the bars that show it, from the maker's mark. */
  bars: z.array(z.int().min(1).max(2000)).max(2000).nullable().default(null),
  barsAffected: count('Bars affected', 0, 2000).nullable().default(null),
  barsLookedAt: count('Bars looked at', 0, 2000).nullable().default(null),
  note: optionalText('Note', 2000),
  marks: z.array(MarkWish).max(60, 'At most 60 marks').default([]),
};

/** A fault seen at an inspection. Keeping one makes the fault's answer `found`. */
export const NewFinding = z.strictObject({ id, fault: FaultSlug, ...findingFields });
export type NewFinding = z.infer<typeof NewFinding>;
export const ChangeFinding = changeOf(findingFields);
export type ChangeFinding = z.infer<typeof ChangeFinding>;

export const FindingView = z.object({
  ...recordFields,
  inspectionId: z.string(),
  batchId: z.string(),
  fault: FaultSlug,
  severity: Severity,
  bars: z.array(z.int()).nullable(),
  barsAffected: z.int().nullable(),
  barsLookedAt: z.int().nullable(),
  note: z.string().nullable(),
  marks: z.array(MarkView),
  isWithdrawn: z.boolean(),
  /** Set while the batch is held, e.g. since this finding is one of safety. */
  batchHoldReason: z.string().nullable(),
});
export type FindingView = z.infer<typeof FindingView>;

export const READING_KINDS = ['loaf-mass-g', 'bar-mass-g', 'room-temperature-c', 'humidity-fraction', 'ph', 'alkalinity-pass'] as const;
const readingOf = (kind: (typeof READING_KINDS)[number], value: z.ZodNumber) => z.strictObject({ id, kind: z.literal(kind), value, bar: z.int().min(1).max(2000).nullable().default(null) });
export const ReadingWish = z.discriminatedUnion('kind', [
  readingOf('loaf-mass-g', measure('Loaf mass', 0, 500_000, 'g')),
  readingOf('bar-mass-g', measure('Bar mass', 0, 5_000, 'g')),
  readingOf('room-temperature-c', measure('Room temperature', -5, 50, '°C')),
  readingOf('humidity-fraction', measure('Humidity', 0.01, 1)),
  readingOf('ph', measure('pH', 0, 14)),
  /** 1 passed, 0 failed. */
  readingOf('alkalinity-pass', measure('Alkalinity check (1 passed, 0 failed)', 0, 1).int()),
]);
export type ReadingWish = z.infer<typeof ReadingWish>;

/** Answers of one look; a fault not named stays as it was, at first `not-checked`. */
export const ChecklistAnswers = z.array(z.strictObject({ fault: FaultSlug, answer: Answer })).max(80);

const inspectionFields = {
  inspectedAt: instant,
  barsLookedAt: count('Bars looked at', 0, 2000).nullable().default(null),
  note: optionalText('Note', 4000),
};

export const NewInspection = z.strictObject({
  id,
  stage: Stage,
  ...inspectionFields,
  answers: ChecklistAnswers.default([]),
  findings: z.array(NewFinding).max(40).default([]),
  readings: z.array(ReadingWish).max(40).default([]),
});
export type NewInspection = z.infer<typeof NewInspection>;

export const ChangeInspection = changeOf({ ...inspectionFields, answers: ChecklistAnswers });
export type ChangeInspection = z.infer<typeof ChangeInspection>;

export const InspectionView = z.object({
  ...recordFields,
  batchId: z.string(),
  stage: Stage,
  inspectedAt: z.string(),
  inspectorId: z.string().nullable(),
  inspectorName: z.string().nullable(),
  barsLookedAt: z.int().nullable(),
  note: z.string().nullable(),
  answers: z.array(z.object({ fault: FaultSlug, answer: Answer })),
  findings: z.array(FindingView),
  readings: z.array(z.object({ id: z.string(), kind: z.string(), value: z.number(), bar: z.int().nullable() })),
  batchState: BatchState,
  batchHoldReason: z.string().nullable(),
});
export type InspectionView = z.infer<typeof InspectionView>;

/** A look that the plan asks for. */
export const DueInspection = z.object({
  batchId: z.string(),
  batchCode: z.string(),
  palette: Palette.nullable(),
  bars: z.int().nullable(),
  formulaName: z.string().nullable(),
  stage: Stage,
  dueOn: z.string(),
  daysLate: z.int(),
  standing: z.enum(['coming', 'due', 'late', 'overdue']),
  /** Faults that must be answered, in checklist order. */
  mustAnswer: z.array(FaultSlug),
});
export type DueInspection = z.infer<typeof DueInspection>;

/** Faults of this workshop's records by how often they were found at a stage, for "likely first". */
export const LikelyFaults = z.object({ items: z.array(z.object({ fault: FaultSlug, found: z.int(), checked: z.int() })) });

const batchParams = z.object({ batchId: z.uuid() });
const params = z.object({ inspectionId: z.uuid() });

export const inspectionsApi = {
  ofBatch: endpoint({ method: 'get', path: '/api/batches/:batchId/inspections', summary: 'Inspections of a batch, oldest first', right: 'workshop.read', params: batchParams, reply: z.object({ items: z.array(InspectionView) }) }),
  record: endpoint({ method: 'post', path: '/api/batches/:batchId/inspections', summary: 'Record an inspection', right: 'inspection.write', params: batchParams, body: NewInspection, reply: InspectionView, creates: true }),
  due: endpoint({ method: 'get', path: '/api/inspections/due', summary: 'What wants looking at', right: 'workshop.read', query: z.object({ on: z.iso.date().optional() }), reply: z.object({ items: z.array(DueInspection) }) }),
  likely: endpoint({ method: 'get', path: '/api/inspections/likely-faults', summary: 'Faults likely at a stage', right: 'workshop.read', query: z.object({ stage: Stage, batchId: z.uuid().optional() }), reply: LikelyFaults }),
  read: endpoint({ method: 'get', path: '/api/inspections/:inspectionId', summary: 'One inspection', right: 'workshop.read', params, reply: InspectionView }),
  change: endpoint({ method: 'patch', path: '/api/inspections/:inspectionId', summary: 'Answer more of the checklist', right: 'inspection.write', params, body: ChangeInspection, reply: InspectionView, versioned: true }),
  keepFinding: endpoint({ method: 'post', path: '/api/inspections/:inspectionId/findings', summary: 'Keep a finding', right: 'inspection.write', params, body: NewFinding, reply: FindingView, creates: true }),
  changeFinding: endpoint({ method: 'patch', path: '/api/findings/:findingId', summary: 'Change a finding', right: 'inspection.write', params: z.object({ findingId: z.uuid() }), body: ChangeFinding, reply: FindingView, versioned: true }),
  withdrawFinding: endpoint({ method: 'put', path: '/api/findings/:findingId/withdrawal', summary: 'Take a finding back; the fault returns to not checked', right: 'inspection.write', params: z.object({ findingId: z.uuid() }), body: z.strictObject({ isWithdrawn: z.boolean() }), reply: FindingView, versioned: true }),
};
