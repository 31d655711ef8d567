import { useId } from 'react';
import type { Palette } from '#shared/words/batch-words.ts';

export const PLAIN_SOAP: Palette = { base: '#e6dfc8', second: '#d8cfb2', third: '#f3eede', design: 'plain' };

function Pattern({ soap, w, h }: { soap: Palette; w: number; h: number }) {
  switch (soap.design) {
    case 'swirl': return <path fill={soap.second} d={`M0 ${h * 0.62}C${w * 0.3} ${h * 0.35} ${w * 0.42} ${h * 0.9} ${w * 0.6} ${h * 0.5}S${w * 0.85} ${h * 0.2} ${w} ${h * 0.42}V${h * 0.66}C${w * 0.8} ${h * 0.48} ${w * 0.74} ${h * 0.86} ${w * 0.52} ${h * 0.82}S${w * 0.2} ${h * 0.66} 0 ${h * 0.86}z`} />;
    case 'layers': return <path fill={soap.second} d={`M0 ${h * 0.58}Q${w * 0.5} ${h * 0.5} ${w} ${h * 0.6}V${h}H0z`} />;
    case 'specks': return <>{Array.from({ length: 9 }, (_speck, i) => <circle key={i} cx={((i * 7.3 + 3) % (w - 2)) + 1} cy={((i * 11.7 + 6) % (h - 6)) + 4} r={0.7 + (i % 3) * 0.4} fill={soap.second} />)}</>;
    case 'plain': return null;
  }
}

/** A batch's own cut face; decorative, its code always stands beside. */
export function Slice({ soap, width = 22, height = 26 }: { soap: Palette | null; width?: number; height?: number }) {
  const id = useId();
  const face = soap ?? PLAIN_SOAP;
  const outline = `M1 ${height - 1}V4Q${width * 0.25} 1 ${width * 0.5} 2T${width - 1} 3V${height - 1}z`;
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true" className="fill-keeps inline-block shrink-0 align-middle">
      <defs><clipPath id={id}><path d={outline} /></clipPath></defs>
      <g clipPath={`url(#${id})`}>
        <rect width={width} height={height} fill={face.base} />
        <Pattern soap={face} w={width} h={height} />
        <path d={`M0 0H${width}V3H3V${height}H0z`} fill="#fff" opacity=".28" />
        <path d={`M${width - 2} 4V${height}H0v-2H${width - 2}z`} fill="#000" opacity=".18" />
      </g>
      <path d={outline} fill="none" className="stroke-slice-edge" />
    </svg>
  );
}
