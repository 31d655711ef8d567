import fc from 'fast-check';
import { describe, expect, it, test } from 'vitest';
import { concentrationOfRatio, ratioOfConcentration } from '#analysis/lye/water.ts';

describe('water to lye and lye concentration', () => {
  // Pairs of the common tables, to the four decimals they are printed with.
  test.each([[0.25, 3], [0.28, 2.5714], [0.3, 2.3333], [0.33, 2.0303], [0.3333, 2.0003], [0.35, 1.8571], [0.38, 1.6316], [0.4, 1.5]])(
    'pairs %f with %f', (concentration, ratio) => {
      expect(ratioOfConcentration(concentration)).toBeCloseTo(ratio, 4);
    });

  it('gives a third of lye for two parts of water', () => {
    expect(concentrationOfRatio(2)).toBeCloseTo(1 / 3, 12);
  });

  it('undoes itself over all that the log accepts', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 5.7, noNaN: true }), (ratio) => Math.abs(ratioOfConcentration(concentrationOfRatio(ratio)) - ratio) <= 1e-12 * ratio));
  });

  it('refuses what is no ratio and no concentration', () => {
    for (const wrong of [0, -1, Number.NaN]) expect(() => concentrationOfRatio(wrong)).toThrow(RangeError);
    for (const wrong of [0, 1, 1.2, Number.NaN]) expect(() => ratioOfConcentration(wrong)).toThrow(RangeError);
  });
});
