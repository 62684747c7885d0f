import { newId, randomText } from '../store/ids.js';
import type { Charge, PaymentIntent, PaymentMethod } from './stored.js';

export interface ChargeFacts {
  status: Charge['status'];
  captured: boolean;
  failure?: { code: string; message: string };
  outcome: NonNullable<Charge['outcome']>;
  threeDs: boolean;
  cvcCheck: 'pass' | 'fail' | null;
  receiptUrl: (chargeId: string) => string;
}

export function newCharge(intent: PaymentIntent, method: PaymentMethod, facts: ChargeFacts, created: number): Charge {
  const paid = facts.status === 'succeeded';
  const id = newId(method.type === 'card' ? 'ch' : 'py');
  return {
    id,
    object: 'charge',
    amount: intent.amount,
    amount_captured: paid && facts.captured ? intent.amount : 0,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: method.billing_details,
    calculated_statement_descriptor: intent.statement_descriptor ?? 'LOOPBAY DEMO',
    captured: facts.captured,
    created,
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: facts.failure?.code ?? null,
    failure_message: facts.failure?.message ?? null,
    fraud_details: {},
    livemode: false,
    metadata: { ...intent.metadata },
    on_behalf_of: null,
    outcome: facts.outcome,
    paid,
    payment_intent: intent.id,
    payment_method: method.id,
    payment_method_details: detailsOf(intent, method, facts),
    radar_options: {},
    receipt_email: intent.receipt_email,
    receipt_number: null,
    receipt_url: facts.status === 'failed' ? null : facts.receiptUrl(id),
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: intent.statement_descriptor,
    statement_descriptor_suffix: intent.statement_descriptor_suffix,
    status: facts.status,
    transfer_data: null,
    transfer_group: null,
  } satisfies Charge;
}

function detailsOf(intent: PaymentIntent, method: PaymentMethod, facts: ChargeFacts): NonNullable<Charge['payment_method_details']> {
  const bank = method.us_bank_account;
  if (bank) {
    return {
      type: 'us_bank_account',
      us_bank_account: {
        account_holder_type: bank.account_holder_type,
        account_type: bank.account_type,
        bank_name: bank.bank_name,
        fingerprint: bank.fingerprint,
        last4: bank.last4,
        payment_reference: null,
        routing_number: bank.routing_number,
      },
    };
  }
  const card = method.card;
  if (!card) return { type: method.type };
  return {
    type: 'card',
    card: {
      amount_authorized: facts.status === 'succeeded' ? intent.amount : null,
      authorization_code: facts.status === 'succeeded' ? randomText(6).toUpperCase() : null,
      brand: card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: facts.cvcCheck },
      country: card.country,
      electronic_commerce_indicator: facts.threeDs ? '05' : null,
      exp_month: card.exp_month,
      exp_year: card.exp_year,
      fingerprint: card.fingerprint ?? null,
      funding: card.funding,
      installments: null,
      last4: card.last4,
      mandate: null,
      network: card.brand,
      network_token: { used: false },
      network_transaction_id: randomText(15),
      regulated_status: 'unregulated',
      three_d_secure: facts.threeDs
        ? {
            authentication_flow: 'challenge',
            electronic_commerce_indicator: '05',
            exemption_indicator: null,
            result: 'authenticated',
            result_reason: null,
            transaction_id: randomText(28),
            version: '2.2.0',
          }
        : null,
      transaction_link_id: null,
      wallet: null,
    },
  };
}
