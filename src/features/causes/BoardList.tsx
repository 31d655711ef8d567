import { Link } from 'react-router-dom';
import type { BoardFault, CauseCell } from '#shared/causes.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Grade, GRADE_SETTING } from '#src/components/Grade.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Wire } from '#src/components/Wire.tsx';
import { countWords, subjectOf, type BoardNames } from './cause-words.ts';
import { byGrade, isFirm } from './standing-cells.ts';

/** So many lines a fault before the rest is only counted. */
const MOST_LINES = 6;

/** The board fault by fault, for a narrow screen or who reads rather than scans. */
export function BoardList({ cells, faults, names, linkOf }: { cells: readonly CauseCell[]; faults: readonly BoardFault[]; names: BoardNames; linkOf: (cell: CauseCell) => string }) {
  return (
    <div className="grid gap-7">
      {faults.map((fault) => {
        const own = cells.filter((cell) => cell.fault === fault.fault);
        const firm = own.filter(isFirm).sort(byGrade);
        const noDifference = own.filter((cell) => cell.grade === 'no-difference').length;
        const few = own.filter((cell) => cell.grade === 'too-few').length;
        return (
          <section key={fault.fault} aria-label={fault.name}>
            <Rail level={2} heading={<span className="inline-flex items-center gap-2"><FaultMark fault={fault.fault} name="" size={24} />{fault.name}</span>} aside={`${fault.found} of ${fault.checked} found`} />
            {firm.slice(0, MOST_LINES).map((cell) => (
              <Link key={`${cell.input} ${cell.level}`} to={linkOf(cell)} className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-3 border-b border-line py-2 no-underline hover:bg-tray coarse:py-3">
                <span className={`leading-tight ${GRADE_SETTING[cell.grade]}`}>{cell.level !== null && cell.direction === 'less' ? `${subjectOf(cell, names)}: less` : subjectOf(cell, names)}</span>
                <Wire grade={cell.grade} estimate={cell.estimate} lower={cell.lower} upper={cell.upper} raw={cell.rawEstimate} width={110} height={20} />
                <span className="text-note text-ink-2">{countWords(cell)}</span>
                <span className="justify-self-end text-note"><Grade grade={cell.grade} wordOnly /></span>
              </Link>
            ))}
            <p className="pt-2 text-note text-ink-2">
              {firm.length === 0 && 'Nothing goes with it so far. '}
              {firm.length > MOST_LINES && `${firm.length - MOST_LINES} more hints. `}
              {noDifference > 0 && `${noDifference} with no difference seen. `}
              {few > 0 && `${few} with too few to say.`}
            </p>
          </section>
        );
      })}
    </div>
  );
}
