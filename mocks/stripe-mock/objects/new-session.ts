import { newId } from '../store/ids.js';
import type { LineItem, Session } from './stored.js';

export interface LineOrder {
  name: string;
  currency: string;
  unitAmount: number;
  quantity: number;
  taxBehavior: 'exclusive' | 'inclusive' | 'unspecified';
}
export interface SessionOrder {
  lines: LineOrder[];
  successUrl: string;
  cancelUrl: string | null;
  customer: string | null;
  customerEmail: string | null;
  customerCreation: 'always' | 'if_required' | null;
  clientReferenceId: string | null;
  metadata: Record<string, string>;
  allowedPaymentMethodTypes: string[] | null;
  billingAddressCollection: 'auto' | 'required' | null;
  submitType: Session['submit_type'];
  locale: Session['locale'];
  expiresAt: number;
  publicUrl: string;
}

export function newLineItem(line: LineOrder, created: number): LineItem {
  const total = line.unitAmount * line.quantity;
  return {
    id: newId('li'),
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: total,
    amount_tax: 0,
    amount_total: total,
    currency: line.currency,
    description: line.name,
    metadata: {},
    price: {
      id: newId('price'),
      object: 'price',
      active: false,
      billing_scheme: 'per_unit',
      created,
      currency: line.currency,
      custom_unit_amount: null,
      livemode: false,
      lookup_key: null,
      metadata: {},
      nickname: null,
      product: newId('prod'),
      recurring: null,
      tax_behavior: line.taxBehavior,
      tiers_mode: null,
      transform_quantity: null,
      type: 'one_time',
      unit_amount: line.unitAmount,
      // Text on the wire; the SDK makes a Decimal of it.
      unit_amount_decimal: String(line.unitAmount),
    },
    quantity: line.quantity,
  } satisfies LineItem;
}

export function newSession(order: SessionOrder, created: number): Session {
  const id = newId('cs_test');
  const total = order.lines.reduce((sum, line) => sum + line.unitAmount * line.quantity, 0);
  return {
    id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: order.allowedPaymentMethodTypes,
    amount_subtotal: total,
    amount_total: total,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: order.billingAddressCollection,
    cancel_url: order.cancelUrl,
    client_reference_id: order.clientReferenceId,
    client_secret: null,
    collected_information: null,
    consent: null,
    consent_collection: null,
    created,
    currency: order.lines[0]?.currency ?? null,
    currency_conversion: null,
    custom_fields: [],
    custom_text: { after_submit: null, shipping_address: null, submit: null, terms_of_service_acceptance: null },
    customer: order.customer,
    customer_account: null,
    customer_creation: order.customer ? null : (order.customerCreation ?? 'if_required'),
    customer_details: order.customerEmail
      ? { address: null, business_name: null, email: order.customerEmail, individual_name: null, name: null, phone: null, tax_exempt: 'none', tax_ids: null }
      : null,
    customer_email: order.customerEmail,
    discounts: [],
    expires_at: order.expiresAt,
    integration_identifier: null,
    invoice: null,
    invoice_creation: {
      enabled: false,
      invoice_data: { account_tax_ids: null, custom_fields: null, description: null, footer: null, issuer: null, metadata: {}, rendering_options: null },
    },
    livemode: false,
    locale: order.locale,
    managed_payments: null,
    metadata: order.metadata,
    mode: 'payment',
    origin_context: null,
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: order.allowedPaymentMethodTypes ?? ['card'],
    payment_status: total === 0 ? 'no_payment_required' : 'unpaid',
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: order.submitType,
    subscription: null,
    success_url: order.successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: `${order.publicUrl}/c/pay/${id}`,
    wallet_options: null,
  } satisfies Session;
}
