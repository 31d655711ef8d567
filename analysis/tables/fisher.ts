import { Z95 } from '#analysis/maths/distributions.ts';
import { conditionalOf, exactOddsRatio, exactTest, probabilitiesAt } from './conditional.ts';
import { checkTable, tableSize } from './two-by-two.ts';
import type { TwoByTwo } from './two-by-two.ts';

/** Whether the fault and the exposure go together more than chance deals, two-sided. */
export interface FisherTest {
  p: number;
  /** Counts tables as likely as the seen one half; less strict where counts are few. */
  midP: number;
}

/**
 * Fisher's exact test of one table.
 *
 * Mid-p for [[3, 1], [1, 3]]: 0.2571429, half of the class of tables as likely as the seen one taken off.
 *
 * @throws RangeError when a count is negative or no integer
 *
 * Source: R. A. Fisher, The Design of Experiments (1935); H. O. Lancaster, J. Am. Stat. Assoc. 56 (1961) 223. Cost: O(smaller margin).
 */
export function fisherTest(table: TwoByTwo): FisherTest {
  checkTable('fisherTest', table);
  return exactTest(conditionalOf(table), table.exposedFound);
}

/** An odds ratio with its 95 % interval; null where there is no bound. */
export interface OddsRatio {
  estimate: number | null;
  lower: number | null;
  upper: number | null;
  method: 'conditional-exact' | 'woolf-half';
}

/** Above this many batches the exact interval costs more than it is worth and agrees to the second digit. */
export const EXACT_UP_TO = 2000;

/**
 * Odds ratio of one table: conditional maximum likelihood with exact interval up to
 * 2,000 batches, Woolf's with ½ added to each count beyond.
 *
 * @throws RangeError when a count is negative or no integer
 *
 * Source: Fisher 1935; B. Woolf, Ann. Hum. Genet. 19 (1955) 251, with J. Haldane's ½ (1956).
 */
export function oddsRatio(table: TwoByTwo): OddsRatio {
  checkTable('oddsRatio', table);
  if (tableSize(table) > EXACT_UP_TO) return woolf(table);
  return { ...exactOddsRatio(conditionalOf(table), table.exposedFound), method: 'conditional-exact' };
}

function woolf(table: TwoByTwo): OddsRatio {
  const [a, b, c, d] = [table.exposedFound + 0.5, table.exposedClear + 0.5, table.unexposedFound + 0.5, table.unexposedClear + 0.5];
  const log = Math.log((a * d) / (b * c));
  const half = Z95 * Math.sqrt(1 / a + 1 / b + 1 / c + 1 / d);
  return { estimate: Math.exp(log), lower: Math.exp(log - half), upper: Math.exp(log + half), method: 'woolf-half' };
}

/**
 * The smallest p that these margins could ever give: above the level, the question cannot be decided.
 *
 * @param harmOnly count only the end where more of the exposed are found
 *
 * Source: R. E. Tarone, Biometrics 46 (1990) 515.
 */
export function smallestReachableP(table: TwoByTwo, harmOnly: boolean): number {
  const probability = probabilitiesAt(conditionalOf(table), 0);
  const most = probability[probability.length - 1]!;
  return harmOnly ? most : Math.min(most, probability[0]!);
}
