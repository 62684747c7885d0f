import type { FloorRow } from '@shared/jobs';
import { describe, expect, it } from 'vitest';
import { queueOf } from './queue.js';

const row = (number: string, change: Partial<FloorRow>): FloorRow => ({
  id: `job-${number.toLowerCase()}`,
  number,
  customerName: 'Corvel Plastics',
  machine: '37 kW 4-pole',
  route: 'rewind',
  step: 'core-test-after',
  state: 'open',
  holdReason: null,
  waitingFor: null,
  promisedOn: '2026-04-02',
  receivedAt: '2026-03-14T07:30:00.000Z',
  late: false,
  coreVerdict: null,
  ...change,
});
const numbers = (entries: readonly { readonly job: FloorRow }[]) => entries.map((e) => e.job.number);

describe('the queue of the bay', () => {
  it('puts late jobs first, then the nearest promise, and jobs without a promise last', () => {
    const rows = [row('J-1', { promisedOn: null }), row('J-2', { promisedOn: '2026-04-09' }), row('J-3', {}), row('J-4', { promisedOn: '2026-05-01', late: true })];
    expect(numbers(queueOf(rows, null).now)).toEqual(['J-4', 'J-3', 'J-2', 'J-1']);
  });

  it('leaves out jobs that wait for the office, the customer or the door, and jobs that have ended', () => {
    const rows = [row('J-1', { step: 'awaiting-approval' }), row('J-2', { step: 'ready' }), row('J-3', { step: 'received' }), row('J-4', { state: 'scrapped' }), row('J-5', {})];
    expect(numbers(queueOf(rows, null).now)).toEqual(['J-5']);
  });

  it('keeps jobs on hold apart, in sight', () => {
    const queue = queueOf([row('J-1', { state: 'on-hold' }), row('J-2', {})], null);
    expect([numbers(queue.now), numbers(queue.held)]).toEqual([['J-2'], ['J-1']]);
  });

  it('names the next record to make by the step of the job', () => {
    const work = (change: Partial<FloorRow>) => queueOf([row('J-1', change)], null).now[0]!.work[0];
    expect(work({ step: 'incoming-test' })).toBe('incoming-test');
    expect(work({ step: 'strip-and-burnout' })).toBe('strip');
    expect(work({ step: 'core-test-after', coreVerdict: 'inconclusive' })).toBe('core-test-after');
    expect(work({ step: 'core-test-after', coreVerdict: 'does-not-conform' })).toBe('core-repair');
  });

  it('shows one step alone, and still counts all of them', () => {
    const queue = queueOf([row('J-1', { step: 'rewind' }), row('J-2', {}), row('J-3', {})], 'rewind');
    expect(numbers(queue.now)).toEqual(['J-1']);
    expect(queue.counts).toEqual([
      { step: 'core-test-after', jobs: 2 },
      { step: 'rewind', jobs: 1 },
    ]);
  });
});
