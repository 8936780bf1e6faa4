/** Random numbers that come out the same for the same seed (mulberry32, public domain), so that a failing history can be run again. */
export interface Seeded {
  /** A number from 0 (included) to 1 (left out). */
  next(): number;
  below(limit: number): number;
  pick<T>(list: readonly T[]): T;
  chance(share: number): boolean;
  id(): string;
}

export function seeded(seed: number): Seeded {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const below = (limit: number) => Math.floor(next() * limit);
  const hex = (digits: number) => Array.from({ length: digits }, () => below(16).toString(16)).join('');
  return {
    next,
    below,
    pick: (list) => list[below(list.length)],
    chance: (share) => next() < share,
    id: () => `${hex(8)}-${hex(4)}-4${hex(3)}-8${hex(3)}-${hex(12)}`,
  };
}
