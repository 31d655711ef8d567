import type { GradeCode } from './Grade.tsx';

interface WireProps {
  grade: GradeCode;
  /** Ratios; null where the interval was not worked out. */
  estimate: number | null;
  lower: number | null;
  upper: number | null;
  /** The raw count's ratio: a dotted tick. */
  raw?: number | null;
  width?: number;
  height?: number;
  /** Range of the common log2 scale. */
  from?: number;
  to?: number;
}

const THICKNESS: Partial<Record<GradeCode, number>> = { settled: 5, 'shown-by-trial': 5, likely: 3, 'no-difference': 3 };

/** An interval on a wire across the line of no difference: thickness and knot say the grade, side says the direction. Decorative; the cell's name says it in words. */
export function Wire({ grade, estimate, lower, upper, raw = null, width = 80, height = 18, from = -5, to = 6 }: WireProps) {
  const middle = height / 2;
  const at = (ratio: number) => Math.max(-1, Math.min(width + 1, ((Math.log2(Math.max(ratio, 1e-9)) - from) / (to - from)) * width));
  const zero = at(1);
  const isDrawn = estimate !== null && lower !== null && upper !== null;
  const isWeak = grade === 'too-few' || grade === 'no-variation' || !isDrawn;
  const tint = grade === 'no-difference' || isWeak ? 'text-ink-2' : (estimate ?? 1) >= 1 ? 'text-more-fill' : 'text-less-fill';
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true" className={`fill-keeps block ${tint}`}>
      <path d={`M${zero} 0V${height}`} className="stroke-ink-3" fill="none" />
      {raw !== null && <path d={`M${at(raw)} ${middle - height * 0.42}v${height * 0.84}`} className="stroke-ink" strokeWidth="1.5" strokeDasharray="2 2" fill="none" />}
      {grade === 'not-told-apart' ? (
        <path d={`M${zero - 14} ${middle - 5}v10M${zero + 14} ${middle - 5}v10M${zero - 14} ${middle}c7-7 14 7 28 0`} className="stroke-ink-3" strokeWidth="1.6" fill="none" />
      ) : isWeak ? (
        <path d={`M${isDrawn ? Math.max(2, at(lower)) : zero - 22} ${middle}H${isDrawn ? Math.min(width - 2, at(upper)) : zero + 22}`} className="stroke-ink-3" strokeWidth="1.5" strokeDasharray="1.5 3" fill="none" />
      ) : (
        <g stroke="currentColor" fill="none">
          <path d={`M${Math.max(1, at(lower))} ${middle}H${Math.min(width - 1, at(upper))}`} strokeWidth={THICKNESS[grade] ?? 1.5} />
          <Knot grade={grade} x={at(estimate)} middle={middle} width={width} />
          {Math.log2(upper) > to && <path d={`M${width - 5} ${middle - 5}l4.5 5-4.5 5`} strokeWidth="2" />}
          {Math.log2(Math.max(lower, 1e-9)) < from && <path d={`M5 ${middle - 5}l-4.5 5 4.5 5`} strokeWidth="2" />}
        </g>
      )}
    </svg>
  );
}

function Knot({ grade, x, middle, width }: { grade: GradeCode; x: number; middle: number; width: number }) {
  if (grade === 'settled' || grade === 'shown-by-trial') return <rect x={Math.min(width - 8, Math.max(0, x - 4))} y={middle - 6} width="8" height="12" fill="currentColor" stroke="none" />;
  if (grade === 'hint') return <circle cx={x} cy={middle} r="3.2" className="fill-tray" strokeWidth="1.6" />;
  return <rect x={x - 3.5} y={middle - 4.5} width="7" height="9" fill="currentColor" stroke="none" />;
}
