import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { LotStanding } from '#shared/words/lot-words.ts';

export interface LotName { id: string; code: string; materialId: string; materialName: string; standing: LotStanding }

/** What the ids in the answers are called, as it is now: a renamed mould needs no new answer. */
export interface Names {
  timeZone: string;
  members: ReadonlyMap<string, string>;
  formulas: ReadonlyMap<string, string>;
  moulds: ReadonlyMap<string, string>;
  materials: ReadonlyMap<string, string>;
  lots: ReadonlyMap<string, LotName>;
}

type Row = { kind: string; id: string; name: string; material: string | null; material_name: string | null; standing: LotStanding | null };

export async function readNames(tx: WorkshopTransaction): Promise<Names> {
  const [zone, rows] = [
    await tx.row<{ time_zone: string }>('select time_zone from workshop where id = $1', [tx.workshopId]),
    await tx.rows<Row>(
      `select 'member' kind, id, name, null::uuid material, null material_name, null standing from member
       union all select 'formula', id, name, null, null, null from formula
       union all select 'mould', id, name, null, null, null from mould
       union all select 'material', id, name, null, null, null from material
       union all select 'lot', l.id, l.code, l.material_id, m.name, l.standing from lot l join material m on m.workshop_id = l.workshop_id and m.id = l.material_id`,
    ),
  ];
  const of = (kind: string) => new Map(rows.filter((row) => row.kind === kind).map(({ id, name }) => [id, name]));
  return {
    timeZone: zone?.time_zone ?? 'Etc/UTC',
    members: of('member'), formulas: of('formula'), moulds: of('mould'), materials: of('material'),
    lots: new Map(rows.flatMap((row) => (row.kind === 'lot' ? [[row.id, { id: row.id, code: row.name, materialId: row.material!, materialName: row.material_name!, standing: row.standing! }]] : []))),
  };
}
