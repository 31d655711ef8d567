import { Link } from 'react-router-dom';
import { formatCount } from '#src/lib/format.ts';
import { isUnfinished } from './upload-queue.ts';
import { useUploads } from './Uploads.tsx';

/** One line over every screen while photos are on their way or were not taken; nothing else. */
export function UploadsLine({ batchAddress }: { batchAddress: (batchId: string) => string }) {
  const { uploads } = useUploads();
  const going = uploads.filter((upload) => isUnfinished(upload) && upload.state !== 'stopped');
  const stuck = uploads.filter(({ state }) => state === 'stopped' || state === 'refused');
  const shown = stuck[0] ?? going[0];
  if (!shown) return null;
  return (
    <p role="status" className="no-print flex flex-wrap items-baseline gap-x-3 bg-tray px-5 py-1.5 text-note max-rack:px-4">
      {going.length > 0 && <span>{formatCount(going.length, 'photo')} on the way.</span>}
      {stuck.length > 0 && <b className="font-[640]">{formatCount(stuck.length, 'photo')} not taken.</b>}
      <Link to={batchAddress(shown.batchId)} className="underline underline-offset-3 coarse:py-2.5">Look at {shown.batchCode}</Link>
    </p>
  );
}
