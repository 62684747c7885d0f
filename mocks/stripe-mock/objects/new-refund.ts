import { newId, randomText } from '../store/ids.js';
import type { Charge, Refund } from './stored.js';

export interface RefundOrder {
  amount: number;
  reason: Refund['reason'];
  metadata: Record<string, string>;
  status: 'pending' | 'succeeded';
}

export function newRefund(charge: Charge, order: RefundOrder, created: number): Refund {
  const card = charge.payment_method_details?.card;
  return {
    id: newId(charge.id.startsWith('py_') ? 'pyr' : 're'),
    object: 'refund',
    amount: order.amount,
    balance_transaction: null,
    charge: charge.id,
    created,
    currency: charge.currency,
    customer: charge.customer,
    customer_account: null,
    destination_details: card
      ? { card: { reference: `7${randomText(10).toUpperCase()}`, reference_status: 'pending', reference_type: 'acquirer_reference_number', type: 'refund' }, type: 'card' }
      : { type: 'us_bank_account', us_bank_transfer: { reference: null, reference_status: 'pending' } },
    metadata: order.metadata,
    payment_intent: charge.payment_intent,
    payment_method: charge.payment_method,
    ...(order.status === 'pending' ? { pending_reason: 'processing' as const } : {}),
    reason: order.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: order.status,
    transfer_reversal: null,
  } satisfies Refund;
}
