import { blend, scaled, tint } from '../colour.ts';
import { rise } from '../curves.ts';
import { insideOf, type Shares, topOf } from '../design.ts';
import { at, fields } from '../noise.ts';
import { overPatch, shade, stain } from '../sheet.ts';
import { BAR_MM } from '../layout.ts';
import { boxOf, boxRound, clusterOf, type Painter, perMm, places, wholeOf } from './brush.ts';

/** Tan to dark brown, everywhere the scent is; full by week 4. */
export const vanillaBrowning: Painter = ({ sheet, look, spec, severity }, patch) => {
  if (patch.kind === 'batter') return null;
  const { cloud } = fields();
  const deep = [0.34, 0.6, 0.84][severity - 1]! * (0.42 + 0.58 * rise(-0.6, 4, spec.weekOfCure)), brown = tint(severity === 1 ? '#9a6c3c' : severity === 2 ? '#6f4220' : '#4a2913');
  overPatch(sheet, patch, (k, u, v) => {
    const rim = 0.86 + 0.14 * rise(16, 2, sheet.inset[k] as number);
    stain(sheet, k, brown, Math.min(0.94, deep * rim * (0.86 + 0.28 * at(cloud, u * 1.2 + look.character.ox, v * 1.2))));
  });
  return wholeOf(patch);
};

/** A plainly different colour than was meant: greener, greyer or redder. */
export const colourShift: Painter = ({ sheet, look, spec, severity }, patch) => {
  if (patch.kind === 'batter') return null;
  const strength = 0.16 + 0.16 * severity, way = (spec.batchCode.charCodeAt(spec.batchCode.length - 1) + look.character.ox) % 3;
  const toward = way < 1 ? tint('#7e8a55') : way < 2 ? tint('#8d8478') : tint('#a8784f');
  const { slow } = fields();
  overPatch(sheet, patch, (k, u, v) => stain(sheet, k, toward, strength * (0.7 + 0.6 * at(slow, u * 0.9 + look.character.oy, v * 0.9))));
  return wholeOf(patch);
};

/** A colour that leaves its layer: a halo along each line, wider by the week. */
export const colourBleed: Painter = ({ sheet, look, spec, severity }, patch) => {
  if (patch.kind === 'batter' || patch.kind === 'side') return null;
  const isFace = patch.kind === 'face', design = spec.palette.design;
  const reachMm = [1, 2, 3.6][severity - 1]! * (0.6 + 0.4 * rise(0, 6, spec.weekOfCure));
  const inside = insideOf(design, look.character), onTop = topOf(design, look.character), shares: Shares = { second: 0, third: 0 };
  const toX = isFace ? 80 / patch.w : BAR_MM / patch.w, toY = (isFace ? 65 : 80) / patch.h;
  const dye = blend(look.second, scaled(look.base, 0.9), 0.15), hasLines = design === 'swirl' || design === 'layers';
  const { cloud } = fields();
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * toX, y = v * toY;
    let m = 0;
    if (hasLines) {
      for (let i = 0; i < 8; i += 1) {
        const angle = i * 0.785, r = reachMm * (i & 1 ? 1 : 0.5);
        if (isFace) inside(x + Math.cos(angle) * r, y + Math.sin(angle) * r, patch.bar * BAR_MM * 0.3, shares);
        else onTop((patch.bar - 1) * BAR_MM + x + Math.cos(angle) * r, y + Math.sin(angle) * r, shares);
        m += shares.second / 8;
      }
    } else m = rise(0.55, 0.75, at(cloud, x * 3 + look.character.ox, y * 3));
    if (m > 0.02) stain(sheet, k, dye, Math.min(0.8, m * (0.5 + 0.2 * severity)));
  });
  return wholeOf(patch, 0.08);
};

/** Points of pure colour, each with a short smear. */
export const colourSpecks: Painter = ({ sheet, look, severity, random }, patch) => {
  if (patch.kind === 'side') return null;
  const mm = patch.kind === 'batter' ? 3.1 : perMm(patch), area = (patch.w * patch.h) / (mm * mm);
  const pure = scaled(look.second, 0.42);
  const specks = places(patch, Math.round((area / 5200) * [9, 34, 62][severity - 1]!) + 2, random, () => mm * random.between(0.35, 0.75), 0.06);
  for (const speck of specks) {
    const tail = severity * mm * random.between(0.5, 1.4);
    overPatch(sheet, patch, (k, u, v) => {
      const du = u - speck.u, dv = v - speck.v, t = Math.hypot(du, dv) / speck.r;
      const smear = du > 0 && du < tail ? rise(speck.r, 0, Math.abs(dv)) * (1 - du / tail) * 0.5 : 0;
      const m = Math.max(rise(1.1, 0.6, t), smear);
      if (m > 0) stain(sheet, k, pure, m * 0.92);
    }, boxOf({ ...speck, r: speck.r + tail }));
  }
  return severity === 1 ? clusterOf(patch, specks) : wholeOf(patch);
};

/** Orange to brown spots with a fuzzy edge, growing from week 4. */
export const orangeSpots: Painter = ({ sheet, spec, severity, random }, patch) => {
  if (patch.kind === 'batter' || patch.kind === 'side') return null;
  const mm = perMm(patch), grown = 0.75 + 0.55 * rise(4, 9, spec.weekOfCure), isNarrow = patch.kind === 'top';
  const spots = places(patch, isNarrow ? severity : [1, 5, 12][severity - 1]!, random, () => mm * grown * random.between(1.1, 1.5 + 0.75 * severity), 0.14);
  const orange = tint('#c0640f'), core = tint('#7d3806');
  const { cloud } = fields();
  for (const spot of spots) {
    overPatch(sheet, patch, (k, u, v) => {
      const t = Math.hypot(u - spot.u, v - spot.v) / spot.r + (at(cloud, u * 3, v * 3) - 0.5) * 0.5;
      const m = rise(1.15, 0.35, t);
      if (m <= 0) return;
      stain(sheet, k, orange, m * 0.82);
      stain(sheet, k, core, rise(0.5, 0, t) * 0.6);
      shade(sheet, k, 1 - 0.06 * m);
    }, boxOf({ ...spot, r: spot.r * 1.3 }));
  }
  return boxRound(patch, spots);
};
