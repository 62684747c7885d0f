import { describe, expect, it } from 'vitest';
import { sampleBefore } from '../../../test/sample-job.js';
import { changesBetween, saidReadings } from './reading-words.js';

const before = sampleBefore(12) as unknown as Record<string, unknown>;
const said = (readings: Record<string, unknown>, system: 'si' | 'inch-pound' = 'si') => new Map(saidReadings(readings, system, () => 'W-01').map((r) => [r.path, r]));

describe('a record in words', () => {
  it('gives every reading its name and its unit, in the person’s units', () => {
    expect(said(before).get('geometry.outerDiameterM')).toMatchObject({ label: 'Outside diameter', value: '340 mm' });
    expect(said(before, 'inch-pound').get('geometry.outerDiameterM')?.value).toBe('13.3858 in');
    expect(said(before).get('reading.searchVoltsV')?.value).toBe('8.096 V');
    expect(said(before).get('checks.rotorOut')?.value).toBe('yes');
    expect(said(before).get('instruments.wattmeterId')?.value).toBe('W-01');
    expect(said(before).get('frame.state')?.value).toBe('in frame');
  });

  it('leaves no reading of a core test without a name', () => {
    for (const { path, label } of saidReadings(before, 'si')) expect(label, path).not.toBe(path.split('.').at(-1));
  });

  it('numbers what there are several of, and says what was not done', () => {
    const test = said({ windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24 }, vibration: null, methods: ['re-insulate', 'grind'] });
    expect(test.get('windingResistance.resistancesOhm.1')).toMatchObject({ label: 'Winding resistance: Resistance 2', value: '0.01336 Ω' });
    expect(test.get('vibration')).toMatchObject({ label: 'Vibration', value: 'not recorded' });
    expect(test.get('methods')?.value).toBe('re insulate, grind');
  });

  it('finds what a correction changed, and nothing else', () => {
    const corrected = structuredClone(before) as { reading: { wattsW: number } };
    corrected.reading.wattsW = 41.2;
    expect(changesBetween(before, corrected as unknown as Record<string, unknown>, 'si')).toEqual([{ label: 'Watts', was: '40.01 W', is: '41.2 W' }]);
    expect(changesBetween(before, before, 'si')).toEqual([]);
  });
});
