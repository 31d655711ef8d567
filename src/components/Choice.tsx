import type { ReactNode } from 'react';
import { Radio, RadioGroup } from 'react-aria-components';

interface ChoiceProps<Value extends string> {
  label: string;
  value: Value | null;
  options: readonly { value: Value; label: ReactNode; tone?: 'found' }[];
  onChange: (value: Value) => void;
  size?: 'row' | 'desk' | 'bench';
  isDisabled?: boolean;
}

const HEIGHT = { row: 'min-h-9 text-note', desk: 'min-h-10 text-row', bench: 'min-h-15 text-rail' };

/** Two to four joined blocks, one of which stands; arrow keys move between them. */
export function Choice<Value extends string>({ label, value, options, onChange, size = 'desk', isDisabled = false }: ChoiceProps<Value>) {
  return (
    <RadioGroup aria-label={label} value={value} onChange={(next) => onChange(next as Value)} orientation="horizontal" isDisabled={isDisabled} className="inline-flex gap-0.5 rounded-bar bg-line-firm p-px">
      {options.map(({ value: option, label: words, tone }) => (
        <Radio
          key={option}
          value={option}
          className={`flex flex-1 cursor-pointer items-center justify-center gap-1.5 bg-tray px-3 font-[540] whitespace-nowrap coarse:min-h-12 data-disabled:cursor-not-allowed data-disabled:text-ink-3 data-focus-visible:z-10 data-focus-visible:outline-3 data-focus-visible:outline-offset-2 data-focus-visible:outline-focus data-selected:bg-ink data-selected:text-on-ink ${tone === 'found' ? 'data-selected:bg-more-fill! data-selected:text-on-more!' : ''} ${HEIGHT[size]}`}
        >
          {words}
        </Radio>
      ))}
    </RadioGroup>
  );
}
