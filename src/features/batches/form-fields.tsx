import { createContext, use, type ReactNode } from 'react';
import { get, useController, useFormContext, type FieldPath } from 'react-hook-form';
import { QuantityField } from '#src/components/QuantityField.tsx';
import { SelectField } from '#src/components/TextField.tsx';
import { SI, type Quantity, type UnitChoice } from '#src/lib/units.ts';
import type { BatchDraft } from './batch-draft.ts';

interface FormSurroundings {
  units: UnitChoice;
  /** Soft warning at a field, by its JSON pointer. */
  warningAt: (pointer: string) => string | undefined;
}

/** Units and live warnings for every field of the batch form. */
export const FormSurroundingsContext = createContext<FormSurroundings>({ units: SI, warningAt: () => undefined });

/** Error and warning of one field of the draft. */
export function useFieldSays(name: FieldPath<BatchDraft>): { error: string | undefined; warning: string | undefined } {
  const { formState } = useFormContext<BatchDraft>();
  const problem: unknown = get(formState.errors, name);
  const error = typeof problem === 'object' && problem !== null && 'message' in problem && typeof problem.message === 'string' ? problem.message : undefined;
  return { error, warning: use(FormSurroundingsContext).warningAt(`#/${name.replaceAll('.', '/')}`) };
}

interface MeasureProps {
  name: FieldPath<BatchDraft>;
  label: string;
  quantity?: Quantity;
  sign?: string;
  hint?: ReactNode;
  decimals?: number;
  className?: string;
}

/** A measured value of the draft, typed in the person's unit. */
export function Measure({ name, label, quantity = 'plain', sign, hint, decimals, className }: MeasureProps) {
  const { units } = use(FormSurroundingsContext);
  const { field } = useController<BatchDraft>({ name });
  return (
    <QuantityField
      name={name} label={label} quantity={quantity} units={units} hint={hint} {...useFieldSays(name)} {...(sign ? { sign } : {})} {...(decimals === undefined ? {} : { decimals })} {...(className ? { className } : {})}
      value={typeof field.value === 'number' ? field.value : null} onChange={field.onChange} onBlur={field.onBlur}
    />
  );
}

interface PickProps {
  name: FieldPath<BatchDraft>;
  label: string;
  options: readonly { value: string; label: string }[];
  emptyLabel?: string;
  hint?: ReactNode;
  className?: string;
  onPick?: () => void;
}

/** One of a list; the empty choice is "not known" and kept as such. */
export function Pick({ name, label, options, emptyLabel = 'not recorded', hint, className, onPick }: PickProps) {
  // Controlled: options may come after the value, and a select that was filled early would then show nothing.
  const { field } = useController<BatchDraft>({ name });
  // A value that is not among the choices (they could not be read, or it was withdrawn) is kept, and shown as kept.
  const isListed = field.value === null || field.value === undefined || options.some(({ value }) => value === String(field.value));
  return (
    <SelectField
      label={label} options={isListed ? options : [{ value: String(field.value), label: 'kept as it was' }, ...options]} emptyLabel={emptyLabel} hint={hint} {...useFieldSays(name)} {...(className ? { className } : {})}
      name={name} onBlur={field.onBlur} value={field.value === null || field.value === undefined ? '' : String(field.value)}
      onChange={(event) => {
        field.onChange(event.target.value === '' ? null : event.target.value);
        onPick?.();
      }}
    />
  );
}

/** Yes, no, or nothing said. */
export function YesNo({ name, label, hint }: { name: FieldPath<BatchDraft>; label: string; hint?: ReactNode }) {
  const { field } = useController<BatchDraft>({ name });
  const words = { yes: true, no: false } as const;
  return (
    <SelectField
      label={label} hint={hint} emptyLabel="not recorded" options={[{ value: 'yes', label: 'yes' }, { value: 'no', label: 'no' }]} {...useFieldSays(name)}
      name={name} onBlur={field.onBlur} value={field.value === true ? 'yes' : field.value === false ? 'no' : ''}
      onChange={(event) => field.onChange(event.target.value in words ? words[event.target.value as keyof typeof words] : null)}
    />
  );
}

/** Fields in a row that wraps: as many as fit, none narrower than its words need. */
export function FieldRow({ children }: { children: ReactNode }) {
  return <div className="grid grid-cols-[repeat(auto-fill,minmax(13.5rem,1fr))] items-start gap-x-5 gap-y-4 *:min-w-0 *:grid-cols-[minmax(0,1fr)] max-rack:grid-cols-1">{children}</div>;
}
