import type { FieldProblem } from '#shared/http/problem.ts';
import type { Answer } from '#shared/words/fault-words.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';
import { STAGE_IN_WORDS, STAGES, stageOrder, type Stage } from '#shared/words/stages.ts';
import { catalogueFault, faultCatalogue, type CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { answerable, appliesTo, checklistFor } from '#server/features/faults/checklist.ts';

export interface AnswerWish {
  fault: string;
  answer: Answer;
}

const SLUGS = new Set<string>(faultCatalogue.map((fault) => fault.slug));
const METHOD_IN_WORDS = { cold: 'cold process', hot: 'hot process', rebatch: 'a rebatch' } as const;

export function isCatalogueSlug(slug: string): slug is CatalogueSlug {
  return SLUGS.has(slug);
}

/** Why a fault cannot be answered found or clear at this look, in words; undefined when it can. */
export function whyNotAnswerable(fault: string, stage: Stage, method: Method): string | undefined {
  if (!isCatalogueSlug(fault)) return `There is no fault ${fault} in the catalogue`;
  const { name, firstSeen } = catalogueFault(fault);
  if (!appliesTo(fault, method)) return `${name} does not occur in ${METHOD_IN_WORDS[familyOf(method)]}`;
  if (answerable(fault, stage) !== 'cannot') return undefined;
  if (stageOrder(stage) < stageOrder(firstSeen)) {
    return `${name} cannot be seen yet at ${STAGE_IN_WORDS[stage]}, only from ${STAGE_IN_WORDS[firstSeen]} on`;
  }
  const places = STAGES.filter((other) => answerable(fault, other) !== 'cannot').map((other) => STAGE_IN_WORDS[other]);
  return `${name} cannot be judged at ${STAGE_IN_WORDS[stage]}, only at ${places.join(', ')}`;
}

/**
 * What is wrong with the answers of one look.
 *
 * @param found faults that have a finding at this look; `found` is theirs alone
 */
export function problemsOfAnswers(answers: readonly AnswerWish[], stage: Stage, method: Method, found: ReadonlySet<string>): FieldProblem[] {
  const seen = new Set<string>();
  return answers.flatMap(({ fault, answer }, index): FieldProblem[] => {
    const at = `#/answers/${index}`;
    if (seen.has(fault)) return [{ pointer: `${at}/fault`, detail: `${fault} is answered twice` }];
    seen.add(fault);
    if (!isCatalogueSlug(fault)) return [{ pointer: `${at}/fault`, detail: `There is no fault ${fault} in the catalogue` }];
    const { name } = catalogueFault(fault);
    if (answer !== 'found' && found.has(fault)) return [{ pointer: `${at}/answer`, detail: `${name} has a finding at this inspection; take the finding back first` }];
    if (answer === 'not-checked') return [];
    const why = whyNotAnswerable(fault, stage, method);
    if (why) return [{ pointer: `${at}/answer`, detail: why }];
    if (answer === 'found' && !found.has(fault)) return [{ pointer: `${at}/answer`, detail: `${name} is found once its finding says how severe it is` }];
    return [];
  });
}

/**
 * The whole checklist of a look, one answer a fault. What nobody answered is `not-checked`, never clear;
 * faults that the plan does not hold at this stage are left out.
 */
export function wholeChecklist(answers: readonly AnswerWish[], stage: Stage, method: Method, found: ReadonlySet<string>): AnswerWish[] {
  const given = new Map(answers.map(({ fault, answer }) => [fault, answer]));
  return checklistFor(stage, method).map(({ fault }) => ({ fault, answer: found.has(fault) ? 'found' : (given.get(fault) ?? 'not-checked') }));
}
