import type { Character } from './character.ts';
import { mix, rise } from './curves.ts';
import { insideOf, type Shares, topHeightMm, topOf } from './design.ts';
import type { Look } from './look.ts';
import { at, fields } from './noise.ts';
import { overFrame, overPatch, type Patch, type Sheet, shade, stain } from './sheet.ts';

/** Distance to the outline in units, below 0 inside. */
export type Outline = (u: number, v: number) => number;

/** Takes the pixels inside the outline for the patch and sets their height; edges are worn round. */
export function coverPatch(sheet: Sheet, patch: Patch, outline: Outline, bevel = 6): void {
  const { owner, inset, z, scale } = sheet;
  const fall = Math.max(1.5, Math.min(4.5, bevel * 0.7)) * scale;
  overFrame(sheet, patch, 14, (k, u, v) => {
    const d = outline(u, v);
    if (d > 0) return;
    owner[k] = patch.id;
    inset[k] = -d;
    z[k] = patch.lift * scale - fall * (1 - rise(0, bevel, -d));
  });
}

/** The cut face of a bar, or the end of a loaf: the design inside, smooth, with fine marks of the wire. */
export function paintFace(sheet: Sheet, patch: Patch, look: Look, design: 'plain' | 'layers' | 'swirl' | 'specks', alongMm: number, hasWire: boolean): void {
  const { cloud, grain, lumps } = fields();
  const { z, r, g, b, shine, scale } = sheet;
  const { base, second, third, character: c, rustic } = look;
  const inside = insideOf(design, c), shares: Shares = { second: 0, third: 0 };
  const toX = 80 / patch.w, toY = 65 / patch.h, jitter = patch.id * 61;
  const wire = (hasWire ? 0.42 : 0.12) * scale;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * toX, y = v * toY;
    inside(x, y, alongMm, shares);
    const { second: s, third: t } = shares;
    const cloudy = at(cloud, x * 3.4 + c.ox + jitter, y * 3.4 + c.oy) - 0.5;
    const tone = 1 + cloudy * (0.07 + rustic * 0.16);
    r[k] = mix(mix(base.r, second.r, s), third.r, t) * tone;
    g[k] = mix(mix(base.g, second.g, s), third.g, t) * tone;
    b[k] = mix(mix(base.b, second.b, s), third.b, t) * tone;
    const marks = at(grain, u * 0.035 + jitter, v * 0.62 + at(cloud, u * 0.2, v * 0.2) * 5) - 0.5;
    z[k] = (z[k] as number) + marks * wire * 1.7 + (at(grain, u * 1.1, v * 1.1) - 0.5) * 0.3 * scale + rustic * (at(lumps, u * 1.3 + jitter, v * 1.3) - 0.5) * 3.2 * scale;
    shine[k] = look.shine;
  });
  sprinkle(sheet, patch, look, toX, toY, jitter);
}

/** The top of a loaf or of its bars: `from` is where the patch begins along the loaf, both in mm. */
export function paintTop(sheet: Sheet, patch: Patch, look: Look, design: 'plain' | 'layers' | 'swirl' | 'specks', along: { fromMm: number; lengthMm: number }, spooned: number): void {
  const { grain, lumps, cloud } = fields();
  const { z, r, g, b, shine, scale } = sheet;
  const { base, second, third, character: c, rustic } = look;
  const onTop = topOf(design, c), shares: Shares = { second: 0, third: 0 };
  const toX = along.lengthMm / patch.w, toY = 80 / patch.h, unitsPerMm = patch.h / 80;
  const deep = Math.max(rustic * 0.8, spooned);
  overPatch(sheet, patch, (k, u, v) => {
    const x = along.fromMm + u * toX, y = v * toY;
    onTop(x, y, shares);
    const { second: s, third: t } = shares;
    const tone = 0.97 + (at(cloud, x * 2.4 + c.oy, y * 2.4 + c.ox) - 0.5) * (0.12 + rustic * 0.1);
    r[k] = mix(mix(base.r, second.r, s), third.r, t) * tone;
    g[k] = mix(mix(base.g, second.g, s), third.g, t) * tone;
    b[k] = mix(mix(base.b, second.b, s), third.b, t) * tone;
    let height = topHeightMm(c, x, y) * (1 - 0.6 * deep);
    if (deep > 0) height += deep * spoonedHeightMm(c, x, y, lumps, cloud);
    z[k] = (z[k] as number) + (height * unitsPerMm + (at(grain, u * 0.8, v * 0.8) - 0.5) * 0.7) * scale;
    shine[k] = look.shine * 0.8;
  });
  sprinkle(sheet, patch, look, toX, toY, along.fromMm);
}

/** Heaps of a batter too stiff to pour, or of a cooked mass pressed into the mould. */
function spoonedHeightMm(c: Character, x: number, y: number, lumps: Float32Array<ArrayBuffer>, cloud: Float32Array<ArrayBuffer>): number {
  const heap = at(lumps, x * 1.15 + c.oy, y * 1.15 + c.ox), fold = Math.abs(at(cloud, x * 2.2 + c.ox, y * 2.2 + c.oy) - 0.5);
  return heap * 7 + (0.2 - Math.min(0.2, fold * 1.5)) * 9 - 2;
}

function sprinkle(sheet: Sheet, patch: Patch, look: Look, toX: number, toY: number, jitter: number): void {
  const { bumps, slow } = fields();
  look.specks.forEach((speck, index) => {
    // A cell of the field is about 25 texels: a speck of 1 mm in a cell of 4.5 mm.
    const reach = (speck.sizeMm / 4.5) * 0.62, per = 25 / 4.5;
    overPatch(sheet, patch, (k, u, v) => {
      const x = u * toX * per + jitter * per + index * 211, y = v * toY * per + index * 97;
      const d = at(bumps, x, y);
      if (d > reach || at(slow, x * 0.31 * 13, y * 0.29 * 13) > 0.32 + speck.share * 0.36) return;
      const m = 1 - rise(reach * 0.55, reach, d);
      stain(sheet, k, speck.colour, m * 0.85);
      if (speck.raised !== 0) sheet.z[k] = (sheet.z[k] as number) + speck.raised * m * sheet.scale;
    });
  });
}

/** The outer side of a loaf, smooth from the mould. */
export function paintSide(sheet: Sheet, patch: Patch, look: Look, design: 'plain' | 'layers' | 'swirl' | 'specks', lengthMm: number): void {
  const { cloud, grain } = fields();
  const { z, r, g, b, shine, scale } = sheet;
  const { base, second, third, character: c } = look;
  const inside = insideOf(design, c), shares: Shares = { second: 0, third: 0 };
  const toX = lengthMm / patch.w, toY = 65 / patch.h;
  overPatch(sheet, patch, (k, u, v) => {
    const x = u * toX, y = v * toY;
    inside(78, y, x, shares);
    const soft = 0.9, tone = 0.98 + (at(cloud, x * 2.1 + c.ox, y * 2.1) - 0.5) * 0.1;
    r[k] = mix(mix(base.r, second.r, shares.second * soft), third.r, shares.third) * tone;
    g[k] = mix(mix(base.g, second.g, shares.second * soft), third.g, shares.third) * tone;
    b[k] = mix(mix(base.b, second.b, shares.second * soft), third.b, shares.third) * tone;
    z[k] = (z[k] as number) + (at(grain, u * 0.05, v * 0.5) - 0.5) * 0.8 * scale;
    shine[k] = look.shine * 1.3;
  });
  sprinkle(sheet, patch, look, toX, toY, 40);
}

/** Rubs the outermost pixel of each patch into what lies beside it, so that outlines show no steps. */
export function rubEdges(sheet: Sheet): void {
  const { width: W, owner, inset, r, g, b } = sheet;
  for (let k = W; k < owner.length - W; k += 1) {
    if (owner[k] === 0 || (inset[k] as number) > 1) continue;
    const outside = owner[k - 1] !== owner[k] ? k - 1 : owner[k + 1] !== owner[k] ? k + 1 : owner[k - W] !== owner[k] ? k - W : owner[k + W] !== owner[k] ? k + W : -1;
    if (outside >= 0) {
      const share = 0.5 * (1 - (inset[k] as number));
      stain(sheet, k, { r: r[outside] as number, g: g[outside] as number, b: b[outside] as number }, share);
    }
  }
}

/** An oval in the middle that gelled while the rest did not. */
export function paintGelled(sheet: Sheet, patch: Patch, look: Look, strength: number): void {
  const { cloud } = fields();
  const { shine } = sheet;
  overPatch(sheet, patch, (k, u, v) => {
    const x = (u / patch.w) * 2 - 1, y = (v / patch.h) * 2 - 1.06;
    const e = Math.pow(Math.abs(x / 0.7) ** 2.6 + Math.abs(y / 0.64) ** 2.6, 1 / 2.6) + (at(cloud, u * 0.35 + look.character.ox, v * 0.35 + patch.id * 9) - 0.5) * 0.2;
    const within = 1 - rise(0.94, 1.03, e);
    const line = Math.exp(-(((e - 0.985) / 0.03) ** 2));
    shade(sheet, k, 1 - strength * (0.26 * within + 0.16 * line));
    if (within > 0) {
      sheet.b[k] = (sheet.b[k] as number) * (1 - strength * 0.16 * within);
      shine[k] = (shine[k] as number) + 0.22 * strength * within;
    }
  });
}
