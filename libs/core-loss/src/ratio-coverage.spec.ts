import { propagateDistributions, seededUniform, standardOfInput, type InputDistribution } from '@libs/measurement';
import { describe, expect, it } from 'vitest';
import { deriveGeometry } from './core-geometry.js';
import { DEFAULT_READING_UNCERTAINTY, FLUX_EXPONENT, FLUX_EXPONENT_HALF_WIDTH, lossUncertaintyRel, ratioUncertaintyRel, type ReadingUncertainty, type UncertainReading } from './reading-uncertainty.js';
import { reduceReading, referLoss, type RingReading } from './ring-reading.js';
import { SAMPLE_CORES, sampleInput, type SampleCore } from './sample-cores.fixture.js';

/**
 * A world in which the true loss is known: the readings of a sample core are taken as true, meters and size err as the statement
 * says, and each pair of wrong readings goes through the reduction as it would in the bay. Counted is how often the stated
 * interval holds the truth.
 */
const TARGET = 1.32;
const normal = (standardUncertainty: number): InputDistribution => ({ kind: 'normal', estimate: 0, standardUncertainty });
const rectangular = (halfWidth: number): InputDistribution => ({ kind: 'rectangular', estimate: 0, halfWidth });

interface World {
  core: SampleCore;
  u: ReadingUncertainty;
  sameVoltmeter: boolean;
  /** The true flux of the after test over that of the before test. */
  fluxShift: number;
  phase: InputDistribution;
}

/** Every error that can be made, in this order. */
const errorsOf = ({ u, sameVoltmeter, phase }: World): InputDistribution[] => [
  normal(u.voltsRel), sameVoltmeter ? normal(0) : normal(u.voltsRel), normal(u.wattsRel), phase, normal(u.areaRel), normal(u.stackingRel), normal(u.massRel),
  rectangular(FLUX_EXPONENT_HALF_WIDTH),
  normal(u.voltsRepeatRel), normal(u.wattsRepeatRel), normal(u.frequencyRel),
  normal(u.voltsRepeatRel), normal(u.wattsRepeatRel), normal(u.frequencyRel),
];

/** Watts a meter with phase error δ shows over the true ones. */
const phaseFactor = (powerFactor: number, delta: number) => Math.cos(Math.acos(powerFactor) - delta) / powerFactor;

function world(w: World) {
  const geometry = deriveGeometry(SAMPLE_CORES[w.core]);
  const first = sampleInput(w.core, 'before').reading;
  const last = sampleInput(w.core, 'after').reading;
  const truth = (reading: RingReading) => reduceReading(reading, geometry);
  // the after test stands at its own true flux: its volts and, by the true exponent, its watts
  const trueExponent = (slack: number) => FLUX_EXPONENT + slack;
  return {
    errors: errorsOf(w),
    run(e: readonly number[]): { before: UncertainReading; after: UncertainReading; ratio: number; trueRatio: number; loss: number; trueLoss: number } {
      const [gainBefore = 0, gainOther = 0, gainWatts = 0, delta = 0, area = 0, stacking = 0, mass = 0, slack = 0, v1 = 0, w1 = 0, f1 = 0, v2 = 0, w2 = 0, f2 = 0] = e;
      const n = trueExponent(slack);
      const shifted: RingReading = { ...last, searchVoltsV: last.searchVoltsV * w.fluxShift, wattsW: last.wattsW * w.fluxShift ** n };
      const [a, b] = [truth(first), truth(shifted)];
      const measured = { ...geometry, areaM2: geometry.areaM2 * (1 + area) * (1 + stacking), massKg: geometry.massKg * (1 + area) * (1 + stacking) * (1 + mass) };
      const read = (reading: RingReading, gain: number, volts: number, watts: number, frequency: number, powerFactor: number): UncertainReading => {
        const wrong: RingReading = {
          ...reading,
          searchVoltsV: reading.searchVoltsV * (1 + gain) * (1 + volts),
          wattsW: reading.wattsW * (1 + gainWatts) * (1 + watts) * phaseFactor(powerFactor, delta),
          frequencyHz: reading.frequencyHz * (1 + frequency),
        };
        return { reading: wrong, reduced: reduceReading(wrong, measured) };
      };
      const before = read(first, gainBefore, v1, w1, f1, a.powerFactor);
      const after = read(shifted, w.sameVoltmeter ? gainBefore : gainOther, v2, w2, f2, b.powerFactor);
      const referred = (test: UncertainReading) => referLoss(test.reduced.wattsPerKg, test.reduced.fluxDensityT, TARGET);
      const trueAt = (test: { wattsPerKg: number; fluxDensityT: number }) => test.wattsPerKg * (TARGET / test.fluxDensityT) ** n;
      return { before, after, ratio: referred(after) / referred(before), trueRatio: trueAt(b) / trueAt(a), loss: referred(before), trueLoss: trueAt(a) };
    },
  };
}

const degree = Math.PI / 180;
const usual = DEFAULT_READING_UNCERTAINTY;
const sharp: ReadingUncertainty = { ...usual, voltsRepeatRel: 0.001, wattsRepeatRel: 0.002, phaseErrorRad: degree / Math.sqrt(3) };
const SCENARIOS: [string, World, number][] = [
  ['one set of meters for both tests', { core: 12, u: usual, sameVoltmeter: true, fluxShift: 0.97, phase: normal(usual.phaseErrorRad) }, 0.97],
  ['another voltmeter in the second test', { core: 12, u: usual, sameVoltmeter: false, fluxShift: 1.02, phase: normal(usual.phaseErrorRad) }, 0.97],
  // the wattmeter's phase is known as a limit of ± 1 degree only, on the core whose power factor rises from 0.21 to 0.34
  ['the phase error of the wattmeter, known as a limit only, outweighs all else', { core: 2, u: sharp, sameVoltmeter: true, fluxShift: 1, phase: rectangular(degree) }, 1],
];

describe('The stated interval of after over before holds the truth as often as it says', () => {
  it.each(SCENARIOS)('%s: at least 94 of 100', (_words, w, most) => {
    const { errors, run } = world(w);
    const held = propagateDistributions(
      errors,
      (e) => {
        const { before, after, ratio, trueRatio } = run(e);
        return Math.abs(ratio - trueRatio) <= 2 * ratioUncertaintyRel(before, after, w.u, w.sameVoltmeter) * ratio ? 1 : 0;
      },
      seededUniform(12),
      { trials: 20_000 },
    ).estimate;
    expect(held).toBeGreaterThanOrEqual(0.94);
    expect(held).toBeLessThanOrEqual(most);
  });
  it.each(SCENARIOS)('%s: the uncertainty agrees with drawing every error', (_words, w) => {
    const { errors, run } = world(w);
    const drawn = propagateDistributions(errors, (e) => { const r = run(e); return Math.log(r.ratio / r.trueRatio); }, seededUniform(3), { trials: 20_000 });
    const still = run(errors.map(() => 0));
    expect(Math.abs(drawn.standardUncertainty / ratioUncertaintyRel(still.before, still.after, w.u, w.sameVoltmeter) - 1)).toBeLessThan(0.05);
    expect(Math.abs(drawn.estimate)).toBeLessThan(0.1 * drawn.standardUncertainty);
  });
  it('an interval of one standard uncertainty holds it far less often: the count can fail', () => {
    const w = SCENARIOS[0]![1];
    const { errors, run } = world(w);
    const held = propagateDistributions(errors, (e) => { const { before, after, ratio, trueRatio } = run(e); return Math.abs(ratio - trueRatio) <= ratioUncertaintyRel(before, after, w.u) * ratio ? 1 : 0; }, seededUniform(12), { trials: 10_000 }).estimate;
    expect(held).toBeGreaterThan(0.65);
    expect(held).toBeLessThan(0.72);
  });
});

describe('The stated interval of W/kg alone', () => {
  it('holds the truth at least 94 times of 100', () => {
    const w = SCENARIOS[0]![1];
    const { errors, run } = world(w);
    const held = propagateDistributions(errors, (e) => { const { before, loss, trueLoss } = run(e); return Math.abs(loss - trueLoss) <= 2 * lossUncertaintyRel(before, TARGET, w.u) * loss ? 1 : 0; }, seededUniform(8), { trials: 10_000 }).estimate;
    expect(held).toBeGreaterThanOrEqual(0.94);
    expect(standardOfInput(errors[7]!)).toBeCloseTo(usual.exponent, 12);
  });
});
