import { useMemo, useRef, useState, type KeyboardEvent } from 'react';
import type { BoardFault, CauseCell, CausesBoard } from '#shared/causes.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { GROUP_WORDS, CellIndex, type BoardColumn } from './board-columns.ts';
import { BoardCell } from './BoardCell.tsx';
import { cellName, type BoardNames } from './cause-words.ts';

interface BoardGridProps {
  board: CausesBoard;
  faults: readonly BoardFault[];
  columns: readonly BoardColumn[];
  names: BoardNames;
  linkOf: (cell: CauseCell) => string;
  /** Place of the cell somebody came back from, "fault input level". */
  startAt?: string | undefined;
}

/** Where a key leads from a cell; null when it is not a key of the grid. */
function moved(key: string, [row, column]: [number, number], rows: number, columns: number): [number, number] | null {
  switch (key) {
    case 'ArrowRight': return [row, Math.min(columns - 1, column + 1)];
    case 'ArrowLeft': return [row, Math.max(0, column - 1)];
    case 'ArrowDown': return [Math.min(rows - 1, row + 1), column];
    case 'ArrowUp': return [Math.max(0, row - 1), column];
    case 'Home': return [row, 0];
    case 'End': return [row, columns - 1];
    default: return null;
  }
}

/** Faults against inputs, a wire in every cell. Arrows move from cell to cell, Enter opens; the fault column stays. */
export function BoardGrid({ board, faults, columns, names, linkOf, startAt }: BoardGridProps) {
  const index = useMemo(() => new CellIndex(board), [board]);
  const grid = useRef<HTMLTableElement>(null);
  const [current, setCurrent] = useState<[number, number]>(() => placeOf(startAt, faults, columns));
  const move = (event: KeyboardEvent) => {
    const next = moved(event.key, current, faults.length, columns.length);
    if (!next || event.metaKey || event.altKey || event.ctrlKey) return;
    event.preventDefault();
    setCurrent(next);
    const cell = grid.current?.querySelector<HTMLElement>(`[data-place="${next.join(' ')}"]`);
    cell?.focus();
    cell?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  };
  const groups = groupsOf(columns);
  return (
    <div role="region" aria-label="The board" tabIndex={-1} className="tray-edge max-h-[86vh] overflow-auto bg-tray">
      <table ref={grid} role="grid" aria-label="Faults against inputs" aria-rowcount={faults.length + 2} className="border-separate border-spacing-0" onKeyDown={move}>
        <thead className="sticky top-0 z-20 bg-tray">
          <tr>
            <th scope="col" rowSpan={2} className="sticky left-0 z-30 w-44 min-w-44 border-b-2 border-r-2 border-ink bg-tray px-3 pb-2 text-left align-bottom text-row font-[640] max-rack:w-34 max-rack:min-w-34 max-rack:px-2">
              Fault<span className="block text-fine font-normal">found of looked at</span>
            </th>
            {groups.map(({ group, size }) => (
              <th key={group} scope="colgroup" colSpan={size} className="border-r-2 border-ink px-2 pt-2 text-left text-row font-[640] last:border-r-0">{GROUP_WORDS[group]}</th>
            ))}
          </tr>
          <tr>
            {columns.map((column, at) => (
              <th key={column.key} scope="col" className={`w-21 min-w-21 max-w-28 border-b-2 border-b-ink px-1.5 pb-2 text-left align-bottom text-fine leading-tight font-[600] break-words ${edge(columns, at)}`}>
                {column.label}
                {column.detail && <span className="block font-normal">{column.detail}</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {faults.map((fault, row) => (
            <tr key={fault.fault} className="h-11.75">
              <th scope="row" className="sticky left-0 z-10 border-b border-r-2 border-b-line border-r-ink bg-tray px-3 text-left font-normal max-rack:px-2">
                <span className="flex items-center gap-2">
                  <FaultMark fault={fault.fault} name="" size={24} />
                  <span className="min-w-0 leading-tight"><span className="block text-row font-[560]">{fault.name}</span><span className="block text-fine text-ink-2">{fault.found} of {fault.checked}</span></span>
                </span>
              </th>
              {columns.map((column, at) => {
                const cell = index.at(fault.fault, column);
                return (
                  <td key={column.key} role="gridcell" className={`h-11.75 border-b border-b-line p-0 ${edge(columns, at)}`} onFocus={() => setCurrent([row, at])}>
                    {cell && <BoardCell cell={cell} name={cellName(cell, column, names)} to={linkOf(cell)} place={`${row} ${at}`} isCurrent={current[0] === row && current[1] === at} />}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Groups are parted by ink, columns by a line. */
function edge(columns: readonly BoardColumn[], at: number): string {
  const next = columns[at + 1];
  if (!next) return '';
  return next.input.group === columns[at]?.input.group ? 'border-r border-r-line' : 'border-r-2 border-r-ink';
}

function groupsOf(columns: readonly BoardColumn[]): { group: BoardColumn['input']['group']; size: number }[] {
  const groups: { group: BoardColumn['input']['group']; size: number }[] = [];
  for (const { input: { group } } of columns) {
    const last = groups.at(-1);
    if (last?.group === group) last.size++;
    else groups.push({ group, size: 1 });
  }
  return groups;
}

function placeOf(startAt: string | undefined, faults: readonly BoardFault[], columns: readonly BoardColumn[]): [number, number] {
  if (startAt === undefined) return [0, 0];
  const [fault, input, level = ''] = startAt.split(' ');
  const row = faults.findIndex((one) => one.fault === fault);
  const column = columns.findIndex(({ key }) => key === `${input}\n${level}`);
  return [Math.max(0, row), Math.max(0, column)];
}
