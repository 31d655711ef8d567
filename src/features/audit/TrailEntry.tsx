import type { AuditEntry } from '#shared/audit.ts';
import { formatCount, formatInstant } from '#src/lib/format.ts';
import { calledIn, changesIn, deedWords, tableWords, type FieldChange } from './trail-words.ts';

/** Changes shown before the rest is folded away. */
const SHOWN = 4;

function Change({ change: { field, before, after }, deed }: { change: FieldChange; deed: string }) {
  const words = deed === 'update' ? <>from <span className="text-ink">{before}</span> to <b className="font-[600] text-ink">{after}</b></> : <span className="text-ink">{deed === 'delete' ? before : after}</span>;
  return <li className="break-words">{field}: {words}</li>;
}

/** One line of the trail. */
export function TrailEntry({ entry, timeZone, onRecord }: { entry: AuditEntry; timeZone: string; onRecord: (recordId: string) => void }) {
  const called = calledIn(entry);
  const changes = changesIn(entry);
  const { recordId } = entry;
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-line py-2.5 rack:grid-cols-[11rem_minmax(0,1fr)]">
      <time dateTime={entry.at} className="text-note text-ink-2">{formatInstant(entry.at, timeZone)}</time>
      <div className="grid min-w-0 gap-1">
        <p>
          <b className="font-[600]">{entry.memberName ?? 'Loafmark'}</b> {deedWords(entry.deed)} {tableWords(entry.table)}{' '}
          {recordId ? <button type="button" className="font-[600] underline underline-offset-3" aria-label={`All entries of ${called ?? 'this record'}`} onClick={() => onRecord(recordId)}>{called ?? 'this record'}</button> : called}
        </p>
        {changes.length > 0 && (
          <ul className="text-note text-ink-2">
            {changes.slice(0, SHOWN).map((change) => <Change key={change.field} change={change} deed={entry.deed} />)}
          </ul>
        )}
        {changes.length > SHOWN && (
          <details className="text-note text-ink-2">
            <summary className="w-fit underline underline-offset-3">{formatCount(changes.length - SHOWN, 'more field')}</summary>
            <ul>{changes.slice(SHOWN).map((change) => <Change key={change.field} change={change} deed={entry.deed} />)}</ul>
          </details>
        )}
      </div>
    </li>
  );
}
