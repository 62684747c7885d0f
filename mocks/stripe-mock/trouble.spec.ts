import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { refusalOf, sdkFor, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

describe('calls that are repeated or go wrong', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterEach(() => shop.mock.control.clearFaults());
  afterAll(() => shop.close());
  const order = (sdk = shop.stripe, idempotencyKey = 'invoice:1:1:5000', amount = 5_000) =>
    sdk.paymentIntents.create({ amount, currency: 'usd', confirm: true, payment_method: 'pm_card_visa' }, { idempotencyKey });
  const chargesOf = (amount: number) => shop.mock.state.charges.where((charge) => charge.amount === amount).length;

  it('the same key gives the same answer and does the work once', async () => {
    const first = await order();
    const second = await order();
    expect(second.id).toBe(first.id);
    expect(second.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(second.lastResponse.headers['original-request']).toBe(first.lastResponse.requestId);
    expect(chargesOf(5_000)).toBe(1);
  });

  it('the same key with other parameters is refused', async () => {
    await order(shop.stripe, 'invoice:2:1', 5_100);
    expect(await refusalOf(order(shop.stripe, 'invoice:2:1', 5_200))).toMatchObject({ statusCode: 400, type: 'StripeIdempotencyError' });
    expect(chargesOf(5_200)).toBe(0);
  });

  it('a declined card is remembered too, a wrong parameter is not', async () => {
    const decline = () => shop.stripe.paymentIntents.create({ amount: 5_300, currency: 'usd', confirm: true, payment_method: 'pm_card_chargeDeclined' }, { idempotencyKey: 'invoice:3:1' });
    const [first, second] = [await refusalOf(decline()), await refusalOf(decline())];
    expect(second.charge).toBe(first.charge);
    expect(second.headers?.['idempotent-replayed']).toBe('true');
    const wrong = () => shop.stripe.paymentIntents.create({ amount: -1, currency: 'usd' }, { idempotencyKey: 'invoice:3:2' });
    await refusalOf(wrong());
    expect((await refusalOf(wrong())).headers?.['idempotent-replayed']).toBeUndefined();
  });

  it('a key at work sends the second caller away with 409 until the first is done', async () => {
    shop.mock.control.failCalls({ path: '/v1/payment_intents', kind: 'hang', when: 'before' });
    const first = order(shop.stripe, 'invoice:4:1', 5_400);
    await vi.waitFor(() => expect(shop.mock.control.faults()).toEqual([]));
    expect(await refusalOf(order(shop.stripe, 'invoice:4:1', 5_400))).toMatchObject({ statusCode: 409, code: 'idempotency_key_in_use' });
    shop.mock.control.letGo();
    expect((await order(shop.stripe, 'invoice:4:1', 5_400)).id).toBe((await first).id);
    expect(chargesOf(5_400)).toBe(1);
  });

  it('an error after the work leaves the work done, and the key remembers the error', async () => {
    shop.mock.control.failCalls({ path: '/v1/payment_intents', when: 'after', status: 500 });
    expect(await refusalOf(order(shop.stripe, 'invoice:5:1', 5_500))).toMatchObject({ statusCode: 500, type: 'StripeAPIError' });
    expect(await refusalOf(order(shop.stripe, 'invoice:5:1', 5_500))).toMatchObject({ statusCode: 500, headers: { 'idempotent-replayed': 'true' } });
    expect(chargesOf(5_500)).toBe(1);
  });

  it('an error before the work leaves the key free', async () => {
    shop.mock.control.failCalls({ path: '/v1/payment_intents', status: 503 });
    expect((await refusalOf(order(shop.stripe, 'invoice:6:1', 5_600))).statusCode).toBe(503);
    expect(chargesOf(5_600)).toBe(0);
    await order(shop.stripe, 'invoice:6:1', 5_600);
    expect(chargesOf(5_600)).toBe(1);
  });

  it('a line that breaks after the work is mended by the SDK trying again: one charge', async () => {
    shop.mock.control.failCalls({ path: '/v1/payment_intents', kind: 'reset', when: 'after' });
    const intent = await order(sdkFor(shop.mock.port, { maxNetworkRetries: 1 }), 'invoice:7:1', 5_700);
    expect(intent.status).toBe('succeeded');
    expect(intent.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(chargesOf(5_700)).toBe(1);
  });

  it('too many calls are told so', async () => {
    shop.mock.control.failCalls({ status: 429 });
    expect(await refusalOf(shop.stripe.balance.retrieve())).toMatchObject({ statusCode: 429, type: 'StripeRateLimitError' });
  });

  it('sixty-four parallel tries with one key make one charge', async () => {
    const tries = await Promise.allSettled(Array.from({ length: 64 }, () => order(shop.stripe, 'invoice:8:1', 5_800)));
    expect(new Set(tries.flatMap((one) => (one.status === 'fulfilled' ? [one.value.id] : []))).size).toBe(1);
    expect(chargesOf(5_800)).toBe(1);
  });

  it('a key is free again after a day', async () => {
    const first = await order(shop.stripe, 'invoice:9:1', 5_900);
    await shop.mock.control.advance(24 * 3600 + 1);
    expect((await order(shop.stripe, 'invoice:9:1', 5_900)).id).not.toBe(first.id);
  });
});
