import type Stripe from 'stripe';
import { z } from 'zod';
import { methodFromAlias } from '../engine/payment-methods.js';
import { attempt, cancelIntent, capture, createIntent, unexpected } from '../engine/payments.js';
import { sessionOf } from '../engine/session-outcome.js';
import { refuseOddAmount } from '../engine/sessions.js';
import { ApiError, invalid, missing, missingRef } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { clearableText, created, currency, email, metadata, onList, positive, text, webAddress, yesNo } from '../http/params.js';
import { moneyText, smallestCharge } from '../objects/money.js';
import type { PaymentIntent } from '../objects/stored.js';
import type { World } from '../world.js';
import { customerRef } from './customers.js';

const common = {
  customer: text().optional(),
  description: clearableText(1000).optional(),
  metadata: metadata().optional(),
  receipt_email: email().optional(),
  payment_method: text().optional(),
  allowed_payment_method_types: z.array(z.enum(['card', 'us_bank_account'])).min(1).optional(),
  statement_descriptor_suffix: text(22).optional(),
};
const body = z.strictObject({
  ...common,
  amount: positive(),
  currency: currency(),
  confirm: yesNo().optional(),
  return_url: webAddress().optional(),
  capture_method: z.enum(['automatic', 'automatic_async', 'manual']).optional(),
  automatic_payment_methods: z.strictObject({ enabled: yesNo(), allow_redirects: z.enum(['always', 'never']).optional() }).optional(),
} satisfies KnownParams<Stripe.PaymentIntentCreateParams>);
const CONFIRMABLE: readonly string[] = ['requires_payment_method', 'requires_confirmation', 'requires_action'];

export function paymentIntentRoutes(on: Operation, world: World): void {
  const { paymentIntents } = world.state;
  const found = (id: string): PaymentIntent => {
    const intent = paymentIntents.find(id);
    if (!intent) throw missing('payment_intent', id, 'intent');
    return intent;
  };
  const ownOnly = (intent: PaymentIntent, verb: string): PaymentIntent => {
    if (sessionOf(world, intent)?.status === 'open') {
      throw invalid(`You cannot ${verb} this PaymentIntent because it was created by Checkout. Expire the Checkout Session instead.`, { code: 'payment_intent_unexpected_state' });
    }
    return intent;
  };

  on('POST', '/v1/payment_intents', body, (params) => {
    refuseOddAmount(params.amount, params.currency, `Amount must be at least ${moneyText(smallestCharge(params.currency), params.currency)}`);
    if (params.payment_method) methodOf(world, params.payment_method);
    const intent = createIntent(world, {
      amount: params.amount,
      currency: params.currency,
      customer: customerRef(world, params.customer),
      description: params.description || null,
      metadata: mergedMetadata(null, params.metadata),
      receiptEmail: params.receipt_email ?? null,
      statementDescriptorSuffix: params.statement_descriptor_suffix ?? null,
      allowedPaymentMethodTypes: params.allowed_payment_method_types ?? null,
      ...(params.capture_method ? { captureMethod: params.capture_method } : {}),
      automatic: params.automatic_payment_methods?.enabled ?? true,
    });
    if (params.payment_method) {
      intent.payment_method = methodOf(world, params.payment_method).id;
      intent.status = 'requires_confirmation';
    }
    return params.confirm ? confirm(world, intent, undefined, params.return_url) : intent;
  });
  on('GET', '/v1/payment_intents/:id', z.strictObject({ client_secret: text().optional() }), (_params, id) => found(id));
  on('POST', '/v1/payment_intents/:id', z.strictObject({ ...common, amount: positive().optional() }), (params, id) => {
    const intent = found(id);
    const changesMoney = params.amount !== undefined && params.amount !== intent.amount;
    if (changesMoney && !CONFIRMABLE.includes(intent.status)) throw unexpected(intent, 'change the amount of', CONFIRMABLE.join(', '));
    if (params.amount !== undefined && changesMoney) intent.amount = ownOnly(intent, 'change') && params.amount;
    if (params.customer !== undefined) intent.customer = customerRef(world, params.customer);
    if (params.description !== undefined) intent.description = params.description || null;
    if (params.receipt_email !== undefined) intent.receipt_email = params.receipt_email;
    if (params.payment_method !== undefined && CONFIRMABLE.includes(intent.status)) {
      intent.payment_method = methodOf(world, params.payment_method).id;
      intent.status = 'requires_confirmation';
    }
    intent.metadata = mergedMetadata(intent.metadata, params.metadata);
    return intent;
  });
  on('POST', '/v1/payment_intents/:id/confirm', z.strictObject({ payment_method: text(), return_url: webAddress(), receipt_email: email() } satisfies KnownParams<Stripe.PaymentIntentConfirmParams>).partial(), (params, id) =>
    confirm(world, ownOnly(found(id), 'confirm'), params.payment_method, params.return_url),
  );
  on('POST', '/v1/payment_intents/:id/capture', z.strictObject({ amount_to_capture: positive().optional(), metadata: metadata().optional() }), (params, id) => {
    const intent = found(id);
    capture(world, intent, params.amount_to_capture);
    intent.metadata = mergedMetadata(intent.metadata, params.metadata);
    return intent;
  });
  on('POST', '/v1/payment_intents/:id/cancel', z.strictObject({ cancellation_reason: z.enum(['abandoned', 'duplicate', 'fraudulent', 'requested_by_customer']).optional() }), (params, id) => {
    const intent = ownOnly(found(id), 'cancel');
    cancelIntent(world, intent, params.cancellation_reason ?? null);
    return intent;
  });
  on('GET', '/v1/payment_intents', z.strictObject({ ...onList, created: created(), customer: text().optional() }), (params) =>
    listPage(
      paymentIntents.newestFirst().filter((intent) => createdFits(intent.created, params.created) && (params.customer === undefined || intent.customer === params.customer)),
      params,
      '/v1/payment_intents',
      'payment_intent',
    ),
  );
}

function methodOf(world: World, id: string) {
  const method = world.state.paymentMethods.find(id) ?? methodFromAlias(world, id);
  if (!method) throw missingRef('PaymentMethod', id, 'payment_method');
  return method;
}

function confirm(world: World, intent: PaymentIntent, methodId: string | undefined, returnUrl: string | undefined): PaymentIntent {
  if (!CONFIRMABLE.includes(intent.status)) throw unexpected(intent, 'confirm', CONFIRMABLE.join(', '));
  const id = methodId ?? intent.payment_method;
  if (!id) {
    throw invalid("You cannot confirm this PaymentIntent because it's missing a payment method. Update the PaymentIntent with a payment method and then confirm it again.", {
      code: 'payment_intent_unexpected_state',
    });
  }
  const result = attempt(world, intent, methodOf(world, id), returnUrl ?? null);
  if (result.kind !== 'declined') return intent;
  const { error } = result;
  throw new ApiError(402, {
    type: 'card_error',
    message: error.message ?? 'Your card was declined.',
    payment_intent: intent,
    ...(error.code ? { code: error.code } : {}),
    ...(error.decline_code ? { decline_code: error.decline_code } : {}),
    ...(error.advice_code ? { advice_code: error.advice_code } : {}),
    ...(error.charge ? { charge: error.charge } : {}),
    ...(error.payment_method ? { payment_method: error.payment_method } : {}),
  });
}
