import { describe, expect, it } from 'vitest';
import type { PaymentFacts, SessionFacts } from './payment-service.js';
import { settlementOf, type AttemptFacts } from './settlement.js';

const attempt = (more: Partial<AttemptFacts> = {}): AttemptFacts => ({ id: 'attempt-1', invoiceId: 'invoice-1', amountMinor: 119_000, currency: 'EUR', state: 'open', ...more });
const money = (more: Partial<PaymentFacts> = {}): PaymentFacts => ({ intentId: 'pi_1', state: 'received', receivedMinor: 119_000, currency: 'EUR', receivedAt: '2026-03-02T09:00:00.000Z', reference: 'visa 4242', ...more });
const session = (more: Partial<SessionFacts> = {}): SessionFacts => ({ sessionId: 'cs_1', url: null, status: 'complete', attemptId: 'attempt-1', invoiceId: 'invoice-1', payment: money(), ...more });

describe('what follows from a payment page', () => {
  it('money that came in as asked for pays the invoice', () => {
    expect(settlementOf(attempt(), session(), false)).toMatchObject({ kind: 'pay', amountMinor: 119_000 });
  });

  it('the same money is booked once, whatever comes again', () => {
    expect(settlementOf(attempt({ state: 'complete' }), session(), true)).toEqual({ kind: 'nothing-new' });
  });

  it('a page that is open, or was left, changes nothing', () => {
    expect(settlementOf(attempt(), session({ status: 'open', payment: null }), false)).toEqual({ kind: 'nothing-new' });
    expect(settlementOf(attempt(), session({ status: 'open', payment: money({ state: 'failed', receivedMinor: 0 }) }), false)).toEqual({ kind: 'nothing-new' });
  });

  it('complete is not paid: money under way waits', () => {
    expect(settlementOf(attempt(), session({ payment: money({ state: 'under-way', receivedMinor: 0 }) }), false)).toEqual({ kind: 'under-way' });
  });

  it('a page that expired, and money that was refused later, close the attempt once', () => {
    expect(settlementOf(attempt(), session({ status: 'expired', payment: null }), false)).toEqual({ kind: 'closed' });
    expect(settlementOf(attempt({ state: 'expired' }), session({ status: 'expired', payment: null }), false)).toEqual({ kind: 'nothing-new' });
    expect(settlementOf(attempt(), session({ payment: money({ state: 'failed', receivedMinor: 0 }) }), false)).toEqual({ kind: 'closed' });
  });

  it('money counts even when the attempt had been given up', () => {
    expect(settlementOf(attempt({ state: 'expired' }), session(), false)).toMatchObject({ kind: 'pay' });
  });

  it.each([
    ['a cent less', session({ payment: money({ receivedMinor: 118_999 }) }), '118999'],
    ['a cent more', session({ payment: money({ receivedMinor: 119_001 }) }), '119001'],
    ['an amount nobody can tell', session({ payment: money({ receivedMinor: null }) }), 'unclear'],
    ['another currency', session({ payment: money({ currency: 'USD' }) }), 'USD'],
    ['another invoice', session({ invoiceId: 'invoice-2' }), 'another invoice'],
    ['another attempt', session({ attemptId: null }), 'another invoice'],
  ])('%s is for a person to look at and pays nothing', (_, facts, word) => {
    const settlement = settlementOf(attempt(), facts, false);
    expect(settlement.kind).toBe('needs-person');
    expect((settlement as { why: string }).why).toContain(word);
    expect(settlementOf(attempt({ state: 'complete' }), facts, false)).toEqual({ kind: 'nothing-new' });
  });

  it('every order of the same messages ends in the same state', () => {
    const life = [session({ status: 'open', payment: null }), session({ payment: money({ state: 'under-way', receivedMinor: 0 }) }), session()];
    for (const order of permutations([0, 1, 2, 2])) {
      let state: AttemptFacts['state'] = 'open';
      let booked = 0;
      for (const step of order) {
        const settlement = settlementOf(attempt({ state }), life[step]!, booked > 0);
        if (settlement.kind === 'pay') [state, booked] = ['complete', booked + 1];
        if (settlement.kind === 'closed') state = 'expired';
      }
      expect({ state, booked }).toEqual({ state: 'complete', booked: 1 });
    }
  });
});

function permutations<T>(items: readonly T[]): T[][] {
  if (items.length < 2) return [[...items]];
  return items.flatMap((item, i) => permutations([...items.slice(0, i), ...items.slice(i + 1)]).map((rest) => [item, ...rest]));
}
