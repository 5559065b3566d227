import { describe, expect, it } from 'vitest';
import { createRandom } from './random';

describe('the seeded generator', () => {
  it('tells the same story for the same seed and another for another', () => {
    const story = (seed: number) => {
      const random = createRandom(seed);
      return [random.whole(1, 1e6), random.uuid(), random.shuffled(['a', 'b', 'c', 'd', 'e', 'f']).join('')];
    };
    expect(story(7)).toEqual(story(7));
    expect(story(8)).not.toEqual(story(7));
  });

  it('stays within its limits, reaches both, and spreads evenly', () => {
    const random = createRandom(20);
    const counts = new Map<number, number>();
    for (let index = 0; index < 6000; index += 1) {
      const value = random.whole(1, 6);
      counts.set(value, (counts.get(value) ?? 0) + 1);
    }
    expect([...counts.keys()].sort()).toEqual([1, 2, 3, 4, 5, 6]);
    for (const count of counts.values()) expect(Math.abs(count - 1000)).toBeLessThan(150);
  });

  it('makes version 4 UUIDs that do not repeat', () => {
    const random = createRandom(3);
    const ids = Array.from({ length: 2000 }, () => random.uuid());
    expect(new Set(ids).size).toBe(2000);
    for (const id of ids) expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  });
});
