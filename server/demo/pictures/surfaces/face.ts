import { type Body, edgeHeight, forEachPixel } from '../body.ts';
import type { Look } from '../look.ts';
import { type Colour, mix, type Raster, smooth } from '../raster.ts';

/** Paints the cut face of a bar: the design carried on from bar to bar, under the fine marks of the wire. */
export function paintFace(raster: Raster, body: Body, look: Look, scale: number): void {
  const { noise, otherNoise } = look;
  const paint = designOf(look);
  const roughness = look.isRough ? 3.2 : 0.55;
  forEachPixel(raster, body, (k, x, y, depth) => {
    const u = x / scale + body.bar * 9;
    const v = y / scale + body.bar * 4;
    const wire = (noise.grain(x * 0.05 + body.bar * 31, y * 0.8) - 0.5) * 0.55 + (otherNoise.grain(x * 0.012 + body.bar * 17, y * 0.34) - 0.5) * 0.7;
    const slow = noise.cloud(x * 0.35 + body.bar * 77, y * 0.35);
    const round = edgeHeight(depth, 7);
    raster.z[k] = body.thickness + round * 6 + wire * (look.isRough ? 0.4 : 1) + slow * 3 * (look.isRough ? 2.4 : 0.8)
      + (look.isRough ? (otherNoise.cloud(x * 2.3, y * 2.3) - 0.5) * roughness * 1.5 : 0);
    let colour = paint(u, v);
    const mottle = (otherNoise.cloud(u * 1.7 + 40, v * 1.7) - 0.5) * (look.isRough ? 0.24 : 0.07) + (noise.grain(x, y) - 0.5) * 0.035;
    const worn = 1 + mottle + (1 - round) * 0.06;
    colour = [colour[0] * worn, colour[1] * worn, colour[2] * worn];
    put(raster, k, colour, look.gloss * (0.75 + 0.5 * slow), body.mark);
  });
}

export function put(raster: Raster, k: number, colour: Colour, gloss: number, mark: number): void {
  raster.red[k] = colour[0];
  raster.green[k] = colour[1];
  raster.blue[k] = colour[2];
  raster.gloss[k] = gloss;
  raster.owner[k] = mark;
}

/** Colour of the design at a place of the face, in units of a bar about 250 wide. */
function designOf(look: Look): (u: number, v: number) => Colour {
  const { noise, otherNoise, base, second, third, stretch } = look;
  const shadeOf = (colour: Colour, by: number): Colour => [colour[0] * by, colour[1] * by, colour[2] * by];
  if (look.design === 'layers') {
    const line = noise.cloud(3, 9) * 60 - 20;
    const upper = -20 - otherNoise.cloud(50, 80) * 70;
    return (u, v) => {
      const wave = (noise.cloud(u * 0.22, 11) - 0.5) * 42 + (noise.cloud(u * 0.9, v * 0.12) - 0.5) * 14;
      const low = smooth(-1.6, 1.6, v - line - wave);
      const wave2 = (otherNoise.cloud(u * 0.26, 31) - 0.5) * 36 + (otherNoise.cloud(u * 1.1, v * 0.2) - 0.5) * 10;
      const high = smooth(1.6, -1.6, v - upper - wave2);
      const pencil = smooth(3.6, 1.4, Math.abs(v - line - wave + 1.5)) * smooth(0.1, 0.3, noise.cloud(u * 0.7, 70));
      return mix(mix(mix(base, second, low), third, high), shadeOf(second, 0.42), pencil * 0.75);
    };
  }
  if (look.design === 'plain') return (u, v) => mix(base, third, 0.28 * smooth(0.35, 0.9, noise.cloud(u * 0.4 + 30 * noise.cloud(u * 0.3, v * 0.3), v * 0.4)));
  if (look.design === 'specks') {
    return (u, v) => {
      const clump = smooth(0.25, 0.8, noise.cloud(u * 0.6, v * 0.6));
      const dark = smooth(0.915, 0.965, otherNoise.grain(u * 0.66 + v * 0.43, v * 0.66 - u * 0.43)) * (0.35 + 0.65 * clump);
      const pale = smooth(0.93, 0.97, noise.grain(u * 0.47 - v * 0.29, v * 0.47 + u * 0.29));
      return mix(mix(base, shadeOf(second, 0.8), dark), third, pale * 0.55);
    };
  }
  return (u, v) => {
    const s = u * 0.34 * stretch;
    const t = v * 0.34 / stretch;
    const wx = noise.cloud(s, t) - 0.5;
    const wy = otherNoise.cloud(s + 60, t) - 0.5;
    const fold = noise.cloud(s * 0.6 + wx * 66 + 7, t * 0.6 + wy * 66);
    const band = otherNoise.cloud(s * 0.8 + wy * 78 + fold * 22, t * 0.8 + wx * 78);
    const share = smooth(1 - look.swirlShare - 0.018, 1 - look.swirlShare + 0.018, fold);
    const thread = smooth(0.66, 0.685, band) * smooth(0.86, 0.82, band);
    const feather = smooth(1 - look.swirlShare - 0.16, 1 - look.swirlShare, fold) * 0.2;
    return mix(mix(mix(base, second, feather), second, share * (0.82 + 0.18 * band)), third, thread * 0.8);
  };
}
