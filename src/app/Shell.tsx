import { Camera, LayoutGrid, List, MoreHorizontal, Moon, Sun } from 'lucide-react';
import { useEffect, useMemo, useState } from 'react';
import { Link, NavLink, Outlet, useNavigate } from 'react-router-dom';
import { UploadsLine } from '#src/features/photos/UploadsLine.tsx';
import { useSession } from '#src/features/session/session.queries.ts';
import { setSingleKeys, useKeys } from '#src/lib/keys.ts';
import { setRoom, useRoom } from '#src/lib/room.ts';
import { BENCH, DESK } from './navigation.ts';
import { FindField } from './FindField.tsx';
import { KeyList } from './KeyList.tsx';
import { paths } from './paths.ts';
import { PersonMenu } from './PersonMenu.tsx';
import { SignedOutNotice } from './SignedOutNotice.tsx';

const BAR = 'flex h-9.5 shrink-0 items-center whitespace-nowrap bg-board px-3 text-row font-[500] no-underline shadow-[inset_0_1px_var(--color-edge-lit),inset_1px_0_var(--color-edge-lit)] hover:bg-tray aria-[current=page]:z-10 aria-[current=page]:-mb-2 aria-[current=page]:h-11.5 aria-[current=page]:rounded-b-bar aria-[current=page]:bg-ink aria-[current=page]:font-[620] aria-[current=page]:text-on-ink aria-[current=page]:shadow-none max-bench:aria-[current=page]:mb-0 max-bench:h-12 max-bench:aria-[current=page]:h-12';

/** A row of bars; the current one is pushed out of the loaf. */
function NavLoaf({ bars }: { bars: readonly { label: string; to: string }[] }) {
  return (
    <div className="flex items-end gap-0.5 first:[&>a:first-child]:rounded-tl-loaf [&>a:first-child]:rounded-tl-loaf [&>a:last-child]:rounded-tr-loaf">
      {bars.map(({ label, to }) => (
        <NavLink key={to} to={to} end={to === '/'} className={BAR}>{label}</NavLink>
      ))}
    </div>
  );
}

function RoomToggle() {
  const room = useRoom();
  return (
    <button type="button" className="flex min-h-10 min-w-10 items-center justify-center rounded-bar border border-line-firm bg-tray coarse:min-h-12 coarse:min-w-12" aria-label={room === 'day' ? 'Evening light' : 'Day light'} onClick={() => setRoom(room === 'day' ? 'evening' : 'day')}>
      {room === 'day' ? <Moon size={18} aria-hidden="true" /> : <Sun size={18} aria-hidden="true" />}
    </button>
  );
}

const FOOT = 'grid min-h-14 flex-1 place-items-center content-center gap-0.5 bg-board text-note font-[560] no-underline shadow-[inset_0_1px_var(--color-edge-lit)] aria-[current=page]:-mt-1.5 aria-[current=page]:bg-ink aria-[current=page]:text-on-ink aria-[current=page]:shadow-none';

function FootBar({ onMore, isMoreOpen }: { onMore: () => void; isMoreOpen: boolean }) {
  return (
    <nav aria-label="Main, at the foot" className="no-print fixed inset-x-0 bottom-0 z-20 flex gap-0.5 bg-board-deep px-1 pb-1.5 pt-1 rack:hidden">
      <NavLink to={paths.today} end className={FOOT}><List size={22} aria-hidden="true" />Today</NavLink>
      <NavLink to={paths.inspect} className={FOOT}><Camera size={22} aria-hidden="true" />Inspect</NavLink>
      <NavLink to={paths.batches} className={FOOT}><LayoutGrid size={22} aria-hidden="true" />Batches</NavLink>
      <button type="button" className={FOOT} aria-expanded={isMoreOpen} onClick={onMore}><MoreHorizontal size={22} aria-hidden="true" />More</button>
    </nav>
  );
}

/** The frame around every screen of somebody signed in. */
export function Shell() {
  const navigate = useNavigate();
  const [isMoreOpen, setMoreOpen] = useState(false);
  const [areKeysOpen, setKeysOpen] = useState(false);
  const keys = useMemo(() => ({
    ...Object.fromEntries([...BENCH, ...DESK].map(({ key, to }) => [`g ${key}`, () => void navigate(to)])),
    '/': () => document.querySelector<HTMLInputElement>('#find')?.focus(),
    '?': () => setKeysOpen(true),
  }), [navigate]);
  useKeys(keys);
  const { singleKeys } = useSession().account;
  useEffect(() => setSingleKeys(singleKeys), [singleKeys]);
  return (
    <>
      <header className="no-print relative z-10 grid grid-cols-[auto_minmax(0,1fr)_auto] items-end gap-x-6 bg-board-deep px-5 max-bench:grid-cols-[minmax(0,1fr)_auto] max-rack:px-4">
        <a href="#main" className="absolute left-3 top-2 -translate-y-20 bg-lift p-2 focus:z-30 focus:translate-y-0">Skip to the work</a>
        <Link to={paths.today} className="flex h-14.5 items-center gap-2 text-[1.0625rem] font-[660] no-underline [font-stretch:124%] max-bench:h-12.5">
          <svg width="30" height="22" viewBox="0 0 30 22" aria-hidden="true"><path d="M1 4h15v14H1zM18 4h3v14h-3zM24 8h5v14h-5z" fill="currentColor" /></svg>
          Loafmark
        </Link>
        <nav aria-label="Main" className="flex items-end gap-3.5 max-bench:order-last max-bench:col-span-2 max-bench:overflow-x-auto max-rack:hidden">
          <NavLoaf bars={BENCH} />
          <NavLoaf bars={DESK} />
        </nav>
        <div className="flex h-14.5 items-center gap-2 max-bench:h-12.5">
          <FindField />
          <RoomToggle />
          <PersonMenu onKeys={() => setKeysOpen(true)} />
        </div>
      </header>
      <UploadsLine batchAddress={paths.batch} />
      <main id="main" tabIndex={-1} className="mx-auto w-full max-w-[107.5rem] flex-1 px-5 pb-10 pt-6 outline-none max-rack:px-4 max-rack:pb-24 max-rack:pt-4">
        <Outlet />
      </main>
      <FootBar isMoreOpen={isMoreOpen} onMore={() => setMoreOpen(!isMoreOpen)} />
      {isMoreOpen && (
        <nav aria-label="More" className="fixed inset-x-0 bottom-17 z-20 grid grid-cols-2 gap-0.5 border-t-2 border-ink bg-board-deep p-1 rack:hidden" onClick={() => setMoreOpen(false)}>
          {DESK.map(({ label, to }) => (
            <NavLink key={to} to={to} className="flex min-h-14 items-center bg-board px-4 text-rail font-[560] no-underline aria-[current=page]:bg-ink aria-[current=page]:text-on-ink">{label}</NavLink>
          ))}
        </nav>
      )}
      <SignedOutNotice />
      <KeyList isOpen={areKeysOpen} onClose={() => setKeysOpen(false)} />
    </>
  );
}
