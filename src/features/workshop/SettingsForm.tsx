import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { WorkshopView } from '#shared/workshop.ts';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { CallProblem } from '#src/lib/call.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { CURRENCIES, readTyped, SETTINGS_FIELDS, SETTINGS_LABELS, typedFrom, type SettingsTyped } from './settings-form.ts';
import { useChangeWorkshop } from './workshop.queries.ts';

const ZONES = Intl.supportedValuesOf('timeZone');
const optionsWith = (values: readonly string[], current: string) => [...new Set([current, ...values])].sort().map((value) => ({ value, label: value }));

function theirs(error: unknown): WorkshopView | undefined {
  return error instanceof CallProblem && error.status === 412 ? WorkshopView.safeParse(error.problem.current).data : undefined;
}

/** Settings as typed; where somebody else was quicker both versions are shown and nothing typed is lost. */
export function SettingsForm({ workshop }: { workshop: WorkshopView }) {
  const change = useChangeWorkshop();
  const { tell } = useToasts();
  const [base, setBase] = useState(workshop);
  const [other, setOther] = useState<WorkshopView>();
  const { register, handleSubmit, setError, reset, getValues, formState: { errors } } = useForm<SettingsTyped>({ defaultValues: typedFrom(workshop) });
  const submit = handleSubmit(async (typed) => {
    const read = readTyped(typed);
    if ('problems' in read) return read.problems.forEach(({ field, says }, index) => setError(field, { message: says }, { shouldFocus: index === 0 }));
    try {
      const now = await change.mutateAsync({ version: (other ?? base).version, change: read.change });
      setBase(now);
      setOther(undefined);
      reset(typedFrom(now));
      tell('The settings are kept');
    } catch (error) {
      const current = theirs(error);
      if (current) return setOther(current);
      const left = placeProblems(error, setError, SETTINGS_FIELDS);
      if (left) setError('root', { message: left });
    }
  });
  const takeTheirs = (current: WorkshopView) => {
    setBase(current);
    setOther(undefined);
    reset(typedFrom(current));
  };
  const field = (name: keyof SettingsTyped) => ({ label: SETTINGS_LABELS[name], error: errors[name]?.message, ...register(name) });
  return (
    <form className="grid max-w-3xl gap-5" noValidate onSubmit={(event) => void submit(event)}>
      <Rail heading="Settings" />
      {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
      {other && <BothVersions mine={getValues()} theirs={typedFrom(other)} onTheirs={() => takeTheirs(other)} />}
      <div className="grid gap-4 rack:grid-cols-2">
        <TextField {...field('name')} autoComplete="organization" className="rack:col-span-2" />
        <SelectField {...field('timeZone')} options={optionsWith(ZONES, base.timeZone)} hint="Days begin and end in this zone" />
        <TextField {...field('batchPrefix')} autoComplete="off" hint="One to six letters or digits; earlier codes stay as they are" />
        <SelectField {...field('currency')} options={optionsWith(CURRENCIES, base.currency)} hint="Prices that are there already keep their numbers" className="rack:col-span-2" />
        <TextField {...field('firstPriceMinor')} inputMode="decimal" autoComplete="off" isOptional hint="For one bar, in the currency above" />
        <TextField {...field('secondPriceMinor')} inputMode="decimal" autoComplete="off" isOptional hint="For one bar sold as a second" />
      </div>
      <Block kind="main" type="submit" className="justify-self-start" busy={change.isPending && 'Keeping …'}>{other ? 'Keep mine instead' : 'Keep'}</Block>
    </form>
  );
}

function BothVersions({ mine, theirs: current, onTheirs }: { mine: SettingsTyped; theirs: SettingsTyped; onTheirs: () => void }) {
  const apart = SETTINGS_FIELDS.filter((name) => mine[name] !== current[name]);
  return (
    <div role="alert" className="grid justify-items-start gap-2 border-l-4 border-ink bg-tray px-4 py-3">
      <p className="font-[600]">Somebody else changed the settings meanwhile. Nothing was overwritten.</p>
      <ul>{apart.map((name) => <li key={name}>{SETTINGS_LABELS[name]}: yours {mine[name] || 'empty'}, theirs {current[name] || 'empty'}</li>)}</ul>
      <Block onClick={onTheirs}>Take theirs</Block>
    </div>
  );
}
