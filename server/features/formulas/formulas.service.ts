import { v7 as uuidv7 } from 'uuid';
import type { z } from 'zod';
import type { ChangeFormula, FormulaView, NewFormula } from '#shared/formulas.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { invalid } from '#server/problem.ts';
import { Formula, FormulaLine, FormulaVersion } from './formula.entity.ts';
import { readFormula } from './formulas.read.ts';

type Formulas = z.input<typeof FormulaView>;

/** Writers may read quantities, so they always get the full view. */
async function fullView(tx: WorkshopTransaction, formulaId: string): Promise<Formulas> {
  return (await readFormula(tx, formulaId)) as Formulas;
}

/** Adds a formula with its first version. @throws Problem 409 for a name or id in use, 422 for an unknown material */
export async function addFormula(tx: WorkshopTransaction, wish: NewFormula): Promise<{ view: Formulas; again: boolean }> {
  await refuseUnknownMaterials(tx, wish);
  const again = await insertOnce(tx, Formula, 'formula', { id: wish.id, name: wish.name, note: wish.note, version: 1, updatedAt: tx.now }, wish);
  if (!again) {
    const formulaVersionId = uuidv7();
    await tx.manager.insert(FormulaVersion, { workshopId: tx.workshopId, id: formulaVersionId, formulaId: wish.id, number: 1, superfatFraction: wish.superfatFraction, frozenAt: null });
    if (wish.lines.length > 0) {
      await tx.manager.insert(FormulaLine, wish.lines.map((line, position) => ({ ...line, workshopId: tx.workshopId, formulaVersionId, position })));
    }
  }
  return { view: await fullView(tx, wish.id), again };
}

/** Renames a formula or withdraws it; what batches used stays as it was. @throws Problem 404, 412 */
export async function changeFormula(tx: WorkshopTransaction, formulaId: string, { isWithdrawn, ...fields }: ChangeFormula, version: number): Promise<Formulas> {
  const formula = await lockForChange(tx, Formula, 'formula', formulaId, version, () => fullView(tx, formulaId));
  Object.assign(formula, fields);
  if (isWithdrawn !== undefined) formula.withdrawnAt = isWithdrawn ? (formula.withdrawnAt ?? tx.now) : null;
  await saveChange(tx, Formula, formula);
  return fullView(tx, formulaId);
}

async function refuseUnknownMaterials(tx: WorkshopTransaction, { lines }: NewFormula): Promise<void> {
  const known = await tx.rows<{ id: string }>('select id from material where id = any($1::uuid[])', [lines.map((line) => line.materialId)]);
  const ids = new Set(known.map(({ id }) => id));
  const errors = lines.flatMap((line, index) => (ids.has(line.materialId) ? [] : [{ pointer: `#/lines/${index}/materialId`, detail: 'There is no such material in this workshop' }]));
  if (errors.length > 0) throw invalid(errors);
}
