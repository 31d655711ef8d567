import { describe, expect, it } from 'vitest';
import { priorFromLots, shrunkRatio } from '#analysis/lots/shrink.ts';

describe('shrunkRatio', () => {
  // G. N. Norén, J. Hopstadius & A. Bate, Stat. Methods Med. Res. 22 (2013) 57, prior Gamma(½, ½): log2 of the ratio. Six decimals: as printed.
  it.each([[5, 1, 1.874469, 0.873364], [12, 6, 0.943416, 0.407599], [0, 2, -2.321928, 0.001565]])(
    'agrees for %i found, %d expected', (found, expected, log2, chance) => {
      const ratio = shrunkRatio(found, expected, 0.5);
      expect(Math.log2(ratio.mean)).toBeCloseTo(log2, 6);
      expect(ratio.chanceTwice).toBeCloseTo(chance, 6);
    });

  it('agrees on the lower end for 5 found, 1 expected', () => {
    expect(Math.log2(shrunkRatio(5, 1, 0.5).lower)).toBeCloseTo(0.347003, 6);
  });

  it('says "like the others" when nothing was looked at, and follows the counts when much was', () => {
    expect(shrunkRatio(0, 0, 3).mean).toBe(1);
    expect(shrunkRatio(3000, 1000, 3).mean).toBeCloseTo(3, 1);
  });

  it('lies between 1 and the raw ratio', () => {
    for (const [found, expected] of [[3, 1], [0, 4], [9, 2]] as const) {
      const { mean } = shrunkRatio(found, expected, 2);
      expect(mean).toBeGreaterThanOrEqual(Math.min(1, found / expected));
      expect(mean).toBeLessThanOrEqual(Math.max(1, found / expected));
    }
  });

  it('refuses what is no count', () => {
    expect(() => shrunkRatio(0.5, 1, 1)).toThrow(RangeError);
    expect(() => shrunkRatio(1, -1, 1)).toThrow(/expected must be 0 or more/);
    expect(() => shrunkRatio(1, 1, 0)).toThrow(/a must be above 0/);
  });
});

describe('priorFromLots', () => {
  it('pulls hard where lots are alike and little where they differ', () => {
    const alike = Object.freeze(Array.from({ length: 12 }, () => ({ found: 3, expected: 3 })));
    const apart = Object.freeze(Array.from({ length: 12 }, (_, i) => ({ found: i % 4 === 0 ? 12 : 0, expected: 3 })));
    expect(priorFromLots(alike)).toBeCloseTo(20, 3);
    expect(priorFromLots(apart)).toBeLessThan(0.5);
  });

  it('takes lots as alike where none says anything', () => {
    expect(priorFromLots([])).toBe(20);
  });
});
