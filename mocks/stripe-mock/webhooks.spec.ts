import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { HOOK_SECRET, refusalOf, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';
import { signatureHeader } from './webhooks/sign.js';

describe('webhooks', () => {
  let shop: ShopBesideIt;
  beforeEach(async () => void (shop = await shopBesideIt()));
  afterEach(() => shop.close());
  const PAID = ['payment_intent.created', 'charge.succeeded', 'payment_intent.succeeded', 'checkout.session.completed'];

  it('carry a signature that the SDK accepts, and only over the very bytes that were sent', async () => {
    await shop.paid();
    await shop.mock.control.settled();
    const body = String(shop.received[0]?.body);
    const signature = String(shop.received[0]?.headers['stripe-signature']);
    expect(signature).toMatch(/^t=\d{10},v1=[0-9a-f]{64}$/);
    expect(Stripe.webhooks.constructEvent(body, signature, HOOK_SECRET).object).toBe('event');
    for (const [wrong, secret] of [[body.replace('false', 'true '), HOOK_SECRET], [JSON.stringify(JSON.parse(body)), HOOK_SECRET], [body, 'whsec_another']] as const) {
      expect(() => Stripe.webhooks.constructEvent(wrong, signature, secret)).toThrow(Stripe.errors.StripeSignatureVerificationError);
    }
  });

  it('are signed exactly as the SDK signs its own test headers', () => {
    const payload = '{"id":"evt_1"}';
    const theirs = Stripe.webhooks.generateTestHeaderString({ payload, secret: HOOK_SECRET, timestamp: 1_790_000_000 });
    expect(signatureHeader(payload, HOOK_SECRET, 1_790_000_000)).toBe(theirs);
  });

  it('tell of a payment in the order it happened, each with a snapshot of its moment', async () => {
    const { session, intent } = await shop.paid(12_000);
    await shop.mock.control.settled();
    expect(shop.types()).toEqual(PAID);
    const [created, , , completed] = shop.received.map(({ event }) => event);
    expect(created?.data.object).toMatchObject({ id: intent.id, status: 'requires_payment_method' });
    expect(completed).toMatchObject({ api_version: Stripe.API_VERSION, livemode: false, data: { object: { id: session.id, payment_status: 'paid', amount_total: 12_000 } } });
  });

  it('name the call and the key that caused them', async () => {
    const customer = await shop.stripe.customers.create({ name: 'Plant' }, { idempotencyKey: 'customer:1' });
    await shop.mock.control.settled();
    expect(shop.received[0]?.event.request).toEqual({ id: customer.lastResponse.requestId, idempotency_key: 'customer:1' });
  });

  it('come again when the shop was not well, until it answers 2xx', async () => {
    shop.answers.push(500, 302);
    await shop.stripe.customers.create({ name: 'Plant' });
    await shop.mock.control.settled();
    const event = (await shop.stripe.events.list({ delivery_success: false })).data[0];
    expect(event?.pending_webhooks).toBe(1);
    await shop.mock.control.advance(2);
    await shop.mock.control.advance(3);
    expect(shop.received.map(({ event: { id } }) => id)).toEqual([event?.id, event?.id, event?.id]);
    expect((await shop.stripe.events.retrieve(String(event?.id))).pending_webhooks).toBe(0);
    expect(shop.mock.control.deliveries()[0]).toMatchObject({ state: 'delivered', attempts: [{ status: 500 }, { status: 302 }, { status: 200 }] });
  });

  it('are given up after the last try, and can be sent again by hand', async () => {
    shop.answers.push(...Array.from({ length: 8 }, () => 503));
    await shop.stripe.customers.create({ name: 'Plant' });
    await shop.mock.control.settled();
    for (let tries = 0; tries < 8; tries += 1) await shop.mock.control.retryNow();
    expect(shop.mock.control.deliveries()[0]).toMatchObject({ state: 'given-up' });
    expect(shop.received).toHaveLength(8);
    await shop.mock.control.resend(String(shop.received[0]?.event.id));
    expect(shop.received).toHaveLength(9);
  });

  it('can be lost; the events are still to be read from the service', async () => {
    shop.mock.control.onEvents({ action: 'lose', type: '*' });
    const { session } = await shop.paid();
    await shop.mock.control.settled();
    expect(shop.received).toEqual([]);
    const missed = await shop.stripe.events.list({ type: 'checkout.session.completed' });
    expect(missed.data[0]?.data.object).toMatchObject({ id: session.id });
    expect((await shop.stripe.events.list({ types: ['charge.succeeded', 'payment_intent.succeeded'] })).data.map((event) => event.type)).toEqual(['payment_intent.succeeded', 'charge.succeeded']);
  });

  it('can come several times, and a rule ends after its number of events', async () => {
    shop.mock.control.onEvents({ action: 'repeat', type: 'checkout.session.completed', copies: 3, left: 1 });
    await shop.paid();
    await shop.paid();
    await shop.mock.control.settled();
    const completed = shop.received.filter(({ event }) => event.type === 'checkout.session.completed').map(({ event }) => event.id);
    expect(completed).toHaveLength(4);
    expect(new Set(completed).size).toBe(2);
  });

  it('can be held and let go backwards or in any order', async () => {
    shop.mock.control.onEvents({ action: 'hold' });
    await shop.paid();
    await shop.mock.control.settled();
    expect(shop.received).toEqual([]);
    await shop.mock.control.release('backwards');
    expect(shop.types()).toEqual([...PAID].reverse());
    shop.received.length = 0;
    await shop.paid();
    await shop.mock.control.release(['checkout.session.completed', 'charge.succeeded']);
    expect(shop.types()).toEqual(['checkout.session.completed', 'charge.succeeded']);
  });

  it('can be late', async () => {
    shop.mock.control.onEvents({ action: 'delay', type: 'charge.*', delayMs: 3_600_000 });
    await shop.paid();
    await shop.mock.control.settled();
    expect(shop.types()).not.toContain('charge.succeeded');
    await shop.mock.control.advance(3_601);
    expect(shop.types().at(-1)).toBe('charge.succeeded');
  });

  it('go to every endpoint that asks for them, signed with its own secret, shown once', async () => {
    const bodies: { body: string; signature: string }[] = [];
    const other = createServer((request, response) => {
      let body = '';
      request.on('data', (chunk: Buffer) => (body += chunk.toString('utf8')));
      request.on('end', () => {
        bodies.push({ body, signature: String(request.headers['stripe-signature']) });
        response.end();
      });
    });
    await new Promise<void>((done) => other.listen(0, '127.0.0.1', done));
    const url = `http://127.0.0.1:${(other.address() as AddressInfo).port}/hook`;
    const endpoint = await shop.stripe.webhookEndpoints.create({ url, enabled_events: ['charge.succeeded'] });
    expect(endpoint.secret).toMatch(/^whsec_/);
    expect((await shop.stripe.webhookEndpoints.retrieve(endpoint.id)).secret).toBeUndefined();
    await shop.paid();
    await shop.mock.control.settled();
    expect(bodies).toHaveLength(1);
    expect(Stripe.webhooks.constructEvent(bodies[0]?.body ?? '', bodies[0]?.signature ?? '', String(endpoint.secret)).type).toBe('charge.succeeded');
    await shop.stripe.webhookEndpoints.del(endpoint.id);
    await shop.paid();
    await shop.mock.control.settled();
    expect(bodies).toHaveLength(1);
    await new Promise((done) => other.close(done));
  });

  it('never leave this machine', async () => {
    expect((await refusalOf(shop.stripe.webhookEndpoints.create({ url: 'https://shop.example.com/hook', enabled_events: ['*'] }))).param).toBe('url');
    await expect(shopBesideIt({ webhookUrl: 'http://10.0.0.1/hook' })).rejects.toThrow('this machine only');
  });

  it('are kept for thirty days', async () => {
    const { id } = (await shop.stripe.customers.create({ name: 'Plant' }), (await shop.stripe.events.list()).data[0]) ?? { id: '' };
    await shop.mock.control.advance(31 * 86_400);
    expect((await refusalOf(shop.stripe.events.retrieve(id))).code).toBe('resource_missing');
  });
});
