import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { type Random, randomOf } from '../random.ts';
import type { Body } from './body.ts';
import { combed } from './surfaces/top.ts';
import type { Look } from './look.ts';
import type { PictureWish } from './picture-wish.ts';

export type Scene = 'pour' | 'loaf' | 'tops' | 'faces' | 'bar';

/** Faults seen best on the top of the cut loaf. */
const onTop = new Set<CatalogueSlug>(['soda-ash', 'overheating-crack', 'volcano', 'uneven-bars', 'stuck-in-mould', 'seizing', 'acceleration']);

/** How the batch is laid out for a picture; the same loaf is laid out alike at each stage, so that pictures can be compared. */
export function sceneOf(wish: PictureWish): Scene {
  if (wish.stage === 'pour') return 'pour';
  if (wish.stage === 'unmould') return 'loaf';
  if (wish.stage === 'in-use') return 'bar';
  const random = randomOf(7, 'scene', wish.code);
  const top = wish.shows.filter(({ fault }) => onTop.has(fault)).length;
  if (top > wish.shows.length - top) return 'tops';
  return random.weighted([['faces', 5], ['bar', wish.stage === 'cut' ? 1 : 4], ['tops', wish.shows.length > 0 ? 0 : 5]] as const);
}

/** Places the bodies of a scene. `offset` is where a top lies along its loaf, `scale` how large a face is drawn. */
export interface Placed { body: Body; offset: number; scale: number }

export function layOut(wish: PictureWish, scene: Scene, look: Look, random: Random): Placed[] {
  const placed = layOutSound(wish, scene, look, random);
  for (const { fault, severity, bars } of wish.shows) {
    for (const { body } of placed) if (bars.includes(body.bar)) reshape(body, fault, severity, randomOf(7, 'shape', wish.code, body.bar));
  }
  return placed;
}

/** Faults of the outline itself: bars cut too small or askew, bars that bent. */
function reshape(body: Body, fault: CatalogueSlug, severity: number, random: Random): void {
  if (fault === 'uneven-bars') {
    const smaller = 1 - 0.05 * severity - random.between(0, 0.03);
    body.halfWidth *= body.side === 'top' ? smaller - 0.05 : smaller;
    body.halfHeight *= body.side === 'top' ? 1 - (1 - smaller) / 2 : smaller;
    body.thickness -= 4 * severity;
    body.turn += random.normal(0, 0.008 * severity);
  }
  if (fault === 'warping') {
    const bow = (3 + 5 * severity) * (body.halfHeight / 108);
    const before = body.skyline;
    const half = body.halfWidth;
    body.skyline = (x) => (before?.(x) ?? 0) + bow * ((x / half) ** 2 * 1.6 - 0.8);
    body.turn += 0.012 * severity;
  }
}

function layOutSound(wish: PictureWish, scene: Scene, look: Look, random: Random): Placed[] {
  if (scene === 'tops') return topsOf(wish, random);
  if (scene === 'faces') return facesOf(wish, look, random);
  if (scene === 'bar') return barsOf(wish, look, random);
  const isPour = scene === 'pour';
  const body: Body = {
    mark: 1, bar: 0, cx: 540 + random.normal(0, 5), cy: 296 + random.normal(0, 5), halfWidth: 424, halfHeight: isPour ? 146 : 160,
    turn: random.normal(0, 0.006), corner: isPour ? 4 : 7, thickness: isPour ? 30 : 74, side: isPour ? 'batter' : 'top',
  };
  return [{ body, offset: 500, scale: 1 }];
}

/** Bars worth showing: those that carry faults first, in the order they lie in the loaf. */
export function barsToShow(wish: PictureWish, count: number, random: Random): number[] {
  const all = Array.from({ length: wish.bars }, (_, i) => i + 1);
  const faulty = new Set(wish.shows.flatMap(({ bars }) => bars));
  // One faulty bar of each fault before anything else, so that every fault can be seen.
  const needed = wish.shows.flatMap(({ bars }) => bars.slice(0, 1));
  const ranked = [...new Set([...needed, ...random.shuffle(all.filter((bar) => faulty.has(bar))), ...random.shuffle(all)])];
  return ranked.slice(0, count).sort((a, b) => a - b);
}

function topsOf(wish: PictureWish, random: Random): Placed[] {
  const rows = wish.bars > 14 ? 2 : 1;
  const inRow = Math.ceil(wish.bars / rows);
  const width = 850 / Math.max(inRow, 6);
  const start = 540 - (width * inRow) / 2;
  return Array.from({ length: wish.bars }, (_, i) => {
    const row = Math.floor(i / inRow);
    const body: Body = {
      mark: i + 1, bar: i + 1, cx: start + width * ((i % inRow) + 0.5) + random.normal(0, 0.7), cy: (rows === 1 ? 292 : 158 + row * 268) + random.normal(0, 2.4),
      halfWidth: width / 2 - 1.9, halfHeight: rows === 1 ? 158 : 122,
      turn: random.normal(0, 0.0025), corner: 5, thickness: 62 + random.normal(0, 1.6), side: 'top',
    };
    return { body, offset: body.cx - 540 + 500 + row * 1000, scale: 1 };
  });
}

function facesOf(wish: PictureWish, look: Look, random: Random): Placed[] {
  const shown = barsToShow(wish, Math.min(6, wish.bars), random);
  const columns = Math.ceil(shown.length / 2);
  return shown.map((bar, i) => {
    const row = Math.floor(i / columns);
    const body: Body = {
      mark: i + 1, bar, cx: 540 + ((i % columns) - (columns - 1) / 2) * 288 + random.normal(0, 3), cy: 168 + row * 258 + random.normal(0, 2.5), halfWidth: 124, halfHeight: 108,
      turn: random.normal(0, 0.012), corner: 7, thickness: 34 + random.normal(0, 1), side: 'face', skyline: skylineOf(look, bar, 1),
    };
    return { body, offset: 0, scale: 1 };
  });
}

function barsOf(wish: PictureWish, look: Look, random: Random): Placed[] {
  const count = wish.stage === 'in-use' || wish.bars < 2 || random.chance(0.3) ? 1 : 2;
  const shown = barsToShow(wish, count, random);
  const scale = count === 1 ? 2.0 : 1.72;
  return shown.map((bar, i) => {
    const body: Body = {
      mark: i + 1, bar, cx: 540 + (i - (count - 1) / 2) * 468 + random.normal(0, 6), cy: 308 + random.normal(0, 7), halfWidth: 124 * scale, halfHeight: 106 * scale,
      turn: random.normal(0, 0.035), corner: 9, thickness: 46, side: 'face', skyline: skylineOf(look, bar, scale),
    };
    return { body, offset: 0, scale };
  });
}

/** Upper edge of a cut face: the combed top seen from the side. */
function skylineOf(look: Look, bar: number, scale: number): (x: number) => number {
  const heights = Float32Array.from({ length: 640 }, (_, i) => {
    const across = (i - 320) / scale;
    return (combed(look, 500 + bar * 30, across * 1.25).height - 0.45) * (look.isRough ? 7 : 9) * scale;
  });
  const eased = heights.map((_, i) => {
    let sum = 0;
    for (let j = -9; j <= 9; j += 1) sum += heights[Math.min(639, Math.max(0, i + j))] as number;
    return sum / 19;
  });
  return (x) => eased[Math.min(639, Math.max(0, Math.round(x) + 320))] as number;
}
