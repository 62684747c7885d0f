import type Stripe from 'stripe';
import type { PaymentFacts, SessionFacts } from './payment-service.js';
import { fromServiceAmount } from './service-amount.js';

/** A session as the service answers it, with its payment and charge expanded, in our words. */
export function sessionFacts(session: Stripe.Checkout.Session): SessionFacts {
  const status = statusOf(session.status);
  const intent = typeof session.payment_intent === 'object' ? session.payment_intent : null;
  return {
    sessionId: session.id,
    url: session.url,
    status,
    attemptId: session.metadata?.['attemptId'] ?? null,
    invoiceId: session.metadata?.['invoiceId'] ?? null,
    payment: intent ? paymentFacts(intent, status) : null,
  };
}

/** A word we do not know is taken as open: nothing is decided on it. */
const statusOf = (status: string | null): SessionFacts['status'] => (status === 'complete' || status === 'expired' ? status : 'open');

function paymentFacts(intent: Stripe.PaymentIntent, sessionStatus: SessionFacts['status']): PaymentFacts {
  const currency = intent.currency.toUpperCase();
  const charge = typeof intent.latest_charge === 'object' ? intent.latest_charge : null;
  return {
    intentId: intent.id,
    state: stateOf(intent.status, sessionStatus),
    receivedMinor: fromServiceAmount(intent.amount_received, currency),
    currency,
    receivedAt: charge ? new Date(charge.created * 1000).toISOString() : null,
    reference: referenceOf(charge) ?? intent.id,
  };
}

function stateOf(status: Stripe.PaymentIntent.Status, sessionStatus: SessionFacts['status']): PaymentFacts['state'] {
  if (status === 'succeeded') return 'received';
  // a declined card leaves the page open for another; a page that is complete has no second try
  if (status === 'canceled') return 'failed';
  return status === 'requires_payment_method' && sessionStatus !== 'open' ? 'failed' : 'under-way';
}

function referenceOf(charge: Stripe.Charge | null): string | null {
  const card = charge?.payment_method_details?.card;
  return card?.last4 ? `${card.brand ?? 'card'} ending ${card.last4}` : null;
}
