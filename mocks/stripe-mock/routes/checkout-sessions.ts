import type Stripe from 'stripe';
import { z } from 'zod';
import { expireSession, createSession, type NewSession } from '../engine/sessions.js';
import { invalid, missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { clearableText, created, currency, email, metadata, notNegative, onList, positive, text, webAddress, whole } from '../http/params.js';
import type { Session } from '../objects/stored.js';
import type { World } from '../world.js';
import { customerRef } from './customers.js';

const line = z.strictObject({
  price_data: z.strictObject({
    currency: currency(),
    unit_amount: notNegative(),
    tax_behavior: z.enum(['exclusive', 'inclusive', 'unspecified']).optional(),
    product_data: z.strictObject({ name: text(), description: text().optional(), images: z.array(webAddress()).max(8).optional(), metadata: metadata().optional() }),
  }),
  quantity: positive(),
});
const intentData = z
  .strictObject({
    capture_method: z.enum(['automatic', 'automatic_async', 'manual']),
    description: clearableText(1000),
    metadata: metadata(),
    receipt_email: email(),
    setup_future_usage: z.enum(['off_session', 'on_session']),
    statement_descriptor: text(22),
    statement_descriptor_suffix: text(22),
  } satisfies KnownParams<Stripe.Checkout.SessionCreateParams.PaymentIntentData>)
  .partial();
const body = z.strictObject({
  mode: z.enum(['payment']),
  ui_mode: z.enum(['hosted_page']).optional(),
  line_items: z.array(line).min(1).max(100),
  success_url: webAddress(),
  cancel_url: webAddress().optional(),
  client_reference_id: text(200).optional(),
  customer: text().optional(),
  customer_email: email().optional(),
  customer_creation: z.enum(['always', 'if_required']).optional(),
  expires_at: whole().optional(),
  metadata: metadata().optional(),
  payment_intent_data: intentData.optional(),
  allowed_payment_method_types: z.array(z.enum(['card', 'us_bank_account'])).min(1).optional(),
  billing_address_collection: z.enum(['auto', 'required']).optional(),
  submit_type: z.enum(['auto', 'book', 'donate', 'pay']).optional(),
  locale: z.enum(['auto', 'de', 'en', 'en-GB', 'es', 'fr', 'it', 'nl']).optional(),
} satisfies KnownParams<Stripe.Checkout.SessionCreateParams>);
const filters = z.strictObject({
  ...onList,
  created: created(),
  customer: text().optional(),
  customer_details: z.strictObject({ email: text() }).optional(),
  payment_intent: text().optional(),
  status: z.enum(['complete', 'expired', 'open']).optional(),
} satisfies KnownParams<Stripe.Checkout.SessionListParams>);

export function sessionRoutes(on: Operation, world: World): void {
  const { sessions, lineItems } = world.state;
  const found = (id: string): Session => {
    const session = sessions.find(id);
    if (!session) throw missing('checkout.session', id, 'session');
    return session;
  };

  on('POST', '/v1/checkout/sessions', body, (params) => createSession(world, orderOf(world, params)));
  on('GET', '/v1/checkout/sessions/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/checkout/sessions/:id', z.strictObject({ metadata: metadata().optional() }), (params, id) => {
    const session = found(id);
    session.metadata = mergedMetadata(session.metadata, params.metadata);
    return session;
  });
  on('POST', '/v1/checkout/sessions/:id/expire', z.strictObject({}), (_params, id) => {
    const session = found(id);
    expireSession(world, session);
    return session;
  });
  on('GET', '/v1/checkout/sessions/:id/line_items', z.strictObject(onList), (params, id) =>
    listPage(lineItems[found(id).id] ?? [], params, `/v1/checkout/sessions/${id}/line_items`, 'line_item'),
  );
  on('GET', '/v1/checkout/sessions', filters, (params) =>
    listPage(
      sessions
        .newestFirst()
        .filter(
          (session) =>
            createdFits(session.created, params.created) &&
            (params.customer === undefined || session.customer === params.customer) &&
            (params.customer_details === undefined || session.customer_details?.email === params.customer_details.email) &&
            (params.payment_intent === undefined || session.payment_intent === params.payment_intent) &&
            (params.status === undefined || session.status === params.status),
        ),
      params,
      '/v1/checkout/sessions',
      'checkout.session',
    ),
  );
}

function orderOf(world: World, params: z.output<typeof body>): NewSession {
  if (params.customer && params.customer_email) throw invalid('You may only specify one of these parameters: customer, customer_email.', { code: 'parameters_exclusive' });
  if (params.customer && params.customer_creation) throw invalid('`customer_creation` can only be used when `customer` is not set.', { param: 'customer_creation' });
  const intent = params.payment_intent_data ?? {};
  return {
    lines: params.line_items.map(({ price_data: price, quantity }) => ({
      name: price.product_data.name,
      currency: price.currency,
      unitAmount: price.unit_amount,
      quantity,
      taxBehavior: price.tax_behavior ?? 'unspecified',
    })),
    successUrl: params.success_url,
    cancelUrl: params.cancel_url ?? null,
    customer: customerRef(world, params.customer),
    customerEmail: params.customer_email ?? null,
    customerCreation: params.customer_creation ?? null,
    clientReferenceId: params.client_reference_id ?? null,
    metadata: mergedMetadata(null, params.metadata),
    allowedPaymentMethodTypes: params.allowed_payment_method_types ?? null,
    billingAddressCollection: params.billing_address_collection ?? null,
    submitType: params.submit_type ?? null,
    locale: params.locale ?? null,
    expiresAt: params.expires_at,
    intent: {
      metadata: mergedMetadata(null, intent.metadata),
      description: intent.description || null,
      receiptEmail: intent.receipt_email ?? null,
      captureMethod: intent.capture_method ?? 'automatic_async',
      setupFutureUsage: intent.setup_future_usage ?? null,
      statementDescriptor: intent.statement_descriptor ?? null,
      statementDescriptorSuffix: intent.statement_descriptor_suffix ?? null,
    },
  };
}
