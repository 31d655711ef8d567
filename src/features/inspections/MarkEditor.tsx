import { Check, Undo2 } from 'lucide-react';
import { useState } from 'react';
import type { FaultView } from '#shared/faults.ts';
import { BarPicker, type BarAnswer } from '#src/components/BarPicker.tsx';
import { Block } from '#src/components/Block.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { SeverityPicker } from '#src/components/SeverityPicker.tsx';
import { TextArea } from '#src/components/TextField.tsx';

/** A finding on its way to being kept. */
export interface Draft {
  fault: string;
  severity: number;
  bars: BarAnswer[];
  note: string;
}

interface MarkEditorProps {
  draft: Draft;
  onDraft: (draft: Draft) => void;
  /** Likely ones first. */
  faults: readonly FaultView[];
  onKeep: () => void;
  onTakeBack: () => void;
  /** Already found at this look: keeping would make it twice. */
  taken: ReadonlySet<string>;
}

const AT_HAND = 6;

/** The lowest severity that exists for a fault. */
export function firstSeverity(fault: FaultView): number {
  return fault.criteria.findIndex((criterion) => criterion !== null) + 1;
}

/** Which fault, how bad, on which bars; everything has a likely answer already, Keep makes it one. */
export function MarkEditor({ draft, onDraft, faults, onKeep, onTakeBack, taken }: MarkEditorProps) {
  const [areAllShown, setAllShown] = useState(false);
  const [hasNote, setHasNote] = useState(draft.note !== '');
  const fault = faults.find(({ slug }) => slug === draft.fault) ?? faults[0];
  if (!fault) return null;
  const shown = areAllShown ? faults : faults.slice(0, AT_HAND);
  const choose = (next: FaultView) => {
    setAllShown(false);
    onDraft({ ...draft, fault: next.slug, severity: next.criteria[draft.severity - 1] == null ? firstSeverity(next) : draft.severity });
  };
  return (
    <section aria-label="This mark" className="grid gap-3.5 border-b-2 border-ink bg-tray px-5 pb-4.5 pt-4 max-rack:gap-2.5 max-rack:px-4 max-rack:pb-3 max-rack:pt-2.5">
      <div role="radiogroup" aria-label="Fault; likely ones first" className={`flex gap-1.5 ${areAllShown ? 'flex-wrap' : 'overflow-x-auto rack:flex-wrap'}`}>
        {shown.map((option) => (
          <button
            key={option.slug}
            type="button"
            role="radio"
            aria-checked={option.slug === fault.slug}
            className={`flex min-h-12 shrink-0 items-center gap-2 rounded-bar px-3 font-[580] whitespace-nowrap max-rack:min-h-15 max-rack:text-rail ${option.slug === fault.slug ? 'bg-ink text-on-ink' : 'bg-lift block-edge'}`}
            onClick={() => choose(option)}
          >
            <FaultMark fault={option.slug} name={option.name} size={28} withName />
          </button>
        ))}
        {faults.length > AT_HAND && <Block kind="quiet" className="shrink-0" onClick={() => setAllShown(!areAllShown)}>{areAllShown ? 'Fewer' : `All ${faults.length}`}</Block>}
      </div>
      <SeverityPicker criteria={fault.criteria} value={draft.severity} onChange={(severity) => onDraft({ ...draft, severity })} />
      {draft.bars.length > 0 && <BarPicker bars={draft.bars} onChange={(bars) => onDraft({ ...draft, bars })} />}
      {fault.lookAlikes[0] && (
        <p className="text-note text-ink-2 max-rack:hidden"><b className="font-[640] text-ink">Could it be something else?</b> {fault.lookAlikes.slice(0, 2).map(({ name, howToTell }) => `${name}: ${howToTell}`).join(' ')}</p>
      )}
      {hasNote ? (
        <TextArea label="Note" rows={2} value={draft.note} maxLength={2000} onChange={(event) => onDraft({ ...draft, note: event.target.value })} />
      ) : (
        <button type="button" className="justify-self-start text-note underline underline-offset-2 coarse:min-h-11" onClick={() => setHasNote(true)}>Add a note</button>
      )}
      <div className="grid grid-cols-[6rem_1fr] gap-2">
        <Block size="bench" kind="quiet" aria-label="Take the mark back" onClick={onTakeBack}><Undo2 size={22} aria-hidden="true" /></Block>
        <Block size="bench" kind="main" waitsFor={taken.has(fault.slug) ? `${fault.name} is marked already` : undefined} onClick={onKeep}><Check size={22} aria-hidden="true" />Keep</Block>
      </div>
    </section>
  );
}
