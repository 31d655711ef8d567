/** One table of checked batches. */
export interface TwoByTwo {
  exposedFound: number;
  exposedClear: number;
  unexposedFound: number;
  unexposedClear: number;
}

/** @throws RangeError when a count is negative or no integer */
export function checkTable(name: string, table: TwoByTwo): void {
  for (const [field, count] of Object.entries(table) as [string, number][]) {
    if (!Number.isInteger(count) || count < 0) throw new RangeError(`${name}: ${field} must be an integer of 0 or more, got ${count}`);
  }
}

/** Batches in a table. */
export function tableSize(table: TwoByTwo): number {
  return table.exposedFound + table.exposedClear + table.unexposedFound + table.unexposedClear;
}
