import { zodResolver } from '@hookform/resolvers/zod';
import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { FormProvider, useForm, useWatch } from 'react-hook-form';
import { NewBatch } from '#shared/batches.ts';
import type { BatchState } from '#shared/words/batch-words.ts';
import { familyOf } from '#shared/words/methods.ts';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { useSession } from '#src/features/session/session.queries.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import type { BatchDraft } from './batch-draft.ts';
import { FieldRow, FormSurroundingsContext, Measure } from './form-fields.tsx';
import { IngredientFields } from './IngredientFields.tsx';
import { LyeCaution } from './LyeCaution.tsx';
import { BlendFields, CookFields, FaceFields, MouldFields, TemperatureFields } from './MakingFields.tsx';
import { PlanFields } from './PlanFields.tsx';
import { useLiveWarnings } from './use-live-warnings.ts';
import { WaterFields } from './WaterFields.tsx';

const FIELDS = Object.keys(NewBatch.shape);

interface BatchFormProps {
  start: BatchDraft;
  /** The state that is kept; null for a batch that is not yet logged. */
  stateNow: BatchState | null;
  saveWords: string;
  busyWords: string;
  /** Keeps what was typed; throws what the server answered. */
  onSave: (draft: BatchDraft) => Promise<void>;
  /** What is to be said above the blocks, e.g. that somebody else changed the batch. */
  notice?: ReactNode;
  /** Values that come in from outside while the form is open. */
  incoming?: Partial<BatchDraft>;
  away: ReactNode;
}

/** All inputs of a batch in the order of its making. Nothing typed is lost when saving fails. */
export function BatchForm({ start, stateNow, saveWords, busyWords, onSave, notice, incoming, away }: BatchFormProps) {
  const { account, workshop } = useSession();
  const form = useForm<BatchDraft, unknown, BatchDraft>({ resolver: zodResolver(NewBatch) as never, defaultValues: start, shouldFocusError: false });
  const { control, handleSubmit, setError, setValue, formState: { isSubmitting, submitCount, errors } } = form;
  const [refused, setRefused] = useState<string>();
  const sheet = useRef<HTMLFormElement>(null);
  const live = useLiveWarnings(control, account);
  const surroundings = useMemo(() => ({ units: account, warningAt: live.warningAt }), [account, live.warningAt]);
  const isHot = familyOf(useWatch({ control, name: 'method' })) === 'hot';
  const wrong = Object.keys(errors).length;

  useEffect(() => {
    for (const [field, value] of Object.entries(incoming ?? {})) setValue(field as keyof BatchDraft, value as never);
  }, [incoming, setValue]);
  // Most fields are drawn by their own component, so the first wrong one is found on the page.
  useEffect(() => {
    if (submitCount > 0 && wrong > 0) sheet.current?.querySelector<HTMLElement>('[aria-invalid=true]')?.focus();
  }, [submitCount, wrong]);

  const save = handleSubmit(async (draft) => {
    setRefused(undefined);
    try {
      await onSave(draft);
    } catch (error) {
      setRefused(placeProblems(error, setError, FIELDS));
    }
  });

  return (
    <FormProvider {...form}>
      <FormSurroundingsContext value={surroundings}>
        <form ref={sheet} noValidate onSubmit={(event) => void save(event)} className="grid gap-8">
          <Group heading="Plan"><PlanFields stateNow={stateNow} /></Group>
          <Group heading="What goes in" aside={account.massUnit === 'gram' ? 'grams' : 'ounces by weight'}>
            <LyeCaution isHot={isHot} />
            <FieldRow>
              <Measure name="oilMassG" label="All oils together" quantity="mass" />
              <WaterFields />
            </FieldRow>
            <IngredientFields />
          </Group>
          <Group heading="Temperatures"><TemperatureFields /></Group>
          <Group heading="Blend and pour"><BlendFields timeZone={workshop.timeZone} /></Group>
          {isHot && <Group heading="Cook"><CookFields /></Group>}
          <Group heading="Mould and cut"><MouldFields /></Group>
          <Group heading="Face and note"><FaceFields /></Group>
          <div className="sticky bottom-0 z-10 grid gap-2 border-t-2 border-ink bg-board py-3 max-rack:bottom-16">
            {notice}
            <div role="alert">
              {refused && <p className="border-l-4 border-ink bg-tray px-3 py-2">{refused}</p>}
              {wrong > 0 && <p className="text-note font-[560]">{wrong === 1 ? 'One field needs' : `${wrong} fields need`} another look.</p>}
            </div>
            <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
              <Block kind="main" type="submit" busy={isSubmitting && busyWords} className="max-rack:flex-1">{saveWords}</Block>
              {away}
              {live.count > 0 && <p className="text-note text-ink-2">{live.count === 1 ? 'One warning' : `${live.count} warnings`}; they let pass.</p>}
            </div>
          </div>
        </form>
      </FormSurroundingsContext>
    </FormProvider>
  );
}

function Group({ heading, aside, children }: { heading: string; aside?: string; children: ReactNode }) {
  return (
    <section className="grid gap-4">
      <Rail heading={heading} {...(aside ? { aside } : {})} />
      {children}
    </section>
  );
}
