import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, count, recordFields, text } from './http/fields.ts';

function isTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}

export const TimeZone = z.string().max(60).refine(isTimeZone, 'Time zone must be one such as Europe/London');

export const ChangeWorkshop = changeOf({
  name: text('Workshop name', 120),
  timeZone: TimeZone,
  currency: z.string().regex(/^[A-Z]{3}$/, 'Currency must be three letters such as EUR'),
  batchPrefix: z.string().trim().regex(/^[A-Z\d]{1,6}$/i, 'Prefix must be one to six letters or digits'),
  firstPriceMinor: count('Price of a first', 0, 10_000_000).nullable(),
  secondPriceMinor: count('Price of a second', 0, 10_000_000).nullable(),
});
export type ChangeWorkshop = z.infer<typeof ChangeWorkshop>;

export const WorkshopView = z.object({
  ...recordFields,
  name: z.string(),
  timeZone: z.string(),
  currency: z.string(),
  batchPrefix: z.string(),
  firstPriceMinor: z.int().nullable(),
  secondPriceMinor: z.int().nullable(),
});
export type WorkshopView = z.infer<typeof WorkshopView>;

export const workshopApi = {
  read: endpoint({ method: 'get', path: '/api/workshop', summary: 'This workshop', right: 'workshop.read', reply: WorkshopView }),
  change: endpoint({ method: 'patch', path: '/api/workshop', summary: 'Change the settings', right: 'workshop.manage', body: ChangeWorkshop, reply: WorkshopView, versioned: true }),
};
