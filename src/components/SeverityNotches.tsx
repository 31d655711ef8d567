/** One, two or three upright notches; always beside words that say the same. */
export function SeverityNotches({ severity, scale = 1 }: { severity: number; scale?: number }) {
  return (
    <svg width={severity * 4 * scale} height={10 * scale} viewBox={`0 0 ${severity * 4} 10`} aria-hidden="true" className="shrink-0 fill-current">
      {Array.from({ length: severity }, (_notch, index) => <rect key={index} x={index * 4} width="2.5" height="10" />)}
    </svg>
  );
}
