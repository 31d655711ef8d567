import { Camera } from 'lucide-react';
import type { DueInspection } from '#shared/inspections.ts';
import { BlockLink } from '#src/components/Block.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Flag } from '#src/components/Flag.tsx';
import { Slice } from '#src/components/Slice.tsx';
import { formatCount, formatDay } from '#src/lib/format.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';

const MARKS = 6;

/** When a look was wanted, in words. */
export function DueFlag({ due }: { due: DueInspection }) {
  if (due.standing === 'coming') return <Flag kind="draft">{formatDay(due.dueOn)}</Flag>;
  if (due.standing === 'due') return <Flag kind="today">{due.daysLate === 0 ? 'today' : `since ${formatDay(due.dueOn)}`}</Flag>;
  return <Flag kind="late">{formatCount(due.daysLate, 'day')} late</Flag>;
}

/** Looks in walking order, late ones first; each leads to its own checklist. */
export function DueList({ items, addressOf, faultName }: { items: readonly DueInspection[]; addressOf: (due: DueInspection) => string; faultName: (slug: string) => string }) {
  return (
    <ul>
      {items.map((due) => (
        <li key={`${due.batchId} ${due.stage}`} className="grid min-h-14 grid-cols-[1.6rem_7rem_6rem_minmax(0,1fr)_8rem_auto] items-center gap-x-3 border-b border-line py-1.5 max-rack:grid-cols-[1.6rem_1fr_auto] max-rack:gap-y-1">
          <Slice soap={due.palette} />
          <span className="stamp text-row">{due.batchCode}</span>
          <span className="font-[560] max-rack:hidden">{STAGE_WORDS[due.stage]}</span>
          <span className="flex flex-wrap items-center gap-1 max-rack:hidden">
            {due.mustAnswer.slice(0, MARKS).map((fault) => <FaultMark key={fault} fault={fault} name={faultName(fault)} />)}
            {due.mustAnswer.length > MARKS && <span className="text-note text-ink-2">and {due.mustAnswer.length - MARKS} more</span>}
          </span>
          <span className="max-rack:col-start-2 max-rack:row-start-2 max-rack:flex max-rack:gap-2"><span className="hidden text-note max-rack:inline">{STAGE_WORDS[due.stage]}</span><DueFlag due={due} /></span>
          <BlockLink to={addressOf(due)} className="max-rack:col-start-3 max-rack:row-span-2 max-rack:row-start-1"><Camera size={18} aria-hidden="true" />Look</BlockLink>
        </li>
      ))}
    </ul>
  );
}
