import { Grade, type GradeCode } from '#src/components/Grade.tsx';

const MEANS: readonly (readonly [GradeCode, string])[] = [
  ['settled', 'clear of the line on every check'], ['likely', 'clear of the line, one check open'], ['hint', 'leans one way, may be chance'],
  ['no-difference', 'the range lies close to the line'], ['too-few', 'too little to say anything'], ['not-told-apart', 'moved together with something else'],
];

/** How a wire is read; stands beside the board, not behind a question mark. */
export function WireKey() {
  return (
    <aside aria-label="How to read a wire" className="bg-tray px-3.5 py-3">
      <h2 className="text-row">Each cell is a wire.</h2>
      <svg viewBox="0 0 320 56" className="fill-keeps mt-1 block w-full max-w-80" role="img" aria-label="Right of the line goes with more, left with less; the bar is the 95 % range, the dotted tick the raw count">
        <path d="M108 2v32" className="stroke-ink-3" />
        <text x="4" y="22" className="fill-less text-note font-[600]">goes with less</text>
        <path d="M146 18h116" strokeWidth="5" className="stroke-more-fill" /><rect x="198" y="12" width="8" height="12" className="fill-more-fill" />
        <path d="M238 6v24" strokeWidth="1.5" strokeDasharray="2 2" className="stroke-ink" />
        <text x="108" y="50" textAnchor="middle" className="fill-ink-2 text-fine">no difference</text>
        <text x="196" y="50" textAnchor="middle" className="fill-ink-2 text-fine">95 % range</text>
        <text x="270" y="50" textAnchor="middle" className="fill-ink-2 text-fine">raw count</text>
      </svg>
      <dl className="m-0 grid gap-y-0.5">
        {MEANS.map(([grade, means]) => (
          <div key={grade} className="grid grid-cols-[11.5rem_1fr] items-center gap-x-2"><dt className="text-row"><Grade grade={grade} /></dt><dd className="m-0 text-note text-ink-2">{means}</dd></div>
        ))}
      </dl>
    </aside>
  );
}
