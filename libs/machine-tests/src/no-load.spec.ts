import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeNoLoadLevel, noLoadLosses, noLoadSeparation, type NoLoadPoint } from './index.js';

const at = (v: number, a: number, wattsW: number): NoLoadPoint => ({ voltsV: [v, v, v], ampsA: [a, a, a], wattsW });

/** Constructed, not measured: a 400 V motor with 0.60 Ω between leads. */
const RUN = [
  [440, 14.2, 784.7, 181.48, 603.22], [400, 11, 618.9, 108.9, 510], [380, 9.9, 566, 88.21, 477.79], [360, 9, 520.2, 72.9, 447.3],
  [240, 5.6, 327, 28.22, 298.78], [200, 4.7, 282.4, 19.88, 262.52], [160, 3.9, 246.5, 13.69, 232.81], [120, 3.3, 219.5, 9.8, 209.7],
] as const;
const points = RUN.map(([v, a, w]) => at(v, a, w));

// Source: method of IEEE 112-2004 clause 5.5; the figures are a constructed set, computed.
describe('No-load losses taken apart', () => {
  it.each(RUN)('%d V, %d A, %d W: %d W in the winding, %d W constant', (v, a, w, winding, constant) => {
    const losses = noLoadLosses(at(v, a, w), 0.6);
    expect(losses.windingLossW).toBeCloseTo(winding, 1);
    expect(losses.constantLossW).toBeCloseTo(constant, 1);
  });
  it('the line through 120 to 240 V meets no volts at 180.02 W; 329.98 W at 400 V is core', () => {
    const s = noLoadSeparation(points, 0.6, 400);
    expect(s.pointsInFit).toBe(4);
    expect(s.slopeWPerV2).toBeCloseTo(2.062e-3, 7);
    expect(s.frictionAndWindageW).toBeCloseTo(180.02, 2);
    expect(s.coreLossW).toBeCloseTo(329.98, 2);
  });
  it('without a point at rated volts the core loss stays unknown', () => {
    expect(noLoadSeparation(points.slice(4), 0.6, 400).coreLossW).toBeNull();
  });
  it('a motor built with known losses gives them back', () => {
    const watts = fc.double({ min: 10, max: 5000, noNaN: true });
    fc.assert(
      fc.property(watts, watts, fc.double({ min: 0.01, max: 2, noNaN: true }), (friction, core, ohm) => {
        const run = [400, 220, 170, 120].map((v) => at(v, v / 40, friction + core * (v / 400) ** 2 + 1.5 * ohm * (v / 40) ** 2));
        const s = noLoadSeparation(run, ohm, 400);
        expect(s.frictionAndWindageW / friction).toBeCloseTo(1, 6);
        expect(s.coreLossW! / core).toBeCloseTo(1, 6);
      }),
    );
  });
  it('needs three different low points', () => {
    expect(() => noLoadSeparation(points.slice(0, 6), 0.6, 400)).toThrow(/three points/);
    expect(() => noLoadSeparation([points[4]!, points[4]!, points[4]!], 0.6, 400)).toThrow(/three points/);
    expect(() => noLoadSeparation(points, 0.6, NaN)).toThrow(/rated volts/);
  });
  it.each<[NoLoadPoint, number, RegExp]>([
    [at(400, 11, 108), 0.6, /winding alone/], [at(400, 11, 0), 0.6, /watts/], [at(NaN, 11, 600), 0.6, /volts/], [at(400, 0, 600), 0.6, /amperes/], [at(400, 11, 600), 0, /resistance/],
  ])('a reading that cannot be is named', (point, ohm, words) => expect(() => noLoadLosses(point, ohm)).toThrow(words));
});

// Source: common practice, 10 % either way.
describe('No-load current against an earlier one', () => {
  it.each([[110, 'conforms'], [90, 'conforms'], [110.1, 'inconclusive'], [89.9, 'inconclusive']])('%d A against 100 A: %s', (amps, verdict) => {
    expect(judgeNoLoadLevel(amps, 100).verdict).toBe(verdict);
  });
  it.each([[0, 100], [100, 0], [NaN, 100]])('refuses %d against %d A', (a, b) => expect(() => judgeNoLoadLevel(a, b)).toThrow(/no-load current/));
});
