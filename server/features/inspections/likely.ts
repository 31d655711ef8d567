/** How often one fault was found among looks that checked it. */
export interface FaultCount {
  found: number;
  checked: number;
}

/** The counts of one fault, from all looks down to those nearest to the batch. */
export interface CountsOfFault {
  fault: string;
  all: FaultCount;
  sameMethod: FaultCount;
  sameLots: FaultCount;
}

/** A nearer group counts like this many looks against the wider one. */
const PRIOR_LOOKS = 4;

/**
 * Faults by how likely each is on a batch: the rate among batches of the same lots, leaned on that of the same
 * method, leaned on that of all, so that one look at a new lot does not turn the list upside down.
 *
 * Ties keep the order they came in. An ordering aid, not an estimate that is shown.
 */
export function byLikelihood<C extends CountsOfFault>(faults: readonly C[]): C[] {
  const rated = faults.map((counts) => {
    const everywhere = (counts.all.found + 0.5) / (counts.all.checked + 10);
    return { counts, rate: lean(counts.sameLots, lean(counts.sameMethod, everywhere)) };
  });
  return rated.sort((a, b) => b.rate - a.rate).map(({ counts }) => counts);
}

function lean({ found, checked }: FaultCount, prior: number): number {
  return (found + PRIOR_LOOKS * prior) / (checked + PRIOR_LOOKS);
}
