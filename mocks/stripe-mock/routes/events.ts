import { z } from 'zod';
import { invalid, missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import { created, onList, text, yesNo } from '../http/params.js';
import { typeFits } from '../webhooks/delivery.js';
import type { World } from '../world.js';

const KEPT_FOR_S = 30 * 86_400;

export function eventRoutes(on: Operation, world: World): void {
  const { events } = world.state;
  const fresh = (event: { created: number }) => event.created > world.clock.seconds() - KEPT_FOR_S;

  on('GET', '/v1/events/:id', z.strictObject({}), (_params, id) => {
    const event = events.find(id);
    if (!event || !fresh(event)) throw missing('event', id);
    return event;
  });
  on('GET', '/v1/events', z.strictObject({ ...onList, created: created(), type: text().optional(), types: z.array(text()).max(20).optional(), delivery_success: yesNo().optional() }), (params) => {
    if (params.type !== undefined && params.types !== undefined) throw invalid('You may only specify one of these parameters: type, types.', { code: 'parameters_exclusive' });
    const patterns = params.types ?? (params.type === undefined ? ['*'] : [params.type]);
    const wanted = events
      .newestFirst()
      .filter(
        (event) =>
          fresh(event) &&
          createdFits(event.created, params.created) &&
          patterns.some((pattern) => typeFits(pattern, event.type)) &&
          (params.delivery_success === undefined || params.delivery_success === (event.pending_webhooks === 0)),
      );
    return listPage(wanted, params, '/v1/events', 'event');
  });
}
