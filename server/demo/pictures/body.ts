import type { Raster } from './raster.ts';

/** One thing lying on the board: a bar, a loaf or a filled mould. Lengths are pixels of the picture. */
export interface Body {
  /** Mark left in the raster's `owner` plane. */
  mark: number;
  /** Bar counted from the maker's mark; 0 for an uncut loaf. */
  bar: number;
  cx: number;
  cy: number;
  halfWidth: number;
  halfHeight: number;
  /** Turn on the board in radians. */
  turn: number;
  corner: number;
  /** Height above the board. */
  thickness: number;
  side: 'top' | 'face' | 'batter';
  /** Lifts or lowers the outline's upper edge, as a textured top does when seen from the cut side. */
  skyline?: (x: number) => number;
}

/** A pixel of a body: place from its centre in pixels, and depth inside its outline. */
export type AtPixel = (k: number, x: number, y: number, depth: number) => void;

/** Visits the pixels inside a body's outline. */
export function forEachPixel(raster: Raster, body: Body, visit: AtPixel): void {
  const { cx, cy, halfWidth, halfHeight, corner, skyline } = body;
  const cos = Math.cos(body.turn);
  const sin = Math.sin(body.turn);
  const slack = skyline ? 26 : 2;
  const reachX = Math.abs(halfWidth * cos) + Math.abs((halfHeight + slack) * sin);
  const reachY = Math.abs(halfHeight * cos) + Math.abs(halfWidth * sin) + slack;
  const left = Math.max(0, Math.floor(cx - reachX));
  const right = Math.min(raster.width - 1, Math.ceil(cx + reachX));
  const top = Math.max(0, Math.floor(cy - reachY));
  const bottom = Math.min(raster.height - 1, Math.ceil(cy + reachY));
  for (let py = top; py <= bottom; py += 1) {
    for (let px = left; px <= right; px += 1) {
      const x = (px - cx) * cos + (py - cy) * sin;
      const y = (py - cy) * cos - (px - cx) * sin;
      const lift = skyline && y < 0 ? skyline(x) : 0;
      const dx = Math.abs(x) - halfWidth + corner;
      const dy = (y < 0 ? -y - lift : y) - halfHeight + corner;
      const outside = dx > 0 && dy > 0 ? Math.sqrt(dx * dx + dy * dy) : Math.max(dx, dy);
      const depth = corner - outside;
      if (depth > 0) visit(py * raster.width + px, x, y, depth);
    }
  }
}

/** Height of a rounded edge of the given radius, from 0 at the outline to 1 inside. */
export function edgeHeight(depth: number, radius: number): number {
  if (depth >= radius) return 1;
  const t = 1 - depth / radius;
  return Math.sqrt(1 - t * t);
}

