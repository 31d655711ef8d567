import type { Random } from '../random.ts';
import type { Colour } from './raster.ts';

/** The room a picture is taken in. */
export interface Light {
  /** Colour of the lamp as the camera renders it; 1, 1, 1 is neutral. */
  lamp: Colour;
  /** Colour of the rest of the room. */
  room: Colour;
  exposure: number;
}

/**
 * Light by month: a warm lamp carries dark winter afternoons, a bluish window the summer.
 * Without a grey card such a picture misleads about colour by several ΔE.
 *
 * @param month 1..12
 */
export function lightOf(month: number, random: Random): Light {
  const winter = (1 + Math.cos(((month - 0.5) / 12) * 2 * Math.PI)) / 2;
  const warm = (winter - 0.45) * 0.11 + random.normal(0, 0.014);
  const green = random.normal(0, 0.008);
  return {
    lamp: [1 + warm, 1 + green, 1 - warm * 1.25],
    room: [1 + warm * 0.35 - 0.02, 1 + green, 1.02 - warm * 0.3],
    exposure: 0.95 - 0.1 * winter + random.normal(0, 0.035),
  };
}
