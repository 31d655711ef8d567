import type { ReactNode } from 'react';
import { CallProblem, NoReception } from '#src/lib/call.ts';
import { Block } from './Block.tsx';

/** Nothing yet: how many are there of how many needed, and the next act. */
export function EmptyState({ title, children, act }: { title: ReactNode; children?: ReactNode; act?: ReactNode }) {
  return (
    <div className="grid justify-items-start gap-3 py-8">
      <p className="say text-gauge-s">{title}</p>
      {children && <p className="max-w-prose text-ink-2">{children}</p>}
      {act}
    </div>
  );
}

/** Coming: the part's own shape, and in words what is being counted. No spinner, no shimmer. */
export function LoadingShape({ says, rows = 6, rowClassName = 'h-10' }: { says: string; rows?: number; rowClassName?: string }) {
  return (
    <div role="status" aria-label={says} className="grid gap-px py-2">
      {Array.from({ length: rows }, (_row, index) => (
        <div key={index} className={`${rowClassName} bg-sink`} />
      ))}
      <span className="sr-only">{says}</span>
    </div>
  );
}

/** Went wrong: what, that the records are safe, try again, and a reference to tell us. */
export function ErrorState({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  const problem = error instanceof CallProblem ? error.problem : undefined;
  const title = problem?.title ?? (error instanceof NoReception ? 'No reception' : 'This could not be shown');
  return (
    <div role="alert" className="grid justify-items-start gap-2 border-l-4 border-ink bg-tray px-4 py-4">
      <p className="text-rail font-[640]">{title}</p>
      <p className="max-w-prose text-ink-2">{(problem?.detail ?? (error instanceof Error ? error.message : 'Something went wrong')).replace(/\.$/, '')}. Your records are safe.</p>
      {problem?.instance && problem.status >= 500 && <p className="text-note text-ink-2">Reference: {problem.instance}</p>}
      {onRetry && <Block onClick={onRetry}>Try again</Block>}
    </div>
  );
}

/** Not allowed: says who can. */
export function NotAllowed({ children }: { children: ReactNode }) {
  return <p className="border-l-4 border-line-firm bg-tray px-4 py-3 text-ink-2">{children}</p>;
}
