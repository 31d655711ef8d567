import type { BatchRow, InputSpec } from './board-rows.ts';

/** Plain order of text by code unit: the same on every machine, whatever its language. */
export function byText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** The batch's one value of a nominal input, or null when not recorded. */
export function nominalValue(row: BatchRow, input: string): string | null {
  if (input === 'method') return row.method;
  if (input === 'methodFamily') return row.family;
  return row.nominal[input] ?? null;
}

/**
 * Whether a batch has the level asked about.
 *
 * @param level level of a nominal input, or the thing held; for numbers null
 * @param above numbers only: batches above it count as exposed (the board uses the median of the checked ones)
 * @returns null when the batch's record does not say
 * @throws RangeError when a number is asked without `above`, or another kind without a level
 */
export function isExposed(row: BatchRow, input: InputSpec, level: string | null, above?: number): boolean | null {
  if (input.kind === 'number') {
    if (above === undefined) throw new RangeError(`isExposed: ${input.slug} is a number and needs the value to be above`);
    const value = row.numbers[input.slug];
    return value === undefined ? null : value > above;
  }
  if (level === null) throw new RangeError(`isExposed: ${input.slug} needs a level`);
  if (input.kind === 'held') {
    const held = row.holds[input.slug];
    return held === undefined ? null : held.includes(level);
  }
  const value = nominalValue(row, input.slug);
  return value === null ? null : value === level;
}
