import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';

export const OutboxMail = z.object({ id: z.string(), recipient: z.string(), subject: z.string(), body: z.string(), createdAt: z.string() });
export type OutboxMail = z.infer<typeof OutboxMail>;

export const outboxApi = {
  list: endpoint({ method: 'get', path: '/api/outbox', summary: 'Mails kept on this machine, outside production', right: 'workshop.manage', reply: z.object({ items: z.array(OutboxMail) }) }),
};
