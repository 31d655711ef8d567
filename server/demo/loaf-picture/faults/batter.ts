import { blend, scaled, tint } from '../colour.ts';
import { bell, mix, rise } from '../curves.ts';
import { at, fields } from '../noise.ts';
import { lift, overPatch, shade, stain } from '../sheet.ts';
import { type Painter, wholeOf } from './brush.ts';

/** Batter that had to be spooned or pressed in: its heaps are in the relief already, the whole surface shows it. */
export const spooned: Painter = (_brush, patch) => (patch.kind === 'batter' || patch.kind === 'top' ? wholeOf(patch) : null);

/** Free oil: pools on the batter and in its corners; a clear layer at the foot of the loaf or bar. */
export const separation: Painter = ({ sheet, look, severity }, patch) => {
  const { slow, cloud } = fields();
  const oil = blend(scaled(look.base, 0.5), tint('#8a6412'), 0.6), { ox, oy } = look.character;
  if (patch.kind === 'batter' || patch.kind === 'top') {
    const level = [0.62, 0.54, 0.47][severity - 1]!, isBar = patch.bar > 0;
    overPatch(sheet, patch, (k, u, v) => {
      const x = u + patch.bar * 68, corner = isBar ? 0 : rise(70, 0, Math.min(u, patch.w - u)) * rise(90, 0, Math.min(v, patch.h - v)) * 0.5;
      const m = rise(level, level + 0.035, at(slow, x * 1.3 + oy, v * 1.5 + ox) + (at(cloud, x, v) - 0.5) * 0.1 + corner);
      if (m <= 0) return;
      stain(sheet, k, oil, m * 0.62);
      const k0 = sheet.z[k] as number;
      // Liquid lies level: it fills the relief under it.
      sheet.z[k] = mix(k0, patch.lift * sheet.scale, m * 0.85);
      sheet.shine[k] = mix(sheet.shine[k] as number, 1.3, m);
    });
    return wholeOf(patch, 0.02);
  }
  const layer = patch.h * [0.05, 0.09, 0.16][severity - 1]!;
  overPatch(sheet, patch, (k, u, v) => {
    const m = rise(-2, 2, v - patch.h + layer + (at(slow, u * 0.9 + ox, 9) - 0.5) * 12);
    if (m <= 0) return;
    stain(sheet, k, oil, m * 0.66);
    sheet.shine[k] = (sheet.shine[k] as number) + 0.5 * m;
    lift(sheet, k, -m * 1.5);
  });
  return { u: patch.w * 0.04, v: patch.h - layer * 1.8, w: patch.w * 0.92, h: layer * 1.8 };
};

/** Fat setting: dull, with pale waxy crumbs in it. */
export const falseTrace: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'batter') return null;
  const { bumps, cloud } = fields(), waxy = blend(look.base, tint('#fffaf0'), 0.7);
  overPatch(sheet, patch, (k, u, v) => {
    const m = rise(0.2 + severity * 0.07, 0.05, at(bumps, u * 1.9 + (at(cloud, u, v) - 0.5) * 20, v * 1.9)) * 0.6;
    stain(sheet, k, waxy, m);
    lift(sheet, k, m * 1.6);
    sheet.shine[k] = 0.08;
  });
  return wholeOf(patch);
};

/** The mass rose out of the mould and ran over its wall. */
export const volcano: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'batter') return null;
  const { cloud, lumps } = fields();
  overPatch(sheet, patch, (k, u, v) => {
    const e = Math.hypot((u / patch.w) * 2 - 1, (v / patch.h) * 2 - 1);
    const m = rise(1, 0.1, e) + rise(0.4, 0.75, at(lumps, u * 0.5, v * 0.5)) * 0.4;
    lift(sheet, k, m * (10 + 7 * severity) + (at(cloud, u * 1.4, v * 1.4) - 0.5) * 22);
    stain(sheet, k, scaled(look.base, 0.8), 0.4 * rise(0.5, 0.62, at(cloud, u * 2.2, v * 2.2)));
    sheet.shine[k] = 0.5;
  });
  return wholeOf(patch);
};

/** An open crack along the top of a loaf that grew too hot. */
export const overheatingCrack: Painter = ({ sheet, look, severity, spec }, patch) => {
  if (patch.kind !== 'top' && patch.kind !== 'batter') return null;
  const { cloud, slow } = fields();
  const { ox, oy } = look.character, width = [1.1, 3, 6.5][severity - 1]!, dark = scaled(look.base, 0.14);
  const perBar = patch.w / 21, total = patch.bar > 0 ? spec.bars * 21 * perBar : patch.w;
  let low = patch.h, high = 0;
  overPatch(sheet, patch, (k, u, v) => {
    const x = patch.bar > 0 ? (patch.bar - 1) * 21 * perBar + u : u, t = x / total;
    const middle = patch.h * (0.5 + (at(slow, x * 0.5 + ox, oy) - 0.5) * 0.5) + (at(cloud, x * 1.6 + oy, 30) - 0.5) * 26 + (at(cloud, x * 5, 90) - 0.5) * 7;
    const open = width * rise(0.02, 0.2, t) * rise(0.98, 0.8, t) * (0.55 + 0.9 * at(cloud, x * 1.1, 170));
    const d = v - middle;
    if (Math.abs(d) > open + 26) return;
    low = Math.min(low, v);
    high = Math.max(high, v);
    const m = rise(open + 0.8, open * 0.4, Math.abs(d));
    lift(sheet, k, -m * (4 + 5 * severity) + bell(Math.abs(d) - open - 4, 8) * severity * 1.8);
    if (m > 0) stain(sheet, k, dark, m * 0.8);
    else shade(sheet, k, 1 - 0.05 * bell(Math.abs(d) - open, 3));
  });
  return high > low ? { u: 0, v: low, w: patch.w, h: high - low } : null;
};
