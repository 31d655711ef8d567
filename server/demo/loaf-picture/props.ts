import type { Random } from '../random.ts';
import { coverPatch } from './body.ts';
import { scaled, type Tint, tint } from './colour.ts';
import { boxDistance, rise } from './curves.ts';
import { at, fields } from './noise.ts';
import { flatPatch, overFrame, overPatch, type Patch, type Sheet, stain } from './sheet.ts';
import type { LoafPictureSpec } from './spec.ts';
import { strokesOf } from './stroke-font.ts';

const white = tint('#e9e9e6'), black = tint('#1b1b1b'), cardGrey = tint('#777777'), kraft = tint('#c7a677'), kraftDark = tint('#9c7c4e'), ink = tint('#1d1a15');

/** Grey card, scale and rack label, laid at the foot of the picture by a hand in a hurry. */
export function layProps(sheet: Sheet, spec: LoafPictureSpec, heightUnits: number, random: Random): void {
  const y = heightUnits - 62;
  if (spec.hasGreyCard) layCard(sheet, 96 + random.between(-14, 20), y + random.between(-5, 4), random.normal(0, 0.02));
  layScale(sheet, 350 + random.between(-30, 30), y + 14 + random.between(-5, 5), random.normal(0, 0.012));
  layLabel(sheet, spec, 812 + random.between(-20, 18), y + random.between(-4, 3), random.normal(0, 0.018));
}

function layCard(sheet: Sheet, cx: number, cy: number, turn: number): void {
  const card = flatPatch(250, 'prop', 0, { cx, cy, w: 112, h: 78 }, 3, turn);
  coverPatch(sheet, card, (u, v) => boxDistance(u, v, 112, 78, 2), 1);
  overPatch(sheet, card, (k, u, v) => stain(sheet, k, v < 62 ? cardGrey : u < 56 ? white : black, 1));
}

/** Five centimetres, in fields of one. */
function layScale(sheet: Sheet, cx: number, cy: number, turn: number): void {
  const bar = flatPatch(251, 'prop', 0, { cx, cy, w: 214, h: 26 }, 3, turn);
  coverPatch(sheet, bar, (u, v) => boxDistance(u, v, 214, 26, 2), 1);
  overPatch(sheet, bar, (k, u, v) => stain(sheet, k, v < 11 && u > 7 && u < 207 && Math.floor((u - 7) / 40) % 2 === 0 ? black : white, 1));
  write(sheet, bar, '5 CM', 172, 15, 7.5, 0.75);
}

function layLabel(sheet: Sheet, spec: LoafPictureSpec, cx: number, cy: number, turn: number): void {
  const { cloud, grain } = fields();
  const label = flatPatch(252, 'prop', 0, { cx, cy, w: 246, h: 78 }, 3.5, turn);
  const seed = spec.seed * 31;
  coverPatch(sheet, label, (u, v) => Math.max(boxDistance(u, v, 246, 78, 2), (16 - u - v) * 0.7, (16 - u - (78 - v)) * 0.7, 5.5 - Math.hypot(u - 17, v - 39)), 1);
  overPatch(sheet, label, (k, u, v) => {
    const fibre = at(grain, u * 0.16 + seed, v * 0.9 + at(cloud, u, v) * 8);
    stain(sheet, k, fibre > 0.74 ? kraftDark : kraft, 1);
    if (fibre > 0.74) stain(sheet, k, kraft, 0.55);
    if (Math.abs(Math.hypot(u - 17, v - 39) - 8.5) < 2.4) stain(sheet, k, scaled(kraft, 0.72), 0.8);
  });
  write(sheet, label, spec.batchCode, 38, 13, 28, 2.15);
  write(sheet, label, spec.stageLabel, 38, 53, 13, 1.05);
}

/** Writes with a marker on a patch; sizes in units. */
function write(sheet: Sheet, on: Patch, text: string, left: number, top: number, size: number, radius: number): void {
  const room = on.w - left - 8, natural = strokesOf(text, size), fitted = natural.width > room ? strokesOf(text, (size * room) / natural.width) : natural;
  for (const { x0, y0, x1, y1 } of fitted.strokes) {
    const box = { u: left + Math.min(x0, x1) - 3, v: top + Math.min(y0, y1) - 3, w: Math.abs(x1 - x0) + 6, h: Math.abs(y1 - y0) + 6 };
    const dx = x1 - x0, dy = y1 - y0, length = dx * dx + dy * dy || 1;
    overPatch(sheet, on, (k, u, v) => {
      const px = u - left - x0, py = v - top - y0, t = Math.min(1, Math.max(0, (px * dx + py * dy) / length));
      const d = Math.hypot(px - t * dx, py - t * dy);
      if (d < radius + 0.7) stain(sheet, k, ink, 1 - rise(radius - 0.5, radius + 0.5, d));
    }, box);
  }
}

export type Wall = Tint;

/** The mould round the batter: its walls stand higher than what is in it. */
export function layMould(sheet: Sheet, spec: LoafPictureSpec, batter: Patch): void {
  const { cloud, grain } = fields();
  const wall = spec.mould === 'wood' ? 30 : 24, w = batter.w + 2 * wall, h = batter.h + 2 * wall;
  const mould: Patch = { ...batter, id: 240, kind: 'prop', w, h, lift: spec.mould === 'wood' ? 62 : 58 };
  const light = tint('#b1926a'), dark = tint('#7d5f3c'), silicone = tint('#8a949b');
  coverPatch(sheet, mould, (u, v) => boxDistance(u, v, w, h, spec.mould === 'wood' ? 4 : 16), spec.mould === 'wood' ? 3 : 9);
  overFrame(sheet, mould, 0, (k, u, v) => {
    if (sheet.owner[k] !== mould.id) return;
    if (spec.mould === 'silicone') {
      stain(sheet, k, silicone, 1);
      sheet.shine[k] = 0.2;
      return;
    }
    const isEnd = u < wall || u > w - wall;
    const along = isEnd ? v : u, over = isEnd ? u : v;
    const vein = at(cloud, along * 0.25 + 90, over * 2.6 + at(cloud, along * 0.3, over * 0.4) * 60);
    stain(sheet, k, light, 1);
    stain(sheet, k, dark, 0.75 * rise(0.42, 0.75, vein));
    sheet.z[k] = (sheet.z[k] as number) + (at(grain, along * 0.06, over * 0.8) - 0.5) * 1.2;
    const seam = Math.abs(isEnd ? Math.min(Math.abs(u - wall), Math.abs(u - w + wall)) : 9);
    if (seam < 1) stain(sheet, k, scaled(dark, 0.4), 0.8);
  });
}
