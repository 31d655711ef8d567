import { describe, expect, it } from 'vitest';
import { falseDiscoveryRates } from '#analysis/causes/false-discovery.ts';

describe('falseDiscoveryRates', () => {
  // Y. Benjamini & Y. Hochberg, J. R. Stat. Soc. B 57 (1995) 289: fifteen tests of a heart study.
  const published = Object.freeze([0.0001, 0.0004, 0.0019, 0.0095, 0.0201, 0.0278, 0.0298, 0.0344, 0.0459, 0.324, 0.4262, 0.5719, 0.6528, 0.759, 1]);

  it('agrees with the published example and rejects four', () => {
    const q = falseDiscoveryRates(published);
    const expected = [0.0015, 0.003, 0.0095, 0.035625, 0.0603, 0.0638571, 0.0638571, 0.0645, 0.0765, 0.486, 0.5811818, 0.714875, 0.7532308, 0.8132143, 1];
    for (const [i, value] of expected.entries()) expect(q[i]).toBeCloseTo(value, 7);
    expect(q.filter((value) => value <= 0.05)).toHaveLength(4);
  });

  it('does not mind the order of the questions', () => {
    const turned = falseDiscoveryRates([...published].reverse()).reverse();
    expect(turned).toEqual(falseDiscoveryRates(published));
  });

  it('changes nothing when all weigh the same, and favours the heavier', () => {
    expect(falseDiscoveryRates(published, published.map(() => 4))).toEqual(falseDiscoveryRates(published));
    const favoured = falseDiscoveryRates(published, published.map((_, i) => (i === 4 ? 4 : 1)));
    expect(favoured[4]).toBeLessThan(0.05);
    expect(favoured[0]).toBeGreaterThan(0.0015);
  });

  it('answers nothing for nothing, and refuses what is no p', () => {
    expect(falseDiscoveryRates([])).toEqual([]);
    expect(() => falseDiscoveryRates([Number.NaN])).toThrow(/p must lie in 0..1/);
    expect(() => falseDiscoveryRates([0.1], [0])).toThrow(/weights must be above 0/);
    expect(() => falseDiscoveryRates([0.1], [1, 1])).toThrow(/2 weights/);
  });
});
