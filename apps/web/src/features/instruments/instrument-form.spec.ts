import { describe, expect, it } from 'vitest';
import { blankInstrument, instrumentFrom, readInstrument, type InstrumentValues } from './instrument-form.js';

const typed = (text: string) => ({ text, system: 'si' as const });
const filled: InstrumentValues = {
  ...blankInstrument('si'),
  tag: 'W-01',
  kind: 'wattmeter',
  percentOfReading: typed('0,5'),
  percentOfRange: typed('0.2 %'),
  calibratedOn: '2025-11-04',
  dueOn: '2026-11-04',
};

describe('the form of an instrument', () => {
  it('takes percents as the maker prints them, with a comma or a percent sign', () => {
    const { input, problems } = readInstrument(filled);
    expect(problems).toEqual([]);
    expect(input).toMatchObject({ tag: 'W-01', kind: 'wattmeter', percentOfReading: 0.5, percentOfRange: 0.2 });
  });

  it('names each gap once, by its field', () => {
    expect(readInstrument(blankInstrument('si')).problems.map((p) => p.path).sort()).toEqual(['calibratedOn', 'dueOn', 'kind', 'percentOfRange', 'percentOfReading', 'tag']);
  });

  it('refuses a calibration that is due before it was made', () => {
    expect(readInstrument({ ...filled, dueOn: '2025-01-01' }).problems).toEqual([{ path: 'dueOn', message: 'It is due after it was calibrated.' }]);
  });

  it('refuses letters and more than a hundred percent', () => {
    expect(readInstrument({ ...filled, percentOfReading: typed('half') }).problems.map((p) => p.path)).toEqual(['percentOfReading']);
    expect(readInstrument({ ...filled, percentOfReading: typed('250') }).problems.map((p) => p.message)).toEqual(['0 to 100.']);
  });

  it('brings an instrument back as it was kept', () => {
    const { input } = readInstrument(filled);
    expect(readInstrument(instrumentFrom({ ...input, id: 'inst-0001', version: 1, standing: 'in-calibration' }, 'inch-pound')).input).toEqual(input);
  });
});
