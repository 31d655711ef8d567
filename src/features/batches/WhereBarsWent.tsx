import type { AnyBatchView } from '#shared/batches.ts';
import { DISPOSITIONS } from '#shared/words/batch-words.ts';
import { Soft } from '#src/components/Caution.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Strip } from '#src/components/Strip.tsx';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatMoney } from '#src/lib/format.ts';
import { DISPOSITION_WORDS } from '#src/lib/words.ts';
import { useFaultName } from './FaultMarks.tsx';
import { barsOf } from './looked-at.ts';

/** Room for one batch's bars, CSS px. */
const WIDTH = 300;

/** Every bar and where it went, and what that cost. */
export function WhereBarsWent({ batch }: { batch: AnyBatchView }) {
  const { workshop } = useSession();
  const nameOf = useFaultName();
  const { pieces, label } = barsOf(batch);
  const gone = batch.dispositions.reduce((sum, part) => sum + part.bars, 0);
  const left = (batch.bars ?? 0) - gone;
  return (
    <section className="grid content-start gap-3">
      <Rail heading="Where the bars went" aside={batch.bars === null ? 'bars not counted' : `${gone} of ${batch.bars}`} />
      {pieces.length === 0 ? (
        <p className="text-ink-2">The bars are not counted yet.</p>
      ) : (
        <>
          <Strip pieces={pieces} label={label} width={Math.max(3, Math.min(22, WIDTH / pieces.length - 2))} height={42} gap={pieces.length > 40 ? 1 : 2} />
          <ul className="text-row">
            {DISPOSITIONS.map((kind) => ({ kind, parts: batch.dispositions.filter((part) => part.kind === kind) })).filter(({ parts }) => parts.length > 0).map(({ kind, parts }) => (
              <li key={kind} className="flex items-center gap-2.5 border-t border-line py-1.5">
                <span aria-hidden="true"><Strip pieces={[{ kind }]} label={DISPOSITION_WORDS[kind]} width={12} height={14} /></span>
                <span>{DISPOSITION_WORDS[kind]}{parts.some(({ fault }) => fault) && <span className="text-ink-2">, for {parts.flatMap(({ fault }) => (fault ? [nameOf(fault).toLowerCase()] : [])).join(', ')}</span>}</span>
                <span className="gauge ml-auto text-gauge-s">{parts.reduce((sum, part) => sum + part.bars, 0)}</span>
              </li>
            ))}
            {left > 0 && (
              <li className="flex items-center gap-2.5 border-t border-line py-1.5"><span aria-hidden="true"><Strip pieces={[{ kind: 'rack' }]} label="on the rack" width={12} height={14} /></span><span>on the rack</span><span className="gauge ml-auto text-gauge-s">{left}</span></li>
            )}
          </ul>
        </>
      )}
      {batch.lostMinor > 0 && <Soft>Lost: <b className="font-[640]">{formatMoney(batch.lostMinor, workshop.currency)}</b>, by what the bars would have brought as firsts.</Soft>}
    </section>
  );
}
