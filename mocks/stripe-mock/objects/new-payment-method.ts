import { createHash } from 'node:crypto';
import type { TestCard } from '../cards/test-cards.js';
import { newId } from '../store/ids.js';
import type { PaymentMethod } from './stored.js';

export interface BillingDetails {
  name: string | null;
  email: string | null;
  phone: string | null;
  address: PaymentMethod['billing_details']['address'];
}
export const NO_BILLING: BillingDetails = { name: null, email: null, phone: null, address: null };

/** The same card always has the same fingerprint, whoever used it. */
export const fingerprintOf = (number: string): string => createHash('sha256').update(number).digest('base64url').replace(/[-_]/g, '0').slice(0, 16);

export function newCardMethod(card: TestCard, expiry: { month: number; year: number }, billing: BillingDetails, cvcGiven: boolean, created: number): PaymentMethod {
  return {
    id: newId('pm'),
    object: 'payment_method',
    allow_redisplay: 'unspecified',
    billing_details: { ...billing, tax_id: null },
    card: {
      brand: card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: cvcGiven ? 'unchecked' : null },
      country: 'US',
      display_brand: card.brand,
      exp_month: expiry.month,
      exp_year: expiry.year,
      fingerprint: fingerprintOf(card.number),
      funding: card.funding,
      generated_from: null,
      last4: card.number.slice(-4),
      networks: { available: [card.brand], preferred: null },
      regulated_status: 'unregulated',
      three_d_secure_usage: { supported: true },
      wallet: null,
    },
    created,
    customer: null,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'card',
  } satisfies PaymentMethod;
}

export function newBankMethod(accountNumber: string, routingNumber: string, billing: BillingDetails, created: number): PaymentMethod {
  return {
    id: newId('pm'),
    object: 'payment_method',
    allow_redisplay: 'unspecified',
    billing_details: { ...billing, tax_id: null },
    created,
    customer: null,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'us_bank_account',
    us_bank_account: {
      account_holder_type: 'individual',
      account_type: 'checking',
      bank_name: 'TEST BANK',
      financial_connections_account: null,
      fingerprint: fingerprintOf(accountNumber),
      last4: accountNumber.slice(-4),
      networks: { preferred: 'ach', supported: ['ach'] },
      routing_number: routingNumber,
      status_details: {},
    },
  } satisfies PaymentMethod;
}
