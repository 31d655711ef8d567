import type { Palette } from '#shared/words/batch-words.ts';
import type { Character } from './character.ts';
import { bell, rise } from './curves.ts';
import { at, fields } from './noise.ts';

/** Shares of the second and the third colour at one place. */
export interface Shares { second: number; third: number }

/** Shares at a place of the cut face: across 0..80 mm, down 0..65 mm, at a depth along the loaf in mm. */
export type Design = (acrossMm: number, downMm: number, alongMm: number, shares: Shares) => void;

/** The design inside the loaf: neighbouring bars are close in `alongMm`, so their faces resemble each other. */
export function insideOf(design: Palette['design'], c: Character): Design {
  if (design === 'layers') return layersOf(c);
  if (design === 'swirl') return { hanger: hangerOf, comb: combOf, pot: potOf }[c.swirl](c);
  return (_x, _y, _z, shares) => { shares.second = 0; shares.third = 0; };
}

function layersOf(c: Character): Design {
  const { slow, cloud } = fields();
  const [first, second] = c.layers;
  return (x, y, z, shares) => {
    const wave = (at(slow, x * 2.2 + c.ox, z * 1.1 + c.oy) - 0.5) * 13 + (at(cloud, x * 2 + c.oy, y * 0.6 + z) - 0.5) * 2.4;
    const down = y + wave, a = down - first * 65, b = down - second * 65 + c.lean * (x - 40) * 0.08;
    shares.second = rise(-0.35, 0.35, a) * (1 - rise(-0.35, 0.35, b));
    shares.third = Math.max(rise(-0.35, 0.35, b), c.hasLine ? 0.85 * bell(a, 0.45) : 0);
  };
}

/** A wire hanger drawn through poured lines: plumes that fold back on themselves. */
function hangerOf(c: Character): Design {
  const { slow, cloud } = fields();
  const level = 0.5 - c.plenty * 0.06;
  return (x, y, z, shares) => {
    const px = x * 1.5 + c.ox + z * 0.55, py = y * 1.5 + c.oy - z * 0.35;
    const wx = at(slow, px, py) - 0.5, wy = at(slow, py + 171, px + 67) - 0.5;
    const vx = at(slow, px + 190 * wx, py + 190 * wy) - 0.5;
    const f = at(slow, px * 1.25 + 330 * vx + 90 * wy, py * 0.9 + 260 * wx + 40) + (at(cloud, x * 3 + c.ox, y * 3 + z) - 0.5) * 0.03;
    shares.second = rise(level - 0.012, level + 0.012, f) * (1 - rise(level + 0.2, level + 0.222, f));
    shares.third = Math.max(0.9 * bell(f - level + 0.032, 0.012), rise(level + 0.29, level + 0.31, f));
  };
}

/** Lines poured side by side and combed across: feathers that point to and fro. */
function combOf(c: Character): Design {
  const { slow, cloud } = fields();
  const pitch = 26 + c.turns * 5;
  return (x, y, z, shares) => {
    const warp = (at(slow, x * 1.9 + c.ox, y * 1.9 + c.oy + z * 0.6) - 0.5) * 46, loose = at(slow, x * 2.3 + c.oy, y * 1.5 + c.ox + z);
    const tooth = (x + warp * 0.5 + c.lean * y * 0.3) / pitch, place = tooth - Math.floor(tooth);
    const pulled = (8 + 22 * loose) * (bell(place - 0.27, 0.13) - 0.8 * bell(place - 0.74, 0.2));
    const s = (y * 0.8 + warp * 0.8 + pulled) / (21 + c.plenty * 3) + at(cloud, x * 2, y * 2 + z) * 0.08, band = s - Math.floor(s), wide = 0.18 * (loose - 0.5) + c.plenty * 0.05;
    shares.second = rise(0.3, 0.32, band) * (1 - rise(0.58 + wide, 0.6 + wide, band));
    shares.third = 0.9 * rise(0.61 + wide, 0.63 + wide, band) * (1 - rise(0.68 + wide, 0.7 + wide, band));
  };
}

/** Colours dropped into the pot and turned once: broad, soft lobes with thin tails. */
function potOf(c: Character): Design {
  const { slow, cloud } = fields();
  const level = 0.54 - c.plenty * 0.06;
  return (x, y, z, shares) => {
    const px = x * 1.8 + c.ox + z * 0.4, py = y * 2.1 + c.oy + z * 0.2;
    const wx = at(slow, py + 40, px) - 0.5, wy = at(slow, px + 300, py + 200) - 0.5;
    const f = at(slow, px + 210 * wx, py + 210 * wy) + (at(cloud, px * 1.4, py * 1.4) - 0.5) * 0.07;
    const g = at(slow, px * 0.9 + 240 * wy + 77, py * 0.9 + 180 * wx + 133);
    shares.second = rise(level - 0.015, level + 0.02, f);
    shares.third = 0.85 * rise(0.6, 0.625, g) * (1 - rise(0.7, 0.72, g));
  };
}

/** The design on the loaf's top: along 0..250 mm, across 0..80 mm; follows how the top was worked. */
export function topOf(design: Palette['design'], c: Character): (alongMm: number, acrossMm: number, shares: Shares) => void {
  const { slow, cloud } = fields();
  if (design === 'plain' || design === 'specks') return (_x, _y, shares) => { shares.second = 0; shares.third = 0; };
  const few = design === 'layers' ? 0.55 : 1;
  return (x, y, shares) => {
    const phase = wavePhase(c, x, y);
    const drift = (at(slow, x * 1.5 + c.oy, y * 1.5 + c.ox) - 0.5) * 2.1 + (at(cloud, x * 1.6 + c.ox, y * 1.6) - 0.5) * 0.25;
    const s = phase * 0.5 + drift, band = s - Math.floor(s);
    const width = (0.3 + c.plenty * 0.1) * few;
    shares.second = rise(0.28, 0.31, band) * (1 - rise(0.28 + width, 0.32 + width, band));
    shares.third = 0.85 * rise(0.34 + width, 0.36 + width, band) * (1 - rise(0.44 + width, 0.47 + width, band));
  };
}

/** Count of the spoon's strokes up to this place of the top. */
export function wavePhase(c: Character, x: number, y: number): number {
  const { slow } = fields();
  const bend = at(slow, x * 1.3 + c.ox, y * 1.3 + c.oy) - 0.5;
  const turn = Math.sin((6.2832 * x) / c.wavelengthMm + bend * 5);
  if (c.top === 'combed') {
    const place = x / (c.wavelengthMm * 0.6) + bend * 1.6 + y * 0.004 * c.lean, part = place - Math.floor(place);
    return (y / 80) * (c.turns + 0.8) + 0.8 * (bell(part - 0.27, 0.14) - 0.8 * bell(part - 0.75, 0.2)) + bend * 2;
  }
  if (c.top === 'peaks') return (y / 80) * c.turns * 0.8 + x / c.wavelengthMm + 0.7 * turn + bend * 2.4;
  return (y / 80) * c.turns + 0.62 * turn + bend * 1.4 + c.lean * x * 0.008;
}

/** Height of the worked top above its edge, in mm. */
export function topHeightMm(c: Character, x: number, y: number): number {
  const { cloud, slow } = fields();
  const edge = rise(0, 7, y) * rise(0, 7, 80 - y);
  const rough = (at(cloud, x * 3.1 + c.ox, y * 3.1 + c.oy) - 0.5);
  if (c.top === 'smooth') return edge * ((at(slow, x * 1.4 + c.ox, y * 1.4) - 0.5) * 2.6 + rough * 1.1 + 0.5 * Math.sin(wavePhase(c, x, y) * 6.2832));
  const phase = wavePhase(c, x, y), t = phase - Math.floor(phase);
  // Drawn up gently, let fall steeply, as a spoon leaves it.
  const crest = t < 0.66 ? rise(0, 0.66, t) : 1 - rise(0.66, 1, t);
  const size = 0.55 + 0.9 * at(slow, x * 2 + c.oy, y * 2 + 90);
  return edge * (c.depthMm * (c.top === 'combed' ? 0.55 : 1) * crest * size + rough * 2.2 + 2 * (1 - ((y - 40) / 40) ** 2));
}
