import { z } from 'zod';
import { count, id, instant, optionalDay, optionalMeasure, optionalText } from './http/fields.ts';
import { CookStage, Cover, Gel, Palette, Trace } from './words/batch-words.ts';

/** One thing that went in. A lot says which delivery; mass and share of the oils may both be known. */
export const IngredientWish = z.strictObject({
  id,
  materialId: z.uuid({ error: 'Choose the material' }),
  lotId: z.uuid().nullable().default(null),
  massG: optionalMeasure('Mass', 0, 500_000, 'g'),
  shareOfOilsFraction: optionalMeasure('Share of the oils', 0, 2),
});
export type IngredientWish = z.infer<typeof IngredientWish>;

export const CookStageWish = z.strictObject({ stage: CookStage, minutesFromStart: z.number().min(0).max(720, 'Minutes must lie between 0 and 720') });
export type CookStageWish = z.infer<typeof CookStageWish>;

/**
 * What can be known of a making. The limits are the hard ones: outside them the number is a slip
 * or the thing cannot work. Softer limits warn and let pass (`shared/batch-warnings.ts`).
 */
export const batchFields = {
  pouredAt: instant.nullable().default(null),
  formulaId: z.uuid().nullable().default(null),
  formulaVersionId: z.uuid().nullable().default(null),
  makerId: z.uuid().nullable().default(null),
  mouldId: z.uuid().nullable().default(null),
  bars: count('Bars', 1, 2000).nullable().default(null),
  oilMassG: z.number({ error: 'Oil mass must be a number' }).gt(0, 'Oil mass must be above 0 g').max(500_000, 'Oil mass must be at most 500 000 g').nullable().default(null),
  /** Water : lye by mass as weighed; concentration is 1 / (1 + ratio). */
  waterToLye: optionalMeasure('Water to lye', 1, 5.7),
  superfatFraction: optionalMeasure('Superfat', -0.02, 0.3),
  oilTemperatureC: optionalMeasure('Oil temperature', 5, 120, '°C'),
  lyeTemperatureC: optionalMeasure('Lye temperature', 5, 120, '°C'),
  batterTemperatureC: optionalMeasure('Batter temperature', 5, 120, '°C'),
  scentTemperatureC: optionalMeasure('Temperature when the scent went in', 5, 120, '°C'),
  roomTemperatureC: optionalMeasure('Room temperature', -5, 50, '°C'),
  humidityFraction: optionalMeasure('Humidity', 0.01, 1),
  blendSeconds: count('Blend time in seconds', 0, 3600).nullable().default(null),
  traceAtScent: Trace.nullable().default(null),
  traceAtPour: Trace.nullable().default(null),
  minutesToPour: optionalMeasure('Minutes from trace to pour', 0, 720, 'min'),
  cover: Cover.nullable().default(null),
  isSprayed: z.boolean().nullable().default(null),
  gel: Gel.nullable().default(null),
  cookTemperatureC: optionalMeasure('Cook temperature', 40, 130, '°C'),
  cookMinutes: optionalMeasure('Cook time', 5, 720, 'min'),
  cookLossFraction: optionalMeasure('Cook loss', 0, 0.4),
  mouldHours: optionalMeasure('Hours in the mould', 0.5, 336, 'h'),
  cutHours: optionalMeasure('Hours from pour to cut', 0.5, 720, 'h'),
  unmouldedOn: optionalDay('Unmoulded on'),
  cutOn: optionalDay('Cut on'),
  palette: Palette.nullable().default(null),
  hasEmbeds: z.boolean().default(false),
  note: optionalText('Note', 4000),
  ingredients: z.array(IngredientWish).max(60, 'At most 60 ingredients').default([]),
  cookStages: z.array(CookStageWish).max(20, 'At most 20 cook stages').default([]),
};
