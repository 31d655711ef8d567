import type { Random } from '../random.ts';
import { letter } from './lettering.ts';
import type { PictureWish } from './picture-wish.ts';
import { type Colour, linear, type Raster } from './raster.ts';
import { noiseOf } from './noise.ts';

const ink = linear('#1d1a16');
const card = linear('#777777');
const cardWhite = linear('#ecebe8');
const cardBlack = linear('#1e1e1e');
const kraft = linear('#c4a272');
const strip = linear('#e6e5e0');

const stageOnLabel: Readonly<Record<PictureWish['stage'], string>> = {
  pour: 'pour', unmould: 'unmould', cut: 'cut', 'cure-w1': 'week 1', 'cure-w2': 'week 2', 'cure-w4': 'week 4', 'cure-w6': 'week 6', release: 'release', 'in-use': 'in use',
};

interface Slip { x: number; y: number; width: number; height: number; lean: number; thickness: number; colour: (x: number, y: number) => Colour }

/** Lays out what belongs in a good picture: grey card, scale and rack label. */
export function drawProps(raster: Raster, wish: PictureWish, random: Random): void {
  const noise = noiseOf(11, wish.code);
  const y = 606 + random.normal(0, 5);
  const wobble = () => random.normal(0, 6);
  if (wish.hasGreyCard) {
    slip(raster, {
      x: 96 + wobble(), y, width: 116, height: 76, lean: random.normal(0, 0.02), thickness: 2.4,
      colour: (u, v) => (v < 60 ? card : u < 58 ? cardWhite : cardBlack),
    });
  }
  const scaleX = 286 + wobble();
  slip(raster, { x: scaleX, y: y + 34, width: 218, height: 26, lean: 0, thickness: 1.8, colour: (u, v) => (v < 11 && u < 200 && Math.floor(u / 40) % 2 === 0 ? ink : strip) });
  letter(raster, '5 cm', scaleX + 172, y + 34 + 14.5, 8, ink);
  const labelX = 722 + wobble();
  const punch = { x: 20, y: 38 };
  slip(raster, {
    x: labelX, y, width: 250, height: 76, lean: 0, thickness: 2.2,
    colour: (u, v) => {
      if (Math.hypot(u - punch.x, v - punch.y) < 6) return [0.05, 0.05, 0.05];
      const fibre = 0.93 + 0.1 * noise.cloud(u * 0.5, v * 3) + (noise.grain(u * 0.35, v * 1.2) - 0.5) * 0.16;
      return [kraft[0] * fibre, kraft[1] * fibre, kraft[2] * fibre];
    },
  });
  letter(raster, wish.code, labelX + 40, y + 14, 27, ink);
  const end = letter(raster, stageOnLabel[wish.stage], labelX + 40, y + 52, 13, ink);
  letter(raster, wish.takenLocal.slice(5, 10), end + 14, y + 52, 13, ink);
}

function slip(raster: Raster, { x, y, width, height, lean, thickness, colour }: Slip): void {
  const noise = noiseOf(12, 'slip');
  for (let py = Math.floor(y - 4); py <= y + height + 4; py += 1) {
    for (let px = Math.floor(x); px <= x + width; px += 1) {
      const v = py - y - (px - x - width / 2) * lean;
      const u = px - x + (py - y - height / 2) * lean;
      if (u < 0 || u > width || v < 0 || v > height) continue;
      const k = py * raster.width + px;
      const [red, green, blue] = colour(u, v);
      raster.z[k] = thickness + noise.cloud(px * 0.2, py * 0.2) * 1.5;
      raster.red[k] = red;
      raster.green[k] = green;
      raster.blue[k] = blue;
      raster.gloss[k] = 0;
      raster.owner[k] = 0;
    }
  }
}
