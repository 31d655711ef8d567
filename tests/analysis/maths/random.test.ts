import { describe, expect, it } from 'vitest';
import { normalDraw, randomFrom, shuffled } from '#analysis/maths/random.ts';

describe('randomFrom', () => {
  it('gives the same stream for the same seed and another for another', () => {
    const draw = (seed: number) => { const random = randomFrom(seed); return Array.from({ length: 5 }, () => random.next()); };
    expect(draw(7)).toEqual(draw(7));
    expect(draw(7)).not.toEqual(draw(8));
  });

  it('is even over 0..1 and normal where asked', () => {
    const random = randomFrom(42);
    const uniform = Array.from({ length: 20_000 }, () => random.next());
    expect(Math.min(...uniform)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...uniform)).toBeLessThan(1);
    // Four standard errors of the mean of 20,000.
    expect(Math.abs(uniform.reduce((a, b) => a + b) / 20_000 - 0.5)).toBeLessThan(4 * Math.sqrt(1 / 12 / 20_000));
    const normal = Array.from({ length: 20_000 }, () => normalDraw(random));
    expect(Math.abs(normal.reduce((a, b) => a + b) / 20_000)).toBeLessThan(4 / Math.sqrt(20_000));
    expect(Math.abs(normal.reduce((a, b) => a + b * b, 0) / 20_000 - 1)).toBeLessThan(4 * Math.sqrt(2 / 20_000));
  });

  it('shuffles a copy that keeps every value', () => {
    const cards = Object.freeze([1, 2, 3, 4, 5, 6]);
    expect(shuffled(cards, randomFrom(1)).sort()).toEqual([...cards]);
  });

  it('refuses a seed that is no 32-bit integer', () => {
    expect(() => randomFrom(-1)).toThrow(RangeError);
    expect(() => randomFrom(0.5)).toThrow(/seed must be an integer/);
  });
});
