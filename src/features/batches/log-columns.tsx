import { ArrowDown, ArrowUp } from 'lucide-react';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { BATCH_SORTS, BatchRow } from '#shared/batches.ts';
import type { FaultView } from '#shared/faults.ts';
import type { ListColumn } from '#src/components/DataTable.tsx';
import { LotTag } from '#src/components/LotTag.tsx';
import { Slice } from '#src/components/Slice.tsx';
import { Strip } from '#src/components/Strip.tsx';
import { formatDay, formatMoney, formatNumber } from '#src/lib/format.ts';
import { toShown, unitSign, type UnitChoice } from '#src/lib/units.ts';
import { METHOD_WORDS } from '#src/lib/words.ts';
import { FaultMarks } from './FaultMarks.tsx';
import { barsOf, lookedAt } from './looked-at.ts';

export type LogSort = (typeof BATCH_SORTS)[number];
export interface LogLinks {
  batch: (batchId: string) => string;
  lot: (lotId: string) => string;
}

interface LogColumnsOptions {
  catalogue: readonly FaultView[];
  currentYear: number;
  currency: string;
  units: UnitChoice;
  links: LogLinks;
  sort: LogSort;
  order: 'asc' | 'desc';
  onSort: (sort: LogSort) => void;
  isSelected: (id: string) => boolean;
  onSelect: (id: string) => void;
}

/** Room for the bars of one batch, in CSS px; many bars get slimmer pieces. */
const BARS_WIDTH = 96;

export const LOG_COLUMN_CLASS: Record<string, string> = {
  select: 'pl-3.5 pr-0', load: 'text-right tabular-nums', water: 'text-right tabular-nums', oils: 'text-right tabular-nums', lost: 'pr-3.5 text-right tabular-nums',
};

/** Where a column's head sorts the log by it. */
export const SORTED_COLUMN: Record<LogSort, string> = { made: 'made', code: 'code', water: 'water', oils: 'oils', load: 'load', worst: 'found' };

/** The scent lots of a batch; where there are none, whatever lots are known stay behind the row. */
export function scentLots(row: BatchRow) {
  return row.lots.filter(({ kind }) => kind === 'fragrance');
}

/** Pieces of a batch's bars, slim enough for a row. */
export function BarsStrip({ row, height = 16 }: { row: Pick<BatchRow, 'bars' | 'dispositions'>; height?: number }) {
  const { pieces, label } = barsOf(row);
  if (pieces.length === 0) return <span className="text-ink-3">not counted</span>;
  return <Strip pieces={pieces} label={label} width={Math.max(2, Math.min(6, BARS_WIDTH / pieces.length - 1))} height={height} gap={1} />;
}

export function logColumns({ catalogue, currentYear, currency, units, links, sort, order, onSort, isSelected, onSelect }: LogColumnsOptions): ListColumn<BatchRow>[] {
  const head = (by: LogSort, words: string, says = words) => () => (
    <SortHead isCurrent={sort === by} order={order} says={says} onPress={() => onSort(by)}>{words}</SortHead>
  );
  const measure = (value: number | null, decimals: number): ReactNode => (value === null ? <span className="text-ink-3" aria-label="not recorded">·</span> : formatNumber(value, decimals));
  return [
    {
      id: 'select',
      header: () => <span className="sr-only">Select</span>,
      cell: ({ row: { original: row } }) => (
        <label className="flex min-h-10 cursor-pointer items-center">
          <input type="checkbox" className="peer sr-only" checked={isSelected(row.id)} onChange={() => onSelect(row.id)} aria-label={`Select ${row.code}`} />
          <span className="rounded-[2px] outline-offset-2 peer-focus-visible:outline-3 peer-focus-visible:outline-focus"><Slice soap={row.palette} width={20} height={24} /></span>
        </label>
      ),
    },
    { id: 'code', header: head('code', 'batch'), cell: ({ row: { original: row } }) => <Link to={links.batch(row.id)} className="stamp no-underline hover:underline">{row.code}</Link> },
    { id: 'made', header: head('made', 'made'), cell: ({ row: { original: row } }) => formatDay(row.madeOn, currentYear) },
    { id: 'method', header: 'method', cell: ({ row: { original: row } }) => METHOD_WORDS[row.method].replace('oven-gelled', 'oven') },
    { id: 'formula', header: 'formula', cell: ({ row: { original: row } }) => row.formulaName ?? <span className="text-ink-3">no formula</span> },
    { id: 'lots', header: 'scent lot', cell: ({ row: { original: row } }) => <LotTags row={row} links={links} /> },
    { id: 'load', header: head('load', 'load %', 'fragrance load'), cell: ({ row: { original: row } }) => measure(row.fragranceFraction === null ? null : row.fragranceFraction * 100, 1) },
    { id: 'water', header: head('water', 'water : lye', 'water to lye'), cell: ({ row: { original: row } }) => measure(row.waterToLye, 2) },
    { id: 'oils', header: head('oils', `oils ${unitSign('temperature', units)}`, 'oil temperature'), cell: ({ row: { original: row } }) => measure(row.oilTemperatureC === null ? null : toShown(row.oilTemperatureC, 'temperature', units), 0) },
    { id: 'maker', header: 'maker', cell: ({ row: { original: row } }) => row.makerName?.split(' ')[0] ?? <span className="text-ink-3">not said</span> },
    { id: 'found', header: head('worst', 'found, worst first', 'worst fault'), cell: ({ row: { original: row } }) => <FaultMarks found={row.found} clear={row.clear} most={4} /> },
    {
      id: 'looked-at',
      header: 'looked at',
      cell: ({ row: { original: row } }) => {
        const { pieces, label } = lookedAt(row, catalogue);
        return pieces.length > 0 ? <Strip pieces={pieces} label={label} width={5} height={16} gap={1} /> : <span className="text-ink-3">nothing yet</span>;
      },
    },
    { id: 'bars', header: 'bars', cell: ({ row: { original: row } }) => <BarsStrip row={row} /> },
    { id: 'lost', header: `lost ${currency}`, cell: ({ row: { original: row } }) => <span className={row.lostMinor === 0 ? 'text-ink-3' : ''}>{formatMoney(row.lostMinor)}</span> },
  ];
}

function LotTags({ row, links }: { row: BatchRow; links: LogLinks }) {
  const lots = scentLots(row);
  if (lots.length === 0) return <span className="text-ink-3">no scent lot</span>;
  return <span className="inline-flex gap-1">{lots.map((lot) => <LotTag key={lot.lotId} code={lot.code} standing={lot.standing} to={links.lot(lot.lotId)} />)}</span>;
}

function SortHead({ isCurrent, order, says, onPress, children }: { isCurrent: boolean; order: 'asc' | 'desc'; says: string; onPress: () => void; children: ReactNode }) {
  const Arrow = order === 'asc' ? ArrowUp : ArrowDown;
  return (
    <button type="button" className={`inline-flex items-center gap-1 coarse:min-h-12 ${isCurrent ? 'font-[680] text-ink' : 'hover:underline'}`} title={`Sort by ${says}`} onClick={onPress}>
      {children}
      {isCurrent && <Arrow size={13} aria-hidden="true" />}
    </button>
  );
}
