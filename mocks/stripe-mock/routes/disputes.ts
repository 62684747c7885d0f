import type Stripe from 'stripe';
import { z } from 'zod';
import { acceptDispute, giveEvidence } from '../engine/disputes.js';
import { missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { clearableText, created, metadata, onList, text, yesNo } from '../http/params.js';
import type { Dispute } from '../objects/stored.js';
import type { World } from '../world.js';

const writing = () => clearableText(20_000).optional();
const evidence = z.strictObject({
  access_activity_log: writing(), billing_address: writing(), cancellation_policy_disclosure: writing(), cancellation_rebuttal: writing(),
  customer_email_address: writing(), customer_name: writing(), customer_purchase_ip: writing(), duplicate_charge_explanation: writing(),
  duplicate_charge_id: writing(), product_description: writing(), refund_policy_disclosure: writing(), refund_refusal_explanation: writing(),
  service_date: writing(), shipping_address: writing(), shipping_carrier: writing(), shipping_date: writing(), shipping_tracking_number: writing(),
  uncategorized_text: writing(),
} satisfies KnownParams<Stripe.DisputeUpdateParams.Evidence>);

export function disputeRoutes(on: Operation, world: World): void {
  const { disputes, fraudWarnings } = world.state;
  const found = (id: string): Dispute => {
    const dispute = disputes.find(id);
    if (!dispute) throw missing('dispute', id);
    return dispute;
  };

  on('GET', '/v1/disputes/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/disputes/:id', z.strictObject({ evidence: evidence.optional(), metadata: metadata().optional(), submit: yesNo().optional() }), (params, id) => {
    const dispute = found(id);
    dispute.metadata = mergedMetadata(dispute.metadata, params.metadata);
    const given = Object.fromEntries(Object.entries(params.evidence ?? {}).filter((entry): entry is [string, string] => entry[1] !== undefined));
    if (params.evidence || params.submit) giveEvidence(world, dispute, given, params.submit ?? true);
    return dispute;
  });
  on('POST', '/v1/disputes/:id/close', z.strictObject({}), (_params, id) => {
    const dispute = found(id);
    acceptDispute(world, dispute);
    return dispute;
  });
  on('GET', '/v1/disputes', z.strictObject({ ...onList, created: created(), charge: text().optional(), payment_intent: text().optional() }), (params) =>
    listPage(
      disputes
        .newestFirst()
        .filter(
          (dispute) =>
            createdFits(dispute.created, params.created) &&
            (params.charge === undefined || dispute.charge === params.charge) &&
            (params.payment_intent === undefined || dispute.payment_intent === params.payment_intent),
        ),
      params,
      '/v1/disputes',
      'dispute',
    ),
  );
  on('GET', '/v1/radar/early_fraud_warnings', z.strictObject({ ...onList, created: created(), charge: text().optional(), payment_intent: text().optional() }), (params) =>
    listPage(
      fraudWarnings.newestFirst().filter((warning) => createdFits(warning.created, params.created) && (params.charge === undefined || warning.charge === params.charge)),
      params,
      '/v1/radar/early_fraud_warnings',
      'early_fraud_warning',
    ),
  );
}
