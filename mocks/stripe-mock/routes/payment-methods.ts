import type Stripe from 'stripe';
import { z } from 'zod';
import { methodFromAccount, methodFromAlias, methodFromCard } from '../engine/payment-methods.js';
import { invalid, missing, missingRef } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { email, metadata, onList, positive, text } from '../http/params.js';
import { NO_BILLING } from '../objects/new-payment-method.js';
import type { PaymentMethod } from '../objects/stored.js';
import { emit, type World } from '../world.js';
import { customerRef } from './customers.js';

const body = z.strictObject({
  type: z.enum(['card', 'us_bank_account']),
  card: z.union([z.strictObject({ token: text() }), z.strictObject({ number: text(19), exp_month: positive(), exp_year: positive(), cvc: text(4).optional() })]).optional(),
  us_bank_account: z.strictObject({ account_number: text(), routing_number: text(), account_holder_type: z.enum(['individual', 'company']).optional() }).optional(),
  billing_details: z.strictObject({ email: email(), name: text(), phone: text() }).partial().optional(),
  metadata: metadata().optional(),
} satisfies KnownParams<Stripe.PaymentMethodCreateParams>);

export function paymentMethodRoutes(on: Operation, world: World): void {
  const { paymentMethods } = world.state;
  const found = (id: string): PaymentMethod => {
    const method = paymentMethods.find(id) ?? methodFromAlias(world, id);
    if (!method) throw missing('payment_method', id, 'payment_method');
    return method;
  };

  on('POST', '/v1/payment_methods', body, (params) => {
    const method = made(world, params);
    method.metadata = mergedMetadata(null, params.metadata);
    return method;
  });
  on('GET', '/v1/payment_methods/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/payment_methods/:id/attach', z.strictObject({ customer: text() }), (params, id) => {
    const method = found(id);
    method.customer = customerRef(world, params.customer);
    emit(world, 'payment_method.attached', method);
    return method;
  });
  on('POST', '/v1/payment_methods/:id/detach', z.strictObject({}), (_params, id) => {
    const method = found(id);
    if (!method.customer) throw invalid('The payment method you provided is not attached to a customer so detachment is impossible.');
    method.customer = null;
    emit(world, 'payment_method.detached', method);
    return method;
  });
  on('GET', '/v1/payment_methods', z.strictObject({ ...onList, customer: text().optional(), type: text().optional() }), (params) =>
    listPage(
      paymentMethods
        .newestFirst()
        .filter((method) => method.customer !== null && (params.customer === undefined || method.customer === params.customer) && (params.type === undefined || method.type === params.type)),
      params,
      '/v1/payment_methods',
      'payment_method',
    ),
  );
}

function made(world: World, params: z.output<typeof body>): PaymentMethod {
  const { email: mail = null, name = null, phone = null } = params.billing_details ?? {};
  const billing = { ...NO_BILLING, email: mail, name, phone };
  const lacks = (param: string) => invalid(`Missing required param: ${param}.`, { code: 'parameter_missing', param });
  if (params.type === 'us_bank_account') {
    if (!params.us_bank_account) throw lacks('us_bank_account');
    return methodFromAccount(world, params.us_bank_account.account_number, params.us_bank_account.routing_number, billing);
  }
  if (!params.card) throw lacks('card');
  if ('token' in params.card) {
    const method = methodFromAlias(world, params.card.token);
    if (!method) throw missingRef('token', params.card.token, 'card[token]');
    method.billing_details = { ...billing, tax_id: null };
    return method;
  }
  return methodFromCard(world, { number: params.card.number, expMonth: params.card.exp_month, expYear: params.card.exp_year, cvc: params.card.cvc }, billing);
}
