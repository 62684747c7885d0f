import { testCard } from '../cards/test-cards.js';
import { invalid, missingRef } from '../http/api-error.js';
import { moneyText } from '../objects/money.js';
import { newRefund } from '../objects/new-refund.js';
import type { Charge, Refund } from '../objects/stored.js';
import { emit, later, type World } from '../world.js';
import { book } from './balance.js';
import { closeInquiryAfterRefund, disputesOf } from './disputes.js';

export interface RefundRequest {
  charge?: string | undefined;
  payment_intent?: string | undefined;
  amount?: number | undefined;
  reason?: 'duplicate' | 'fraudulent' | 'requested_by_customer' | undefined;
  metadata: Record<string, string>;
}

export function createRefund(world: World, request: RefundRequest): Refund {
  const charge = chargeOf(world, request);
  const left = charge.amount - charge.amount_refunded;
  if (disputesOf(world, charge).some((dispute) => !dispute.is_charge_refundable)) {
    throw invalid(`Charge ${charge.id} has been charged back; cannot issue a refund.`, { code: 'charge_disputed' });
  }
  if (left <= 0) throw invalid(`Charge ${charge.id} has already been refunded.`, { code: 'charge_already_refunded' });
  const amount = request.amount ?? left;
  if (amount > left) {
    throw invalid(`Refund amount (${moneyText(amount, charge.currency)}) is greater than unrefunded amount on charge (${moneyText(left, charge.currency)})`, { param: 'amount' });
  }
  const number = world.state.behind[charge.payment_method ?? '']?.number ?? '';
  const outcome = testCard(number)?.outcome;
  const after = outcome?.kind === 'succeeds' ? outcome.then?.kind : undefined;
  const waits = after === 'refund-waits';
  const refund = world.state.refunds.add(
    newRefund(charge, { amount, reason: request.reason ?? null, metadata: request.metadata, status: waits ? 'pending' : 'succeeded' }, world.clock.seconds()),
  );
  refund.balance_transaction = book(world, {
    type: charge.id.startsWith('py_') ? 'payment_refund' : 'refund', category: 'refund', amount: -amount, fee: 0, currency: charge.currency, source: refund.id,
    description: `REFUND FOR CHARGE${charge.description ? ` (${charge.description})` : ''}`,
  }).id;
  const before = { amount_refunded: charge.amount_refunded, refunded: charge.refunded };
  charge.amount_refunded += amount;
  charge.refunded = charge.amount_refunded === charge.amount;
  emit(world, 'refund.created', refund);
  emit(world, 'charge.refunded', charge, before);
  if (charge.refunded) closeInquiryAfterRefund(world, charge);
  if (waits) later(world, world.settings.refundSettlesAfterMs, { kind: 'refund.settle', id: refund.id });
  if (after === 'refund-fails') later(world, world.settings.refundFailsAfterMs, { kind: 'refund.fail', id: refund.id });
  return refund;
}

function chargeOf(world: World, request: RefundRequest): Charge {
  if (!request.charge && !request.payment_intent) {
    throw invalid('One of the following params should be provided for this request: payment_intent or charge.', { code: 'parameter_missing' });
  }
  const intent = world.state.paymentIntents.find(request.payment_intent);
  if (request.payment_intent && !intent) throw missingRef('payment_intent', request.payment_intent, 'payment_intent');
  const charge = world.state.charges.find(request.charge ?? intent?.latest_charge);
  if (request.charge && !charge) throw missingRef('charge', request.charge, 'charge');
  if (intent && charge && charge.payment_intent !== intent.id) throw invalid(`Charge ${charge.id} does not belong to PaymentIntent ${intent.id}.`);
  if (!charge || charge.status !== 'succeeded') {
    throw invalid(intent ? `This PaymentIntent (${intent.id}) does not have a successful charge to refund.` : `Charge ${charge?.id} did not succeed; there is nothing to refund.`, { code: 'charge_not_refundable' });
  }
  if (!charge.captured) throw invalid(`Charge ${charge.id} has not been captured. Cancel its PaymentIntent instead.`, { code: 'charge_not_refundable' });
  return charge;
}

export function settleRefund(world: World, refund: Refund): void {
  if (refund.status !== 'pending') return;
  refund.status = 'succeeded';
  delete refund.pending_reason;
  emit(world, 'refund.updated', refund, { status: 'pending' });
  emit(world, 'charge.refund.updated', refund, { status: 'pending' });
}

/** The bank sends a refund back, also one that had succeeded: the money is on the account again and the charge is open again. */
export function failRefund(world: World, refund: Refund, reason: string): void {
  const charge = world.state.charges.find(refund.charge);
  if (!charge || (refund.status !== 'pending' && refund.status !== 'succeeded')) throw invalid(`Refund ${refund.id} has a status of ${refund.status} and cannot fail any more.`);
  const before = { status: refund.status };
  refund.status = 'failed';
  refund.failure_reason = reason;
  delete refund.pending_reason;
  refund.failure_balance_transaction = book(
    world,
    {
      type: charge.id.startsWith('py_') ? 'payment_failure_refund' : 'refund_failure', category: 'refund_failure', amount: refund.amount, fee: 0,
      currency: refund.currency, source: refund.id, description: 'REFUND FAILURE',
    },
    true,
  ).id;
  charge.amount_refunded -= refund.amount;
  charge.refunded = false;
  emit(world, 'refund.failed', refund, before);
  emit(world, 'refund.updated', refund, before);
  emit(world, 'charge.refund.updated', refund, before);
}
