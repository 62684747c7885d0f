import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { KEY, refusalOf, sdkFor, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';
import { startStripeMock } from './start-stripe-mock.js';

describe('the control API over HTTP', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());
  const tell = (act: string, body: unknown, headers: Record<string, string> = {}) =>
    fetch(`${shop.mock.url}/_control/${act}`, { method: 'POST', body: JSON.stringify(body), headers: { 'content-type': 'application/json', ...headers } });

  it('pays a session, disputes it, decides it, and fails a refund', async () => {
    const session = await shop.newSession();
    expect(await (await tell('sessions/pay', { session: session.id, card: '4242424242424242' })).json()).toEqual({ kind: 'succeeded' });
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    const refund = await shop.stripe.refunds.create({ payment_intent: String(intent), amount: 1_000 });
    expect(await (await tell('refunds/fail', { refund: refund.id })).json()).toMatchObject({ status: 'failed' });
    const dispute: Stripe.Dispute = JSON.parse(await (await tell('disputes/open', { charge: intent, reason: 'duplicate' })).text());
    expect(dispute).toMatchObject({ status: 'needs_response', reason: 'duplicate' });
    expect(await (await tell('disputes/decide', { dispute: dispute.id, outcome: 'won' })).json()).toMatchObject({ status: 'won' });
  });

  it('lets calls fail and events get lost', async () => {
    await tell('faults', { path: '/v1/customers', status: 500, left: 1 });
    expect((await refusalOf(shop.stripe.customers.list())).statusCode).toBe(500);
    await tell('webhooks/rules', { action: 'lose', type: 'customer.created', left: 1 });
    await shop.stripe.customers.create({ name: 'Plant' });
    await tell('settled', {});
    expect(shop.types()).not.toContain('customer.created');
    expect((await shop.stripe.events.list({ type: 'customer.created' })).data).toHaveLength(1);
  });

  it('shows what stands, but no secret and no card number', async () => {
    const text = await (await fetch(`${shop.mock.url}/_control/state`)).text();
    expect(JSON.parse(text)).toMatchObject({ sessions: [{ status: 'complete' }] });
    expect(text).not.toMatch(/whsec_|4242424242424242/);
    expect(await (await fetch(`${shop.mock.url}/_control`)).text()).toContain('$3,184.50');
  });

  it('says what is wrong with an order it does not understand', async () => {
    expect((await tell('webhooks/rules', { action: 'burn' })).status).toBe(400);
    expect((await tell('disputes/open', { charge: 'ch_none' })).status).toBe(404);
    expect((await fetch(`${shop.mock.url}/_control/faults`, { method: 'POST', body: '{', headers: { 'content-type': 'application/json' } })).status).toBe(400);
  });

  it('takes no orders from another site’s page', async () => {
    expect((await tell('faults', {}, { origin: 'http://elsewhere.example' })).status).toBe(403);
    expect((await tell('faults/clear', {}, { origin: shop.mock.url })).status).toBe(200);
  });
});

describe('the payment service with a folder to keep its state in', () => {
  it('remembers payments, keys and events that were on their way through a restart', async () => {
    const stateDir = await mkdtemp(join(tmpdir(), 'payment-mock-'));
    const shop = await shopBesideIt({ stateDir });
    const { session, intent } = await shop.paid(7_700);
    const made = await shop.stripe.customers.create({ name: 'Plant' }, { idempotencyKey: 'customer:1' });
    await shop.mock.control.settled();
    shop.answers.push(503);
    await shop.stripe.customers.update(made.id, { name: 'Plant 2' });
    await shop.mock.control.settled();
    const url = String(shop.mock.state.endpoints.all()[0]?.url);
    await shop.mock.close();

    const again = await startStripeMock({ secretKey: KEY, stateDir, webhookUrl: url, webhookSecret: 'whsec_demo1234' });
    const stripe = sdkFor(again.port);
    expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ payment_status: 'paid', amount_total: 7_700 });
    expect((await stripe.balanceTransactions.list({ source: String(intent.latest_charge) })).data).toHaveLength(1);
    const replayed = await stripe.customers.create({ name: 'Plant' }, { idempotencyKey: 'customer:1' });
    expect(replayed.id).toBe(made.id);
    expect(again.state.endpoints.all()).toHaveLength(1);
    await again.control.retryNow();
    expect(shop.types().at(-1)).toBe('customer.updated');
    expect(shop.types().filter((type) => type === 'customer.updated')).toHaveLength(2);
    await again.close();
    await shop.close();
    await rm(stateDir, { recursive: true });
  });
});
