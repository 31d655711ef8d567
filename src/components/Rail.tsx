import type { ReactNode } from 'react';

/** A ruled line that a group hangs from: heading on the left, its count or unit on the right. No box around what follows. */
export function Rail({ heading, aside, level = 2, id }: { heading: ReactNode; aside?: ReactNode; level?: 2 | 3; id?: string }) {
  const Heading = `h${level}` as const;
  return (
    <div className="rail-ends flex flex-wrap items-baseline gap-x-3.5">
      <Heading id={id}>{heading}</Heading>
      {aside !== undefined && <span className="ml-auto text-note text-ink-2">{aside}</span>}
    </div>
  );
}
