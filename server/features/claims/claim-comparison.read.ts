import { wilsonInterval } from '#analysis/intervals/wilson-interval.ts';
import type { ComparisonRow } from '#shared/claims.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { ClaimChoice } from './claim-rows.read.ts';

/**
 * This lot, other lots of the same fragrance, all other fragrances, each cold and hot: with the counts
 * that a supplier asks for first. Rebatch and planned batches are left out.
 */
const COMPARISON_SQL = `
  with scented as (
    select i.batch_id, bool_or(i.lot_id = any($1::uuid[])) is_this, bool_or(i.material_id in (select material_id from lot where id = any($1::uuid[]))) is_same
    from batch_ingredient i join material m on m.workshop_id = i.workshop_id and m.id = i.material_id and m.kind = 'fragrance' group by 1
  )
  select f.fault, case when s.is_this then 'this lot' when s.is_same then 'other lots of this fragrance' else 'all other fragrances' end
      || case when b.method in ('cold', 'cold-oven') then ', cold' else ', hot' end "group",
    count(*)::int "batchesMade", count(o.outcomes ->> f.fault)::int "batchesChecked", count(*) filter (where (o.outcomes ->> f.fault)::int > 0)::int "batchesWithFault"
  from scented s join batch b on b.id = s.batch_id and b.method <> 'rebatch' and b.state <> 'planned'
    and ($3::date is null or b.made_on >= $3) and ($4::date is null or b.made_on <= $4)
  left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
  cross join unnest($2::text[]) f (fault) group by 1, 2`;

const GROUPS = ['this lot', 'other lots of this fragrance', 'all other fragrances'].flatMap((who) => [`${who}, cold`, `${who}, hot`]);

/** The comparison of a claim: every group stands, also one in which nothing was made. */
export async function claimComparison(tx: WorkshopTransaction, claim: ClaimChoice): Promise<ComparisonRow[]> {
  const rows = await tx.rows<Omit<ComparisonRow, 'rate' | 'lower' | 'upper'>>(COMPARISON_SQL, [claim.lotIds, claim.faults, claim.from, claim.to]);
  return claim.faults.flatMap((fault) => GROUPS.map((group) => {
    const counts = rows.find((row) => row.fault === fault && row.group === group) ?? { batchesMade: 0, batchesChecked: 0, batchesWithFault: 0 };
    const interval = counts.batchesChecked > 0 ? wilsonInterval(counts.batchesWithFault, counts.batchesChecked) : null;
    return { fault, group, ...counts, rate: interval?.share ?? null, lower: interval?.lower ?? null, upper: interval?.upper ?? null };
  }));
}
