import { Link } from 'react-router-dom';
import type { BatchRow } from '#shared/batches.ts';
import { LotTag } from '#src/components/LotTag.tsx';
import { Slice } from '#src/components/Slice.tsx';
import { formatDay } from '#src/lib/format.ts';
import { FaultMarks } from './FaultMarks.tsx';
import { scentLots, type LogLinks } from './log-columns.tsx';

interface LogPartProps {
  rows: readonly BatchRow[];
  currentYear: number;
  links: LogLinks;
}

/** The log on a phone: face, code, day, tag and marks; the rest is behind the row. */
export function LogRows({ rows, currentYear, links }: LogPartProps) {
  return (
    <ul aria-label="Batches" className="-mx-4 border-y border-line bg-tray">
      {rows.map((row) => (
        <li key={row.id} className="border-t border-line first:border-t-0">
          <Link to={links.batch(row.id)} className="grid min-h-16 grid-cols-[1.75rem_1fr_auto] gap-x-3 gap-y-1 px-3 py-2.5 no-underline">
            <Slice soap={row.palette} width={22} height={26} />
            <span className="stamp">{row.code}</span>
            <span className="text-row">{formatDay(row.madeOn, currentYear)}</span>
            <span className="col-span-2 col-start-2 flex flex-wrap gap-1">{scentLots(row).map((lot) => <LotTag key={lot.lotId} code={lot.code} standing={lot.standing} />)}</span>
            <span className="col-span-2 col-start-2 text-row"><FaultMarks found={row.found} clear={row.clear} /></span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** The same batches as a wall of their cut faces. */
export function LogFaces({ rows, currentYear, links }: LogPartProps) {
  return (
    <ul aria-label="Faces of the batches" className="grid grid-cols-[repeat(auto-fill,minmax(7.25rem,1fr))] gap-x-3 gap-y-6 pt-2">
      {rows.map((row) => (
        <li key={row.id}>
          <Link to={links.batch(row.id)} className="grid justify-items-center gap-1.5 no-underline hover:bg-tray">
            <span className="grid w-full justify-items-center border-b-5 border-ink"><Slice soap={row.palette} width={72} height={84} /></span>
            <span className="stamp text-note">{row.code}</span>
            <span className="text-note text-ink-2">{formatDay(row.madeOn, currentYear)}</span>
            <span className="min-h-6 text-note"><FaultMarks found={row.found} clear={row.clear} most={3} /></span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
