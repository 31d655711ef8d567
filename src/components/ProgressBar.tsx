/** How far something has come, in words and as a filling line. */
export function ProgressBar({ done, of, label }: { done: number; of: number; label: string }) {
  const share = of > 0 ? Math.min(1, done / of) : 0;
  return (
    <div role="progressbar" aria-label={label} aria-valuemin={0} aria-valuemax={of} aria-valuenow={done} className="grid gap-1">
      <svg viewBox="0 0 100 6" preserveAspectRatio="none" aria-hidden="true" className="fill-keeps h-1.5 w-full"><rect width="100" height="6" className="fill-sink" /><rect width={share * 100} height="6" className="fill-ink" /></svg>
      <span className="text-note text-ink-2">{label}</span>
    </div>
  );
}
