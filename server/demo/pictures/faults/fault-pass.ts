import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import type { Random } from '../../random.ts';
import { type Body, forEachPixel } from '../body.ts';
import type { Look } from '../look.ts';
import type { Raster } from '../raster.ts';
import type { Extent } from './extent.ts';

/** One fault being laid over one body. */
export interface FaultPass {
  raster: Raster;
  body: Body;
  look: Look;
  /** How large the body is drawn; 1 is a face 248 wide. */
  scale: number;
  /** Where the body's top lies along its loaf, in pixels. */
  offset: number;
  severity: SeverityGrade;
  ageDays: number;
  random: Random;
  /** How far the fault reaches here, 0..1: an uncut loaf carries it only where its bars will be cut. */
  reach: (x: number) => number;
  extent: Extent;
}

export type FaultPainter = (pass: FaultPass) => void;

/** Visits a body's pixels with the fault's reach there; the share returned is how plainly the fault shows. */
export function lay(pass: FaultPass, paint: (k: number, x: number, y: number, depth: number, reach: number) => number): void {
  const { raster, body, reach, extent } = pass;
  forEachPixel(raster, body, (k, x, y, depth) => {
    const here = reach(x);
    if (here <= 0.01) return;
    const share = paint(k, x, y, depth, here);
    if (share > 0.25) extent.add(k, share);
  });
}

export interface Disc { x: number; y: number; radius: number; angle: number; roundness: number }

/** Scatters discs over a body, away from its very edge; fewer where the fault does not reach. */
export function scatter(pass: FaultPass, count: number, radius: (random: Random) => number): Disc[] {
  const { body, random, reach } = pass;
  return Array.from({ length: count }, () => ({
    x: random.between(-0.92, 0.92) * (body.halfWidth - 4), y: random.between(-0.88, 0.9) * (body.halfHeight - 4),
    radius: radius(random), angle: random.between(0, Math.PI), roundness: random.between(0.62, 1),
  })).filter(({ x }) => random.chance(reach(x)));
}

/** Visits the pixels of discs: `from` is 0 in the middle of a disc, 1 on its rim, up to 1.6 outside. */
export function stamp(pass: FaultPass, discs: readonly Disc[], paint: (k: number, from: number, disc: Disc, wx: number, wy: number) => number): void {
  const { raster, body, extent, look } = pass;
  const cos = Math.cos(body.turn);
  const sin = Math.sin(body.turn);
  for (const disc of discs) {
    const px = body.cx + disc.x * cos - disc.y * sin;
    const py = body.cy + disc.x * sin + disc.y * cos;
    const far = Math.ceil(disc.radius * 1.7 + 1);
    const ca = Math.cos(disc.angle);
    const sa = Math.sin(disc.angle);
    for (let y = Math.max(0, Math.floor(py - far)); y <= Math.min(raster.height - 1, py + far); y += 1) {
      for (let x = Math.max(0, Math.floor(px - far)); x <= Math.min(raster.width - 1, px + far); x += 1) {
        const k = y * raster.width + x;
        if (raster.owner[k] !== body.mark) continue;
        const wx = x - px;
        const wy = y - py;
        const a = wx * ca + wy * sa;
        const b = (wy * ca - wx * sa) / disc.roundness;
        const wobble = 1 + (look.noise.cloud(x * 40 / (disc.radius * 4 + 12), y * 40 / (disc.radius * 4 + 12)) - 0.5) * 0.5;
        const from = Math.sqrt(a * a + b * b) / (disc.radius * wobble);
        if (from > 1.6) continue;
        const share = paint(k, from, disc, wx, wy);
        if (share > 0.25) extent.add(k, share);
      }
    }
  }
}
