import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, id, optionalText, recordFields, text } from './http/fields.ts';
import { pageOf, pageQuery } from './http/page.ts';
import { Email } from './session.ts';

const supplierFields = {
  name: text('Supplier name', 120),
  contactName: optionalText('Contact', 120),
  email: Email.nullable().default(null),
  phone: optionalText('Phone', 40),
  note: optionalText('Note', 2000),
};

export const NewSupplier = z.strictObject({ id, ...supplierFields });
export type NewSupplier = z.infer<typeof NewSupplier>;
export const ChangeSupplier = changeOf({ ...supplierFields, isWithdrawn: z.boolean() });
export type ChangeSupplier = z.infer<typeof ChangeSupplier>;

export const SupplierView = z.object({
  ...recordFields,
  name: z.string(),
  contactName: z.string().nullable(),
  email: z.string().nullable(),
  phone: z.string().nullable(),
  note: z.string().nullable(),
  isWithdrawn: z.boolean(),
});
export type SupplierView = z.infer<typeof SupplierView>;

const params = z.object({ supplierId: z.uuid() });

export const suppliersApi = {
  list: endpoint({ method: 'get', path: '/api/suppliers', summary: 'Suppliers by name', right: 'workshop.read', query: z.object({ ...pageQuery }), reply: pageOf(SupplierView) }),
  read: endpoint({ method: 'get', path: '/api/suppliers/:supplierId', summary: 'One supplier', right: 'workshop.read', params, reply: SupplierView }),
  create: endpoint({ method: 'post', path: '/api/suppliers', summary: 'Add a supplier', right: 'lot.write', body: NewSupplier, reply: SupplierView, creates: true }),
  change: endpoint({ method: 'patch', path: '/api/suppliers/:supplierId', summary: 'Change a supplier', right: 'lot.write', params, body: ChangeSupplier, reply: SupplierView, versioned: true }),
};
