/** Grams in an avoirdupois ounce; exact by definition (international yard and pound agreement, 1959). */
export const GRAMS_PER_OUNCE = 28.349523125;

export function gramsFromOunces(ounces: number): number {
  return ounces * GRAMS_PER_OUNCE;
}

export function ouncesFromGrams(grams: number): number {
  return grams / GRAMS_PER_OUNCE;
}
