/** Linear light, 0..1 each. */
export interface Tint { r: number; g: number; b: number }

/** @param hex `#rrggbb`, as screens write it (sRGB). */
export function tint(hex: string): Tint {
  const [r, g, b] = [1, 3, 5].map((from) => linear(Number.parseInt(hex.slice(from, from + 2), 16) / 255)) as [number, number, number];
  return { r, g, b };
}

export function blend(from: Tint, to: Tint, share: number): Tint {
  return { r: from.r + (to.r - from.r) * share, g: from.g + (to.g - from.g) * share, b: from.b + (to.b - from.b) * share };
}

export function scaled(colour: Tint, by: number): Tint {
  return { r: colour.r * by, g: colour.g * by, b: colour.b * by };
}

function linear(v: number): number {
  return v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4;
}

const STEPS = 4096;
/** sRGB byte of a linear value in 0..1, by steps of 1/4095. */
const bytes = Uint8Array.from({ length: STEPS }, (_, i) => {
  const v = i / (STEPS - 1);
  return Math.round(255 * (v <= 0.0031308 ? 12.92 * v : 1.055 * v ** (1 / 2.4) - 0.055));
});

export function byteOf(v: number): number {
  return bytes[v <= 0 ? 0 : v >= 1 ? STEPS - 1 : (v * (STEPS - 1)) | 0] as number;
}
