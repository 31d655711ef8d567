import { useState } from 'react';
import { fromShown, SI, toShown, unitSign, type Quantity, type UnitChoice } from '#src/lib/units.ts';
import { CONTROL, FieldFrame, type FieldShape } from './Field.tsx';

interface QuantityFieldProps extends FieldShape {
  quantity: Quantity;
  /** The value inside: °C, g, a fraction, or the plain number; null while empty, NaN while what is typed is no number, so that no schema takes it. */
  value: number | null;
  onChange: (value: number | null) => void;
  onBlur?: () => void;
  units?: UnitChoice;
  decimals?: number;
  name?: string;
  /** Sign of a plain number, e.g. "s". */
  sign?: string;
  className?: string;
}

/** Number in a typed text, a comma taken as the decimal sign; undefined when it is none. */
export function numberIn(text: string): number | null | undefined {
  const compact = text.replaceAll(/\s/g, '').replace('\u2212', '-').replace(',', '.');
  if (compact === '') return null;
  return /^-?(?:\d+(?:\.\d*)?|\.\d+)$/.test(compact) ? Number(compact) : undefined;
}

function shownText(value: number | null, quantity: Quantity, units: UnitChoice, decimals: number): string {
  return value === null || Number.isNaN(value) ? '' : String(Number(toShown(value, quantity, units).toFixed(decimals)));
}

/** A measured value in the person's own unit. What was typed stays as typed; the value inside is SI. */
export function QuantityField({ quantity, value, onChange, onBlur, units = SI, decimals = 2, name, sign, label, hint, error, warning, isOptional, className }: QuantityFieldProps) {
  const [typed, setTyped] = useState({ text: shownText(value, quantity, units, decimals), stands: value });
  // A value set from outside (a partner field, a reset) replaces what was typed; our own echo does not.
  const text = Object.is(typed.stands, value) ? typed.text : shownText(value, quantity, units, decimals);
  const isNumber = numberIn(text) !== undefined;
  const unit = sign ?? unitSign(quantity, units);
  return (
    <FieldFrame label={label} hint={hint} error={isNumber ? error : 'Type a number, for example 38.5'} warning={warning} {...(isOptional ? { isOptional } : {})} {...(className ? { className } : {})}>
      {(ids) => (
        <span className="relative block">
          <input
            {...ids}
            name={name}
            inputMode="decimal"
            autoComplete="off"
            className={`${CONTROL} ${unit ? 'pr-16' : ''} tabular-nums`}
            value={text}
            onBlur={onBlur}
            onChange={(event) => {
              const shown = numberIn(event.target.value);
              const next = shown === null ? null : fromShown(shown ?? Number.NaN, quantity, units);
              setTyped({ text: event.target.value, stands: next });
              onChange(next);
            }}
          />
          {unit && <span aria-hidden="true" className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-note text-ink-2">{unit}</span>}
        </span>
      )}
    </FieldFrame>
  );
}
