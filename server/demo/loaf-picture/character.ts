import { randomOf } from '../random.ts';

/** What makes a batch recognisable in each of its pictures; its code alone decides it. */
export interface Character {
  /** Where this batch reads the fields of chance. */
  ox: number;
  oy: number;
  /** How its colours were poured. */
  swirl: 'hanger' | 'comb' | 'pot';
  /** How its top was worked. */
  top: 'waves' | 'peaks' | 'combed' | 'smooth';
  /** How much of the second colour there is: −1 little to 1 much. */
  plenty: number;
  turns: number;
  wavelengthMm: number;
  depthMm: number;
  lean: number;
  /** Edges of the layers, from the top, in 0..1. */
  layers: readonly [number, number];
  hasLine: boolean;
}

export function characterOf(batchCode: string, isWorked: boolean): Character {
  const r = randomOf(7, 'character', batchCode);
  return {
    ox: r.between(0, 512), oy: r.between(0, 512),
    swirl: r.weighted([['hanger', 5], ['comb', 3], ['pot', 4]] as const),
    top: isWorked ? r.weighted([['waves', 5], ['peaks', 4], ['combed', 3]] as const) : r.weighted([['smooth', 3], ['waves', 2], ['peaks', 1]] as const),
    plenty: r.between(-1, 1), turns: r.between(1.6, 3.2), wavelengthMm: r.between(46, 90), depthMm: r.between(3.2, 5.2), lean: r.between(-1, 1),
    layers: [r.between(0.24, 0.42), r.between(0.56, 0.76)], hasLine: r.chance(0.5),
  };
}
