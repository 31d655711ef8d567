import { MapPin, SquareDashed, ZoomIn, ZoomOut } from 'lucide-react';
import { useMemo, useState } from 'react';
import type { PhotoView } from '#shared/photos.ts';
import { PhotoStage } from '#src/components/PhotoStage.tsx';
import { Pin, type PlacedMark } from '#src/components/Pin.tsx';
import { WHOLE, zoomAt, type Box, type Point, type View } from '#src/components/photo-geometry.ts';
import { pictureAddress } from '#src/features/photos/photos.queries.ts';
import { useKeys } from '#src/lib/keys.ts';

export interface ShownMark {
  key: string;
  mark: PlacedMark;
  fault: string;
  name: string;
  severity: number | undefined;
  isChosen: boolean;
  onChoose?: () => void;
  onMove?: (dx: number, dy: number) => void;
}

interface PhotoMarkerProps {
  photo: PhotoView;
  alt: string;
  marks: readonly ShownMark[];
  canMark: boolean;
  onMark: (mark: Point | Box) => void;
}

const TOOL = 'flex min-h-10 items-center gap-1.5 px-3 text-row font-[540] coarse:min-h-12 aria-pressed:bg-ink aria-pressed:text-on-ink';

/** One photo in its well, with what is marked on it and the tools to mark more. */
export function PhotoMarker({ photo, alt, marks, canMark, onMark }: PhotoMarkerProps) {
  const [view, setView] = useState<View>(WHOLE);
  const [tool, setTool] = useState<'point' | 'area'>('point');
  const [areShown, setShown] = useState(true);
  const keys = useMemo(() => ({
    m: () => setShown((shown) => !shown),
    z: () => setView((seen) => (seen.zoom >= 4 ? WHOLE : zoomAt(seen, 2, { x: 0.5, y: 0.5 }))),
    ...(canMark ? { p: () => setTool('point'), a: () => setTool('area') } : {}),
  }), [canMark]);
  useKeys(keys);
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap items-center gap-2">
        {canMark && (
          <div role="group" aria-label="How to mark" className="inline-flex gap-0.5 rounded-bar bg-line-firm p-px">
            <button type="button" aria-pressed={tool === 'point'} className={`${TOOL} bg-tray`} onClick={() => setTool('point')}><MapPin size={17} aria-hidden="true" />Point</button>
            <button type="button" aria-pressed={tool === 'area'} className={`${TOOL} bg-tray`} onClick={() => setTool('area')}><SquareDashed size={17} aria-hidden="true" />Area</button>
          </div>
        )}
        <div className="ml-auto inline-flex gap-0.5 rounded-bar bg-line-firm p-px">
          <button type="button" aria-label="Look closer" className={`${TOOL} bg-tray`} onClick={() => setView(zoomAt(view, 1.6, { x: 0.5, y: 0.5 }))}><ZoomIn size={18} aria-hidden="true" /></button>
          <button type="button" aria-label="Step back" disabled={view.zoom === 1} className={`${TOOL} bg-tray disabled:text-ink-3`} onClick={() => setView(zoomAt(view, 1 / 1.6, { x: 0.5, y: 0.5 }))}><ZoomOut size={18} aria-hidden="true" /></button>
          <button type="button" aria-pressed={areShown} className={`${TOOL} bg-tray`} onClick={() => setShown(!areShown)}>Marks</button>
        </div>
      </div>
      <PhotoStage src={pictureAddress(photo.id, 'display')} alt={alt} aspect={photo.width / photo.height} view={view} onView={setView} tool={canMark ? tool : undefined} onPoint={onMark} onArea={onMark}>
        {areShown && marks.map(({ key, ...pin }) => <Pin key={key} view={view} {...pin} />)}
      </PhotoStage>
    </div>
  );
}
