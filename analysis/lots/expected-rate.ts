import type { BatchRow } from '#analysis/causes/board-rows.ts';

/** Checked and found of one stratum. */
interface Tally { n: number; events: number }

/** Family and formula together count from so many peers on; below, the family alone. */
const ENOUGH_PEERS = 10;

/** Checked and found by method family and by family and formula. */
export interface PeerRates {
  family: Map<string, Tally>;
  formula: Map<string, Tally>;
}

const formulaKey = (row: BatchRow) => `${row.family}\n${row.nominal['formula'] ?? ''}`;

function add(map: Map<string, Tally>, key: string, found: boolean): void {
  const tally = map.get(key) ?? { n: 0, events: 0 };
  tally.n++;
  if (found) tally.events++;
  map.set(key, tally);
}

/** Tallies of a fault over batches that were checked for it. Cost: O(rows). */
export function talliesOf(rows: readonly BatchRow[], fault: string): PeerRates {
  const rates: PeerRates = { family: new Map(), formula: new Map() };
  for (const row of rows) {
    const outcome = row.outcomes[fault];
    if (outcome === undefined) continue;
    add(rates.family, row.family, outcome > 0);
    add(rates.formula, formulaKey(row), outcome > 0);
  }
  return rates;
}

function without(all: Tally | undefined, own: Tally | undefined): Tally {
  return { n: (all?.n ?? 0) - (own?.n ?? 0), events: (all?.events ?? 0) - (own?.events ?? 0) };
}

/**
 * How many of a lot's checked batches would have the fault at the rates of the batches without it.
 *
 * Each batch counts with the rate of its method family and formula where at least
 * 10 batches without the lot were checked there, else of its family; ½ is added to
 * the found and 1 to the checked, so that no rate is 0 (our rule).
 *
 * @param all tallies over every batch, the lot's own included
 * @param own rows that hold the lot
 */
export function expectedFound(all: PeerRates, own: readonly BatchRow[], fault: string): number {
  const mine = talliesOf(own, fault);
  let expected = 0;
  for (const row of own) {
    if (row.outcomes[fault] === undefined) continue;
    const key = formulaKey(row);
    const near = without(all.formula.get(key), mine.formula.get(key));
    const peers = near.n >= ENOUGH_PEERS ? near : without(all.family.get(row.family), mine.family.get(row.family));
    expected += (peers.events + 0.5) / (peers.n + 1);
  }
  return expected;
}
