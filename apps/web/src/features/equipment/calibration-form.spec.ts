import { describe, expect, it } from 'vitest';
import { calibrationFormOf, readCalibration, type CalibrationForm } from './calibration-form.js';

const typed = (text: string) => ({ text, system: 'si' as const });
const filled = (more: Partial<CalibrationForm> = {}): CalibrationForm => ({ ...calibrationFormOf({ percentOfReading: 0.3, percentOfRange: 0.1 }, 'si'), calibratedOn: '2026-02-27', dueOn: '2027-02-27', asFound: 'within', ...more });
const paths = (form: CalibrationForm) => readCalibration(form, 4).problems.map((p) => p.path);

describe('the form of a calibration', () => {
  it('begins with the limits of error as they are, and is read as a certificate prints them', () => {
    expect(readCalibration(filled({ percentOfReading: typed('0,5 %'), certificateNumber: 'K-26-0120', laboratory: 'Town calibration service' }), 4)).toEqual({
      problems: [],
      input: { version: 4, calibratedOn: '2026-02-27', dueOn: '2027-02-27', certificateNumber: 'K-26-0120', laboratory: 'Town calibration service', asFound: 'within', asFoundWords: '', percentOfReading: 0.5, percentOfRange: 0.1 },
    });
  });

  it('names each gap once, by its field', () => {
    expect(paths({ ...calibrationFormOf({ percentOfReading: 0.3, percentOfRange: 0.1 }, 'si'), percentOfRange: typed('') }).sort()).toEqual(['asFound', 'calibratedOn', 'dueOn', 'percentOfRange']);
  });

  it('due before it was made, or found outside without a word on it, is told at the field', () => {
    expect(paths(filled({ dueOn: '2026-02-27' }))).toEqual(['dueOn']);
    expect(paths(filled({ asFound: 'outside' }))).toEqual(['asFoundWords']);
    expect(paths(filled({ asFound: 'outside', asFoundWords: 'Read 2.1 % high at 400 W.' }))).toEqual([]);
  });
});
