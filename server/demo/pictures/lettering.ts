import { type Colour, type Raster, raise, smooth, tint } from './raster.ts';

/**
 * Strokes of a stamped label. A point is a column 0..4 and a row 0..7 (capitals stand on row 6);
 * points of one stroke are joined, strokes are parted by a space.
 */
const glyphs: Readonly<Record<string, string>> = {
  '0': '103041453616050110', '1': '022026 1636', '2': '01103041420646', '3': '0110304142334445361605 1333', '4': '300444 3036',
  '5': '4000023243453616 1605', '6': '41301001051636454333 3303', '7': '004016', '8': '103041423313020110 133344453616050413', '9': '43130201103041453616 1605',
  '-': '0343', A: '062046 1434', B: '060030414233 0333 334445360636', C: '413010010516 1636 3645', D: '00204244260600', E: '40000646 0333', F: '400006 0333', G: '4130100105163645 4323 4345',
  H: '0006 4046 0343', I: '2026', J: '40453616 1605', K: '0006 4003 0346', L: '000646', M: '0600234046', N: '06004640', O: '103041453616050110', P: '060030414233 3303', Q: '103041453616050110 2447',
  R: '06003041423303 2346', S: '413010010213334445361605', T: '0040 2026', U: '000516364540', V: '002640', W: '0016233640', X: '0046 4006', Y: '002340 2326', Z: '00400646',
  a: '123243 4346 44140516 163645', c: '43321203051636 3645', d: '4046 43321203051636 3645', e: '04444332120305163645', i: '2226 2020', k: '0006 4204 0446', l: '2026', m: '0206 03122326 23324346',
  n: '0206 0312324346', o: '123243453616050312', p: '0207 03123243453616 1605', r: '1216 132232', s: '433212031434453616 1605', t: '20253646 0232', u: '02051636 3645 4246', w: '0216243642',
};

/** Draws a line of text with its left end at x and capitals from y down; returns its right end. */
export function letter(raster: Raster, text: string, x: number, y: number, size: number, colour: Colour): number {
  const step = size / 6;
  const pen = Math.max(0.8, size * 0.075);
  let at = x;
  for (const character of text) {
    for (const stroke of (glyphs[character] ?? '').split(' ')) {
      const points = stroke.match(/../g) ?? [];
      points.forEach((point, i) => {
        const next = points[i + 1] ?? (points.length === 1 ? point : undefined);
        if (next) line(raster, at + Number(point[0]) * step, y + Number(point[1]) * step, at + Number(next[0]) * step, y + Number(next[1]) * step, pen, colour);
      });
    }
    at += step * (character === ' ' ? 3 : 5.7);
  }
  return at;
}

function line(raster: Raster, x0: number, y0: number, x1: number, y1: number, pen: number, colour: Colour): void {
  const long = Math.hypot(x1 - x0, y1 - y0) || 1;
  const ux = (x1 - x0) / long;
  const uy = (y1 - y0) / long;
  for (let y = Math.floor(Math.min(y0, y1) - pen - 1); y <= Math.max(y0, y1) + pen + 1; y += 1) {
    for (let x = Math.floor(Math.min(x0, x1) - pen - 1); x <= Math.max(x0, x1) + pen + 1; x += 1) {
      const along = Math.min(long, Math.max(0, (x - x0) * ux + (y - y0) * uy));
      const ink = smooth(pen + 0.7, pen - 0.5, Math.hypot(x - x0 - along * ux, y - y0 - along * uy));
      if (ink <= 0) continue;
      const k = y * raster.width + x;
      tint(raster, k, colour, ink * 0.9);
      raise(raster, k, -ink * 0.12);
    }
  }
}
