import { toSi } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { AISI_STEELS, EN_10106_STEELS, JIS_STEEL_NAMES } from './electrical-steels.js';
import { readSteelName, type NamedSteel } from './steel-name.js';

const named = (name: string): NamedSteel => {
  const reading = readSteelName(name);
  if (reading.outcome !== 'read') throw new Error(reading.words);
  return reading;
};
const of = (name: string) => EN_10106_STEELS.find((s) => s.name === name)!;

describe('The grades of EN 10106', () => {
  it('each name says its own loss and thickness', () => {
    expect(EN_10106_STEELS).toHaveLength(35);
    for (const steel of EN_10106_STEELS) {
      const name = named(steel.name);
      expect(name.maxLossWPerKg, steel.name).toBeCloseTo(steel.maxLossAt15WPerKg, 12);
      expect(name.thicknessM, steel.name).toBeCloseTo(steel.thicknessM, 12);
    }
  });
  it('no name stands twice, and every sheet is one of the four that the standard has', () => {
    expect(new Set(EN_10106_STEELS.map((s) => s.name)).size).toBe(35);
    // Source: scope of EN 10106 on catalogue pages: 0.35, 0.50, 0.65 and 1.00 mm.
    expect([...new Set(EN_10106_STEELS.map((s) => Math.round(s.thicknessM * 1e5)))].sort((a, b) => a - b)).toEqual([35, 50, 65, 100]);
  });
  it('a sheet that may lose more at 1.5 T may also lose more at 1.0 T, and carries no less flux', () => {
    for (const mm of [35, 50, 65, 100]) {
      const sheets = EN_10106_STEELS.filter((s) => Math.round(s.thicknessM * 1e5) === mm).sort((a, b) => a.maxLossAt15WPerKg - b.maxLossAt15WPerKg);
      sheets.slice(1).forEach((steel, i) => {
        const better = sheets[i]!;
        expect(steel.maxLossAt10WPerKg, steel.name).toBeGreaterThan(better.maxLossAt10WPerKg);
        expect(steel.densityKgPerM3, steel.name).toBeGreaterThanOrEqual(better.densityKgPerM3);
        steel.minPolarizationT.forEach((j, k) => expect(j, steel.name).toBeGreaterThanOrEqual(better.minPolarizationT[k]!));
      });
    }
  });
  it('the loss at 1.0 T lies where the exponent of steel puts it', () => {
    for (const steel of EN_10106_STEELS) {
      const exponent = Math.log(steel.maxLossAt15WPerKg / steel.maxLossAt10WPerKg) / Math.log(1.5);
      expect(exponent, steel.name).toBeGreaterThan(1.9);
      expect(exponent, steel.name).toBeLessThan(2.4);
    }
  });
  // Source: typical polarization in records of the Modelica Standard Library (BSD): above the guaranteed least.
  it.each([['M400-50A', 1.574, 1.659, 1.774], ['M530-50A', 1.593, 1.674, 1.788], ['M800-50A', 1.64, 1.721, 1.83]])('%s: a typical sheet carries more than it must', (name, ...typical) => {
    of(name).minPolarizationT.forEach((least, i) => expect(typical[i] as number).toBeGreaterThan(least));
  });
  // Source: typical losses in open material files (pyleecan, Apache-2.0): below the guaranteed most.
  it.each([['M235-35A', 0.92, 2.25], ['M400-50A', 1.49, 3.57], ['M530-65A', 1.85, 4.26], ['M800-50A', 3.05, 6.6]])('%s: a typical sheet loses less than it may', (name, at10, at15) => {
    expect(at10).toBeLessThan(of(name).maxLossAt10WPerKg);
    expect(at15).toBeLessThan(of(name).maxLossAt15WPerKg);
  });
  // Source: conventional density of the Modelica records (BSD).
  it.each([['M270-50A', 7600], ['M330-50A', 7650], ['M530-50A', 7700], ['M600-50A', 7750], ['M800-50A', 7800]])('%s weighs %d kg/m³, as read', (name, density) => {
    expect(of(name).densityKgPerM3).toBe(density);
    expect(of(name).densityStanding).toBe('read');
  });
  it('every row says how far it stands', () => {
    for (const steel of EN_10106_STEELS) expect(['from memory', 'from memory, unconfirmed']).toContain(steel.standing);
    expect(of('M210-35A').standing).toBe('from memory, unconfirmed');
  });
});

describe('AISI types', () => {
  it('29 gauge is 0.36 mm, 26 is 0.47, 24 is 0.64 (from memory)', () => {
    const thickness = (gauge: number) => AISI_STEELS.find((s) => s.gauge === gauge)!.thicknessM * 1000;
    expect(thickness(29)).toBeCloseTo(0.356, 3);
    expect(thickness(26)).toBeCloseTo(0.47, 3);
    expect(thickness(24)).toBeCloseTo(0.635, 3);
  });
  // Source: M-19 29 gauge listed under A677 36F155 in university course notes.
  it('M-19 of 29 gauge is 36F155 of today', () => {
    const m19 = AISI_STEELS.find((s) => s.name === 'M-19' && s.gauge === 29)!;
    const name = named('36F155');
    expect(name).toMatchObject({ system: 'ASTM A677', processing: 'fully', frequencyHz: 60 });
    expect(name.maxLossWPerKg).toBeCloseTo(toSi(m19.newerMaxLossWPerLb!, 'specific-loss', 'inch-pound'), 9);
    expect(Math.round(m19.thicknessM * 1e5)).toBe(36);
    expect(m19.maxLossWPerLb).toBe(1.58);
  });
  it.each([['M-15', 29, 3.2], ['M-22', 24, 4.81], ['M-27', 26, 4.19], ['M-36', 24, 5.29], ['M-43', 26, 5.07], ['M-45', 24, 7.94], ['M-47', 26, 10.14], ['M-47', 24, 12.35]])('%s of %d gauge is %d W/kg', (name, gauge, kg) => {
    const steel = AISI_STEELS.find((s) => s.name === name && s.gauge === gauge)!;
    expect(toSi(steel.maxLossWPerLb, 'specific-loss', 'inch-pound')).toBeCloseTo(kg, 2);
  });
  it('a thicker sheet of one type loses more, and so does a higher number', () => {
    for (const name of new Set(AISI_STEELS.map((s) => s.name))) {
      const losses = AISI_STEELS.filter((s) => s.name === name).map((s) => s.maxLossWPerLb);
      expect([...losses].sort((a, b) => a - b)).toEqual(losses);
    }
    expect(AISI_STEELS.some((s) => s.name === 'M-43' && s.gauge === 29)).toBe(false);
  });
});

describe('Names of steels', () => {
  it('every JIS name says its sheet, and the one of the same loss in EN 10106 says the same', () => {
    for (const name of JIS_STEEL_NAMES) expect(named(name).system, name).toBe('JIS C 2552');
    expect(JIS_STEEL_NAMES).toHaveLength(24);
    expect(named('50A400')).toMatchObject({ thicknessM: of('M400-50A').thicknessM, maxLossWPerKg: 4 });
  });
  it.each([['M660-50K', 6.6, 'semi'], ['M1050-50D', 10.5, 'semi'], ['M340-50E', 3.4, 'semi'], [' m 400 - 50 a ', 4, 'fully'], ['47S188', 4.145, 'semi']])('%s is read', (name, loss, processing) => {
    expect(named(name).maxLossWPerKg).toBeCloseTo(loss, 2);
    expect(named(name).processing).toBe(processing);
  });
  it.each(['', 'M400', 'M400-50', 'M-19', '50B400', 'M9999-50A', '99A400x', '500A400', 'steel'])('“%s” is no name', (name) => {
    expect(readSteelName(name).outcome).toBe('not-a-name');
  });
  it('never throws, whatever is typed', () => {
    fc.assert(fc.property(fc.string(), (text) => void expect(['read', 'not-a-name']).toContain(readSteelName(text).outcome)));
  });
});
