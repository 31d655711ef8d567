import { faultCatalogue } from '#server/features/faults/catalogue.ts';

const places = new Map<string, number>(faultCatalogue.map((fault, index) => [fault.slug, index]));

/** Place of a fault on every checklist; one that the catalogue no longer holds comes last. */
export function checklistOrder(fault: string): number {
  return places.get(fault) ?? places.size;
}
