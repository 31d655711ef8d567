import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { v7 as uuidv7 } from 'uuid';
import { NewLot } from '#shared/lots.ts';
import type { MaterialKind } from '#shared/words/lot-words.ts';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { materialPickerQuery } from '#src/features/materials/materials.queries.ts';
import { supplierPickerQuery } from '#src/features/suppliers/suppliers.queries.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { useAddLot } from './lots.queries.ts';

const FIELDS = Object.keys(NewLot.shape);
const TEXTS = [['code', 'Lot code, as printed'], ['supplierProductName', 'Supplier’s product name'], ['supplierProductNumber', 'Supplier’s product number'], ['certificateEdition', 'Certificate edition'], ['storage', 'Storage'], ['intendedUseNote', 'Supplier’s note on use'], ['note', 'Note']] as const;
const DAYS = [['orderedOn', 'Ordered on'], ['receivedOn', 'Received on'], ['openedOn', 'Opened on'], ['finishedOn', 'Finished on'], ['bestBeforeOn', 'Best before'], ['certificateOn', 'Certificate date']] as const;
/** Typed number to the number inside. */
const NUMBERS = [['quantityG', 'Quantity, g', 1], ['quantityLeftG', 'Left, g', 1], ['priceMinorPerKg', 'Price per kg', 100], ['purityFraction', 'Purity, %', 0.01], ['certificateMaxFraction', 'Rinse-off maximum, % of the bar', 0.01], ['flashPointC', 'Flash point, °C', 1], ['vanillinFraction', 'Vanillin, %', 0.01]] as const;

type Typed = Record<string, string>;

/** All that is printed on a container and its papers; what is not known stays empty. */
export function AddLotForm({ kind }: { kind: MaterialKind }) {
  const materials = (useQuery(materialPickerQuery).data ?? []).filter((material) => material.kind === kind);
  const suppliers = useQuery(supplierPickerQuery).data ?? [];
  const add = useAddLot();
  const { tell } = useToasts();
  const [id, setId] = useState(() => uuidv7());
  const [refused, setRefused] = useState<string>();
  const { register, handleSubmit, reset, setError, formState: { errors, isSubmitting } } = useForm<Typed>();
  const save = handleSubmit(async (typed) => {
    setRefused(undefined);
    const text = (name: string) => (typed[name]?.trim() ? typed[name].trim() : null);
    const number = (name: string, times: number) => (text(name) === null ? null : Number((Number((text(name) ?? '').replace(',', '.')) * times).toPrecision(10)));
    const wish = {
      id, materialId: typed['materialId'] ?? '', supplierId: text('supplierId'),
      ...Object.fromEntries([...TEXTS, ...DAYS].map(([name]) => [name, text(name)])), ...Object.fromEntries(NUMBERS.map(([name, , times]) => [name, number(name, times)])), code: typed['code'] ?? '',
    };
    const read = NewLot.safeParse(wish);
    if (!read.success) {
      for (const issue of read.error.issues) setError(String(issue.path[0]), { message: issue.message }, { shouldFocus: true });
      return;
    }
    try {
      const lot = await add.mutateAsync(read.data);
      tell(`Lot ${lot.code} is in the list`);
      setId(uuidv7());
      reset();
    } catch (error) {
      setRefused(placeProblems(error, setError, FIELDS));
    }
  });
  const field = (name: string) => ({ ...register(name), error: errors[name]?.message });
  return (
    <form noValidate onSubmit={(event) => void save(event)} className="mt-9 grid gap-4">
      <Rail heading="Add a lot" />
      {refused && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{refused}</p>}
      <div className="grid gap-4 rack:grid-cols-2 desk:grid-cols-4">
        <SelectField label="Material" emptyLabel="Choose the material" options={materials.map(({ id: value, name }) => ({ value, label: name }))} {...field('materialId')} />
        <SelectField label="Supplier" emptyLabel="None" options={suppliers.map(({ id: value, name }) => ({ value, label: name }))} {...field('supplierId')} />
        {TEXTS.map(([name, label]) => <TextField key={name} label={label} isOptional={name !== 'code'} {...field(name)} />)}
        {DAYS.map(([name, label]) => <TextField key={name} type="date" label={label} isOptional {...field(name)} />)}
        {NUMBERS.map(([name, label]) => <TextField key={name} inputMode="decimal" label={label} isOptional {...field(name)} />)}
      </div>
      <div><Block type="submit" kind="main" busy={isSubmitting && 'Adding …'}>Add the lot</Block></div>
    </form>
  );
}
