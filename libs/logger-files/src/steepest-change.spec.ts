import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OutOfRangeError } from './out-of-range-error.js';
import { createSteepestChange } from './steepest-change.js';

const rates = (readings: readonly (readonly [number, number])[], spanS = 600) => {
  const change = createSteepestChange(spanS);
  for (const [t, c] of readings) change.add(t, c);
  return change.result();
};
const every = (stepS: number, count: number, c: (t: number) => number) => Array.from({ length: count }, (_, i) => [i * stepS, c(i * stepS)] as const);

describe('The steepest change', () => {
  it('of a straight rise is its slope: 80 K/h', () => {
    expect(rates(every(10, 400, (t) => 20 + (80 * t) / 3600))!.heatingKPerH).toBeCloseTo(80, 8);
    expect(rates(every(10, 400, (t) => 20 + (80 * t) / 3600))!.coolingKPerH).toBe(0);
  });
  it('does not count the last digit: 1 s readings that flicker by 0.1 K are no 360 K/h', () => {
    const flicker = rates(every(1, 3600, (t) => 20 + (t % 2) / 10))!;
    expect(flicker.heatingKPerH).toBeLessThan(0.1);
  });
  it('finds the steep part and the fall after it', () => {
    const found = rates(every(30, 400, (t) => (t < 3600 ? 20 : t < 7200 ? 20 + (t - 3600) / 12 : 320 - (t - 7200) / 36)))!;
    expect(found.heatingKPerH).toBeCloseTo(300, 6);
    expect(found.coolingKPerH).toBeCloseTo(100, 6);
  });
  it('of a slow logger is read from reading to reading', () => {
    expect(rates(every(900, 4, (t) => t / 36))!.heatingKPerH).toBeCloseTo(100, 8);
  });
  it('is not told where the readings end too soon', () => {
    expect(rates(every(10, 50, () => 20))).toBeNull();
    expect(rates([])).toBeNull();
  });
  it('is not taken across a gap', () => {
    const change = createSteepestChange(600);
    for (const [t, c] of every(60, 20, () => 20)) change.add(t, c);
    change.interrupt();
    for (const [t, c] of every(60, 20, () => 300)) change.add(t + 5000, c);
    expect(change.result()).toEqual({ heatingKPerH: 0, coolingKPerH: 0 });
  });
  it('is the same backwards', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: 1, max: 500 }), fc.integer({ min: 0, max: 400 })), { minLength: 2, maxLength: 40 }), (steps) => {
        let t = 0;
        const readings = steps.map(([step, c]) => [(t += step), c] as const);
        const [there, back] = [rates(readings), rates([...readings].reverse())];
        expect(back === null).toBe(there === null);
        if (there && back) {
          expect(back.heatingKPerH).toBeCloseTo(there.heatingKPerH, 6);
          expect(back.coolingKPerH).toBeCloseTo(there.coolingKPerH, 6);
        }
      }),
    );
  });
  it('refuses a span of nothing', () => {
    for (const span of [0, -1, NaN, Infinity]) expect(() => createSteepestChange(span)).toThrow(OutOfRangeError);
  });
});
