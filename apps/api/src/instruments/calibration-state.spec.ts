import { describe, expect, it } from 'vitest';
import { calibrationStanding, pastGrace } from './calibration-state.js';

describe('an instrument’s calibration', () => {
  it('is in order while its date is more than thirty days away', () => {
    expect(calibrationStanding('2026-06-30', '2026-05-30')).toBe('in-calibration');
  });
  it('is due soon in the last thirty days, the day itself included', () => {
    expect(calibrationStanding('2026-06-30', '2026-05-31')).toBe('due-soon');
    expect(calibrationStanding('2026-06-30', '2026-06-30')).toBe('due-soon');
  });
  it('is overdue from the day after', () => {
    expect(calibrationStanding('2026-06-30', '2026-07-01')).toBe('overdue');
  });
  it('is only flagged for thirty days, and not counted from the thirty-first', () => {
    expect(pastGrace('2026-06-30', '2026-07-30')).toBe(false);
    expect(pastGrace('2026-06-30', '2026-07-31')).toBe(true);
  });
  it('that never comes due is never past it', () => {
    expect(pastGrace('9999-12-31', '2026-07-31')).toBe(false);
  });
});
