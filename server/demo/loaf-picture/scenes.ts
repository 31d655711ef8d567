import { type Random } from '../random.ts';
import { coverPatch, paintFace, paintGelled, paintSide, paintTop } from './body.ts';
import { boxDistance, rise } from './curves.ts';
import { BAR_MM, facePatches, loafPatches, shownBars, topPatches } from './layout.ts';
import type { Look } from './look.ts';
import { at, fields } from './noise.ts';
import { paintBatter } from './pour.ts';
import { layMould } from './props.ts';
import { formOf, outlineOf } from './forms.ts';
import { flatPatch, type Patch, type Sheet } from './sheet.ts';
import type { LoafPictureSpec } from './spec.ts';

/** Puts the soap of a scene on the board, without its faults of the surface; gives the patches faults may be painted on. */
export function laySoap(sheet: Sheet, spec: LoafPictureSpec, look: Look, heightUnits: number, random: Random): Patch[] {
  switch (spec.scene) {
    case 'pour': return layPour(sheet, spec, look, heightUnits);
    case 'loaf': return layLoaf(sheet, spec, look, heightUnits);
    case 'tops': return layTops(sheet, spec, look, heightUnits, random);
    default: return layFaces(sheet, spec, look, heightUnits, random);
  }
}

function layPour(sheet: Sheet, spec: LoafPictureSpec, look: Look, heightUnits: number): Patch[] {
  const isSlab = spec.bars > 14;
  const batter = flatPatch(1, 'batter', 0, { cx: 500, cy: 14 + (heightUnits - 116) / 2, w: isSlab ? 700 : 800, h: isSlab ? 400 : 262 }, 50);
  layMould(sheet, spec, batter);
  const { slow } = fields();
  const { ox, oy } = look.character;
  coverPatch(sheet, batter, (u, v) => boxDistance(u, v, batter.w, batter.h, spec.mould === 'wood' ? 3 : 10) + (at(slow, u * 0.9 + ox, v * 0.9 + oy) - 0.5) * 3, 2);
  paintBatter(sheet, batter, spec, look);
  return [batter];
}

function layLoaf(sheet: Sheet, spec: LoafPictureSpec, look: Look, heightUnits: number): Patch[] {
  const { top, end, side, lengthMm } = loafPatches(spec, heightUnits);
  const { scale, z, lit } = sheet;
  const form = formOf(spec, look, 0);
  const edge = (patch: Patch) => (u: number, v: number) => boxDistance(u, v, patch.w, patch.h, 5);
  coverPatch(sheet, side, (u, v) => Math.max(edge(side)(u, v), form.tornAt(u, v, side.w, side.h)), 5);
  coverPatch(sheet, end, (u, v) => Math.max(edge(end)(u, v), form.tornAt(end.w - u, v, end.w, end.h)), 5);
  coverPatch(sheet, top, edge(top), 9);
  const design = spec.palette.design;
  paintTop(sheet, top, look, design, { fromMm: 0, lengthMm }, form.spooned);
  paintFace(sheet, end, look, design, 0, false);
  paintSide(sheet, side, look, design, lengthMm);
  if (spec.gel === 'partial') paintGelled(sheet, end, look, 0.22);
  // Upright faces: they go down to the board, and the lamp meets them at another angle.
  for (const [patch, light] of [[end, 1.1], [side, 0.8]] as const) standUp(sheet, patch, light, scale, z, lit);
  return [top, end, side];
}

function standUp(sheet: Sheet, patch: Patch, light: number, scale: number, z: Float32Array, lit: Float32Array): void {
  for (let k = 0; k < z.length; k += 1) {
    if (sheet.owner[k] !== patch.id) continue;
    const x = (k % sheet.width) / scale, y = Math.floor(k / sheet.width) / scale;
    const det = patch.ax.x * patch.ay.y - patch.ax.y * patch.ay.x;
    const v = ((y - patch.cy) * patch.ax.x - (x - patch.cx) * patch.ax.y) / det + patch.h / 2, down = v / patch.h;
    z[k] = (z[k] as number) - patch.lift * scale * rise(-0.25, 1.25, down) * 0.98;
    lit[k] = light * (1.06 - 0.34 * down * down);
  }
}

function layTops(sheet: Sheet, spec: LoafPictureSpec, look: Look, heightUnits: number, random: Random): Patch[] {
  const patches = topPatches(spec, heightUnits, random);
  const columns = spec.bars > 14 ? Math.ceil(spec.bars / 2) : spec.bars;
  for (const patch of patches) {
    const form = formOf(spec, look, patch.bar);
    const placed = form.placed(patch);
    Object.assign(patch, placed);
    coverPatch(sheet, patch, outlineOf(form, patch, look), 5);
    const fromMm = ((patch.bar - 1) % columns) * BAR_MM + (patch.bar > columns ? 311 : 0);
    paintTop(sheet, patch, look, spec.palette.design, { fromMm, lengthMm: BAR_MM }, form.spooned);
  }
  return patches;
}

function layFaces(sheet: Sheet, spec: LoafPictureSpec, look: Look, heightUnits: number, random: Random): Patch[] {
  const patches = facePatches(spec, shownBars(spec), heightUnits, random);
  for (const patch of patches) {
    const form = formOf(spec, look, patch.bar);
    coverPatch(sheet, patch, outlineOf(form, patch, look), spec.scene === 'bar' ? 8 : 5);
    paintFace(sheet, patch, look, spec.palette.design, patch.bar * BAR_MM * 0.3, true);
    if (spec.gel === 'partial') paintGelled(sheet, patch, look, 0.26);
  }
  return patches;
}
