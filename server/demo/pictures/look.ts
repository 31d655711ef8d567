import type { Design } from '#shared/words/batch-words.ts';
import { type Random, randomOf } from '../random.ts';
import { type Noise, noiseOf } from './noise.ts';
import { type Colour, linear, mix } from './raster.ts';
import type { PictureWish } from './picture-wish.ts';

/** What makes a batch recognisable in each of its pictures: decided by its code alone, whatever the stage. */
export interface Look {
  base: Colour;
  second: Colour;
  third: Colour;
  design: Design;
  /** Cooked soap: rough and matt. */
  isRough: boolean;
  gloss: number;
  noise: Noise;
  otherNoise: Noise;
  /** Strokes of the comb over the top: their width in pixels and how wildly they were drawn. */
  strokeWidth: number;
  strokeWildness: number;
  /** How stretched the swirl is along the face, 0.5 to 1.6. */
  stretch: number;
  swirlShare: number;
}

const black: Colour = [0, 0, 0];

export function lookOf(wish: PictureWish): Look {
  const random = randomOf(7, 'look', wish.code);
  const isRough = wish.method === 'hot' || wish.method === 'rebatch';
  const isGelled = wish.gel === 'full';
  const settle = (hex: string): Colour => {
    const colour = linear(hex);
    if (isRough) return mix(colour, [0.42, 0.33, 0.2], 0.16);
    return isGelled ? deepened(colour) : colour;
  };
  const { base, second, third, design } = wish.palette;
  return {
    base: settle(base), second: settle(second), third: settle(third), design, isRough,
    gloss: isRough ? 0.04 : isGelled ? 0.34 : 0.13,
    noise: noiseOf(7, wish.code), otherNoise: noiseOf(8, wish.code),
    strokeWidth: random.between(46, 88), strokeWildness: random.between(0.5, 1.5),
    stretch: random.between(0.6, 1.5), swirlShare: random.between(0.34, 0.58),
  };
}

/** Draws of one picture; two pictures of the same batch lie differently on the board. */
export function layoutRandom(wish: PictureWish): Random {
  return randomOf(7, 'layout', wish.code, wish.stage);
}

/** Soap that gelled is darker and purer in colour. */
function deepened([red, green, blue]: Colour): Colour {
  const grey = 0.21 * red + 0.72 * green + 0.07 * blue;
  const purer = (v: number) => Math.max(0, grey + (v - grey) * 1.04) * 0.84;
  return mix([purer(red), purer(green), purer(blue)], black, 0.02);
}
