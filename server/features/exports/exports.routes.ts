import { historyCells, historyHead } from '#shared/batch-history.ts';
import { exportsApi } from '#shared/exports.ts';
import { batchHistoryPages } from '#server/features/batches/history.read.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';
import type { Api } from '#server/http/api.ts';
import { sendCsv } from '#server/http/csv.ts';

const FAULTS = faultCatalogue.map((fault) => fault.slug);

export function exportsRoutes(api: Api): void {
  api.stream(exportsApi.batches, async ({ tx, query, response }) => {
    async function* records() {
      for await (const page of batchHistoryPages(tx, query)) for (const row of page) yield historyCells(row, FAULTS);
    }
    await sendCsv(response, { fileName: 'batches.csv', head: historyHead(FAULTS), records: records() });
  });
}
