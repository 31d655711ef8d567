import type { CausesBoard } from '#shared/causes.ts';
import { Rail } from '#src/components/Rail.tsx';
import { formatCount } from '#src/lib/format.ts';
import { LEFT_OUT_WORDS, subjectOf, type BoardNames } from './cause-words.ts';

/** What the board cannot say, by name: what moved together, what was left out, what lies on the path. */
export function BoardNotes({ board, names }: { board: CausesBoard; names: BoardNames }) {
  const ties = tiesOf(board, names);
  const { leftOut, questions, batches } = board.generatedFrom;
  const notLooked = board.faults.reduce((sum, fault) => sum + fault.notChecked, 0);
  const notYet = board.faults.reduce((sum, fault) => sum + fault.notYet, 0);
  const never = board.faults.filter((fault) => fault.found === 0);
  const onPath = board.cells.some((cell) => cell.onThePath.includes('gel'));
  return (
    <div className="mt-8 grid gap-x-8 gap-y-7 bench:grid-cols-3">
      <section>
        <Rail level={3} heading="Cannot be told apart" />
        {ties.length === 0 ? <p className="pt-2 text-row text-ink-2">Nothing that was asked moved together with something else.</p> : (
          <ul className="m-0 list-none p-0">
            {ties.map(({ what, withWhat }) => <li key={what} className="border-b border-line py-2 text-row"><b>{what}</b> was only made with {withWhat}. A trial pour without it would tell.</li>)}
          </ul>
        )}
      </section>
      <section>
        <Rail level={3} heading="Left out" />
        <ul className="m-0 list-none p-0 text-row">
          {leftOut.map(({ reason, count }) => <li key={reason} className="border-b border-line py-2">{formatCount(count, 'batch', 'batches')} {LEFT_OUT_WORDS[reason] ?? reason}</li>)}
          <li className="border-b border-line py-2">{formatCount(notLooked, 'answer')} that nobody gave: never taken for clear</li>
          {notYet > 0 && <li className="border-b border-line py-2">{formatCount(notYet, 'answer')} that cannot be given yet, the loaf being too young</li>}
          {never.length > 0 && <li className="border-b border-line py-2">{formatCount(never.length, 'fault')} never found: {never.map(({ name }) => name.toLowerCase()).join(', ')}</li>}
        </ul>
      </section>
      <section>
        <Rail level={3} heading="How it was worked out" />
        <div className="grid gap-2 pt-2 text-row text-ink-2">
          <p>Every wire holds hot and cold still, and the lots a batch holds, and what else moved with it.{onPath && ' Gel lies on the path from warmth and water to ash and rivers, so it is not taken out there; it has a column of its own.'}</p>
          <p>Of all wires shown as settled or likely at most 1 in 10 is expected to be chance, over {questions.lots + questions.others} questions asked of {formatCount(batches, 'batch', 'batches')}.</p>
        </div>
      </section>
    </div>
  );
}

const MOST_TIES = 5;

/** Each thing that is tied once, with what it is tied to most often. */
function tiesOf(board: CausesBoard, names: BoardNames): { what: string; withWhat: string }[] {
  const ties = new Map<string, { what: string; withWhat: string; faults: number }>();
  for (const cell of board.cells) {
    if (cell.grade !== 'not-told-apart' || cell.tiedWith.length === 0) continue;
    const what = subjectOf({ ...cell, direction: 'more' }, names);
    const withWhat = cell.tiedWith.map((term) => subjectOf({ ...cell, ...term, direction: 'more' }, names).replace(/^(?:The|A) /, (word) => word.toLowerCase())).join(' and ');
    const known = ties.get(what);
    if (known) known.faults++;
    else ties.set(what, { what, withWhat, faults: 1 });
  }
  return [...ties.values()].sort((a, b) => b.faults - a.faults).slice(0, MOST_TIES);
}
