import type { ChangeBatch } from '#shared/batches.ts';
import type { FieldProblem } from '#shared/http/problem.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { invalid, invalidField } from '#server/problem.ts';

type Referring = Pick<ChangeBatch, 'formulaId' | 'formulaVersionId' | 'makerId' | 'mouldId' | 'ingredients'>;

/** Refuses whatever a batch names that this workshop does not have, all at once. @throws Problem 422 */
export async function refuseUnknownReferences(tx: WorkshopTransaction, wish: Referring): Promise<void> {
  const errors: FieldProblem[] = [];
  const unknown = (pointer: string, what: string) => errors.push({ pointer, detail: `There is no such ${what} in this workshop` });
  if (wish.formulaId && !(await tx.row('select 1 from formula where id = $1', [wish.formulaId]))) unknown('#/formulaId', 'formula');
  if (wish.makerId && !(await tx.row('select 1 from member where id = $1 and workshop_id = $2', [wish.makerId, tx.workshopId]))) unknown('#/makerId', 'person');
  if (wish.mouldId && !(await tx.row('select 1 from mould where id = $1', [wish.mouldId]))) unknown('#/mouldId', 'mould');
  if (wish.formulaVersionId) {
    const version = await tx.row<{ formulaId: string }>('select formula_id "formulaId" from formula_version where id = $1', [wish.formulaVersionId]);
    if (!version) unknown('#/formulaVersionId', 'formula version');
    else if (version.formulaId !== wish.formulaId) errors.push({ pointer: '#/formulaVersionId', detail: 'This version belongs to another formula' });
  }
  errors.push(...(await problemsOfIngredients(tx, wish.ingredients ?? [])));
  if (errors.length > 0) throw invalid(errors);
}

async function problemsOfIngredients(tx: WorkshopTransaction, lines: NonNullable<Referring['ingredients']>): Promise<FieldProblem[]> {
  if (lines.length === 0) return [];
  const materials = await tx.rows<{ id: string }>('select id from material where id = any($1::uuid[])', [lines.map((line) => line.materialId)]);
  const lots = await tx.rows<{ id: string; materialId: string }>('select id, material_id "materialId" from lot where id = any($1::uuid[])', [lines.flatMap((line) => line.lotId ?? [])]);
  const known = new Set(materials.map(({ id }) => id));
  const materialOfLot = new Map(lots.map((lot) => [lot.id, lot.materialId]));
  const seen = new Set<string>();
  return lines.flatMap((line, index) => {
    const problems: FieldProblem[] = [];
    if (seen.has(line.id)) problems.push({ pointer: `#/ingredients/${index}/id`, detail: 'Each ingredient needs an id of its own' });
    seen.add(line.id);
    if (!known.has(line.materialId)) problems.push({ pointer: `#/ingredients/${index}/materialId`, detail: 'There is no such material in this workshop' });
    if (line.lotId && !materialOfLot.has(line.lotId)) problems.push({ pointer: `#/ingredients/${index}/lotId`, detail: 'There is no such lot in this workshop' });
    else if (line.lotId && materialOfLot.get(line.lotId) !== line.materialId) problems.push({ pointer: `#/ingredients/${index}/lotId`, detail: 'This lot is of another material' });
    return problems;
  });
}

/** A batch is made before it leaves the mould and is cut. @throws Problem 422 */
export function refuseWrongOrder({ madeOn, unmouldedOn, cutOn }: { madeOn: string; unmouldedOn: string | null; cutOn: string | null }): void {
  if (unmouldedOn && unmouldedOn < madeOn) throw invalidField('#/unmouldedOn', `Unmoulded on must not lie before the day it was made (${madeOn})`);
  if (cutOn && cutOn < (unmouldedOn ?? madeOn)) throw invalidField('#/cutOn', `Cut on must not lie before ${unmouldedOn ? 'the day it was unmoulded' : 'the day it was made'} (${unmouldedOn ?? madeOn})`);
}

/** From its first batch on a formula version never changes again. */
export async function freezeFormulaVersion(tx: WorkshopTransaction, formulaVersionId: string | null | undefined): Promise<void> {
  if (!formulaVersionId) return;
  await tx.rows('update formula_version set frozen_at = $2 where id = $1 and frozen_at is null', [formulaVersionId, tx.now]);
}
