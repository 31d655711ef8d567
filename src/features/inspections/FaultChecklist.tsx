import { useState } from 'react';
import type { Answer } from '#shared/words/fault-words.ts';
import { Block } from '#src/components/Block.tsx';
import { Choice } from '#src/components/Choice.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { ANSWER_WORDS } from '#src/lib/words.ts';
import { FaultWords } from './FaultWords.tsx';
import type { StageFault } from './stage-faults.ts';

const ANSWERS = [
  { value: 'found', label: ANSWER_WORDS.found, tone: 'found' },
  { value: 'clear', label: ANSWER_WORDS.clear },
  { value: 'not-checked', label: ANSWER_WORDS['not-checked'] },
] as const;

interface FaultChecklistProps {
  stageName: string;
  faults: readonly StageFault[];
  answerOf: (fault: string) => Answer;
  onAnswer: (faults: readonly string[], answer: Answer) => void;
  /** "found" needs a severity, so it opens the editor. */
  onFound: (fault: string) => void;
  isReadOnly: boolean;
}

/** Every fault that can show at the stage, each found, clear or not looked at; what must be answered comes first. */
export function FaultChecklist({ stageName, faults, answerOf, onAnswer, onFound, isReadOnly }: FaultChecklistProps) {
  const [open, setOpen] = useState<string | null>(null);
  const must = faults.filter(({ isMust }) => isMust);
  const answered = must.filter(({ fault }) => answerOf(fault.slug) !== 'not-checked').length;
  const rest = faults.filter(({ fault }) => answerOf(fault.slug) === 'not-checked').map(({ fault }) => fault.slug);
  return (
    <section aria-labelledby="checklist-heading">
      <Rail id="checklist-heading" heading={`${stageName}, all that must be answered`} aside={`${answered} of ${must.length}`} />
      <ul>
        {faults.map(({ fault, isMust }) => (
          <li key={fault.slug} className="border-b border-line">
            <div className="grid min-h-12 grid-cols-[1fr_auto] items-center gap-x-2.5 gap-y-1 py-1 max-rack:grid-cols-1">
              <button type="button" aria-expanded={open === fault.slug} className="flex min-h-9 items-center gap-2.5 text-left coarse:min-h-12" onClick={() => setOpen(open === fault.slug ? null : fault.slug)}>
                <FaultMark fault={fault.slug} name={fault.name} size={24} withName />
                {!isMust && <span className="text-note text-ink-3">may stay open</span>}
              </button>
              <Choice label={fault.name} size="row" isDisabled={isReadOnly} value={answerOf(fault.slug)} options={ANSWERS} onChange={(answer) => (answer === 'found' ? onFound(fault.slug) : onAnswer([fault.slug], answer))} />
            </div>
            {open === fault.slug && <FaultWords fault={fault} />}
          </li>
        ))}
      </ul>
      <p className="mt-2.5 text-note text-ink-2">“All the rest clear” keeps each of them as clear, with your name and the time. Leaving keeps them as not looked at. What cannot be seen at this stage yet is never among them.</p>
      <div className="mt-2 flex flex-wrap gap-2">
        <Block kind="main" waitsFor={isReadOnly ? 'Your role reads only' : rest.length === 0 ? 'All are answered' : undefined} onClick={() => onAnswer(rest, 'clear')}>All the rest clear ({rest.length})</Block>
      </div>
    </section>
  );
}
