import { FAMILY_OF, OUTLINES, PATTERNS } from './fault-glyphs.tsx';
import { SeverityNotches } from './SeverityNotches.tsx';

interface FaultMarkProps {
  fault: string;
  name: string;
  size?: 20 | 24 | 28 | 34;
  severity?: number;
  /** Shows the name beside the mark; it is read out in either case. */
  withName?: boolean;
}

/** A fault's own mark: the outline says the family, the pattern says the fault. A workshop's own fault carries two letters. */
export function FaultMark({ fault, name, size = 20, severity, withName = false }: FaultMarkProps) {
  const family = FAMILY_OF[fault] ?? 'structure';
  const isSafety = family === 'safety';
  return (
    <span className="inline-flex items-center gap-1 align-middle">
      <svg width={size} height={size} viewBox="0 0 24 24" aria-hidden="true" className={`fill-keeps shrink-0 overflow-visible ${isSafety ? 'text-on-safe' : 'text-ink'}`}>
        <path d={OUTLINES[family]} className={isSafety ? 'fill-safe-fill stroke-safe-fill' : 'fill-lift stroke-ink'} strokeWidth="1.6" />
        <g fill="none" stroke="currentColor" strokeWidth="1.6" strokeLinecap="square">
          {PATTERNS[fault] ?? <text x="12" y="16" textAnchor="middle" fontSize="10" fontWeight="700" stroke="none" className="fill-current">{name.slice(0, 2)}</text>}
        </g>
      </svg>
      {severity !== undefined && <SeverityNotches severity={severity} />}
      <span className={withName ? 'ml-0.5' : 'sr-only'}>{name}</span>
      {severity !== undefined && <span className="sr-only">, severity {severity}</span>}
    </span>
  );
}
