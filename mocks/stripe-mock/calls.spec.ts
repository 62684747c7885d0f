import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import Stripe from 'stripe';
import { KEY, refusalOf, sdkFor, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';
import { startStripeMock } from './start-stripe-mock.js';
import { API_VERSION } from './world.js';

describe('a call to the payment service', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());
  const raw = (path: string, init: RequestInit = {}) => fetch(`${shop.mock.url}${path}`, { ...init, headers: { authorization: `Bearer ${KEY}`, ...init.headers } });

  it('speaks the API version of the SDK in use', () => {
    expect(API_VERSION).toBe(Stripe.API_VERSION);
  });

  it('needs the test key, and refuses a live one', async () => {
    for (const key of ['sk_test_another1', `sk_${'live'}_abcdefgh1234`]) {
      const stranger = new Stripe(key, { host: '127.0.0.1', port: shop.mock.port, protocol: 'http', telemetry: false, maxNetworkRetries: 0 });
      expect(await refusalOf(stranger.balance.retrieve())).toMatchObject({ statusCode: 401, type: 'StripeAuthenticationError' });
    }
    expect((await fetch(`${shop.mock.url}/v1/balance`)).status).toBe(401);
    expect((await fetch(`${shop.mock.url}/v1/balance`, { headers: { authorization: `Basic ${Buffer.from(`${KEY}:`).toString('base64')}` } })).status).toBe(200);
    await expect(startStripeMock({ secretKey: `sk_${'live'}_abcdefgh` })).rejects.toThrow('test key');
  });

  it('names what it does not know and what is lacking', async () => {
    const unknown = await (await raw('/v1/customers', { method: 'POST', body: new URLSearchParams({ 'address[planet]': 'Mars' }) })).json();
    expect(unknown).toMatchObject({ error: { type: 'invalid_request_error', code: 'parameter_unknown', param: 'address[planet]' } });
    const lacking = await (await raw('/v1/checkout/sessions', { method: 'POST', body: new URLSearchParams({ mode: 'payment', success_url: 'http://127.0.0.1/', 'line_items[0][quantity]': '1' }) })).json();
    expect(lacking).toMatchObject({ error: { code: 'parameter_missing', param: 'line_items[0][price_data]' } });
    const noNumber = await (await raw('/v1/payment_intents', { method: 'POST', body: new URLSearchParams({ amount: '12.50', currency: 'usd' }) })).json();
    expect(noNumber).toMatchObject({ error: { code: 'parameter_invalid_integer', param: 'amount' } });
    // Gone from the API since this version: the filter is called allowed_payment_method_types.
    const gone = await (await raw('/v1/payment_intents', { method: 'POST', body: new URLSearchParams({ amount: '500', currency: 'usd', 'payment_method_types[0]': 'card' }) })).json();
    expect(gone).toMatchObject({ error: { code: 'parameter_unknown', param: 'payment_method_types' } });
    expect((await raw('/v1/subscriptions')).status).toBe(404);
  });

  it('gives every answer a number of its own', async () => {
    const answers = await Promise.all([raw('/v1/balance'), raw('/v1/customers/cus_none'), raw('/v1/nothing')]);
    const numbers = answers.map((answer) => answer.headers.get('request-id'));
    expect(new Set(numbers).size).toBe(3);
    for (const number of numbers) expect(number).toMatch(/^req_\w{14}$/);
  });

  it('answers 404 resource_missing for what is not there', async () => {
    for (const call of [
      shop.stripe.checkout.sessions.retrieve('cs_test_none'), shop.stripe.paymentIntents.retrieve('pi_none'), shop.stripe.charges.retrieve('ch_none'),
      shop.stripe.refunds.retrieve('re_none'), shop.stripe.disputes.retrieve('dp_none'), shop.stripe.customers.retrieve('cus_none'),
      shop.stripe.events.retrieve('evt_none'), shop.stripe.balanceTransactions.retrieve('txn_none'), shop.stripe.webhookEndpoints.retrieve('we_none'),
    ]) {
      expect(await refusalOf(call)).toMatchObject({ statusCode: 404, code: 'resource_missing' });
    }
  });

  it('pages through lists in both directions, newest first', async () => {
    const ids: string[] = [];
    for (let nth = 0; nth < 7; nth += 1) ids.unshift((await shop.stripe.customers.create({ email: 'list@example.com', name: `n${nth}` })).id);
    const first = await shop.stripe.customers.list({ email: 'list@example.com', limit: 3 });
    expect(first.data.map((customer) => customer.id)).toEqual(ids.slice(0, 3));
    expect(first).toMatchObject({ object: 'list', has_more: true, url: '/v1/customers' });
    const next = await shop.stripe.customers.list({ email: 'list@example.com', limit: 3, starting_after: String(ids[2]) });
    expect(next.data.map((customer) => customer.id)).toEqual(ids.slice(3, 6));
    const before = await shop.stripe.customers.list({ email: 'list@example.com', limit: 3, ending_before: String(ids[3]) });
    expect(before).toMatchObject({ has_more: false, data: ids.slice(0, 3).map((id) => ({ id })) });
    const all: string[] = [];
    for await (const customer of shop.stripe.customers.list({ email: 'list@example.com', limit: 2 })) all.push(customer.id);
    expect(all).toEqual(ids);
    expect(await refusalOf(shop.stripe.customers.list({ limit: 101 }))).toMatchObject({ statusCode: 400, param: 'limit' });
    expect(await refusalOf(shop.stripe.customers.list({ starting_after: 'cus_none' }))).toMatchObject({ code: 'resource_missing', param: 'starting_after' });
  });

  it('keeps to the rules of metadata', async () => {
    const customer = await shop.stripe.customers.create({ metadata: { a: '1', b: '2' } });
    expect((await shop.stripe.customers.update(customer.id, { metadata: { a: '', c: '3' } })).metadata).toEqual({ b: '2', c: '3' });
    expect((await shop.stripe.customers.update(customer.id, { metadata: '' })).metadata).toEqual({});
    for (const metadata of [{ ['k'.repeat(41)]: 'x' }, { key: 'v'.repeat(501) }, Object.fromEntries(Array.from({ length: 51 }, (_, nth) => [`k${nth}`, 'v']))]) {
      expect((await refusalOf(shop.stripe.customers.create({ metadata }))).statusCode).toBe(400);
    }
  });

  it('forgets a deleted customer but for the fact', async () => {
    const { id } = await shop.stripe.customers.create({ name: 'Plant' });
    expect(await shop.stripe.customers.del(id)).toMatchObject({ id, deleted: true });
    expect(await shop.stripe.customers.retrieve(id)).toMatchObject({ id, deleted: true });
  });

  it('does not put objects where nothing can be expanded', async () => {
    const session = await shop.newSession();
    expect(await refusalOf(shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['amount_total'] }))).toMatchObject({ statusCode: 400 });
    expect(await refusalOf(shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['a.b.c.d.e'] }))).toMatchObject({ statusCode: 400 });
    const list = await shop.stripe.checkout.sessions.list({ limit: 1, expand: ['data.line_items'] });
    expect(list.data[0]?.line_items?.data).toHaveLength(1);
  });

  it('carries an intent through confirm, capture and cancel, and refuses steps out of order', async () => {
    const held = await shop.stripe.paymentIntents.create({ amount: 9_000, currency: 'usd', capture_method: 'manual' });
    expect(held.status).toBe('requires_payment_method');
    expect((await refusalOf(shop.stripe.paymentIntents.confirm(held.id))).code).toBe('payment_intent_unexpected_state');
    expect((await shop.stripe.paymentIntents.confirm(held.id, { payment_method: 'pm_card_visa' })).status).toBe('requires_capture');
    expect(await shop.stripe.paymentIntents.capture(held.id, { amount_to_capture: 8_000 })).toMatchObject({ status: 'succeeded', amount_received: 8_000 });
    for (const call of [shop.stripe.paymentIntents.confirm(held.id), shop.stripe.paymentIntents.cancel(held.id), shop.stripe.paymentIntents.capture(held.id)]) {
      expect((await refusalOf(call)).code).toBe('payment_intent_unexpected_state');
    }
    const dropped = await shop.stripe.paymentIntents.create({ amount: 9_000, currency: 'usd' });
    expect(await shop.stripe.paymentIntents.cancel(dropped.id, { cancellation_reason: 'abandoned' })).toMatchObject({ status: 'canceled', cancellation_reason: 'abandoned' });
  });

  it('withstands two hundred calls at once', async () => {
    const sdk = sdkFor(shop.mock.port);
    const made = await Promise.all(Array.from({ length: 200 }, (_, nth) => sdk.customers.create({ name: `c${nth}` })));
    expect(new Set(made.map((customer) => customer.id)).size).toBe(200);
  });
});
