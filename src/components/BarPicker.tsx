import { useEffect, useRef } from 'react';

export type BarAnswer = 'found' | 'clear' | 'not-checked';

interface BarPickerProps {
  /** Answer of each bar, from the maker's mark. */
  bars: readonly BarAnswer[];
  onChange: (bars: BarAnswer[]) => void;
}

/** A press this long means "not looked at". */
const HOLD_MS = 450;

/** "5 of 12": bars with the fault of bars looked at. */
export function barCounts(bars: readonly BarAnswer[]): { affected: number; lookedAt: number } {
  return { affected: bars.filter((bar) => bar === 'found').length, lookedAt: bars.filter((bar) => bar !== 'not-checked').length };
}

/** One block per bar: tap turns it, drag paints, hold (or Delete) says it was not looked at. */
export function BarPicker({ bars, onChange }: BarPickerProps) {
  const painting = useRef<{ answer: BarAnswer; hold: ReturnType<typeof setTimeout> } | null>(null);
  const latest = useRef(bars);
  useEffect(() => {
    latest.current = bars;
  }, [bars]);
  const set = (index: number, answer: BarAnswer) => {
    if (latest.current[index] === undefined || latest.current[index] === answer) return;
    const next = latest.current.map((bar, at) => (at === index ? answer : bar));
    latest.current = next;
    onChange(next);
  };
  const stop = () => {
    if (painting.current) clearTimeout(painting.current.hold);
    painting.current = null;
  };
  const { affected, lookedAt } = barCounts(bars);
  return (
    <div className="grid gap-1">
      <div className="flex items-baseline justify-between gap-3">
        <span className="text-row font-[560]">Which bars? <span className="font-normal text-ink-2">Touch or draw across</span></span>
        <span className="gauge text-[1.75rem] leading-none" aria-live="polite">{affected} of {lookedAt}</span>
      </div>
      <div
        role="group"
        aria-label={`Bars 1 to ${bars.length} from the maker’s mark`}
        className="grid touch-none auto-cols-fr gap-0.5 rack:grid-flow-col max-rack:grid-cols-6 max-rack:gap-1"
        onPointerMove={(event) => {
          if (!painting.current) return;
          const under = document.elementFromPoint(event.clientX, event.clientY)?.closest<HTMLElement>('[data-bar]');
          if (!under) return;
          const index = Number(under.dataset['bar']);
          if (latest.current[index] !== painting.current.answer) clearTimeout(painting.current.hold);
          set(index, painting.current.answer);
        }}
        onPointerUp={stop}
        onPointerCancel={stop}
        onPointerLeave={stop}
      >
        {bars.map((answer, index) => (
          <button
            key={index}
            type="button"
            data-bar={index}
            aria-pressed={answer === 'found'}
            aria-label={`Bar ${index + 1}${answer === 'not-checked' ? ', not looked at' : ''}`}
            className={`grid h-15 min-w-0 place-items-end justify-items-center rounded-t-bar border-[1.5px] pb-1 text-note select-none max-rack:h-14 max-rack:place-items-center max-rack:rounded-bar max-rack:text-bench ${answer === 'found' ? 'border-more bg-more-fill font-[700] text-on-more' : answer === 'clear' ? 'border-line-firm bg-lift text-ink-2' : 'border-x-0 border-t-0 border-b-3 border-line-firm text-ink-3'}`}
            onPointerDown={(event) => {
              // Touch captures the pointer by itself; painting needs the bars under the finger to hear it.
              if (event.currentTarget.hasPointerCapture?.(event.pointerId)) event.currentTarget.releasePointerCapture(event.pointerId);
              const next: BarAnswer = answer === 'found' ? 'clear' : 'found';
              stop();
              painting.current = { answer: next, hold: setTimeout(() => { set(index, 'not-checked'); stop(); }, HOLD_MS) };
              set(index, next);
            }}
            onClick={(event) => {
              // A screen reader presses without a pointer; a finger's own click was answered when it came down.
              if (event.detail === 0) set(index, answer === 'found' ? 'clear' : 'found');
            }}
            onKeyDown={(event) => {
              if (event.key === ' ' || event.key === 'Enter') { event.preventDefault(); set(index, answer === 'found' ? 'clear' : 'found'); }
              if (event.key === 'Delete' || event.key === 'Backspace') { event.preventDefault(); set(index, 'not-checked'); }
              if (event.key === 'ArrowRight' || event.key === 'ArrowLeft') {
                event.preventDefault();
                const sibling = event.key === 'ArrowRight' ? event.currentTarget.nextElementSibling : event.currentTarget.previousElementSibling;
                if (sibling instanceof HTMLElement) sibling.focus();
              }
            }}
          >
            {index + 1}
          </button>
        ))}
      </div>
      <div className="flex justify-between text-fine text-ink-2"><span>bar 1, maker’s mark</span><span>hold a bar: not looked at</span></div>
    </div>
  );
}
