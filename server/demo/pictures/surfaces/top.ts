import { type Body, edgeHeight, forEachPixel } from '../body.ts';
import type { Look } from '../look.ts';
import { type Colour, mix, type Raster, smooth } from '../raster.ts';
import { combedOver } from './comb-table.ts';
import { put } from './face.ts';

export interface Stroke { height: number; share: number; thread: number }

/** The combed top at a place of the loaf: height 0..1 of its ridges, and how much of the other colours lies there. */
export function combed(look: Look, u: number, v: number): Stroke {
  const { noise, otherNoise, strokeWidth, strokeWildness } = look;
  const wx = (noise.cloud(u * 0.16, v * 0.2) - 0.5) * strokeWildness;
  const wy = (otherNoise.cloud(u * 0.16 + 90, v * 0.2) - 0.5) * strokeWildness;
  const sweep = Math.sin(u * 0.0125 + wy * 2.2) * 74;
  const phase = ((v + sweep + wx * 88) / strokeWidth + wy * 1.3) * Math.PI;
  const ridge = 0.5 + 0.5 * Math.sin(phase * 2 + Math.sin(phase) * 0.8);
  const crest = ridge ** 1.7;
  const fold = noise.cloud(u * 0.34 + wy * 60, v * 0.3 + Math.sin(phase) * 9 + wx * 50);
  const share = smooth(1 - look.swirlShare - 0.03, 1 - look.swirlShare + 0.03, fold + (ridge - 0.5) * 0.22);
  const drawn = otherNoise.cloud(u * 0.2 + wx * 40, phase * 9);
  const thread = smooth(0.66, 0.72, drawn) * (0.4 + 0.6 * ridge);
  return { height: crest, share, thread };
}

/** Paints the top of a loaf or of its bars, seen from above. `along` is where the body's left end lies in the loaf. */
export function paintTop(raster: Raster, body: Body, look: Look, offset: number): void {
  const { noise, otherNoise } = look;
  const strokeAt = combedOver(look, body, offset);
  const relief = look.isRough ? 5 : 13;
  const isPlain = look.design === 'plain' || look.design === 'specks';
  const specksIn = look.design === 'specks';
  const dark: Colour = [look.second[0] * 0.8, look.second[1] * 0.8, look.second[2] * 0.8];
  forEachPixel(raster, body, (k, x, y, depth) => {
    const u = x + offset;
    const stroke = strokeAt(x, y);
    const across = Math.abs(y) / body.halfHeight;
    const middle = 1 - across * across;
    const round = edgeHeight(depth, 6);
    const lumps = look.isRough
      ? (noise.cloud(u * 1.1, y * 1.1) - 0.5) * 17 + (otherNoise.cloud(u * 2.6, y * 2.6) - 0.5) * 8
      : (noise.cloud(u * 0.7, y * 0.7) - 0.5) * 4.4 + (otherNoise.cloud(u * 2, y * 2) - 0.5) * 1.1;
    raster.z[k] = body.thickness + round * 6 + (stroke.height * relief + lumps) * (0.35 + 0.65 * middle) + middle * 9 + (noise.grain(x, y) - 0.5) * 0.25;
    let colour = isPlain ? mix(look.base, look.third, stroke.height * 0.3) : mix(mix(look.base, look.second, stroke.share * 0.94), look.third, stroke.thread * 0.7);
    if (specksIn) colour = mix(colour, dark, smooth(0.9, 0.96, otherNoise.grain(u * 0.58 + y * 0.38, y * 0.58 - u * 0.38)) * smooth(0.3, 0.7, noise.cloud(u * 0.5, y * 0.5)));
    const worn = 1 + (otherNoise.cloud(u * 1.6 + 40, y * 1.6) - 0.5) * (look.isRough ? 0.2 : 0.08);
    put(raster, k, [colour[0] * worn, colour[1] * worn, colour[2] * worn], look.gloss * 0.9, body.mark);
  });
}
