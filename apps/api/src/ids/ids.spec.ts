import { describe, expect, it } from 'vitest';
import { SteppingClock } from '../clock/clock.js';
import { TimeSortedIds } from './ids.js';

describe('identifiers', () => {
  it('sort by the time they were made, also a thousand within one millisecond', () => {
    const clock = new SteppingClock(new Date('2026-03-02T09:00:00.000Z'));
    const ids = new TimeSortedIds(clock);
    const made = Array.from({ length: 1000 }, () => ids.next());
    clock.forward(1);
    made.push(ids.next());
    expect([...made].sort()).toEqual(made);
    expect(new Set(made).size).toBe(made.length);
  });
  it('keep their order when the clock is set back', () => {
    const clock = new SteppingClock(new Date('2026-03-02T09:00:00.000Z'));
    const ids = new TimeSortedIds(clock);
    const first = ids.next();
    clock.forward(-3_600_000);
    expect(ids.next() > first).toBe(true);
  });
  it('have the form of a UUID of version 7', () => {
    expect(new TimeSortedIds(new SteppingClock(new Date(0))).next()).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  });
});
