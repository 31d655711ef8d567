import { useQuery } from '@tanstack/react-query';
import type { GeneratedFrom } from '#shared/causes.ts';
import { DayPicker, Picker, SentenceFilter } from '#src/components/SentenceFilter.tsx';
import { formulaPickerQuery } from '#src/features/formulas/formulas.queries.ts';
import { formatCount, formatDay } from '#src/lib/format.ts';
import type { CountedAsk } from './causes.queries.ts';

const FAMILIES = [{ value: 'both', label: 'cold and hot family' }, { value: 'cold', label: 'cold family' }, { value: 'hot', label: 'hot family' }] as const;
const ANY = 'any';

/** What is counted, as a sentence that is also the address. */
export function CountingSentence({ ask, counted, onAsk, hasFamily = true }: { ask: CountedAsk; counted: GeneratedFrom | undefined; onAsk: (ask: CountedAsk) => void; hasFamily?: boolean }) {
  const formulas = useQuery(formulaPickerQuery).data ?? [];
  const options = [{ value: ANY, label: 'any formula' }, ...formulas.map(({ id, name }) => ({ value: id, label: name }))];
  const family = ask.family ?? 'both';
  const since = ask.from ?? counted?.firstMadeOn ?? undefined;
  return (
    <SentenceFilter label="What is counted">
      <span>Counting {counted ? <b>{formatCount(counted.batches, 'batch', 'batches')}</b> : 'the batches'} made</span>
      <DayPicker label="Made on or after" value={ask.from} onChange={(from) => onAsk({ ...ask, from })}>{since ? `${formatDay(since)} on` : 'any day'}</DayPicker>
      <span>until</span>
      <DayPicker label="Made on or before" value={ask.to} onChange={(to) => onAsk({ ...ask, to })}>{ask.to ? formatDay(ask.to) : 'today'}</DayPicker>
      {hasFamily && (
        <Picker label="Family" options={FAMILIES} selected={[family]} onChange={([next]) => onAsk({ ...ask, family: next === 'cold' || next === 'hot' ? next : undefined })} onClear={() => onAsk({ ...ask, family: undefined })}>
          {FAMILIES.find(({ value }) => value === family)?.label}
        </Picker>
      )}
      <span>of</span>
      <Picker label="Formula" options={options} selected={[ask.formula ?? ANY]} onChange={([next]) => onAsk({ ...ask, formula: next === ANY ? undefined : next })} onClear={() => onAsk({ ...ask, formula: undefined })}>
        {options.find(({ value }) => value === (ask.formula ?? ANY))?.label ?? 'one formula'}
      </Picker>
      <span>, adjusted for what changed with it</span>
    </SentenceFilter>
  );
}
