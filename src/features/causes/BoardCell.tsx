import { memo } from 'react';
import { Link } from 'react-router-dom';
import type { CauseCell } from '#shared/causes.ts';
import { Wire } from '#src/components/Wire.tsx';

const WASH = { more: 'bg-more-wash', less: 'bg-less-wash', none: '' } as const;

/** One wire of the board, with the counts it was cut from; opens its cause. */
export const BoardCell = memo(function BoardCell({ cell, name, to, place, isCurrent }: { cell: CauseCell; name: string; to: string; place: string; isCurrent: boolean }) {
  const focus = { tabIndex: isCurrent ? 0 : -1, 'data-place': place };
  if (cell.grade === 'comes-after') return <span {...focus} aria-label={name} className="grid h-full place-items-center text-tick text-ink-2 outline-offset-[-3px]">comes after</span>;
  const isSettled = cell.grade === 'settled';
  if (cell.exposedN === 0 && cell.unexposedN === 0) return <span {...focus} aria-label={name} className="grid h-full place-items-center text-ink-3 outline-offset-[-3px]">·</span>;
  return (
    <Link {...focus} to={to} aria-label={name} className={`grid h-full content-center justify-items-center gap-0.5 no-underline outline-offset-[-3px] hover:bg-lift ${isSettled ? WASH[cell.direction] : ''}`}>
      <Wire grade={cell.grade} estimate={cell.estimate} lower={cell.lower} upper={cell.upper} raw={['settled', 'likely', 'hint'].includes(cell.grade) ? cell.rawEstimate : null} width={70} height={17} />
      <span className={`text-tick whitespace-nowrap ${isSettled || cell.grade === 'likely' ? 'font-[640]' : 'text-ink-2'}`}>{shortCount(cell)}</span>
    </Link>
  );
});

/** "8/10 · 6/104": both sides for what could be the cause, found of looked at for a number. */
function shortCount(cell: CauseCell): string {
  if (cell.level === null) return `${cell.events}/${cell.n}`;
  return ['settled', 'likely', 'hint'].includes(cell.grade) ? `${cell.exposedEvents}/${cell.exposedN} · ${cell.unexposedEvents}/${cell.unexposedN}` : `${cell.exposedEvents}/${cell.exposedN}`;
}
