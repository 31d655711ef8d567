import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, id, optionalText, recordFields, text } from './http/fields.ts';
import { pageOf, pageQuery } from './http/page.ts';
import { MaterialKind } from './words/lot-words.ts';

export const Alkali = z.enum(['naoh', 'koh']);

const materialFields = {
  name: text('Name', 120),
  inciName: optionalText('INCI name', 200),
  /** mg KOH per g of fat. Below 50 or above 300 is a slip of units. */
  saponificationKohMgPerG: z
    .number({ error: 'Saponification value must be a number' })
    .min(50, 'Saponification value must lie between 50 and 300 mg KOH per g')
    .max(300, 'Saponification value must lie between 50 and 300 mg KOH per g')
    .nullable()
    .default(null),
  isHardFat: z.boolean().default(false),
  isLauric: z.boolean().default(false),
  isAnimal: z.boolean().default(false),
  isLinoleicRich: z.boolean().default(false),
  alkali: Alkali.nullable().default(null),
  isEssentialOil: z.boolean().default(false),
  isWhitePigment: z.boolean().default(false),
  note: optionalText('Note', 2000),
};

export const NewMaterial = z.strictObject({ id, kind: MaterialKind, ...materialFields });
export type NewMaterial = z.infer<typeof NewMaterial>;
export const ChangeMaterial = changeOf({ ...materialFields, isWithdrawn: z.boolean() });
export type ChangeMaterial = z.infer<typeof ChangeMaterial>;

export const MaterialView = z.object({
  ...recordFields,
  kind: MaterialKind,
  name: z.string(),
  inciName: z.string().nullable(),
  saponificationKohMgPerG: z.number().nullable(),
  isHardFat: z.boolean(),
  isLauric: z.boolean(),
  isAnimal: z.boolean(),
  isLinoleicRich: z.boolean(),
  alkali: Alkali.nullable(),
  isEssentialOil: z.boolean(),
  isWhitePigment: z.boolean(),
  note: z.string().nullable(),
  isWithdrawn: z.boolean(),
});
export type MaterialView = z.infer<typeof MaterialView>;

const params = z.object({ materialId: z.uuid() });

export const materialsApi = {
  list: endpoint({ method: 'get', path: '/api/materials', summary: 'Materials by name', right: 'workshop.read', query: z.object({ ...pageQuery, kind: MaterialKind.optional() }), reply: pageOf(MaterialView) }),
  read: endpoint({ method: 'get', path: '/api/materials/:materialId', summary: 'One material', right: 'workshop.read', params, reply: MaterialView }),
  create: endpoint({ method: 'post', path: '/api/materials', summary: 'Add a material', right: 'lot.write', body: NewMaterial, reply: MaterialView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/materials/:materialId', summary: 'Change a material', right: 'lot.write', params, body: ChangeMaterial, reply: MaterialView, versioned: true }),
};
