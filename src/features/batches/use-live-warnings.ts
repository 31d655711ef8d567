import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo } from 'react';
import { useWatch, type Control } from 'react-hook-form';
import { batchWarnings } from '#shared/batch-warnings.ts';
import { METHODS } from '#shared/words/methods.ts';
import { lotPickerQuery } from '#src/features/lots/lots.queries.ts';
import { materialPickerQuery } from '#src/features/materials/materials.queries.ts';
import { showQuantity, type UnitChoice } from '#src/lib/units.ts';
import type { BatchDraft } from './batch-draft.ts';

/** What is typed and makes no number is not known yet. */
function withoutNonsense<Value>(value: Value): Value {
  if (typeof value === 'number' && Number.isNaN(value)) return null as Value;
  if (Array.isArray(value)) return value.map(withoutNonsense) as Value;
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, withoutNonsense(inner)])) as Value;
}

/** Soft warnings of what stands in the form just now, by pointer; several at one field are joined. */
export function useLiveWarnings(control: Control<BatchDraft>, units: UnitChoice): { warningAt: (pointer: string) => string | undefined; count: number } {
  const draft = useWatch({ control }) as BatchDraft;
  const materials = useQuery(materialPickerQuery).data;
  const lots = useQuery(lotPickerQuery).data;
  const byPointer = useMemo(() => {
    if (!METHODS.includes(draft.method)) return new Map<string, string>();
    const batch = withoutNonsense(draft);
    const ingredients = batch.ingredients.flatMap((line) => {
      const material = materials?.find(({ id }) => id === line.materialId);
      return [{ ...line, kind: material?.kind ?? ('additive' as const), isEssentialOil: material?.isEssentialOil ?? false }];
    });
    const said = batchWarnings({ ...batch, ingredients }, lots ?? [], {
      temperature: (celsius) => showQuantity(celsius, 'temperature', units, 0),
      mass: (grams) => showQuantity(grams, 'mass', units, grams < 20 || units.massUnit === 'ounce' ? 2 : 1),
    });
    const joined = new Map<string, string>();
    for (const { pointer, detail } of said) joined.set(pointer, joined.has(pointer) ? `${joined.get(pointer)}. ${detail}` : detail);
    return joined;
  }, [draft, materials, lots, units]);
  return { warningAt: useCallback((pointer: string) => byPointer.get(pointer), [byPointer]), count: byPointer.size };
}
