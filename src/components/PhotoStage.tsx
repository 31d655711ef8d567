import { useRef, useState, type KeyboardEvent, type PointerEvent, type ReactNode, type RefObject } from 'react';
import { boxBetween, panBy, toPicture, toStage, WHOLE, zoomAt, type Box, type Point, type View } from './photo-geometry.ts';
import { useWheelZoom } from './use-wheel-zoom.ts';

interface PhotoStageProps {
  src: string;
  alt: string;
  /** Width over height of the upright picture. */
  aspect: number;
  view: View;
  onView: (view: View) => void;
  /** `point`: a touch places a point and a drag moves the picture; `area`: a drag draws round. Undefined: look only. */
  tool?: 'point' | 'area' | undefined;
  onPoint?: (point: Point) => void;
  onArea?: (box: Box) => void;
  /** Pins and areas; placed by `toStage(view, …)`. */
  children?: ReactNode;
  className?: string;
}

/** A touch that moves less than this (CSS px) is a touch, not a drag. */
const SLIP = 8;
/** Two touches at one place within this time are one: wet screens double them. */
const ECHO_MS = 250;
const PAN_STEP = 0.12;

interface Touching {
  start: Point;
  last: Point;
  moved: boolean;
}

/** The picture in its neutral well: looked at closely with fingers, mouse and keyboard, and marked. */
export function PhotoStage({ src, alt, aspect, view, onView, tool, onPoint, onArea, children, className = '' }: PhotoStageProps) {
  const stage = useRef<HTMLDivElement>(null);
  const pointers = useRef(new Map<number, Touching>());
  const lastTouch = useRef<{ at: number; point: Point }>({ at: -1e9, point: { x: -1, y: -1 } });
  const [drawing, setDrawing] = useState<Box | null>(null);
  useWheelZoom(stage, view, onView);

  const place = (event: PointerEvent): Point => placeIn(stage, event);
  const slipped = (a: Point, b: Point) => {
    const rect = stage.current?.getBoundingClientRect();
    return Math.hypot((a.x - b.x) * (rect?.width ?? 1), (a.y - b.y) * (rect?.height ?? 1)) > SLIP;
  };

  const move = (event: PointerEvent) => {
    const touching = pointers.current.get(event.pointerId);
    if (!touching) return;
    const now = place(event);
    touching.moved ||= slipped(touching.start, now);
    if (pointers.current.size === 2) pinch(event.pointerId, touching, now);
    else if (touching.moved && tool === 'area') setDrawing(boxBetween(toPicture(view, touching.start), toPicture(view, now)));
    else if (touching.moved) onView(panBy(view, now.x - touching.last.x, now.y - touching.last.y));
    touching.last = now;
  };

  const pinch = (id: number, touching: Touching, now: Point) => {
    const other = [...pointers.current].find(([key]) => key !== id)?.[1];
    if (!other) return;
    other.moved = true;
    const before = Math.hypot(touching.last.x - other.last.x, touching.last.y - other.last.y);
    const after = Math.hypot(now.x - other.last.x, now.y - other.last.y);
    if (before > 0.01) onView(zoomAt(view, after / before, { x: (now.x + other.last.x) / 2, y: (now.y + other.last.y) / 2 }));
  };

  const lift = (event: PointerEvent) => {
    const touching = pointers.current.get(event.pointerId);
    pointers.current.delete(event.pointerId);
    if (!touching) return;
    const now = place(event);
    if (touching.moved) {
      if (tool === 'area' && drawing && drawing.width > 0.01 && drawing.height > 0.01) onArea?.(drawing);
      setDrawing(null);
      return;
    }
    const isEcho = event.timeStamp - lastTouch.current.at < ECHO_MS && !slipped(lastTouch.current.point, now);
    lastTouch.current = { at: event.timeStamp, point: now };
    if (!isEcho && tool) onPoint?.(toPicture(view, now));
  };

  const key = (event: KeyboardEvent) => {
    if (event.target !== event.currentTarget) return;
    const acts: Record<string, () => void> = {
      '+': () => onView(zoomAt(view, 1.5, { x: 0.5, y: 0.5 })), '=': () => onView(zoomAt(view, 1.5, { x: 0.5, y: 0.5 })),
      '-': () => onView(zoomAt(view, 1 / 1.5, { x: 0.5, y: 0.5 })), '0': () => onView(WHOLE),
      ArrowLeft: () => onView(panBy(view, PAN_STEP, 0)), ArrowRight: () => onView(panBy(view, -PAN_STEP, 0)),
      ArrowUp: () => onView(panBy(view, 0, PAN_STEP)), ArrowDown: () => onView(panBy(view, 0, -PAN_STEP)),
      ...(tool ? { Enter: () => onPoint?.({ x: view.x, y: view.y }) } : {}),
    };
    const act = acts[event.key];
    if (!act) return;
    event.preventDefault();
    act();
  };

  const box = drawing && { from: toStage(view, drawing), to: toStage(view, { x: drawing.x + drawing.width, y: drawing.y + drawing.height }) };
  return (
    <div
      ref={stage}
      tabIndex={0}
      role="group"
      aria-label={`Photo: ${alt}. ${tool ? 'Enter places a point in the middle; ' : ''}plus and minus zoom, arrows move.`}
      className={`on-photo group relative w-full touch-none overflow-hidden bg-well select-none ${tool === 'area' ? 'cursor-crosshair' : tool ? 'cursor-cell' : view.zoom > 1 ? 'cursor-grab' : ''} ${className}`}
      style={{ aspectRatio: aspect }}
      onPointerDown={(event) => {
        if (event.target instanceof Element && event.target.closest('button')) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        const start = place(event);
        if (pointers.current.size < 2) pointers.current.set(event.pointerId, { start, last: start, moved: false });
      }}
      onPointerMove={move}
      onPointerUp={lift}
      onPointerCancel={(event) => { pointers.current.delete(event.pointerId); setDrawing(null); }}
      onKeyDown={key}
    >
      <img src={src} alt={alt} draggable={false} className="absolute inset-0 size-full origin-top-left" style={{ transform: `translate(${(0.5 - view.x * view.zoom) * 100}%, ${(0.5 - view.y * view.zoom) * 100}%) scale(${view.zoom})` }} />
      {children}
      {box && <div aria-hidden="true" className="pointer-events-none absolute border-[2.5px] border-pin outline-2 outline-[#17191a]" style={{ left: `${box.from.x * 100}%`, top: `${box.from.y * 100}%`, width: `${(box.to.x - box.from.x) * 100}%`, height: `${(box.to.y - box.from.y) * 100}%` }} />}
      {tool && <svg viewBox="0 0 24 24" aria-hidden="true" className="pointer-events-none absolute left-1/2 top-1/2 hidden size-8 -translate-x-1/2 -translate-y-1/2 group-focus-visible:block"><path d="M12 2v20M2 12h20" stroke="#17191a" strokeWidth="3" /><path d="M12 2v20M2 12h20" stroke="#fff" strokeWidth="1.2" /></svg>}
    </div>
  );
}

function placeIn(stage: RefObject<HTMLDivElement | null>, event: PointerEvent): Point {
  const rect = stage.current?.getBoundingClientRect();
  if (!rect || rect.width === 0) return { x: 0.5, y: 0.5 };
  return { x: (event.clientX - rect.left) / rect.width, y: (event.clientY - rect.top) / rect.height };
}
