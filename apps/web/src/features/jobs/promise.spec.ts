import { describe, expect, it } from 'vitest';
import { promiseStanding } from './promise.js';

describe('how a promise stands', () => {
  it('is late from the day after it', () => {
    expect(promiseStanding('2026-11-30', '2026-12-01')).toEqual({ kind: 'late', days: 1 });
    expect(promiseStanding('2026-12-01', '2026-12-01')).toEqual({ kind: 'today' });
    expect(promiseStanding('2026-12-02', '2026-12-01')).toEqual({ kind: 'ahead', days: 1 });
  });

  it('counts calendar days over the change of the clock', () => {
    expect(promiseStanding('2026-10-20', '2026-10-30')).toEqual({ kind: 'late', days: 10 });
  });

  it('is none where no date was given, and late no more once the job has ended', () => {
    expect(promiseStanding(null, '2026-12-01')).toEqual({ kind: 'none' });
    expect(promiseStanding('2026-01-01', '2026-12-01', true).kind).toBe('ahead');
  });
});
