import { Link } from 'react-router-dom';
import type { CauseCell } from '#shared/causes.ts';
import { Grade, GRADE_SETTING } from '#src/components/Grade.tsx';
import { countWords, predicateOf, subjectOf, type BoardNames } from './cause-words.ts';

/** The sentences that stand, each set as firmly as what is behind it; each opens its cause. */
export function StandingSentences({ cells, names, linkOf }: { cells: readonly CauseCell[]; names: BoardNames; linkOf: (cell: CauseCell) => string }) {
  return (
    <ol className="m-0 list-none p-0" aria-label="What stands, firmest first">
      {cells.map((cell) => (
        <li key={`${cell.fault} ${cell.input} ${cell.level}`} className="grid grid-cols-[minmax(0,1fr)_9rem_12rem] items-center gap-x-4 border-b border-line py-2 max-bench:grid-cols-1 max-bench:py-2.5">
          <Link to={linkOf(cell)} className={`text-gauge-s leading-tight no-underline hover:underline coarse:py-1.5 ${GRADE_SETTING[cell.grade]}`}>
            {subjectOf(cell, names)} {predicateOf(cell, names)}
          </Link>
          <Grade grade={cell.grade} />
          <span className="text-note text-ink-2">{countWords(cell)}{cell.moreNeeded !== null && `, about ${cell.moreNeeded} more would tell`}</span>
        </li>
      ))}
    </ol>
  );
}
