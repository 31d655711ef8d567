import { useQuery } from '@tanstack/react-query';
import { useFormContext, useWatch } from 'react-hook-form';
import { v7 as uuidv7 } from 'uuid';
import { BATCH_STATES, type BatchState } from '#shared/words/batch-words.ts';
import { mayPass } from '#shared/words/batch-life.ts';
import { METHODS } from '#shared/words/methods.ts';
import { Block } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { formulaPickerQuery } from '#src/features/formulas/formulas.queries.ts';
import { membersQuery } from '#src/features/members/members.queries.ts';
import { METHOD_WORDS, optionsOf, STATE_WORDS } from '#src/lib/words.ts';
import type { BatchDraft } from './batch-draft.ts';
import { mouldsQuery } from './batches.queries.ts';
import { FieldRow, Measure, Pick, useFieldSays } from './form-fields.tsx';

const emptyAsUndefined = (value: unknown) => (value === '' || value === null ? undefined : value);

/** When, how, by whom, of what, in what. `stateNow` is the state that is kept; a new batch has none. */
export function PlanFields({ stateNow }: { stateNow: BatchState | null }) {
  const { register, setValue } = useFormContext<BatchDraft>();
  const formulaId = useWatch<BatchDraft, 'formulaId'>({ name: 'formulaId' });
  const formulas = useQuery(formulaPickerQuery).data ?? [];
  const members = useQuery(membersQuery).data ?? [];
  const moulds = useQuery(mouldsQuery).data ?? [];
  const formula = formulas.find(({ id }) => id === formulaId);
  const states = BATCH_STATES.filter((state) => stateNow === null || mayPass(stateNow, state));
  const codeSays = useFieldSays('code');
  return (
    <div className="grid gap-4">
      <FieldRow>
        {stateNow === null && <TextField label="Batch code" hint="Left empty, it gets the next number" autoComplete="off" {...codeSays} {...register('code', { setValueAs: emptyAsUndefined })} />}
        <TextField label="Made on" type="date" {...useFieldSays('madeOn')} {...register('madeOn')} />
        <Pick name="method" label="Method" options={optionsOf(METHODS, METHOD_WORDS)} emptyLabel="choose …" />
        <Pick name="state" label="Where it stands" options={optionsOf(states, STATE_WORDS)} emptyLabel="choose …" hint={stateNow && stateNow !== 'closed' && stateNow !== 'abandoned' ? 'A batch goes forward only' : undefined} />
        <Pick name="makerId" label="Maker" options={members.filter((member) => !member.hasEnded || member.role !== 'viewer').map(({ id, name }) => ({ value: id, label: name }))} />
        <Pick name="formulaId" label="Formula" onPick={() => setValue('formulaVersionId', null)} options={formulas.filter((one) => !one.isWithdrawn || one.id === formulaId).map(({ id, name }) => ({ value: id, label: name }))} />
        {formula && formula.versions.length > 0 && <Pick name="formulaVersionId" label="Version" options={formula.versions.map(({ id, number }) => ({ value: id, label: `version ${number}` }))} />}
        <Pick name="mouldId" label="Mould" options={moulds.map(({ id, name }) => ({ value: id, label: name }))} />
        <Measure name="bars" label="Bars" decimals={0} />
        <Measure name="superfatFraction" label="Superfat, planned" quantity="percent" />
      </FieldRow>
      {formula?.seesQuantities && <FromFormula versions={formula.versions} />}
    </div>
  );
}

interface Version {
  id: string;
  superfatFraction: number | null;
  lines: { materialId: string; materialName: string; shareOfOilsFraction: number }[];
}

/** Puts the formula's fats and superfat into the form, with masses where the oils are known. */
function FromFormula({ versions }: { versions: readonly Version[] }) {
  const { getValues, setValue } = useFormContext<BatchDraft>();
  const versionId = useWatch<BatchDraft, 'formulaVersionId'>({ name: 'formulaVersionId' });
  const lines = useWatch<BatchDraft, 'ingredients'>({ name: 'ingredients' });
  const version = versions.find(({ id }) => id === versionId) ?? versions[0];
  const missing = version?.lines.filter((line) => !lines.some(({ materialId }) => materialId === line.materialId)) ?? [];
  if (!version || missing.length === 0) return null;
  const putIn = () => {
    const oilMassG = getValues('oilMassG');
    const added = missing.map(({ materialId, shareOfOilsFraction }) => ({ id: uuidv7(), materialId, lotId: null, shareOfOilsFraction, massG: oilMassG === null ? null : oilMassG * shareOfOilsFraction }));
    setValue('ingredients', [...added, ...lines], { shouldDirty: true });
    if (getValues('superfatFraction') === null && version.superfatFraction !== null) setValue('superfatFraction', version.superfatFraction);
    if (versionId === null) setValue('formulaVersionId', version.id);
  };
  return <Block className="justify-self-start" onClick={putIn}>Put in its {missing.map(({ materialName }) => materialName.toLowerCase()).join(', ')}</Block>;
}
