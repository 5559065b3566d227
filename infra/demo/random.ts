export interface Random {
  /** From 0 up to but not including 1. */
  next(): number;
  between(min: number, max: number): number;
  /** A whole number, both ends included. */
  whole(min: number, max: number): number;
  chance(probability: number): boolean;
  pick<T>(list: readonly T[]): T;
  shuffled<T>(list: readonly T[]): T[];
  uuid(): string;
}

/** A small seeded generator (mulberry32), so that the same seed tells the same story. */
export function createRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const whole = (min: number, max: number) => min + Math.floor(next() * (max - min + 1));
  return {
    next,
    whole,
    between: (min, max) => min + next() * (max - min),
    chance: (probability) => next() < probability,
    pick: (list) => {
      const item = list[whole(0, list.length - 1)];
      if (item === undefined) throw new RangeError('Nothing to pick from');
      return item;
    },
    shuffled: (list) =>
      list
        .map((item) => ({ item, key: next() }))
        .sort((a, b) => a.key - b.key)
        .map(({ item }) => item),
    uuid: () => uuidFrom(Array.from({ length: 16 }, () => whole(0, 255))),
  };
}

/** Sixteen bytes written as a version 4 UUID. */
function uuidFrom(bytes: number[]): string {
  const marked = bytes.map((byte, index) => {
    if (index === 6) return (byte & 0x0f) | 0x40;
    return index === 8 ? (byte & 0x3f) | 0x80 : byte;
  });
  const hex = marked.map((byte) => byte.toString(16).padStart(2, '0')).join('');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
