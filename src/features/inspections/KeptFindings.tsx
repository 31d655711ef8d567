import type { FaultView } from '#shared/faults.ts';
import { Block } from '#src/components/Block.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Rail } from '#src/components/Rail.tsx';
import type { Look } from './use-look.ts';

type Finding = Look['findings'][number];

/** What was found at this look, as a list: marks are reached by keyboard here, in reading order. */
export function KeptFindings({ findings, faults, onTakeBack, chosen, onChoose, isReadOnly }: { findings: readonly Finding[]; faults: readonly FaultView[]; onTakeBack: (finding: Finding) => void; chosen: string | null; onChoose: (id: string) => void; isReadOnly: boolean }) {
  if (findings.length === 0) return null;
  return (
    <section aria-label="Found at this look">
      <Rail heading="Found" aside={String(findings.length)} />
      <ul>
        {findings.map((finding) => {
          const fault = faults.find(({ slug }) => slug === finding.fault);
          return (
            <li key={finding.id} className={`flex min-h-12 items-center gap-3 border-b border-line ${chosen === finding.id ? 'bg-wait-wash' : ''}`}>
              <button type="button" className="flex min-h-11 flex-1 items-center gap-2 text-left" aria-pressed={chosen === finding.id} onClick={() => onChoose(finding.id)}>
                <FaultMark fault={finding.fault} name={fault?.name ?? finding.fault} size={24} severity={finding.severity} withName />
                <span className="text-note text-ink-2">
                  {finding.barsAffected !== null && finding.barsLookedAt !== null ? `${finding.barsAffected} of ${finding.barsLookedAt} bars` : 'the loaf'}, {finding.marks.length === 1 ? '1 mark' : `${finding.marks.length} marks`}
                </span>
              </button>
              {!isReadOnly && !('isOnItsWay' in finding) && <Block kind="quiet" onClick={() => onTakeBack(finding)}>Take back</Block>}
              {'isOnItsWay' in finding && <span className="text-note text-ink-2">sending</span>}
            </li>
          );
        })}
      </ul>
    </section>
  );
}
