import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { invalidField } from '#server/problem.ts';

/** Above this the number is a slip or the soap cannot hold it (share of the oils). */
const MOST = 0.12;

interface Line {
  materialId: string;
  massG: number | null;
  shareOfOilsFraction: number | null;
}

/**
 * Fragrance of a batch as a share of its oils, summed over its fragrance lines; a line without a share is
 * reckoned from its mass. Null when there is none, or when a line says neither.
 *
 * @param oilMassG grams of all fats; null where not known
 * @throws Problem 422 at the line that takes the sum above 12 %
 */
export async function fragranceFractionOf(tx: WorkshopTransaction, oilMassG: number | null, lines: readonly Line[]): Promise<number | null> {
  const rows = await tx.rows<{ id: string }>(`select id from material where kind = 'fragrance' and id = any($1::uuid[])`, [lines.map((line) => line.materialId)]);
  const fragrances = new Set(rows.map(({ id }) => id));
  let sum = 0;
  let isKnown = fragrances.size > 0;
  for (const [index, line] of lines.entries()) {
    if (!fragrances.has(line.materialId)) continue;
    const load = line.shareOfOilsFraction ?? (line.massG !== null && oilMassG !== null ? line.massG / oilMassG : null);
    if (load === null) {
      isKnown = false;
      continue;
    }
    sum += load;
    // Sums of decimals: 0.06 + 0.06 must not fall over the last bit.
    if (sum > MOST + 1e-12) {
      const field = line.shareOfOilsFraction === null ? 'massG' : 'shareOfOilsFraction';
      throw invalidField(`#/ingredients/${index}/${field}`, `Fragrances together must be at most 12 % of the oils; with this one they are ${(sum * 100).toFixed(1)} %`);
    }
  }
  return isKnown ? Math.min(sum, MOST) : null;
}
