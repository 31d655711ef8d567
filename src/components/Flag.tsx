import type { ReactNode } from 'react';

const LOOKS = { today: 'bg-wait-wash text-wait', late: 'bg-wait-fill text-on-wait', held: 'bg-safe-fill text-on-safe', passed: 'bg-pass-wash text-pass', draft: 'border border-line-firm text-ink-2' } as const;

/** A word that waits, passed or stops; always in text. */
export function Flag({ kind, children }: { kind: keyof typeof LOOKS; children: ReactNode }) {
  return <span className={`inline-flex items-center rounded-[2px] px-1.5 py-px text-note font-[600] whitespace-nowrap ${LOOKS[kind]}`}>{children}</span>;
}
