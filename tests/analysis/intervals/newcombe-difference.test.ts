import { describe, expect, it } from 'vitest';
import { newcombeDifference } from '#analysis/intervals/newcombe-difference.ts';

describe('newcombeDifference', () => {
  // R. G. Newcombe, Stat. Med. 17 (1998) 873–890, method 10. Five decimals: as printed.
  it.each([
    [56, 70, 48, 80, 0.05243, 0.33387], [9, 10, 3, 10, 0.17052, 0.80902], [6, 7, 2, 7, 0.05823, 0.80625],
    [5, 56, 0, 29, -0.03814, 0.19256], [0, 10, 0, 20, -0.16113, 0.27753], [10, 10, 0, 20, 0.67909, 1],
  ])('agrees with the published bounds for %i/%i against %i/%i', (a, m, b, n, lower, upper) => {
    const interval = newcombeDifference(a, m, b, n);
    expect(interval.lower).toBeCloseTo(lower, 5);
    expect(interval.upper).toBeCloseTo(upper, 5);
  });

  it('turns round when the groups swap places', () => {
    const one = newcombeDifference(5, 56, 0, 29);
    const other = newcombeDifference(0, 29, 5, 56);
    expect(other.difference).toBeCloseTo(-one.difference, 12);
    expect(other.lower).toBeCloseTo(-one.upper, 12);
  });

  it('refuses an empty group', () => {
    expect(() => newcombeDifference(0, 0, 1, 4)).toThrow(RangeError);
  });
});
