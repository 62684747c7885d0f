import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { backIronFluxDensity, checkWinding, dcFluxPerPole, windingCheckProblems, type WindingCheckInput } from './index.js';
import { SAMPLE_ROTOR, sampleCheck, sampleWinding } from './sample-windings.fixture.js';

/** Machine, k_w, turns a phase, flux mWb, gap peak T, back iron T, A/mm², ohm between leads at 20 °C, copper kg. */
const CROSS_CHECK = [
  [1, 0.9236, 36, 52.53, 0.835, 1.465, 4.16, 0.0131, 70.2],
  [2, 0.9099, 55, 34.9, 0.86, 1.423, 4.36, 0.0364, 37.9],
  [3, 0.8666, 60, 33.59, 0.649, 1.437, 4.2, 0.0711, 28.4],
  [6, 0.925, 128, 140.53, 0.827, 1.455, 4.1, 0.2622, 367.4],
  [7, 0.925, 72, 26.22, 0.795, 1.438, 5.06, 0.0589, 34.5],
  [8, 0.9659, 380, 2.75, 0.862, 1.361, 6.33, 21.1115, 1.3],
  [9, 0.9099, 65, 28.3, 0.88, 1.472, 5.0, 0.062, 24.9],
  [10, 0.9577, 176, 10.36, 0.787, 1.426, 5.54, 0.7502, 8.3],
  [12, 0.925, 96, 19.67, 0.82, 1.426, 5.48, 0.1523, 17.6],
] as const;

/** The card prints mean turns to the millimetre and nameplates to three digits: what follows from them agrees to that and half its last digit. */
const MEAN_TURN = 0.5 / 456;
const NAMEPLATE = 0.003;
const agrees = (value: number, printed: number, halfDigit: number, relative: number) => Math.abs(value - printed) <= halfDigit + relative * printed;

describe('the windings of the sample shop', () => {
  it.each(CROSS_CHECK)('machine %i comes out as on its winding card', (machine, kw, turns, fluxMWb, gapT, backIronT, density, ohm, copper) => {
    const check = checkWinding(sampleCheck(machine));
    expect(check.factors.winding).toBeCloseTo(kw, 4);
    expect(check.turnsPerPhase).toBe(turns);
    expect(check.fluxPerPoleWb * 1000).toBeCloseTo(fluxMWb, 2);
    expect(check.gapPeakT).toBeCloseTo(gapT, 3);
    expect(check.operatingBackIronT).toBeCloseTo(backIronT, 3);
    expect(agrees(check.currentDensityAPerM2! / 1e6, density, 0.005, NAMEPLATE)).toBe(true);
    expect(agrees(check.resistance!.lineToLineOhm, ohm, 0.00005, MEAN_TURN)).toBe(true);
    expect(agrees(check.copperKg!, copper, 0.05, MEAN_TURN)).toBe(true);
    expect(check.flags.filter((f) => f.is !== 'usual')).toEqual([]);
    expect(check.missing).toEqual(['Measure the narrowest tooth: its flux density follows from it.']);
  });
  it('the slip-ring rotor comes out as on its winding card, and its deep back iron is flagged as lightly worked', () => {
    const check = checkWinding(SAMPLE_ROTOR);
    expect(check.factors.winding).toBeCloseTo(0.9598, 4);
    expect(check.fluxPerPoleWb * 1000).toBeCloseTo(30.84, 2);
    expect(check.gapPeakT).toBeCloseTo(0.765, 3);
    expect(check.operatingBackIronT).toBeCloseTo(0.823, 3);
    expect(check.currentDensityAPerM2! / 1e6).toBeCloseTo(5.03, 2);
    expect(check.flags.filter((f) => f.is !== 'usual').map((f) => [f.place, f.is])).toEqual([['backIronT', 'low']]);
  });
  it('the mill armature runs at 1.451 T in its back iron', () => {
    const flux = dcFluxPerPole({ inducedVoltsV: 420, conductors: 368, paths: 4, poles: 4, speedRpm: 1500 });
    expect(flux * 1000).toBeCloseTo(45.65, 2);
    expect(backIronFluxDensity(flux, 0.015732)).toBeCloseTo(1.451, 3);
  });
});

describe('checking a winding', () => {
  const input = sampleCheck(12);
  it('says what is wanted for each figure it cannot tell', () => {
    const check = checkWinding({ winding: { ...sampleWinding(12), meanTurnM: null }, lineVoltsV: 400, frequencyHz: 50 });
    expect(check.missing).toHaveLength(3);
    expect(check).not.toHaveProperty('operatingBackIronT');
    expect(check).not.toHaveProperty('resistance');
    expect(check).not.toHaveProperty('currentDensityAPerM2');
  });
  it('works out the tooth once its width is measured, and flags a starved one', () => {
    const core = { ...input.core!, toothWidthM: 0.0065 };
    const check = checkWinding({ ...input, core });
    // by hand: 0.820 T × 14.268 mm × 220 / (6.5 mm × 209)
    expect(check.toothT).toBeCloseTo(1.895, 2);
    expect(check.flags.find((f) => f.place === 'statorToothT')?.is).toBe('high');
    expect(check.flags.find((f) => f.place === 'statorToothT')?.words).toMatch(/Count turns, circuits and connection again/);
  });
  it('flags a miscounted winding: half the turns drive the back iron far over what is usual', () => {
    const check = checkWinding({ ...input, winding: { ...input.winding, turnsPerCoil: 6 } });
    expect(check.flags.map((f) => f.is)).toEqual(['high', 'high', 'high']);
  });
  it('carries the resistance to the temperature it is measured at', () => {
    const at = (temperatureC: number) => checkWinding({ ...input, temperatureC }).resistance!.lineToLineOhm;
    expect(at(75) / at(20)).toBeCloseTo(309.5 / 254.5, 9);
  });
  it.each<[string, Partial<WindingCheckInput>]>([
    ['lineVoltsV', { lineVoltsV: Number.NaN }],
    ['frequencyHz', { frequencyHz: 0 }],
    ['inducedShare', { inducedShare: 1.2 }],
    ['ratedCurrentA', { ratedCurrentA: -1 }],
    ['temperatureC', { temperatureC: 900 }],
    ['winding.connection', { winding: { ...input.winding, connection: 'dc' } }],
    ['winding.spanTo', { winding: { ...input.winding, spanTo: 1 } }],
    ['core.gapDiameterM', { core: { ...input.core!, gapDiameterM: 0 } }],
    ['core.netLengthM', { core: { ...input.core!, netLengthM: 0.3 } }],
    ['core.backIronAreaM2', { core: { ...input.core!, backIronAreaM2: -1 } }],
    ['core.toothWidthM', { core: { ...input.core!, toothWidthM: 0.02 } }],
  ])('names the box when %s is wrong, and refuses to reckon', (path, change) => {
    const wrong = { ...input, ...change };
    const problems = windingCheckProblems(wrong);
    expect(problems.map((p) => p.path)).toContain(path);
    expect(problems.every((p) => p.message.length > 20)).toBe(true);
    expect(() => checkWinding(wrong)).toThrow(OutOfRangeError);
  });
});
