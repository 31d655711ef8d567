import { Download } from 'lucide-react';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { ClaimView } from '#shared/claims.ts';
import { Rail } from '#src/components/Rail.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { Strip } from '#src/components/Strip.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { formatCount } from '#src/lib/format.ts';
import { claimFile, claimPreviewQuery } from './claims.queries.ts';

const FILE = 'inline-flex min-h-10 items-center gap-2 rounded-bar bg-lift px-4 font-[580] no-underline block-edge coarse:min-h-12';
const MOST_PIECES = 60;

/** What the supplier gets, as it will be: counts first, then the rows. */
export function ClaimSheet({ claim, canTakeOut }: { claim: ClaimView; canTakeOut: boolean }) {
  const preview = useQuery(claimPreviewQuery(claim.id, claim.version));
  const faults = useQuery(faultsQuery);
  const [hasMark, setMark] = useState(true);
  if (preview.isPending) return <LoadingShape says="Counting the batches that hold these lots" rows={8} />;
  if (preview.isError) return <ErrorState error={preview.error} onRetry={() => void preview.refetch()} />;
  const { head, rows, rowCount, batches, comparison } = preview.data;
  const nameOf = (slug: string) => faults.data?.find((fault) => fault.slug === slug)?.name ?? slug;
  return (
    <div className="grid grid-cols-1 content-start gap-6">
      <section>
        <Rail heading="This lot beside others" aside={formatCount(batches, 'batch', 'batches')} />
        <div className="overflow-x-auto" role="region" aria-label="Comparison" tabIndex={0}>
          <table className="w-full border-collapse text-row">
            <thead><tr className="text-left text-note text-ink-2"><th scope="col" className="py-1.5 pr-3 font-[560]">Fault</th><th scope="col" className="pr-3 font-[560]">Group</th><th scope="col" className="pr-3 font-[560]">Found of checked</th><th scope="col" className="pr-3 font-[560]">95 % range</th><th scope="col" className="font-[560]">Made</th></tr></thead>
            <tbody>
              {comparison.filter(({ batchesMade }) => batchesMade > 0).map((row) => (
                <tr key={`${row.fault} ${row.group}`} className="border-t border-line">
                  <td className="py-1.5 pr-3">{nameOf(row.fault)}</td>
                  <td className="pr-3">{row.group}</td>
                  <td className="pr-3">
                    <span className="flex items-center gap-2"><b className="gauge whitespace-nowrap">{row.batchesWithFault} of {row.batchesChecked}</b>
                      {row.batchesChecked <= MOST_PIECES && row.batchesChecked > 0 && <Strip width={3} height={12} gap={1} label={`${row.batchesWithFault} of ${row.batchesChecked} found`} pieces={Array.from({ length: row.batchesChecked }, (_piece, index) => (index < row.batchesWithFault ? { kind: 'found', severity: 3 } : { kind: 'clear' }))} />}
                    </span>
                  </td>
                  <td className="pr-3 whitespace-nowrap">{row.lower === null || row.upper === null ? 'nothing checked' : `${Math.round(row.lower * 100)} to ${Math.round(row.upper * 100)} of 100`}</td>
                  <td>{row.batchesMade}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      </section>
      <section className="grid grid-cols-1 gap-3">
        <Rail heading="Rows of the file" aside={rowCount > rows.length ? `first ${rows.length} of ${rowCount}` : formatCount(rowCount, 'row')} />
        <div className="tray-edge max-h-120 overflow-auto bg-tray" role="region" aria-label="Rows of the file" tabIndex={0}>
          <table className="border-collapse text-note">
            <thead className="sticky top-0 bg-tray"><tr>{head.map((name) => <th key={name} scope="col" className="border-b-2 border-ink px-2 py-1.5 text-left align-bottom font-[560] text-ink-2">{name}</th>)}</tr></thead>
            <tbody>{rows.map((cells, index) => <tr key={index} className="border-t border-line">{cells.map((cell, at) => <td key={at} className="px-2 py-1.5 whitespace-nowrap">{cell ?? ''}</td>)}</tr>)}</tbody>
          </table>
        </div>
        {canTakeOut ? (
          <div className="flex flex-wrap items-center gap-3">
            <a className={FILE} href={claimFile(claim.id, 'rows', hasMark)} download><Download size={18} aria-hidden="true" />Rows as CSV</a>
            <a className={FILE} href={claimFile(claim.id, 'comparison', hasMark)} download><Download size={18} aria-hidden="true" />Comparison as CSV</a>
            <label className="flex min-h-10 cursor-pointer items-center gap-2 text-row coarse:min-h-12"><input type="checkbox" className="size-5 accent-ink" checked={hasMark} onChange={(event) => setMark(event.target.checked)} />with a byte-order mark, for spreadsheets</label>
          </div>
        ) : <p className="text-note text-ink-2">Owners and makers take the files out.</p>}
      </section>
    </div>
  );
}
