import { Upload } from 'lucide-react';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { IMPORT_LIMITS } from '#shared/imports.ts';
import { Flag } from '#src/components/Flag.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape, NotAllowed } from '#src/components/states.tsx';
import { importsQuery, useUploadSheet } from '#src/features/imports/imports.queries.ts';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { formatCount, formatInstant } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

const STATES = { uploaded: 'not checked yet', checked: 'checked', committed: 'in the log' } as const;

/** Brings an older batch history into the log. */
export function Component() {
  const imports = useQuery(importsQuery);
  const upload = useUploadSheet();
  const navigate = useNavigate();
  const may = useMay();
  const { workshop } = useSession();
  const inputId = useId();
  const [isOver, setOver] = useState(false);
  const take = (file: File | undefined) => { if (file) upload.mutate(file, { onSuccess: (sheet) => void navigate(paths.import(sheet.id)) }); };
  return (
    <div className="grid grid-cols-1 gap-7">
      <h1>Import a batch history</h1>
      {may('import.write') ? (
        <div
          className={`grid justify-items-start gap-3 border-2 border-dashed p-6 ${isOver ? 'border-ink bg-tray' : 'border-line-firm'}`}
          onDragOver={(event) => { event.preventDefault(); setOver(true); }}
          onDragLeave={() => setOver(false)}
          onDrop={(event) => { event.preventDefault(); setOver(false); take(event.dataTransfer.files[0]); }}
        >
          <p className="max-w-prose">One row a batch, as CSV; any sheet will do, you match its columns next. A dry run tells every problem by line and column, then all rows are written or none. At most {formatCount(IMPORT_LIMITS.rows, 'row')} and 10 MB.</p>
          <label htmlFor={inputId} className="inline-flex min-h-12 cursor-pointer items-center gap-2 rounded-bar bg-ink px-5 font-[580] text-on-ink block-edge-main"><Upload size={18} aria-hidden="true" />{upload.isPending ? 'Reading the sheet …' : 'Choose a CSV file'}</label>
          <input id={inputId} type="file" accept=".csv,text/csv,text/plain" className="sr-only" disabled={upload.isPending} onChange={(event) => { take(event.target.files?.[0]); event.target.value = ''; }} />
          <p className="text-note text-ink-2">Or drop it here. <a href="/api/exports/batches.csv" download>Our own format</a>, with this log in it, shows the columns.</p>
          {upload.isError && <ErrorState error={upload.error} />}
        </div>
      ) : <NotAllowed>Owners and makers import.</NotAllowed>}
      <section>
        <Rail heading="Earlier imports" aside={imports.data && String(imports.data.length)} />
        {imports.isPending && <LoadingShape says="Fetching earlier imports" rows={3} />}
        {imports.isError && <ErrorState error={imports.error} onRetry={() => void imports.refetch()} />}
        {imports.data?.length === 0 && <EmptyState title="Nothing was imported yet" />}
        <ul>
          {imports.data?.map((sheet) => (
            <li key={sheet.id} className="flex flex-wrap items-center gap-x-4 border-b border-line py-2">
              {may('import.write') ? <Link to={paths.import(sheet.id)} className="flex min-h-10 items-center font-[600]">{sheet.fileName}</Link> : <span className="font-[600]">{sheet.fileName}</span>}
              <span className="text-note text-ink-2">{formatCount(sheet.rowCount, 'row')}, {formatInstant(sheet.createdAt, workshop.timeZone)}</span>
              <span className="ml-auto"><Flag kind={sheet.state === 'committed' ? 'passed' : 'draft'}>{sheet.state === 'committed' ? formatCount(sheet.batchesMade ?? 0, 'batch', 'batches') : STATES[sheet.state]}</Flag></span>
            </li>
          ))}
        </ul>
      </section>
    </div>
  );
}
