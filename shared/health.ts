import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';

export const healthApi = {
  live: endpoint({ method: 'get', path: '/api/health/live', summary: 'The process turns', right: 'public', reply: z.object({ live: z.literal(true) }) }),
  ready: endpoint({ method: 'get', path: '/api/health/ready', summary: 'Ready to serve', right: 'public', reply: z.object({ ready: z.literal(true) }) }),
};
