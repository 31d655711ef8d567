/**
 * Endometrial cancer study: histology grade by neovascularisation (NV), pulsatility
 * index (PI) and endometrium height (EH), 79 patients.
 *
 * Source: G. Heinze and M. Schemper, Stat. Med. 21 (2002) 2409–2419 (data of E. Asseryanis, Vienna).
 */
const times = (value: number, count: number): number[] => new Array<number>(count).fill(value);

export const NV: readonly number[] = [
  ...times(0, 21), ...times(1, 5), ...times(0, 21), ...times(1, 4), ...times(0, 19), 1, 0, 0, 0, 1, 1, 0, 1, 0,
];

export const PI: readonly number[] = [
  13, 16, 8, 34, 20, 5, 17, 10, 26, 17, 8, 7, 20, 10, 18, 16, 18, 8, 29, 12, 20, 38, 22, 7, 25, 15, 7, 28, 11, 19, 10, 10, 18, 14,
  21, 11, 17, 25, 16, 19, 15, 33, 24, 48, 12, 19, 2, 22, 40, 5, 0, 21, 15, 29, 15, 12, 3, 20, 23, 12, 22, 42, 15, 13, 14, 19, 12,
  13, 10, 12, 49, 6, 5, 17, 11, 21, 5, 19, 33,
];

export const EH: readonly number[] = [
  1.64, 2.26, 3.14, 2.68, 1.28, 2.31, 1.8, 1.68, 1.56, 2.31, 2.01, 1.89, 3.15, 1.23, 1.27, 1.76, 2, 2.64, 0.88, 1.27, 1.37, 0.97,
  1.14, 0.88, 0.91, 0.58, 0.97, 1.5, 1.33, 2.37, 1.82, 3.13, 1.31, 1.92, 1.64, 2.01, 1.88, 1.93, 2.11, 1.29, 1.72, 0.75, 1.92,
  1.84, 1.11, 1.61, 1.18, 1.44, 1.18, 0.93, 1.17, 1.19, 1.06, 2.02, 2.29, 2.33, 2.9, 1.7, 1.41, 2.25, 1.54, 1.97, 1.75, 2.16,
  2.57, 1.37, 3.61, 2.04, 2.17, 1.69, 0.27, 1.84, 1.3, 0.96, 1.01, 0.98, 0.35, 1.02, 0.85,
];

export const HG: readonly number[] = [
  ...times(0, 17), ...times(1, 10), ...times(0, 16), ...times(1, 10), ...times(0, 16), ...times(1, 10),
];
