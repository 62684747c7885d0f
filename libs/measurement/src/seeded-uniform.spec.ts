import { describe, expect, it } from 'vitest';
import { OutOfRangeError } from './out-of-range-error.js';
import { seededUniform, xoshiro128 } from './seeded-uniform.js';

describe('Random numbers that a seed fixes', () => {
  // Source: published sequence of xoshiro128** from the state 1, 2, 3, 4, as the tests of public implementations quote it.
  it('follow the published sequence', () => {
    const next = xoshiro128([1, 2, 3, 4]);
    expect(Array.from({ length: 10 }, next)).toEqual([11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804]);
  });
  it('lie from 0 to 1, evenly, without leaning on the one before', () => {
    for (const seed of [0, 1, 2, 4294967295]) {
      const next = seededUniform(seed);
      const drawn = Array.from({ length: 50_000 }, next);
      expect(Math.min(...drawn.slice(0, 10_000))).toBeGreaterThanOrEqual(0);
      expect(Math.max(...drawn.slice(0, 10_000))).toBeLessThan(1);
      const tenths = Array.from({ length: 10 }, (_, i) => drawn.filter((u) => Math.floor(u * 10) === i).length);
      // chi-squared with 9 degrees of freedom: beyond 27.9 once in a thousand
      expect(tenths.reduce((sum, count) => sum + (count - 5000) ** 2 / 5000, 0)).toBeLessThan(27.9);
      const together = drawn.slice(1).reduce((sum, u, i) => sum + (u - 0.5) * (drawn[i]! - 0.5), 0) / drawn.length;
      expect(Math.abs(together * 12)).toBeLessThan(0.02);
    }
  });
  it('differ from seed to seed, also between neighbours', () => {
    const first = Array.from({ length: 500 }, (_, seed) => seededUniform(seed)());
    expect(new Set(first).size).toBe(500);
  });
  it('need a whole seed', () => {
    for (const bad of [-1, 1.5, NaN, 2 ** 32]) expect(() => seededUniform(bad)).toThrow(OutOfRangeError);
  });
});
