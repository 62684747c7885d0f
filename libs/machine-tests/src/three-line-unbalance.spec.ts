import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { negativeSequenceFraction, spreadFraction, unbalanceFraction } from './index.js';

type Arrow = readonly [re: number, im: number];
/** Line volts of a positive sequence of 1 and a negative one of `share`, turned by `angle`: put together as arrows. */
function lineVolts(share: number, angle: number): [number, number, number] {
  const turn = (2 * Math.PI) / 3;
  const line = (k: number): Arrow => [Math.cos(-k * turn) + share * Math.cos(k * turn + angle), Math.sin(-k * turn) + share * Math.sin(k * turn + angle)];
  return [0, 1, 2].map((k) => 400 * Math.hypot(...line(k))) as [number, number, number];
}

describe('Three definitions of unbalance, kept apart', () => {
  // computed: 1.040 % from the mean, 1.951 % of spread
  it('0.512, 0.508 and 0.518 Ω spread by 1.951 %, although they are 1.040 % from their mean', () => {
    expect(spreadFraction([0.512, 0.508, 0.518])).toBeCloseTo(0.01951, 5);
    expect(unbalanceFraction([0.512, 0.508, 0.518])).toBeCloseTo(0.0104, 5);
  });
  it('the spread lies between one and two times the deviation from the mean', () => {
    const x = fc.double({ min: 0.5, max: 2, noNaN: true });
    fc.assert(
      fc.property(x, x, x, (a, b, c) => {
        const u = unbalanceFraction([a, b, c]);
        expect(spreadFraction([a, b, c])).toBeGreaterThanOrEqual(u - 1e-12);
        expect(spreadFraction([a, b, c])).toBeLessThanOrEqual(2 * u + 1e-12);
      }),
    );
  });
  it('the sequences that line volts are put together from are found again', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.5, noNaN: true }), fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }), (share, angle) => {
        expect(negativeSequenceFraction(lineVolts(share, angle))).toBeCloseTo(share, 6);
      }),
    );
  });
  it('400, 400 and 400 V are balanced by all three', () => {
    expect([unbalanceFraction([400, 400, 400]), spreadFraction([400, 400, 400]), negativeSequenceFraction([400, 400, 400])]).toEqual([0, 0, 0]);
  });
  it.each([[[0, 400, 400]], [[NaN, 400, 400]], [[100, 100, 200]], [[100, 100, 400]]] as [[number, number, number]][])('%j V are no line volts', (volts) => {
    expect(() => negativeSequenceFraction(volts)).toThrow(/volts/);
  });
  it.each([[[1]], [[1, 0]], [[1, NaN, 1]]])('a spread of %j is refused', (values) => expect(() => spreadFraction(values)).toThrow(/all three/));
});
