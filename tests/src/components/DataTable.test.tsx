import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { DataTable, type ListColumn } from '#src/components/DataTable.tsx';

interface Shelf { code: string }

const COLUMNS: ListColumn<Shelf>[] = [
  { id: 'code', header: 'Batch', cell: ({ row }) => <a href={`#${row.original.code}`}>{row.original.code}</a> },
];
const ROWS = [{ code: 'QL-0001' }, { code: 'QL-0002' }, { code: 'QL-0003' }];

function rowOf(code: string): HTMLElement {
  return screen.getByRole('row', { name: code });
}

describe('DataTable', () => {
  it('moves with j and k, stops at its ends, and opens on Enter', async () => {
    const onOpen = vi.fn();
    render(<DataTable label="Batches" columns={COLUMNS} rows={ROWS} rowId={({ code }) => code} onOpen={onOpen} />);
    rowOf('QL-0001').focus();
    await userEvent.keyboard('jjj');
    expect(rowOf('QL-0003')).toHaveFocus();
    await userEvent.keyboard('k{Enter}');
    expect(onOpen).toHaveBeenCalledExactlyOnceWith({ code: 'QL-0002' });
  });

  it('leaves Enter on a row’s own link to the link', async () => {
    const onOpen = vi.fn();
    render(<DataTable label="Batches" columns={COLUMNS} rows={ROWS} rowId={({ code }) => code} onOpen={onOpen} />);
    screen.getByRole('link', { name: 'QL-0002' }).focus();
    await userEvent.keyboard('{Enter}');
    expect(onOpen).not.toHaveBeenCalled();
  });
});
