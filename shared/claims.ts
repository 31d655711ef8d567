import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, id, optionalDay, optionalText, recordFields, text } from './http/fields.ts';
import { FaultSlug } from './words/fault-words.ts';

/** Columns of the supplier's file, in order. Those marked `always` cannot be left out: without them a row says nothing. */
export const CLAIM_COLUMNS = [
  { name: 'claim number', always: true }, { name: 'supplier', always: true }, { name: 'fragrance name', always: true }, { name: 'supplier product number', always: false },
  { name: 'lot code', always: true }, { name: 'received on', always: false }, { name: 'opened on', always: false }, { name: 'best before', always: false },
  { name: 'batch code', always: true }, { name: 'made on', always: true }, { name: 'method', always: true }, { name: 'formula class', always: false },
  { name: 'hard fats percent', always: false }, { name: 'lauric oils percent', always: false }, { name: 'superfat percent', always: false }, { name: 'lye concentration percent', always: false },
  { name: 'oil temperature C', always: false }, { name: 'lye temperature C', always: false }, { name: 'temperature when fragrance added C', always: false },
  { name: 'fragrance percent of oils', always: false }, { name: 'fragrance percent of finished soap', always: false }, { name: 'share of this lot in the fragrance percent', always: false },
  { name: 'colourants used', always: false }, { name: 'additives', always: false }, { name: 'fault', always: true }, { name: 'fault found', always: true }, { name: 'severity 1 to 3', always: false },
  { name: 'first seen at', always: false }, { name: 'first seen on', always: false }, { name: 'bars affected', always: false }, { name: 'bars looked at', always: false },
  { name: 'photo references', always: false }, { name: 'remarks', always: false },
] as const;
export type ClaimColumn = (typeof CLAIM_COLUMNS)[number]['name'];

const LEAVABLE: readonly string[] = CLAIM_COLUMNS.filter(({ always }) => !always).map(({ name }) => name);

const claimFields = {
  supplierId: z.uuid({ error: 'Choose the supplier' }),
  title: text('Title', 120),
  lotIds: z.array(z.uuid()).min(1, 'Choose at least one lot').max(40, 'At most 40 lots'),
  faults: z.array(FaultSlug).min(1, 'Choose at least one fault').max(40, 'At most 40 faults'),
  from: optionalDay('From'),
  to: optionalDay('To'),
  /** Columns that stay at home. Good batches cannot be left out: a claim with the bad ones only does not stand. */
  leaveOut: z.array(z.string().refine((name) => LEAVABLE.includes(name), 'This column cannot be left out')).max(CLAIM_COLUMNS.length).default([]),
  remarks: optionalText('Remarks', 2000),
};

export const NewClaim = z.strictObject({ id, ...claimFields });
export type NewClaim = z.infer<typeof NewClaim>;
export const ChangeClaim = changeOf(claimFields);
export type ChangeClaim = z.infer<typeof ChangeClaim>;

export const ClaimView = z.object({
  ...recordFields,
  number: z.int(),
  state: z.enum(['draft']),
  supplierId: z.string(),
  supplierName: z.string(),
  title: z.string(),
  lotIds: z.array(z.string()),
  lots: z.array(z.object({ id: z.string(), code: z.string(), materialName: z.string() })),
  faults: z.array(FaultSlug),
  from: z.string().nullable(),
  to: z.string().nullable(),
  leaveOut: z.array(z.string()),
  remarks: z.string().nullable(),
});
export type ClaimView = z.infer<typeof ClaimView>;

/** A share of batches with its denominators and 95 % score interval. */
export const ComparisonRow = z.object({
  fault: FaultSlug,
  group: z.string(),
  batchesMade: z.int(),
  batchesChecked: z.int(),
  batchesWithFault: z.int(),
  rate: z.number().nullable(),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
});
export type ComparisonRow = z.infer<typeof ComparisonRow>;

/** What would go out, before anything does. */
export const ClaimPreview = z.object({
  head: z.array(z.string()),
  rows: z.array(z.array(z.union([z.string(), z.number(), z.null()]))),
  rowCount: z.int(),
  batches: z.int(),
  comparison: z.array(ComparisonRow),
});
export type ClaimPreview = z.infer<typeof ClaimPreview>;

const params = z.object({ claimId: z.uuid() });
/** `bom=yes` puts a byte-order mark before the first byte. */
const fileQuery = z.object({ bom: z.enum(['yes', 'no']).default('no') });

export const claimsApi = {
  list: endpoint({ method: 'get', path: '/api/claims', summary: 'Claims, newest first', right: 'workshop.read', reply: z.object({ items: z.array(ClaimView) }) }),
  read: endpoint({ method: 'get', path: '/api/claims/:claimId', summary: 'One claim', right: 'workshop.read', params, reply: ClaimView }),
  create: endpoint({ method: 'post', path: '/api/claims', summary: 'Draft a claim', right: 'claim.draft', body: NewClaim, reply: ClaimView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/claims/:claimId', summary: 'Change a draft', right: 'claim.draft', params, body: ChangeClaim, reply: ClaimView, versioned: true }),
  preview: endpoint({ method: 'get', path: '/api/claims/:claimId/preview', summary: 'What would go out', right: 'workshop.read', params, reply: ClaimPreview, heavy: true }),
  rows: endpoint({ method: 'get', path: '/api/claims/:claimId/rows.csv', summary: 'The supplier’s rows as CSV', right: 'claim.draft', params, query: fileQuery, streams: 'text/csv', heavy: true }),
  comparison: endpoint({ method: 'get', path: '/api/claims/:claimId/comparison.csv', summary: 'The comparison with other lots as CSV', right: 'claim.draft', params, query: fileQuery, streams: 'text/csv', heavy: true }),
};
