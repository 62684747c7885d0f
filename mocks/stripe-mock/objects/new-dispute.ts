import { newId } from '../store/ids.js';
import type { Charge, Dispute } from './stored.js';

export type DisputeReason = 'fraudulent' | 'product_not_received' | 'product_unacceptable' | 'duplicate' | 'credit_not_processed' | 'general' | 'unrecognized';

/** The card network's own number for a reason (10.4 fraud without the card present, 13.1 goods not received ...). */
const NETWORK_CODE: Record<DisputeReason, string> = {
  fraudulent: '10.4', product_not_received: '13.1', product_unacceptable: '13.3', duplicate: '12.6.1', credit_not_processed: '13.7', general: '12.5', unrecognized: '10.4',
};
export const isDisputeReason = (value: unknown): value is DisputeReason => typeof value === 'string' && Object.hasOwn(NETWORK_CODE, value);

const NO_EVIDENCE: Dispute['evidence'] = {
  access_activity_log: null, billing_address: null, cancellation_policy: null, cancellation_policy_disclosure: null, cancellation_rebuttal: null,
  customer_communication: null, customer_email_address: null, customer_name: null, customer_purchase_ip: null, customer_signature: null,
  duplicate_charge_documentation: null, duplicate_charge_explanation: null, duplicate_charge_id: null, enhanced_evidence: {},
  product_description: null, receipt: null, refund_policy: null, refund_policy_disclosure: null, refund_refusal_explanation: null,
  service_date: null, service_documentation: null, shipping_address: null, shipping_carrier: null, shipping_date: null,
  shipping_documentation: null, shipping_tracking_number: null, uncategorized_file: null, uncategorized_text: null,
};
const DAYS_TO_ANSWER = 9;

export function newDispute(charge: Charge, facts: { amount: number; reason: DisputeReason; inquiry: boolean }, created: number): Dispute {
  const card = charge.payment_method_details?.card;
  return {
    id: newId('dp'),
    object: 'dispute',
    amount: facts.amount,
    balance_transactions: [],
    charge: charge.id,
    created,
    currency: charge.currency,
    enhanced_eligibility_types: [],
    evidence: { ...NO_EVIDENCE, enhanced_evidence: {}, customer_email_address: charge.billing_details.email, customer_name: charge.billing_details.name },
    evidence_details: {
      due_by: created + DAYS_TO_ANSWER * 86_400,
      enhanced_eligibility: {},
      has_evidence: false,
      past_due: false,
      submission_count: 0,
      submission_method: 'manual',
    },
    intended_submission_method: 'manual',
    is_charge_refundable: facts.inquiry,
    livemode: false,
    metadata: {},
    network_reason_code: facts.inquiry ? '10' : NETWORK_CODE[facts.reason],
    payment_intent: charge.payment_intent,
    ...(card
      ? { payment_method_details: { card: { brand: card.brand ?? 'visa', network: card.network ?? 'visa', case_type: facts.inquiry ? ('inquiry' as const) : ('chargeback' as const), network_reason_code: NETWORK_CODE[facts.reason] }, type: 'card' as const } }
      : {}),
    reason: facts.reason,
    status: facts.inquiry ? 'warning_needs_response' : 'needs_response',
  } satisfies Dispute;
}
