import type Stripe from 'stripe';
import { z } from 'zod';
import { createRefund } from '../engine/refunds.js';
import { invalid, missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { created, metadata, onList, positive, text } from '../http/params.js';
import type { Refund } from '../objects/stored.js';
import { emit, type World } from '../world.js';

const body = z.strictObject({
  charge: text().optional(),
  payment_intent: text().optional(),
  amount: positive().optional(),
  reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
  metadata: metadata().optional(),
} satisfies KnownParams<Stripe.RefundCreateParams>);

export function refundRoutes(on: Operation, world: World): void {
  const { refunds } = world.state;
  const found = (id: string): Refund => {
    const refund = refunds.find(id);
    if (!refund) throw missing('refund', id);
    return refund;
  };

  on('POST', '/v1/refunds', body, (params) => createRefund(world, { ...params, metadata: mergedMetadata(null, params.metadata) }));
  on('GET', '/v1/refunds/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/refunds/:id', z.strictObject({ metadata: metadata().optional() }), (params, id) => {
    const refund = found(id);
    refund.metadata = mergedMetadata(refund.metadata, params.metadata);
    emit(world, 'refund.updated', refund);
    return refund;
  });
  on('POST', '/v1/refunds/:id/cancel', z.strictObject({}), (_params, id) => {
    const refund = found(id);
    throw invalid(`You can only cancel a refund that waits for the customer; this one has a status of ${refund.status}.`);
  });
  on('GET', '/v1/refunds', z.strictObject({ ...onList, created: created(), charge: text().optional(), payment_intent: text().optional() }), (params) =>
    listPage(
      refunds
        .newestFirst()
        .filter(
          (refund) =>
            createdFits(refund.created, params.created) &&
            (params.charge === undefined || refund.charge === params.charge) &&
            (params.payment_intent === undefined || refund.payment_intent === params.payment_intent),
        ),
      params,
      '/v1/refunds',
      'refund',
    ),
  );
}
