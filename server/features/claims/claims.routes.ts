import { claimsApi } from '#shared/claims.ts';
import type { Api } from '#server/http/api.ts';
import { sendCsv } from '#server/http/csv.ts';
import { claimComparison } from './claim-comparison.read.ts';
import { claimCells, claimColumns, claimRows } from './claim-rows.read.ts';
import { findClaim, listClaims, previewClaim, readClaim, workshopToday } from './claims.read.ts';
import { changeClaim, draftClaim } from './claims.service.ts';

const COMPARISON_HEAD = ['fault', 'group', 'batches made', 'batches checked', 'batches with the fault', 'rate percent', 'rate lower 95', 'rate upper 95'];
const percent = (share: number | null) => (share === null ? null : Number((share * 100).toFixed(1)));

export function claimsRoutes(api: Api): void {
  api.serve(claimsApi.list, ({ tx }) => listClaims(tx));
  api.serve(claimsApi.read, ({ tx, params }) => readClaim(tx, params.claimId));
  api.create(claimsApi.create, ({ tx, body }) => draftClaim(tx, body));
  api.serve(claimsApi.change, ({ tx, params, body, version }) => changeClaim(tx, params.claimId, body, version));
  api.serve(claimsApi.preview, ({ tx, params }) => previewClaim(tx, params.claimId));
  api.stream(claimsApi.rows, async ({ tx, params, query, response }) => {
    const claim = await findClaim(tx, params.claimId);
    const [columns, today] = [claimColumns(claim), await workshopToday(tx)];
    async function* records() {
      for await (const row of claimRows(tx, claim)) yield claimCells(row, claim, columns, today);
    }
    await sendCsv(response, { fileName: `claim-${claim.number}-rows.csv`, head: columns, records: records(), hasByteOrderMark: query.bom === 'yes' });
  });
  api.stream(claimsApi.comparison, async ({ tx, params, query, response }) => {
    const claim = await findClaim(tx, params.claimId);
    const comparison = await claimComparison(tx, claim);
    async function* records() {
      for (const row of comparison) yield [row.fault, row.group, row.batchesMade, row.batchesChecked, row.batchesWithFault, percent(row.rate), percent(row.lower), percent(row.upper)];
    }
    await sendCsv(response, { fileName: `claim-${claim.number}-comparison.csv`, head: COMPARISON_HEAD, records: records(), hasByteOrderMark: query.bom === 'yes' });
  });
}
