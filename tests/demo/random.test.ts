import { describe, expect, it } from 'vitest';
import { randomOf } from '#server/demo/random.ts';

const draws = (n: number, draw: () => number) => Array.from({ length: n }, draw);
const mean = (values: readonly number[]) => values.reduce((sum, v) => sum + v, 0) / values.length;

describe('seeded generator', () => {
  it('gives the same draws for the same seed and name, others for another', () => {
    const first = draws(20, randomOf(7, 'a', 1).unit);
    expect(draws(20, randomOf(7, 'a', 1).unit)).toEqual(first);
    expect(draws(20, randomOf(7, 'a', 2).unit)).not.toEqual(first);
    expect(draws(20, randomOf(8, 'a', 1).unit)).not.toEqual(first);
  });

  it('spreads over 0..1 and its streams start apart', () => {
    const values = draws(20_000, randomOf(1, 'spread').unit);
    expect(Math.min(...values)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...values)).toBeLessThan(1);
    expect(mean(values)).toBeCloseTo(0.5, 2);
    expect(mean(Array.from({ length: 5000 }, (_, n) => randomOf(1, 'stream', n).unit()))).toBeCloseTo(0.5, 1);
  });

  it('draws a normal, a binomial and weights with the mean they ask for', () => {
    const r = randomOf(3, 'means');
    const normal = draws(20_000, () => r.normal(10, 2));
    // Standard error 0.014.
    expect(Math.abs(mean(normal) - 10)).toBeLessThan(0.06);
    expect(Math.abs(mean(normal.map((v) => (v - 10) ** 2)) - 4)).toBeLessThan(0.2);
    expect(Math.abs(mean(draws(5000, () => r.binomial(11, 0.25))) - 2.75)).toBeLessThan(0.1);
    expect(Math.abs(mean(draws(5000, () => (r.weighted([['a', 3], ['b', 1]] as const) === 'a' ? 1 : 0))) - 0.75)).toBeLessThan(0.03);
  });

  it('shuffles without losing any', () => {
    const shuffled = randomOf(5, 'shuffle').shuffle([1, 2, 3, 4, 5, 6, 7, 8]);
    expect([...shuffled].sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
    expect(shuffled).not.toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });
});
