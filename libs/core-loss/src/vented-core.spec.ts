import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { deriveGeometry } from './core-geometry.js';
import { SAMPLE_CORES } from './sample-cores.fixture.js';
import { deriveVentedGeometry, type AxialVents } from './vented-core.js';

const armature = SAMPLE_CORES[11];
const vents: AxialVents = { count: 8, holeDiameterM: 0.02, circleDiameterM: 0.22 };

describe('An armature with axial vents', () => {
  it('a cable through the vents encloses only the iron outside them', () => {
    const d = deriveVentedGeometry(armature, vents, 'through-vents');
    expect(d).toEqual(deriveGeometry({ ...armature, innerDiameterM: 0.24 }));
    expect(d.backIronDepthM).toBeCloseTo(0.038, 12);
    expect(d.massKg).toBeLessThan(deriveGeometry(armature).massKg);
  });
  it('a cable through the spider or the shaft has the flux pass the holes: depth and mass lose them', () => {
    const whole = deriveGeometry(armature);
    for (const path of ['through-spider', 'through-shaft'] as const) {
      const d = deriveVentedGeometry(armature, vents, path);
      expect(d.backIronDepthM).toBeCloseTo(whole.backIronDepthM - 0.02, 12);
      expect(d.areaM2 / whole.areaM2).toBeCloseTo((0.068 - 0.02) / 0.068, 12);
      expect(whole.massKg - d.massKg).toBeCloseTo(8 * 7750 * whole.netLengthM * Math.PI * 0.01 ** 2, 9);
      expect(d.meanPathM).toBe(whole.meanPathM);
    }
  });
  it('a stator with vents in its back iron keeps its outside', () => {
    const d = deriveVentedGeometry(SAMPLE_CORES[1], { count: 12, holeDiameterM: 0.015, circleDiameterM: 0.47 }, 'through-vents');
    expect(d.meanDiameterM + d.backIronDepthM).toBeCloseTo(0.53, 12);
    expect(d.meanDiameterM - d.backIronDepthM).toBeCloseTo(0.485, 12);
  });
  it('holes of next to nothing change next to nothing', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 20 }), (count) => {
        const d = deriveVentedGeometry(armature, { count, holeDiameterM: 1e-9, circleDiameterM: 0.22 }, 'through-shaft');
        const whole = deriveGeometry(armature);
        expect(d.areaM2 / whole.areaM2).toBeCloseTo(1, 6);
        expect(d.massKg / whole.massKg).toBeCloseTo(1, 9);
      }),
    );
  });
  it.each<[string, Partial<AxialVents>]>([
    ['no holes', { count: 0 }], ['half a hole', { count: 1.5 }], ['holes without width', { holeDiameterM: 0 }], ['a width that is no number', { holeDiameterM: NaN }], ['holes in the slots', { circleDiameterM: 0.31 }],
    ['holes in the shaft', { circleDiameterM: 0.18 }], ['a circle that is no number', { circleDiameterM: NaN }], ['holes that overlap', { count: 40 }],
  ])('%s are refused', (_words, over) => expect(() => deriveVentedGeometry(armature, { ...vents, ...over }, 'through-vents')).toThrow(OutOfRangeError));
});
