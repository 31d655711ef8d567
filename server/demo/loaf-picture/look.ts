import { familyOf } from '#shared/words/methods.ts';
import { type Character, characterOf } from './character.ts';
import { blend, scaled, type Tint, tint } from './colour.ts';
import type { LoafPictureSpec } from './spec.ts';

/** How the soap of one batch looks on the day of the picture. */
export interface Look {
  character: Character;
  base: Tint;
  second: Tint;
  third: Tint;
  /** 0 matt to 1 wet. */
  shine: number;
  /** Unevenness of a cooked soap: 0 none to 1 rustic. */
  rustic: number;
  /** Grains in the body: colour, size in mm, share of places that hold one. */
  specks: readonly { colour: Tint; sizeMm: number; share: number; raised: number }[];
}

export function lookOf(spec: LoafPictureSpec): Look {
  const isHot = familyOf(spec.method) === 'hot', isSalt = spec.formula === 'salt', isRebatch = spec.method === 'rebatch';
  const gelled = spec.gel === 'full' ? 1 : 0;
  // Gel turns soap darker and deeper; a cooked soap is paler than its gel would make it, and matt.
  const deepen = (colour: Tint) => {
    const grey = (colour.r + colour.g + colour.b) / 3, depth = 1 + 0.12 * gelled;
    const deeper = { r: grey + (colour.r - grey) * depth, g: grey + (colour.g - grey) * depth, b: grey + (colour.b - grey) * depth };
    return scaled(deeper, 1 - 0.1 * gelled);
  };
  const { palette } = spec;
  const base = deepen(tint(palette.base)), second = deepen(tint(palette.second)), third = deepen(tint(palette.third));
  const isWorked = !isSalt && spec.formula !== 'hotel' && palette.design !== 'plain' && palette.design !== 'specks';
  return {
    character: characterOf(spec.batchCode, isWorked && !isRebatch), base, second, third,
    shine: (isHot || isRebatch ? 0.05 : 0.13) + 0.16 * gelled * (isHot ? 0.3 : 1) - (isSalt ? 0.06 : 0),
    rustic: isRebatch ? 1 : spec.method === 'hot' ? 0.8 : isHot ? 0.35 : 0,
    specks: specksOf(spec, base, second),
  };
}

function specksOf(spec: LoafPictureSpec, base: Tint, second: Tint): Look['specks'] {
  if (spec.formula === 'salt') {
    return [
      { colour: blend(base, tint('#ffffff'), 0.55), sizeMm: 0.85, share: 0.8, raised: 0.5 },
      { colour: blend(base, tint('#8d9696'), 0.5), sizeMm: 0.7, share: 0.5, raised: -0.4 },
    ];
  }
  if (spec.formula === 'milk-and-oat') {
    return [
      { colour: tint('#8a6636'), sizeMm: 0.75, share: 0.4, raised: 0.1 },
      { colour: blend(base, tint('#fff6e0'), 0.6), sizeMm: 1.1, share: 0.35, raised: 0.2 },
    ];
  }
  if (spec.palette.design !== 'specks') return [];
  return [{ colour: second, sizeMm: 0.75, share: 0.6, raised: 0 }, { colour: scaled(second, 0.45), sizeMm: 0.5, share: 0.4, raised: 0 }];
}
