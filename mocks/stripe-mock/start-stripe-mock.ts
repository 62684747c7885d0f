import Fastify from 'fastify';
import type { AddressInfo } from 'node:net';
import { KeptFile } from '../kept-file.js';
import { lookRoutes } from '../look/look-routes.js';
import { controlRoutes } from './control/control-routes.js';
import { controlOf, type Control } from './control/control.js';
import { actOnAgenda } from './engine/act-on-agenda.js';
import { apiOn, takeForms } from './http/api.js';
import { ApiError } from './http/api-error.js';
import { Faults } from './http/faults.js';
import { listPage } from './http/list-page.js';
import { payRoutes } from './pay-page/pay-routes.js';
import { chargeRoutes } from './routes/charges.js';
import { sessionRoutes } from './routes/checkout-sessions.js';
import { customerRoutes } from './routes/customers.js';
import { disputeRoutes } from './routes/disputes.js';
import { eventRoutes } from './routes/events.js';
import { moneyRoutes } from './routes/money.js';
import { paymentIntentRoutes } from './routes/payment-intents.js';
import { paymentMethodRoutes } from './routes/payment-methods.js';
import { refundRoutes } from './routes/refunds.js';
import { addEndpoint, webhookEndpointRoutes } from './routes/webhook-endpoints.js';
import { Agenda } from './store/agenda.js';
import { Clock } from './store/clock.js';
import { newId } from './store/ids.js';
import { newState, type State, type StateFile } from './store/state.js';
import { isLoopback } from './webhooks/loopback.js';
import { Webhooks } from './webhooks/webhooks.js';
import type { Settings, World } from './world.js';

export interface StripeMockOptions {
  secretKey: string;
  host?: string;
  /** 0 or nothing: a free port. */
  port?: number;
  /** Where events go; without it, endpoints are made through the API. */
  webhookUrl?: string | undefined;
  webhookSecret?: string | undefined;
  /** Kept on disk here; without it, in memory only. */
  stateDir?: string | undefined;
  /** The address a browser reaches the pay page under, when it is not host and port. */
  publicUrl?: string | undefined;
  retryAfterMs?: readonly number[];
  answerWithinMs?: number;
  settings?: Partial<Omit<Settings, 'publicUrl'>>;
}

export interface StripeMock {
  port: number;
  url: string;
  state: State;
  control: Control;
  close(): Promise<void>;
}

const RETRY_AFTER_MS = [1_000, 2_000, 5_000, 15_000, 60_000, 300_000, 3_600_000];
const DAY_MS = 86_400_000;
const SETTINGS: Omit<Settings, 'publicUrl'> = {
  refundSettlesAfterMs: 30_000,
  refundFailsAfterMs: 60_000,
  disputeOpensAfterMs: 5_000,
  disputeDecidedAfterMs: 5_000,
  debitSettlesAfterMs: 30_000,
  moneyAvailableAfterMs: 2 * DAY_MS,
};

/** Start the demo payment service: its API, its pay page, its webhooks and its control page, on one port of this machine. */
export async function startStripeMock(options: StripeMockOptions): Promise<StripeMock> {
  if (!/^(sk|rk)_test_\w{4,}$/.test(options.secretKey)) throw new Error('The payment mock needs a test key of its own: sk_test_ and at least four letters or digits.');
  const host = options.host ?? '127.0.0.1';
  const file = new KeptFile<StateFile>(options.stateDir, 'stripe-mock.json');
  const kept = file.read();
  const clock = new Clock(kept?.offsetMs);
  const state = newState(newId('acct'), kept);
  const agenda = new Agenda(clock, kept?.agenda);
  const settings: Settings = { ...SETTINGS, ...options.settings, publicUrl: '' };
  const world: World = { state, clock, agenda, settings, request: null, announce: (event) => webhooks.announce(event) };
  const snapshot = (): StateFile => JSON.parse(JSON.stringify({ ...state, version: 1, offsetMs: clock.offsetMs, agenda }));
  const changed = () => file.writeSoon(snapshot);
  const webhooks = new Webhooks(world, { retryAfterMs: options.retryAfterMs ?? RETRY_AFTER_MS, answerWithinMs: options.answerWithinMs ?? 10_000 }, changed);
  const faults = new Faults();
  const control = controlOf({ world, webhooks, faults, changed });

  const app = Fastify({ logger: false, bodyLimit: 256 * 1024, forceCloseConnections: true });
  app.setErrorHandler((error, _request, reply) => {
    const refusal = error instanceof ApiError ? error : undefined;
    const status = refusal?.status ?? (error instanceof Error && 'statusCode' in error && typeof error.statusCode === 'number' ? error.statusCode : 500);
    if (status >= 500) process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
    void reply.status(status).send({ error: refusal?.body ?? { type: 'api_error', message: status < 500 && error instanceof Error ? error.message : 'The demo payment service failed.' } });
  });
  takeForms(app);
  const on = apiOn(app, {
    world, faults, secretKey: options.secretKey, changed,
    find: (id) => everything(state, id),
    hidden: (object, name) => hiddenPart(state, object, name),
  });
  for (const routes of [customerRoutes, sessionRoutes, paymentMethodRoutes, paymentIntentRoutes, chargeRoutes, refundRoutes, disputeRoutes, moneyRoutes, eventRoutes, webhookEndpointRoutes]) routes(on, world);
  lookRoutes(app);
  await app.register(async (part) => payRoutes(part, world, changed));
  await app.register(async (part) => controlRoutes(part, world, control));
  app.get('/', async (_request, reply) => reply.redirect('/_control', 302));

  await app.listen({ host, port: options.port ?? 0 });
  const { port } = app.server.address() as AddressInfo;
  const url = `http://${host}:${port}`;
  settings.publicUrl = options.publicUrl?.replace(/\/$/, '') ?? url;
  if (options.webhookUrl) useConfiguredEndpoint(world, options.webhookUrl, options.webhookSecret);
  agenda.start((item) => {
    try {
      if (item.kind === 'webhook.attempt') webhooks.attemptAgain(item.id);
      else actOnAgenda(world, item);
    } catch (error) {
      // One act that fails must not take the service down with it.
      process.stderr.write(`${item.kind} ${item.id}: ${error instanceof Error ? error.stack : String(error)}\n`);
    }
    changed();
  });
  webhooks.resume();

  return {
    port, url, state, control,
    async close() {
      agenda.close();
      faults.letGo();
      await webhooks.close();
      await app.close();
      file.writeNow(snapshot());
    },
  };
}

/** The endpoint of the configuration stands under its own id, so that a restart does not add a second one. */
function useConfiguredEndpoint(world: World, url: string, secret: string | undefined): void {
  if (!secret?.startsWith('whsec_')) throw new Error('The payment mock needs the webhook secret (whsec_...) that the application checks.');
  if (!isLoopback(url)) throw new Error('The payment mock sends webhooks to this machine only: use an address on 127.0.0.1 or localhost.');
  const known = world.state.endpoints.all().find((endpoint) => endpoint.metadata['configured'] === 'true');
  const endpoint = known ?? addEndpoint(world, url, ['*'], secret);
  endpoint.metadata['configured'] = 'true';
  endpoint.url = url;
  world.state.secrets[endpoint.id] = secret;
}

function everything(state: State, id: string): unknown {
  const { customers, sessions, paymentIntents, paymentMethods, charges, refunds, disputes, balanceTransactions } = state;
  for (const kind of [customers, sessions, paymentIntents, paymentMethods, charges, refunds, disputes, balanceTransactions]) {
    const found = kind.find(id);
    if (found) return found;
  }
  return undefined;
}

function hiddenPart(state: State, object: { [key: string]: unknown }, name: string): unknown {
  const id = String(object['id']);
  if (object['object'] === 'checkout.session' && name === 'line_items') return listPage(state.lineItems[id] ?? [], {}, `/v1/checkout/sessions/${id}/line_items`, 'line_item');
  if (object['object'] === 'charge' && name === 'refunds') return listPage(state.refunds.newestFirst().filter((refund) => refund.charge === id), {}, `/v1/charges/${id}/refunds`, 'refund');
  return undefined;
}
