import { describe, expect, it } from 'vitest';
import { gramsFromOunces, ouncesFromGrams } from '#shared/units/mass.ts';
import { celsiusFromFahrenheit, fahrenheitFromCelsius } from '#shared/units/temperature.ts';

describe('mass', () => {
  it('takes the avoirdupois ounce as 28.349523125 g, exact by definition (1959)', () => {
    expect(gramsFromOunces(1)).toBe(28.349523125);
    // 2 lb 3.3 oz = 35.3 oz, 0.45359237 kg a pound.
    expect(gramsFromOunces(35.3)).toBeCloseTo(2 * 453.59237 + (3.3 * 453.59237) / 16, 9);
    expect(ouncesFromGrams(1000)).toBeCloseTo(35.2739619, 6);
  });
});

describe('temperature', () => {
  it.each([[32, 0], [212, 100], [-40, -40], [110, 43 + 1 / 3], [200, 93 + 1 / 3]])('%d °F is %d °C', (fahrenheit, celsius) => {
    expect(celsiusFromFahrenheit(fahrenheit)).toBeCloseTo(celsius, 9);
    expect(fahrenheitFromCelsius(celsius)).toBeCloseTo(fahrenheit, 9);
  });
});
