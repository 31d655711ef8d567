import type { FaultView } from '#shared/faults.ts';
import { METHOD_FAMILIES } from '#shared/words/methods.ts';
import { STAGES } from '#shared/words/stages.ts';
import { type CatalogueFault, faultCatalogue } from './catalogue.ts';
import { answerable } from './checklist.ts';

const BARS_GO = {
  firsts: 'sell as firsts', seconds: 'sell as seconds', rebatch: 'rebatch', embeds: 'use as embeds', discarded: 'discard', hold: 'hold the batch',
} as const;

/** Where bars usually go by severity, e.g. `Severity 1: sell as firsts; 2: sell as seconds`. */
function dispositionOf({ usually }: CatalogueFault): string {
  return `Severity ${Object.entries(usually).map(([severity, where]) => `${severity}: ${BARS_GO[where]}`).join('; ')}`;
}

function faultView(fault: CatalogueFault): FaultView {
  return {
    slug: fault.slug,
    name: fault.name,
    otherNames: [...fault.otherNames],
    kind: fault.kind,
    family: fault.family,
    methodFamilies: METHOD_FAMILIES.filter((family) => fault.occursIn[family] !== 'never'),
    firstSeen: fault.firstSeen,
    definition: fault.definition,
    criteria: [fault.severity[1] ?? null, fault.severity[2] ?? null, fault.severity[3] ?? null],
    extentUnit: fault.extentUnit === 'loaf' ? 'loaves' : 'bars',
    lookAlikes: fault.lookAlikes.map(({ name, howToTell }) => ({ name, howToTell })),
    prevention: fault.prevention,
    disposition: dispositionOf(fault),
    checklist: STAGES.map((stage) => ({ stage, answer: answerable(fault.slug, stage) })),
  };
}

/** The catalogue in the order people meet the faults; the same for every workshop until one adds its own. */
export const FAULT_VIEWS: readonly FaultView[] = faultCatalogue.map(faultView);
