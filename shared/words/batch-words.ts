import { z } from 'zod';

export const BATCH_STATES = ['planned', 'making', 'in-mould', 'curing', 'cured', 'closed', 'abandoned'] as const;
export const BatchState = z.enum(BATCH_STATES, { error: `State must be one of ${BATCH_STATES.join(', ')}` });
export type BatchState = z.infer<typeof BatchState>;

export const TRACES = ['emulsion', 'light', 'medium', 'thick', 'seized'] as const;
export const Trace = z.enum(TRACES, { error: `Trace must be one of ${TRACES.join(', ')}` });
export type Trace = z.infer<typeof Trace>;

export const GELS = ['none', 'partial', 'full', 'not-seen'] as const;
export const Gel = z.enum(GELS, { error: `Gel must be one of ${GELS.join(', ')}` });
export type Gel = z.infer<typeof Gel>;

export const COVERS = ['open', 'board', 'board-and-towel', 'oven', 'fridge', 'heat-mat'] as const;
export const Cover = z.enum(COVERS, { error: `Cover must be one of ${COVERS.join(', ')}` });
export type Cover = z.infer<typeof Cover>;

export const COOK_STAGES = ['trace', 'separating', 'apple-sauce', 'mashed-potato', 'translucent', 'taffy'] as const;
export const CookStage = z.enum(COOK_STAGES, { error: `Cook stage must be one of ${COOK_STAGES.join(', ')}` });
export type CookStage = z.infer<typeof CookStage>;

export const DISPOSITIONS = ['firsts', 'seconds', 'rebatch', 'embeds', 'discarded', 'kept'] as const;
export const DispositionKind = z.enum(DISPOSITIONS);
export type DispositionKind = z.infer<typeof DispositionKind>;

export const DESIGNS = ['plain', 'layers', 'swirl', 'specks'] as const;
export const Design = z.enum(DESIGNS);
export type Design = z.infer<typeof Design>;

/** The colours a batch's cut face is drawn with, as `#rrggbb`. */
export const Palette = z.strictObject({
  base: z.string().regex(/^#[\da-f]{6}$/),
  second: z.string().regex(/^#[\da-f]{6}$/),
  third: z.string().regex(/^#[\da-f]{6}$/),
  design: Design,
});
export type Palette = z.infer<typeof Palette>;
