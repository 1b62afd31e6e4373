/**
 * A seeded source of chance for the demo association: the same seed gives the same people on every machine.
 *
 * Mulberry32 (T. Ettinger, public domain), from memory: 32 bits of state, enough for demo data and nothing else.
 */
export interface Chance {
  /** A number in [0, 1). */
  next(): number;
  /** A whole number from `low` to `high`, both included. */
  between(low: number, high: number): number;
  /** True with the given probability. */
  happens(probability: number): boolean;
  /** One item of a list that is not empty. */
  pick<T>(items: readonly T[]): T;
  /** One item, by weight. */
  pickWeighted<T>(items: readonly (readonly [item: T, weight: number])[]): T;
  /** Up to `count` different items, in random order. */
  sample<T>(items: readonly T[], count: number): T[];
  /** A copy in random order (Fisher–Yates). */
  shuffle<T>(items: readonly T[]): T[];
  /** A source of its own for a named purpose: what one part draws never shifts another. */
  fork(purpose: string): Chance;
}

/** FNV-1a, 32 bits. */
export function hashText(text: string, start = 0x811c9dc5): number {
  let hash = start >>> 0;
  for (let index = 0; index < text.length; index++) {
    hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193) >>> 0;
  }
  return hash;
}

/** A source of chance for a seed. */
export function chance(seed: number): Chance {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
  const between = (low: number, high: number): number => low + Math.floor(next() * (high - low + 1));
  const shuffle = <T>(items: readonly T[]): T[] => {
    const copy = [...items];
    for (let last = copy.length - 1; last > 0; last--) {
      const other = between(0, last);
      [copy[last], copy[other]] = [copy[other] as T, copy[last] as T];
    }
    return copy;
  };
  return {
    next,
    between,
    happens: (probability) => next() < probability,
    pick: <T>(items: readonly T[]): T => items[Math.floor(next() * items.length)] as T,
    pickWeighted: <T>(items: readonly (readonly [T, number])[]): T => {
      let left = next() * items.reduce((sum, [, weight]) => sum + weight, 0);
      for (const [item, weight] of items) {
        left -= weight;
        if (left < 0) return item;
      }
      return (items.at(-1) as readonly [T, number])[0];
    },
    sample: (items, count) => shuffle(items).slice(0, count),
    shuffle,
    fork: (purpose) => chance(hashText(purpose, hashText(String(seed)))),
  };
}
