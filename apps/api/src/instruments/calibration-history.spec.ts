import { describe, expect, it } from 'vitest';
import { doubtFrom, inOrder, isSuperseded } from './calibration-history.js';

const entry = (id: string, calibratedOn: string, at = `${calibratedOn}T12:00:00.000Z`) => ({ id, calibratedOn, at });
const older = entry('a', '2024-02-01');
const wrong = entry('b', '2025-02-03');
const corrected = entry('c', '2025-02-03', '2025-02-10T08:00:00.000Z');
const newest = entry('d', '2026-02-02');
const lateEntry = entry('e', '2023-01-30', '2026-02-03T08:00:00.000Z');
const ordered = inOrder([wrong, newest, lateEntry, older, corrected]);

describe('the history of an instrument’s calibrations', () => {
  it('goes by the day of the calibration, not by the day it was written down', () => {
    expect(ordered.map((e) => e.id)).toEqual(['d', 'c', 'b', 'a', 'e']);
  });
  it('of two entries of one day the later written one counts', () => {
    expect(ordered.filter((e) => isSuperseded(e, ordered)).map((e) => e.id)).toEqual(['b']);
  });
  it('found outside, an instrument is in doubt since the calibration before', () => {
    expect(doubtFrom(newest, ordered)).toBe('2025-02-03');
    expect(doubtFrom(corrected, ordered)).toBe('2024-02-01');
  });
  it('with nothing known before, the doubt goes back without end', () => {
    expect(doubtFrom(lateEntry, ordered)).toBeNull();
  });
});
