import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, id, optionalMeasure, optionalText, recordFields, text } from './http/fields.ts';
import { pageOf, pageQuery } from './http/page.ts';

const LineWish = z.strictObject({ id, materialId: z.uuid({ error: 'Choose the material' }), shareOfOilsFraction: z.number().min(0).max(2, 'Share of the oils must lie between 0 and 2') });

export const NewFormula = z.strictObject({
  id,
  name: text('Formula name', 120),
  note: optionalText('Note', 2000),
  /** First version's lines; may be empty while only the name is known. */
  superfatFraction: optionalMeasure('Superfat', -0.02, 0.3),
  lines: z.array(LineWish).max(40).default([]),
});
export type NewFormula = z.infer<typeof NewFormula>;
export const ChangeFormula = changeOf({ name: text('Formula name', 120), note: optionalText('Note', 2000), isWithdrawn: z.boolean() });
export type ChangeFormula = z.infer<typeof ChangeFormula>;

const outline = { ...recordFields, name: z.string(), note: z.string().nullable(), isWithdrawn: z.boolean(), batches: z.int() };

/** Without quantities: what an inspector or viewer sees. */
export const FormulaOutline = z.object({ ...outline, seesQuantities: z.literal(false), versions: z.array(z.object({ id: z.string(), number: z.int(), isFrozen: z.boolean() })) });
export const FormulaView = z.object({
  ...outline,
  seesQuantities: z.literal(true),
  versions: z.array(z.object({
    id: z.string(),
    number: z.int(),
    isFrozen: z.boolean(),
    superfatFraction: z.number().nullable(),
    lines: z.array(z.object({ materialId: z.string(), materialName: z.string(), shareOfOilsFraction: z.number() })),
  })),
});
export const AnyFormulaView = z.discriminatedUnion('seesQuantities', [FormulaView, FormulaOutline]);
export type AnyFormulaView = z.infer<typeof AnyFormulaView>;

const params = z.object({ formulaId: z.uuid() });

export const formulasApi = {
  list: endpoint({ method: 'get', path: '/api/formulas', summary: 'Formulas by name', right: 'workshop.read', query: z.object({ ...pageQuery }), reply: pageOf(AnyFormulaView) }),
  read: endpoint({ method: 'get', path: '/api/formulas/:formulaId', summary: 'One formula', right: 'workshop.read', params, reply: AnyFormulaView }),
  create: endpoint({ method: 'post', path: '/api/formulas', summary: 'Add a formula', right: 'formula.write', body: NewFormula, reply: FormulaView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/formulas/:formulaId', summary: 'Rename a formula or withdraw it', right: 'formula.write', params, body: ChangeFormula, reply: FormulaView, versioned: true }),
};
