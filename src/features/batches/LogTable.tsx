import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { BatchRow } from '#shared/batches.ts';
import { DataTable } from '#src/components/DataTable.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { useSession } from '#src/features/session/session.queries.ts';
import { useKeys } from '#src/lib/keys.ts';
import type { BatchesAsk } from './batches.queries.ts';
import { LOG_COLUMN_CLASS, logColumns, SORTED_COLUMN, type LogLinks, type LogSort } from './log-columns.tsx';

interface LogTableProps {
  rows: BatchRow[];
  ask: BatchesAsk;
  onAsk: (ask: BatchesAsk) => void;
  links: LogLinks;
  onOpen: (batchId: string) => void;
  selected: ReadonlySet<string>;
  onSelect: (batchId: string) => void;
  currentYear: number;
}

/** The log as rows. `j` and `k` move, Enter opens, `x` selects. */
export function LogTable({ rows, ask, onAsk, links, onOpen, selected, onSelect, currentYear }: LogTableProps) {
  const { account, workshop } = useSession();
  const catalogue = useQuery(faultsQuery).data;
  const { sort = 'made', order = 'desc' } = ask;
  const columns = useMemo(() => {
    // The first press on a head shows the most first; a second turns it round.
    const onSort = (by: LogSort) => onAsk({ ...ask, sort: by, order: by === sort && order === 'desc' ? 'asc' : 'desc' });
    return logColumns({ catalogue: catalogue ?? [], currentYear, currency: workshop.currency, units: account, links, sort, order, onSort, isSelected: (id) => selected.has(id), onSelect });
  }, [catalogue, currentYear, workshop.currency, account, links, sort, order, ask, onAsk, selected, onSelect]);
  useKeys(useMemo(() => {
    const first = () => document.querySelector<HTMLElement>('tr[data-row]')?.focus();
    return { j: first, k: first };
  }, []));
  return (
    <DataTable
      label="Batches"
      columns={columns}
      rows={rows}
      rowId={(row) => row.id}
      onOpen={(row) => onOpen(row.id)}
      onSelect={(row) => onSelect(row.id)}
      isSelected={(row) => selected.has(row.id)}
      sortedBy={{ id: SORTED_COLUMN[sort], direction: order === 'asc' ? 'ascending' : 'descending' }}
      columnClass={LOG_COLUMN_CLASS}
    />
  );
}
