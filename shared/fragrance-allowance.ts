import type { MethodFamily } from './words/methods.ts';

/** Share of its mass that a bar is expected to lose in the cure. */
export const CURE_LOSS: Record<MethodFamily, number> = { cold: 0.11, hot: 0.07, rebatch: 0.07 };

export interface Scent {
  /** Grams of this lot in the batch. */
  massG: number;
  /** The certificate's maximum for rinse-off products, as a fraction of the finished bar. */
  maximum: number;
}

export interface FragranceInBar {
  /** All fragrance as a fraction of the finished bar. */
  fraction: number;
  /** Sum over the lots of their fraction of the finished bar by their maximum; at most 1 is allowed. */
  used: number;
  /** Grams that would be allowed in all, kept in the same proportions. */
  largestG: number;
}

/**
 * How much fragrance the finished bar holds against the certificates. The maximum is a share of the finished
 * product, not of the oils, and the bar dries, so the reckoning uses the mass after cook and cure. Two lots
 * may hold the same restricted substance, so their parts of their maxima are added.
 *
 * @param scents each fragrance lot; at least one, maxima above 0
 * @param restG everything else that went in: fats, alkali, all liquids, colour, additives; grams
 * @param keeps what is left of the charged mass after cook loss and cure loss, 0..1
 *
 * Source: category 9 maxima of fragrance certificates are given in % w/w of the finished product.
 */
export function fragranceInBar(scents: readonly Scent[], restG: number, keeps: number): FragranceInBar {
  const massG = scents.reduce((sum, scent) => sum + scent.massG, 0);
  const finishedG = (massG + restG) * keeps;
  const used = scents.reduce((sum, scent) => sum + scent.massG / finishedG / scent.maximum, 0);
  // The one maximum that this blend as a whole has: its lots' maxima, harmonically by mass.
  const blendMaximum = massG / scents.reduce((sum, scent) => sum + scent.massG / scent.maximum, 0);
  const kept = blendMaximum * keeps;
  return { fraction: massG / finishedG, used, largestG: (kept * restG) / (1 - kept) };
}
