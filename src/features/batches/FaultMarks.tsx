import { useQuery } from '@tanstack/react-query';
import type { BatchRow } from '#shared/batches.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';

/** A fault's name by its slug; the slug in words while the catalogue is on its way. */
export function useFaultName(): (slug: string) => string {
  const catalogue = useQuery(faultsQuery).data;
  return (slug) => catalogue?.find((fault) => fault.slug === slug)?.name ?? slug.replaceAll('-', ' ');
}

/** Marks of what was found, worst first; "clear" when all that was answered is; "not looked at" when nothing was. */
export function FaultMarks({ found, clear, most = 6 }: Pick<BatchRow, 'found' | 'clear'> & { most?: number }) {
  const nameOf = useFaultName();
  if (found.length === 0) return <span className="text-ink-3">{clear.length > 0 ? 'clear' : 'not looked at'}</span>;
  return (
    <span className="inline-flex flex-wrap items-center gap-x-2.5 gap-y-1">
      {found.slice(0, most).map(({ fault, severity }) => <FaultMark key={fault} fault={fault} name={nameOf(fault)} severity={severity} />)}
      {found.length > most && <span className="text-note text-ink-2">and {found.length - most} more</span>}
    </span>
  );
}
