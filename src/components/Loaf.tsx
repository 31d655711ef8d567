import type { Palette } from '#shared/words/batch-words.ts';
import { PLAIN_SOAP } from './Slice.tsx';

const SKEW = 8;

/** A loaf on its shelf: as long as it has bars, wire cuts where it is cut, a white top where ash is open. Decorative. */
export function Loaf({ soap, bars, isCut, hasAsh = false, height = 40, barWidth = 5 }: { soap: Palette | null; bars: number; isCut: boolean; hasAsh?: boolean; height?: number; barWidth?: number }) {
  const { base, second, design } = soap ?? PLAIN_SOAP;
  const count = Math.min(14, Math.max(4, bars));
  const gap = isCut ? 1.1 : 0;
  const end = 1 + count * barWidth;
  const width = end + SKEW + 2;
  const face = height - 11;
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true" className="fill-keeps block shrink-0">
      {Array.from({ length: count }, (_bar, i) => {
        const x = 1 + i * barWidth;
        const top = `M${x + SKEW} 3h${barWidth - gap}l-${SKEW} 7h-${barWidth - gap}z`;
        return (
          <g key={i}>
            <path d={top} fill={hasAsh ? '#eceeed' : design === 'swirl' ? second : base} />
            <path d={top} fill="#fff" opacity=".25" />
            <rect x={x} y="10" width={barWidth - gap} height={face} fill={base} />
            {design === 'layers' && <rect x={x} y={10 + face * 0.55} width={barWidth - gap} height={face * 0.45} fill={second} />}
            {design === 'swirl' && <rect x={x} y={10 + face * (0.3 + 0.25 * Math.abs(Math.sin(i * 1.3)))} width={barWidth - gap} height={face * 0.28} fill={second} />}
            {isCut && <rect x={x + barWidth - gap - 1} y="10" width="1" height={face} fill="#000" opacity=".16" />}
          </g>
        );
      })}
      <path d={`M${end} 10l${SKEW}-7V${height - 8}l-${SKEW} 7z`} fill={second} />
      <path d={`M${end} 10l${SKEW}-7V${height - 8}l-${SKEW} 7z`} fill="#000" opacity=".28" />
      <path d={`M1 10L${1 + SKEW} 3H${end + SKEW}V${height - 8}L${end} ${height - 1}H1z`} fill="none" className="stroke-slice-edge" />
    </svg>
  );
}
