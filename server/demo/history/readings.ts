import { familyOf } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import { type Random, within } from '../random.ts';
import type { BatchInputs, HistoryReading } from './types.ts';

/** Share of the fresh mass that is gone by a cure check; more water, more loss. */
const dried: Readonly<Partial<Record<Stage, number>>> = { 'cure-w1': 0.45, 'cure-w2': 0.68, 'cure-w4': 0.9, 'cure-w6': 1 };

/** Mass of two marked bars, room and humidity at cure checks; a pH strip at the cut of some and at every release. */
export function readingsAt(r: Random, stage: Stage, inputs: BatchInputs): HistoryReading[] {
  const gone = dried[stage];
  const poured = inputs.ingredients.reduce((sum, line) => sum + line.massG, 0) * 0.98;
  const fresh = poured / inputs.bars;
  if (gone !== undefined) {
    const whole = (familyOf(inputs.method) === 'cold' ? 0.1 : 0.07) + 0.02 * (inputs.waterToLye - 2);
    const bar = (n: number): HistoryReading => ({ kind: 'bar-mass-g', bar: n, value: Number((fresh * (1 - whole * gone) * (1 + r.normal(0, 0.012))).toFixed(1)) });
    return [
      bar(2), bar(Math.round(inputs.bars / 2)),
      { kind: 'room-temperature-c', value: Number((inputs.roomTemperatureC + r.normal(0, 1.5)).toFixed(1)) },
      { kind: 'humidity-fraction', value: Number(within(inputs.humidityFraction + r.normal(0, 0.05), 0.25, 0.9).toFixed(2)) },
    ];
  }
  if (stage === 'release' || (stage === 'cut' && r.chance(0.3))) {
    return [{ kind: 'ph', value: Number((stage === 'release' ? r.normal(9.7, 0.2) : r.normal(10.3, 0.2)).toFixed(1)) }];
  }
  return [];
}
