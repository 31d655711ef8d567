import { useQuery } from '@tanstack/react-query';
import { formatCount, formatNumber } from '#src/lib/format.ts';
import { batchCountQuery, type BatchesAsk } from './batches.queries.ts';

/** How many the sentence finds, of how many, and how many it leaves out because nobody looked. */
export function LogCount({ ask, onAsk }: { ask: BatchesAsk; onAsk: (ask: BatchesAsk) => void }) {
  const { sort: _sort, order: _order, ...counted } = ask;
  const count = useQuery({ ...batchCountQuery(counted), placeholderData: (before) => before });
  const leavesOut = ask.answer === 'answered';
  const unseen = useQuery({ ...batchCountQuery({ ...counted, answer: 'not-checked' }), enabled: leavesOut });
  if (!count.data) return <p className="min-h-6 text-note text-ink-2">counting …</p>;
  const { found, all } = count.data;
  return (
    <p aria-live="polite">
      <b className="font-[640]">{formatCount(found, 'batch', 'batches')}</b>
      {found !== all && <span className="ml-2.5 text-note text-ink-2">of {formatNumber(all)}</span>}
      {leavesOut && unseen.data && unseen.data.found > 0 && (
        <span className="text-note text-ink-2">
          ; {formatNumber(unseen.data.found)} more {ask.fault ? 'were not looked at for it' : 'have nothing looked at yet'} and are not shown.{' '}
          <button type="button" className="underline underline-offset-3 coarse:min-h-12" onClick={() => onAsk({ ...ask, answer: undefined, fault: undefined })}>Show them</button>
        </span>
      )}
    </p>
  );
}
