import { ImageOff, RotateCw, X } from 'lucide-react';
import { ProgressBar } from '#src/components/ProgressBar.tsx';
import { formatNumber } from '#src/lib/format.ts';
import { useUploads } from './Uploads.tsx';
import type { Upload } from './upload-queue.ts';

const ACT = 'inline-flex min-h-10 min-w-10 shrink-0 items-center justify-center gap-1.5 rounded-bar border border-line-firm px-2 text-note coarse:min-h-12 coarse:min-w-12';

/** Photos on their way, each with how far it is, why it waits, and a way to stop it or to try again. */
export function UploadList({ uploads, withBatch = false }: { uploads: readonly Upload[]; withBatch?: boolean }) {
  const { queue } = useUploads();
  if (uploads.length === 0) return null;
  return (
    <ul aria-label="Photos on their way" className="grid max-w-3xl gap-px">
      {uploads.map((upload) => (
        <li key={upload.id} className="flex items-center gap-3 border-t border-line py-1.5">
          <Preview upload={upload} />
          <div className="grid min-w-0 flex-1 gap-0.5">
            <p className="truncate text-row">{withBatch && <b className="stamp mr-2">{upload.batchCode}</b>}{upload.fileName}</p>
            <Standing upload={upload} />
          </div>
          {upload.state === 'stopped' && <button type="button" className={ACT} aria-label={`Send ${upload.fileName} again`} onClick={() => queue.tryAgain(upload.id)}><RotateCw size={16} aria-hidden="true" />Try again</button>}
          {upload.state !== 'kept' && (
            <button type="button" className={ACT} aria-label={`${upload.state === 'refused' ? 'Close' : 'Stop'} ${upload.fileName}`} onClick={() => queue.remove(upload.id)}><X size={16} aria-hidden="true" /></button>
          )}
        </li>
      ))}
    </ul>
  );
}

/** The picture as it lies on this device; nothing where the browser cannot show it. */
function Preview({ upload }: { upload: Upload }) {
  return (
    <span className="grid size-12 shrink-0 place-items-center overflow-hidden bg-well text-[#000]">
      {upload.state === 'refused' ? <ImageOff size={20} aria-hidden="true" /> : <img src={upload.preview} alt="" width={48} height={48} className="size-full object-cover" onError={(event) => event.currentTarget.remove()} />}
    </span>
  );
}

function Standing({ upload }: { upload: Upload }) {
  const mib = (bytes: number) => formatNumber(bytes / 1024 / 1024, 1);
  switch (upload.state) {
    case 'sending':
      return <ProgressBar done={upload.sentBytes} of={upload.bytes} label={`${mib(upload.sentBytes)} of ${mib(upload.bytes)} MiB sent`} />;
    case 'reading':
      return <p className="text-note text-ink-2">Sent; being looked at …</p>;
    case 'kept':
      return <p role="status" className="text-note font-[600]">Kept</p>;
    case 'refused':
      return <p role="alert" className="text-note"><b className="font-[640]">Not taken.</b> {upload.reason}</p>;
    default:
      return <p role="status" className="text-note text-ink-2">{upload.reason ?? 'Waits for its turn'}</p>;
  }
}
