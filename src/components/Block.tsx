import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link } from 'react-router-dom';

export type BlockKind = 'main' | 'plain' | 'quiet' | 'stop';

const LOOKS: Record<BlockKind, string> = {
  main: 'bg-ink text-on-ink block-edge-main',
  plain: 'bg-lift block-edge',
  quiet: 'border border-line-firm',
  stop: 'bg-safe-fill text-on-safe block-edge-main',
};

const SIZES = {
  desk: 'min-h-10 max-rack:min-h-12 coarse:min-h-12 px-4 text-body',
  bench: 'min-h-15 px-5 text-bench',
};

function look(kind: BlockKind, size: keyof typeof SIZES, extra: string): string {
  return `inline-flex items-center justify-center gap-2 rounded-bar font-[580] whitespace-nowrap no-underline ${LOOKS[kind]} ${SIZES[size]} ${extra}`;
}

interface BlockProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'className'> {
  kind?: BlockKind;
  size?: keyof typeof SIZES;
  /** What happens just now, shown in place of the label, e.g. "Keeping …". */
  busy?: string | false;
  /** Why it cannot be pressed; becomes its label. */
  waitsFor?: string | undefined;
  className?: string;
  children: ReactNode;
}

/** A button: a block whose edge goes under the finger. Its label says what happens. */
export function Block({ kind = 'plain', size = 'desk', busy = false, waitsFor, className = '', children, type = 'button', disabled, ...rest }: BlockProps) {
  const isStopped = waitsFor !== undefined || disabled;
  return (
    <button
      type={type}
      className={`${look(isStopped ? 'quiet' : kind, size, className)} ${isStopped ? 'bg-sink text-ink-3 cursor-not-allowed' : ''}`}
      disabled={isStopped || busy !== false}
      aria-busy={busy !== false || undefined}
      {...rest}
    >
      {waitsFor ?? (busy === false ? children : busy)}
    </button>
  );
}

/** A link that looks as a block, for going somewhere. */
export function BlockLink({ to, kind = 'plain', size = 'desk', className = '', children, state }: { to: string; kind?: BlockKind; size?: keyof typeof SIZES; className?: string; children: ReactNode; state?: unknown }) {
  return (
    <Link to={to} state={state} className={look(kind, size, className)}>
      {children}
    </Link>
  );
}
