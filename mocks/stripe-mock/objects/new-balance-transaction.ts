import { newId } from '../store/ids.js';
import type { BalanceTransaction } from './stored.js';

export interface Booking {
  type: BalanceTransaction['type'];
  category: 'charge' | 'refund' | 'refund_failure' | 'dispute' | 'dispute_reversal';
  amount: number;
  fee: number;
  currency: string;
  source: string;
  description: string | null;
  availableOn: number;
}

/** One line of the account: what came in or went out, what it cost, what is left. `amount - fee = net`, always. */
export function newBalanceTransaction(booking: Booking, created: number): BalanceTransaction {
  return {
    id: newId('txn'),
    object: 'balance_transaction',
    amount: booking.amount,
    available_on: booking.availableOn,
    balance_type: 'payments',
    created,
    currency: booking.currency,
    description: booking.description,
    exchange_rate: null,
    fee: booking.fee,
    fee_details:
      booking.fee === 0
        ? []
        : [
            {
              amount: booking.fee,
              application: null,
              currency: booking.currency,
              description: booking.category === 'dispute' ? 'Dispute fee' : 'Processing fees',
              type: 'stripe_fee',
            },
          ],
    net: booking.amount - booking.fee,
    reporting_category: booking.category,
    source: booking.source,
    status: booking.availableOn <= created ? 'available' : 'pending',
    type: booking.type,
  } satisfies BalanceTransaction;
}
