import { tableFeatures, useTable, type ColumnDef, type RowData } from '@tanstack/react-table';
import { useRef, type KeyboardEvent } from 'react';

/** Lists arrive sorted and paged by the server, so the table itself opts into nothing. */
export const listFeatures = tableFeatures({});
export type ListColumn<Row extends RowData> = ColumnDef<typeof listFeatures, Row, unknown>;

interface DataTableProps<Row extends RowData> {
  label: string;
  columns: ListColumn<Row>[];
  rows: Row[];
  rowId: (row: Row) => string;
  onOpen?: (row: Row) => void;
  /** `x` on a row. */
  onSelect?: (row: Row) => void;
  isSelected?: (row: Row) => boolean;
  /** The column the rows are sorted by. */
  sortedBy?: { id: string; direction: 'ascending' | 'descending' };
  /** Classes by column id: for both head and cell, e.g. to leave a column out on a phone. */
  columnClass?: Record<string, string>;
}

function step(from: HTMLElement, by: 1 | -1): void {
  const next = by === 1 ? from.nextElementSibling : from.previousElementSibling;
  if (next instanceof HTMLElement) next.focus();
}

/** Rows under a sticky head. `j` and `k` move, Enter opens; a row's own links and blocks keep working. */
export function DataTable<Row extends RowData>({ label, columns, rows, rowId, onOpen, onSelect, isSelected, sortedBy, columnClass = {} }: DataTableProps<Row>) {
  const body = useRef<HTMLTableSectionElement>(null);
  const table = useTable({ features: listFeatures, columns, data: rows, getRowId: rowId });
  const key = (event: KeyboardEvent<HTMLTableRowElement>, row: Row) => {
    if (event.target !== event.currentTarget) return;
    if (event.key === 'j' || event.key === 'ArrowDown') step(event.currentTarget, 1);
    else if (event.key === 'k' || event.key === 'ArrowUp') step(event.currentTarget, -1);
    else if (event.key === 'Enter') onOpen?.(row);
    else if (event.key === 'x' && onSelect) onSelect(row);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div role="region" aria-label={label} tabIndex={0} className="relative tray-edge overflow-x-auto rounded-[2px] bg-tray">
      <table className="w-full border-collapse">
        <thead className="sticky top-0 bg-tray">
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id} className="border-b-2 border-ink">
              {group.headers.map((header) => (
                <th key={header.id} scope="col" aria-sort={sortedBy?.id === header.column.id ? sortedBy.direction : undefined} className={`px-2.5 pb-1.5 pt-2 text-left align-bottom text-note font-[560] whitespace-nowrap text-ink-2 ${columnClass[header.column.id] ?? ''}`}>
                  <table.FlexRender header={header} />
                </th>
              ))}
            </tr>
          ))}
        </thead>
        <tbody ref={body}>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} tabIndex={0} data-row={row.id} className={`border-t border-line ${isSelected?.(row.original) ? 'bg-wait-wash' : 'hover:bg-lift focus-visible:bg-lift'}`} onKeyDown={(event) => key(event, row.original)}>
              {row.getAllCells().map((cell) => (
                <td key={cell.id} className={`h-10 px-2.5 text-row whitespace-nowrap coarse:h-13 ${columnClass[cell.column.id] ?? ''}`}>
                  <table.FlexRender cell={cell} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
