import { type Random, randomOf } from '../random.ts';
import { flatPatch, type Patch } from './sheet.ts';
import type { LoafPictureSpec, ShownFault } from './spec.ts';

/** Length of the loaf that one bar takes, in mm. */
export const BAR_MM = 21;

/** Room kept free at the foot of the picture for card, scale and label, in units. */
const FOOT = 116;

/** Numbers of the bars that show a fault; the same in every picture of the batch. */
export function barsWith(fault: ShownFault, spec: Pick<LoafPictureSpec, 'batchCode' | 'bars'>): number[] {
  if (fault.bars && fault.bars.length > 0) return [...fault.bars];
  const count = Math.max(1, Math.round((fault.extentShare ?? 1) * spec.bars));
  const from = randomOf(7, 'bars', spec.batchCode, fault.slug).whole(0, spec.bars - count);
  return Array.from({ length: count }, (_, i) => from + i + 1);
}

/** Bars laid before the lens: the asked ones, else faulty ones first and clear ones for comparison. */
export function shownBars(spec: LoafPictureSpec): number[] {
  if (spec.shownBars && spec.shownBars.length > 0) return [...spec.shownBars];
  const random = randomOf(7, 'shown', spec.batchCode, spec.scene);
  const count = Math.min(spec.bars, spec.scene === 'bar' ? random.whole(1, 2) : random.pick([6, 6, 8, 12]));
  const all = Array.from({ length: spec.bars }, (_, i) => i + 1);
  const marks = new Map(all.map((bar) => [bar, spec.faults.filter((fault) => barsWith(fault, spec).includes(bar)).length]));
  const worst = random.shuffle(all).sort((a, b) => (marks.get(b) ?? 0) - (marks.get(a) ?? 0));
  const faulty = worst.slice(0, Math.ceil(count * 0.7));
  return [...faulty, ...random.shuffle(worst.slice(faulty.length))].slice(0, count).sort((a, b) => a - b);
}

/** Cut faces in rows, each a little turned as hands lay them. */
export function facePatches(spec: LoafPictureSpec, bars: readonly number[], heightUnits: number, random: Random): Patch[] {
  const rows = bars.length <= 2 ? 1 : bars.length <= 8 ? 2 : 3, columns = Math.ceil(bars.length / rows);
  const room = { w: 930, h: heightUnits - FOOT - 26 };
  const cell = { w: room.w / columns, h: room.h / rows };
  const w = Math.min(cell.w - 26, (cell.h - 22) * 1.2), h = w / 1.22;
  const pitch = { x: Math.min(cell.w, w + 46), y: Math.min(cell.h, h + 34) };
  const jitter = spec.scene === 'bar' ? 0.03 : 0.014;
  return bars.map((bar, i) => {
    const row = Math.floor(i / columns), inRow = Math.min(columns, bars.length - row * columns);
    const cx = 500 + ((i % columns) - (inRow - 1) / 2) * pitch.x + random.between(-3, 3);
    const cy = 22 + room.h / 2 + (row - (rows - 1) / 2) * pitch.y + random.between(-3, 3);
    return flatPatch(i + 1, 'face', bar, { cx, cy, w, h }, 24 + random.between(-1.5, 1.5), random.normal(0, jitter));
  });
}

/** The cut loaf from above, bar by bar; a slab lies in two rows. */
export function topPatches(spec: LoafPictureSpec, heightUnits: number, random: Random): Patch[] {
  const rows = spec.bars > 14 ? 2 : 1, columns = Math.ceil(spec.bars / rows);
  const pitch = Math.min(72, 868 / columns), deep = rows === 2 ? 222 : Math.min(300, pitch * 3.9);
  const fan = spec.scene === 'tops' ? random.between(-1.2, 1.2) : 0;
  return Array.from({ length: spec.bars }, (_, i) => {
    const row = Math.floor(i / columns), place = (i % columns) - (columns - 1) / 2;
    const cy = 14 + (heightUnits - FOOT) / 2 + (rows === 2 ? (row - 0.5) * (deep + 26) : 0) + random.between(-3, 3) + fan * place;
    return flatPatch(i + 1, 'top', i + 1, { cx: 500 + place * pitch, cy, w: pitch - 4.6 + random.between(-0.6, 0.6), h: deep }, 32 + random.between(-1.6, 1.6), random.normal(0, 0.004));
  });
}

/** The whole loaf from a corner: top, the end before us on the left, the long side. */
export function loafPatches(spec: LoafPictureSpec, heightUnits: number): { top: Patch; end: Patch; side: Patch; lengthMm: number } {
  const lengthMm = spec.bars > 14 ? 270 : spec.bars * BAR_MM;
  const k = 3, length = { x: 570 * (lengthMm / 252), y: -118 * (lengthMm / 252) }, depth = { x: 205, y: 108 }, tall = 172;
  const corner = { x: 500 - length.x / 2 + depth.x / 2, y: 14 + (heightUnits - FOOT) / 2 + (tall + depth.y - length.y) / 2 - 6 };
  const along = { x: length.x / (lengthMm * k), y: length.y / (lengthMm * k) }, across = { x: depth.x / (80 * k), y: depth.y / (80 * k) }, down = { x: 0, y: tall / (65 * k) };
  const patch = (id: number, kind: Patch['kind'], w: number, h: number, ax: Patch['ax'], ay: Patch['ay'], cx: number, cy: number): Patch => ({ id, kind, bar: 0, w, h, ax, ay, cx, cy, lift: 92 });
  return {
    lengthMm,
    top: patch(1, 'top', lengthMm * k, 80 * k, along, across, corner.x + (length.x - depth.x) / 2, corner.y - tall + (length.y - depth.y) / 2),
    end: patch(2, 'face', 80 * k, 65 * k, across, down, corner.x - depth.x / 2, corner.y - (tall + depth.y) / 2),
    side: patch(3, 'side', lengthMm * k, 65 * k, along, down, corner.x + length.x / 2, corner.y - (tall - length.y) / 2),
  };
}
