import { describe, expect, it } from 'vitest';
import { DEFAULT_MACHINE_TEST_LIMITS as LIMITS, FINAL_TEST_PARTS, evaluateFinalTest, finalTestProblems, type FinalTestReadings, type MachineTest, type TestJudgement } from './index.js';
import { finalTest, insulation } from './quarry-motor.fixture.js';

const of = (judgements: TestJudgement[], test: MachineTest) => judgements.find((j) => j.test === test);
const part = <K extends keyof FinalTestReadings>(key: K, more: Partial<NonNullable<FinalTestReadings[K]>>): FinalTestReadings => ({ ...finalTest, [key]: { ...(finalTest[key] as object), ...more } });
const verdictOf = (test: MachineTest, readings: FinalTestReadings) => of(evaluateFinalTest(readings).judgements, test)!.verdict;

// The readings are the sample shop's quarry motor: constructed, not measured.
describe('The quarry motor leaves the shop', () => {
  const result = evaluateFinalTest(finalTest, LIMITS, FINAL_TEST_PARTS);
  it('every part conforms and nothing is missing', () => {
    expect(result.judgements.map((j) => [j.test, j.verdict])).toEqual(
      ['insulation-resistance', 'insulation-new-winding', 'winding-resistance-balance', 'high-potential', 'surge-difference', 'no-load-current-balance', 'vibration', 'direction', 'bearing-rise', 'core-loss'].map((t) => [t, 'conforms']),
    );
    expect(result).toMatchObject({ calculation: 'machine-tests/1', verdict: 'conforms', missing: [], notDone: [], warnings: [] });
  });
  it('the limits are the ones on its paper', () => {
    const limit = (test: MachineTest) => of(result.judgements, test)!.limit;
    expect([limit('insulation-resistance'), limit('winding-resistance-balance'), limit('high-potential'), limit('surge-difference'), limit('no-load-current-balance'), limit('vibration'), limit('bearing-rise')]).toEqual([5e6, 0.02, 1800, 0.1, 0.05, 2.8e-3, 45]);
  });
  it('of 3960 W at no load 278 W are the winding, 3682 W the rest', () => {
    expect(result.derived.noLoad!.atRated!.windingLossW).toBeCloseTo(278, 0);
    expect(result.derived.noLoad!.atRated!.constantLossW).toBeCloseTo(3682, 0);
    expect(result.derived.noLoad!.separation).toBeNull();
  });
  it('the bearings rise by 38 K, the drive end more', () => {
    expect(result.derived.bearings).toEqual({ riseK: 38, warmer: 'drive-end', stable: true });
  });
  it('every judgement says where its limit comes from', () => {
    for (const j of result.judgements) {
      expect(j.source.length).toBeGreaterThan(10);
      expect(['S', 'P', 'C']).toContain(j.standing);
      expect(j.words).toMatch(/\.$/);
    }
  });
});

describe('A demanded part that is missing', () => {
  const nothing: FinalTestReadings = { insulation, windingResistance: null, highPotential: null, noLoad: null, vibration: null, directionRight: null, bearings: null, core: null };
  it('makes the whole not valid and is named', () => {
    expect(evaluateFinalTest(nothing, LIMITS, ['insulation', 'no-load', 'core'])).toMatchObject({ verdict: 'not-valid', missing: ['no-load', 'core'] });
  });
  it('undemanded, it is only named as not done', () => {
    expect(evaluateFinalTest(nothing)).toMatchObject({ verdict: 'conforms', missing: [], notDone: FINAL_TEST_PARTS.filter((p) => p !== 'insulation') });
  });
  it('a core test without a verdict counts as missing', () => {
    expect(evaluateFinalTest({ ...finalTest, core: { wattsPerKg: 3, verdict: null } }, LIMITS, ['core']).missing).toEqual(['core']);
  });
});

describe('High potential', () => {
  it('is refused where the insulation resistance did not pass', () => {
    const wet = part('insulation', { resistanceOhm: 4.9e6, windingTemperatureC: 40 });
    expect(finalTestProblems(wet)).toMatchObject([{ path: 'highPotential', code: 'insulation-first' }]);
    expect(() => evaluateFinalTest(wet)).toThrow(/no high-potential test/);
    expect(evaluateFinalTest({ ...wet, highPotential: null }).verdict).toBe('does-not-conform');
  });
  it.each([
    [{ held: false }, 'does-not-conform'],
    [{ held: false, appliedVoltsV: 900 }, 'does-not-conform'],
    [{ appliedVoltsV: 1799.5 }, 'conforms'],
    [{ appliedVoltsV: 1799 }, 'not-valid'],
    [{ seconds: 59 }, 'not-valid'],
    [{ case: 'repeat', appliedVoltsV: 1440 }, 'conforms'],
    [{ supply: 'dc', appliedVoltsV: 1800 }, 'not-valid'],
    [{ supply: 'dc', appliedVoltsV: 3060 }, 'conforms'],
  ] as const)('%j: %s', (more, verdict) => expect(verdictOf('high-potential', part('highPotential', more))).toBe(verdict));
  it('a digit too many is asked about, not passed over in silence', () => {
    expect(evaluateFinalTest(part('highPotential', { appliedVoltsV: 18_000 })).warnings).toMatchObject([{ path: 'highPotential.appliedVoltsV', code: 'over-level' }]);
    expect(evaluateFinalTest(part('highPotential', { appliedVoltsV: 1900 })).warnings).toEqual([]);
  });
  it('an old winding that was only cleaned is not asked for 100 MΩ', () => {
    const cleaned = { ...part('highPotential', { case: 'reconditioned', appliedVoltsV: 1170 }), insulation: { ...insulation, resistanceOhm: 40e6, windingTemperatureC: 40 } };
    expect(evaluateFinalTest(cleaned).verdict).toBe('conforms');
  });
});

describe('No-load run', () => {
  const run = (voltsV: [number, number, number], ampsA: [number, number, number]) => part('noLoad', { points: [{ voltsV, ampsA, wattsW: 3960 }] });
  it.each([
    [[400, 400, 400], [100, 100, 107.5], 'conforms'],
    [[400, 400, 400], [100, 100, 108], 'does-not-conform'],
    [[400, 400, 410], [118, 118, 118], 'not-valid'],
    [[380, 380, 380], [118, 118, 118], 'not-valid'],
  ] as [[number, number, number], [number, number, number], string][])('volts %j, amperes %j: %s', (volts, amps, verdict) => {
    expect(verdictOf('no-load-current-balance', run(volts, amps))).toBe(verdict);
  });
  it('a rotor winding under test does not set the volts of the stator', () => {
    const crane = { ...finalTest, insulation: { ...insulation, ratedVoltageV: 205 } };
    expect(verdictOf('no-load-current-balance', crane)).toBe('not-valid');
    expect(verdictOf('no-load-current-balance', { ...crane, noLoad: { ...finalTest.noLoad!, ratedVoltageV: 400 } })).toBe('conforms');
  });
  it('low points on no sensible line warn instead of giving a loss', () => {
    const at = (v: number, wattsW: number) => ({ voltsV: [v, v, v] as [number, number, number], ampsA: [30, 30, 30] as [number, number, number], wattsW });
    const falling = evaluateFinalTest(part('noLoad', { points: [at(400, 3960), at(200, 900), at(160, 1000), at(120, 1100)] }));
    expect(falling.derived.noLoad!.separation).toBeNull();
    expect(falling.warnings).toMatchObject([{ path: 'noLoad.points', code: 'separation' }]);
  });
});

describe('Running', () => {
  it.each([[2.8e-3, 'conforms'], [2.81e-3, 'does-not-conform']])('the worst point of %d m/s: %s', (worst, verdict) => {
    expect(verdictOf('vibration', part('vibration', { velocitiesMPerS: [0.5e-3, worst] }))).toBe(verdict);
  });
  it.each([
    [{ driveEndC: 69 }, 'conforms'], [{ driveEndC: 69.1 }, 'does-not-conform'], [{ driveEndC: 74, poles: 2 }, 'conforms'], [{ nonDriveEndC: 75, poles: 2 }, 'does-not-conform'],
    [{ changeInHalfHourK: 2 }, 'conforms'], [{ changeInHalfHourK: 2.1 }, 'not-valid'], [{ changeInHalfHourK: -3 }, 'not-valid'],
  ] as const)('bearings %j: %s', (more, verdict) => expect(verdictOf('bearing-rise', part('bearings', more))).toBe(verdict));
  it('the wrong direction fails', () => expect(evaluateFinalTest({ ...finalTest, directionRight: false }).verdict).toBe('does-not-conform'));
  it('a core that did not conform is carried into the final test', () => {
    expect(evaluateFinalTest({ ...finalTest, core: { wattsPerKg: 5.1, verdict: 'does-not-conform' } }).verdict).toBe('does-not-conform');
  });
});

describe('A reading that cannot be is named', () => {
  const point = finalTest.noLoad!.points[0]!;
  it.each<[FinalTestReadings, string]>([
    [part('highPotential', { appliedVoltsV: NaN }), 'highPotential.appliedVoltsV'],
    [part('highPotential', { seconds: 0 }), 'highPotential.seconds'],
    [part('highPotential', { ratedVoltageV: -1 }), 'highPotential.ratedVoltageV'],
    [part('highPotential', { case: 'wound-rotor' }), 'highPotential.secondaryVoltsV'],
    [part('noLoad', { points: [] }), 'noLoad.points'],
    [part('noLoad', { points: [point, { ...point, wattsW: 200 }] }), 'noLoad.points.1.wattsW'],
    [part('noLoad', { points: [{ ...point, ampsA: [1, NaN, 1] }] }), 'noLoad.points.0.ampsA'],
    [part('noLoad', { lineResistanceOhm: 0 }), 'noLoad.lineResistanceOhm'],
    [part('noLoad', { frequencyHz: NaN }), 'noLoad.frequencyHz'],
    [part('noLoad', { speedRpm: 0 }), 'noLoad.speedRpm'],
    [part('noLoad', { ratedVoltageV: NaN }), 'noLoad.ratedVoltageV'],
    [part('vibration', { velocitiesMPerS: [] }), 'vibration.velocitiesMPerS'],
    [part('vibration', { velocitiesMPerS: [0.001, -0.001] }), 'vibration.velocitiesMPerS.1'],
    [part('vibration', { shaftHeightM: null }), 'vibration.shaftHeightM'],
    [part('bearings', { ambientC: NaN }), 'bearings.ambientC'],
    [part('bearings', { changeInHalfHourK: NaN }), 'bearings.changeInHalfHourK'],
    [part('bearings', { poles: 3 }), 'bearings.poles'],
    [{ ...finalTest, surgeDifferenceFraction: NaN }, 'surgeDifferenceFraction'],
  ])('reading %# is named by its box', (readings, path) => {
    expect(finalTestProblems(readings).map((p) => p.path)).toEqual([path]);
    expect(() => evaluateFinalTest(readings)).toThrow();
  });
  it('the quarry motor has no problems', () => expect(finalTestProblems(finalTest)).toEqual([]));
});
