import { useId, type ReactNode } from 'react';

export interface FieldShape {
  label: ReactNode;
  /** What would be right, shown while nothing is wrong. */
  hint?: ReactNode;
  error?: string | undefined;
  /** A soft warning: lets pass. */
  warning?: string | undefined;
  isOptional?: boolean;
}

interface FieldFrameProps extends FieldShape {
  children: (ids: { id: string; 'aria-describedby': string | undefined; 'aria-invalid': true | undefined }) => ReactNode;
  className?: string;
}

/** Label, control, and what is to be said about it, tied together for every reader. */
export function FieldFrame({ label, hint, error, warning, isOptional, children, className = '' }: FieldFrameProps) {
  const id = useId();
  const saysId = error || warning || hint ? `${id}-says` : undefined;
  return (
    <div className={`grid content-start gap-1 ${className}`}>
      <label htmlFor={id} className="text-row font-[560]">
        {label}
        {isOptional && <span className="font-normal text-ink-3"> (may stay empty)</span>}
      </label>
      {children({ id, 'aria-describedby': saysId, 'aria-invalid': error ? true : undefined })}
      {error ? (
        <p id={saysId} className="text-note font-[560] text-ink">
          <span aria-hidden="true" className="mr-1 inline-block bg-ink px-1 text-on-ink">!</span>
          {error}
        </p>
      ) : warning ? (
        <p id={saysId} className="border-l-4 border-wait-fill bg-wait-wash px-2 py-1 text-note">{warning}</p>
      ) : hint ? (
        <p id={saysId} className="text-note text-ink-2">{hint}</p>
      ) : null}
    </div>
  );
}

/** Look of every typed control; the edge grows firm when its value is refused. */
export const CONTROL = 'w-full min-h-11 max-rack:min-h-12 coarse:min-h-12 rounded-bar border-[1.5px] border-line-firm bg-lift px-3 text-rail aria-invalid:border-ink aria-invalid:border-2 disabled:bg-sink disabled:text-ink-3';
