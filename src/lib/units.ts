import { fahrenheitFromCelsius, celsiusFromFahrenheit } from '#shared/units/temperature.ts';
import { gramsFromOunces, ouncesFromGrams } from '#shared/units/mass.ts';
import type { MassUnit, TemperatureUnit } from '#shared/session.ts';
import { formatNumber } from './format.ts';

/** How a person likes their units. */
export interface UnitChoice {
  temperatureUnit: TemperatureUnit;
  massUnit: MassUnit;
}

export const SI: UnitChoice = { temperatureUnit: 'celsius', massUnit: 'gram' };

export type Quantity = 'temperature' | 'mass' | 'percent' | 'plain';

/** Sign shown beside a field. Ounces say that they are weighed: liquid may be measured in fluid ounces. */
export function unitSign(quantity: Quantity, choice: UnitChoice): string {
  if (quantity === 'temperature') return choice.temperatureUnit === 'celsius' ? '°C' : '°F';
  if (quantity === 'mass') return choice.massUnit === 'gram' ? 'g' : 'oz by weight';
  return quantity === 'percent' ? '%' : '';
}

/** From the number inside (°C, g, fraction) to the one shown. */
export function toShown(value: number, quantity: Quantity, choice: UnitChoice): number {
  if (quantity === 'temperature' && choice.temperatureUnit === 'fahrenheit') return fahrenheitFromCelsius(value);
  if (quantity === 'mass' && choice.massUnit === 'ounce') return ouncesFromGrams(value);
  return quantity === 'percent' ? value * 100 : value;
}

/** From the number shown to the one inside. */
export function fromShown(shown: number, quantity: Quantity, choice: UnitChoice): number {
  if (quantity === 'temperature' && choice.temperatureUnit === 'fahrenheit') return celsiusFromFahrenheit(shown);
  if (quantity === 'mass' && choice.massUnit === 'ounce') return gramsFromOunces(shown);
  return quantity === 'percent' ? shown / 100 : shown;
}

/** A quantity with its sign, rounded for showing only. */
export function showQuantity(value: number, quantity: Quantity, choice: UnitChoice, decimals = 1): string {
  const sign = unitSign(quantity, choice).replace(' by weight', '');
  return `${formatNumber(toShown(value, quantity, choice), decimals)}${sign ? `\u202F${sign}` : ''}`;
}
