import { invalid } from '../http/api-error.js';
import { LARGEST_CHARGE, moneyText, smallestCharge } from '../objects/money.js';
import type { IntentOrder } from '../objects/new-payment-intent.js';
import { newLineItem, newSession, type SessionOrder } from '../objects/new-session.js';
import type { PaymentIntent, PaymentMethod, Session } from '../objects/stored.js';
import { emit, later, type World } from '../world.js';
import { attempt, cancelIntent, createIntent, type Attempt } from './payments.js';
import { completeSession } from './session-outcome.js';

const SHORTEST_LIFE_S = 30 * 60;
const LONGEST_LIFE_S = 24 * 3600;

export type NewSession = Omit<SessionOrder, 'publicUrl' | 'expiresAt'> & { expiresAt?: number | undefined; intent: Partial<IntentOrder> };

export function createSession(world: World, order: NewSession): Session {
  const created = world.clock.seconds();
  const currencies = new Set(order.lines.map((line) => line.currency));
  if (currencies.size !== 1) throw invalid('All line items must have the same currency.', { param: 'line_items' });
  const expiresAt = order.expiresAt ?? created + LONGEST_LIFE_S;
  if (expiresAt < created + SHORTEST_LIFE_S) throw invalid('The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.', { param: 'expires_at' });
  if (expiresAt > created + LONGEST_LIFE_S) throw invalid('The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.', { param: 'expires_at' });
  const session = newSession({ ...order, expiresAt, publicUrl: world.settings.publicUrl }, created);
  const total = session.amount_total ?? 0;
  const currency = session.currency ?? 'usd';
  if (total > 0) refuseOddAmount(total, currency, `The Checkout Session's total amount must convert to at least ${moneyText(smallestCharge(currency), currency)}.`);
  world.state.sessions.add(session);
  world.state.lineItems[session.id] = order.lines.map((line) => newLineItem(line, created));
  world.state.intentOrders[session.id] = order.intent;
  later(world, (expiresAt - created) * 1000, { kind: 'session.expire', id: session.id });
  return session;
}

/** Amounts the service does not take: too small, too large, or a thousandth that no bank can move. */
export function refuseOddAmount(amount: number, currency: string, tooSmall: string): void {
  if (amount < smallestCharge(currency)) throw invalid(tooSmall, { code: 'amount_too_small' });
  if (amount > LARGEST_CHARGE) throw invalid(`Amount must be no more than ${moneyText(LARGEST_CHARGE, currency)}`, { code: 'amount_too_large' });
  if (['bhd', 'jod', 'kwd', 'omr', 'tnd'].includes(currency) && amount % 10 !== 0) {
    throw invalid(`Invalid amount: the last digit of an amount in ${currency} must be 0.`, { code: 'invalid_charge_amount' });
  }
}

export function expireSession(world: World, session: Session): void {
  if (session.status !== 'open') {
    throw invalid(`Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of "${session.status}".`);
  }
  world.agenda.cancel('session.expire', session.id);
  session.status = 'expired';
  session.url = null;
  const intent = world.state.paymentIntents.find(session.payment_intent);
  if (intent && intent.status !== 'succeeded' && intent.status !== 'canceled') cancelIntent(world, intent, null);
  emit(world, 'checkout.session.expired', session);
}

export interface Payer {
  email: string;
  name: string | null;
}

/** Somebody pressed pay. The intent is made at the first try and used again at the next. */
export function paySession(world: World, session: Session, method: PaymentMethod, payer: Payer): { attempt: Attempt; intent: PaymentIntent } {
  refuseUnlessOpen(session);
  rememberPayer(session, payer);
  const intent = world.state.paymentIntents.find(session.payment_intent) ?? intentFor(world, session);
  session.payment_intent = intent.id;
  if (intent.status === 'requires_action') intent.next_action = null;
  return { attempt: attempt(world, intent, method, session.success_url), intent };
}

export function completeFree(world: World, session: Session, payer: Payer): void {
  refuseUnlessOpen(session);
  rememberPayer(session, payer);
  completeSession(world, session, 'no_payment_required');
}

function intentFor(world: World, session: Session): PaymentIntent {
  return createIntent(world, {
    ...world.state.intentOrders[session.id],
    amount: session.amount_total ?? 0,
    currency: session.currency ?? 'usd',
    customer: session.customer,
    allowedPaymentMethodTypes: session.payment_method_types.map((type) => (type === 'us_bank_account' ? type : 'card')),
  });
}

function rememberPayer(session: Session, payer: Payer): void {
  session.customer_details = {
    address: null, business_name: null, email: session.customer_email ?? payer.email, individual_name: null, name: payer.name, phone: null, tax_exempt: 'none', tax_ids: [],
  };
}

function refuseUnlessOpen(session: Session): void {
  if (session.status !== 'open') throw invalid(`This Checkout Session is ${session.status} and cannot be paid.`);
}
