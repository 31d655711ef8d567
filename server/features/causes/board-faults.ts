import type { FaultSpec } from '#analysis/causes/board-rows.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';

/** A concentration is the ratio of water to lye said the other way round; the board asks the ratio. */
const askedAs = (input: string) => (input === 'lyeConcentration' ? 'waterToLye' : input);

/** The catalogue as the analysis wants it: when each fault is first seen, and what the trade suspects. */
export const BOARD_FAULTS: readonly (FaultSpec & { name: string })[] = faultCatalogue.map(({ slug, name, firstSeen, suspects }) => ({
  slug, name, firstSeen,
  suspects: [...new Set(suspects.map(({ input }) => askedAs(input)))].map((input) => ({ input })),
}));
