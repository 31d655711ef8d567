/** What part of a picture is seen: the point in the middle (0..1) and how close, 1 shows all. */
export interface View {
  zoom: number;
  x: number;
  y: number;
}

export const WHOLE: View = { zoom: 1, x: 0.5, y: 0.5 };
export const MOST_ZOOM = 8;

export interface Point {
  x: number;
  y: number;
}

export interface Box extends Point {
  width: number;
  height: number;
}

const within = (value: number, lower: number, upper: number) => Math.min(upper, Math.max(lower, value));

/** The view moved back so that it never shows beyond the picture's edge. */
export function clampView({ zoom, x, y }: View): View {
  const close = within(zoom, 1, MOST_ZOOM);
  const half = 0.5 / close;
  return { zoom: close, x: within(x, half, 1 - half), y: within(y, half, 1 - half) };
}

/** Point of the picture (0..1) under a point of the stage (0..1). */
export function toPicture(view: View, { x, y }: Point): Point {
  return { x: within(view.x + (x - 0.5) / view.zoom, 0, 1), y: within(view.y + (y - 0.5) / view.zoom, 0, 1) };
}

/** Where a point of the picture lies on the stage; may lie outside 0..1. */
export function toStage(view: View, { x, y }: Point): Point {
  return { x: 0.5 + (x - view.x) * view.zoom, y: 0.5 + (y - view.y) * view.zoom };
}

/** Closer or farther by `factor`; the picture's point under `at` (stage, 0..1) stays where it is. */
export function zoomAt(view: View, factor: number, at: Point): View {
  const zoom = within(view.zoom * factor, 1, MOST_ZOOM);
  const kept = { x: view.x + (at.x - 0.5) / view.zoom, y: view.y + (at.y - 0.5) / view.zoom };
  return clampView({ zoom, x: kept.x - (at.x - 0.5) / zoom, y: kept.y - (at.y - 0.5) / zoom });
}

/** Moved by a share of the stage. */
export function panBy(view: View, dx: number, dy: number): View {
  return clampView({ zoom: view.zoom, x: view.x - dx / view.zoom, y: view.y - dy / view.zoom });
}

/** The box between two points of the picture. */
export function boxBetween(a: Point, b: Point): Box {
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) };
}

/** Moves a mark, keeping it on the picture. */
export function moveMark<Mark extends Point & { width?: number; height?: number }>(mark: Mark, dx: number, dy: number): Mark {
  return { ...mark, x: within(mark.x + dx, 0, 1 - (mark.width ?? 0)), y: within(mark.y + dy, 0, 1 - (mark.height ?? 0)) };
}

/** Bars (1..count, in a row across the picture between `from` and `to`) that a mark touches. */
export function barsUnder(mark: { x: number; width?: number | null }, count: number, from = 0.09, to = 0.91): number[] {
  const at = (x: number) => within(Math.floor(((x - from) / (to - from)) * count), 0, count - 1);
  const [first, last] = [at(mark.x), at(mark.x + (mark.width ?? 0))];
  return Array.from({ length: last - first + 1 }, (_bar, index) => first + index + 1);
}
