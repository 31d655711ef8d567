import { scaled, tint } from '../colour.ts';
import { bell, rise } from '../curves.ts';
import { at, fields } from '../noise.ts';
import { lift, overPatch, shade, stain } from '../sheet.ts';
import { boxOf, boxRound, type Painter, perMm, places, pointAt, wholeOf } from './brush.ts';

const ashWhite = tint('#eceeec');

/** A pale matt film on what met the air: grows from the unmoulding until week 2. */
export const sodaAsh: Painter = ({ sheet, look, spec, severity }, patch) => {
  if (patch.kind === 'side' || patch.kind === 'batter') return null;
  const { cloud, grain, slow } = fields();
  const grown = 0.6 + 0.4 * rise(0, 2, spec.weekOfCure), { ox, oy } = look.character;
  const cover = [0.3, 0.56, 0.82][severity - 1]! * grown, isFace = patch.kind === 'face';
  const alongU = patch.bar * 24;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * 1.1 + alongU * 2.6, y = v * 1.1;
    const f = 0.62 * at(cloud, x * 0.9 + oy, y * 0.9 + ox) + 0.38 * at(slow, x * 0.8, y * 0.8 + oy);
    const near = isFace ? rise(0.62, 0.06, v / patch.h) * 0.34 - 0.24 + (severity - 1) * 0.05 : 0;
    const a = rise(1 - cover - 0.2, 1 - cover + 0.06, f + near + 0.06) * (0.66 + 0.34 * at(grain, u * 0.5, v * 0.5));
    if (a <= 0) return;
    stain(sheet, k, ashWhite, a * 0.84);
    lift(sheet, k, a * (0.5 + severity * 0.5) * (at(grain, u * 0.7 + 9, v * 0.7) + 0.4));
    sheet.shine[k] = (sheet.shine[k] as number) * (1 - a);
  });
  return isFace ? { u: patch.w * 0.06, v: patch.h * 0.06, w: patch.w * 0.88, h: patch.h * 0.38 } : wholeOf(patch);
};

/** Lines and smears along the way of the wire, bits pulled through. */
export const dragMarks: Painter = ({ sheet, severity, random }, patch) => {
  if (patch.kind !== 'face') return null;
  const count = [4, 8, 14][severity - 1]!;
  const lines = Array.from({ length: count }, () => ({ u: patch.w * random.between(0.08, 0.92), from: random.between(0.1, 0.45), to: random.between(0.6, 0.97), lean: random.between(-0.04, 0.04), r: random.between(0.9, 1.5 + severity * 0.7) }));
  const { grain } = fields();
  for (const line of lines) {
    overPatch(sheet, patch, (k, u, v) => {
      const t = v / patch.h, d = u - line.u - line.lean * v - (at(grain, 5, v * 0.2 + line.u) - 0.5) * 1.6;
      const rough = 0.35 + 0.9 * at(grain, line.u, v * 0.35), on = rise(line.from, line.from + 0.16, t) * rise(line.to, line.to - 0.12, t);
      const m = bell(d, line.r) * on * rough;
      if (on < 0.02) return;
      lift(sheet, k, -m * (0.45 + severity * 0.38) + 0.6 * rough * bell(d - line.r * 2, line.r) * severity * on);
      shade(sheet, k, 1 - m * 0.1);
    }, { u: line.u - 16, v: 0, w: 32, h: patch.h });
  }
  return boxRound(patch, lines.flatMap((l) => [{ u: l.u, v: l.from * patch.h, r: 4 }, { u: l.u, v: l.to * patch.h, r: 4 }]));
};

/** Clear beads that stand on the surface and catch the light. */
export const sweating: Painter = ({ sheet, severity, random }, patch) => {
  if (patch.kind === 'batter' || patch.kind === 'side') return null;
  const size = perMm(patch), area = (patch.w * patch.h) / (size * size);
  const drops = places(patch, Math.round((area / 5200) * [26, 60, 110][severity - 1]!) + 3, random, () => size * (0.45 + 1.1 * random.unit() ** 2 + (severity === 3 ? 0.5 * random.unit() : 0)), 0.05);
  for (const drop of drops) {
    overPatch(sheet, patch, (k, u, v) => {
      const t = ((u - drop.u) ** 2 + (v - drop.v) ** 2) / (drop.r * drop.r);
      if (t >= 1) return;
      lift(sheet, k, Math.sqrt(1 - t) * drop.r * 0.75);
      // Light gathers on the far side of a drop and leaves its near side dark.
      shade(sheet, k, 0.84 + 0.24 * ((u - drop.u + (v - drop.v) * 0.4) / drop.r));
      sheet.shine[k] = 2.2;
    }, boxOf(drop));
  }
  return wholeOf(patch);
};

/** A corner left in the mould: what is left of the bar shows its torn inside. */
export const stuckInMould: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'face' && patch.kind !== 'side') return null;
  const { cloud, lumps } = fields();
  const size = severity * 26 + 12 + 16, atEnd = patch.kind === 'face' && patch.bar === 0;
  overPatch(sheet, patch, (k, u, v) => {
    const d = Math.hypot((atEnd ? patch.w - u : u) * 0.8, (patch.h - v) * 1.15);
    const m = rise(size + 16, size - 4, d);
    if (m <= 0) return;
    lift(sheet, k, m * ((at(lumps, u * 2, v * 2) - 0.5) * 14 + (at(cloud, u * 3, v * 3) - 0.5) * 8 - 5));
    stain(sheet, k, scaled(look.base, 0.86 + 0.2 * at(cloud, u * 2, v * 2)), m * 0.7);
    sheet.shine[k] = (sheet.shine[k] as number) * (1 - m);
  });
  const reach = Math.min(patch.h, size * 1.25 + 12);
  return { u: atEnd ? patch.w - reach : 0, v: patch.h - reach, w: reach, h: reach };
};

/** Bands and weave that a wrap pressed into the bar and left dull. */
export const wrapMarks: Painter = ({ sheet, severity, random }, patch) => {
  if (patch.kind !== 'face' && patch.kind !== 'top') return null;
  const { cloud } = fields();
  const band = patch.w * random.between(0.3, 0.42), from = patch.w * random.between(0.2, 0.4);
  overPatch(sheet, patch, (k, u, v) => {
    const inBand = rise(from - 2, from + 1, u) * rise(from + band + 2, from + band - 1, u);
    const edge = bell(u - from, 1.6) + bell(u - from - band, 1.6);
    const weave = Math.max(0, Math.sin(u * 1.5) * Math.sin(v * 1.5));
    if (edge < 0.02 && inBand <= 0) return;
    lift(sheet, k, -edge * (0.8 + severity * 0.5) - inBand * weave * 0.4 * severity);
    shade(sheet, k, 1 - edge * 0.16 - inBand * (0.05 * severity) * (0.4 + at(cloud, u, v)));
    sheet.shine[k] = (sheet.shine[k] as number) * (1 - 0.8 * inBand);
  });
  return { u: from - 4, v: patch.h * 0.06, w: band + 8, h: patch.h * 0.9 };
};

/** A thumb's dent in soap that stayed soft, and a wet shine round it. */
export const softSticky: Painter = ({ sheet, severity, random }, patch) => {
  if (patch.kind === 'batter' || patch.kind === 'side') return null;
  const size = perMm(patch) * (5.5 + severity);
  const across = Math.min(size, patch.w * 0.42);
  const dents = places(patch, severity, random, () => size, 0.28).map((d) => ({ ...d, u: Math.min(patch.w - across, Math.max(across, d.u)) }));
  for (const dent of dents) {
    overPatch(sheet, patch, (k, u, v) => {
      const t = Math.hypot((u - dent.u) / across, (v - dent.v) / (dent.r * 1.25));
      if (t > 1.4) return;
      lift(sheet, k, -size * 0.5 * rise(1, 0.1, t) + size * 0.12 * bell(t - 1.08, 0.13));
      shade(sheet, k, 1 - 0.1 * rise(1, 0.5, t));
      // The lines of the thumb stay in soft soap.
      if (t < 0.75) lift(sheet, k, Math.sin(Math.hypot(u - dent.u, (v - dent.v) * 0.7 - dent.r * 0.2) * 2.1) * 0.22);
      sheet.shine[k] = (sheet.shine[k] as number) + 0.5 * rise(1.3, 0.6, t);
    }, { u: dent.u - across * 1.5, v: dent.v - dent.r * 1.9, w: across * 3, h: dent.r * 3.8 });
  }
  return boxRound(patch, dents);
};

/** Something that is not soap: a hair, or a splinter. */
export const foreignMatter: Painter = ({ sheet, random }, patch) => {
  if (patch.kind === 'side') return null;
  const length = Math.min(patch.w * 0.36, patch.h * 0.34, 60), at0 = { u: patch.w * random.between(0.3, 0.5), v: patch.h * random.between(0.3, 0.55), r: length };
  const hair = tint('#1c130c'), bend = random.between(0.5, 1.1);
  overPatch(sheet, patch, (k, u, v) => {
    const t = (u - at0.u) / length;
    if (t < -0.9 || t > 0.9) return;
    const d = Math.abs(v - at0.v - Math.sin(t * 2.6) * length * 0.32 * bend - t * 6) / Math.sqrt(1 + 0.5 * bend);
    if (d > 2) return;
    stain(sheet, k, hair, rise(1.5, 0.4, d) * 0.92);
    lift(sheet, k, rise(1.6, 0.3, d) * 1.2);
  }, boxOf(at0));
  return pointAt(patch, { ...at0, r: length * 0.8 });
};

/** Edges that broke off: the form is cut by the outline, the break is pale and grainy. */
export const crumbly: Painter = ({ sheet, look, severity }, patch) => {
  if (patch.kind !== 'face' && patch.kind !== 'top') return null;
  const { cloud, grain } = fields();
  const reach = 4 + severity * 3;
  overPatch(sheet, patch, (k, u, v) => {
    const m = rise(reach, 0, sheet.inset[k] as number) * rise(0.35, 0.55, at(cloud, u * 1.8, v * 1.8 + patch.id * 40) + 0.08 * severity);
    if (m <= 0) return;
    lift(sheet, k, m * (at(grain, u * 0.45, v * 0.45) * 2.6 - 2 - severity * 0.6));
    stain(sheet, k, scaled(look.base, 1.1), m * 0.6);
    sheet.shine[k] = 0;
  });
  return wholeOf(patch, 0);
};
