import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createDecimatedCurve } from './decimated-curve.js';

function curveOf(readings: readonly (readonly [number, number])[]) {
  const curve = createDecimatedCurve(1);
  for (const [t, c] of readings) curve.add(t, c);
  return curve.points();
}

describe('The curve for drawing', () => {
  it('keeps every reading of a short file', () => {
    expect(curveOf([[0, 20], [1, 21], [2, 22]])).toEqual([{ seconds: 0, celsius: 20 }, { seconds: 1, celsius: 21 }, { seconds: 2, celsius: 22 }]);
  });
  it('keeps one short peak in a hundred thousand readings, in 2000 points at most', () => {
    const points = curveOf(Array.from({ length: 100_000 }, (_, t) => [t, t === 61_803 ? 446 : 300 + (t % 7)] as const));
    expect(points.length).toBeLessThanOrEqual(2000);
    expect(points.length).toBeGreaterThan(900);
    expect(points).toContainEqual({ seconds: 61_803, celsius: 446 });
  });
  it('gives a late reading its place', () => {
    expect(curveOf([[0, 20], [5, 25], [9, 29], [3, 99]]).map((p) => p.seconds)).toEqual([0, 3, 5, 9]);
  });
  it('keeps highest and lowest, stays in order, and is the same backwards', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: -1e6, max: 1e6 }), fc.integer({ min: 0, max: 500 })), { minLength: 1, maxLength: 3000 }), (raw) => {
        const readings = [...new Map(raw).entries()].sort((a, b) => a[0] - b[0]);
        const points = curveOf(readings);
        expect(points.length).toBeLessThanOrEqual(2000);
        expect(Math.max(...points.map((p) => p.celsius))).toBe(Math.max(...readings.map((r) => r[1])));
        expect(Math.min(...points.map((p) => p.celsius))).toBe(Math.min(...readings.map((r) => r[1])));
        expect(points.every((p, i) => i === 0 || p.seconds > points[i - 1]!.seconds)).toBe(true);
        expect(curveOf([...readings].reverse())).toEqual(points);
      }),
      { numRuns: 30 },
    );
  });
});
