import type { ApproveForCustomer } from '@shared/quotes';
import { describe, expect, it } from 'vitest';
import { approvalProblem } from './approval-rules.js';

const NOW = new Date('2026-03-10T10:00:00.000Z');
const QUOTE = { grossMinor: 119_000, createdAt: '2026-03-09T08:30:40.000Z' };
const byPhone = (more: Partial<ApproveForCustomer> = {}): ApproveForCustomer => ({ version: 2, how: 'phone', approvedBy: 'H. Brandt', approvedAt: '2026-03-10T09:55:00Z', purchaseOrder: '', notToExceedMinor: 120_000, ...more });
const problem = (input: ApproveForCustomer) => approvalProblem(input, QUOTE, NOW, (minor) => `${minor / 100} EUR`);

describe('an approval taken down for the customer', () => {
  it('by phone stands with a name, a time and a limit', () => {
    expect(problem(byPhone())).toBeNull();
  });

  it('by phone needs the limit', () => {
    expect(problem(byPhone({ notToExceedMinor: null }))).toMatchObject({ code: 'INPUT_NOT_VALID', path: 'notToExceedMinor' });
  });

  it('with a limit of exactly the total stands; one cent less does not, and both sums are named', () => {
    expect(problem(byPhone({ notToExceedMinor: 119_000 }))).toBeNull();
    const short = problem(byPhone({ notToExceedMinor: 118_999 }));
    expect(short).toMatchObject({ code: 'AMOUNT_NOT_RIGHT' });
    expect(short!.words).toContain('1189.99 EUR');
    expect(short!.words).toContain('1190 EUR');
  });

  it('by purchase order needs its number and no limit, but a limit that is named counts', () => {
    expect(problem(byPhone({ how: 'purchase-order', notToExceedMinor: null }))).toMatchObject({ path: 'purchaseOrder' });
    expect(problem(byPhone({ how: 'purchase-order', purchaseOrder: '4500017', notToExceedMinor: null }))).toBeNull();
    expect(problem(byPhone({ how: 'purchase-order', purchaseOrder: '4500017', notToExceedMinor: 100 }))).toMatchObject({ code: 'AMOUNT_NOT_RIGHT' });
  });

  it('is not in the future, but a clock five minutes ahead is forgiven', () => {
    expect(problem(byPhone({ approvedAt: '2026-03-10T10:05:00Z' }))).toBeNull();
    expect(problem(byPhone({ approvedAt: '2026-03-10T10:05:01Z' }))).toMatchObject({ path: 'approvedAt' });
  });

  it('is not older than the quote, to the minute', () => {
    expect(problem(byPhone({ approvedAt: '2026-03-09T08:30:00Z' }))).toBeNull();
    expect(problem(byPhone({ approvedAt: '2026-03-09T08:29:59Z' }))).toMatchObject({ path: 'approvedAt' });
    expect(problem(byPhone({ approvedAt: '2026-03-09T09:30:00+01:00' }))).toBeNull();
  });
});
