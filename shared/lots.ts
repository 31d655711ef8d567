import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, count, id, optionalDay, optionalMeasure, optionalText, recordFields, text } from './http/fields.ts';
import { pageOf, pageQuery } from './http/page.ts';
import { LotStanding, MaterialKind } from './words/lot-words.ts';

const lotFields = {
  supplierId: z.uuid().nullable().default(null),
  /** Exactly as printed on the container. */
  code: text('Lot code', 60),
  supplierProductName: optionalText('Supplier’s product name', 120),
  supplierProductNumber: optionalText('Supplier’s product number', 60),
  orderedOn: optionalDay('Ordered on'),
  receivedOn: optionalDay('Received on'),
  openedOn: optionalDay('Opened on'),
  finishedOn: optionalDay('Finished on'),
  bestBeforeOn: optionalDay('Best before'),
  quantityG: optionalMeasure('Quantity', 0, 1_000_000, 'g'),
  quantityLeftG: optionalMeasure('Quantity left', 0, 1_000_000, 'g'),
  priceMinorPerKg: count('Price per kg', 0, 100_000_000).nullable().default(null),
  /** Alkali only: share of pure alkali. */
  purityFraction: optionalMeasure('Purity', 0.7, 1),
  /** The certificate's maximum for rinse-off products (category 9), share of the finished bar. Missing is "not known", never "no limit". */
  certificateMaxFraction: optionalMeasure('Certificate maximum', 0, 1),
  certificateEdition: optionalText('Certificate edition', 60),
  certificateOn: optionalDay('Certificate date'),
  flashPointC: optionalMeasure('Flash point', -50, 400, '°C'),
  vanillinFraction: optionalMeasure('Vanillin', 0, 1),
  intendedUseNote: optionalText('Supplier’s note on use', 2000),
  storage: optionalText('Storage', 200),
  note: optionalText('Note', 2000),
};

export const NewLot = z.strictObject({ id, materialId: z.uuid({ error: 'Choose the material' }), ...lotFields });
export type NewLot = z.infer<typeof NewLot>;
/** The standing is changed by its own deed, with a reason. */
export const ChangeLot = changeOf(lotFields);
export type ChangeLot = z.infer<typeof ChangeLot>;

export const SetLotStanding = z.strictObject({ standing: LotStanding, reason: text('Reason', 500) });
export type SetLotStanding = z.infer<typeof SetLotStanding>;

export const LotView = z.object({
  ...recordFields,
  materialId: z.string(),
  materialName: z.string(),
  materialKind: MaterialKind,
  supplierId: z.string().nullable(),
  supplierName: z.string().nullable(),
  code: z.string(),
  supplierProductName: z.string().nullable(),
  supplierProductNumber: z.string().nullable(),
  orderedOn: z.string().nullable(),
  receivedOn: z.string().nullable(),
  openedOn: z.string().nullable(),
  finishedOn: z.string().nullable(),
  bestBeforeOn: z.string().nullable(),
  quantityG: z.number().nullable(),
  quantityLeftG: z.number().nullable(),
  priceMinorPerKg: z.int().nullable(),
  purityFraction: z.number().nullable(),
  certificateMaxFraction: z.number().nullable(),
  certificateEdition: z.string().nullable(),
  certificateOn: z.string().nullable(),
  flashPointC: z.number().nullable(),
  vanillinFraction: z.number().nullable(),
  intendedUseNote: z.string().nullable(),
  storage: z.string().nullable(),
  note: z.string().nullable(),
  standing: LotStanding,
  /** Batches that hold the lot. */
  batches: z.int(),
});
export type LotView = z.infer<typeof LotView>;

export const LotStandingChange = z.object({ id: z.string(), before: LotStanding, after: LotStanding, reason: z.string(), memberName: z.string().nullable(), changedAt: z.string() });
export type LotStandingChange = z.infer<typeof LotStandingChange>;

const params = z.object({ lotId: z.uuid() });

export const LotsFilter = z.object({
  ...pageQuery,
  kind: MaterialKind.optional(),
  standing: LotStanding.optional(),
  supplierId: z.uuid().optional(),
  materialId: z.uuid().optional(),
  /** Part of a code or a material's name. */
  find: z.string().max(80).optional(),
});

export const lotsApi = {
  list: endpoint({ method: 'get', path: '/api/lots', summary: 'Lots, newest first', right: 'workshop.read', query: LotsFilter, reply: pageOf(LotView) }),
  read: endpoint({ method: 'get', path: '/api/lots/:lotId', summary: 'One lot', right: 'workshop.read', params, reply: LotView }),
  create: endpoint({ method: 'post', path: '/api/lots', summary: 'Add a lot', right: 'lot.write', body: NewLot, reply: LotView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/lots/:lotId', summary: 'Change a lot', right: 'lot.write', params, body: ChangeLot, reply: LotView, versioned: true }),
  setStanding: endpoint({ method: 'put', path: '/api/lots/:lotId/standing', summary: 'Put a lot into another standing', right: 'lot.hold', params, body: SetLotStanding, reply: LotView, versioned: true }),
  standingChanges: endpoint({ method: 'get', path: '/api/lots/:lotId/standing-changes', summary: 'Who changed the standing, when and why', right: 'workshop.read', params, reply: z.object({ items: z.array(LotStandingChange) }) }),
};
