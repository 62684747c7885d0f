import fc from 'fast-check';
import { OutOfRangeError, toSi } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { deriveGeometry, geometryProblems, toothMassKg, type CoreGeometry } from './core-geometry.js';
import { voltsPerTurnFor } from './ring-reading.js';
import { SAMPLE_CORES, type SampleCore } from './sample-cores.fixture.js';

const stator: CoreGeometry = {
  kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.035, slots: 48, stackLengthM: 0.3, ducts: 2, ductWidthM: 0.01, stackingFactor: 0.95, densityKgPerM3: 7700,
};
const armature: CoreGeometry = { ...stator, kind: 'armature', outerDiameterM: 0.25, innerDiameterM: 0.08, slotDepthM: 0.03, stackLengthM: 0.2, ducts: 0, ductWidthM: 0 };

describe('Worked ring-test cores (computed from the ring geometry, formulas from memory)', () => {
  it('a 400 mm stator holds 82.20 kg of back iron and takes 3.27 volts per turn at 85 kilolines and 60 Hz', () => {
    const d = deriveGeometry(stator);
    expect(d.backIronDepthM).toBeCloseTo(0.035, 12);
    expect(d.netLengthM).toBeCloseTo(0.266, 12);
    expect(d.areaM2).toBeCloseTo(9.31e-3, 8);
    expect(d.meanPathM).toBeCloseTo(1.14668, 5);
    expect(d.massKg).toBeCloseTo(82.2, 2);
    const flux = toSi(85, 'flux-density', 'inch-pound');
    expect(voltsPerTurnFor(flux, 60, d.areaM2)).toBeCloseTo(3.2698, 4);
    expect(voltsPerTurnFor(flux, 50, d.areaM2)).toBeCloseTo(2.7248, 4);
    // H rms 350 A/m: 401.3 ampere-turns, 15.96 VA/kg, 1.312 kVA
    const voltAmperes = voltsPerTurnFor(flux, 60, d.areaM2) * 350 * d.meanPathM;
    expect(350 * d.meanPathM).toBeCloseTo(401.3, 1);
    expect(voltAmperes / d.massKg).toBeCloseTo(15.96, 2);
    expect(voltAmperes).toBeCloseTo(1312, 0);
    // kick-off: 36.7 turns on 120 V, 73.4 on 240 V
    expect(120 / voltsPerTurnFor(flux, 60, d.areaM2)).toBeCloseTo(36.7, 1);
    expect(240 / voltsPerTurnFor(flux, 60, d.areaM2)).toBeCloseTo(73.4, 1);
  });
  it('a 20 inch stator measured in inches holds 298.3 pounds', () => {
    const inch = 0.0254;
    const d = deriveGeometry({ ...stator, outerDiameterM: 20 * inch, innerDiameterM: 13 * inch, slotDepthM: 1.75 * inch, stackLengthM: 12 * inch, ductWidthM: 0.375 * inch });
    expect(d.backIronDepthM / inch).toBeCloseTo(1.75, 10);
    expect(d.areaM2 / inch ** 2).toBeCloseTo(18.703, 3);
    expect(d.areaM2).toBeCloseTo(0.0120665, 7);
    expect(d.meanPathM / inch).toBeCloseTo(57.334, 3);
    expect(d.massKg).toBeCloseTo(135.307, 3);
    expect(d.massKg / 0.45359237).toBeCloseTo(298.3, 2);
    expect(voltsPerTurnFor(toSi(85, 'flux-density', 'inch-pound'), 60, d.areaM2)).toBeCloseTo(4.2379, 4);
  });
  it('an armature has its back iron inside the slots: 55 mm deep, 34.13 kg', () => {
    const d = deriveGeometry(armature);
    expect(d.backIronDepthM).toBeCloseTo(0.055, 12);
    expect(d.areaM2).toBeCloseTo(0.01045, 8);
    expect(d.meanPathM).toBeCloseTo(0.42412, 5);
    expect(d.massKg).toBeCloseTo(34.126, 3);
    expect(voltsPerTurnFor(1.3175, 60, d.areaM2)).toBeCloseTo(3.6701, 4);
  });
  // Check: D_i/D_o 0.825 → 1.103 inside, 0.60 → 1.305 (constant permeability, computed).
  it.each([[0.825, 1.103], [0.6, 1.305]])('a back iron with diameters in the ratio %d is denser inside by %d', (ratio, expected) => {
    const d = deriveGeometry({ ...stator, outerDiameterM: 1, innerDiameterM: ratio - 0.1, slotDepthM: 0.05 });
    expect(d.innerToMeanFluxRatio).toBeCloseTo(expected, 3);
  });
});

describe('The cores of the sample shop come out as its table prints them', () => {
  it.each<[SampleCore, string, string, string, string, string, string, string]>([
    [1, '51.0', '351.50', '17926.5', '1.5048', '207.72', '5.2566', '1.11'],
    [2, '44.5', '275.50', '12259.8', '1.2582', '118.77', '3.5949', '1.12'],
    [3, '53.5', '218.50', '11689.7', '1.0886', '97.98', '3.4278', '1.17'],
    [4, '69.0', '228.00', '15732.0', '0.7508', '91.54', '4.6131', '1.37'],
    [6, '77.0', '627.00', '48279.0', '3.4652', '1288.17', '14.1569', '1.07'],
    [7, '32.0', '285.00', '9120.0', '1.3635', '96.37', '2.6743', '1.08'],
    [8, '12.5', '80.75', '1009.4', '0.3534', '2.78', '0.2960', '1.12'],
    [9, '42.0', '228.95', '9615.9', '1.1844', '87.12', '2.8197', '1.12'],
    [10, '22.5', '161.50', '3633.8', '0.6833', '19.24', '1.0655', '1.11'],
    [11, '68.0', '275.50', '18734.0', '0.7791', '113.12', '5.4934', '1.34'],
    [12, '33.0', '209.00', '6897.0', '0.9645', '51.22', '2.0224', '1.12'],
  ])('core %d', (number, depth, net, area, path, mass, volts, inner) => {
    const d = deriveGeometry(SAMPLE_CORES[number]);
    const digits = (text: string) => (text.split('.')[1] ?? '').length;
    const same = (value: number, printed: string) => expect(Math.abs(value - Number(printed))).toBeLessThanOrEqual(0.5001 * 10 ** -digits(printed));
    same(d.backIronDepthM * 1e3, depth);
    same(d.netLengthM * 1e3, net);
    same(d.areaM2 * 1e6, area);
    same(d.meanPathM, path);
    same(d.massKg, mass);
    same(voltsPerTurnFor(1.32, 50, d.areaM2), volts);
    same(d.innerToMeanFluxRatio, inner);
  });
});

describe('What holds for every core', () => {
  const anyCore = fc
    .record({
      kind: fc.constantFrom('stator' as const, 'armature' as const),
      innerDiameterM: fc.double({ min: 0.02, max: 2, noNaN: true }),
      radialM: fc.double({ min: 0.01, max: 0.5, noNaN: true }),
      slotShare: fc.double({ min: 0.05, max: 0.9, noNaN: true }),
      stackLengthM: fc.double({ min: 0.02, max: 3, noNaN: true }),
      stackingFactor: fc.double({ min: 0.7, max: 1, noNaN: true }),
      densityKgPerM3: fc.double({ min: 6500, max: 8200, noNaN: true }),
    })
    .map(({ radialM, slotShare, ...rest }): CoreGeometry => ({
      ...rest, outerDiameterM: rest.innerDiameterM + 2 * radialM, slotDepthM: radialM * slotShare, slots: 36, ducts: 0, ductWidthM: 0,
    }));
  it('back-iron mass is the mass of the ring between its two diameters', () => {
    fc.assert(
      fc.property(anyCore, (g) => {
        const d = deriveGeometry(g);
        const inner = d.meanDiameterM - d.backIronDepthM;
        const outer = d.meanDiameterM + d.backIronDepthM;
        const ring = g.densityKgPerM3 * d.netLengthM * (Math.PI / 4) * (outer ** 2 - inner ** 2);
        expect(d.massKg / ring).toBeCloseTo(1, 9);
        if (g.kind === 'stator') expect(outer).toBeCloseTo(g.outerDiameterM, 9);
        else expect(inner).toBeCloseTo(g.innerDiameterM, 9);
        expect(d.innerToMeanFluxRatio).toBeGreaterThan(1);
      }),
    );
  });
  it('back iron and teeth without slots make the whole ring', () => {
    fc.assert(
      fc.property(anyCore, (g) => {
        const whole = g.densityKgPerM3 * g.stackingFactor * g.stackLengthM * (Math.PI / 4) * (g.outerDiameterM ** 2 - g.innerDiameterM ** 2);
        expect((deriveGeometry(g).massKg + toothMassKg(g, 0)) / whole).toBeCloseTo(1, 9);
      }),
    );
  });
});

describe('A size that cannot be is named, with the field and what to do', () => {
  it('a sound core has no problem', () => {
    expect(geometryProblems(stator)).toEqual([]);
    expect(geometryProblems(armature)).toEqual([]);
  });
  it.each<[keyof CoreGeometry, number, string]>([
    ['outerDiameterM', 0, 'not-positive'],
    ['outerDiameterM', NaN, 'not-positive'],
    ['outerDiameterM', Infinity, 'not-positive'],
    ['outerDiameterM', 25.1, 'too-large'],
    ['innerDiameterM', -0.1, 'not-positive'],
    ['innerDiameterM', 0.4, 'diameters'],
    ['slotDepthM', 0, 'not-positive'],
    ['slotDepthM', 0.07, 'no-back-iron'],
    ['slotDepthM', 0.2, 'no-back-iron'],
    ['stackLengthM', 0, 'not-positive'],
    ['stackLengthM', 0.02, 'no-iron-length'],
    ['slots', 2, 'slots'],
    ['slots', 36.5, 'slots'],
    ['ducts', -1, 'ducts'],
    ['ducts', 1.5, 'ducts'],
    ['ductWidthM', -0.01, 'duct-width'],
    ['ductWidthM', 0, 'duct-width'],
    ['stackingFactor', 0.69, 'stacking-factor'],
    ['stackingFactor', 1.01, 'stacking-factor'],
    ['densityKgPerM3', 6499, 'density'],
    ['densityKgPerM3', 8201, 'density'],
    ['densityKgPerM3', NaN, 'density'],
  ])('%s of %d', (field, value, code) => {
    const wrong = { ...stator, [field]: value };
    expect(geometryProblems(wrong).map((p) => p.code)).toContain(code);
    expect(() => deriveGeometry(wrong)).toThrow(OutOfRangeError);
    try {
      deriveGeometry(wrong);
    } catch (error) {
      expect((error as OutOfRangeError).field).toBe(geometryProblems(wrong)[0]?.field);
    }
  });
  it.each<[keyof CoreGeometry, number]>([
    ['outerDiameterM', 25], ['slotDepthM', 0.0699], ['innerDiameterM', 0.3299], ['slots', 3], ['ducts', 29], ['stackingFactor', 0.7], ['stackingFactor', 1], ['densityKgPerM3', 6500], ['densityKgPerM3', 8200],
  ])('%s of %d is just inside', (field, value) => {
    expect(geometryProblems({ ...stator, [field]: value })).toEqual([]);
    expect(deriveGeometry({ ...stator, [field]: value }).massKg).toBeGreaterThan(0);
  });
  it('all problems are told at once, also of a form that is still empty', () => {
    expect(geometryProblems({}).map((p) => p.field)).toEqual([
      'kind', 'outerDiameterM', 'innerDiameterM', 'slotDepthM', 'stackLengthM', 'slots', 'ducts', 'ductWidthM', 'stackingFactor', 'densityKgPerM3',
    ]);
  });
  it('slots that leave no teeth are refused', () => {
    expect(() => toothMassKg(stator, 0.001)).toThrow(/no teeth/);
    expect(() => toothMassKg(stator, -1)).toThrow(OutOfRangeError);
    expect(() => toothMassKg(stator, NaN)).toThrow(OutOfRangeError);
  });
});
