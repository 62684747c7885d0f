import { z } from 'zod';
import { missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import { mergedMetadata } from '../http/metadata.js';
import { created, metadata, onList, text } from '../http/params.js';
import type { Charge } from '../objects/stored.js';
import { emit, type World } from '../world.js';

export function chargeRoutes(on: Operation, world: World): void {
  const { charges } = world.state;
  const found = (id: string): Charge => {
    const charge = charges.find(id);
    if (!charge) throw missing('charge', id);
    return charge;
  };

  on('GET', '/v1/charges/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/charges/:id', z.strictObject({ metadata: metadata().optional(), description: text(1000).optional() }), (params, id) => {
    const charge = found(id);
    charge.metadata = mergedMetadata(charge.metadata, params.metadata);
    charge.description = params.description ?? charge.description;
    emit(world, 'charge.updated', charge);
    return charge;
  });
  on('GET', '/v1/charges', z.strictObject({ ...onList, created: created(), customer: text().optional(), payment_intent: text().optional() }), (params) =>
    listPage(
      charges
        .newestFirst()
        .filter(
          (charge) =>
            createdFits(charge.created, params.created) &&
            (params.customer === undefined || charge.customer === params.customer) &&
            (params.payment_intent === undefined || charge.payment_intent === params.payment_intent),
        ),
      params,
      '/v1/charges',
      'charge',
    ),
  );
}
