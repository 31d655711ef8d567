import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { v7 as uuidv7 } from 'uuid';
import type { z } from 'zod';
import { CLAIM_COLUMNS, NewClaim, type ClaimView } from '#shared/claims.ts';
import { Block } from '#src/components/Block.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { LotTag } from '#src/components/LotTag.tsx';
import { SelectField, TextArea, TextField } from '#src/components/TextField.tsx';
import { TickList } from '#src/components/TickList.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { lotPickerQuery } from '#src/features/lots/lots.queries.ts';
import { supplierPickerQuery } from '#src/features/suppliers/suppliers.queries.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { useKeepClaim } from './claims.queries.ts';

type Values = z.input<typeof NewClaim>;

const FIELDS = ['supplierId', 'title', 'lotIds', 'faults', 'from', 'to', 'leaveOut', 'remarks'];
const LEAVABLE = CLAIM_COLUMNS.filter(({ always }) => !always).map(({ name }) => ({ value: name, label: name }));

/** What goes out and what stays at home. Good batches are always in. */
export function ClaimForm({ claim, onKept }: { claim?: ClaimView; onKept: (claim: ClaimView) => void }) {
  const suppliers = useQuery(supplierPickerQuery);
  const lots = useQuery(lotPickerQuery);
  const faults = useQuery(faultsQuery);
  const keep = useKeepClaim(claim);
  const defaults = useMemo<Values>(() => ({
    id: claim?.id ?? uuidv7(), supplierId: claim?.supplierId ?? '', title: claim?.title ?? '', lotIds: claim?.lotIds ?? [], faults: claim?.faults ?? [],
    from: claim?.from ?? null, to: claim?.to ?? null, leaveOut: claim?.leaveOut ?? [], remarks: claim?.remarks ?? null,
  }), [claim]);
  const { register, control, handleSubmit, setError, formState: { errors, isDirty } } = useForm<Values, unknown, NewClaim>({ resolver: zodResolver(NewClaim), defaultValues: defaults });
  const supplierId = useWatch({ control, name: 'supplierId' });
  const theirs = (lots.data ?? []).filter((lot) => lot.supplierId === supplierId);
  const submit = handleSubmit(async (wish) => {
    try {
      onKept(await keep.mutateAsync(wish));
    } catch (error) {
      const left = placeProblems(error, setError, FIELDS);
      if (left) setError('root', { message: left });
    }
  });
  return (
    <form noValidate className="grid grid-cols-1 content-start gap-4" onSubmit={(event) => void submit(event)}>
      {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
      <SelectField label="Supplier" emptyLabel="Choose the supplier" options={(suppliers.data ?? []).map(({ id, name }) => ({ value: id, label: name }))} error={errors.supplierId?.message} {...register('supplierId')} />
      <TextField label="Title" placeholder="What it is about, in a few words" error={errors.title?.message} {...register('title')} />
      <Controller control={control} name="lotIds" render={({ field }) => (
        <TickList legend="Lots" selected={field.value} onChange={field.onChange} error={errors.lotIds?.message} whenEmpty={supplierId ? 'No lot of this supplier is on record.' : 'Choose the supplier first.'} options={theirs.map((lot) => ({ value: lot.id, label: <><LotTag code={lot.code} standing={lot.standing} /> {lot.materialName}</> }))} />
      )} />
      <Controller control={control} name="faults" render={({ field }) => (
        <TickList legend="Faults" selected={field.value} onChange={field.onChange} error={errors.faults?.message} options={(faults.data ?? []).map((fault) => ({ value: fault.slug, label: <FaultMark fault={fault.slug} name={fault.name} withName /> }))} />
      )} />
      <div className="grid gap-4 rack:grid-cols-2">
        <TextField type="date" label="Made from" isOptional error={errors.from?.message} {...register('from', { setValueAs: (day: string | null) => day || null })} />
        <TextField type="date" label="Made until" isOptional error={errors.to?.message} {...register('to', { setValueAs: (day: string | null) => day || null })} />
      </div>
      <TextArea label="Remarks" isOptional hint="Stands in every row." error={errors.remarks?.message} {...register('remarks')} />
      <details className="border-t border-line pt-2">
        <summary className="min-h-10 text-row font-[560]">Leave columns out</summary>
        <Controller control={control} name="leaveOut" render={({ field }) => <TickList legend="Columns that stay at home" selected={field.value ?? []} onChange={field.onChange} options={LEAVABLE} />} />
      </details>
      <p className="text-note text-ink-2">Never in the file: the formula’s grams and names of fats, other scents, prices, people. Good batches and those not looked at are always in it: a claim with the bad ones alone does not stand.</p>
      <Block kind="main" type="submit" className="justify-self-start" waitsFor={claim && !isDirty ? 'Nothing is changed' : undefined} busy={keep.isPending && 'Keeping …'}>{claim ? 'Keep the changes' : 'Draft the claim'}</Block>
    </form>
  );
}
