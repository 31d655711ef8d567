import { useQuery } from '@tanstack/react-query';
import { Trash2 } from 'lucide-react';
import { use } from 'react';
import { useController, useFieldArray, useFormContext } from 'react-hook-form';
import { v7 as uuidv7 } from 'uuid';
import type { LotView } from '#shared/lots.ts';
import type { MaterialView } from '#shared/materials.ts';
import { MATERIAL_KINDS, type MaterialKind } from '#shared/words/lot-words.ts';
import { Block } from '#src/components/Block.tsx';
import { Soft } from '#src/components/Caution.tsx';
import { CONTROL, FieldFrame } from '#src/components/Field.tsx';
import { STANDING_WORDS } from '#src/components/LotTag.tsx';
import { lotPickerQuery } from '#src/features/lots/lots.queries.ts';
import { materialPickerQuery } from '#src/features/materials/materials.queries.ts';
import type { BatchDraft } from './batch-draft.ts';
import { FormSurroundingsContext, Measure, useFieldSays } from './form-fields.tsx';

const KIND_WORDS: Record<MaterialKind, string> = { fat: 'Fats and oils', alkali: 'Alkali', liquid: 'Liquids', fragrance: 'Fragrances', colourant: 'Colourants', additive: 'Additives', packaging: 'Packaging' };

/** What goes in, line by line; a lot says which delivery it was. */
export function IngredientFields() {
  const { control } = useFormContext<BatchDraft>();
  const { fields, append, remove } = useFieldArray({ control, name: 'ingredients', keyName: 'key' });
  const materials = useQuery(materialPickerQuery).data ?? [];
  const lots = useQuery(lotPickerQuery).data ?? [];
  const { warningAt } = use(FormSurroundingsContext);
  const overall = warningAt('#/ingredients');
  return (
    <div className="grid gap-3">
      {fields.length === 0 && <p className="text-ink-2">Nothing yet. Fragrances with their lots matter most for finding causes; fats, lye and water make the check against certificates possible.</p>}
      <ul className="grid gap-3">
        {fields.map((field, index) => <IngredientLine key={field.key} index={index} materials={materials} lots={lots} onRemove={() => remove(index)} />)}
      </ul>
      {overall && <Soft>{overall}</Soft>}
      <Block className="justify-self-start max-rack:w-full" onClick={() => append({ id: uuidv7(), materialId: '', lotId: null, massG: null, shareOfOilsFraction: null })}>Add a line</Block>
    </div>
  );
}

function IngredientLine({ index, materials, lots, onRemove }: { index: number; materials: readonly MaterialView[]; lots: readonly LotView[]; onRemove: () => void }) {
  const { setValue } = useFormContext<BatchDraft>();
  const { field: materialField } = useController<BatchDraft, `ingredients.${number}.materialId`>({ name: `ingredients.${index}.materialId` });
  const { field: lotField } = useController<BatchDraft, `ingredients.${number}.lotId`>({ name: `ingredients.${index}.lotId` });
  const materialId = materialField.value;
  const material = materials.find(({ id }) => id === materialId);
  const ofMaterial = lots.filter((lot) => lot.materialId === materialId);
  const materialSays = useFieldSays(`ingredients.${index}.materialId`);
  const lotSays = useFieldSays(`ingredients.${index}.lotId`);
  const named = material?.name ?? `line ${index + 1}`;
  return (
    <li className="grid grid-cols-[minmax(0,1.4fr)_minmax(0,1.4fr)_minmax(0,1fr)_minmax(0,1fr)_auto] items-start gap-x-4 gap-y-3 border-t border-line pt-3 first:border-t-0 max-rack:grid-cols-1">
      <FieldFrame label="Material" {...materialSays}>
        {(ids) => (
          <select {...ids} className={CONTROL} {...materialField} onChange={(event) => { materialField.onChange(event); setValue(`ingredients.${index}.lotId`, null); }}>
            <option value="">choose …</option>
            {MATERIAL_KINDS.filter((kind) => kind !== 'packaging').map((kind) => (
              <optgroup key={kind} label={KIND_WORDS[kind]}>
                {materials.filter((one) => one.kind === kind && (!one.isWithdrawn || one.id === materialId)).map((one) => <option key={one.id} value={one.id}>{one.name}</option>)}
              </optgroup>
            ))}
          </select>
        )}
      </FieldFrame>
      <FieldFrame label="Lot" {...lotSays}>
        {(ids) => (
          <select {...ids} className={CONTROL} {...lotField} value={lotField.value ?? ''} onChange={(event) => lotField.onChange(event.target.value || null)}>
            <option value="">{materialId ? 'lot not known' : 'choose the material first'}</option>
            {ofMaterial.map((lot) => <option key={lot.id} value={lot.id}>{lot.standing === 'in-use' ? lot.code : `${lot.code}: ${STANDING_WORDS[lot.standing]}`}</option>)}
          </select>
        )}
      </FieldFrame>
      <Measure name={`ingredients.${index}.shareOfOilsFraction`} label={material?.kind === 'fragrance' ? 'Load, of the oils' : 'Of the oils'} quantity="percent" />
      <Measure name={`ingredients.${index}.massG`} label="Weighed" quantity="mass" />
      <button type="button" aria-label={`Take ${named} out`} title="Take out" className="mt-6 flex min-h-11 min-w-11 items-center justify-center rounded-bar border border-line-firm max-rack:mt-0 max-rack:min-h-12 max-rack:w-full" onClick={onRemove}>
        <Trash2 size={18} aria-hidden="true" /><span aria-hidden="true" className="ml-2 rack:hidden">Take out</span>
      </button>
    </li>
  );
}
