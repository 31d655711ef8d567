import { type Method, familyOf } from '#shared/words/methods.ts';
import { STAGES, type Stage } from '#shared/words/stages.ts';
import { type CatalogueSlug, catalogueFault } from './catalogue.ts';

/**
 * `must`: answered found, clear or not checked before the stage counts as done.
 * `may`: can be answered. `cannot`: cannot be judged at this stage, so "clear" is not offered.
 */
export type Answerable = 'must' | 'may' | 'cannot';

/** One letter a stage, in the order pour, unmould, cut, week 1, 2, 4, 6, release, in use: x must, o may, - cannot. */
const table: Readonly<Record<CatalogueSlug, string>> = {
  'soda-ash': '-xxxxooxo',
  'glycerin-rivers': '--xo-o-oo',
  ricing: 'xox----oo',
  acceleration: 'x--------',
  seizing: 'x--------',
  separation: 'xxxo---oo',
  'false-trace': 'x--------',
  'colour-shift': '-oxoxxoxo',
  'vanilla-browning': '--oxxxoxo',
  'colour-bleed': '--ooxxxxo',
  'partial-gel-ring': '-ox----oo',
  'overheating-crack': 'oxx----o-',
  volcano: 'x--------',
  'heat-tunnels': '-xx----o-',
  'lye-pockets': '--xooooxx',
  'lye-heavy': '-oxx-x-xx',
  'stearic-spots': '--xo---o-',
  'air-pockets': '--x----oo',
  'soft-sticky': '-xxoxx-xo',
  crumbly: '--xo-oooo',
  'drag-marks': '--x----o-',
  'uneven-bars': '--x----xo',
  'stuck-in-mould': '-x-------',
  sweating: '---xxxoxo',
  warping: '---xxxoo-',
  'orange-spots': '-----xxxx',
  'scent-fade': '----oxxxx',
  'off-smell': '--xxoxoxx',
  'embed-detachment': '--x--xoxo',
  'wrap-marks': '-------xx',
  'colour-specks': '--x----oo',
  'foreign-matter': 'ooxooooxx',
  // Kept like faults: nobody has to answer for them.
  'design-differs': '-oo----oo',
  'customer-reaction': '--------o',
  'damaged-in-transit': '--------o',
};

const meaning: Readonly<Record<string, Answerable>> = { x: 'must', o: 'may', '-': 'cannot' };

/** Whether a fault must, may or cannot be answered at a stage, whatever the method. */
export function answerable(fault: CatalogueSlug, stage: Stage): Answerable {
  return meaning[table[fault][STAGES.indexOf(stage)] ?? '-'] ?? 'cannot';
}

/** Whether a fault belongs on the lists of a method at all. A rebatch was cooked, so pour faults fall away. */
export function appliesTo(fault: CatalogueSlug, method: Method): boolean {
  return catalogueFault(fault).occursIn[familyOf(method)] !== 'never';
}

/** The faults an inspection of this method at this stage asks for, in catalogue order. */
export function checklistFor(stage: Stage, method: Method): { fault: CatalogueSlug; answer: 'must' | 'may' }[] {
  return (Object.keys(table) as CatalogueSlug[]).flatMap((fault) => {
    const answer = answerable(fault, stage);
    return answer === 'cannot' || !appliesTo(fault, method) ? [] : [{ fault, answer }];
  });
}
