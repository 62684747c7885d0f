import type { PaymentFacts, SessionFacts } from './payment-service.js';

/** Our own side of a payment page, as it stands in the database. */
export interface AttemptFacts {
  readonly id: string;
  readonly invoiceId: string;
  readonly amountMinor: number;
  readonly currency: string;
  readonly state: 'asked' | 'open' | 'complete' | 'expired';
}

export type Settlement =
  | { readonly kind: 'nothing-new' }
  /** money is on its way; the page is used up */
  | { readonly kind: 'under-way' }
  /** nothing will come in through this page any more */
  | { readonly kind: 'closed' }
  | { readonly kind: 'pay'; readonly payment: PaymentFacts; readonly amountMinor: number }
  /** money came in that does not fit what we asked for: recorded, not applied */
  | { readonly kind: 'needs-person'; readonly why: string };

/**
 * What follows for an invoice from how its payment page stands at the service. The answer depends on the state alone,
 * never on the order or number of the messages that led here, so it may be asked for any number of times.
 */
export function settlementOf(attempt: AttemptFacts, session: SessionFacts, alreadyBooked: boolean): Settlement {
  const { payment } = session;
  if (alreadyBooked) return { kind: 'nothing-new' };
  if (payment?.state === 'received') return received(attempt, session, payment);
  if (attempt.state === 'complete') return { kind: 'nothing-new' };
  if (session.status === 'expired') return attempt.state === 'expired' ? { kind: 'nothing-new' } : { kind: 'closed' };
  if (session.status === 'complete') return payment?.state === 'failed' ? (attempt.state === 'expired' ? { kind: 'nothing-new' } : { kind: 'closed' }) : { kind: 'under-way' };
  return { kind: 'nothing-new' };
}

function received(attempt: AttemptFacts, session: SessionFacts, payment: PaymentFacts): Settlement {
  const problems = [
    ...(session.attemptId === attempt.id && session.invoiceId === attempt.invoiceId ? [] : ['it was made for another invoice']),
    ...(payment.currency === attempt.currency ? [] : [`it came in ${payment.currency}, not in ${attempt.currency}`]),
    ...(payment.receivedMinor === attempt.amountMinor ? [] : [`the amount that came in (${payment.receivedMinor ?? 'unclear'}) is not the amount asked for (${attempt.amountMinor}), in the smallest unit`]),
  ];
  if (problems.length === 0 && payment.receivedMinor !== null) return { kind: 'pay', payment, amountMinor: payment.receivedMinor };
  // the attempt is complete once a person was told
  return attempt.state === 'complete' ? { kind: 'nothing-new' } : { kind: 'needs-person', why: problems.join('; ') };
}
