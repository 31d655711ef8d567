import type { ReactNode } from 'react';
import { LampLoaf } from './LampLoaf.tsx';

/** The frame of every page outside the workshop: the form on the left, a cut loaf under the lamp on the right. */
export function Door({ children, heading, says }: { children: ReactNode; heading: string; says?: ReactNode }) {
  return (
    <div className="grid flex-1 bench:grid-cols-[31.25rem_minmax(0,1fr)]">
      <main className="grid content-center gap-5 px-5 py-8 max-bench:order-last max-bench:mx-auto max-bench:w-full max-bench:max-w-lg max-bench:content-start bench:px-11.5">
        <div className="grid gap-3">
          <p className="flex items-center gap-3 text-[1.75rem] leading-none font-[660] [font-stretch:124%]">
            <svg width="44" height="32" viewBox="0 0 30 22" aria-hidden="true"><path d="M1 4h15v14H1zM18 4h3v14h-3zM24 8h5v14h-5z" fill="currentColor" /></svg>
            Loafmark
          </p>
          <p className="max-w-sm text-rail text-ink-2">What every loaf showed, what went into it, and what goes with what.</p>
        </div>
        <div className="grid gap-1.5">
          <h1 className="text-gauge-s">{heading}</h1>
          {says && <p className="text-ink-2">{says}</p>}
        </div>
        {children}
      </main>
      <div className="relative h-28 overflow-hidden bg-well bench:sticky bench:top-0 bench:h-screen">
        <LampLoaf />
      </div>
    </div>
  );
}

/** What went wrong with the whole form, above its first field. */
export function FormProblem({ children }: { children: ReactNode }) {
  return <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{children}</p>;
}
