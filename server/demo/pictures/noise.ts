import { randomOf } from '../random.ts';

/** Side of every table; a power of two so that wrapping is one bit-and. */
const side = 512;
const mask = side - 1;

export type Field = (x: number, y: number) => number;

interface Tables { cloud: Float32Array; grain: Float32Array; veins: Float32Array }
let tables: Tables | undefined;

/** Tables shared by all pictures: worked out once, because sampling a table costs a tenth of working out its octaves. */
function sharedTables(): Tables {
  tables ??= { cloud: evened(octaves('cloud', 8, 5)), grain: evened(octaves('grain', 128, 2)), veins: veinTable() };
  return tables;
}

export interface Noise {
  /** Soft lumps about 64 wide with finer ones in them; evenly spread over 0..1, so a threshold is a share of the area. */
  cloud: Field;
  /** Fine grain about 4 wide, evenly spread over 0..1. */
  grain: Field;
  /** Distance to the nearest wall of a cracked-glaze net with cells about 64 wide: 0 on a wall, about 1 in a cell. */
  veins: Field;
}

/** Noise seen through a window that differs from batch to batch. */
export function noiseOf(seed: number, name: string): Noise {
  const { cloud, grain, veins } = sharedTables();
  const random = randomOf(seed, 'noise', name);
  const shifted = (table: Float32Array): Field => {
    const dx = random.unit() * side;
    const dy = random.unit() * side;
    return (x, y) => sample(table, x + dx, y + dy);
  };
  return { cloud: shifted(cloud), grain: shifted(grain), veins: shifted(veins) };
}

/** Reads a table between its points; it repeats in both directions. */
function sample(table: Float32Array, x: number, y: number): number {
  const xf = Math.floor(x);
  const yf = Math.floor(y);
  const fx = x - xf;
  const fy = y - yf;
  const x0 = xf & mask;
  const x1 = (xf + 1) & mask;
  const row0 = (yf & mask) * side;
  const row1 = ((yf + 1) & mask) * side;
  const a = table[row0 + x0] as number;
  const b = table[row0 + x1] as number;
  const c = table[row1 + x0] as number;
  const d = table[row1 + x1] as number;
  const top = a + (b - a) * fx;
  return top + (c + (d - c) * fx - top) * fy;
}

/** Repeating value noise: `cells` lumps across, each octave twice as fine and half as strong. */
function octaves(name: string, cells: number, count: number): Float32Array {
  const random = randomOf(1, 'table', name);
  const table = new Float32Array(side * side);
  for (let octave = 0, n = cells, weight = 1; octave < count; octave += 1, n *= 2, weight /= 2) {
    const knots = Float32Array.from({ length: n * n }, () => random.unit());
    const step = n / side;
    for (let y = 0; y < side; y += 1) {
      const gy = Math.floor(y * step);
      const fy = ease(y * step - gy);
      const row0 = gy * n;
      const row1 = ((gy + 1) % n) * n;
      for (let x = 0; x < side; x += 1) {
        const gx = Math.floor(x * step);
        const fx = ease(x * step - gx);
        const gx1 = (gx + 1) % n;
        const a = knots[row0 + gx] as number;
        const b = knots[row0 + gx1] as number;
        const c = knots[row1 + gx] as number;
        const d = knots[row1 + gx1] as number;
        const top = a + (b - a) * fx;
        table[y * side + x] = (table[y * side + x] as number) + weight * (top + (c + (d - c) * fx - top) * fy);
      }
    }
  }
  return table;
}

function ease(t: number): number {
  return t * t * t * (t * (t * 6 - 15) + 10);
}

/** Spreads values evenly over 0..1, by the logistic stand-in for the normal distribution. */
function evened(table: Float32Array): Float32Array {
  const mean = table.reduce((sum, v) => sum + v, 0) / table.length;
  const deviation = Math.sqrt(table.reduce((sum, v) => sum + (v - mean) ** 2, 0) / table.length);
  return table.map((v) => 1 / (1 + Math.exp((-1.702 * (v - mean)) / deviation)));
}

/** Difference of the distances to the two nearest of scattered points: zero along the walls between them. */
function veinTable(): Float32Array {
  const random = randomOf(1, 'table', 'veins');
  const cells = 8;
  const size = side / cells;
  const points = Array.from({ length: cells * cells }, () => ({ x: random.unit() * size, y: random.unit() * size }));
  const table = new Float32Array(side * side);
  for (let y = 0; y < side; y += 1) {
    for (let x = 0; x < side; x += 1) {
      const cx = Math.floor(x / size);
      const cy = Math.floor(y / size);
      let first = Infinity;
      let second = Infinity;
      for (let j = -1; j <= 1; j += 1) {
        for (let i = -1; i <= 1; i += 1) {
          const point = points[((cy + j + cells) % cells) * cells + ((cx + i + cells) % cells)] as { x: number; y: number };
          const away = (cx + i) * size + point.x - x;
          const beside = (cy + j) * size + point.y - y;
          const distance = Math.sqrt(away * away + beside * beside);
          if (distance < first) { second = first; first = distance; } else if (distance < second) second = distance;
        }
      }
      table[y * side + x] = Math.min(1, (second - first) / size);
    }
  }
  return table;
}
