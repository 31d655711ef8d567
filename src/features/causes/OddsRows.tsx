import type { CauseDetail } from '#shared/causes.ts';
import type { GradeCode } from '#src/components/Grade.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Wire } from '#src/components/Wire.tsx';
import { formatNumber } from '#src/lib/format.ts';

interface Line { label: string; n: string; estimate: number | null; lower: number | null; upper: number | null; grade: GradeCode; isMain?: boolean }

/** Raw beside adjusted, without each adjuster, and with any one batch left out: what the answer would shake under. */
export function OddsRows({ cause }: { cause: CauseDetail }) {
  const lines = linesOf(cause);
  if (cause.cell.estimate === null) return null;
  return (
    <section>
      <Rail heading="Raw beside adjusted" aside={cause.cell.range ? 'odds, high against low' : 'odds, with it against without'} />
      <div role="table" aria-label="Odds ratios with their 95 % ranges">
        {lines.map((line) => (
          <div role="row" key={line.label} className={`grid grid-cols-[minmax(0,1fr)_9rem_8.5rem] items-center gap-x-3 border-b border-line px-1.5 py-2 text-row max-rack:grid-cols-[minmax(0,1fr)_8rem] ${line.isMain ? 'bg-tray font-[640]' : ''}`}>
            <span role="rowheader">{line.label} <span className="font-normal text-ink-2">{line.n}</span></span>
            <span role="cell"><Wire grade={line.grade} estimate={line.estimate} lower={line.lower} upper={line.upper} width={144} height={20} /></span>
            <span role="cell" className="justify-self-end tabular-nums max-rack:col-span-2">{oddsWords(line)}</span>
          </div>
        ))}
      </div>
      <p className="pt-2 text-note text-ink-2">
        Penalised logistic model{cause.adjustedFor.length > 0 ? `, holding still ${cause.adjustedFor.map(({ label }) => label).join(', ')}` : ''}. Hot and cold are held still always, and so are the lots a batch holds.
        {cause.mantelHaenszel?.estimate != null && ` By method and maker alone: ×${ratio(cause.mantelHaenszel.estimate)} (Mantel-Haenszel).`}
        {cause.p !== null && ` p ${cause.p < 0.001 ? 'below 0.001' : formatNumber(cause.p, 3)}, q ${cause.cell.q === null ? 'not asked' : cause.cell.q < 0.001 ? 'below 0.001' : formatNumber(cause.cell.q, 3)}.`}
      </p>
    </section>
  );
}

function linesOf({ cell, raw, without, leaveOneOut, adjustedFor }: CauseDetail): Line[] {
  const adjusted: Line = {
    label: adjustedFor.length > 0 ? `Adjusted: ${adjustedFor.map(({ label }) => label.toLowerCase()).join(', ')}` : 'Adjusted for method and lots', n: String(cell.n),
    estimate: cell.estimate, lower: cell.lower, upper: cell.upper, grade: cell.grade, isMain: true,
  };
  return [
    { label: 'Raw count', n: String(cell.n), ...raw, grade: 'hint' },
    adjusted,
    ...without.map(({ term, ...odds }): Line => ({ label: `Without taking out ${term.label.toLowerCase()}`, n: '', ...odds, grade: 'hint' })),
    ...(leaveOneOut ? [{ label: 'Any one batch left out', n: '', estimate: Math.sqrt(leaveOneOut.lowest * leaveOneOut.highest), lower: leaveOneOut.lowest, upper: leaveOneOut.highest, grade: 'likely' as const }] : []),
  ];
}

export function ratio(value: number): string {
  return value >= 100 ? formatNumber(value) : value >= 10 ? formatNumber(value, 1) : formatNumber(value, 2);
}

function oddsWords({ estimate, lower, upper }: Line): string {
  if (estimate === null) return 'no figure';
  const range = `${lower === null ? 'no end' : ratio(lower)} to ${upper === null ? 'no end' : ratio(upper)}`;
  return `×${ratio(estimate)}  ${range}`;
}
