import { randomOf } from '../random.ts';
import { nearness, shadows } from './lamp.ts';
import type { Light } from './light.ts';
import type { Raster } from './raster.ts';

/** Direction to the lamp: low, from the left and a little from behind. */
const lampX = -0.83;
const lampY = -0.26;
const lampZ = 0.494;
const half = Math.hypot(lampX, lampY, lampZ + 1);
const halfX = lampX / half;
const halfY = lampY / half;
const halfZ = (lampZ + 1) / half;

const curveSteps = 4096;
/** Camera curve and sRGB encoding in one table; inputs 0..2, shoulder above 0.75. */
const curve = Uint8ClampedArray.from({ length: curveSteps + 1 }, (_, i) => {
  const v = (i / curveSteps) * 2;
  const rolled = v < 0.7 ? v : 0.7 + 0.3 * (1 - Math.exp(-(v - 0.7) / 0.3));
  return 255 * (rolled <= 0.0031308 ? 12.92 * rolled : 1.055 * rolled ** (1 / 2.4) - 0.055);
});

/** Noise of the camera's sensor, as factors of the light. */
const sensor = Float32Array.from({ length: 0x10000 }, ((random) => () => 1 + (random.unit() + random.unit() - 1) * 0.016)(randomOf(1, 'sensor')));

/** Lights a scene with one lamp and the room, as the camera would record it: 8-bit sRGB, three bytes a pixel. */
export function shade(raster: Raster, light: Light): Buffer {
  const { width, height, z, red, green, blue, gloss, owner } = raster;
  const dark = shadows(raster);
  const near = nearness(raster);
  const pixels = Buffer.allocUnsafe(width * height * 3);
  const toCurve = curveSteps / 2;
  for (let y = 0; y < height; y += 1) {
    const up = y > 0 ? width : 0;
    const down = y < height - 1 ? width : 0;
    const gy = Math.min((y - 3.5) / 8, Math.ceil(height / 8) - 2);
    const by = Math.max(0, Math.floor(gy));
    const fy = Math.max(0, gy - by);
    for (let x = 0; x < width; x += 1) {
      const k = y * width + x;
      const here = z[k] as number;
      const nxRaw = ((z[x > 0 ? k - 1 : k] as number) - (z[x < width - 1 ? k + 1 : k] as number)) * 0.5;
      const nyRaw = ((z[k - up] as number) - (z[k + down] as number)) * 0.5;
      const nz = 1 / Math.sqrt(nxRaw * nxRaw + nyRaw * nyRaw + 1);
      const nx = nxRaw * nz;
      const ny = nyRaw * nz;
      const isSoap = (owner[k] as number) > 0;
      const open = 1 - (dark[k] as number);
      const wrap = isSoap ? 0.16 : 0;
      const lambert = (nx * lampX + ny * lampY + nz * lampZ + wrap) / (1 + wrap);
      const direct = lambert > 0 ? lambert * open : 0;
      const gx = Math.min((x - 3.5) / 8, near.across - 2);
      const bx = Math.max(0, Math.floor(gx));
      const fx = Math.max(0, gx - bx);
      const b = by * near.across + bx;
      const row0 = (near.at[b] as number) * (1 - fx) + (near.at[b + 1] as number) * fx;
      const row1 = (near.at[b + near.across] as number) * (1 - fx) + (near.at[b + near.across + 1] as number) * fx;
      const walls = row0 + (row1 - row0) * fy - here;
      const sky = walls > 0 ? 1 / (1 + walls * 0.045) : 1;
      const room = (0.22 + 0.1 * nz + 0.05 * ny) * sky;
      const across = x / width;
      const downwards = y / height;
      const fall = 1.2 - 0.36 * across - 0.1 * downwards;
      const mirror = nx * halfX + ny * halfY + nz * halfZ;
      const shiny = gloss[k] as number;
      let glint = 0;
      if (shiny > 0.01 && mirror > 0.8) {
        const m2 = mirror * mirror;
        const m8 = m2 * m2 * m2 * m2;
        const m32 = m8 * m8 * m8 * m8;
        glint = (m8 * 0.045 + m32 * 0.32 + m32 * m32 * 0.35 * shiny) * shiny * open * fall;
      }
      const grainy = sensor[(Math.imul(k, 0x9e3779b1) >>> 15) & 0xffff] as number;
      const strength = light.exposure * grainy * toCurve;
      const lamp = direct * 1.34 * fall;
      const glow = isSoap ? 0.035 * (1 - open) : 0;
      pixels[k * 3] = curve[Math.min(curveSteps, ((red[k] as number) * (lamp * light.lamp[0] + (room + glow) * light.room[0]) + glint * light.lamp[0]) * strength) | 0] as number;
      pixels[k * 3 + 1] = curve[Math.min(curveSteps, ((green[k] as number) * (lamp * light.lamp[1] + (room + glow) * light.room[1]) + glint * light.lamp[1]) * strength) | 0] as number;
      pixels[k * 3 + 2] = curve[Math.min(curveSteps, ((blue[k] as number) * (lamp * light.lamp[2] + room * light.room[2]) + glint * light.lamp[2]) * strength) | 0] as number;
    }
  }
  return pixels;
}
