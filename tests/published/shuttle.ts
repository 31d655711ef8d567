/**
 * Space shuttle flights before January 1986: temperature at launch (°F) and whether a
 * primary O-ring showed thermal distress.
 *
 * Source: S. R. Dalal, E. B. Fowlkes and B. Hoadley, J. Am. Stat. Assoc. 84 (1989) 945–957.
 */
export const temperatureF: readonly number[] = [66, 70, 69, 68, 67, 72, 73, 70, 57, 63, 70, 78, 67, 53, 67, 75, 70, 81, 76, 79, 75, 76, 58];
export const distress: readonly number[] = [0, 1, 0, 0, 0, 0, 0, 0, 1, 1, 1, 0, 0, 1, 0, 0, 0, 0, 0, 0, 1, 0, 1];
