import { useState } from 'react';
import { QuantityField } from '#src/components/QuantityField.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Picker, SentenceFilter } from '#src/components/SentenceFilter.tsx';
import { EmptyState, ErrorState, LoadingShape, NotAllowed } from '#src/components/states.tsx';
import { SelectField, TextArea, TextField } from '#src/components/TextField.tsx';
import { CallProblem } from '#src/lib/call.ts';
import type { UnitChoice } from '#src/lib/units.ts';

const METHODS = [{ value: 'cold', label: 'cold family' }, { value: 'hot', label: 'hot family' }];
const OUNCES: UnitChoice = { temperatureUnit: 'fahrenheit', massUnit: 'ounce' };
const LOST = new CallProblem({ type: '/problems/unexpected', title: 'This could not be worked out just now', status: 500, detail: 'The counting stopped half way', instance: '7Q4-181' });

/** What is typed or chosen, with hints, warnings and refusals; and a part before, without and instead of its data. */
export function FieldPieces() {
  const [oilC, setOilC] = useState<number | null>(43);
  const [massG, setMassG] = useState<number | null>(1000);
  const [methods, setMethods] = useState<string[]>(['cold']);
  return (
    <>
      <section className="grid gap-4">
        <Rail heading="Sentence and fields" aside="units as the person likes them" />
        <SentenceFilter label="Which batches">
          <span>Show</span>
          <Picker label="Method" options={METHODS} selected={methods} onChange={setMethods} onClear={() => setMethods([])}>{METHODS.find(({ value }) => value === methods[0])?.label ?? 'all'}</Picker>
          <span>batches</span>
        </SentenceFilter>
        <div className="grid gap-4 rack:grid-cols-2 desk:grid-cols-4">
          <TextField label="Supplier’s code" defaultValue="EF-7802" hint="As printed on the bottle" />
          <SelectField label="Mould" options={[{ value: 'a', label: 'Long loaf, 12 bars' }]} emptyLabel="No mould yet" />
          <TextField label="Superfat" defaultValue="25" error="Superfat must lie between −5 and 20 %" />
          <QuantityField label="Oil temperature" quantity="temperature" value={oilC} onChange={setOilC} />
          <QuantityField label="Oil temperature, in °F" quantity="temperature" units={OUNCES} value={oilC} onChange={setOilC} warning="Warmer than usual here: 38 to 49 °C" />
          <QuantityField label="Fats, in ounces" quantity="mass" units={OUNCES} value={massG} onChange={setMassG} />
          <TextArea label="Note" isOptional className="rack:col-span-2" />
        </div>
      </section>
      <section className="grid gap-4">
        <Rail heading="Four states of a part" />
        <div className="grid items-start gap-6 rack:grid-cols-2 desk:grid-cols-4">
          <EmptyState title="3 of the 8 batches this needs have been looked at">Look at QL-0177 and QL-0175 today and it will be 5.</EmptyState>
          <LoadingShape says="Counting 176 batches" rows={4} />
          <ErrorState error={LOST} onRetry={() => undefined} />
          <NotAllowed>Only an owner sees grams.</NotAllowed>
        </div>
      </section>
    </>
  );
}
