import { describe, expect, it } from 'vitest';
import { nextTry } from './outbox-schedule.js';

const CREATED = new Date('2026-03-02T09:00:00.000Z');
const wait = (attempts: number) => {
  const next = nextTry(attempts, CREATED, CREATED);
  return next.giveUp ? null : (next.at.getTime() - CREATED.getTime()) / 1000;
};

describe('mail that did not leave', () => {
  it('is tried again after five seconds, then ever later, at most an hour apart', () => {
    expect([1, 2, 3, 10, 50].map(wait)).toEqual([5, 10, 20, 2560, 3600]);
  });
  it('is given up after three days, not before', () => {
    const threeDays = 3 * 24 * 3_600_000;
    expect(nextTry(80, CREATED, new Date(CREATED.getTime() + threeDays - 1)).giveUp).toBe(false);
    expect(nextTry(80, CREATED, new Date(CREATED.getTime() + threeDays)).giveUp).toBe(true);
  });
});
