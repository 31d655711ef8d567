import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import type { Random } from '../../random.ts';
import type { Look } from '../look.ts';
import type { Patch, Sheet, SurfaceBox } from '../sheet.ts';
import type { LoafPictureSpec } from '../spec.ts';

export interface Brush {
  sheet: Sheet;
  look: Look;
  spec: LoafPictureSpec;
  severity: SeverityGrade;
  /** Of this fault on this bar. */
  random: Random;
}

/** Paints one fault on one surface; answers where it is plainest, nothing when this surface cannot show it. */
export type Painter = (brush: Brush, patch: Patch) => SurfaceBox | null;

export function wholeOf(patch: Patch, margin = 0.04): SurfaceBox {
  return { u: patch.w * margin, v: patch.h * margin, w: patch.w * (1 - 2 * margin), h: patch.h * (1 - 2 * margin) };
}

/** Smallest box round round things, cut to the patch. */
export function boxRound(patch: Patch, things: readonly { u: number; v: number; r: number }[]): SurfaceBox | null {
  if (things.length === 0) return null;
  const u = Math.max(0, Math.min(...things.map((t) => t.u - t.r)) - 4), v = Math.max(0, Math.min(...things.map((t) => t.v - t.r)) - 4);
  return { u, v, w: Math.min(patch.w, Math.max(...things.map((t) => t.u + t.r)) + 4) - u, h: Math.min(patch.h, Math.max(...things.map((t) => t.v + t.r)) + 4) - v };
}

/** A box round the largest thing and those near it, for a fault of few, scattered things. */
export function clusterOf(patch: Patch, things: readonly { u: number; v: number; r: number }[]): SurfaceBox | null {
  const [largest] = [...things].sort((a, b) => b.r - a.r);
  if (!largest) return null;
  const away = (t: { u: number; v: number }) => Math.hypot(t.u - largest.u, t.v - largest.v);
  return boxRound(patch, [...things].sort((a, b) => away(a) - away(b)).slice(0, 2).map((t) => ({ ...t, r: t.r + 3 })));
}

/** A box round one thing, wide enough to be pointed at. */
export function pointAt(patch: Patch, thing: { u: number; v: number; r: number } | undefined): SurfaceBox | null {
  return thing ? boxRound(patch, [{ ...thing, r: Math.max(thing.r, 9) }]) : null;
}

/** Places on a patch, away from its edge. */
export function places(patch: Patch, count: number, random: Random, radius: () => number, margin = 0.1): { u: number; v: number; r: number }[] {
  const top = patch.kind === 'face' ? margin + 0.08 : margin;
  return Array.from({ length: count }, () => ({ u: patch.w * random.between(margin, 1 - margin), v: patch.h * random.between(top, 1 - margin), r: radius() }));
}

export function boxOf(thing: { u: number; v: number; r: number }): SurfaceBox {
  return { u: thing.u - thing.r - 1, v: thing.v - thing.r - 1, w: 2 * thing.r + 2, h: 2 * thing.r + 2 };
}

/** Units per mm on a patch. */
export function perMm(patch: Patch): number {
  return patch.kind === 'face' ? patch.w / 80 : patch.h / 80;
}
