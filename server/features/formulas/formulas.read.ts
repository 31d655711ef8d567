import type { AnyFormulaView } from '#shared/formulas.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';

interface VersionRow {
  id: string;
  number: number;
  isFrozen: boolean;
  superfatFraction: number | null;
  lines: { materialId: string; materialName: string; shareOfOilsFraction: number }[];
}

interface FormulaRow {
  id: string;
  version: number;
  createdAt: Date;
  updatedAt: Date;
  name: string;
  note: string | null;
  isWithdrawn: boolean;
  batches: number;
  versions: VersionRow[];
}

const FORMULA_SQL = `
  select f.id, f.version, f.created_at "createdAt", f.updated_at "updatedAt", f.name, f.note, f.withdrawn_at is not null "isWithdrawn",
    (select count(*)::int from batch b where b.workshop_id = f.workshop_id and b.formula_id = f.id) batches,
    coalesce((
      select jsonb_agg(jsonb_build_object('id', v.id, 'number', v.number, 'isFrozen', v.frozen_at is not null, 'superfatFraction', v.superfat_fraction, 'lines', coalesce((
        select jsonb_agg(jsonb_build_object('materialId', l.material_id, 'materialName', m.name, 'shareOfOilsFraction', l.share_of_oils_fraction) order by l.position)
        from formula_line l join material m on m.workshop_id = l.workshop_id and m.id = l.material_id
        where l.workshop_id = v.workshop_id and l.formula_version_id = v.id), '[]')) order by v.number desc)
      from formula_version v where v.workshop_id = f.workshop_id and v.formula_id = f.id), '[]') versions
  from formula f`;

/** With quantities for those who may read them, the outline for the others. */
function formulaView(tx: WorkshopTransaction, row: FormulaRow): AnyFormulaView {
  const outline = { ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString() };
  if (tx.may('formula.read')) return { ...outline, seesQuantities: true };
  return { ...outline, seesQuantities: false, versions: row.versions.map(({ id, number, isFrozen }) => ({ id, number, isFrozen })) };
}

/** One formula, as far as the member may see it. @throws Problem 404 */
export async function readFormula(tx: WorkshopTransaction, formulaId: string): Promise<AnyFormulaView> {
  const statement = `${FORMULA_SQL} where f.id = $1`;
  const row = await tx.row<FormulaRow>(statement, [formulaId]);
  if (!row) throw notFound('formula');
  return formulaView(tx, row);
}

/** A page of formulas by name. */
export async function listFormulas(tx: WorkshopTransaction, { cursor, limit }: { cursor?: string; limit: number }) {
  const [name, lastId] = cursor ? readCursor(cursor, ['text', 'uuid']) : [null, null];
  const statement = `${FORMULA_SQL} where $1::text is null or (f.name, f.id) > ($1, $2::uuid) order by f.name, f.id limit $3`;
  const rows = await tx.rows<FormulaRow>(statement, [name, lastId, limit + 1]);
  const page = pageFrom(rows, limit, (row) => [row.name, row.id]);
  return { items: page.items.map((row) => formulaView(tx, row)), next: page.next };
}
