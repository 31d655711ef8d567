import type { Raster } from './raster.ts';

/** Falls of the shadow per pixel away from the lamp: three heights of one broad lamp, for a soft edge. */
const slopes = [0.36, 0.44, 0.55] as const;
/** How far a ray from the left sinks in the picture per pixel. */
const shear = 0.3;

/** Kept from picture to picture: giving megabytes back each time costs more than the walk itself. */
let scratch = new Float32Array(0);

/**
 * Share of the lamp hidden at each pixel, 0..1. Each ray is walked away from the lamp,
 * line by line, carrying the height below which it is dark.
 */
export function shadows({ width, height, z }: Raster): Float32Array {
  const dark = (scratch = scratch.length === z.length ? scratch.fill(0) : new Float32Array(z.length));
  const lines = height + Math.ceil(width * shear) + 1;
  const shift = Int32Array.from({ length: width }, (_, x) => lines - height - Math.floor(x * shear));
  for (const slope of slopes) {
    const horizon = new Float32Array(lines + 1);
    for (let y = 0, k = 0; y < height; y += 1) {
      for (let x = 0; x < width; x += 1, k += 1) {
        const line = y + (shift[x] as number);
        const ray = (horizon[line] as number) - slope;
        const here = z[k] as number;
        if (ray > here) {
          const deep = (ray - here) * 0.3;
          dark[k] = (dark[k] as number) + (deep > 1 ? 1 : deep) / slopes.length;
          horizon[line] = ray;
        } else horizon[line] = here;
      }
    }
  }
  return softened(dark, width, height, 2);
}

/** Share of the sky hidden by what stands near, from heights averaged over blocks of 8 pixels. */
export function nearness({ width, height, z }: Raster): { at: Float32Array; across: number } {
  const across = Math.ceil(width / 8);
  const down = Math.ceil(height / 8);
  const blocks = new Float32Array(across * down);
  for (let y = 0; y < down; y += 1) {
    for (let x = 0; x < across; x += 1) {
      let sum = 0;
      for (let j = 0; j < 8; j += 2) for (let i = 0; i < 8; i += 2) sum += z[Math.min(height - 1, y * 8 + j) * width + Math.min(width - 1, x * 8 + i)] as number;
      blocks[y * across + x] = sum / 16;
    }
  }
  return { at: softened(softened(blocks, across, down, 2), across, down, 2), across };
}

/** Box blur in both directions. */
function softened(plane: Float32Array, width: number, height: number, radius: number): Float32Array {
  const wide = new Float32Array(plane.length);
  const size = 2 * radius + 1;
  for (let y = 0; y < height; y += 1) {
    const row = y * width;
    let sum = 0;
    for (let x = -radius; x <= radius; x += 1) sum += plane[row + Math.max(0, x)] as number;
    for (let x = 0; x < width; x += 1) {
      wide[row + x] = sum / size;
      sum += (plane[row + Math.min(width - 1, x + radius + 1)] as number) - (plane[row + Math.max(0, x - radius)] as number);
    }
  }
  const both = new Float32Array(plane.length);
  const sums = new Float32Array(width);
  for (let y = -radius; y <= radius; y += 1) for (let x = 0; x < width; x += 1) sums[x] = (sums[x] as number) + (wide[Math.max(0, y) * width + x] as number);
  for (let y = 0; y < height; y += 1) {
    const next = Math.min(height - 1, y + radius + 1) * width;
    const last = Math.max(0, y - radius) * width;
    for (let x = 0; x < width; x += 1) {
      both[y * width + x] = (sums[x] as number) / size;
      sums[x] = (sums[x] as number) + (wide[next + x] as number) - (wide[last + x] as number);
    }
  }
  return both;
}
