/** A stream of numbers in 0 ≤ x < 1 that its seed decides. */
export interface Random {
  readonly seed: number;
  next(): number;
}

/**
 * Seeded generator of uniform numbers; the same seed gives the same stream on every machine.
 *
 * @param seed an integer in 0..2³²−1
 * @throws RangeError for any other seed
 *
 * Source: mulberry32, a published 32-bit mixer (T. Ettinger; public domain). Good for shuffles and simulation, never for secrets.
 */
export function randomFrom(seed: number): Random {
  if (!Number.isInteger(seed) || seed < 0 || seed > 0xffff_ffff) throw new RangeError(`randomFrom: seed must be an integer in 0..4294967295, got ${seed}`);
  let state = seed >>> 0;
  return {
    seed,
    next() {
      state = (state + 0x6d2b79f5) >>> 0;
      let mixed = Math.imul(state ^ (state >>> 15), state | 1);
      mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
      return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
    },
  };
}

/** A standard normal draw (Box and Muller, Ann. Math. Stat. 29 (1958) 610); uses two numbers of the stream. */
export function normalDraw(random: Random): number {
  const radius = Math.sqrt(-2 * Math.log(1 - random.next()));
  return radius * Math.cos(2 * Math.PI * random.next());
}

/** A new array in drawn order (Fisher and Yates); the given one stays as it is. */
export function shuffled<T>(values: readonly T[], random: Random): T[] {
  const out = [...values];
  for (let last = out.length - 1; last > 0; last--) {
    const pick = Math.floor(random.next() * (last + 1));
    [out[last], out[pick]] = [out[pick] as T, out[last] as T];
  }
  return out;
}
