import { z } from 'zod';

export const ANSWERS = ['found', 'clear', 'not-checked'] as const;
export const Answer = z.enum(ANSWERS, { error: `Answer must be one of ${ANSWERS.join(', ')}` });
export type Answer = z.infer<typeof Answer>;

/** 1 sells as a first, 2 is a second, 3 does not sell as this product. */
export const Severity = z.int().min(1, 'Severity is 1, 2 or 3').max(3, 'Severity is 1, 2 or 3');
export type Severity = z.infer<typeof Severity>;

/** A fault's slug, as in the catalogue. */
export const FaultSlug = z.string().min(1).max(60).regex(/^[a-z][a-z\d-]*$/, 'Fault must be a slug such as soda-ash');
export type FaultSlug = z.infer<typeof FaultSlug>;
