import { Check } from 'lucide-react';
import type { ReactNode } from 'react';
import { Button, Dialog, DialogTrigger, ListBox, ListBoxItem, Popover } from 'react-aria-components';

export interface PickerOption {
  value: string;
  label: string;
}

interface PickerProps {
  /** What is picked, for readers: "method". */
  label: string;
  /** The words that stand in the sentence. */
  children: ReactNode;
  options: readonly PickerOption[];
  selected: readonly string[];
  onChange: (values: string[]) => void;
  isMultiple?: boolean;
  /** Backspace on the picker. */
  onClear?: () => void;
}

const WORDS = 'cursor-pointer border-b-2 border-ink px-0.5 pb-px font-[640] data-hovered:bg-tray coarse:py-3';

/** An underlined part of the sentence that opens its choices. */
export function Picker({ label, children, options, selected, onChange, isMultiple = false, onClear }: PickerProps) {
  return (
    <DialogTrigger>
      <Button className={WORDS} aria-label={`${label}: ${typeof children === 'string' ? children : ''}`} onKeyDown={(event) => { if (event.key === 'Backspace') onClear?.(); else event.continuePropagation(); }}>{children}</Button>
      <Popover placement="bottom start" className="max-h-80 min-w-56 overflow-auto border border-line-firm bg-lift text-ink">
        <Dialog aria-label={label} className="outline-none">
          {({ close }) => (
            <ListBox
              aria-label={label}
              autoFocus
              selectionMode={isMultiple ? 'multiple' : 'single'}
              selectedKeys={selected}
              onSelectionChange={(keys) => {
                onChange(keys === 'all' ? options.map(({ value }) => value) : [...keys].map(String));
                if (!isMultiple) close();
              }}
              className="outline-none"
            >
              {options.map(({ value, label: words }) => (
                <ListBoxItem key={value} id={value} textValue={words} className="group flex min-h-11 cursor-pointer items-center gap-2 px-3 outline-none data-focused:bg-ink data-focused:text-on-ink">
                  <Check size={16} aria-hidden="true" className="invisible group-data-selected:visible" />
                  {words}
                </ListBoxItem>
              ))}
            </ListBox>
          )}
        </Dialog>
      </Popover>
    </DialogTrigger>
  );
}

/** A part of the sentence that is a day. */
export function DayPicker({ label, value, onChange, children }: { label: string; value: string | undefined; onChange: (day: string | undefined) => void; children: ReactNode }) {
  return (
    <DialogTrigger>
      <Button className={WORDS}>{children}</Button>
      <Popover placement="bottom start" className="border border-line-firm bg-lift p-3 text-ink">
        <Dialog aria-label={label} className="grid gap-2 outline-none">
          <label className="grid gap-1 text-row font-[560]">{label}<input type="date" value={value ?? ''} className="min-h-11 rounded-bar border border-line-firm bg-lift px-2" onChange={(event) => onChange(event.target.value || undefined)} /></label>
          <Button className="min-h-11 cursor-pointer border border-line-firm" onPress={() => onChange(undefined)}>Any day</Button>
        </Dialog>
      </Popover>
    </DialogTrigger>
  );
}

/** Plain words with pickers in them; the sentence is the address in words, and what readers hear. */
export function SentenceFilter({ label, children }: { label: string; children: ReactNode }) {
  return <div role="group" aria-label={label} className="say flex flex-wrap items-baseline gap-x-1.5 gap-y-2 text-bench">{children}</div>;
}
