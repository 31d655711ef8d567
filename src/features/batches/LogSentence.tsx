import { useQuery } from '@tanstack/react-query';
import { BATCH_STATES } from '#shared/words/batch-words.ts';
import { METHODS, type Method, type MethodFamily } from '#shared/words/methods.ts';
import { LotTag } from '#src/components/LotTag.tsx';
import { DayPicker, Picker, SentenceFilter, type PickerOption } from '#src/components/SentenceFilter.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { formulaPickerQuery } from '#src/features/formulas/formulas.queries.ts';
import { lotPickerQuery } from '#src/features/lots/lots.queries.ts';
import { membersQuery } from '#src/features/members/members.queries.ts';
import { formatDay } from '#src/lib/format.ts';
import { FAMILY_WORDS, METHOD_WORDS, optionsOf, STATE_WORDS } from '#src/lib/words.ts';
import type { BatchesAsk } from './batches.queries.ts';

const ANYTHING = 'anything';
const ANSWERS = [
  { value: 'any', label: 'found, clear or not looked at' },
  { value: 'answered', label: 'found or clear' },
  { value: 'found', label: 'found' },
  { value: 'clear', label: 'clear' },
  { value: 'not-checked', label: 'not looked at' },
] as const;
const METHOD_OPTIONS: PickerOption[] = [
  { value: 'any', label: 'all' },
  { value: 'family:cold', label: FAMILY_WORDS.cold },
  { value: 'family:hot', label: FAMILY_WORDS.hot },
  ...optionsOf(METHODS, METHOD_WORDS),
];

/** Words for what was picked from a list, joined by "or". */
function wordsFor(values: readonly string[] | undefined, options: readonly PickerOption[], none: string): string {
  if (!values || values.length === 0) return none;
  return values.map((value) => options.find((option) => option.value === value)?.label ?? 'one not listed').join(' or ');
}

/** The log's filter as a sentence; each underlined part opens its choices, Backspace takes it out. */
export function LogSentence({ ask, onAsk }: { ask: BatchesAsk; onAsk: (ask: BatchesAsk) => void }) {
  const lots = useQuery(lotPickerQuery).data ?? [];
  const catalogue = useQuery(faultsQuery).data ?? [];
  const lotOptions = lots.map((lot) => ({ value: lot.id, label: `${lot.code}, ${lot.materialName}` }));
  const faultOptions = [{ value: ANYTHING, label: ANYTHING }, ...catalogue.map(({ slug, name }) => ({ value: slug, label: name.toLowerCase() }))];
  const method = ask.family ? `family:${ask.family}` : (ask.method?.[0] ?? 'any');
  const answer = ask.answer ?? (ask.fault ? 'found' : 'any');

  const pickMethod = (values: string[]) => {
    const value = values.at(-1) ?? 'any';
    const family = value.startsWith('family:') ? (value.slice(7) as MethodFamily) : undefined;
    onAsk({ ...ask, family, method: family || value === 'any' ? undefined : [value as Method] });
  };
  const pickFault = (values: string[]) => {
    const fault = values[0] === ANYTHING ? undefined : values[0];
    // "Found" goes without saying once a fault is named.
    onAsk({ ...ask, fault, answer: fault && ask.answer === undefined ? 'found' : ask.answer });
  };

  return (
    <SentenceFilter label="Which batches are shown">
      <span>Show</span>
      <Picker label="Method" options={METHOD_OPTIONS} selected={[method]} onChange={pickMethod} onClear={() => pickMethod(['any'])}>
        {ask.method && ask.method.length > 1 ? wordsFor(ask.method, METHOD_OPTIONS, 'all') : wordsFor([method], METHOD_OPTIONS, 'all')}
      </Picker>
      <span>batches made</span>
      <DayPicker label="Made on or after" value={ask.from} onChange={(from) => onAsk({ ...ask, from })}>{ask.from ? `since ${formatDay(ask.from)}` : 'any day'}</DayPicker>
      {ask.to && <><span>until</span><DayPicker label="Made on or before" value={ask.to} onChange={(to) => onAsk({ ...ask, to })}>{formatDay(ask.to)}</DayPicker></>}
      <span>holding</span>
      <Picker label="Lots" isMultiple options={lotOptions} selected={ask.lot ?? []} onChange={(lot) => onAsk({ ...ask, lot })} onClear={() => onAsk({ ...ask, lot: undefined })}>
        {ask.lot && ask.lot.length > 0 ? <LotWords ids={ask.lot} lots={lots} /> : 'any lot'}
      </Picker>
      <span>where</span>
      <Picker label="Fault" options={faultOptions} selected={[ask.fault ?? ANYTHING]} onChange={pickFault} onClear={() => onAsk({ ...ask, fault: undefined, answer: undefined })}>
        {wordsFor([ask.fault ?? ANYTHING], faultOptions, ANYTHING)}
      </Picker>
      <span>was</span>
      <Picker label="Answer" options={ANSWERS} selected={[answer]} onChange={(values) => onAsk({ ...ask, answer: values[0] === 'any' ? undefined : (values[0] as BatchesAsk['answer']) })} onClear={() => onAsk({ ...ask, answer: undefined })}>
        {wordsFor([answer], ask.fault ? ANSWERS.filter(({ value }) => value !== 'any') : ANSWERS, 'found')}
      </Picker>
      <MoreParts ask={ask} onAsk={onAsk} />
    </SentenceFilter>
  );
}

function LotWords({ ids, lots }: { ids: readonly string[]; lots: readonly { id: string; code: string }[] }) {
  return (
    <span className="inline-flex flex-wrap items-center gap-1">
      {ids.map((id, index) => (
        <span key={id} className="inline-flex items-center gap-1">
          {index > 0 && 'or'}
          <LotTag code={lots.find((lot) => lot.id === id)?.code ?? 'a lot'} />
        </span>
      ))}
    </span>
  );
}

type Part = 'maker' | 'formula' | 'state' | 'to' | 'find';
const PARTS: readonly { value: Part; label: string }[] = [
  { value: 'maker', label: 'made by …' }, { value: 'formula', label: 'of the formula …' }, { value: 'state', label: 'that are …' }, { value: 'to', label: 'made until …' },
];

/** What the sentence may go on with; a part stands in it once it is chosen. */
function MoreParts({ ask, onAsk }: { ask: BatchesAsk; onAsk: (ask: BatchesAsk) => void }) {
  const makers = (useQuery(membersQuery).data ?? []).map(({ id, name }) => ({ value: id, label: name }));
  const formulas = (useQuery(formulaPickerQuery).data ?? []).map(({ id, name }) => ({ value: id, label: name }));
  const states = optionsOf(BATCH_STATES, STATE_WORDS);
  const missing = PARTS.filter(({ value }) => ask[value] === undefined);
  const begin = (part: string | undefined) => {
    if (part === 'maker' && makers[0]) onAsk({ ...ask, maker: [makers[0].value] });
    if (part === 'formula' && formulas[0]) onAsk({ ...ask, formula: [formulas[0].value] });
    if (part === 'state') onAsk({ ...ask, state: ['curing'] });
    if (part === 'to') onAsk({ ...ask, to: ask.from ?? new Date().toISOString().slice(0, 10) });
  };
  return (
    <>
      {ask.maker && <><span>, by</span><Picker label="Maker" isMultiple options={makers} selected={ask.maker} onChange={(maker) => onAsk({ ...ask, maker })} onClear={() => onAsk({ ...ask, maker: undefined })}>{wordsFor(ask.maker, makers, 'anybody')}</Picker></>}
      {ask.formula && <><span>, of</span><Picker label="Formula" isMultiple options={formulas} selected={ask.formula} onChange={(formula) => onAsk({ ...ask, formula })} onClear={() => onAsk({ ...ask, formula: undefined })}>{wordsFor(ask.formula, formulas, 'any formula')}</Picker></>}
      {ask.state && <><span>, that are</span><Picker label="State" isMultiple options={states} selected={ask.state} onChange={(state) => onAsk({ ...ask, state: state as BatchesAsk['state'] })} onClear={() => onAsk({ ...ask, state: undefined })}>{wordsFor(ask.state, states, 'in any state')}</Picker></>}
      {ask.find && <span>, with “{ask.find}” in code, note, lot or formula <button type="button" className="text-note underline coarse:min-h-12" onClick={() => onAsk({ ...ask, find: undefined })}>leave out</button></span>}
      {missing.length > 0 && <span className="text-row">, <Picker label="Add a part" options={missing} selected={[]} onChange={(values) => begin(values[0])}>and …</Picker></span>}
    </>
  );
}
