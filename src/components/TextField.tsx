import type { ComponentPropsWithRef } from 'react';
import { CONTROL, FieldFrame, type FieldShape } from './Field.tsx';

type TextFieldProps = FieldShape & Omit<ComponentPropsWithRef<'input'>, 'className' | 'id'> & { className?: string };

/** One line of text, or a day with `type="date"`; takes react-hook-form's `register` props as they are. */
export function TextField({ label, hint, error, warning, isOptional, className, ...input }: TextFieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} warning={warning} {...(isOptional ? { isOptional } : {})} {...(className ? { className } : {})}>
      {(ids) => <input {...ids} {...input} className={CONTROL} />}
    </FieldFrame>
  );
}

type TextAreaProps = FieldShape & Omit<ComponentPropsWithRef<'textarea'>, 'className' | 'id'> & { className?: string };

/** Several lines of text. */
export function TextArea({ label, hint, error, warning, isOptional, className, rows = 3, ...area }: TextAreaProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} warning={warning} {...(isOptional ? { isOptional } : {})} {...(className ? { className } : {})}>
      {(ids) => <textarea {...ids} {...area} rows={rows} className={`${CONTROL} py-2`} />}
    </FieldFrame>
  );
}

type SelectFieldProps = FieldShape & Omit<ComponentPropsWithRef<'select'>, 'className' | 'id' | 'children'> & { options: readonly { value: string; label: string }[]; emptyLabel?: string; className?: string };

/** One of a few. `emptyLabel` names the choice of none. */
export function SelectField({ label, hint, error, warning, isOptional, options, emptyLabel, className, ...select }: SelectFieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} warning={warning} {...(isOptional ? { isOptional } : {})} {...(className ? { className } : {})}>
      {(ids) => (
        <select {...ids} {...select} className={CONTROL}>
          {emptyLabel !== undefined && <option value="">{emptyLabel}</option>}
          {options.map(({ value, label: words }) => (
            <option key={value} value={value}>{words}</option>
          ))}
        </select>
      )}
    </FieldFrame>
  );
}
