import { Link } from 'react-router-dom';
import type { LotStanding } from '#shared/words/lot-words.ts';

export const STANDING_WORDS: Record<LotStanding, string> = {
  'in-use': 'in use', 'hot-process-only': 'hot process only', 'on-hold': 'on hold', returned: 'returned', 'used-up': 'used up',
};

/** A kraft tag with a cut corner and a hole: a lot, never a batch. Struck through when it is gone, banded when held. */
export function LotTag({ code, standing = 'in-use', to, isLarge = false }: { code: string; standing?: LotStanding; to?: string; isLarge?: boolean }) {
  const isGone = standing === 'used-up' || standing === 'returned';
  const look = `relative inline-flex items-center bg-kraft font-[640] tracking-[.02em] whitespace-nowrap text-kraft-ink no-underline [font-stretch:118%] ${isLarge ? 'kraft-tag-large h-11 pl-9 pr-5 text-gauge-s' : 'kraft-tag h-5.5 pl-4.5 pr-2.5 text-fine'} ${isGone ? 'line-through' : ''}`;
  const inside = (
    <>
      <span aria-hidden="true" className={`absolute rounded-full bg-board-deep ring-1 ring-[#0006] ${isLarge ? 'left-3.5 size-2.5' : 'left-[7px] size-[5px]'}`} />
      {standing === 'on-hold' && <span aria-hidden="true" className="absolute inset-y-0 right-0 w-1.5 bg-kraft-ink" />}
      {code}
      {standing !== 'in-use' && <span className="sr-only">, {STANDING_WORDS[standing]}</span>}
    </>
  );
  return to ? <Link to={to} className={look}>{inside}</Link> : <span className={look}>{inside}</span>;
}
