import { wilsonInterval } from './wilson-interval.ts';
import type { ShareInterval } from './wilson-interval.ts';

/** A difference of two shares with its interval, all in −1..1. */
export interface DifferenceInterval {
  difference: number;
  lower: number;
  upper: number;
}

/**
 * Joins two separate intervals into one for the difference of their shares.
 *
 * @param one the share the other is taken from
 * @param other the share that is taken away
 *
 * Source: hybrid score method, R. G. Newcombe, Stat. Med. 17 (1998) 873–890, method 10;
 * for other intervals than Wilson's, G. Y. Zou and A. Donner, Stat. Med. 27 (2008) 1693.
 */
export function differenceOf(one: ShareInterval, other: ShareInterval): DifferenceInterval {
  const difference = one.share - other.share;
  return {
    difference,
    lower: Math.max(-1, difference - Math.hypot(one.share - one.lower, other.upper - other.share)),
    upper: Math.min(1, difference + Math.hypot(one.upper - one.share, other.share - other.lower)),
  };
}

/**
 * How much more often a fault is found in one group than in another, with a 95 % interval.
 *
 * @param events1 found in the first group, an integer in 0..n1
 * @param n1 checked in the first group, an integer ≥ 1
 * @param events0 found in the second group, an integer in 0..n0
 * @param n0 checked in the second group, an integer ≥ 1
 * @throws RangeError as wilsonInterval does
 *
 * Source: R. G. Newcombe, Stat. Med. 17 (1998) 873–890, method 10.
 */
export function newcombeDifference(events1: number, n1: number, events0: number, n0: number): DifferenceInterval {
  return differenceOf(wilsonInterval(events1, n1), wilsonInterval(events0, n0));
}
