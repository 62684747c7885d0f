import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { RUN_RULES, rulesCompletedAt, type RunRule } from './run-rules.js';

const at = (deviations: readonly number[], index = deviations.length - 1) => rulesCompletedAt(deviations, index);

/** The rules once more, written out window by window. */
function slowly(z: readonly number[], i: number): RunRule[] {
  const found = new Set<RunRule>();
  for (const side of [1, -1]) {
    const s = (k: number) => (z[k] ?? 0) * side;
    const count = (window: number, sigmas: number) => [...Array(window).keys()].filter((k) => i - k >= 0 && s(i - k) > sigmas).length;
    if (s(i) > 3) found.add('one-beyond-3-sigma');
    if (s(i) > 2 && count(3, 2) > 1) found.add('two-of-three-beyond-2-sigma');
    if (s(i) > 1 && count(5, 1) > 3) found.add('four-of-five-beyond-1-sigma');
    if (count(8, 0) === 8) found.add('eight-on-one-side');
    if (i >= 5 && [0, 1, 2, 3, 4].every((k) => s(i - k) > s(i - k - 1))) found.add(side === 1 ? 'six-rising' : 'six-falling');
  }
  return RUN_RULES.map((r) => r.rule).filter((rule) => found.has(rule));
}

describe('Run rules', () => {
  it('one point beyond 3 sigma speaks, one on the line does not', () => {
    expect(at([3.01])).toEqual(['one-beyond-3-sigma']);
    expect(at([-3.01])).toEqual(['one-beyond-3-sigma']);
    expect(at([3])).toEqual([]);
  });
  it('2 of 3 beyond 2 sigma counts one side only', () => {
    expect(at([2.1, 0, 2.2])).toEqual(['two-of-three-beyond-2-sigma']);
    expect(at([2.1, 0, -2.2])).toEqual([]);
    expect(at([2.1, 0, 0, 2.2])).toEqual([]);
  });
  it('2 of 3 is not said again by a point that is back inside', () => {
    expect(at([2.1, 2.2, 0.5])).toEqual([]);
  });
  it('4 of 5 beyond 1 sigma counts one side only', () => {
    expect(at([1.1, 1.2, 0, 1.3, 1.4])).toEqual(['four-of-five-beyond-1-sigma']);
    expect(at([1.1, 1.2, 0, -1.3, -1.4])).toEqual([]);
    expect(at([1.1, 1.2, 1, 1, 1.4])).toEqual([]);
  });
  it('8 in a row on one side, and a point on the centre line ends the run', () => {
    const run = [0.5, 0.2, 0.4, 0.1, 0.3, 0.6, 0.2, 0.4];
    expect(at(run)).toEqual(['eight-on-one-side']);
    expect(at(run.map((z) => -z))).toEqual(['eight-on-one-side']);
    expect(at(run.slice(1))).toEqual([]);
    expect(at([...run.slice(0, 4), 0, ...run.slice(5)])).toEqual([]);
  });
  it('6 in a row rising or falling, and two equal neighbours end it', () => {
    const rising = [-0.5, -0.3, -0.1, 0.1, 0.3, 0.5];
    expect(at(rising)).toEqual(['six-rising']);
    expect(at([...rising].reverse())).toEqual(['six-falling']);
    expect(at(rising.slice(1))).toEqual([]);
    expect(at([-0.5, -0.3, -0.1, -0.1, 0.3, 0.5])).toEqual([]);
    expect(at([-0.5, -0.4, -0.3, -0.2, -0.1, 0])).toEqual(['six-rising']);
  });
  it('say the same as a slow count of every window', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -8, max: 8 }), { minLength: 1, maxLength: 20 }), (halves) => {
        const z = halves.map((h) => h / 2);
        z.forEach((_, i) => expect(rulesCompletedAt(z, i)).toEqual(slowly(z, i)));
      }),
    );
  });
  it('look back only: what comes later changes nothing', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -4, max: 4, noNaN: true }), { minLength: 9, maxLength: 20 }), (z) => {
        expect(rulesCompletedAt(z, 8)).toEqual(rulesCompletedAt(z.slice(0, 9), 8));
      }),
    );
  });
  it('each names its source and how far that was checked', () => {
    for (const rule of RUN_RULES) {
      expect(rule.source).toMatch(/NIST\/SEMATECH/);
      expect(rule.standing).toMatch(/read|from memory/);
    }
  });
});
