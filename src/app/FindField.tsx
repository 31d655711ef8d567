import { Search } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import { paths } from './paths.ts';

/** Finds batches by code, note, lot or formula; the log shows what was found. */
export function FindField() {
  const navigate = useNavigate();
  return (
    <form
      role="search"
      className="relative max-rack:hidden"
      onSubmit={(event) => {
        event.preventDefault();
        const words = new FormData(event.currentTarget).get('find');
        void navigate(`${paths.batches}?find=${encodeURIComponent(String(words ?? ''))}`);
      }}
    >
      <Search size={17} aria-hidden="true" className="pointer-events-none absolute left-2.5 top-1/2 -translate-y-1/2" />
      <input id="find" name="find" type="search" autoComplete="off" aria-label="Find a batch or lot" placeholder="Batch or lot" maxLength={80} className="h-10 w-38 rounded-bar border border-line-firm bg-tray pl-9 pr-2 text-row placeholder:text-ink-3 max-desk:w-32 coarse:h-12" />
    </form>
  );
}
