import { randomOf } from '../random.ts';
import type { Light } from './lamp.ts';
import type { LoafPictureSpec } from './spec.ts';

/**
 * The light of a picture by its month and hour: a low warm lamp in winter, the cool window in summer,
 * and a camera that corrects about half of it. Colours without a card therefore really mislead.
 */
export function lightOf(spec: LoafPictureSpec): Light {
  const r = randomOf(7, 'light', spec.batchCode, spec.takenAt, spec.seed);
  const month = Number(spec.takenAt.slice(5, 7)), hour = Number(spec.takenAt.slice(11, 13));
  const winter = Math.cos(((month - 1) / 12) * 2 * Math.PI);
  const evening = hour >= 17 || hour < 8 ? 0.6 : 0;
  const warmth = 0.045 * winter + 0.05 * evening + r.normal(0, 0.018);
  return {
    slope: (0.5 - 0.1 * winter) * (1 + r.normal(0, 0.06)), shear: 0.3 + r.normal(0, 0.03), exposure: 0.93 - 0.06 * winter + r.normal(0, 0.03),
    white: { r: 1 + warmth, g: 1 + r.normal(0, 0.006), b: 1 - warmth * 1.25 }, noise: 0.035 + 0.02 * Math.max(0, winter), seed: r.whole(0, 511),
  };
}
