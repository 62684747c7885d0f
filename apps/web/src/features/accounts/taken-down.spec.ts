import { recordPaymentSchema } from '@shared/invoices';
import { approveForCustomerSchema } from '@shared/quotes';
import { describe, expect, it } from 'vitest';
import { emptyApproval, localMinute, readApproval } from './approval-form.js';
import { filterOf, paramsOf } from './invoice-filter.js';
import { owedWords } from './invoice-sums.js';
import { paymentFormOf, readPayment } from './payment-form.js';
import { invoiceStateWords, quotePaperNumber, quoteStateWords } from './state-words.js';

const now = new Date('2026-12-01T09:30:00Z');

describe('an approval the shop takes down', () => {
  const phone = { ...emptyApproval(now), approvedBy: 'Timo Pakkarinen', notToExceedMinor: '6.700,00' };

  it('by phone has a name, a time and a limit', () => {
    const { candidate, problems } = readApproval(phone, 3, 'EUR');
    expect(problems).toEqual([]);
    expect(approveForCustomerSchema.parse(candidate)).toMatchObject({ version: 3, how: 'phone', approvedBy: 'Timo Pakkarinen', notToExceedMinor: 670_000, approvedAt: '2026-12-01T09:30:00.000Z' });
  });

  it('by phone asks for the limit', () => {
    expect(readApproval({ ...phone, notToExceedMinor: '' }, 3, 'EUR').problems.map((p) => p.path)).toEqual(['notToExceedMinor']);
  });

  it('by purchase order asks for its number, and takes no limit', () => {
    const order = { ...phone, how: 'purchase-order' as const, notToExceedMinor: '' };
    expect(readApproval(order, 3, 'EUR').problems.map((p) => p.path)).toEqual(['purchaseOrder']);
    expect(approveForCustomerSchema.parse(readApproval({ ...order, purchaseOrder: 'PO-77' }, 3, 'EUR').candidate).notToExceedMinor).toBeNull();
  });

  it('asks for the time when it was cleared', () => {
    expect(readApproval({ ...phone, approvedAt: '' }, 3, 'EUR').problems.map((p) => p.path)).toEqual(['approvedAt']);
  });

  it('shows the minute of this device’s clock', () => {
    expect(new Date(localMinute(now)).toISOString()).toBe('2026-12-01T09:30:00.000Z');
  });
});

describe('a payment written down by hand', () => {
  const invoice = { balanceMinor: 280_894, currency: 'EUR' };
  const form = paymentFormOf(invoice, '2026-12-01');

  it('begins with the whole balance, received today', () => {
    const { candidate, problems } = readPayment(form, 1, invoice);
    expect(problems).toEqual([]);
    expect(recordPaymentSchema.parse(candidate)).toEqual({ version: 1, kind: 'bank-transfer', amountMinor: 280_894, receivedOn: '2026-12-01', reference: '' });
  });

  it('may be a part of it', () => {
    expect(readPayment({ ...form, amountMinor: '1.000,00' }, 1, invoice)).toMatchObject({ problems: [], candidate: { amountMinor: 100_000 } });
  });

  it('is never more than the invoice asks for, and the words say how much that is', () => {
    const [problem] = readPayment({ ...form, amountMinor: '2808,95' }, 1, invoice).problems;
    expect(problem?.path).toBe('amountMinor');
    expect(problem?.message).toContain('2\u202f808.94\u00a0EUR');
  });

  it('is more than nothing, and has a day', () => {
    expect(readPayment({ ...form, amountMinor: '0', receivedOn: null }, 1, invoice).problems.map((p) => p.path)).toEqual(['amountMinor', 'receivedOn']);
    expect(readPayment({ ...form, amountMinor: 'all of it' }, 1, invoice).problems.map((p) => p.path)).toEqual(['amountMinor']);
  });
});

describe('how quotes and invoices stand', () => {
  it('a quote that ran out while it waited says so', () => {
    expect(quoteStateWords({ state: 'sent', expired: false }).words).toContain('waits');
    expect(quoteStateWords({ state: 'sent', expired: true }).words).toContain('past its last day');
    expect(quoteStateWords({ state: 'approved', expired: true }).words).toBe('approved');
  });

  it('an overdue invoice says so unless it is paid', () => {
    expect(invoiceStateWords({ state: 'open', overdue: true }).words).toBe('overdue');
    expect(invoiceStateWords({ state: 'part-paid', overdue: true }).words).toBe('part paid, overdue');
    expect(invoiceStateWords({ state: 'paid', overdue: false }).words).toBe('paid');
  });

  it('a revision carries its number on the paper', () => {
    expect(quotePaperNumber({ number: 'Q2026-0007', revision: 1 })).toBe('Q2026-0007');
    expect(quotePaperNumber({ number: 'Q2026-0007', revision: 3 })).toBe('Q2026-0007-r3');
  });

  it('money of two currencies is never added up', () => {
    expect(owedWords([{ currency: 'EUR', balanceMinor: 100 }, { currency: 'EUR', balanceMinor: 250 }, { currency: 'JPY', balanceMinor: 500 }])).toBe('3.50\u00a0EUR, 500\u00a0JPY');
    expect(owedWords([{ currency: 'EUR', balanceMinor: 0 }])).toBeNull();
  });

  it('an old link with a filter that is not known still opens the list', () => {
    expect(filterOf(new URLSearchParams('state=lost&q=R2026&page=2'))).toEqual({ q: 'R2026', page: 2 });
    expect(paramsOf({ state: 'overdue', q: 'dairy' })).toBe('state=overdue&q=dairy');
  });
});
