import { invalid } from '../http/api-error.js';
import { disputeFee } from '../objects/money.js';
import { newDispute, type DisputeReason } from '../objects/new-dispute.js';
import { newId } from '../store/ids.js';
import type { Charge, Dispute, FraudWarning } from '../objects/stored.js';
import { emit, later, type World } from '../world.js';
import { book } from './balance.js';

export const disputesOf = (world: World, charge: Charge): Dispute[] => world.state.disputes.where((dispute) => dispute.charge === charge.id);

const OVER: readonly string[] = ['won', 'warning_closed'];

/** What is left of a charge to be disputed: what was neither paid back nor is disputed already. */
export function disputable(world: World, charge: Charge, but?: Dispute): number {
  const claimed = disputesOf(world, charge).filter((dispute) => dispute !== but && !OVER.includes(dispute.status));
  return charge.status === 'succeeded' ? charge.amount - charge.amount_refunded - claimed.reduce((sum, dispute) => sum + dispute.amount, 0) : 0;
}

/** The holder tells their bank that they will not pay. An inquiry only asks; a chargeback takes the money at once. */
export function openDispute(world: World, charge: Charge, facts: { amount?: number | undefined; reason: DisputeReason; inquiry: boolean }): Dispute {
  const left = disputable(world, charge);
  if (left <= 0) throw invalid(`Charge ${charge.id} has nothing left to dispute.`);
  const amount = Math.min(left, facts.amount ?? left);
  const dispute = world.state.disputes.add(newDispute(charge, { amount, reason: facts.reason, inquiry: facts.inquiry }, world.clock.seconds()));
  charge.disputed = true;
  if (!facts.inquiry) withdraw(world, dispute);
  emit(world, 'charge.dispute.created', dispute);
  if (!facts.inquiry) emit(world, 'charge.dispute.funds_withdrawn', dispute);
  return dispute;
}

function withdraw(world: World, dispute: Dispute): void {
  dispute.balance_transactions.push(
    book(world, {
      type: 'adjustment', category: 'dispute', amount: -dispute.amount, fee: disputeFee(dispute.currency), currency: dispute.currency, source: dispute.id,
      description: `Chargeback withdrawal for ${dispute.charge}`,
    }),
  );
}

const WAITING: readonly string[] = ['needs_response', 'warning_needs_response'];

export function giveEvidence(world: World, dispute: Dispute, evidence: Record<string, string>, submit: boolean): void {
  if (!WAITING.includes(dispute.status)) throw invalid(`This dispute has a status of ${dispute.status}; its evidence can no longer be changed.`);
  const before = { evidence: { ...dispute.evidence }, status: dispute.status };
  Object.assign(dispute.evidence, Object.fromEntries(Object.entries(evidence).map(([key, value]) => [key, value === '' ? null : value])));
  if (Object.keys(evidence).length > 0) dispute.evidence_details.has_evidence = true;
  if (submit && dispute.evidence_details.has_evidence) {
    dispute.evidence_details.submission_count += 1;
    dispute.status = dispute.status === 'needs_response' ? 'under_review' : 'warning_under_review';
    const text = Object.values(dispute.evidence);
    const outcome = text.includes('winning_evidence') ? 'won' : text.includes('losing_evidence') ? 'lost' : undefined;
    if (outcome) later(world, world.settings.disputeDecidedAfterMs, { kind: 'dispute.decide', id: dispute.id, detail: outcome });
  }
  emit(world, 'charge.dispute.updated', dispute, before);
}

/** The bank has decided. An inquiry that goes badly becomes a chargeback, which can be answered again. */
export function decide(world: World, dispute: Dispute, outcome: 'won' | 'lost'): void {
  if (dispute.status === 'won' || dispute.status === 'lost' || dispute.status === 'warning_closed') throw invalid(`This dispute is closed: ${dispute.status}.`);
  const before = { status: dispute.status };
  const inquiry = dispute.status.startsWith('warning_');
  const charge = world.state.charges.find(dispute.charge);
  const left = charge ? disputable(world, charge, dispute) : 0;
  if (inquiry && outcome === 'lost' && left > 0) {
    // What was paid back since the question was asked is not taken a second time.
    dispute.amount = Math.min(dispute.amount, left);
    dispute.status = 'needs_response';
    dispute.is_charge_refundable = false;
    dispute.evidence_details.has_evidence = false;
    const card = dispute.payment_method_details?.card;
    if (card) card.case_type = 'chargeback';
    withdraw(world, dispute);
    emit(world, 'charge.dispute.updated', dispute, before);
    emit(world, 'charge.dispute.funds_withdrawn', dispute);
    return;
  }
  if (inquiry) {
    dispute.status = 'warning_closed';
  } else {
    dispute.status = outcome;
    dispute.is_charge_refundable = outcome === 'won';
    if (outcome === 'won') reinstate(world, dispute);
  }
  emit(world, 'charge.dispute.closed', dispute, before);
}

function reinstate(world: World, dispute: Dispute): void {
  dispute.balance_transactions.push(
    book(
      world,
      { type: 'adjustment', category: 'dispute_reversal', amount: dispute.amount, fee: 0, currency: dispute.currency, source: dispute.id, description: `Chargeback reversal for ${dispute.charge}` },
      true,
    ),
  );
  emit(world, 'charge.dispute.funds_reinstated', dispute);
}

/** The shop gives in without an answer. */
export function acceptDispute(world: World, dispute: Dispute): void {
  if (!WAITING.includes(dispute.status)) throw invalid(`This dispute has a status of ${dispute.status} and cannot be closed.`);
  const before = { status: dispute.status };
  dispute.status = dispute.status === 'needs_response' ? 'lost' : 'warning_closed';
  emit(world, 'charge.dispute.closed', dispute, before);
}

/** A question about a charge that has been paid back in full has answered itself. */
export function closeInquiryAfterRefund(world: World, charge: Charge): void {
  for (const dispute of disputesOf(world, charge)) {
    if (dispute.status !== 'warning_needs_response' && dispute.status !== 'warning_under_review') continue;
    const before = { status: dispute.status };
    dispute.status = 'warning_closed';
    world.agenda.cancel('dispute.decide', dispute.id);
    emit(world, 'charge.dispute.closed', dispute, before);
  }
}

export function warnOfFraud(world: World, charge: Charge): FraudWarning {
  const warning = world.state.fraudWarnings.add({
    id: newId('issfr'),
    object: 'radar.early_fraud_warning',
    actionable: true,
    charge: charge.id,
    created: world.clock.seconds(),
    fraud_type: 'made_with_stolen_card',
    livemode: false,
    ...(charge.payment_intent ? { payment_intent: charge.payment_intent } : {}),
  });
  emit(world, 'radar.early_fraud_warning.created', warning);
  return warning;
}
