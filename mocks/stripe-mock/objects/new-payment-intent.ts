import { newId, randomText } from '../store/ids.js';
import type { PaymentIntent } from './stored.js';

export interface IntentOrder {
  amount: number;
  currency: string;
  customer?: string | null;
  description?: string | null;
  metadata?: Record<string, string>;
  receiptEmail?: string | null;
  allowedPaymentMethodTypes?: PaymentIntent['allowed_payment_method_types'];
  captureMethod?: PaymentIntent['capture_method'];
  confirmationMethod?: PaymentIntent['confirmation_method'];
  statementDescriptor?: string | null;
  statementDescriptorSuffix?: string | null;
  setupFutureUsage?: PaymentIntent['setup_future_usage'];
  automatic?: boolean;
}

export function newPaymentIntent(order: IntentOrder, created: number): PaymentIntent {
  const id = newId('pi');
  return {
    id,
    object: 'payment_intent',
    allowed_payment_method_types: order.allowedPaymentMethodTypes ?? null,
    amount: order.amount,
    amount_capturable: 0,
    amount_details: { tip: {} },
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: order.automatic ? { allow_redirects: 'always', enabled: true } : null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: order.captureMethod ?? 'automatic_async',
    client_secret: `${id}_secret_${randomText(25)}`,
    confirmation_method: order.confirmationMethod ?? 'automatic',
    created,
    currency: order.currency,
    customer: order.customer ?? null,
    customer_account: null,
    description: order.description ?? null,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: order.metadata ?? {},
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: { card: { installments: null, mandate_options: null, network: null, request_three_d_secure: 'automatic' } },
    payment_method_types: order.allowedPaymentMethodTypes ?? ['card'],
    payment_record: null,
    processing: null,
    receipt_email: order.receiptEmail ?? null,
    review: null,
    setup_future_usage: order.setupFutureUsage ?? null,
    shipping: null,
    source: null,
    statement_descriptor: order.statementDescriptor ?? null,
    statement_descriptor_suffix: order.statementDescriptorSuffix ?? null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
  } satisfies PaymentIntent;
}
