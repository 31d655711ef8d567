import hypergeometricPmf from '@stdlib/stats-base-dists-hypergeometric-pmf';
import { describe, expect, it } from 'vitest';
import { conditionalOf, probabilitiesAt } from '#analysis/tables/conditional.ts';
import { fisherTest, oddsRatio, smallestReachableP } from '#analysis/tables/fisher.ts';

const table = (a: number, b: number, c: number, d: number) => ({ exposedFound: a, exposedClear: b, unexposedFound: c, unexposedClear: d });

describe('fisherTest and oddsRatio', () => {
  // R. A. Fisher, The Design of Experiments (1935): the lady tasting tea; values recomputed with R fisher.test.
  it('agrees on the tea', () => {
    const test = fisherTest(table(3, 1, 1, 3));
    expect(test.p).toBeCloseTo(0.4857143, 7);
    expect(test.midP).toBeCloseTo(0.2571429, 7);
    const ratio = oddsRatio(table(3, 1, 1, 3));
    // R searches the ratio, or its reciprocal where that is below 1, to 1.2e-4; ours goes on.
    expect(Math.abs(ratio.estimate! - 6.40831)).toBeLessThan(6.4 * 6.4 * 1.2e-4);
    expect(Math.abs(ratio.lower! - 0.21173)).toBeLessThan(1.2e-4);
    expect(Math.abs(1 / ratio.upper! - 1 / 621.934)).toBeLessThan(1.2e-4);
  });

  // Criminal twins, Fisher 1962, as in the example of R fisher.test.
  it('agrees on the twins', () => {
    const twins = table(2, 15, 10, 3);
    expect(fisherTest(twins).p).toBeCloseTo(0.0005367241, 9);
    const ratio = oddsRatio(twins);
    expect(Math.abs(ratio.estimate! - 0.04693661)).toBeLessThan(1.2e-4);
    expect(Math.abs(ratio.lower! - 0.003325764)).toBeLessThan(1.2e-4);
    expect(Math.abs(ratio.upper! - 0.363182)).toBeLessThan(1.2e-4);
  });

  it('leaves exactly 2.5 % beyond each end', () => {
    const law = conditionalOf(table(3, 1, 1, 3));
    const { lower, upper } = oddsRatio(table(3, 1, 1, 3));
    const atLower = probabilitiesAt(law, Math.log(lower!));
    const atUpper = probabilitiesAt(law, Math.log(upper!));
    expect(atLower[3]! + atLower[4]!).toBeCloseTo(0.025, 9);
    expect(atUpper[0]! + atUpper[1]! + atUpper[2]! + atUpper[3]!).toBeCloseTo(0.025, 9);
  });

  it('turns round when found and clear swap places', () => {
    const one = oddsRatio(table(7, 5, 3, 12));
    const other = oddsRatio(table(5, 7, 12, 3));
    expect(one.estimate! * other.estimate!).toBeCloseTo(1, 8);
    expect(one.lower! * other.upper!).toBeCloseTo(1, 8);
  });

  it('gives no upper bound, and no NaN, where every found one is exposed', () => {
    expect(oddsRatio(table(4, 2, 0, 9))).toMatchObject({ estimate: null, upper: null });
    expect(oddsRatio(table(0, 6, 4, 5))).toMatchObject({ estimate: 0, lower: 0 });
    expect(oddsRatio(table(0, 6, 0, 5))).toMatchObject({ estimate: null, lower: 0, upper: null });
  });

  it('goes over to Woolf with ½ beyond 2,000 batches, close to the exact answer there', () => {
    const small = oddsRatio(table(60, 440, 90, 1410));
    const large = oddsRatio(table(60, 440, 90, 1411));
    expect([small.method, large.method]).toEqual(['conditional-exact', 'woolf-half']);
    expect(large.estimate! / small.estimate!).toBeCloseTo(1, 1);
    expect(large.lower! / small.lower!).toBeCloseTo(1, 1);
  });

  it('has the weights the kept package has', () => {
    const probability = probabilitiesAt(conditionalOf(table(6, 14, 10, 50)), 0);
    for (let k = 0; k <= 16; k++) expect(probability[k]).toBeCloseTo(hypergeometricPmf(k, 80, 16, 20), 12);
  });

  it('knows the smallest p that margins can reach', () => {
    // 3 found, 3 exposed of 10: at best all three, 1 of 120.
    expect(smallestReachableP(table(1, 2, 2, 5), true)).toBeCloseTo(1 / 120, 12);
    // One-sided the other way nothing better can come than none of 3: 35 of 120.
    expect(smallestReachableP(table(1, 2, 2, 5), false)).toBeCloseTo(1 / 120, 12);
  });

  it('refuses what is no count', () => {
    expect(() => fisherTest(table(-1, 2, 2, 2))).toThrow(/exposedFound must be an integer of 0 or more/);
    expect(() => oddsRatio(table(1, 2.5, 2, 2))).toThrow(RangeError);
  });
});
