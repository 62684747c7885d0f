import type Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusalOf, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

describe('a checkout session', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());

  it('stands open with a page to pay on, and echoes what the shop put into it', async () => {
    const session = await shop.newSession({
      client_reference_id: 'INV-2026-0042',
      customer_email: 'office@example.com',
      metadata: { invoice: 'inv_1', attempt: '2' },
    });
    expect(session).toMatchObject({
      object: 'checkout.session', status: 'open', payment_status: 'unpaid', livemode: false, mode: 'payment', ui_mode: 'hosted_page',
      amount_subtotal: 318_450, amount_total: 318_450, currency: 'usd', client_reference_id: 'INV-2026-0042', customer_email: 'office@example.com',
      metadata: { invoice: 'inv_1', attempt: '2' }, payment_intent: null,
    });
    expect(session.id).toMatch(/^cs_test_\w{60}$/);
    expect(session.url).toBe(`${shop.mock.url}/c/pay/${session.id}`);
    expect(session.expires_at - session.created).toBe(24 * 3600);
    expect(session.lastResponse.requestId).toMatch(/^req_\w{14}$/);
  });

  it('adds up its line items and lists them', async () => {
    const session = await shop.newSession({
      line_items: [
        { quantity: 1, price_data: { currency: 'eur', unit_amount: 250_000, product_data: { name: 'Rewind' } } },
        { quantity: 2, price_data: { currency: 'eur', unit_amount: 4_215, product_data: { name: 'Bearing 6309' } } },
      ],
    });
    expect(session.amount_total).toBe(258_430);
    const lines = await shop.stripe.checkout.sessions.listLineItems(session.id);
    expect(lines.data.map((line) => [line.description, line.quantity, line.amount_total])).toEqual([['Rewind', 1, 250_000], ['Bearing 6309', 2, 8_430]]);
    expect(lines.data[1]?.price?.unit_amount_decimal?.toString()).toBe('4215');
    const whole = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['line_items'] });
    expect(whole.line_items?.data).toHaveLength(2);
  });

  it('is complete and paid after a payment, with the metadata on the payment and its charge', async () => {
    const session = await shop.newSession({ payment_intent_data: { metadata: { invoice: 'inv_7' }, description: 'Invoice 7' }, customer_creation: 'always' });
    expect(shop.mock.control.payWithCard(session.id, '4242424242424242', { email: 'plant@example.com', name: 'Plant Office' })).toEqual({ kind: 'succeeded' });
    const after = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent.latest_charge.balance_transaction', 'customer'] });
    const intent = after.payment_intent as Stripe.PaymentIntent;
    const charge = intent.latest_charge as Stripe.Charge;
    const line = charge.balance_transaction as Stripe.BalanceTransaction;
    expect(after).toMatchObject({ status: 'complete', payment_status: 'paid', url: null, customer_details: { email: 'plant@example.com', name: 'Plant Office' } });
    expect((after.customer as Stripe.Customer).email).toBe('plant@example.com');
    expect(intent).toMatchObject({ status: 'succeeded', amount: 318_450, amount_received: 318_450, metadata: { invoice: 'inv_7' }, description: 'Invoice 7' });
    expect(charge).toMatchObject({ status: 'succeeded', paid: true, captured: true, metadata: { invoice: 'inv_7' }, payment_method_details: { card: { brand: 'visa', last4: '4242' } } });
    expect(line.net).toBe(line.amount - line.fee);
    expect(intent.client_secret).toMatch(new RegExp(`^${intent.id}_secret_`));
  });

  it('can be expired while open and not afterwards', async () => {
    const session = await shop.newSession();
    const expired = await shop.stripe.checkout.sessions.expire(session.id);
    expect(expired).toMatchObject({ status: 'expired', url: null, payment_status: 'unpaid' });
    const refusal = await refusalOf(shop.stripe.checkout.sessions.expire(session.id));
    expect(refusal).toMatchObject({ statusCode: 400, type: 'StripeInvalidRequestError' });
    expect(refusal.message).toContain('has a status of "expired"');
  });

  it('expires by itself when its time is over, and its unfinished payment is cancelled', async () => {
    const session = await shop.newSession({ expires_at: Math.floor(Date.now() / 1000) + 1900 });
    shop.mock.control.payWithCard(session.id, '4000000000000002');
    await shop.mock.control.advance(1901);
    const after = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] });
    expect(after.status).toBe('expired');
    expect((after.payment_intent as Stripe.PaymentIntent).status).toBe('canceled');
    expect(shop.types()).toContain('checkout.session.expired');
  });

  it('lives at least 30 minutes and at most 24 hours', async () => {
    const now = shop.mock.state.sessions.newestFirst()[0]?.created ?? 0;
    for (const wrong of [now + 1700, now + 25 * 3600 + 10]) {
      const refusal = await refusalOf(shop.newSession({ expires_at: wrong }));
      expect(refusal).toMatchObject({ statusCode: 400, param: 'expires_at' });
    }
  });

  it('completes unpaid with a bank debit and says later whether the money came', async () => {
    const good = await shop.newSession({ allowed_payment_method_types: ['card', 'us_bank_account'] });
    const bad = await shop.newSession({ allowed_payment_method_types: ['us_bank_account'] });
    for (const [session, account] of [[good, '000123456789'], [bad, '000222222227']] as const) {
      await fetch(String(session.url), { method: 'POST', redirect: 'manual', body: new URLSearchParams({ method: 'bank', email: 'a@example.com', name: 'A', account }) });
      expect(await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] })).toMatchObject({ status: 'complete', payment_status: 'unpaid', payment_intent: { status: 'processing' } });
    }
    await shop.mock.control.advance(31);
    expect(await shop.stripe.checkout.sessions.retrieve(good.id)).toMatchObject({ payment_status: 'paid' });
    expect(await shop.stripe.checkout.sessions.retrieve(bad.id, { expand: ['payment_intent'] })).toMatchObject({ payment_status: 'unpaid', payment_intent: { status: 'requires_payment_method' } });
    expect(shop.types()).toEqual(expect.arrayContaining(['payment_intent.processing', 'checkout.session.async_payment_succeeded', 'checkout.session.async_payment_failed']));
  });

  it('needs no card when there is nothing to pay', async () => {
    const session = await shop.newSession({ line_items: [{ quantity: 1, price_data: { currency: 'usd', unit_amount: 0, product_data: { name: 'Warranty work' } } }] });
    expect(session.payment_status).toBe('no_payment_required');
    const answer = await fetch(String(session.url), { method: 'POST', redirect: 'manual', body: new URLSearchParams({ method: 'free', email: 'a@example.com' }) });
    expect(answer.status).toBe(303);
    expect(await shop.stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: 'complete', payment_status: 'no_payment_required', payment_intent: null });
  });

  // Zero- and three-decimal currencies: docs.stripe.com/currencies.
  it('takes yen without decimals and dinars with three, and shows both as people write them', async () => {
    const line = (currency: string, unit_amount: number) => ({ line_items: [{ quantity: 1, price_data: { currency, unit_amount, product_data: { name: 'Work' } } }] });
    const yen = await shop.newSession(line('jpy', 500));
    const dinar = await shop.newSession(line('bhd', 5_120));
    expect(await (await fetch(String(yen.url))).text()).toContain('¥500');
    expect(await (await fetch(String(dinar.url))).text()).toMatch(/BHD\s5\.120/);
    expect((await refusalOf(shop.newSession(line('bhd', 5_121)))).code).toBe('invalid_charge_amount');
    expect((await refusalOf(shop.newSession(line('usd', 49)))).code).toBe('amount_too_small');
    expect((await refusalOf(shop.newSession(line('usd', 100_000_000)))).code).toBe('amount_too_large');
  });

  it('leaves cancelling its payment to the session itself', async () => {
    const session = await shop.newSession();
    shop.mock.control.payWithCard(session.id, '4000000000000002');
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect((await refusalOf(shop.stripe.paymentIntents.cancel(String(intent)))).message).toContain('Expire the Checkout Session instead');
  });
});
