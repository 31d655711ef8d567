import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { COOK_STAGES, COVERS, DESIGNS, GELS, TRACES } from '#shared/words/batch-words.ts';
import { familyOf } from '#shared/words/methods.ts';
import { Block } from '#src/components/Block.tsx';
import { CONTROL, FieldFrame } from '#src/components/Field.tsx';
import { PLAIN_SOAP, Slice } from '#src/components/Slice.tsx';
import { TextArea, TextField } from '#src/components/TextField.tsx';
import { COOK_STAGE_WORDS, COVER_WORDS, GEL_WORDS, optionsOf, TRACE_WORDS } from '#src/lib/words.ts';
import { clockIn, instantAt } from '#src/lib/zoned.ts';
import type { BatchDraft } from './batch-draft.ts';
import { FieldRow, Measure, Pick, useFieldSays, YesNo } from './form-fields.tsx';

export function TemperatureFields() {
  const family = familyOf(useWatch<BatchDraft, 'method'>({ name: 'method' }));
  return (
    <FieldRow>
      <Measure name="oilTemperatureC" label="Oils at mixing" quantity="temperature" decimals={1} />
      <Measure name="lyeTemperatureC" label="Lye at mixing" quantity="temperature" decimals={1} />
      <Measure name="batterTemperatureC" label={family === 'hot' ? 'Mass when packed' : 'Batter at pour'} quantity="temperature" decimals={1} />
      <Measure name="scentTemperatureC" label="When the scent went in" quantity="temperature" decimals={1} />
      <Measure name="roomTemperatureC" label="Room" quantity="temperature" decimals={1} />
      <Measure name="humidityFraction" label="Humidity" quantity="percent" decimals={0} />
    </FieldRow>
  );
}

/** `timeZone` is the workshop's: a time is read off the workshop's clock. */
export function BlendFields({ timeZone }: { timeZone: string }) {
  const { setValue } = useFormContext<BatchDraft>();
  const pouredAt = useWatch<BatchDraft, 'pouredAt'>({ name: 'pouredAt' });
  return (
    <FieldRow>
      <Measure name="blendSeconds" label="Blended, motor on" sign="s" decimals={0} />
      <Pick name="traceAtScent" label="Trace when the scent went in" options={optionsOf(TRACES, TRACE_WORDS)} />
      <Pick name="traceAtPour" label="Trace at pour" options={optionsOf(TRACES, TRACE_WORDS)} />
      <Measure name="minutesToPour" label="From trace to pour" sign="min" decimals={1} />
      <TextField
        label="Poured at" type="datetime-local" {...useFieldSays('pouredAt')} value={pouredAt ? clockIn(pouredAt, timeZone) : ''}
        onChange={(event) => setValue('pouredAt', event.target.value ? instantAt(event.target.value, timeZone) : null, { shouldDirty: true })}
      />
      <YesNo name="isSprayed" label="Sprayed with alcohol" />
    </FieldRow>
  );
}

export function CookFields() {
  const { control } = useFormContext<BatchDraft>();
  const { fields, append, remove } = useFieldArray({ control, name: 'cookStages' });
  return (
    <div className="grid gap-4">
      <FieldRow>
        <Measure name="cookTemperatureC" label="Cook, temperature of the mass" quantity="temperature" decimals={1} />
        <Measure name="cookMinutes" label="Cook time" sign="min" decimals={0} />
        <Measure name="cookLossFraction" label="Lost in the cook" quantity="percent" decimals={1} />
      </FieldRow>
      {fields.map((field, index) => (
        <div key={field.id} className="grid grid-cols-[minmax(0,16rem)_minmax(0,10rem)_auto] items-start gap-x-4 gap-y-2 max-rack:grid-cols-1">
          <Pick name={`cookStages.${index}.stage`} label="The mass looked like" options={optionsOf(COOK_STAGES, COOK_STAGE_WORDS)} emptyLabel="choose …" />
          <Measure name={`cookStages.${index}.minutesFromStart`} label="After" sign="min" decimals={0} />
          <Block kind="quiet" className="mt-6 max-rack:mt-0" onClick={() => remove(index)}>Take out</Block>
        </div>
      ))}
      <Block className="justify-self-start max-rack:w-full" onClick={() => append({ stage: COOK_STAGES[Math.min(fields.length, COOK_STAGES.length - 1)] ?? 'trace', minutesFromStart: 0 })}>Add a cook stage</Block>
    </div>
  );
}

export function MouldFields() {
  const { register } = useFormContext<BatchDraft>();
  return (
    <FieldRow>
      <Pick name="cover" label="Covered with" options={optionsOf(COVERS, COVER_WORDS)} />
      <Pick name="gel" label="Gel phase" options={optionsOf(GELS, GEL_WORDS)} />
      <Measure name="mouldHours" label="In the mould" sign="h" decimals={1} />
      <TextField label="Unmoulded on" type="date" {...useFieldSays('unmouldedOn')} {...register('unmouldedOn', { setValueAs: (value: unknown) => value || null })} />
      <TextField label="Cut on" type="date" {...useFieldSays('cutOn')} {...register('cutOn', { setValueAs: (value: unknown) => value || null })} />
      <Measure name="cutHours" label="From pour to cut" sign="h" decimals={1} />
    </FieldRow>
  );
}

const DESIGN_WORDS = { plain: 'plain', layers: 'layers', swirl: 'swirl', specks: 'specks' } as const;
const COLOURS = [['base', 'Base colour'], ['second', 'Second colour'], ['third', 'Third colour']] as const;

/** The face it is recognised by, and whatever else there is to say. */
export function FaceFields() {
  const { register, setValue } = useFormContext<BatchDraft>();
  const palette = useWatch<BatchDraft, 'palette'>({ name: 'palette' });
  const paint = (part: Partial<NonNullable<BatchDraft['palette']>>) => setValue('palette', { ...(palette ?? PLAIN_SOAP), ...part }, { shouldDirty: true });
  return (
    <div className="grid gap-4">
      <div className="flex flex-wrap items-end gap-x-5 gap-y-4">
        <Slice soap={palette} width={54} height={64} />
        <FieldFrame label="Design" className="w-36">
          {(ids) => <select {...ids} className={CONTROL} value={palette?.design ?? 'plain'} onChange={(event) => paint({ design: DESIGNS.find((design) => design === event.target.value) ?? 'plain' })}>{DESIGNS.map((design) => <option key={design} value={design}>{DESIGN_WORDS[design]}</option>)}</select>}
        </FieldFrame>
        {COLOURS.map(([part, label]) => (
          <FieldFrame key={part} label={label} className="w-28">
            {(ids) => <input {...ids} type="color" className={`${CONTROL} p-1`} value={palette?.[part] ?? PLAIN_SOAP[part]} onChange={(event) => paint({ [part]: event.target.value })} />}
          </FieldFrame>
        ))}
        <label className="flex min-h-11 items-center gap-2 coarse:min-h-12"><input type="checkbox" className="size-5" {...register('hasEmbeds')} />Holds pieces of an earlier batch</label>
      </div>
      <TextArea label="Note" rows={4} {...useFieldSays('note')} {...register('note')} />
    </div>
  );
}
