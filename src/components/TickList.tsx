import type { ReactNode } from 'react';

interface TickListProps {
  legend: string;
  options: readonly { value: string; label: ReactNode }[];
  selected: readonly string[];
  onChange: (selected: string[]) => void;
  error?: string | undefined;
  /** Said where there is nothing to tick. */
  whenEmpty?: string;
}

/** Several of many, each a tick with room for a glove. */
export function TickList({ legend, options, selected, onChange, error, whenEmpty }: TickListProps) {
  return (
    <fieldset className="grid gap-1" aria-invalid={error ? true : undefined}>
      <legend className="text-row font-[560]">{legend}</legend>
      {options.length === 0 && whenEmpty && <p className="text-note text-ink-2">{whenEmpty}</p>}
      <div className="grid gap-x-4 rack:grid-cols-2">
        {options.map(({ value, label }) => (
          <label key={value} className="flex min-h-10 cursor-pointer items-center gap-2.5 text-row coarse:min-h-12">
            <input type="checkbox" className="size-5 shrink-0 accent-ink" checked={selected.includes(value)} onChange={(event) => onChange(event.target.checked ? [...selected, value] : selected.filter((other) => other !== value))} />
            {label}
          </label>
        ))}
      </div>
      {error && <p role="alert" className="text-note font-[560]"><span aria-hidden="true" className="mr-1 inline-block bg-ink px-1 text-on-ink">!</span>{error}</p>}
    </fieldset>
  );
}
