/** A source of even numbers from 0 up to 1 that gives the same run for the same seed. */
export interface Chance {
  next: () => number;
  /** A whole number from 0 up to, and without, `n`. */
  below: (n: number) => number;
  /** The list in an order of chance; the list given stays as it was. */
  shuffled: <T>(list: readonly T[]) => T[];
}

/** Chance from a whole-number seed: Weyl steps by the golden ratio, mixed with the finisher of MurmurHash3 (public domain; from memory). */
export function chanceOf(seed: number): Chance {
  let state = seed | 0;
  const next = (): number => {
    state = (state + 0x9e3779b9) | 0;
    let mixed = state ^ (state >>> 16);
    mixed = Math.imul(mixed, 0x85ebca6b);
    mixed ^= mixed >>> 13;
    mixed = Math.imul(mixed, 0xc2b2ae35);
    mixed ^= mixed >>> 16;
    return (mixed >>> 0) / 2 ** 32;
  };
  const below = (n: number): number => Math.floor(next() * n);
  return {
    next,
    below,
    shuffled: (list) => {
      const result = [...list];
      for (let i = result.length - 1; i > 0; i--) {
        const j = below(i + 1);
        [result[i], result[j]] = [result[j]!, result[i]!];
      }
      return result;
    },
  };
}
