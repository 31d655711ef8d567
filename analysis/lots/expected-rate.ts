import type { BatchRow } from '#analysis/causes/board-rows.ts';

/** Checked and found of one stratum. */
interface Tally { n: number; events: number }

/** Family and formula together count from so many peers on; below, the family alone. */
const ENOUGH_PEERS = 10;

/** Checked and found by method family and by family and formula. */
export interface PeerRates {
  family: Map<string, Tally>;
  /** By family, then formula: joining the two into one key for every batch is what would cost. */
  formula: Map<string, Map<string, Tally>>;
}

const formulaOf = (row: BatchRow) => row.nominal['formula'] ?? '';

function add(map: Map<string, Tally>, key: string, found: boolean): void {
  let tally = map.get(key);
  if (!tally) map.set(key, (tally = { n: 0, events: 0 }));
  tally.n++;
  if (found) tally.events++;
}

/** Tallies of a fault over batches that were checked for it. Cost: O(rows). */
export function talliesOf(rows: readonly BatchRow[], fault: string): PeerRates {
  const rates: PeerRates = { family: new Map(), formula: new Map() };
  for (const row of rows) {
    const outcome = row.outcomes[fault];
    if (outcome === undefined) continue;
    add(rates.family, row.family, outcome > 0);
    let formulas = rates.formula.get(row.family);
    if (!formulas) rates.formula.set(row.family, (formulas = new Map()));
    add(formulas, formulaOf(row), outcome > 0);
  }
  return rates;
}

function without(all: Tally | undefined, own: Tally | undefined): Tally {
  return { n: (all?.n ?? 0) - (own?.n ?? 0), events: (all?.events ?? 0) - (own?.events ?? 0) };
}

/** A lot's checked batches of one family against the batches without it. */
export interface AgainstPeers {
  n: number;
  found: number;
  /** Found at the peers' rates. */
  expected: number;
}

/**
 * How many of a lot's checked batches would have the fault at the rates of the batches without it, family by family.
 *
 * Each batch counts with the rate of its method family and formula where at least
 * 10 batches without the lot were checked there, else of its family; ½ is added to
 * the found and 1 to the checked, so that no rate is 0 (our rule).
 *
 * @param all tallies over every batch, the lot's own included
 * @param own rows that hold the lot
 */
export function againstPeers(all: PeerRates, own: readonly BatchRow[], fault: string): { cold: AgainstPeers; hot: AgainstPeers; all: AgainstPeers } {
  const mine = talliesOf(own, fault);
  const [cold, hot] = [ofFamily(all, mine, 'cold'), ofFamily(all, mine, 'hot')];
  return { cold, hot, all: { n: cold.n + hot.n, found: cold.found + hot.found, expected: cold.expected + hot.expected } };
}

function ofFamily(all: PeerRates, mine: PeerRates, family: string): AgainstPeers {
  const far = without(all.family.get(family), mine.family.get(family));
  const answer: AgainstPeers = { n: 0, found: 0, expected: 0 };
  for (const [formula, tally] of mine.formula.get(family) ?? []) {
    const near = without(all.formula.get(family)?.get(formula), tally);
    const peers = near.n >= ENOUGH_PEERS ? near : far;
    answer.n += tally.n;
    answer.found += tally.events;
    answer.expected += (tally.n * (peers.events + 0.5)) / (peers.n + 1);
  }
  return answer;
}
