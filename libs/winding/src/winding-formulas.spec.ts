import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { backIronFluxDensity, copperResistivity, currentDensity, dcFluxPerPole, distributionFactor, fluxFlag, fluxPerPole, gapFluxDensity, gapPeakFluxDensity, phaseVolts, pitchFactor, redesign, slotFill, toothFluxDensity, turnsPerPhase, windingFactors, windingProblems } from './index.js';
import { sampleWinding } from './sample-windings.fixture.js';

describe('winding factors', () => {
  // computed from the formulas of machine text books
  it.each([
    [5, 6, 0.965926],
    [7, 9, 0.939693],
    [8, 9, 0.984808],
  ])('a coil over %i of %i slots a pole has the pitch factor %f', (span, pole, factor) => expect(pitchFactor(span, pole)).toBeCloseTo(factor, 6));
  it.each([
    [2, 30, 0.965926],
    [3, 20, 0.959795],
    [4, 15, 0.957662],
  ])('%i coils a group, %i° apart, have the distribution factor %f', (q, angle, factor) => expect(distributionFactor(q, angle)).toBeCloseTo(factor, 6));
  // published text book example: 18 slots, three phases, 2 poles
  it('18 slots of a two-pole winding give 0.9598, as a text book prints', () => expect(distributionFactor(18 / 2 / 3, 180 / (18 / 2))).toBeCloseTo(0.9598, 4));
  it('a group spread ever finer comes to 3/π', () => expect(distributionFactor(10_000, 60 / 10_000)).toBeCloseTo(3 / Math.PI, 8));
  it('the distribution factor is what adding up the coils as arrows gives', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 12 }), fc.double({ min: 1, max: 30, noNaN: true }), (q, angle) => {
        const arrows = Array.from({ length: q }, (_, i) => (i * angle * Math.PI) / 180);
        const sum = Math.hypot(arrows.reduce((s, a) => s + Math.cos(a), 0), arrows.reduce((s, a) => s + Math.sin(a), 0));
        expect(distributionFactor(q, angle)).toBeCloseTo(sum / q, 9);
      }),
    );
  });
  it('a coil too short or too long by the same slots gives the same', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 17 }), (off) => void expect(pitchFactor(18 - off, 18)).toBeCloseTo(pitchFactor(18 + off, 18), 12)));
  });
  it('one layer fills whole belts, however the coil ends are led', () => {
    const w = sampleWinding(10);
    expect(windingFactors(w)).toEqual(windingFactors({ ...w, spanTo: 13 }));
    expect(windingFactors(w).pitch).toBe(1);
  });
  // 27 slots, 6 poles: q = 3/2; star of slots worked by hand: three coils 20° apart in a belt
  it('a winding with one and a half coils a group counts with three', () => {
    expect(windingFactors({ ...sampleWinding(7), slots: 27, coils: 27, spanTo: 5 }).distribution).toBeCloseTo(0.959795, 6);
  });
  it.each([
    ['a coil over nothing', () => pitchFactor(0, 9)],
    ['a coil over two poles', () => pitchFactor(18, 9)],
    ['NaN for the pole', () => pitchFactor(7, Number.NaN)],
    ['half a coil', () => distributionFactor(0.5, 20)],
    ['no angle', () => distributionFactor(3, 0)],
    ['a single-phase winding', () => windingFactors({ ...sampleWinding(12), connection: 'single' })],
  ])('refuses %s', (_, reckon) => expect(reckon).toThrow(OutOfRangeError));
});

describe('flux and volts', () => {
  // computed: 460 V star, 60 Hz, 96 turns, q 3, span 7/9
  it('a 460 V star winding carries 11.507 mWb a pole', () => {
    const windingFactor = pitchFactor(7, 9) * distributionFactor(3, 20);
    expect(windingFactor).toBeCloseTo(0.901912, 6);
    expect(fluxPerPole({ inducedVoltsV: phaseVolts(460, 'star'), frequencyHz: 60, turnsPerPhase: 96, windingFactor }) * 1000).toBeCloseTo(11.5066, 4);
  });
  // published text book problem: 8 poles, 50 Hz, 36 × 8 conductors a phase, 0.04 Wb, no winding factor: 1278.7 V with the rounded 2.22
  it('0.04 Wb in 288 conductors at 50 Hz induce 1278.7 V, as a text book prints', () => {
    const perVolt = fluxPerPole({ inducedVoltsV: 1, frequencyHz: 50, turnsPerPhase: 144, windingFactor: 1 });
    expect(Math.abs(0.04 / perVolt / 1278.7 - 1)).toBeLessThan(0.001);
  });
  it('a pole of 11.507 mWb over a bore of 180 by 200 mm means 0.407 T in the gap, 0.639 T at its peak', () => {
    const mean = gapFluxDensity(0.0115066, 4, 0.18, 0.2);
    expect(mean).toBeCloseTo(0.407, 4);
    expect(gapPeakFluxDensity(mean)).toBeCloseTo(0.6393, 4);
  });
  it('a DC machine’s flux is that of E = Φ·Z·n·p/(60·a)', () => {
    fc.assert(
      fc.property(fc.integer({ min: 100, max: 900 }), fc.integer({ min: 100, max: 3000 }), fc.constantFrom(2, 4, 6), (conductors, speedRpm, poles) => {
        const flux = dcFluxPerPole({ inducedVoltsV: 440, conductors, paths: poles, poles, speedRpm });
        expect((flux * conductors * speedRpm * poles) / (60 * poles)).toBeCloseTo(440, 8);
      }),
    );
  });
  it('all the flux that crosses a slot pitch of gap goes through the tooth behind it', () => {
    expect(toothFluxDensity({ gapPeakT: 0.8, slotPitchM: 0.02, toothWidthM: 0.01, stackLengthM: 0.2, netLengthM: 0.19 }) * 0.01 * 0.19).toBeCloseTo(0.8 * 0.02 * 0.2, 12);
  });
  it.each([
    ['no volts', () => fluxPerPole({ inducedVoltsV: 0, frequencyHz: 50, turnsPerPhase: 96, windingFactor: 0.9 })],
    ['a winding factor above 1', () => fluxPerPole({ inducedVoltsV: 230, frequencyHz: 50, turnsPerPhase: 96, windingFactor: 1.1 })],
    ['NaN for the frequency', () => fluxPerPole({ inducedVoltsV: 230, frequencyHz: Number.NaN, turnsPerPhase: 96, windingFactor: 0.9 })],
    ['line volts of a single phase', () => phaseVolts(230, 'single')],
    ['no bore', () => gapFluxDensity(0.01, 4, 0, 0.2)],
    ['a negative gap', () => gapPeakFluxDensity(-1)],
    ['a tooth wider than its pitch', () => toothFluxDensity({ gapPeakT: 0.8, slotPitchM: 0.01, toothWidthM: 0.01, stackLengthM: 0.2, netLengthM: 0.19 })],
    ['more iron than stack', () => toothFluxDensity({ gapPeakT: 0.8, slotPitchM: 0.02, toothWidthM: 0.01, stackLengthM: 0.2, netLengthM: 0.21 })],
    ['no back iron', () => backIronFluxDensity(0.01, 0)],
    ['no conductors', () => dcFluxPerPole({ inducedVoltsV: 440, conductors: 0, paths: 4, poles: 4, speedRpm: 1500 })],
    ['NaN for a flux density', () => fluxFlag('gapPeakT', Number.NaN)],
    ['copper colder than it can be', () => copperResistivity(-235)],
    ['a current below nothing', () => currentDensity(sampleWinding(12), -1)],
    ['a slot of no area', () => slotFill(24, [{ strands: 4, overallDiameterM: 0.00115 }], 0)],
  ])('refuses %s', (_, reckon) => expect(reckon).toThrow(OutOfRangeError));
});

describe('copper', () => {
  // IEC 60028 (from memory), values computed
  it.each([
    [20, 0.017241],
    [75, 0.020967],
    [105, 0.022999],
    [120, 0.024015],
  ])('at %i °C has %f Ω·mm²/m', (temperature, resistivity) => expect(copperResistivity(temperature) * 1e6).toBeCloseTo(resistivity, 6));
});

describe('another supply, the same flux', () => {
  const star = { lineVoltsV: 460, frequencyHz: 60, connection: 'star', circuits: 1 } as const;
  // text book rules, computed
  it('575 for 460 V takes 1.25 times the turns of 0.80 the wire', () => {
    expect(redesign(star, { ...star, lineVoltsV: 575 }).turnsFactor).toBeCloseTo(1.25, 12);
    expect(redesign(star, { ...star, lineVoltsV: 575 }).wireAreaFactor).toBeCloseTo(0.8, 12);
  });
  it('delta for star takes 1.7321 times the turns', () => expect(redesign(star, { ...star, connection: 'delta' }).turnsFactor).toBeCloseTo(1.7321, 4));
  it('four circuits for two take twice the turns a coil of half the wire', () => {
    expect(redesign({ ...star, circuits: 2 }, { ...star, circuits: 4 })).toMatchObject({ turnsFactor: 2, wireAreaFactor: 0.5 });
  });
  it('50 Hz for 60 Hz on the same turns raises the flux 1.2 times', () => expect(redesign(star, { ...star, frequencyHz: 50 }).fluxFactorUnchanged).toBeCloseTo(1.2, 12));
  it('a change there and back again changes nothing', () => {
    const supply = fc.record({ lineVoltsV: fc.double({ min: 24, max: 15_000, noNaN: true }), frequencyHz: fc.constantFrom(50, 60), connection: fc.constantFrom('star' as const, 'delta' as const), circuits: fc.integer({ min: 1, max: 8 }), windingFactor: fc.double({ min: 0.5, max: 1, noNaN: true }) });
    fc.assert(fc.property(supply, supply, (a, b) => void expect(redesign(a, b).turnsFactor * redesign(b, a).turnsFactor).toBeCloseTo(1, 9)));
  });
  it('with its turns changed by the factor, the flux stays what it was', () => {
    const from = sampleWinding(12);
    const { turnsFactor } = redesign({ ...star, lineVoltsV: 400, connection: 'delta', circuits: 2 }, { ...star, lineVoltsV: 690, connection: 'star', circuits: 4 });
    const to = { ...from, connection: 'star' as const, circuits: 4, turnsPerCoil: from.turnsPerCoil * turnsFactor };
    const flux = (w: typeof from, volts: number) => phaseVolts(volts, w.connection) / turnsPerPhase(w);
    expect(flux(to, 690)).toBeCloseTo(flux(from, 400), 9);
  });
  it.each([
    ['half a circuit', () => redesign(star, { ...star, circuits: 0.5 })],
    ['no frequency', () => redesign(star, { ...star, frequencyHz: 0 })],
    ['one winding factor of two', () => redesign(star, { ...star, windingFactor: 0.9 })],
  ])('refuses %s', (_, reckon) => expect(reckon).toThrow(OutOfRangeError));
});

describe('winding data', () => {
  const good = sampleWinding(1);
  it.each([
    ['slots', { slots: 2 }],
    ['poles', { poles: 3 }],
    ['layers', { layers: 3 }],
    ['coils', { coils: 36 }],
    ['turnsPerCoil', { turnsPerCoil: Number.NaN }],
    ['spanTo', { spanTo: 1 }],
    ['spanTo', { spanTo: 37 }],
    ['spanTo', { spanTo: 73 }],
    ['connection', { connection: 'zigzag' }],
    ['circuits', { circuits: 3 }],
    ['slots', { slots: 70, coils: 70 }],
    ['wires', { wires: [] }],
    ['wires.0.strands', { wires: [{ strands: 0, bareDiameterM: 0.001 }] }],
    ['wires.0.bareDiameterM', { wires: [{ strands: 1, bareDiameterM: 1.18 }] }],
    ['wires.1.thicknessM', { wires: [{ strands: 1, bareDiameterM: 0.001 }, { strands: 1, widthM: 0.005, thicknessM: 0 }] }],
    ['meanTurnM', { meanTurnM: 1519 }],
    ['coilExtensionM', { coilExtensionM: -0.05 }],
  ])('names the box %s when the figure in it cannot be', (path, change) => {
    const problems = windingProblems({ ...good, ...change });
    expect(problems.map((p) => p.path)).toEqual([path]);
    expect(problems[0]!.message).toMatch(/\.$/);
  });
  it('accepts every winding of the sample shop', () => {
    for (const machine of [1, 2, 3, 6, 7, 8, 9, 10, 11, 12] as const) expect(windingProblems(sampleWinding(machine))).toEqual([]);
  });
  it('asks for everything when nothing is filled in', () => expect(windingProblems({}).map((p) => p.path)).toEqual(['slots', 'poles', 'layers', 'coils', 'turnsPerCoil', 'spanTo', 'connection', 'circuits', 'wires']));
  it('accepts a lifting magnet and an armature, whose coils three-phase rules do not bind', () => {
    expect(windingProblems({ slots: 8, poles: 2, layers: 1, coils: 2, turnsPerCoil: 102, spanTo: 2, connection: 'single', circuits: 1, wires: [{ strands: 1, bareDiameterM: 0.0016 }] })).toEqual([]);
    expect(windingProblems({ slots: 46, poles: 4, layers: 2, coils: 46, turnsPerCoil: 1, spanTo: 12, connection: 'dc', circuits: 4, wires: [{ strands: 1, widthM: 0.0063, thicknessM: 0.002 }] })).toEqual([]);
  });
});
