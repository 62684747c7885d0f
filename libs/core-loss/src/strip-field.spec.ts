import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FIELD_BAND, hRmsEstimate } from './field-estimate.js';
import { planSetups } from './plan-setups.js';
import { SAMPLE_CORES } from './sample-cores.fixture.js';
import { STRIP_STEELS, builtCoreFieldAPerM, builtPeakFromStrip, crestAt, type StripSteel } from './strip-field.js';

const steel = fc.constantFrom(...STRIP_STEELS);
const flux = fc.double({ min: 0.1, max: 1.59, noNaN: true });

describe('The field of a core built of a known steel', () => {
  // Source: open dataset pfyhr/statordata (MIT): strip 94, 280, 1670 A/m peak; three stator rings 303 to 327, 614 to 633, 1783 to 1816 A/m.
  it.each([[94, 303, 327], [280, 614, 633], [1670, 1783, 1816]])('strip of %d A/m becomes a stack of %d to %d A/m', (strip, least, most) => {
    expect(builtPeakFromStrip(strip)).toBeGreaterThanOrEqual(least);
    expect(builtPeakFromStrip(strip)).toBeLessThanOrEqual(most);
  });
  // Source: same dataset: peak and rms field of one stack at 50 Hz.
  it.each([[318, 194], [615, 330], [1788, 768], [3362, 1420]])('a stack of %d A/m peak takes %d A/m rms', (peak, rms) => {
    expect(Math.abs(peak / crestAt(peak) / rms - 1)).toBeLessThan(0.005);
  });
  // Source: strip fields as the table of open datasets gives them; the built core is computed with the factors above.
  it.each<[StripSteel, number, number]>([['M400-50A', 1.0, 121], ['M400-50A', 1.5, 1148], ['M-19', 1.2, 164], ['M800-50A', 1.32, 324], ['M530-65A', 1.5, 1127]])('%s at %d T starts from the %d A/m of its strip', (name, b, strip) => {
    const built = builtPeakFromStrip(strip);
    expect(builtCoreFieldAPerM(b, name)).toBeCloseTo(built / crestAt(built), 9);
  });
  it('lies within the band of the measured stack, for every steel from 0.9 T to the target', () => {
    for (const name of STRIP_STEELS) {
      for (const b of [0.9, 1.0, 1.1, 1.2, 1.3, 1.32]) {
        const share = builtCoreFieldAPerM(b, name) / hRmsEstimate(b);
        expect(share, `${name} at ${b} T`).toBeGreaterThan(FIELD_BAND.low);
        expect(share, `${name} at ${b} T`).toBeLessThan(FIELD_BAND.high);
      }
    }
  });
  it('more flux always takes more field, without a jump', () => {
    fc.assert(
      fc.property(steel, flux, fc.double({ min: 1e-5, max: 0.01, noNaN: true }), (name, b, more) => {
        const [less, then] = [builtCoreFieldAPerM(b, name), builtCoreFieldAPerM(b + more, name)];
        expect(then).toBeGreaterThan(less);
        expect(then / less).toBeLessThan(1 + more * 60 + 1e-6);
      }),
    );
  });
  it('at 1.5 T every steel is at its knee or past it: 400 A/m and more', () => {
    for (const name of STRIP_STEELS) expect(builtCoreFieldAPerM(1.5, name)).toBeGreaterThan(400);
  });
  it('refuses what cannot be', () => {
    for (const bad of [0.09, 1.61, 0, -1, NaN, Infinity]) expect(() => builtCoreFieldAPerM(bad, 'M-19')).toThrow(OutOfRangeError);
    expect(() => builtCoreFieldAPerM(1, 'M999-50A' as StripSteel)).toThrow(OutOfRangeError);
    expect(() => builtCoreFieldAPerM(1, 'toString' as StripSteel)).toThrow(OutOfRangeError);
  });
});

describe('The estimate that the planner uses', () => {
  it('stays what it was where no steel is named', () => {
    fc.assert(fc.property(flux, (b) => void expect(hRmsEstimate(b, 'typical')).toBe(hRmsEstimate(b))));
    expect(hRmsEstimate(1.2994)).toBe(329.8);
    expect(hRmsEstimate(1.6)).toBe(1420);
  });
  it('takes the named steel', () => expect(hRmsEstimate(1.32, 'M800-50A')).toBe(builtCoreFieldAPerM(1.32, 'M800-50A')));
  it('a steel that takes more field asks for more amps at the same turns', () => {
    const request = {
      geometry: SAMPLE_CORES[1],
      targetT: 1.2,
      frequencyHz: 50,
      supplies: [{ id: 's', name: 'S', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 60, frequencyHz: 50, kind: 'variable' as const }],
      cables: [{ id: 'c', name: 'C', crossSectionM2: 1e-5, lengthM: 200, maxAmpsA: 60 }],
      turnsWound: 24,
    };
    const amps = (name?: StripSteel) => planSetups({ ...request, ...(name ? { steel: name } : {}) }).find((o) => o.turns === 24)!.amps;
    expect(amps('M800-50A')).toBeGreaterThan(amps());
    expect(amps('M800-50A') / amps()).toBeCloseTo(builtCoreFieldAPerM(1.2, 'M800-50A') / hRmsEstimate(1.2), 9);
    expect(amps('M235-35A')).toBeLessThan(amps('M800-50A'));
  });
  it('a measured field of this very core still counts more than its steel’s name', () => {
    const base = { geometry: SAMPLE_CORES[1], targetT: 1.32, frequencyHz: 50, supplies: [{ id: 's', name: 'S', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 80, frequencyHz: 50, kind: 'variable' as const }], cables: [{ id: 'c', name: 'C', crossSectionM2: 1e-5, lengthM: 200, maxAmpsA: 80 }], turnsWound: 24, measured: { fluxDensityT: 1.32, fieldRmsAPerM: 400 } };
    const amps = (name?: StripSteel) => planSetups({ ...base, ...(name ? { steel: name } : {}) }).find((o) => o.turns === 24)!.amps;
    expect(amps('M800-50A')).toBeCloseTo(amps(), 9);
  });
});
