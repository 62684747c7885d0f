import { z } from 'zod';
import { invalid, missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { listPage } from '../http/list-page.js';
import { mergedMetadata } from '../http/metadata.js';
import { clearableText, metadata, onList, text, webAddress, yesNo } from '../http/params.js';
import type { WebhookEndpoint } from '../objects/stored.js';
import { newId } from '../store/ids.js';
import { isLoopback } from '../webhooks/loopback.js';
import { API_VERSION, type World } from '../world.js';

const common = { enabled_events: z.array(text()).min(1), url: webAddress(), description: clearableText().optional(), metadata: metadata().optional() };

export function addEndpoint(world: World, url: string, events: string[], secret: string): WebhookEndpoint {
  if (!isLoopback(url)) throw invalid('The demo payment service sends webhooks to this machine only: use an address on 127.0.0.1 or localhost.', { param: 'url', code: 'url_invalid' });
  const endpoint = world.state.endpoints.add({
    id: newId('we'),
    object: 'webhook_endpoint',
    api_version: API_VERSION,
    application: null,
    created: world.clock.seconds(),
    description: null,
    enabled_events: events,
    livemode: false,
    metadata: {},
    status: 'enabled',
    url,
  });
  world.state.secrets[endpoint.id] = secret;
  return endpoint;
}

export function webhookEndpointRoutes(on: Operation, world: World): void {
  const { endpoints, secrets } = world.state;
  const found = (id: string): WebhookEndpoint => {
    const endpoint = endpoints.find(id);
    if (!endpoint) throw missing('webhook endpoint', id);
    return endpoint;
  };

  on('POST', '/v1/webhook_endpoints', z.strictObject({ ...common, api_version: text().optional() }), (params) => {
    const secret = newId('whsec');
    const endpoint = addEndpoint(world, params.url, params.enabled_events, secret);
    endpoint.description = params.description || null;
    endpoint.metadata = mergedMetadata(null, params.metadata);
    return { ...endpoint, secret };
  });
  on('GET', '/v1/webhook_endpoints/:id', z.strictObject({}), (_params, id) => found(id));
  on('POST', '/v1/webhook_endpoints/:id', z.strictObject({ ...common, disabled: yesNo() }).partial(), (params, id) => {
    const endpoint = found(id);
    if (params.url !== undefined && !isLoopback(params.url)) throw invalid('Use an address on this machine.', { param: 'url', code: 'url_invalid' });
    endpoint.url = params.url ?? endpoint.url;
    endpoint.enabled_events = params.enabled_events ?? endpoint.enabled_events;
    endpoint.description = params.description ?? endpoint.description;
    endpoint.metadata = mergedMetadata(endpoint.metadata, params.metadata);
    if (params.disabled !== undefined) endpoint.status = params.disabled ? 'disabled' : 'enabled';
    return endpoint;
  });
  on('DELETE', '/v1/webhook_endpoints/:id', z.strictObject({}), (_params, id) => {
    endpoints.remove(found(id).id);
    delete secrets[id];
    return { id, object: 'webhook_endpoint', deleted: true };
  });
  on('GET', '/v1/webhook_endpoints', z.strictObject(onList), (params) => listPage(endpoints.newestFirst(), params, '/v1/webhook_endpoints', 'webhook endpoint'));
}
