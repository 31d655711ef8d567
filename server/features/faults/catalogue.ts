import { bodyFaults } from './catalogue/body.ts';
import { colourFaults } from './catalogue/colour.ts';
import type { FaultDefinition } from './catalogue/fault-definition.ts';
import { insideFaults } from './catalogue/inside.ts';
import { pourFaults } from './catalogue/pour.ts';
import { safetyFaults } from './catalogue/safety.ts';
import { scentFaults } from './catalogue/scent.ts';
import { surfaceFaults } from './catalogue/surface.ts';

/** The order people meet them in: on the top and the face, then the batter, colour, the body, cure, wrap. */
const order = [
  'soda-ash', 'glycerin-rivers', 'ricing', 'acceleration', 'seizing', 'separation', 'false-trace',
  'colour-shift', 'vanilla-browning', 'colour-bleed', 'partial-gel-ring', 'overheating-crack', 'volcano',
  'heat-tunnels', 'lye-pockets', 'lye-heavy', 'stearic-spots', 'air-pockets', 'soft-sticky', 'crumbly',
  'drag-marks', 'uneven-bars', 'stuck-in-mould', 'sweating', 'warping', 'orange-spots', 'scent-fade',
  'off-smell', 'embed-detachment', 'wrap-marks', 'colour-specks', 'foreign-matter',
  'design-differs', 'customer-reaction', 'damaged-in-transit',
] as const;

export type CatalogueSlug = (typeof order)[number];
export type CatalogueFault = FaultDefinition & { slug: CatalogueSlug };

const bySlug = new Map<string, FaultDefinition>(
  [...surfaceFaults, ...insideFaults, ...bodyFaults, ...pourFaults, ...colourFaults, ...scentFaults, ...safetyFaults]
    .map((fault) => [fault.slug, fault]),
);

/** Every fault a workshop starts with; workshops may add their own beside these. */
export const faultCatalogue: readonly CatalogueFault[] = order.map((slug) => catalogueFault(slug));

/**
 * One fault of the catalogue.
 *
 * @throws RangeError for a slug the catalogue does not hold
 */
export function catalogueFault(slug: CatalogueSlug): CatalogueFault {
  const fault = bySlug.get(slug);
  if (!fault) throw new RangeError(`the catalogue holds no fault "${slug}"`);
  return { ...fault, slug };
}
