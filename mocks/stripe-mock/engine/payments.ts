import { testAccount } from '../cards/test-accounts.js';
import { testCard, type CardOutcome, type TestCard } from '../cards/test-cards.js';
import { invalid } from '../http/api-error.js';
import { feeOn } from '../objects/money.js';
import { newCharge, type ChargeFacts } from '../objects/new-charge.js';
import { newPaymentIntent, type IntentOrder } from '../objects/new-payment-intent.js';
import type { Charge, PaymentError, PaymentIntent, PaymentMethod } from '../objects/stored.js';
import { emit, later, type World } from '../world.js';
import { book } from './balance.js';
import { completeSession, debitArrived, debitFailed, sessionOf } from './session-outcome.js';

export type Attempt = { kind: 'succeeded' | 'capturable' | 'processing' | 'needs-step' } | { kind: 'declined'; error: PaymentError };

const ACCEPTED: ChargeFacts['outcome'] = {
  advice_code: null, network_advice_code: null, network_decline_code: null, network_status: 'approved_by_network', reason: null,
  risk_level: 'normal', risk_score: 12, seller_message: 'Payment complete.', type: 'authorized',
};

export function createIntent(world: World, order: IntentOrder): PaymentIntent {
  const intent = world.state.paymentIntents.add(newPaymentIntent(order, world.clock.seconds()));
  emit(world, 'payment_intent.created', intent);
  return intent;
}

/** Try to pay an intent with a method. The method may need a further step of the holder, or money may arrive later. */
export function attempt(world: World, intent: PaymentIntent, method: PaymentMethod, returnUrl: string | null): Attempt {
  intent.payment_method = method.id;
  intent.last_payment_error = null;
  if (method.type !== 'card') return startDebit(world, intent, method);
  const card = cardOf(world, method);
  if (!card.threeDs) return askBank(world, intent, method, card, false);
  intent.status = 'requires_action';
  intent.next_action = { type: 'redirect_to_url', redirect_to_url: { url: `${world.settings.publicUrl}/c/step/${intent.id}`, return_url: returnUrl } };
  emit(world, 'payment_intent.requires_action', intent);
  return { kind: 'needs-step' };
}

/** The holder has come back from the bank's extra step. A second coming back changes nothing. */
export function finishStep(world: World, intent: PaymentIntent, passed: boolean): Attempt | undefined {
  const method = world.state.paymentMethods.find(intent.payment_method);
  if (intent.status !== 'requires_action' || !method) return undefined;
  intent.next_action = null;
  if (passed) return askBank(world, intent, method, cardOf(world, method), true);
  return putBack(world, intent, {
    type: 'invalid_request_error',
    code: 'payment_intent_authentication_failure',
    message: 'We are unable to authenticate your payment method. Please choose a different payment method and try again.',
    payment_method: method,
  });
}

function cardOf(world: World, method: PaymentMethod): TestCard {
  const card = testCard(world.state.behind[method.id]?.number ?? '');
  if (!card) throw invalid(`The payment method ${method.id} is not a test card.`);
  return card;
}

function askBank(world: World, intent: PaymentIntent, method: PaymentMethod, card: TestCard, threeDs: boolean): Attempt {
  const { outcome } = card;
  const cvcGiven = world.state.behind[method.id]?.cvcGiven ?? false;
  if (outcome.kind === 'declined' && (!outcome.onlyWithCvc || cvcGiven)) return decline(world, intent, method, outcome, threeDs);
  const manual = intent.capture_method === 'manual';
  const charge = addCharge(world, intent, method, { status: 'succeeded', captured: !manual, outcome: ACCEPTED, threeDs, cvcCheck: cvcGiven ? 'pass' : null });
  if (manual) {
    intent.status = 'requires_capture';
    intent.amount_capturable = intent.amount;
    emit(world, 'charge.succeeded', charge);
    emit(world, 'payment_intent.amount_capturable_updated', intent);
    const session = sessionOf(world, intent);
    if (session) completeSession(world, session, 'unpaid');
    return { kind: 'capturable' };
  }
  receive(world, intent, charge, charge.amount, outcome.kind === 'succeeds' && outcome.availableAtOnce === true);
  emit(world, 'charge.succeeded', charge);
  succeed(world, intent);
  foresee(world, charge, card);
  return { kind: 'succeeded' };
}

function decline(world: World, intent: PaymentIntent, method: PaymentMethod, outcome: Extract<CardOutcome, { kind: 'declined' }>, threeDs: boolean): Attempt {
  const charge = addCharge(world, intent, method, {
    status: 'failed',
    captured: false,
    failure: { code: outcome.code, message: outcome.message },
    outcome: {
      ...ACCEPTED,
      advice_code: outcome.advice ?? null,
      network_status: outcome.blocked ? 'not_sent_to_network' : 'declined_by_network',
      reason: outcome.blocked ? 'highest_risk_level' : (outcome.declineCode ?? outcome.code),
      risk_level: outcome.blocked ? 'highest' : 'normal',
      risk_score: outcome.blocked ? 92 : 12,
      seller_message: outcome.blocked ? 'The payment was blocked as too risky.' : 'The bank declined the payment.',
      type: outcome.blocked ? 'blocked' : 'issuer_declined',
    },
    threeDs,
    cvcCheck: outcome.code === 'incorrect_cvc' ? 'fail' : null,
  });
  emit(world, 'charge.failed', charge);
  return putBack(world, intent, {
    type: 'card_error',
    charge: charge.id,
    code: closedCode(outcome.code),
    message: outcome.message,
    payment_method: method,
    ...(outcome.advice ? { advice_code: outcome.advice } : {}),
    ...(outcome.declineCode ? { decline_code: outcome.declineCode } : {}),
  });
}

function closedCode(code: string): NonNullable<PaymentError['code']> {
  return code === 'expired_card' || code === 'incorrect_cvc' || code === 'processing_error' ? code : 'card_declined';
}

/** A failed attempt: the intent waits for another method and remembers why. */
function putBack(world: World, intent: PaymentIntent, error: PaymentError): Attempt {
  intent.status = 'requires_payment_method';
  intent.payment_method = null;
  intent.last_payment_error = error;
  emit(world, 'payment_intent.payment_failed', intent);
  return { kind: 'declined', error };
}

function addCharge(world: World, intent: PaymentIntent, method: PaymentMethod, facts: Omit<ChargeFacts, 'receiptUrl'>): Charge {
  const receiptUrl = (id: string) => `${world.settings.publicUrl}/c/receipt/${id}`;
  const charge = world.state.charges.add(newCharge(intent, method, { ...facts, receiptUrl }, world.clock.seconds()));
  intent.latest_charge = charge.id;
  return charge;
}

function receive(world: World, intent: PaymentIntent, charge: Charge, amount: number, atOnce: boolean): void {
  const fee = feeOn(amount, charge.currency);
  const line = book(world, { type: charge.id.startsWith('py_') ? 'payment' : 'charge', category: 'charge', amount, fee, currency: charge.currency, source: charge.id, description: charge.description }, atOnce);
  charge.balance_transaction = line.id;
  charge.captured = true;
  charge.amount_captured = amount;
  charge.amount_refunded = charge.amount - amount;
  intent.amount_received = amount;
  intent.amount_capturable = 0;
}

function succeed(world: World, intent: PaymentIntent): void {
  intent.status = 'succeeded';
  intent.processing = null;
  emit(world, 'payment_intent.succeeded', intent);
  const session = sessionOf(world, intent);
  if (session?.status === 'open') completeSession(world, session, 'paid');
  else if (session) session.payment_status = 'paid';
}

/** Cards that pay now and make trouble later. */
function foresee(world: World, charge: Charge, card: TestCard): void {
  const after = card.outcome.kind === 'succeeds' ? card.outcome.then : undefined;
  if (after?.kind === 'fraud-warning') later(world, world.settings.disputeOpensAfterMs, { kind: 'fraud.warn', id: charge.id });
  if (after?.kind !== 'dispute') return;
  const times = after.times ?? 1;
  for (let nth = 1; nth <= times; nth += 1) {
    later(world, world.settings.disputeOpensAfterMs * nth, { kind: 'dispute.open', id: charge.id, detail: JSON.stringify({ reason: after.reason, inquiry: after.inquiry === true, share: 1 / times }) });
  }
}

function startDebit(world: World, intent: PaymentIntent, method: PaymentMethod): Attempt {
  const charge = addCharge(world, intent, method, { status: 'pending', captured: true, outcome: { ...ACCEPTED, seller_message: 'Payment pending.' }, threeDs: false, cvcCheck: null });
  intent.status = 'processing';
  emit(world, 'charge.pending', charge);
  emit(world, 'payment_intent.processing', intent);
  const session = sessionOf(world, intent);
  if (session) completeSession(world, session, 'unpaid');
  later(world, world.settings.debitSettlesAfterMs, { kind: 'debit.settle', id: intent.id });
  return { kind: 'processing' };
}

/** The bank has answered about a debit, days after the order. */
export function settleDebit(world: World, intent: PaymentIntent): void {
  const charge = world.state.charges.find(intent.latest_charge);
  const method = world.state.paymentMethods.find(intent.payment_method);
  if (intent.status !== 'processing' || !charge || !method) return;
  const session = sessionOf(world, intent);
  const failure = testAccount(world.state.behind[method.id]?.number ?? '')?.failure;
  if (failure) {
    charge.status = 'failed';
    charge.paid = false;
    charge.captured = false;
    charge.failure_code = failure.code;
    charge.failure_message = failure.message;
    emit(world, 'charge.failed', charge);
    putBack(world, intent, { type: 'card_error', charge: charge.id, code: failure.code === 'account_closed' ? 'account_closed' : 'insufficient_funds', message: failure.message, payment_method: method });
    if (session) debitFailed(world, session);
    return;
  }
  charge.status = 'succeeded';
  charge.paid = true;
  receive(world, intent, charge, charge.amount, false);
  emit(world, 'charge.succeeded', charge);
  succeed(world, intent);
  if (session) debitArrived(world, session);
}

export function capture(world: World, intent: PaymentIntent, amount: number | undefined): void {
  const charge = world.state.charges.find(intent.latest_charge);
  if (intent.status !== 'requires_capture' || !charge) throw unexpected(intent, 'capture', 'requires_capture');
  const taken = amount ?? intent.amount_capturable;
  if (taken < 1 || taken > intent.amount_capturable) throw invalid(`The amount to capture must be between 1 and ${intent.amount_capturable}.`, { param: 'amount_to_capture' });
  receive(world, intent, charge, taken, false);
  emit(world, 'charge.captured', charge);
  succeed(world, intent);
}

const CANCELLABLE: readonly string[] = ['requires_payment_method', 'requires_confirmation', 'requires_action', 'requires_capture'];

export function cancelIntent(world: World, intent: PaymentIntent, reason: PaymentIntent['cancellation_reason']): void {
  if (!CANCELLABLE.includes(intent.status)) throw unexpected(intent, 'cancel', CANCELLABLE.join(', '));
  const charge = world.state.charges.find(intent.latest_charge);
  if (intent.status === 'requires_capture' && charge) {
    charge.amount_refunded = charge.amount;
    charge.refunded = true;
    emit(world, 'charge.refunded', charge);
  }
  intent.status = 'canceled';
  intent.canceled_at = world.clock.seconds();
  intent.cancellation_reason = reason;
  intent.amount_capturable = 0;
  intent.next_action = null;
  emit(world, 'payment_intent.canceled', intent);
}

export function unexpected(intent: PaymentIntent, verb: string, allowed: string): Error {
  return invalid(`You cannot ${verb} this PaymentIntent because it has a status of ${intent.status}. Only a PaymentIntent with one of the following statuses may be used: ${allowed}.`, {
    code: 'payment_intent_unexpected_state',
    payment_intent: intent,
  });
}
