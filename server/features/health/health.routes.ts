import { constants } from 'node:fs';
import { access } from 'node:fs/promises';
import { healthApi } from '#shared/health.ts';
import type { Api } from '#server/http/api.ts';
import { busy } from '#server/problem.ts';
import { MIGRATIONS } from '#server/db/migrations/index.ts';

/** `live` touches nothing; `ready` asks the database, the schema and the photo store, and says no while stopping. */
export function healthRoutes(api: Api, { uploadsDir, isStopping }: { uploadsDir: string; isStopping: () => boolean }): void {
  api.open(healthApi.live, () => Promise.resolve({ live: true as const }));
  api.open(healthApi.ready, async ({ lobby }) => {
    if (isStopping()) throw busy('Stopping');
    const applied = await lobby((tx) => tx.row<{ count: number; durable: boolean }>(
      `select (select count(*)::int from migration) count,
         current_setting('fsync') = 'on' and current_setting('full_page_writes') = 'on' and current_setting('synchronous_commit') <> 'off' durable`,
    ));
    if (applied?.count !== MIGRATIONS.length) throw busy('The schema is not up to date');
    if (!applied.durable) throw busy('The database may lose what it acknowledged: fsync, full_page_writes and synchronous_commit must be on');
    await access(uploadsDir, constants.W_OK).catch(() => {
      throw busy('The photo store cannot be written');
    });
    return { ready: true as const };
  });
}
