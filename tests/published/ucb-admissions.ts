import type { TwoByTwo } from '#analysis/tables/two-by-two.ts';

const department = (menIn: number, menOut: number, womenIn: number, womenOut: number): TwoByTwo =>
  ({ exposedFound: menIn, exposedClear: menOut, unexposedFound: womenIn, unexposedClear: womenOut });

/**
 * Admissions to Berkeley by department A to F: men are the exposed, admitted the found.
 *
 * Source: P. Bickel, E. Hammel and J. O'Connell, Science 187 (1975) 398–404; results recomputed with R mantelhaen.test.
 */
export const ucbAdmissions: readonly TwoByTwo[] = [
  department(512, 313, 89, 19), department(353, 207, 17, 8), department(120, 205, 202, 391),
  department(138, 279, 131, 244), department(53, 138, 94, 299), department(22, 351, 24, 317),
];
