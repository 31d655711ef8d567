import type { BatchRow } from '#shared/batches.ts';
import { Block } from '#src/components/Block.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { formatCount, formatMoney } from '#src/lib/format.ts';

/** What the selected batches come to, and their codes to take elsewhere. */
export function SelectedBatches({ rows, onClear }: { rows: readonly BatchRow[]; onClear: () => void }) {
  const { tell } = useToasts();
  if (rows.length === 0) return null;
  const bars = rows.reduce((sum, row) => sum + (row.bars ?? 0), 0);
  const lost = rows.reduce((sum, row) => sum + row.lostMinor, 0);
  const copy = async () => {
    const codes = rows.map(({ code }) => code).join(', ');
    try {
      await navigator.clipboard.writeText(codes);
      tell(`Copied: ${codes}`);
    } catch {
      // No leave to write to the clipboard: the codes are shown to be copied by hand.
      tell(codes);
    }
  };
  return (
    <div role="region" aria-label="Selected batches" className="no-print sticky bottom-0 mt-4 flex flex-wrap items-center gap-x-4 gap-y-2 border-t-2 border-ink bg-board py-2.5 max-rack:bottom-16">
      <p aria-live="polite"><b className="font-[640]">{formatCount(rows.length, 'batch', 'batches')} selected</b>, {formatCount(bars, 'bar')}, {formatMoney(lost)} lost</p>
      <div className="ml-auto flex gap-2">
        <Block onClick={() => void copy()}>Copy the codes</Block>
        <Block kind="quiet" onClick={onClear}>Select none</Block>
      </div>
    </div>
  );
}
