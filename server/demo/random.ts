/**
 * A seeded generator for the invented workshops: the same seed and name give the
 * same draws on every machine, and each named stream is independent of the others,
 * so that a new question asked of one batch does not change all batches after it.
 */
export interface Random {
  /** A number in 0..1, 1 excluded. */
  unit(): number;
  chance(probability: number): boolean;
  normal(mean: number, deviation: number): number;
  between(lower: number, upper: number): number;
  /** A whole number in lower..upper, both included. */
  whole(lower: number, upper: number): number;
  binomial(n: number, probability: number): number;
  pick<T>(from: readonly T[]): T;
  /** Picks by weight; weights need not sum to 1. */
  weighted<T>(from: readonly (readonly [T, number])[]): T;
  shuffle<T>(from: readonly T[]): T[];
}

/** Cuts a value to a range. */
export function within(value: number, lower: number, upper: number): number {
  return Math.min(upper, Math.max(lower, value));
}

/** Probability whose log-odds are given. */
export function logistic(logit: number): number {
  return 1 / (1 + Math.exp(-logit));
}

/**
 * @param seed whole number that fixes the workshop
 * @param name names of the stream, such as `('inputs', 'QL-0042')`
 *
 * Source: xoshiro128**, D. Blackman and S. Vigna (2018), seeded by a string hash.
 */
export function randomOf(seed: number, ...name: readonly (string | number)[]): Random {
  const next = xoshiro(hash(`${seed}/${name.join('/')}`));
  const unit = () => next() / 4_294_967_296;
  const random: Random = {
    unit,
    chance: (probability) => unit() < probability,
    normal: (mean, deviation) => mean + deviation * Math.sqrt(-2 * Math.log(1 - unit())) * Math.cos(2 * Math.PI * unit()),
    between: (lower, upper) => lower + (upper - lower) * unit(),
    whole: (lower, upper) => lower + Math.floor(unit() * (upper - lower + 1)),
    binomial: (n, probability) => Array.from({ length: n }, () => unit() < probability).filter(Boolean).length,
    pick: (from) => {
      const picked = from[Math.floor(unit() * from.length)];
      if (picked === undefined) throw new RangeError('pick: nothing to pick from');
      return picked;
    },
    weighted: (from) => {
      let left = unit() * from.reduce((sum, [, weight]) => sum + weight, 0);
      for (const [value, weight] of from) {
        left -= weight;
        if (left < 0) return value;
      }
      const last = from.at(-1);
      if (!last) throw new RangeError('weighted: nothing to pick from');
      return last[0];
    },
    shuffle: (from) => {
      const shuffled = [...from];
      for (let i = shuffled.length - 1; i > 0; i -= 1) {
        const j = Math.floor(unit() * (i + 1));
        const held = shuffled[i] as (typeof shuffled)[number];
        shuffled[i] = shuffled[j] as (typeof shuffled)[number];
        shuffled[j] = held;
      }
      return shuffled;
    },
  };
  return random;
}

/** Four words from a text, FNV-1a with a different start for each. */
function hash(text: string): [number, number, number, number] {
  const word = (start: number): number => {
    let h = start;
    for (let i = 0; i < text.length; i += 1) h = Math.imul(h ^ text.charCodeAt(i), 16_777_619);
    h ^= h >>> 16;
    h = Math.imul(h, 0x85ebca6b);
    h ^= h >>> 13;
    return h >>> 0;
  };
  return [word(2_166_136_261), word(0x9e3779b9), word(0x7f4a7c15), word(0x51ed270b)];
}

function xoshiro([a, b, c, d]: [number, number, number, number]): () => number {
  const turn = (x: number, k: number) => (x << k) | (x >>> (32 - k));
  return () => {
    const result = Math.imul(turn(Math.imul(b, 5), 7), 9) >>> 0;
    const t = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= t;
    d = turn(d, 11);
    return result;
  };
}
