import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { SetLotStanding, type LotView } from '#shared/lots.ts';
import { LOT_STANDINGS, type LotStanding } from '#shared/words/lot-words.ts';
import { Block } from '#src/components/Block.tsx';
import { STANDING_WORDS } from '#src/components/LotTag.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { placeProblems } from '#src/lib/form-problem.ts';
import { useSetLotStanding } from './lots.queries.ts';

/** Puts a lot into another standing, with a reason that stays. */
export function StandingForm({ lot, suggested }: { lot: LotView; suggested: LotStanding | null }) {
  const set = useSetLotStanding(lot.id);
  const { tell } = useToasts();
  const [refused, setRefused] = useState<string>();
  const { register, handleSubmit, setError, resetField, formState: { errors, isSubmitting } } = useForm<{ standing: LotStanding; reason: string }>({ defaultValues: { standing: suggested ?? lot.standing, reason: '' } });
  const save = handleSubmit(async (typed) => {
    setRefused(undefined);
    const read = SetLotStanding.safeParse(typed);
    if (!read.success) {
      for (const issue of read.error.issues) setError(issue.path[0] as 'reason', { message: issue.message });
      return;
    }
    try {
      const kept = await set.mutateAsync({ ...read.data, version: lot.version });
      tell(`${kept.code} is ${STANDING_WORDS[kept.standing]} now`);
      resetField('reason');
    } catch (error) {
      setRefused(placeProblems(error, setError, ['standing', 'reason']));
    }
  });
  return (
    <form noValidate onSubmit={(event) => void save(event)} className="grid gap-3 pt-3">
      {refused && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{refused}</p>}
      <SelectField label="Put it into" options={LOT_STANDINGS.map((value) => ({ value, label: STANDING_WORDS[value] }))} {...register('standing')} error={errors.standing?.message} />
      <TextField label="Reason" {...register('reason')} error={errors.reason?.message} hint="Stays with the lot, with your name and the day." />
      <div><Block type="submit" busy={isSubmitting && 'Changing …'}>Change the standing</Block></div>
    </form>
  );
}
