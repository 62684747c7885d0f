import type Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkDigitFits } from './cards/card-details.js';
import { TEST_CARDS } from './cards/test-cards.js';
import { refusalOf, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

// The service's published test numbers and what each does: docs.stripe.com/testing.
const DECLINED: [number: string, alias: string, code: string, decline: string | undefined][] = [
  ['4000000000000002', 'pm_card_visa_chargeDeclined', 'card_declined', 'generic_decline'],
  ['4000000000009995', 'pm_card_visa_chargeDeclinedInsufficientFunds', 'card_declined', 'insufficient_funds'],
  ['4000000000009987', 'pm_card_visa_chargeDeclinedLostCard', 'card_declined', 'lost_card'],
  ['4000000000009979', 'pm_card_visa_chargeDeclinedStolenCard', 'card_declined', 'stolen_card'],
  ['4000000000006975', 'pm_card_visa_chargeDeclinedVelocityLimitExceeded', 'card_declined', 'card_velocity_exceeded'],
  ['4000000000000069', 'pm_card_chargeDeclinedExpiredCard', 'expired_card', undefined],
  ['4000000000000127', 'pm_card_chargeDeclinedIncorrectCvc', 'incorrect_cvc', undefined],
  ['4000000000000119', 'pm_card_chargeDeclinedProcessingError', 'processing_error', undefined],
  ['4000000000000341', 'pm_card_chargeCustomerFail', 'card_declined', 'generic_decline'],
  ['4100000000000019', 'pm_card_radarBlock', 'card_declined', 'fraudulent'],
];

describe('the test cards', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());
  const pay = (payment_method: string, more: Partial<Stripe.PaymentIntentCreateParams> = {}) =>
    shop.stripe.paymentIntents.create({ amount: 10_000, currency: 'usd', payment_method, confirm: true, ...more });
  const methodOf = (number: string, cvc?: string) =>
    shop.stripe.paymentMethods.create({ type: 'card', card: { number, exp_month: 12, exp_year: 2040, ...(cvc === undefined ? {} : { cvc }) } });

  it.each(DECLINED)('%s is refused by number and by name, and says why', async (number, alias, code, decline) => {
    for (const method of [alias, (await methodOf(number, '123')).id]) {
      const refusal = await refusalOf(pay(method));
      expect(refusal).toMatchObject({ statusCode: 402, type: 'StripeCardError', code });
      expect(refusal.decline_code || undefined).toBe(decline);
      expect(refusal.payment_intent).toMatchObject({ status: 'requires_payment_method', last_payment_error: { code, type: 'card_error' } });
      const charge = await shop.stripe.charges.retrieve(String(refusal.charge));
      expect(charge).toMatchObject({ status: 'failed', paid: false, failure_code: code });
    }
  });

  it.each(['4242424242424242', '5555555555554444', '378282246310005'])('%s pays', (number) => {
    expect(TEST_CARDS.find((card) => card.number === number)?.outcome).toEqual({ kind: 'succeeds' });
    return expect(methodOf(number, number.length === 15 ? '1234' : '123').then((method) => pay(method.id))).resolves.toMatchObject({ status: 'succeeded', amount_received: 10_000 });
  });

  it('carry a right check digit, all but the one that is published as wrong', () => {
    // ISO/IEC 7812-1 annex B (the Luhn formula).
    expect(TEST_CARDS.filter((card) => !checkDigitFits(card.number))).toEqual([]);
    expect(checkDigitFits('4242424242424241')).toBe(false);
  });

  it('give the security code a say only when one was typed', async () => {
    await expect(methodOf('4000000000000127').then((method) => pay(method.id))).resolves.toMatchObject({ status: 'succeeded' });
  });

  it.each([
    ['4242424242424241', 12, 2040, '123', 'incorrect_number'],
    ['4242424242424242', 13, 2040, '123', 'invalid_expiry_month'],
    ['4242424242424242', 12, 1995, '123', 'invalid_expiry_year'],
    ['4242424242424242', 12, 2040, '99', 'invalid_cvc'],
  ])('%s %s/%s %s is refused before any bank is asked: %s', async (number, exp_month, exp_year, cvc, code) => {
    const refusal = await refusalOf(shop.stripe.paymentMethods.create({ type: 'card', card: { number, exp_month, exp_year, cvc } }));
    expect(refusal).toMatchObject({ statusCode: 402, code });
  });

  it('are the only cards taken: a real-looking number is refused and not kept', async () => {
    const refusal = await refusalOf(methodOf('4532015112830366', '123'));
    expect(refusal).toMatchObject({ code: 'card_declined', decline_code: 'test_mode_live_card' });
    expect(JSON.stringify(shop.mock.state)).not.toContain('4532015112830366');
  });

  it('can be attached to a customer even when charging fails later', async () => {
    const customer = await shop.stripe.customers.create({ email: 'plant@example.com' });
    const method = await methodOf('4000000000000341', '123');
    expect((await shop.stripe.paymentMethods.attach(method.id, { customer: customer.id })).customer).toBe(customer.id);
    expect((await shop.stripe.paymentMethods.list({ customer: customer.id })).data.map((item) => item.id)).toEqual([method.id]);
    expect((await refusalOf(pay(method.id, { customer: customer.id }))).code).toBe('card_declined');
    expect((await shop.stripe.paymentMethods.detach(method.id)).customer).toBeNull();
  });

  it.each([
    ['pm_card_authenticationRequired', true, 'succeeded', undefined],
    ['pm_card_threeDSecure2Required', true, 'succeeded', undefined],
    ['pm_card_authenticationRequiredOnSetup', false, 'requires_payment_method', 'payment_intent_authentication_failure'],
    ['pm_card_threeDSecureRequiredChargeDeclined', true, 'requires_payment_method', 'card_declined'],
    ['pm_card_authenticationRequiredChargeDeclinedInsufficientFunds', true, 'requires_payment_method', 'card_declined'],
  ])('%s waits for the extra step (passed: %s) and ends as %s', async (alias, passed, status, code) => {
    const intent = await pay(alias, { return_url: 'http://127.0.0.1:9/back' });
    expect(intent.status).toBe('requires_action');
    const step = String(intent.next_action?.redirect_to_url?.url);
    expect(await (await fetch(step)).text()).toContain('Yes, it is me');
    const answer = await fetch(step, { method: 'POST', redirect: 'manual', body: new URLSearchParams({ result: passed ? 'pass' : 'fail' }) });
    expect(answer.headers.get('location')).toContain(`http://127.0.0.1:9/back?payment_intent=${intent.id}`);
    const after = await shop.stripe.paymentIntents.retrieve(intent.id);
    expect(after.status).toBe(status);
    expect(after.last_payment_error?.code).toBe(code);
  });

  it('make money available at once with the card made for it, and in two days with the others', async () => {
    const lines = await Promise.all(
      ['pm_card_bypassPending', 'pm_card_visa'].map(async (alias) => {
        const intent = await pay(alias, { expand: ['latest_charge.balance_transaction'] });
        return (intent.latest_charge as Stripe.Charge).balance_transaction as Stripe.BalanceTransaction;
      }),
    );
    expect(lines.map((line) => line.status)).toEqual(['available', 'pending']);
    await shop.mock.control.advance(2 * 86_400 + 1);
    expect((await shop.stripe.balanceTransactions.retrieve(String(lines[1]?.id))).status).toBe('available');
  });

  it('warn of fraud, and bring two disputes on one charge, as published', async () => {
    const warned = await pay('pm_card_createIssuerFraudRecord');
    const twice = await pay('pm_card_createMultipleDisputes');
    await shop.mock.control.advance(20);
    const warnings = await shop.stripe.radar.earlyFraudWarnings.list({ charge: String(warned.latest_charge) });
    expect(warnings.data).toHaveLength(1);
    const disputes = await shop.stripe.disputes.list({ payment_intent: twice.id });
    expect(disputes.data.map((dispute) => dispute.amount)).toEqual([5_000, 5_000]);
  });
});
