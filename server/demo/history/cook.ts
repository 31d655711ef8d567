import type { CookStage } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';
import { type Random, within } from '../random.ts';
import type { BatchInputs } from './types.ts';

type Cook = Pick<BatchInputs, 'cookTemperatureC' | 'cookMinutes' | 'cookLossFraction' | 'cookStages'>;

/** The looks a mass passes through, and the share of the cook after which each is usually noted. */
const looks: readonly (readonly [CookStage, number])[] = [
  ['trace', 0.05], ['separating', 0.22], ['apple-sauce', 0.4], ['mashed-potato', 0.62], ['translucent', 0.88],
];

/** How a hot batch was cooked; nothing for cold ones. */
export function cookOf(r: Random, method: Method): Cook {
  const minutes = Math.round(within(r.normal(method === 'hot-fluid' ? 95 : method === 'rebatch' ? 60 : 76, 15), 35, 170));
  const temperature = Number(within(r.normal(86, 3.2), 76, 95).toFixed(0));
  const loss = Number(within(r.normal(0.055, 0.01), 0.03, 0.085).toFixed(3));
  const noted = looks.filter(([, share]) => share > 0.5 || r.chance(0.75));
  if (method === 'cold' || method === 'cold-oven') return { cookTemperatureC: null, cookMinutes: null, cookLossFraction: null, cookStages: [] };
  return {
    cookTemperatureC: temperature, cookMinutes: minutes, cookLossFraction: loss,
    cookStages: method === 'rebatch' ? [] : noted.map(([stage, share]) => ({ stage, minutesFromStart: Math.round(minutes * share) })),
  };
}
