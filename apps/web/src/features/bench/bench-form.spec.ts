import { coreTestReadingsSchema } from '@shared/core-tests';
import { describe, expect, it } from 'vitest';
import { afterFromBefore, benchFrom, blankBench, readBench, type BenchValues } from './bench-form.js';
import { sampleBefore } from '../../../test/sample-job.js';

const typed = (text: string, system: 'si' | 'inch-pound' = 'si') => ({ text, system });
const paths = (values: BenchValues) => readBench(values).problems.map((p) => p.path);

describe('the form of a core test', () => {
  it('gives a kept test back as the very readings it was kept with', () => {
    for (const machine of [2, 12] as const) {
      const kept = sampleBefore(machine);
      expect(readBench(benchFrom(kept, 'si')).readings).toEqual(kept);
      expect(readBench(benchFrom(kept, 'inch-pound')).readings).toEqual(kept);
    }
  });

  it('reads what the contract takes', () => {
    expect(coreTestReadingsSchema.safeParse(readBench(benchFrom(sampleBefore(12), 'si')).readings).success).toBe(true);
  });

  it('takes a decimal comma, a pasted unit and inches, and keeps what was typed beside the figure', () => {
    const values = benchFrom(sampleBefore(12), 'si');
    values.reading.searchVoltsV = typed('8,084');
    values.reading.wattsW = typed('0.04731 kW');
    values.geometry.outerDiameterM = typed('13 3/8', 'inch-pound');
    const { readings, entered, problems } = readBench(values);
    expect(problems).toHaveLength(1); // 8,084 may be eight thousand and eighty-four
    expect(problems[0]).toMatchObject({ path: 'reading.searchVoltsV' });
    expect(readings.reading.wattsW).toBeCloseTo(47.31, 9);
    expect(readings.geometry.outerDiameterM).toBeCloseTo(0.339725, 9); // 13.375 in of 25.4 mm each
    expect(entered['reading.wattsW']).toEqual({ text: '0.04731 kW', unit: 'kW' });
    expect(entered['geometry.outerDiameterM']).toEqual({ text: '13 3/8', unit: 'in' });
    values.temperatures.meanC = typed('29,4');
    expect(readBench(values).readings.temperatures.meanC).toBe(29.4);
  });

  it('names what is missing by the path of its reading', () => {
    expect(paths(blankBench('si', sampleBefore(12).geometry))).toEqual([
      'reading.excitingTurns',
      'reading.searchTurns',
      'reading.searchVoltsV',
      'reading.excitingA',
      'reading.wattsW',
      'temperatures.ambientC',
      'temperatures.startC',
      'temperatures.minutes',
    ]);
    expect(paths(blankBench('si', null)).slice(0, 5)).toEqual(['geometry.outerDiameterM', 'geometry.innerDiameterM', 'geometry.slotDepthM', 'geometry.slots', 'geometry.stackLengthM']);
  });

  it('keeps letters out of the readings and says where they stand', () => {
    const values = benchFrom(sampleBefore(12), 'si');
    values.reading.excitingA = typed('about 26');
    const { readings, problems } = readBench(values);
    expect(readings.reading.excitingA).toBeNaN();
    expect(problems).toEqual([{ path: 'reading.excitingA', message: expect.stringContaining('not a number') as string }]);
  });

  it('leaves the cable’s resistance out unless the wattmeter sat on the exciting terminals', () => {
    const values = benchFrom(sampleBefore(12), 'si');
    values.reading.cableResistanceOhm = typed('0.0528');
    expect(readBench(values).readings.reading.cableResistanceOhm).toBeUndefined();
    values.reading.wattmeterLead = 'exciting';
    expect(readBench(values).readings.reading.cableResistanceOhm).toBe(0.0528);
  });

  it('starts the test after with size, set-up and meters of the test before, but with no reading and no tick', () => {
    const before = sampleBefore(12);
    const { readings } = readBench(afterFromBefore(before, 'si'));
    expect(readings.geometry).toEqual(before.geometry);
    expect(readings.instruments).toEqual(before.instruments);
    expect(readings.setup).toEqual(before.setup);
    expect(readings.reading).toMatchObject({ excitingTurns: 16, searchTurns: 4, wattmeterLead: 'search', frequencyHz: 50 });
    for (const name of ['searchVoltsV', 'excitingA', 'wattsW'] as const) expect(readings.reading[name]).toBeNaN();
    expect(readings.temperatures.ambientC).toBeNaN();
    expect(Object.values(readings.checks)).not.toContain(true);
  });
});
