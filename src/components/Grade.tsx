/** Grades of evidence as the answers carry them. */
export type GradeCode = 'settled' | 'likely' | 'hint' | 'too-few' | 'no-difference' | 'not-told-apart' | 'comes-after' | 'no-variation' | 'shown-by-trial';

export const GRADE_WORDS: Record<GradeCode, string> = {
  settled: 'settled', likely: 'likely', hint: 'hint', 'too-few': 'too few', 'no-difference': 'no difference seen', 'not-told-apart': 'cannot be told apart',
  'comes-after': 'comes after', 'no-variation': 'always the same', 'shown-by-trial': 'shown by trial',
};

/** Evidence sets like soap: soft and narrow when fresh, wide and firm when settled. */
export const GRADE_SETTING: Record<GradeCode, string> = {
  settled: 'set-settled', 'shown-by-trial': 'set-settled underline', likely: 'set-likely', hint: 'set-hint', 'no-difference': 'set-likely',
  'too-few': 'set-few', 'not-told-apart': 'set-few', 'comes-after': 'set-few', 'no-variation': 'set-few',
};

function MarkOf({ grade }: { grade: GradeCode }) {
  const zero = <path d="M16 0v16" className="stroke-ink-3" />;
  switch (grade) {
    case 'settled':
    case 'shown-by-trial': return <>{zero}<path d="M20 8h17" strokeWidth="5" stroke="currentColor" /><rect x="25" y="2" width="8" height="12" fill="currentColor" /></>;
    case 'likely': return <>{zero}<path d="M18 8h18" strokeWidth="3" stroke="currentColor" /><rect x="23" y="3.5" width="7" height="9" fill="currentColor" /></>;
    case 'hint': return <>{zero}<path d="M9 8h25" strokeWidth="1.5" stroke="currentColor" /><circle cx="22" cy="8" r="3.2" className="fill-tray" stroke="currentColor" strokeWidth="1.6" /></>;
    case 'no-difference': return <>{zero}<path d="M10 8h13" strokeWidth="3" stroke="currentColor" /><rect x="13" y="3.5" width="7" height="9" fill="currentColor" /></>;
    case 'not-told-apart': return <path d="M6 3v10M30 3v10M6 8c6-7 12 7 24 0" strokeWidth="1.6" stroke="currentColor" fill="none" />;
    default: return <>{zero}<path d="M2 8h35" strokeWidth="1.5" strokeDasharray="1.5 3" stroke="currentColor" /></>;
  }
}

/** Mark and word of a grade, never one without the other; `wordOnly` for inside a sentence. */
export function Grade({ grade, wordOnly = false }: { grade: GradeCode; wordOnly?: boolean }) {
  if (wordOnly) return <span className={GRADE_SETTING[grade]}>{GRADE_WORDS[grade]}</span>;
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <svg width="40" height="16" viewBox="0 0 40 16" aria-hidden="true" className="shrink-0"><MarkOf grade={grade} /></svg>
      <span className={GRADE_SETTING[grade]}>{GRADE_WORDS[grade]}</span>
    </span>
  );
}
