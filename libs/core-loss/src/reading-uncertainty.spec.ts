import fc from 'fast-check';
import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { deriveGeometry, type CoreGeometry } from './core-geometry.js';
import { CLAMP_READING_UNCERTAINTY, DEFAULT_READING_UNCERTAINTY, lossUncertaintyRel, ratioUncertaintyRel, type ReadingUncertainty, type UncertainReading } from './reading-uncertainty.js';
import { reduceReading, type RingReading } from './ring-reading.js';
import { SAMPLE_CORES, sampleInput, type SampleCore } from './sample-cores.fixture.js';

const test = (reading: RingReading, geometry: CoreGeometry): UncertainReading => ({ reading, reduced: reduceReading(reading, deriveGeometry(geometry)) });
const sample = (number: SampleCore, name: string) => test(sampleInput(number, name).reading, SAMPLE_CORES[number]);
const none = Object.fromEntries(Object.entries(DEFAULT_READING_UNCERTAINTY).map(([k, v]) => [k, typeof v === 'number' ? 0 : v])) as unknown as ReadingUncertainty;
const only = (part: Partial<ReadingUncertainty>): ReadingUncertainty => ({ ...none, ...part });

describe('The uncertainty of W/kg', () => {
  // Source: sample shop, U (k = 2) 7 %; absolute W/kg realistically ±5 to 10 % (computed from the sensitivities).
  it('is about 7 % with the meters of a usual shop', () => {
    expect(2 * lossUncertaintyRel(sample(1, 'before'), 1.32)).toBeCloseTo(0.07, 2);
  });
  it('0.5 % in volts is 1.0 % in W/kg', () => {
    expect(lossUncertaintyRel(sample(1, 'before'), 1.32, only({ voltsRel: 0.005 }))).toBeCloseTo(0.01, 12);
  });
  // Source: power factor 0.16, tan φ 6.2: a phase error of 0.1 degree is 1.1 % (computed).
  it('0.1 degree of phase error is 1.1 % at power factor 0.16', () => {
    const s = sample(1, 'before');
    const at = { ...s, reduced: { ...s.reduced, powerFactor: 0.16 } };
    expect(lossUncertaintyRel(at, 1.32, only({ phaseErrorRad: (0.1 * Math.PI) / 180 }))).toBeCloseTo(0.011, 3);
  });
  it('area stands in flux and in mass: of 2 % there 2 % are left, as for a mass of its own', () => {
    const s = sample(1, 'before');
    expect(lossUncertaintyRel(s, 1.32, only({ areaRel: 0.02 }))).toBeCloseTo(0.02, 12);
    expect(lossUncertaintyRel(s, 1.32, only({ massRel: 0.02 }))).toBeCloseTo(0.02, 12);
    // against the reduction itself: 1 % more area moves the referred loss by 1 %
    const referred = (factor: number) => {
      const d = deriveGeometry(SAMPLE_CORES[1]);
      const r = reduceReading(s.reading, { ...d, areaM2: d.areaM2 * factor, massKg: d.massKg * factor });
      return r.wattsPerKg * (1.32 / r.fluxDensityT) ** 2;
    };
    expect(referred(1.01) / referred(1) - 1).toBeCloseTo(0.01, 9);
  });
  it('grows with the distance to the flux it is referred to', () => {
    const s = sample(1, 'before');
    expect(lossUncertaintyRel(s, 1.25)).toBeGreaterThan(lossUncertaintyRel(s, s.reduced.fluxDensityT));
    expect(lossUncertaintyRel(s, s.reduced.fluxDensityT, only({ exponent: 0.3 }))).toBe(0);
  });
  it('a clamp meter makes it far worse', () => {
    expect(lossUncertaintyRel(sample(1, 'before'), 1.32, CLAMP_READING_UNCERTAINTY)).toBeGreaterThan(2 * lossUncertaintyRel(sample(1, 'before'), 1.32));
  });
  it('cable loss in the watts counts when the lead sat on the terminals', () => {
    expect(lossUncertaintyRel(sample(9, 'before'), 1.32, only({ cableResistanceRel: 0.1 }))).toBeCloseTo((0.1 * 23.1 ** 2 * 0.0528) / 236.1, 4);
    expect(lossUncertaintyRel(sample(1, 'before'), 1.32, only({ cableResistanceRel: 0.1 }))).toBe(0);
  });
});

describe('The uncertainty of after over before', () => {
  // Source: sample shop, 2.4 points (k = 2) near a ratio of 1.186.
  it('is 2.4 points near +18.6 %', () => {
    expect(2 * ratioUncertaintyRel(sample(12, 'before'), sample(12, 'after')) * 1.186).toBeCloseTo(0.024, 3);
  });
  it('size, stacking, mass and the gain of the meters cancel', () => {
    for (const part of [{ areaRel: 0.05 }, { stackingRel: 0.05 }, { massRel: 0.05 }, { voltsRel: 0.05 }, { wattsRel: 0.05 }] as Partial<ReadingUncertainty>[]) {
      expect(ratioUncertaintyRel(sample(2, 'before'), sample(2, 'after'), only(part)), JSON.stringify(part)).toBe(0);
    }
  });
  // Source: 1 degree at power factor 0.214 → 0.335 shifts the ratio by 2.8 % (computed from cos(φ − 1°)).
  it('the phase error does not: 1 degree from power factor 0.214 to 0.335 is about 3 %', () => {
    const degree = Math.PI / 180;
    const shift = (pf: number) => Math.cos(Math.acos(pf) - degree) / pf;
    expect(1 - shift(0.335) / shift(0.214)).toBeCloseTo(0.028, 3);
    const u = ratioUncertaintyRel(sample(2, 'before'), sample(2, 'after'), only({ phaseErrorRad: degree }));
    expect(u).toBeGreaterThan(0.028);
    expect(u).toBeLessThan(0.033);
  });
  it('an unchanged power factor makes the phase error cancel, too', () => {
    expect(ratioUncertaintyRel(sample(2, 'before'), sample(2, 'before'), only({ phaseErrorRad: 0.02 }))).toBe(0);
  });
  it('the exponent counts by what the fluxes differ', () => {
    const s = sample(1, 'before');
    const other = { ...s, reduced: { ...s.reduced, fluxDensityT: s.reduced.fluxDensityT * 1.05 } };
    expect(ratioUncertaintyRel(s, other, only({ exponent: 0.3 }))).toBeCloseTo(0.3 * Math.log(1.05), 12);
    expect(ratioUncertaintyRel(s, s, only({ exponent: 0.3 }))).toBe(0);
  });
  it('another voltmeter brings its gain in twice', () => {
    expect(ratioUncertaintyRel(sample(1, 'before'), sample(1, 'after'), only({ voltsRel: 0.005 }), false)).toBeCloseTo(Math.SQRT2 * 0.01, 12);
  });
  it('is never larger than two independent tests', () => {
    const numbers: SampleCore[] = [1, 2, 4, 6, 10, 11, 12];
    fc.assert(
      fc.property(fc.constantFrom(...numbers), fc.double({ min: 0, max: 0.05, noNaN: true }), fc.double({ min: 0, max: 0.05, noNaN: true }), (number, phaseErrorRad, voltsRel) => {
        const u = { ...DEFAULT_READING_UNCERTAINTY, phaseErrorRad, voltsRel };
        const [a, b] = [sample(number, 'before'), sample(number, 'after')];
        expect(ratioUncertaintyRel(a, b, u)).toBeLessThanOrEqual(Math.hypot(lossUncertaintyRel(a, 1.32, u), lossUncertaintyRel(b, 1.32, u)) + 1e-12);
      }),
    );
  });
  it('refuses uncertainties that cannot be', () => {
    const s = sample(1, 'before');
    expect(() => lossUncertaintyRel(s, 1.32, only({ voltsRel: -0.1 }))).toThrow(OutOfRangeError);
    expect(() => ratioUncertaintyRel(s, s, only({ wattsRepeatRel: NaN }))).toThrow(OutOfRangeError);
    expect(() => lossUncertaintyRel(s, 0)).toThrow(OutOfRangeError);
  });
});
