import { Radio, RadioGroup } from 'react-aria-components';
import { SeverityNotches } from './SeverityNotches.tsx';

/** How bad, each severity with its criterion of this fault; one that does not exist for it is not offered. */
export function SeverityPicker({ criteria, value, onChange }: { criteria: readonly (string | null)[]; value: number | null; onChange: (severity: number) => void }) {
  return (
    <RadioGroup aria-label="How bad" value={value === null ? null : String(value)} onChange={(next) => onChange(Number(next))} className="grid gap-0.5 rounded-bar bg-line-firm p-px max-rack:auto-cols-fr max-rack:grid-flow-col">
      {criteria.map((criterion, index) => criterion !== null && (
        <Radio
          key={index}
          value={String(index + 1)}
          className="grid min-h-14 cursor-pointer grid-cols-[2.25rem_1fr] items-center gap-2.5 bg-lift px-3 py-1.5 text-left text-row leading-snug data-focus-visible:z-10 data-focus-visible:outline-3 data-focus-visible:outline-offset-2 data-focus-visible:outline-focus data-selected:bg-ink data-selected:text-on-ink max-rack:min-h-22 max-rack:grid-cols-1 max-rack:content-start max-rack:gap-1 max-rack:px-2 max-rack:py-2 max-rack:text-note"
        >
          <span className="flex items-center gap-1"><SeverityNotches severity={index + 1} scale={1.5} /><span className="sr-only">Severity {index + 1}: </span></span>
          {criterion}
        </Radio>
      ))}
    </RadioGroup>
  );
}
