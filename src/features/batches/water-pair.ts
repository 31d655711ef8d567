import { useState } from 'react';
import { concentrationOfRatio, ratioOfConcentration } from '#analysis/lye/water.ts';

export interface WaterPair {
  ratio: number | null;
  concentration: number | null;
  setRatio: (ratio: number | null) => void;
  setConcentration: (concentration: number | null) => void;
}

/**
 * Water to lye and lye concentration, two views of one number. The ratio is what is kept; a concentration
 * stays as it was typed while it is the one that set the ratio.
 */
export function useWaterPair(ratio: number | null, onRatio: (ratio: number | null) => void): WaterPair {
  const [typed, setTyped] = useState<{ concentration: number | null; gave: number | null } | null>(null);
  const follows = ratio !== null && ratio > 0 ? concentrationOfRatio(ratio) : null;
  return {
    ratio,
    concentration: typed !== null && Object.is(typed.gave, ratio) ? typed.concentration : follows,
    setRatio: (next) => {
      setTyped(null);
      onRatio(next);
    },
    setConcentration: (concentration) => {
      const gave = ratioFor(concentration);
      setTyped({ concentration, gave });
      onRatio(gave);
    },
  };
}

/** NaN for a concentration that no lye can have, so that the schema refuses it. */
function ratioFor(concentration: number | null): number | null {
  if (concentration === null) return null;
  return concentration > 0 && concentration < 1 ? ratioOfConcentration(concentration) : Number.NaN;
}
