import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combineCorrelated, combineUncorrelated } from './combined-uncertainty.js';
import { compareWithMonteCarlo } from './compare-with-monte-carlo.js';
import { scoreCorrelation } from './correlated-scores.js';
import { standardOfInput, type InputDistribution } from './input-distribution.js';
import { propagateDistributions } from './monte-carlo.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { seededUniform } from './seeded-uniform.js';

const normal = (estimate: number, standardUncertainty: number): InputDistribution => ({ kind: 'normal', estimate, standardUncertainty });
const rectangular = (estimate: number, halfWidth: number): InputDistribution => ({ kind: 'rectangular', estimate, halfWidth });
const arcsine = (estimate: number, halfWidth: number): InputDistribution => ({ kind: 'arcsine', estimate, halfWidth });
const sum = (x: readonly number[]) => x.reduce((total, value) => total + value, 0);
const near = (value: number, wanted: number, slack: number) => expect(Math.abs(value - wanted), `${value} against ${wanted}`).toBeLessThan(slack);
const many = { trials: 400_000 };

describe('The worked cases of JCGM 101 (all from memory; those marked are computed again)', () => {
  // JCGM 101 clause 9.2.2: four normal inputs of 1: u 2.0, interval ±3.92 (computed: 1.96 × 2).
  it('9.2.2: four normal inputs of 1 make 2.0, and 3.92 to either side', () => {
    const drawn = propagateDistributions([0, 0, 0, 0].map((x) => normal(x, 1)), sum, seededUniform(101), many);
    near(drawn.estimate, 0, 0.015);
    near(drawn.standardUncertainty, 2, 0.01);
    near(drawn.symmetric.low, -3.92, 0.05);
    near(drawn.symmetric.high, 3.92, 0.05);
    expect(compareWithMonteCarlo({ estimate: 0, standardUncertainty: 2, expandedUncertainty: 3.92 }, drawn).agrees).toBe(true);
  });
  // JCGM 101 clause 9.2.3: four rectangular inputs of standard uncertainty 1: u 2.0, interval ±3.88.
  it('9.2.3: four rectangular inputs of 1 make 2.0, but only 3.88 to either side', () => {
    const drawn = propagateDistributions(Array.from({ length: 4 }, () => rectangular(0, Math.sqrt(3))), sum, seededUniform(923), { trials: 1_000_000 });
    near(drawn.standardUncertainty, 2, 0.006);
    near(drawn.symmetric.low, -3.88, 0.02);
    near(drawn.symmetric.high, 3.88, 0.02);
  });
  // JCGM 101 clause 9.2.4: one of them 10 times as wide: the law of propagation says ±19.9 (1.96 × 10.1, computed), the distributions ±17.0.
  it('9.2.4: one wide rectangular input: 19.9 by the law of propagation, 17.0 in truth, and the law is not to be trusted', () => {
    const inputs = [rectangular(0, Math.sqrt(3)), rectangular(0, Math.sqrt(3)), rectangular(0, Math.sqrt(3)), rectangular(0, 10 * Math.sqrt(3))];
    const u = combineUncorrelated(inputs.map((input) => ({ sensitivity: 1, standardUncertainty: standardOfInput(input) })));
    near(u, 10.1, 0.05);
    const drawn = propagateDistributions(inputs, sum, seededUniform(924), many);
    near(drawn.symmetric.low, -17, 0.06);
    near(drawn.symmetric.high, 17, 0.06);
    expect(compareWithMonteCarlo({ estimate: 0, standardUncertainty: u, expandedUncertainty: 1.96 * u }, drawn).agrees).toBe(false);
  });
  // JCGM 101 clause 9.3, mass calibration: 1.2341 mg, u 0.0754, interval 1.0834 to 1.3825; first-order law: u 0.0539, 1.1285 to 1.3395.
  it('9.3: a weight in air: the law of propagation leaves out what the densities do together', () => {
    const inputs = [normal(100_000, 0.05), normal(1.234, 0.02), rectangular(1.2, 0.1), rectangular(8000, 1000), rectangular(8000, 50)];
    const drawn = propagateDistributions(
      inputs,
      ([standard = 0, small = 0, air = 0, weight = 1, reference = 1]) => (standard + small) * (1 + (air - 1.2) * (1 / weight - 1 / reference)) - 100_000,
      seededUniform(93),
      many,
    );
    near(drawn.estimate, 1.2341, 0.0006);
    near(drawn.standardUncertainty, 0.0754, 0.0005);
    near(drawn.shortest.low, 1.0834, 0.004);
    near(drawn.shortest.high, 1.3825, 0.004);
    const first = compareWithMonteCarlo({ estimate: 1.234, standardUncertainty: 0.0539, expandedUncertainty: 0.1055 }, drawn, 1);
    expect(first).toMatchObject({ agrees: false, tolerance: 0.005 });
  });
  // JCGM 101 clause 9.4, comparison loss of a power meter, Y = X₁² + X₂², u 0.005 each; shortest intervals in 10⁻⁶.
  // Uncorrelated rows computed again as 25·χ² with scipy 1.17: up to 149.8, up to 366.0, from 1594 to 3549. The ends of a shortest
  // interval wander where the distribution is flat; its width does not.
  it.each([
    [0, 0, 50, 50, 0, 150], [0, 0.9, 50, 67, 0, 185], [0.01, 0, 150, 112, 0, 367], [0.05, 0, 2550, 502, 1590, 3543],
  ])('9.4: squares of an input at %d with correlation %d: mean %d, u %d, from %d to %d', (x1, r, mean, u, low, high) => {
    const drawn = propagateDistributions([normal(x1, 0.005), normal(0, 0.005)], ([a = 0, b = 0]) => 1e6 * (a * a + b * b), seededUniform(94), {
      ...many,
      correlation: [[1, r], [r, 1]],
    });
    near(drawn.estimate, mean, 1 + mean * 0.005);
    near(drawn.standardUncertainty, u, 1 + u * 0.01);
    near(drawn.shortest.low, low, 2 + low * 0.02);
    near(drawn.shortest.high, high, 3 + high * 0.01);
    near((drawn.shortest.high - drawn.shortest.low) / (high - low), 1, 0.01);
    expect(drawn.shortest.high - drawn.shortest.low).toBeLessThanOrEqual(drawn.symmetric.high - drawn.symmetric.low);
  });
});

describe('Correlated inputs', () => {
  it.each<[InputDistribution, InputDistribution, number]>([
    [normal(0, 1), normal(0, 1), 0.7], [rectangular(0, 1), rectangular(0, 1), 0.8], [arcsine(0, 1), arcsine(0, 1), -0.6], [normal(0, 1), rectangular(0, 1), 0.9],
    [arcsine(0, 1), rectangular(0, 1), 0.5], [rectangular(0, 1), rectangular(0, 1), 1], [arcsine(0, 1), arcsine(0, 1), -1],
  ])('%j with %j are correlated by %d as asked, and agree with the law of propagation', (a, b, r) => {
    const correlation = [[1, r], [r, 1]];
    const drawn = propagateDistributions([a, b], ([x = 0, y = 0]) => x + 2 * y, seededUniform(5), { trials: 120_000, correlation });
    const law = combineCorrelated([{ sensitivity: 1, standardUncertainty: standardOfInput(a) }, { sensitivity: 2, standardUncertainty: standardOfInput(b) }], correlation);
    expect(Math.abs(drawn.standardUncertainty / law - 1)).toBeLessThan(0.012);
  });
  it('one meter used twice cancels in a difference', () => {
    const drawn = propagateDistributions([normal(5, 1), normal(5, 1)], ([a = 0, b = 0]) => a - b, seededUniform(1), { trials: 1000, correlation: [[1, 1], [1, 1]] });
    expect(drawn.standardUncertainty).toBeLessThan(1e-9);
  });
  // Computed in closed form: two rectangular inputs need 2·sin(π·r/6), a normal and a rectangular one r·√(π/3).
  it('the scores behind rectangular inputs have the known closed form', () => {
    for (const r of [0.1, 0.5, 0.9, 0.99]) {
      expect(scoreCorrelation('rectangular', 'rectangular', r)).toBeCloseTo(2 * Math.sin((Math.PI * r) / 6), 5);
      if (r < 0.97) expect(scoreCorrelation('normal', 'rectangular', -r)).toBeCloseTo(-r * Math.sqrt(Math.PI / 3), 5);
    }
  });
  it('refuses correlations that cannot be', () => {
    const run = (inputs: InputDistribution[], correlation: number[][]) => () => propagateDistributions(inputs, sum, seededUniform(1), { trials: 1000, correlation });
    const three = [normal(0, 1), normal(0, 1), normal(0, 1)];
    expect(run(three, [[1, -1, -1], [-1, 1, -1], [-1, -1, 1]])).toThrow(/contradict/);
    expect(run(three, [[1, 1, 1], [1, 1, 0], [1, 0, 1]])).toThrow(/contradict/);
    expect(run([normal(0, 1), normal(0, 1)], [[1, 0.5], [0.4, 1]])).toThrow(OutOfRangeError);
    expect(run([normal(0, 1), normal(0, 1)], [[1, NaN], [NaN, 1]])).toThrow(OutOfRangeError);
    expect(run([normal(0, 1)], [])).toThrow(/one row and one column/);
    expect(run([normal(0, 1), arcsine(0, 1)], [[1, 0.999], [0.999, 1]])).toThrow(/cannot be correlated/);
  });
});

describe('What holds for every drawing', () => {
  it('the same seed gives the same answer', () => {
    const run = (seed: number) => propagateDistributions([normal(1, 0.1), arcsine(2, 0.2)], sum, seededUniform(seed), { trials: 1000 });
    expect(run(42)).toEqual(run(42));
    expect(run(43)).not.toEqual(run(42));
  });
  it('the mean lies inside, a wider share needs a wider interval, and the shortest is never wider than the symmetric', () => {
    const kind = fc.constantFrom(normal, rectangular, arcsine);
    fc.assert(
      fc.property(kind, fc.double({ min: -100, max: 100, noNaN: true }), fc.double({ min: 1e-3, max: 10, noNaN: true }), fc.nat(1e6), (of, estimate, width, seed) => {
        const run = (probability: number) => propagateDistributions([of(estimate, width)], (x) => x[0]!, seededUniform(seed), { trials: 2000, probability });
        const [half, most] = [run(0.5), run(0.95)];
        expect(most.symmetric.low).toBeLessThan(half.symmetric.low);
        expect(most.symmetric.high).toBeGreaterThan(half.symmetric.high);
        expect(most.shortest.high - most.shortest.low).toBeLessThanOrEqual(most.symmetric.high - most.symmetric.low);
        expect(most.estimate).toBeGreaterThan(most.symmetric.low);
        expect(most.estimate).toBeLessThan(most.symmetric.high);
        if (of !== normal) expect(Math.max(most.symmetric.high - estimate, estimate - most.symmetric.low)).toBeLessThanOrEqual(width * 1.001);
      }),
      { numRuns: 40 },
    );
  });
  it('an input without width stays where it is', () => {
    const drawn = propagateDistributions([normal(3, 0), rectangular(4, 0)], sum, seededUniform(1), { trials: 1000 });
    expect(drawn).toMatchObject({ estimate: 7, standardUncertainty: 0, symmetric: { low: 7, high: 7 } });
  });
  it('refuses what cannot be', () => {
    const u = seededUniform(1);
    expect(() => propagateDistributions([normal(0, -1)], sum, u)).toThrow(OutOfRangeError);
    expect(() => propagateDistributions([rectangular(NaN, 1)], sum, u)).toThrow(OutOfRangeError);
    expect(() => propagateDistributions([normal(0, 1)], sum, u, { trials: 999 })).toThrow(OutOfRangeError);
    expect(() => propagateDistributions([normal(0, 1)], sum, u, { probability: 1 })).toThrow(OutOfRangeError);
    expect(() => propagateDistributions([normal(0, 1)], ([x = 0]) => Math.log(x), u, { trials: 1000 })).toThrow(/no number/);
  });
});

describe('The law of propagation beside the drawing', () => {
  const drawn = { symmetric: { low: -1, high: 1 } };
  it('is measured by half a unit in the last digit of the uncertainty that is meant', () => {
    const of = (standardUncertainty: number, digits?: 1 | 2) => compareWithMonteCarlo({ estimate: 0, standardUncertainty, expandedUncertainty: 1 }, drawn, digits).tolerance;
    expect(of(2)).toBeCloseTo(0.05, 12);
    expect(of(0.0539, 1)).toBeCloseTo(0.005, 12);
    expect(of(0.0996, 1)).toBeCloseTo(0.05, 12);
    expect(of(0.00035)).toBeCloseTo(5e-6, 15);
  });
  it('refuses an uncertainty of nothing', () => {
    expect(() => compareWithMonteCarlo({ estimate: 0, standardUncertainty: 0, expandedUncertainty: 1 }, drawn)).toThrow(OutOfRangeError);
    expect(() => compareWithMonteCarlo({ estimate: NaN, standardUncertainty: 1, expandedUncertainty: 1 }, drawn)).toThrow(OutOfRangeError);
    expect(() => compareWithMonteCarlo({ estimate: 0, standardUncertainty: 1, expandedUncertainty: -1 }, drawn)).toThrow(OutOfRangeError);
  });
});
