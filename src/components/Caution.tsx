import { TriangleAlert } from 'lucide-react';
import type { ReactNode } from 'react';

const DEFERRAL = 'The supplier’s safety data sheet and your local rules come before anything written here.';

/** Where the work can hurt: the words unshortened, and who comes first. It cannot be closed. */
export function Caution({ children }: { children: ReactNode }) {
  return (
    <div role="note" aria-label="Caution" className="grid grid-cols-[1.9rem_1fr] gap-x-3 gap-y-1 rounded-[2px] bg-safe-fill px-3.5 py-3 leading-snug text-on-safe">
      <TriangleAlert size={26} aria-hidden="true" />
      <div className="grid gap-1">
        <div className="font-[560]">{children}</div>
        <p className="text-note">{DEFERRAL}</p>
      </div>
    </div>
  );
}

/** A warning that may be passed with a reason. */
export function Soft({ children }: { children: ReactNode }) {
  return <div role="note" className="border-l-5 border-wait-fill bg-wait-wash px-3 py-2.5">{children}</div>;
}
