import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { startStripeMock, type StripeMock } from '../../../mocks/stripe-mock/start-stripe-mock.js';
import { WEBHOOK_PATH } from '../src/http/setup.js';
import { openTestShop, type TestShop } from './test-app.js';

export const WEBHOOK_SECRET = 'whsec_test_shop';
const SECRET_KEY = 'sk_test_shop';

/** A shop and the payment service it is paid through, talking to each other on this machine. */
export interface PaymentTown {
  readonly shop: TestShop;
  readonly stripe: StripeMock;
  /** the service's own SDK, to look at what it knows */
  readonly look: Stripe;
  /** sends an event as the service would; what is not given is right */
  deliver(event: unknown, wrong?: { secret?: string; at?: Date; signature?: string | null; body?: string; type?: string }): Promise<{ status: number; text: string }>;
  close(): Promise<void>;
}

/** `events: 'delivered'` lets the service send its events by itself; otherwise a test delivers what it wants. */
export async function openPaymentTown(options: { events?: 'delivered' } = {}): Promise<PaymentTown> {
  const stripe = await startStripeMock({ secretKey: SECRET_KEY });
  const shop = await openTestShop({ stripe: { secretKey: SECRET_KEY, webhookSecret: WEBHOOK_SECRET, apiUrl: stripe.url } });
  shop.clock.set(new Date());
  await shop.app.listen(0, '127.0.0.1');
  const url = `http://127.0.0.1:${(shop.app.getHttpServer().address() as AddressInfo).port}${WEBHOOK_PATH}`;
  const look = new Stripe(SECRET_KEY, { host: '127.0.0.1', port: stripe.port, protocol: 'http', telemetry: false });
  if (options.events === 'delivered') {
    const endpoint = await look.webhookEndpoints.create({ url, enabled_events: ['*'] });
    stripe.state.secrets[endpoint.id] = WEBHOOK_SECRET;
  }
  return {
    shop,
    stripe,
    look,
    async deliver(event, wrong = {}) {
      const payload = JSON.stringify(event, null, 2);
      const timestamp = Math.floor((wrong.at ?? shop.clock.now()).getTime() / 1000);
      const signature = wrong.signature === undefined ? Stripe.webhooks.generateTestHeaderString({ payload, secret: wrong.secret ?? WEBHOOK_SECRET, timestamp }) : wrong.signature;
      const answer = await fetch(url, { method: 'POST', body: wrong.body ?? payload, headers: { 'content-type': wrong.type ?? 'application/json; charset=utf-8', ...(signature === null ? {} : { 'stripe-signature': signature }) } });
      return { status: answer.status, text: await answer.text() };
    },
    async close() {
      await shop.close();
      await stripe.close();
    },
  };
}
