import { byteOf } from './colour.ts';
import { at, fields } from './noise.ts';
import type { Sheet } from './sheet.ts';

/** The light of one picture: one low lamp or window from the left, the room's own light, and the camera's idea of white. */
export interface Light {
  /** Fall of the shadow's edge per pixel walked; the smaller, the longer the shadows. */
  slope: number;
  /** Pixels a shadow moves down per pixel to the right. */
  shear: number;
  exposure: number;
  white: { r: number; g: number; b: number };
  noise: number;
  seed: number;
}

/** Lights the sheet; three bytes a pixel, sRGB. Cost: one pass of shadows at half size, one pass of light at full size. */
export function develop(sheet: Sheet, light: Light): Uint8Array<ArrayBuffer> {
  const { width: W, height: H, z, r, g, b, shine, lit } = sheet;
  const shadow = shadows(sheet, light), hollow = hollows(sheet);
  const out = new Uint8Array(W * H * 3);
  const { grain } = fields();
  const lx = -0.8, ly = -0.34, lz = 0.5, halfLength = 1 / Math.hypot(lx, ly, lz + 1);
  const sx = lx * halfLength, sy = ly * halfLength, sz = (lz + 1) * halfLength;
  const halfW = (W + 1) >> 1, quarterW = hollow.width;
  const { exposure, white, noise } = light;
  for (let y = 0; y < H; y += 1) {
    const up = y > 0 ? -W : 0, down = y < H - 1 ? W : 0, Y = y / H, grainRow = ((y + light.seed) & 511) * 512;
    const halfRow = (y >> 1) * halfW, qv = Math.min(hollow.height - 1.001, y / 4), qy = qv | 0, qfy = qv - qy;
    for (let x = 0; x < W; x += 1) {
      const k = y * W + x;
      const nx0 = ((z[x > 0 ? k - 1 : k] as number) - (z[x < W - 1 ? k + 1 : k] as number)) * 0.55;
      const ny0 = ((z[k + up] as number) - (z[k + down] as number)) * 0.55;
      const nz = 1 / Math.sqrt(nx0 * nx0 + ny0 * ny0 + 1), nx = nx0 * nz, ny = ny0 * nz;
      // A shadow is read between its half-size pixels, or its edge would show steps.
      const hk = halfRow + (x >> 1), toX = x & 1 && x < W - 2 ? 1 : 0, toY = y & 1 && y < H - 2 ? halfW : 0;
      const open = 1 - ((shadow[hk] as number) + (shadow[hk + toX] as number) + (shadow[hk + toY] as number) + (shadow[hk + toX + toY] as number)) / 4;
      const qu = Math.min(quarterW - 1.001, x / 4), qx = qu | 0, qfx = qu - qx, q = qy * quarterW + qx, held = hollow.values;
      const sky = ((held[q] as number) * (1 - qfx) + (held[q + 1] as number) * qfx) * (1 - qfy) + ((held[q + quarterW] as number) * (1 - qfx) + (held[q + quarterW + 1] as number) * qfx) * qfy;
      const facing = nx * lx + ny * ly + nz * lz;
      // Soap lets light in: its shaded side is never quite dark.
      const direct = (facing > -0.12 ? (facing + 0.12) / 1.12 : 0) * open;
      const X = x / W, fall = 1.14 - 0.3 * X - 0.1 * Y;
      const L = ((0.2 + 0.08 * nz) * sky + direct * 1.34) * fall * (lit[k] as number) * exposure;
      const gloss = shine[k] as number;
      let glint = 0;
      if (gloss > 0.01) {
        let p = nx * sx + ny * sy + nz * sz;
        if (p > 0.6) {
          p *= p; p *= p; p *= p;
          glint = (p * p * p * p * 0.5 + p * p * 0.1) * gloss * open * fall * exposure;
        }
      }
      const jitter = 1 + ((grain[grainRow + ((x + light.seed * 7) & 511)] as number) - 0.5) * noise;
      const o = k * 3;
      out[o] = byteOf(((r[k] as number) * L + glint) * white.r * jitter);
      out[o + 1] = byteOf(((g[k] as number) * L + glint) * white.g * jitter);
      out[o + 2] = byteOf(((b[k] as number) * L + glint) * white.b * jitter);
    }
  }
  return out;
}

/** Share of the lamp's light kept away, at half size, its edges softened. */
function shadows(sheet: Sheet, light: Light): Float32Array {
  const { width: W, height: H, z } = sheet;
  const w = (W + 1) >> 1, h = (H + 1) >> 1;
  const found = new Float32Array(w * h);
  const horizon = new Float32Array(h + w + 2);
  const fallPerStep = light.slope * 2;
  for (let x = 0; x < w; x += 1) {
    const drift = Math.floor(x * light.shear);
    for (let y = 0; y < h; y += 1) {
      const lane = y - drift + w, k = y * w + x;
      const ground = z[Math.min(H - 1, y * 2) * W + Math.min(W - 1, x * 2)] as number;
      const edge = Math.max((horizon[lane] as number) - fallPerStep, 0), over = edge - ground;
      found[k] = over <= 0 ? 0 : over > 5 ? 1 : over / 5;
      horizon[lane] = Math.max(edge, ground);
    }
  }
  return softened(softened(found, w, h), w, h);
}

function softened(from: Float32Array, w: number, h: number): Float32Array {
  const to = new Float32Array(from.length);
  for (let y = 0; y < h; y += 1) {
    const up = y > 0 ? -w : 0, down = y < h - 1 ? w : 0;
    for (let x = 0; x < w; x += 1) {
      const k = y * w + x, left = x > 0 ? -1 : 0, right = x < w - 1 ? 1 : 0;
      to[k] = ((from[k] as number) * 2 + (from[k + left] as number) + (from[k + right] as number) + (from[k + up] as number) + (from[k + down] as number)) / 6;
    }
  }
  return to;
}

/** How much of the room's light reaches each place: less in gaps and at the foot of things; at quarter size. */
function hollows(sheet: Sheet): { values: Float32Array; width: number; height: number } {
  const w = Math.ceil(sheet.width / 4), h = Math.ceil(sheet.height / 4);
  const low = new Float32Array(w * h);
  for (let y = 0; y < h; y += 1) for (let x = 0; x < w; x += 1) low[y * w + x] = sheet.z[Math.min(sheet.height - 1, y * 4 + 1) * sheet.width + Math.min(sheet.width - 1, x * 4 + 1)] as number;
  let wide: Float32Array = low;
  for (let i = 0; i < 5; i += 1) wide = softened(wide, w, h);
  const values = new Float32Array(w * h);
  for (let k = 0; k < values.length; k += 1) values[k] = Math.min(1.12, Math.max(0.3, 1 - ((wide[k] as number) - (low[k] as number)) / (26 * sheet.scale)));
  return { values, width: w, height: h };
}

/** A board of matt grey paint, everywhere nothing else lies. */
export function layBoard(sheet: Sheet, seed: number): void {
  const { cloud, grain, slow } = fields();
  const { width: W, height: H, r, g, b, z } = sheet;
  const dx = (seed * 37) % 511, dy = (seed * 91) % 511;
  for (let y = 0; y < H; y += 1) {
    const grainRow = ((y + dy) & 511) * 512, cloudRow = ((y + dx) & 511) * 512;
    for (let x = 0; x < W; x += 1) {
      const k = y * W + x;
      const tone = 0.262 + ((cloud[cloudRow + ((x + dy) & 511)] as number) - 0.5) * 0.03;
      r[k] = tone; g[k] = tone * 1.003; b[k] = tone * 1.006;
      z[k] = (grain[grainRow + ((x + dx) & 511)] as number) * 0.55 + (cloud[grainRow + ((x * 2 + dy) & 511)] as number) * 0.5;
    }
  }
  // A few old knife marks: boards are used.
  for (let x = 0; x < W; x += 1) {
    const y = Math.round(H * 0.93 + at(slow, x * 0.2 + seed, seed) * 12 - x * 0.03);
    if (y > 1 && y < H && x > W * 0.46 && x < W * 0.62) z[y * W + x] = (z[y * W + x] as number) - 0.5;
  }
}
