import { type Body, forEachPixel } from '../body.ts';
import type { Look } from '../look.ts';
import { linear, mix, type Raster, smooth } from '../raster.ts';
import { put } from './face.ts';
import { combedOver } from './comb-table.ts';

const woodLight = linear('#b3936a');
const woodDark = linear('#6d5233');
const silicone = linear('#8d9a96');

/** Paints the mould round the batter: boards of wood, or a grey-green liner. */
export function paintMould(raster: Raster, mould: Body, look: Look, isWood: boolean): void {
  const { noise, otherNoise } = look;
  forEachPixel(raster, mould, (k, x, y, depth) => {
    const isEnd = Math.abs(x) > mould.halfWidth - 34;
    const grain = isEnd ? noise.cloud(x * 2.4, y * 0.12) : noise.cloud(x * 0.09, y * 2.6 + noise.cloud(x * 0.1, y * 0.2) * 30);
    const fibre = otherNoise.grain(isEnd ? x * 1.2 : x * 0.06, isEnd ? y * 0.06 : y * 1.2);
    const colour = isWood ? mix(woodLight, woodDark, 0.16 + 0.52 * smooth(0.25, 0.95, grain) + 0.2 * fibre) : mix(silicone, [0.15, 0.17, 0.16], 0.14 * grain);
    raster.z[k] = mould.thickness + (isWood ? grain * 0.9 + fibre * 0.5 : 0) - smooth(6, 0, depth) * 5;
    put(raster, k, colour, isWood ? 0.03 : 0.18, mould.mark);
  });
}

/** Paints wet batter in its mould; cooked soap is spooned in and stays in lumps. */
export function paintBatter(raster: Raster, body: Body, look: Look): void {
  const { noise, otherNoise } = look;
  const strokeAt = combedOver(look, body, 500);
  const isPlain = look.design === 'plain' || look.design === 'specks';
  forEachPixel(raster, body, (k, x, y, depth) => {
    const u = x + 500;
    const stroke = strokeAt(x, y);
    const slow = (noise.cloud(u * 0.5, y * 0.5) - 0.5) * 4;
    const lumps = look.isRough ? (noise.cloud(u * 0.8, y * 0.8) - 0.5) * 22 + (otherNoise.cloud(u * 2.2, y * 2.2) - 0.5) * 9 : stroke.height * 5.5 + slow;
    raster.z[k] = body.thickness + lumps + smooth(9, 0, depth) * 5;
    const colour = isPlain ? mix(look.base, look.third, stroke.height * 0.25) : mix(mix(look.base, look.second, stroke.share * 0.92), look.third, stroke.thread * 0.75);
    const light = look.isRough ? 0.94 : 1.06;
    put(raster, k, [colour[0] * light, colour[1] * light, colour[2] * light], look.isRough ? 0.3 : 0.62, body.mark);
  });
}
