import type { Tint } from './colour.ts';

/** The picture while it is built: colour, height and shine of each pixel, before any light falls on it. */
export interface Sheet {
  width: number;
  height: number;
  /** Pixels per unit; a picture is 1000 units across. */
  scale: number;
  r: Float32Array;
  g: Float32Array;
  b: Float32Array;
  /** Height above the board, in pixels. */
  z: Float32Array;
  /** 0 matt to 1 wet. */
  shine: Float32Array;
  /** Share of the light that reaches a face turned away from the lens. */
  lit: Float32Array;
  /** Which patch a pixel belongs to; 0 is the board. */
  owner: Uint8Array;
  /** How far inside its patch's outline a pixel lies, in units. */
  inset: Float32Array;
}

/** A flat piece of surface: a bar's face, a loaf's end, a label. */
export interface Patch {
  id: number;
  /** Bar it belongs to, numbered from 1; 0 for a whole loaf or a prop. */
  bar: number;
  kind: 'top' | 'face' | 'side' | 'batter' | 'prop';
  /** Extent on the surface, in units. */
  w: number;
  h: number;
  /** Middle in the picture, in units. */
  cx: number;
  cy: number;
  /** The surface's two directions in the picture, per unit of surface. */
  ax: { x: number; y: number };
  ay: { x: number; y: number };
  /** Height of its middle above the board, in units. */
  lift: number;
}

let kept: Sheet | undefined;

/** An empty sheet; the memory of the last one of the same size is used again. */
export function blankSheet(width: number, height: number): Sheet {
  if (kept && kept.width === width && kept.height === height) {
    kept.owner.fill(0);
    kept.shine.fill(0);
    kept.lit.fill(1);
    return kept;
  }
  const n = width * height;
  const plane = () => new Float32Array(n);
  kept = { width, height, scale: width / 1000, r: plane(), g: plane(), b: plane(), z: plane(), shine: plane(), lit: plane().fill(1), owner: new Uint8Array(n), inset: plane() };
  return kept;
}

/** A patch that lies flat on the board, turned by a small angle. */
export function flatPatch(id: number, kind: Patch['kind'], bar: number, box: { cx: number; cy: number; w: number; h: number }, lift: number, turn = 0): Patch {
  const c = Math.cos(turn), s = Math.sin(turn);
  return { id, bar, kind, w: box.w, h: box.h, cx: box.cx, cy: box.cy, ax: { x: c, y: s }, ay: { x: -s, y: c }, lift };
}

/** Calls back for each pixel under a patch's frame and a margin round it: pixel, and place on the surface in units. */
export function overFrame(sheet: Sheet, patch: Patch, margin: number, paint: (k: number, u: number, v: number) => void): void {
  const { ax, ay, w, h, cx, cy } = patch;
  const S = sheet.scale, det = ax.x * ay.y - ax.y * ay.x;
  const spanX = (Math.abs(ax.x) * (w / 2 + margin) + Math.abs(ay.x) * (h / 2 + margin)), spanY = (Math.abs(ax.y) * (w / 2 + margin) + Math.abs(ay.y) * (h / 2 + margin));
  const x0 = Math.max(0, Math.floor((cx - spanX) * S)), x1 = Math.min(sheet.width - 1, Math.ceil((cx + spanX) * S));
  const y0 = Math.max(0, Math.floor((cy - spanY) * S)), y1 = Math.min(sheet.height - 1, Math.ceil((cy + spanY) * S));
  for (let py = y0; py <= y1; py += 1) {
    const dy = py / S - cy;
    for (let px = x0; px <= x1; px += 1) {
      const dx = px / S - cx;
      paint(py * sheet.width + px, (dx * ay.y - dy * ay.x) / det + w / 2, (dy * ax.x - dx * ax.y) / det + h / 2);
    }
  }
}

/** As `overFrame`, for the pixels the patch owns, within a box of its surface when one is given. */
export function overPatch(sheet: Sheet, patch: Patch, paint: (k: number, u: number, v: number) => void, box?: SurfaceBox): void {
  const { owner } = sheet;
  const { id } = patch;
  if (!box) {
    overFrame(sheet, patch, 8, (k, u, v) => { if (owner[k] === id) paint(k, u, v); });
    return;
  }
  const part = { ...patch, w: box.w, h: box.h, ...pictureOf(patch, box.u + box.w / 2, box.v + box.h / 2) };
  overFrame(sheet, part, 0, (k, u, v) => { if (owner[k] === id) paint(k, u + box.u, v + box.v); });
}

export interface SurfaceBox { u: number; v: number; w: number; h: number }

/** Where a point of the surface lies in the picture, in units. */
export function pictureOf(patch: Patch, u: number, v: number): { cx: number; cy: number } {
  const du = u - patch.w / 2, dv = v - patch.h / 2;
  return { cx: patch.cx + patch.ax.x * du + patch.ay.x * dv, cy: patch.cy + patch.ax.y * du + patch.ay.y * dv };
}

/** Lets a colour cover a share of one pixel. */
export function stain(sheet: Sheet, k: number, colour: Tint, share: number): void {
  sheet.r[k] = (sheet.r[k] as number) + (colour.r - (sheet.r[k] as number)) * share;
  sheet.g[k] = (sheet.g[k] as number) + (colour.g - (sheet.g[k] as number)) * share;
  sheet.b[k] = (sheet.b[k] as number) + (colour.b - (sheet.b[k] as number)) * share;
}

/** Darkens or lightens one pixel without changing its hue. */
export function shade(sheet: Sheet, k: number, by: number): void {
  sheet.r[k] = (sheet.r[k] as number) * by;
  sheet.g[k] = (sheet.g[k] as number) * by;
  sheet.b[k] = (sheet.b[k] as number) * by;
}

export function lift(sheet: Sheet, k: number, byUnits: number): void {
  sheet.z[k] = (sheet.z[k] as number) + byUnits * sheet.scale;
}
