/** °C from °F; exact by definition: (°F − 32) × 5/9. */
export function celsiusFromFahrenheit(fahrenheit: number): number {
  return ((fahrenheit - 32) * 5) / 9;
}

/** °F from °C; exact by definition: °C × 9/5 + 32. */
export function fahrenheitFromCelsius(celsius: number): number {
  return (celsius * 9) / 5 + 32;
}
