import type { CauseDetail } from '#shared/causes.ts';
import { Grade, GRADE_SETTING } from '#src/components/Grade.tsx';
import { boardNames, measureWords, predicateOf, subjectOf } from './cause-words.ts';

/** The one sentence at the top of a cause, set as firmly as it stands, and what it means in plain counts. */
export function CauseSentence({ cause }: { cause: CauseDetail }) {
  const { cell } = cause;
  const names = boardNames({ faults: [cause.fault], inputs: [cause.input] });
  return (
    <div className="grid items-start gap-x-8 gap-y-3 bench:grid-cols-[minmax(0,1fr)_auto]">
      <div>
        <h1 className={`text-claim leading-tight max-rack:text-title ${GRADE_SETTING[cell.grade]}`}>{headline(cause)}</h1>
        <p className="say mt-2 max-w-[46rem] text-bench text-ink-2">{plainWords(cause)}</p>
      </div>
      <div className="text-bench"><Grade grade={cell.grade} /></div>
    </div>
  );

  function headline({ cell: own, fault }: CauseDetail): string {
    const subject = subjectOf({ ...own, direction: own.direction === 'none' ? 'more' : own.direction }, names);
    switch (own.grade) {
      case 'settled': case 'likely': case 'hint': return `${subject} ${predicateOf(own, names)}.`;
      case 'no-difference': return `${subject}: no difference seen in ${fault.name.toLowerCase()}.`;
      case 'not-told-apart': return `${subject} cannot be told apart here.`;
      case 'comes-after': return `${cause.input.name} comes after ${fault.name.toLowerCase()} can be seen.`;
      case 'no-variation': return `${subject}: nothing to compare.`;
      default: return `${subject} and ${fault.name.toLowerCase()}: too few to say.`;
    }
  }
}

function plainWords({ cell, fault, input, levelLabel, tiedWith }: CauseDetail): string {
  const name = fault.name.toLowerCase();
  if (cell.grade === 'comes-after') return 'What is known only after a fault can be seen cannot have brought it, so nothing was worked out.';
  if (cell.grade === 'not-told-apart' && tiedWith.length > 0) return `It always moved together with ${tiedWith.map(({ label }) => label).join(' and ')}. A trial pour that changes one and not the other would tell.`;
  const counts = cell.level === null
    ? `${cell.events} of ${cell.n} batches that were looked at show ${name}.`
    : `${cell.exposedEvents} of ${cell.exposedN} batches with ${levelLabel ?? 'it'} show ${name}, ${cell.unexposedEvents} of ${cell.unexposedN} others do.`;
  const range = cell.range && cell.estimate !== null ? ` Compared over the workshop’s own middle range, ${measureWords(cell.range.high, input.unit)} and ${measureWords(cell.range.low, input.unit)}.` : '';
  const proof = ['settled', 'likely', 'hint'].includes(cell.grade) ? ' No trial pour has tested it, so this page says “goes with”.' : '';
  const more = cell.moreNeeded === null ? '' : ` About ${cell.moreNeeded} more batches would tell.`;
  return counts + range + proof + more;
}
