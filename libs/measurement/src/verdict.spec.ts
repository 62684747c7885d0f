import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OutOfRangeError } from './out-of-range-error.js';
import { VERDICTS, gateOutcome, judgeLowerLimit, judgeRange, judgeUpperLimit, worstOf, type Verdict } from './verdict.js';

describe('A result is judged with its uncertainty', () => {
  // Source: decision rule of ISO 14253-1 (conformity when y ≤ USL − U, nonconformity when y ≥ USL + U, else neither).
  it.each<[number, number, number, Verdict]>([
    [0.1, 0.024, 0.2, 'conforms'],
    [0.176, 0.024, 0.2, 'conforms'],
    [0.1761, 0.024, 0.2, 'inconclusive'],
    [0.186, 0.024, 0.2, 'inconclusive'],
    [0.2, 0.024, 0.2, 'inconclusive'],
    [0.2239, 0.024, 0.2, 'inconclusive'],
    [0.224, 0.024, 0.2, 'does-not-conform'],
    [0.612, 0.024, 0.2, 'does-not-conform'],
    [-0.05, 0.024, 0.2, 'conforms'],
  ])('%d ± %d against at most %d: %s', (measured, uncertainty, limit, verdict) => {
    expect(judgeUpperLimit(measured, uncertainty, limit)).toBe(verdict);
  });
  it('a result exactly at the limit conforms when nothing is uncertain', () => {
    expect(judgeUpperLimit(10, 0, 10)).toBe('conforms');
    expect(judgeLowerLimit(10, 0, 10)).toBe('conforms');
    expect(judgeRange(10, 0, 10, 10)).toBe('conforms');
    expect(judgeUpperLimit(10.000001, 0, 10)).toBe('does-not-conform');
    expect(judgeLowerLimit(9.999999, 0, 10)).toBe('does-not-conform');
  });
  it('decimals that binary cannot write still meet at the limit', () => {
    expect(judgeUpperLimit(0.1 + 0.2, 0, 0.3)).toBe('conforms');
    expect(judgeUpperLimit(17.6, 2.4, 20)).toBe('conforms');
    expect(judgeUpperLimit(0.7, 0.1, 0.8)).toBe('conforms');
  });
  it('a lower limit is the mirror of an upper one', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.double({ min: 0, max: 1e3, noNaN: true }), fc.double({ min: -1e6, max: 1e6, noNaN: true }), (y, u, limit) => {
        expect(judgeLowerLimit(y, u, limit)).toBe(judgeUpperLimit(-y, u, -limit));
      }),
    );
  });
  it('a larger result never gets a better verdict against an upper limit', () => {
    fc.assert(
      fc.property(fc.double({ min: -10, max: 10, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), (y, more, u) => {
        expect(VERDICTS.indexOf(judgeUpperLimit(y + more, u, 1))).toBeGreaterThanOrEqual(VERDICTS.indexOf(judgeUpperLimit(y, u, 1)));
      }),
    );
  });
  it('a result that is not a number is not valid, and never conforms', () => {
    for (const bad of [NaN, Infinity, -Infinity]) {
      expect(judgeUpperLimit(bad, 0.1, 1)).toBe('not-valid');
      expect(judgeLowerLimit(bad, 0.1, 1)).toBe('not-valid');
      expect(judgeRange(bad, 0.1, 0, 1)).toBe('not-valid');
      if (bad !== -Infinity) expect(judgeUpperLimit(0.5, bad, 1)).toBe('not-valid');
    }
  });
  it('limits that make no sense are refused', () => {
    expect(() => judgeUpperLimit(1, 0, NaN)).toThrow(OutOfRangeError);
    expect(() => judgeLowerLimit(1, 0, Infinity)).toThrow(OutOfRangeError);
    expect(() => judgeUpperLimit(1, -0.1, 2)).toThrow(OutOfRangeError);
    expect(() => judgeRange(1, 0, 2, 1)).toThrow(/above the upper/);
  });
  it('two limits: below, within, near either edge, above', () => {
    expect(judgeRange(14.4, 0.5, 12.5, 16.3)).toBe('conforms');
    expect(judgeRange(12.6, 0.5, 12.5, 16.3)).toBe('inconclusive');
    expect(judgeRange(16.1, 0.5, 12.5, 16.3)).toBe('inconclusive');
    expect(judgeRange(11.9, 0.5, 12.5, 16.3)).toBe('does-not-conform');
    expect(judgeRange(17, 0.5, 12.5, 16.3)).toBe('does-not-conform');
  });
});

describe('The decision rule moves the gate, never the verdict', () => {
  it.each([
    ['conforms', 'open', 'open', 'open'],
    ['inconclusive', 'ask', 'open', 'closed'],
    ['does-not-conform', 'closed', 'closed', 'closed'],
    ['not-valid', 'closed', 'closed', 'closed'],
  ] as const)('%s: ask %s, accept %s, refuse %s', (verdict, ask, accept, refuse) => {
    expect([gateOutcome(verdict, 'ask'), gateOutcome(verdict, 'accept'), gateOutcome(verdict, 'refuse')]).toEqual([ask, accept, refuse]);
  });
});

describe('Several verdicts on one core', () => {
  it('the worst speaks, and not valid is worst of all', () => {
    expect(worstOf(['conforms'])).toBe('conforms');
    expect(worstOf(['conforms', 'inconclusive', 'conforms'])).toBe('inconclusive');
    expect(worstOf(['does-not-conform', 'inconclusive'])).toBe('does-not-conform');
    expect(worstOf(['does-not-conform', 'not-valid', 'conforms'])).toBe('not-valid');
  });
  it('nothing judged is no verdict', () => {
    expect(() => worstOf([])).toThrow(OutOfRangeError);
  });
});
