import { createServer, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { startStripeMock, type StripeMock, type StripeMockOptions } from './start-stripe-mock.js';

export const KEY = 'sk_test_demo1234';
export const HOOK_SECRET = 'whsec_demo1234';

export interface Received {
  body: string;
  headers: IncomingHttpHeaders;
  event: Stripe.Event;
}

/** For specs: the payment service with a small shop beside it that takes webhooks and calls through the official SDK. */
export interface ShopBesideIt {
  mock: StripeMock;
  stripe: Stripe;
  received: Received[];
  /** What the shop answers to the next webhooks; afterwards 200. */
  answers: number[];
  types(): string[];
  newSession(more?: Partial<Stripe.Checkout.SessionCreateParams>): Promise<Stripe.Response<Stripe.Checkout.Session>>;
  /** A paid session, its intent and its charge. */
  paid(amount?: number, card?: string): Promise<{ session: Stripe.Checkout.Session; intent: Stripe.PaymentIntent; charge: string }>;
  close(): Promise<void>;
}

export const sdkFor = (port: number, more: Stripe.StripeConfig = {}): Stripe =>
  new Stripe(KEY, { host: '127.0.0.1', port, protocol: 'http', telemetry: false, maxNetworkRetries: 0, ...more });

export async function shopBesideIt(options: Partial<StripeMockOptions> = {}): Promise<ShopBesideIt> {
  const received: Received[] = [];
  const answers: number[] = [];
  const shop = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      const body = Buffer.concat(chunks).toString('utf8');
      // Throws when the signature is not the service's own; the spec sees the 400 in the deliveries.
      try {
        const event = Stripe.webhooks.constructEvent(body, String(request.headers['stripe-signature']), HOOK_SECRET);
        received.push({ body, headers: request.headers, event });
        response.statusCode = answers.shift() ?? 200;
      } catch {
        response.statusCode = 400;
      }
      response.end('{}');
    });
  });
  await new Promise<void>((done) => shop.listen(0, '127.0.0.1', done));
  const shopPort = (shop.address() as AddressInfo).port;
  const mock = await startStripeMock({ secretKey: KEY, webhookUrl: `http://127.0.0.1:${shopPort}/webhook`, webhookSecret: HOOK_SECRET, ...options });
  const stripe = sdkFor(mock.port);

  const newSession: ShopBesideIt['newSession'] = (more = {}) =>
    stripe.checkout.sessions.create({
      mode: 'payment',
      success_url: `http://127.0.0.1:${shopPort}/paid?session={CHECKOUT_SESSION_ID}`,
      cancel_url: `http://127.0.0.1:${shopPort}/invoice`,
      line_items: [{ quantity: 1, price_data: { currency: 'usd', unit_amount: 318_450, product_data: { name: 'Invoice INV-2026-0042' } } }],
      ...more,
    });

  return {
    mock, stripe, received, answers, newSession,
    types: () => received.map(({ event }) => event.type),
    async paid(amount = 318_450, card = '4242424242424242') {
      const created = await newSession({ line_items: [{ quantity: 1, price_data: { currency: 'usd', unit_amount: amount, product_data: { name: 'Invoice' } } }] });
      mock.control.payWithCard(created.id, card);
      const session = await stripe.checkout.sessions.retrieve(created.id);
      const intent = await stripe.paymentIntents.retrieve(String(session.payment_intent));
      return { session, intent, charge: String(intent.latest_charge) };
    },
    async close() {
      await mock.close();
      await new Promise((done) => shop.close(done));
    },
  };
}

/** What a call is refused with. */
export async function refusalOf(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  try {
    await call;
  } catch (error) {
    if (error instanceof Stripe.errors.StripeError) return error;
    throw error;
  }
  throw new Error('The call was not refused.');
}
