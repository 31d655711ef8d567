/**
 * The false discovery rate at which each question would be named, with weights
 * fixed beforehand (q values).
 *
 * Benjamini and Hochberg's step-up on p·mean(w)/w: a question weighed 4 is believed
 * more easily, at the price of the others, and the rate over all holds.
 *
 * @param p one p value a question, each in 0..1; empty gives an empty answer
 * @param weights one weight > 0 a question, `weights[i]` belongs to `p[i]`; all 1 when absent
 * @returns q[i] belongs to p[i], never below p·mean(w)/w, never above 1
 * @throws RangeError when a p lies outside 0..1, a weight is not positive, or the lengths differ
 *
 * Source: Y. Benjamini and Y. Hochberg, J. R. Stat. Soc. B 57 (1995) 289; weights C. Genovese, K. Roeder and
 * L. Wasserman, Biometrika 93 (2006) 509. Cost: O(n log n).
 */
export function falseDiscoveryRates(p: readonly number[], weights?: readonly number[]): number[] {
  const n = p.length;
  if (weights && weights.length !== n) throw new RangeError(`falseDiscoveryRates: ${n} p values but ${weights.length} weights`);
  for (const value of p) if (!(value >= 0 && value <= 1)) throw new RangeError(`falseDiscoveryRates: p must lie in 0..1, got ${value}`);
  for (const weight of weights ?? []) if (!(weight > 0)) throw new RangeError(`falseDiscoveryRates: weights must be above 0, got ${weight}`);
  const mean = weights ? weights.reduce((sum, weight) => sum + weight, 0) / n : 1;
  const weighted = p.map((value, i) => (value * mean) / (weights?.[i] ?? 1));
  const order = weighted.map((_, i) => i).sort((a, b) => weighted[a]! - weighted[b]! || a - b);
  const q = new Array<number>(n).fill(1);
  let least = 1;
  for (let rank = n; rank >= 1; rank--) {
    const at = order[rank - 1]!;
    least = Math.min(least, (weighted[at]! * n) / rank);
    q[at] = least;
  }
  return q;
}
