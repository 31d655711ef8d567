import { wilsonInterval } from '#analysis/intervals/wilson-interval.ts';
import type { ShareInterval } from '#analysis/intervals/wilson-interval.ts';

/** Checked and found of both groups in one stratum. */
export interface StratumCounts {
  n1: number;
  events1: number;
  n0: number;
  events0: number;
}

export interface Standardised {
  kind: 'answer';
  one: ShareInterval;
  other: ShareInterval;
  /** Positions of the strata where one group is absent. */
  neverMet: number[];
}

export interface NeverMet {
  kind: 'never-met';
  neverMet: number[];
}

/**
 * Both groups' rates as they would be if each had the workshop's own mix of strata.
 *
 * Each stratum weighs by its share of all batches, both groups together; strata where
 * one group is absent cannot be compared and are left out and named.
 *
 * @param strata checked and found, integers ≥ 0
 * @returns `never-met` when no stratum holds both groups
 * @throws RangeError when found exceeds checked or a count is no integer
 *
 * Source: direct standardisation; intervals join each stratum's Wilson limits as G. Y. Zou and A. Donner,
 * Stat. Med. 27 (2008) 1693. Cost: O(strata).
 */
export function standardise(strata: readonly StratumCounts[]): Standardised | NeverMet {
  const both = strata.filter(({ n1, n0 }) => n1 > 0 && n0 > 0);
  const neverMet = strata.flatMap(({ n1, n0 }, i) => ((n1 > 0) !== (n0 > 0) ? [i] : []));
  if (both.length === 0) return { kind: 'never-met', neverMet };
  const total = both.reduce((sum, { n1, n0 }) => sum + n1 + n0, 0);
  const weights = both.map(({ n1, n0 }) => (n1 + n0) / total);
  return {
    kind: 'answer', neverMet,
    one: join(both.map(({ events1, n1 }) => wilsonInterval(events1, n1)), weights),
    other: join(both.map(({ events0, n0 }) => wilsonInterval(events0, n0)), weights),
  };
}

function join(parts: readonly ShareInterval[], weights: readonly number[]): ShareInterval {
  const sum = (of: (part: ShareInterval) => number) => parts.reduce((all, part, i) => all + weights[i]! * of(part), 0);
  const root = (of: (part: ShareInterval) => number) => Math.sqrt(parts.reduce((all, part, i) => all + (weights[i]! * of(part)) ** 2, 0));
  const share = sum((part) => part.share);
  return {
    share,
    lower: Math.max(0, share - root((part) => part.share - part.lower)),
    upper: Math.min(1, share + root((part) => part.upper - part.share)),
  };
}
