import { z } from 'zod';

/** Stages at which somebody looks at a batch, in the order they come; `cure` carries its week. */
export const STAGES = ['pour', 'unmould', 'cut', 'cure-w1', 'cure-w2', 'cure-w4', 'cure-w6', 'release', 'in-use'] as const;
export const Stage = z.enum(STAGES, { error: `Stage must be one of ${STAGES.join(', ')}` });
export type Stage = z.infer<typeof Stage>;

/** Position of a stage in the life of a batch: 0 for the pour. */
export function stageOrder(stage: Stage): number {
  return STAGES.indexOf(stage);
}

/** A stage inside a sentence: "cannot be seen yet at the cut". */
export const STAGE_IN_WORDS: Readonly<Record<Stage, string>> = {
  pour: 'the pour',
  unmould: 'unmoulding',
  cut: 'the cut',
  'cure-w1': 'week 1',
  'cure-w2': 'week 2',
  'cure-w4': 'week 4',
  'cure-w6': 'week 6',
  release: 'release',
  'in-use': 'a complaint',
};
