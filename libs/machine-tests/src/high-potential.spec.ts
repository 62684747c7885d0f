import { describe, expect, it } from 'vitest';
import { DEFAULT_MACHINE_TEST_LIMITS, highPotentialLevel, type HighPotentialCase } from './index.js';

const level = (kase: HighPotentialCase, ratedVoltageV: number, more: { supply?: 'ac' | 'dc'; ratedPowerW?: number | null; secondaryVoltsV?: number } = {}) =>
  highPotentialLevel({ case: kase, ratedVoltageV, ratedPowerW: null, supply: 'ac', ...more }).voltsV;

// Source: ANSI/EASA AR100-2020 Tables 4-4 and 4-5 (DC columns read), 80 % and 75 % IEC 60034-1 9.2, 65 % AR100 4.4 (from memory).
describe('Volts of the high-potential test', () => {
  it.each([
    [230, 1460, 2482, 1168, 1095, 949],
    [400, 1800, 3060, 1440, 1350, 1170],
    [460, 1920, 3264, 1536, 1440, 1248],
    [575, 2150, 3655, 1720, 1612.5, 1397.5],
    [690, 2380, 4046, 1904, 1785, 1547],
    [2300, 5600, 9520, 4480, 4200, 3640],
    [4000, 9000, 15300, 7200, 6750, 5850],
    [6600, 14200, 24140, 11360, 10650, 9230],
    [11000, 23000, 39100, 18400, 17250, 14950],
    [13800, 28600, 48620, 22880, 21450, 18590],
  ])('a winding of %d V: new, DC, 80, 75 and 65 %', (u, ac, dc, again, part, reconditioned) => {
    expect([level('new-winding', u), level('new-winding', u, { supply: 'dc' }), level('repeat', u), level('part-rewound', u), level('reconditioned', u)]).toEqual([ac, dc, again, part, reconditioned]);
  });
  it('a small machine up to half a horsepower and 250 V gets 1000 V, 1700 V DC', () => {
    expect(level('new-winding', 230, { ratedPowerW: 250 })).toBe(1000);
    expect(level('new-winding', 250, { ratedPowerW: 373, supply: 'dc' })).toBe(1700);
    expect(level('new-winding', 230, { ratedPowerW: 374 })).toBe(1460);
    expect(level('new-winding', 251, { ratedPowerW: 250 })).toBe(1502);
  });
  it('a winding of 35 V or less gets 500 V', () => {
    expect(level('new-winding', 24)).toBe(500);
    expect(level('new-winding', 35, { supply: 'dc' })).toBe(850);
    expect(level('new-winding', 36)).toBe(1072);
  });
  it('a wound rotor goes by its slip-ring volts, reversing duty by four times them', () => {
    expect(level('wound-rotor', 400, { secondaryVoltsV: 205 })).toBe(1410);
    expect(level('wound-rotor-reversing', 400, { secondaryVoltsV: 205 })).toBe(1820);
    expect(level('wound-rotor-reversing', 400, { secondaryVoltsV: 205, supply: 'dc' })).toBe(3094);
  });
  // Source: IEC 60034-1 Table 16, from memory: at least 1500 V.
  it('a shop that works to IEC 60034-1 sets the floor of 1500 V', () => {
    const iec = { ...DEFAULT_MACHINE_TEST_LIMITS, highPotentialFloorV: { ...DEFAULT_MACHINE_TEST_LIMITS.highPotentialFloorV, value: 1500 } };
    const of = (ratedVoltageV: number) => highPotentialLevel({ case: 'new-winding', ratedVoltageV, ratedPowerW: null, supply: 'ac' }, iec).voltsV;
    expect([of(230), of(250), of(400)]).toEqual([1500, 1500, 1800]);
  });
  it('says how the volts came about', () => {
    expect(highPotentialLevel({ case: 'reconditioned', ratedVoltageV: 400, ratedPowerW: null, supply: 'dc' }).words).toBe('(2 × 400 V + 1000 V) × 65 % × 1.7 for DC');
  });
  it('asks for what is missing', () => {
    expect(() => level('wound-rotor', 400)).toThrow(/slip rings/);
    expect(() => level('new-winding', NaN)).toThrow(/rated volts/);
    expect(() => level('new-winding', 0)).toThrow(/rated volts/);
    expect(() => level('new-winding', 400, { ratedPowerW: -1 })).toThrow(/rated power/);
  });
});
