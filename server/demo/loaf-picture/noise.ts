import { randomOf } from '../random.ts';

/**
 * Fields of chance, worked out once per process and read many times: every picture looks
 * them up at an offset of its own, which costs a fraction of summing octaves per pixel.
 */
export const SIZE = 512;
const MASK = SIZE - 1;

export type Field = Float32Array<ArrayBuffer>;

interface Fields {
  /** Slow hills, features of 60 to 130 texels. */
  slow: Field;
  /** Clouds with detail down to 4 texels. */
  cloud: Field;
  /** Lumps of about 20 texels with some detail. */
  lumps: Field;
  /** Fine grain of about 2 texels. */
  grain: Field;
  /** Distance between the two nearest of scattered points: a net of cells, 0 on its lines. */
  cells: Field;
  /** Distance to the nearest of scattered points: bumps, 0 at their middle. */
  bumps: Field;
}

let made: Fields | undefined;

/** All fields, each of mean about 0.5 within 0..1 and tiling without a seam. */
export function fields(): Fields {
  made ??= {
    slow: octaves('slow', 4, 2), cloud: octaves('cloud', 8, 6), lumps: octaves('lumps', 24, 3), grain: octaves('grain', 256, 1),
    ...scattered('cells', 420),
  };
  return made;
}

/** Value of a field between its texels; any coordinates of −2 000 000 and above. */
export function at(field: Field, x: number, y: number): number {
  const px = x + 2_097_152, py = y + 2_097_152;
  const xi = px | 0, yi = py | 0;
  const fx = px - xi, fy = py - yi;
  const row = (yi & MASK) * SIZE, next = ((yi + 1) & MASK) * SIZE, left = xi & MASK, right = (xi + 1) & MASK;
  const a = field[row + left] as number, b = field[row + right] as number, c = field[next + left] as number, d = field[next + right] as number;
  return a + (b - a) * fx + (c - a) * fy + (a - b - c + d) * fx * fy;
}

function octaves(name: string, cells: number, count: number): Field {
  const field = new Float32Array(SIZE * SIZE);
  let amplitude = 1;
  for (let octave = 0; octave < count; octave += 1) {
    addLattice(field, `${name}-${octave}`, Math.min(SIZE, cells << octave), amplitude);
    amplitude *= 0.5;
  }
  return stretched(field);
}

function addLattice(field: Field, name: string, cells: number, amplitude: number): void {
  const random = randomOf(1, 'field', name);
  const lattice = Float32Array.from({ length: cells * cells }, () => random.unit());
  const ease = (t: number) => t * t * t * (t * (t * 6 - 15) + 10);
  for (let y = 0; y < SIZE; y += 1) {
    const v = (y * cells) / SIZE, j = Math.floor(v), fy = ease(v - j), row = j * cells, next = ((j + 1) % cells) * cells;
    for (let x = 0; x < SIZE; x += 1) {
      const u = (x * cells) / SIZE, i = Math.floor(u), fx = ease(u - i), right = (i + 1) % cells;
      const a = lattice[row + i] as number, b = lattice[row + right] as number, c = lattice[next + i] as number, d = lattice[next + right] as number;
      field[y * SIZE + x] = (field[y * SIZE + x] as number) + amplitude * (a + (b - a) * fx + (c - a) * fy + (a - b - c + d) * fx * fy);
    }
  }
}

/** Mean 0.5, three deviations filling 0..1, so that a threshold means the same share in every field. */
function stretched(field: Field): Field {
  const mean = field.reduce((sum, value) => sum + value, 0) / field.length;
  const deviation = Math.sqrt(field.reduce((sum, value) => sum + (value - mean) ** 2, 0) / field.length);
  return field.map((value) => Math.min(1, Math.max(0, 0.5 + (value - mean) / (6 * deviation)))) as Field;
}

function scattered(name: string, points: number): Pick<Fields, 'cells' | 'bumps'> {
  const random = randomOf(1, 'field', name);
  const across = Math.floor(Math.sqrt(points)), pitch = SIZE / across;
  const px = new Float32Array(across * across), py = new Float32Array(across * across);
  for (let i = 0; i < px.length; i += 1) {
    px[i] = ((i % across) + random.between(0.05, 0.95)) * pitch;
    py[i] = (Math.floor(i / across) + random.between(0.05, 0.95)) * pitch;
  }
  const cells = new Float32Array(SIZE * SIZE), bumps = new Float32Array(SIZE * SIZE);
  for (let y = 0; y < SIZE; y += 1) {
    for (let x = 0; x < SIZE; x += 1) {
      const ci = Math.floor(x / pitch), cj = Math.floor(y / pitch);
      let first = 1e9, second = 1e9;
      for (let dj = -2; dj <= 2; dj += 1) {
        for (let di = -2; di <= 2; di += 1) {
          const i = (ci + di + across) % across, j = (cj + dj + across) % across, k = j * across + i;
          const dx = Math.abs(x - (px[k] as number)), dy = Math.abs(y - (py[k] as number));
          const d = Math.hypot(Math.min(dx, SIZE - dx), Math.min(dy, SIZE - dy));
          if (d < first) { second = first; first = d; } else if (d < second) second = d;
        }
      }
      cells[y * SIZE + x] = Math.min(1, (second - first) / pitch);
      bumps[y * SIZE + x] = Math.min(1, first / pitch);
    }
  }
  return { cells, bumps };
}
