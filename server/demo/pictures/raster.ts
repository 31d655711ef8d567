/** Size of every picture before it may be turned, in pixels. */
export const pictureWidth = 1080;
export const pictureHeight = 720;

/** A scene before any light falls on it: per pixel a height (in pixels), a colour (linear light, 0..1) and how it shines. */
export interface Raster {
  width: number;
  height: number;
  z: Float32Array;
  red: Float32Array;
  green: Float32Array;
  blue: Float32Array;
  /** Strength of the lamp's mirror image, 0 matt to 1 wet. */
  gloss: Float32Array;
  /** Number of the body seen at a pixel, counted from 1; 0 is the board. */
  owner: Uint8Array;
}

export type Colour = readonly [red: number, green: number, blue: number];

export function emptyRaster(width: number, height: number): Raster {
  const plane = () => new Float32Array(width * height);
  return { width, height, z: plane(), red: plane(), green: plane(), blue: plane(), gloss: plane(), owner: new Uint8Array(width * height) };
}

/** Linear light of `#rrggbb` (sRGB, IEC 61966-2-1). */
export function linear(hex: string): Colour {
  const channel = (at: number) => {
    const v = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

export function mix(a: Colour, b: Colour, share: number): Colour {
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share, a[2] + (b[2] - a[2]) * share];
}

/** Lays a colour over a pixel. */
export function tint(raster: Raster, k: number, colour: Colour, share: number): void {
  raster.red[k] = (raster.red[k] as number) * (1 - share) + colour[0] * share;
  raster.green[k] = (raster.green[k] as number) * (1 - share) + colour[1] * share;
  raster.blue[k] = (raster.blue[k] as number) * (1 - share) + colour[2] * share;
}

/** Multiplies a pixel's colour, as a stain that lets the ground through does. */
export function stain(raster: Raster, k: number, filter: Colour, share: number): void {
  raster.red[k] = (raster.red[k] as number) * (1 + (filter[0] - 1) * share);
  raster.green[k] = (raster.green[k] as number) * (1 + (filter[1] - 1) * share);
  raster.blue[k] = (raster.blue[k] as number) * (1 + (filter[2] - 1) * share);
}

export function raise(raster: Raster, k: number, by: number): void {
  raster.z[k] = (raster.z[k] as number) + by;
}

/** Moves a pixel's gloss towards a value. */
export function shine(raster: Raster, k: number, towards: number, share: number): void {
  raster.gloss[k] = (raster.gloss[k] as number) * (1 - share) + towards * share;
}

/** 0 below `from`, 1 above `to`, smooth between; the edges may be given downwards. */
export function smooth(from: number, to: number, x: number): number {
  const t = Math.min(1, Math.max(0, (x - from) / (to - from)));
  return t * t * (3 - 2 * t);
}
