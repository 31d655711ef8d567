import type { ImportMapping, ImportView } from '#shared/imports.ts';
import { CONTROL } from '#src/components/Field.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SelectField } from '#src/components/TextField.tsx';
import { TickList } from '#src/components/TickList.tsx';

const UNITS = [
  { name: 'temperature', label: 'Temperatures', options: [{ value: 'celsius', label: '°C' }, { value: 'fahrenheit', label: '°F' }] },
  { name: 'share', label: 'Shares', options: [{ value: 'percent', label: 'per cent (33)' }, { value: 'fraction', label: 'fraction (0.33)' }] },
  { name: 'day', label: 'Days', options: [{ value: 'year-month-day', label: '2026-03-14' }, { value: 'day-month-year', label: '14.3.2026' }, { value: 'month-day-year', label: '3/14/2026' }] },
  { name: 'decimal', label: 'Decimals', options: [{ value: 'point', label: '2.05' }, { value: 'comma', label: '2,05' }] },
] as const;
const CREATES = [{ value: 'lots', label: 'lots' }, { value: 'formulas', label: 'formulas (name only)' }, { value: 'people', label: 'people (without an account)' }, { value: 'moulds', label: 'moulds' }, { value: 'colourants', label: 'colourants' }] as const;

interface MappingFormProps {
  sheet: ImportView;
  targets: readonly { name: string; holds: string; isFault: boolean; isRequired: boolean }[];
  mapping: ImportMapping;
  onChange: (mapping: ImportMapping) => void;
}

/** Which column holds what, and in which units: the person has the last word. */
export function MappingForm({ sheet, targets, mapping, onChange }: MappingFormProps) {
  const setTarget = (index: number, target: string | null) => onChange({ ...mapping, targets: sheet.columns.map((_column, at) => (at === index ? target : (mapping.targets[at] ?? null))) });
  return (
    <div className="grid grid-cols-1 gap-5">
      <div className="grid gap-4 rack:grid-cols-2 desk:grid-cols-4">
        {UNITS.map(({ name, label, options }) => <SelectField key={name} label={label} options={options} value={mapping.units[name]} onChange={(event) => onChange({ ...mapping, units: { ...mapping.units, [name]: event.target.value } })} />)}
      </div>
      <TickList legend="What the log does not have yet may be added" options={CREATES} selected={Object.entries(mapping.create).filter(([, may]) => may).map(([kind]) => kind)} onChange={(kinds) => onChange({ ...mapping, create: { lots: kinds.includes('lots'), formulas: kinds.includes('formulas'), people: kinds.includes('people'), moulds: kinds.includes('moulds'), colourants: kinds.includes('colourants') } })} />
      <section>
        <Rail heading="Columns" aside={`${mapping.targets.filter(Boolean).length} of ${sheet.columns.length} are taken`} />
        <ul>
          {sheet.columns.map(({ index, head, samples }) => (
            <li key={index} className="grid items-center gap-x-4 gap-y-1 border-b border-line py-2 rack:grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)_16rem]">
              <span className="truncate font-[600]">{head}</span>
              <span className="truncate text-note text-ink-2">{samples.length > 0 ? samples.join(' · ') : 'empty'}</span>
              <select aria-label={`Column ${head} holds`} className={CONTROL} value={mapping.targets[index] ?? ''} onChange={(event) => setTarget(index, event.target.value || null)}>
                <option value="">is left out</option>
                <optgroup label="Batch">{targets.filter(({ isFault }) => !isFault).map(({ name, holds, isRequired }) => <option key={name} value={name}>{holds}{isRequired ? ' (needed)' : ''}</option>)}</optgroup>
                <optgroup label="Faults">{targets.filter(({ isFault }) => isFault).map(({ name, holds }) => <option key={name} value={name}>{holds}</option>)}</optgroup>
              </select>
            </li>
          ))}
        </ul>
      </section>
    </div>
  );
}
