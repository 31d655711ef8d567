import { mix, rise } from './curves.ts';
import { topHeightMm, topOf, type Shares } from './design.ts';
import type { Look } from './look.ts';
import { at, fields } from './noise.ts';
import { overPatch, type Patch, type Sheet } from './sheet.ts';
import type { LoafPictureSpec } from './spec.ts';

/** Batter just poured: smooth and wet at light trace, ridged when thick, heaps when it seized or was cooked. */
export function paintBatter(sheet: Sheet, patch: Patch, spec: LoafPictureSpec, look: Look): void {
  const { cloud, lumps, slow } = fields();
  const { z, r, g, b, shine, scale } = sheet;
  const { base, second, third, character: c, rustic } = look;
  const grade = (slug: string) => spec.faults.find((f) => f.slug === slug)?.severity ?? 0;
  const thick = Math.min(1, grade('acceleration') * 0.36 + grade('seizing') * 0.5 + (grade('false-trace') > 0 ? 0.5 : 0) + rustic * 0.7);
  const heaps = Math.min(1, grade('seizing') * 0.34 + Math.max(0, grade('acceleration') - 1) * 0.28 + rustic * 0.7);
  const onTop = topOf(spec.palette.design, c), shares: Shares = { second: 0, third: 0 };
  const perUnit = 250 / patch.w;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * perUnit, y = (v / patch.h) * 80;
    const warp = (at(slow, x * 2.4 + c.ox, y * 2.4) - 0.5) * 24 * (1 - heaps);
    onTop(x + warp, y + warp * 0.5, shares);
    const lost = 1 - 0.35 * heaps, s = shares.second * lost, t = shares.third * lost;
    const tone = 1.04 + (at(cloud, x * 2 + c.oy, y * 2) - 0.5) * 0.06;
    r[k] = mix(mix(base.r, second.r, s), third.r, t) * tone;
    g[k] = mix(mix(base.g, second.g, s), third.g, t) * tone;
    b[k] = mix(mix(base.b, second.b, s), third.b, t) * tone;
    const meniscus = rise(9, 0, Math.min(u, patch.w - u, v, patch.h - v)) * 3.2 * (1 - heaps);
    const ripple = (Math.sin(v * 0.05 + (at(slow, u * 0.7 + c.ox, v * 0.7) - 0.5) * 16 + u * 0.013) * 1.1 + (at(slow, u * 1.1, v * 1.1 + c.oy) - 0.5) * 3) * (1 - thick);
    let height = ripple + meniscus + thick * (1 - heaps) * topHeightMm(c, x, y) * 2.2;
    if (heaps > 0) {
      const fold = Math.abs(at(cloud, u * 0.8 + c.ox, v * 0.8 + c.oy) - 0.5);
      height += heaps * ((at(lumps, u * 0.62 + c.oy, v * 0.62) - 0.5) * 30 + (0.16 - Math.min(0.16, fold * 1.4)) * 60 + (at(cloud, u * 2, v * 2) - 0.5) * 9 - 10);
    }
    z[k] = (z[k] as number) + height * scale;
    shine[k] = mix(0.75, 0.16, Math.max(thick * 0.8, heaps));
  });
}
