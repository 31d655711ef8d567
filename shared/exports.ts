import { BatchesChoice } from './batches.ts';
import { endpoint } from './http/endpoint.ts';

export const exportsApi = {
  batches: endpoint({ method: 'get', path: '/api/exports/batches.csv', summary: 'The batch history of a filter as CSV', right: 'workshop.read', query: BatchesChoice, streams: 'text/csv', heavy: true }),
};
