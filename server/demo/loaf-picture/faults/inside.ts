import { blend, scaled, tint } from '../colour.ts';
import { bell, mix, rise } from '../curves.ts';
import { at, fields } from '../noise.ts';
import { lift, overPatch, shade, stain } from '../sheet.ts';
import { paintGelled } from '../body.ts';
import { boxOf, clusterOf, type Painter, perMm, places, pointAt, wholeOf } from './brush.ts';

/** A net of translucent veins, darker and smooth, through the body. */
export const glycerinRivers: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'face') return null;
  const { cells, cloud, slow } = fields();
  const { ox, oy } = look.character, per = 80 / patch.w, deep = tint('#6d4a1c');
  const share = [0.34, 0.5, 0.85][severity - 1]!;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * per, y = v * per, wx = (at(cloud, x * 2.2 + ox, y * 2.2) - 0.5) * 74, wy = (at(cloud, x * 2.2, y * 2.2 + oy) - 0.5) * 74;
    const here = rise(0.54 - share * 0.6, 0.7 - share * 0.5, at(slow, x * 1.8 + ox + patch.bar * 3, y * 1.8 + oy));
    if (here <= 0) return;
    // Veins swell and thin out: each line of the net has its own width.
    const net = at(cells, x * 2.5 + wx + ox + patch.bar * 4, y * 3.1 + wy + oy), width = 0.04 + 0.26 * at(slow, x * 6 + oy, y * 6) ** 1.5;
    const m = (rise(width, width * 0.2, net) * 0.62 + rise(0.5, 0, net) * 0.3) * here * (0.42 + 0.16 * severity);
    if (m <= 0.01) return;
    stain(sheet, k, { r: mix(deep.r, (sheet.r[k] as number) * 0.5, 0.5), g: mix(deep.g, (sheet.g[k] as number) * 0.46, 0.5), b: mix(deep.b, (sheet.b[k] as number) * 0.36, 0.5) }, m * 0.8);
    sheet.shine[k] = (sheet.shine[k] as number) + 0.3 * m;
    lift(sheet, k, -m * 0.3);
  });
  return wholeOf(patch, 0.08);
};

/** Pale hard grains in the body or in the batter. */
export const ricing: Painter = ({ sheet, look, severity, random }, patch) => {
  if (patch.kind === 'side') return null;
  const size = patch.kind === 'batter' ? 3.1 : perMm(patch), area = (patch.w * patch.h) / (size * size);
  const pale = blend(look.base, tint('#fbf5e6'), 0.75), isWet = patch.kind === 'batter';
  const grains = places(patch, Math.round((area / 5200) * [8, 46, 130][severity - 1]!) + 3, random, () => size * random.between(0.6, 1.25), 0.04);
  for (const grain of grains) {
    const turn = random.between(0, 3.14), c = Math.cos(turn), s = Math.sin(turn), slim = random.between(0.45, 0.85);
    overPatch(sheet, patch, (k, u, v) => {
      const du = u - grain.u, dv = v - grain.v, t = Math.hypot((du * c + dv * s) / grain.r, (dv * c - du * s) / (grain.r * slim));
      if (t > 1.5) return;
      const m = rise(1.08, 0.75, t);
      shade(sheet, k, 1 - 0.16 * bell(t - 1.15, 0.22));
      stain(sheet, k, pale, m * 0.92);
      lift(sheet, k, m * (isWet ? 1.7 : 0.5 + 0.2 * severity));
    }, boxOf({ ...grain, r: grain.r * 1.5 }));
  }
  return severity === 1 ? clusterOf(patch, grains) : wholeOf(patch);
};

/** Dry holes with dull walls. */
export const airPockets: Painter = ({ sheet, severity, random }, patch) => {
  if (patch.kind !== 'face') return null;
  const mm = perMm(patch);
  const holes = places(patch, [5, 16, 26][severity - 1]!, random, () => mm * (0.45 + 0.6 * random.unit() ** 2));
  if (severity >= 2) holes.push(...places(patch, severity === 3 ? 4 : 2, random, () => mm * random.between(1.6, 2.3)));
  if (severity === 3) holes.push(...places(patch, 1, random, () => mm * random.between(4.6, 6), 0.2));
  const { cloud } = fields(), wall = tint('#20150c');
  for (const hole of holes) {
    const oval = random.between(0.7, 1);
    overPatch(sheet, patch, (k, u, v) => {
      const d = Math.hypot(u - hole.u, (v - hole.v) / oval) + (at(cloud, u * 4, v * 4) - 0.5) * hole.r * 0.7;
      if (d > hole.r + 1) return;
      const m = rise(hole.r + 0.6, hole.r * 0.72, d);
      lift(sheet, k, -m * Math.min(14, hole.r * 1.5));
      stain(sheet, k, wall, m * 0.42);
      sheet.shine[k] = (sheet.shine[k] as number) * (1 - m);
    }, boxOf({ ...hole, r: hole.r * 1.4 }));
  }
  return severity === 1 ? clusterOf(patch, holes) : wholeOf(patch, 0.06);
};

/** Holes or veins that hold white powder, wet round the edge. */
export const lyePockets: Painter = ({ sheet, random }, patch) => {
  if (patch.kind !== 'face') return null;
  const mm = perMm(patch), pockets = places(patch, 5, random, () => mm * random.between(1.2, 2.6), 0.18), powder = tint('#f6f7f5');
  const { grain } = fields();
  for (const pocket of pockets) {
    overPatch(sheet, patch, (k, u, v) => {
      const t = Math.hypot(u - pocket.u, v - pocket.v) / pocket.r;
      if (t > 1.5) return;
      const m = rise(1.05, 0.85, t), fill = rise(0.85, 0.6, t + (at(grain, u * 0.6, v * 0.6) - 0.5) * 0.4);
      lift(sheet, k, -m * pocket.r * 0.8 + fill * pocket.r * 0.5);
      shade(sheet, k, 1 - 0.5 * m - 0.14 * rise(1.5, 1, t));
      stain(sheet, k, powder, fill * 0.95);
      sheet.shine[k] = (sheet.shine[k] as number) + 0.7 * rise(1.5, 1, t);
    }, boxOf({ ...pocket, r: pocket.r * 1.5 }));
  }
  return pointAt(patch, pockets.sort((a, b) => b.r - a.r)[0]);
};

/** The middle gelled, the rest did not. */
export const partialGelRing: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'face') return null;
  paintGelled(sheet, patch, look, [0.5, 0.85, 1.3][severity - 1]!);
  return { u: patch.w * 0.13, v: patch.h * 0.19, w: patch.w * 0.74, h: patch.h * 0.7 };
};

/** Small round waxy dots, no harder than the rest. */
export const stearicSpots: Painter = ({ sheet, look, severity, random }, patch) => {
  if (patch.kind !== 'face') return null;
  const mm = perMm(patch), waxy = blend(look.base, tint('#fffdf6'), 0.8);
  const dots = places(patch, [9, 40, 80][severity - 1]!, random, () => mm * random.between(0.5, 1.05));
  for (const dot of dots) {
    overPatch(sheet, patch, (k, u, v) => {
      const m = rise(1, 0.55, Math.hypot(u - dot.u, v - dot.v) / dot.r);
      if (m > 0) stain(sheet, k, waxy, m * 0.8);
    }, boxOf(dot));
  }
  return severity === 1 ? clusterOf(patch, dots) : wholeOf(patch);
};

/** Smooth-walled channels and soft folds where it grew too hot; a wrinkled top. */
export const heatTunnels: Painter = ({ sheet, look, severity }, patch) => {
  const { cloud, slow } = fields();
  const { ox, oy } = look.character;
  if (patch.kind === 'top') {
    overPatch(sheet, patch, (k, u, v) => {
      const x = u + patch.bar * 68, wx = at(slow, x * 1.6 + ox, v * 1.6) * 90;
      const fold = Math.abs(Math.sin((at(cloud, x * 0.9 + wx + oy, v * 0.9 + wx * 0.5) - 0.5) * 26));
      lift(sheet, k, (fold - 0.5) * (3 + 2.4 * severity));
      sheet.shine[k] = (sheet.shine[k] as number) + 0.28;
      shade(sheet, k, 0.9 + 0.1 * fold);
    });
    return wholeOf(patch);
  }
  if (patch.kind !== 'face') return null;
  const width = [0.03, 0.045, 0.075][severity - 1]!, dark = scaled(look.base, 0.35), per = 80 / patch.w;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * per, y = v * per, e = Math.hypot((u / patch.w) * 2 - 1, (v / patch.h) * 2 - 1);
    const f = at(slow, x * 3.2 + ox + (at(cloud, x * 2, y * 2 + oy) - 0.5) * 90, y * 4.6 + oy + patch.bar * 7) - 0.5;
    const m = rise(width, width * 0.45, Math.abs(f)) * rise(0.85, 0.55, e);
    if (m <= 0) return;
    lift(sheet, k, -m * (3 + 2.5 * severity));
    stain(sheet, k, dark, m * 0.55);
    sheet.shine[k] = (sheet.shine[k] as number) + 0.5 * m;
  });
  return { u: patch.w * 0.16, v: patch.h * 0.18, w: patch.w * 0.68, h: patch.h * 0.66 };
};

/** A piece of other soap whose edge has come away. */
export const embedDetachment: Painter = (brush, patch) => {
  if (patch.kind !== 'face') return null;
  return paintEmbed(brush, patch, [1.2, 2.4, 4.2][brush.severity - 1]!);
};

/** A cube of other soap set into the bar, with a gap of so many units round it; 0 for one that holds. */
export function paintEmbed({ sheet, look, random }: Pick<Parameters<Painter>[0], 'sheet' | 'look' | 'random'>, patch: Parameters<Painter>[1], gap: number): ReturnType<Painter> {
  const side = patch.w * random.between(0.16, 0.22), u0 = patch.w * random.between(0.32, 0.6), v0 = patch.h * random.between(0.42, 0.62);
  const turn = random.between(-0.6, 0.6), c = Math.cos(turn), s = Math.sin(turn), body = blend(look.third, tint('#ece3cf'), 0.5), dark = scaled(look.base, 0.16);
  const box = { u: u0 - side, v: v0 - side, w: side * 2, h: side * 2 };
  overPatch(sheet, patch, (k, u, v) => {
    const x = Math.abs((u - u0) * c + (v - v0) * s), y = Math.abs((v - v0) * c - (u - u0) * s), d = Math.max(x, y) - side * 0.6;
    if (d < 0) stain(sheet, k, body, rise(0.5, -0.5, d));
    if (gap > 0 && d > -0.5 && d < gap + 0.6) {
      const m = rise(-0.5, 0.3, d) * rise(gap + 0.6, gap - 0.3, d);
      stain(sheet, k, dark, m * 0.85);
      lift(sheet, k, -m * 7);
    }
  }, box);
  return box;
}
