import { useQuery } from '@tanstack/react-query';
import type { BatchBehind, CauseDetail } from '#shared/causes.ts';
import { Rail } from '#src/components/Rail.tsx';
import { formatNumber } from '#src/lib/format.ts';
import { measureWords } from './cause-words.ts';
import { behindQuery, type CauseAsk } from './causes.queries.ts';

const W = 640;
const LEFT = 46;
const TOP = 14;
const FOOT = 226;
const PLOT = { x: (share: number) => LEFT + share * (W - LEFT - 14), y: (share: number) => FOOT - share * (FOOT - TOP) };

/** Round steps that cover a range with some four lines. */
function ticksOf(from: number, to: number): number[] {
  const raw = (to - from) / 5;
  const size = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 5, 10].map((part) => part * size).find((candidate) => candidate >= raw) ?? raw;
  const ticks: number[] = [];
  for (let value = Math.ceil(from / step) * step; value <= to + step * 1e-6; value += step) ticks.push(Number(value.toPrecision(6)));
  return ticks;
}

/** Share of batches with the fault by the value of an input: bands of at least eight batches with their ranges, and under them every batch. */
export function DoseChart({ ask, cause }: { ask: CauseAsk; cause: CauseDetail }) {
  const behind = useQuery(behindQuery(ask));
  const { bins, input, fault, cell } = cause;
  if (bins.length === 0) return null;
  const values = [...bins.flatMap((bin) => [bin.from, bin.to])];
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const room = (high - low) * 0.03 || 1;
  const x = (value: number) => PLOT.x((Math.min(high, Math.max(low, value)) - low + room) / (high - low + 2 * room));
  const top = Math.min(1, Math.ceil(Math.max(...bins.map((bin) => bin.upper)) * 5) / 5);
  const y = (share: number) => PLOT.y(share / top);
  const tint = cell.direction === 'less' ? 'less' : 'more';
  return (
    <section>
      <Rail heading={`Share of batches with ${fault.name.toLowerCase()}`} aside={`${cell.n} looked at, ${cell.events} found`} />
      <svg viewBox={`0 0 ${W} 312`} className="fill-keeps mt-2 block w-full" role="img" aria-label={`By ${input.name.toLowerCase()}: ${bins.map((bin) => `${measureWords(bin.from, '')} to ${measureWords(bin.to, input.unit)}, ${bin.events} of ${bin.n}`).join('; ')}`}>
        {[0, 0.25, 0.5, 0.75, 1].map((part) => (
          <g key={part}>
            <path d={`M${LEFT} ${y(part * top)}H${W - 8}`} className={part === 0 ? 'stroke-ink' : 'stroke-line'} strokeWidth={part === 0 ? 2 : 1} />
            <text x={LEFT - 8} y={y(part * top) + 4} textAnchor="end" className="fill-ink-2 text-note">{formatNumber(part * top * 100)}</text>
          </g>
        ))}
        <text x={LEFT + 4} y={TOP - 2} className="fill-ink-2 text-note">of 100 batches</text>
        {bins.map((bin) => {
          const middle = (x(bin.from) + x(bin.to)) / 2;
          return (
            <g key={bin.from} className={tint === 'more' ? 'text-more-fill' : 'text-less-fill'}>
              <rect x={x(bin.from)} width={Math.max(3, x(bin.to) - x(bin.from))} y={y(bin.upper)} height={Math.max(1, y(bin.lower) - y(bin.upper))} className={tint === 'more' ? 'fill-more-wash' : 'fill-less-wash'} />
              <path d={`M${x(bin.from)} ${y(bin.share)}H${Math.max(x(bin.from) + 3, x(bin.to))}`} stroke="currentColor" strokeWidth="3" />
              <text x={middle} y={y(bin.share) - 7} textAnchor="middle" className="fill-ink text-note font-[640]">{bin.events}/{bin.n}</text>
            </g>
          );
        })}
        <Rug batches={behind.data?.items ?? []} x={x} />
        {ticksOf(low, high).map((tick) => <text key={tick} x={x(tick)} y={294} textAnchor="middle" className="fill-ink-2 text-note">{measureWords(tick, '')}</text>)}
        <text x={W - 8} y={310} textAnchor="end" className="fill-ink-2 text-note">{input.name.toLowerCase()}{input.unit && `, ${input.unit}`}</text>
      </svg>
    </section>
  );
}

/** One tick a batch: found, clear, and not looked at, each on its own line. */
function Rug({ batches, x }: { batches: readonly BatchBehind[]; x: (value: number) => number }) {
  const lines = [
    { outcome: 'found', y: 238, height: 10, look: 'stroke-more', word: 'found' },
    { outcome: 'clear', y: 252, height: 10, look: 'stroke-ink-2', word: 'clear' },
    { outcome: 'not-checked', y: 270, height: 3, look: 'stroke-ink-3', word: 'not l. at' },
  ] as const;
  return (
    <>
      {lines.map(({ outcome, y, height, look, word }) => (
        <g key={outcome} aria-hidden="true">
          <text x={LEFT - 8} y={y + 8} textAnchor="end" className="fill-ink-2 text-tick">{word}</text>
          <path d={batches.filter((batch) => batch.outcome === outcome && batch.value !== null).map((batch) => `M${x(batch.value ?? 0).toFixed(1)} ${y}v${height}`).join('')} className={look} strokeWidth="2" fill="none" />
        </g>
      ))}
    </>
  );
}
