import { addDays } from '#shared/units/days.ts';
import type { Stage } from '#shared/words/stages.ts';
import { catalogueFault, type CatalogueSlug } from '#server/features/faults/catalogue.ts';

/** Days from the pour until a stage is usually reached. Common practice. */
const REACHED_AFTER: Record<Stage, number> = { pour: 0, unmould: 2, cut: 3, 'cure-w1': 7, 'cure-w2': 14, 'cure-w4': 28, 'cure-w6': 42, release: 42, 'in-use': 42 };

/** Whether a batch is too young for a fault to show: "not yet" is neither clear nor unchecked. */
export function cannotBeSeenYet(fault: CatalogueSlug, madeOn: string, today: string): boolean {
  return addDays(madeOn, REACHED_AFTER[catalogueFault(fault).firstSeen]) > today;
}
