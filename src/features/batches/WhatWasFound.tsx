import { useQuery } from '@tanstack/react-query';
import type { AnyBatchView } from '#shared/batches.ts';
import type { FindingView, InspectionView } from '#shared/inspections.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SeverityNotches } from '#src/components/SeverityNotches.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { Strip, type Piece } from '#src/components/Strip.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { inspectionsOfBatchQuery } from '#src/features/inspections/inspections.queries.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';
import { useFaultName } from './FaultMarks.tsx';
import { lookedAt } from './looked-at.ts';

/** Most pieces that a finding's bars are cut into; more are said in words only. */
const MOST_BARS = 48;

/** Each fault that was found, worst first, with what each look says of it; then what is clear and what nobody looked at. */
export function WhatWasFound({ batch }: { batch: AnyBatchView }) {
  const inspections = useQuery(inspectionsOfBatchQuery(batch.id));
  const catalogue = useQuery(faultsQuery).data ?? [];
  const nameOf = useFaultName();
  const { label } = lookedAt(batch, catalogue);
  return (
    <section className="grid content-start gap-3">
      <Rail heading="What was found" aside={label} />
      {inspections.isPending ? (
        <LoadingShape says="Reading the looks" rows={3} rowClassName="h-16" />
      ) : inspections.isError ? (
        <ErrorState error={inspections.error} onRetry={() => void inspections.refetch()} />
      ) : batch.found.length === 0 ? (
        <p className="text-ink-2">{batch.clear.length > 0 ? 'Nothing was found where somebody looked.' : 'Nobody has looked yet. Not looked at is not clear.'}</p>
      ) : (
        <ul className="grid">
          {batch.found.map(({ fault, severity }) => (
            <li key={fault} className="grid grid-cols-[2.25rem_1fr] gap-x-2 border-t border-line py-3 first:border-t-0 first:pt-0">
              <span className="self-start"><FaultMark fault={fault} name="" size={28} /></span>
              <div className="grid gap-2">
                <p className="flex items-center gap-2 font-[640]">{nameOf(fault)} <SeverityNotches severity={severity} /><span className="sr-only">, severity {severity}</span></p>
                {inspections.data.flatMap((look) => look.findings.filter((finding) => finding.fault === fault && !finding.isWithdrawn).map((finding) => <FindingLine key={finding.id} finding={finding} look={look} barsMade={batch.bars} />))}
              </div>
            </li>
          ))}
        </ul>
      )}
      {batch.clear.length > 0 && (
        <details className="text-row">
          <summary className="min-h-6 underline underline-offset-3 coarse:min-h-12">{batch.clear.length} clear</summary>
          <p className="pt-1 text-ink-2">{batch.clear.map(nameOf).join(', ')}</p>
        </details>
      )}
    </section>
  );
}

function FindingLine({ finding, look, barsMade }: { finding: FindingView; look: InspectionView; barsMade: number | null }) {
  const of = finding.barsLookedAt ?? look.barsLookedAt;
  const affected = finding.barsAffected ?? finding.bars?.length ?? null;
  const pieces = affected !== null && of && of <= MOST_BARS ? barPieces(finding, affected, of, of === barsMade) : undefined;
  const count = affected === null ? null : of === null ? `${affected} bars` : `${affected} of ${of} bars`;
  return (
    <div className="grid gap-1 text-row">
      {pieces && count && <Strip pieces={pieces} label={count} width={10} height={16} />}
      <p className="text-ink-2">
        {finding.note && `${finding.note.replace(/\.$/, '')}. `}
        {count ? `${count}, severity` : 'Severity'} {finding.severity}. {look.inspectorName ? `${look.inspectorName.split(' ')[0]}, at` : 'At'} {STAGE_WORDS[look.stage].toLowerCase()}.
      </p>
    </div>
  );
}

/** In the order of the bars where all were looked at and numbered; else those with the fault first, since a sample has no places. */
function barPieces({ bars, severity }: FindingView, affected: number, of: number, isWhole: boolean): Piece[] {
  const has = (index: number) => (isWhole && bars ? bars.includes(index + 1) : index < affected);
  return Array.from({ length: of }, (_bar, index): Piece => (has(index) ? { kind: 'found', severity } : { kind: 'clear' }));
}
