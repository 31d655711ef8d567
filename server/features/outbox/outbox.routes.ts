import { outboxApi } from '#shared/outbox.ts';
import type { Config } from '#server/config.ts';
import type { Api } from '#server/http/api.ts';
import { notFound } from '#server/problem.ts';
import { listMails } from './outbox.read.ts';

/** A page for development: in production mails leave, and nobody reads them here. */
export function outboxRoutes(api: Api, config: Config): void {
  api.serve(outboxApi.list, ({ tx }) => {
    if (config.mode === 'production') throw notFound('outbox');
    return listMails(tx);
  });
}
