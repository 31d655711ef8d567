/**
 * The one door to the distribution functions of the kept packages. Nothing else
 * imports them, so that a package can be changed in one place.
 */
import chisquareCdf from '@stdlib/stats-base-dists-chisquare-cdf';
import gammaCdf from '@stdlib/stats-base-dists-gamma-cdf';
import gammaQuantile from '@stdlib/stats-base-dists-gamma-quantile';
import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';

/** Two-sided 95 % point of the standard normal. */
export const Z95 = 1.959963984540054;

/** 95 % point of chi-square with one degree of freedom: Z95 squared. */
export const CHI2_95 = Z95 * Z95;

/** P(Z > z) of the standard normal, exact far into the tail (taken from the lower tail, which does not round to 0). */
export function normalUpper(z: number): number {
  return normalCdf(-z, 0, 1);
}

/** The z with P(Z ≤ z) = p. */
export function normalPoint(p: number): number {
  return normalQuantile(p, 0, 1);
}

/**
 * P(X > x) of chi-square.
 *
 * With one degree of freedom it comes from the normal's lower tail, which stays
 * exact where 1 − P(X ≤ x) would have rounded to 0 (beyond about x = 70).
 */
export function chisquareUpper(x: number, df: number): number {
  if (x <= 0) return 1;
  return df === 1 ? 2 * normalCdf(-Math.sqrt(x), 0, 1) : 1 - chisquareCdf(x, df);
}

/** P(X > x) of a gamma distribution with this shape and rate. */
export function gammaUpper(x: number, shape: number, rate: number): number {
  return 1 - gammaCdf(x, shape, rate);
}

/** The x with P(X ≤ x) = p of a gamma distribution with this shape and rate. */
export function gammaPoint(p: number, shape: number, rate: number): number {
  return gammaQuantile(p, shape, rate);
}
