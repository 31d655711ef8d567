/**
 * Capitals, figures and a few signs as strokes of a marker pen, on a grid 4 wide and 6 high:
 * labels need no font of the machine. Each letter is a list of strokes, each stroke a run of `xy` pairs.
 */
const STROKES: Readonly<Record<string, string>> = {
  A: '06 20 46|14 34', B: '06 00 30 41 42 33 03|33 44 45 36 06', C: '41 30 10 01 05 16 36 45', D: '06 00 20 42 44 26 06',
  E: '40 00 06 46|03 33', F: '40 00 06|03 33', G: '41 30 10 01 05 16 36 45 43 23', H: '00 06|40 46|03 43', I: '20 26|10 30|16 36',
  J: '40 45 36 16 05', K: '00 06|40 03 46', L: '00 06 46', M: '06 00 23 40 46', N: '06 00 46 40', O: '10 01 05 16 36 45 41 30 10',
  P: '06 00 30 41 42 33 03', Q: '10 01 05 16 36 45 41 30 10|24 46', R: '06 00 30 41 42 33 03|23 46', S: '41 30 10 01 02 13 33 44 45 36 16 05',
  T: '00 40|20 26', U: '00 05 16 36 45 40', V: '00 26 40', W: '00 16 22 36 40', X: '00 46|40 06', Y: '00 23 40|23 26', Z: '00 40 06 46',
  0: '10 01 05 16 36 45 41 30 10', 1: '11 20 26|16 36', 2: '01 10 30 41 42 06 46', 3: '01 10 30 41 42 33 13|33 44 45 36 16 05',
  4: '36 30 04 44', 5: '40 00 02 32 43 45 36 16 05', 6: '40 20 02 05 16 36 45 44 33 03', 7: '00 40 16', 8: '10 01 02 13 33 44 45 36 16 05 04 13|33 42 41 30 10',
  9: '06 26 44 41 30 10 01 02 13 43', '-': '13 33', '.': '26 26', ',': '26 17', '/': '06 40', '·': '23 23', ':': '22 22|25 25', '+': '13 33|22 24',
};

export interface Stroke { x0: number; y0: number; x1: number; y1: number }

/** Strokes of a text, its capitals `size` high, and how wide it runs; unknown signs leave a gap. */
export function strokesOf(text: string, size: number): { strokes: Stroke[]; width: number } {
  const step = size / 6, strokes: Stroke[] = [];
  let left = 0;
  for (const sign of text.toUpperCase()) {
    const drawn = STROKES[sign];
    for (const run of drawn?.split('|') ?? []) {
      const points = run.split(' ').map((pair) => ({ x: left + Number(pair[0]) * step, y: Number(pair[1]) * step }));
      points.slice(1).forEach((to, i) => {
        const from = points[i] ?? to;
        strokes.push({ x0: from.x, y0: from.y, x1: to.x, y1: to.y });
      });
    }
    left += (sign === ' ' ? 3 : 5.7) * step;
  }
  return { strokes, width: left - 1.7 * step };
}
