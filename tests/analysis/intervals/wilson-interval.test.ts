import { describe, expect, it } from 'vitest';
import { wilsonInterval } from '#analysis/intervals/wilson-interval.ts';

describe('wilsonInterval', () => {
  // R. G. Newcombe, Stat. Med. 17 (1998) 857–872, method 3. Five decimals: as printed.
  it.each([[81, 263, 0.25529, 0.36621], [15, 148, 0.06239, 0.16049], [0, 20, 0, 0.16113], [1, 29, 0.00611, 0.17176]])(
    'agrees with the published bounds for %i of %i', (events, n, lower, upper) => {
      expect(wilsonInterval(events, n).lower).toBeCloseTo(lower, 5);
      expect(wilsonInterval(events, n).upper).toBeCloseTo(upper, 5);
    });

  it('mirrors itself when found and clear swap places', () => {
    for (let n = 1; n <= 60; n++) {
      for (let events = 0; events <= n; events++) {
        const one = wilsonInterval(events, n);
        const other = wilsonInterval(n - events, n);
        expect(one.lower).toBeCloseTo(1 - other.upper, 12);
        expect(one.lower).toBeGreaterThanOrEqual(0);
        expect(one.upper).toBeLessThanOrEqual(1);
      }
    }
  });

  it('refuses a share of nothing instead of answering NaN', () => {
    expect(() => wilsonInterval(0, 0)).toThrow(/n must be an integer of 1 or more/);
    expect(() => wilsonInterval(3, 2)).toThrow(/events must be an integer in 0..2/);
    expect(() => wilsonInterval(0.5, 2)).toThrow(RangeError);
  });
});
