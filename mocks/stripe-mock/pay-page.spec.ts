import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

describe('the pay page', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());
  const send = (url: string | null, fields: Record<string, string>) => fetch(String(url), { method: 'POST', redirect: 'manual', body: new URLSearchParams({ method: 'card', ...fields }) });
  const good = { email: 'office@example.com', number: '4242 4242 4242 4242', expiry: '12 / 40', cvc: '123', name: 'Plant Office' };

  it('says that it is a demo, what is to be paid and for what, and needs no script', async () => {
    const session = await shop.newSession({ client_reference_id: 'INV-2026-0042', payment_intent_data: { description: 'Job 2026-0117' } });
    const answer = await fetch(String(session.url));
    const text = await answer.text();
    for (const words of ['Loopbay demo payment page — no real money moves', '$3,184.50', 'Invoice INV-2026-0042', 'Job 2026-0117', '4242 4242 4242 4242', 'Go back without paying']) expect(text).toContain(words);
    expect(text).not.toMatch(/<script|\son\w+=|style=/);
    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
  });

  it('leads to the shop after a payment, with the number of the session in the address', async () => {
    const session = await shop.newSession();
    const answer = await send(session.url, good);
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toMatch(new RegExp(`/paid\\?session=${session.id}$`));
    expect(await (await fetch(`${shop.mock.url}/c/pay/${session.id}`)).text()).toContain('This is paid');
  });

  it('takes a double press as one payment', async () => {
    const session = await shop.newSession();
    const answers = await Promise.all(Array.from({ length: 8 }, () => send(session.url, good)));
    expect(new Set(answers.map((answer) => answer.headers.get('location'))).size).toBe(1);
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect((await shop.stripe.charges.list({ payment_intent: String(intent) })).data).toHaveLength(1);
  });

  it('says in words why a card was declined, keeps what was typed, and takes another card', async () => {
    const session = await shop.newSession();
    const declined = await send(session.url, { ...good, number: '4000000000009995' });
    expect(declined.status).toBe(402);
    const text = await declined.text();
    expect(text).toContain('There is not enough money on the account behind this card.');
    expect(text).toContain('value="office@example.com"');
    expect(await (await fetch(String(session.url))).text()).toContain('The last try did not go through.');
    expect((await send(session.url, good)).status).toBe(303);
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect((await shop.stripe.charges.list({ payment_intent: String(intent) })).data.map((charge) => charge.status)).toEqual(['succeeded', 'failed']);
  });

  it('marks every wrong field and charges nothing', async () => {
    const session = await shop.newSession();
    const answer = await send(session.url, { email: 'nobody', number: '4242424242424241', expiry: '13 / 40', cvc: '99', name: '' });
    const text = await answer.text();
    expect(answer.status).toBe(422);
    for (const field of ['email', 'number', 'expiry', 'cvc', 'name']) expect(text).toMatch(new RegExp(`id="${field}-wrong"`));
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).payment_intent).toBeNull();
  });

  it('refuses a card that is no test card and never sends its number back', async () => {
    const session = await shop.newSession();
    const text = await (await send(session.url, { ...good, number: '4532 0151 1283 0366' })).text();
    expect(text).toContain('Only the test cards listed below are taken here.');
    expect(text.replace(/\s/g, '')).not.toContain('4532015112830366');
  });

  it('fills in a test card at a tap and keeps the e-mail address', async () => {
    const session = await shop.newSession();
    const text = await (await send(session.url, { email: 'office@example.com', fill: '378282246310005' })).text();
    expect(text).toContain('value="3782 822463 10005"');
    expect(text).toContain('value="1234"');
    expect(text).toContain('value="office@example.com"');
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).payment_intent).toBeNull();
  });

  it('asks for the bank’s extra step; refused it goes back, passed it pays', async () => {
    const session = await shop.newSession();
    const first = await send(session.url, { ...good, number: '4000002760003184' });
    const step = new URL(String(first.headers.get('location')), shop.mock.url).href;
    expect(step).toContain('/c/step/pi_');
    const refused = await send(step, { result: 'fail' });
    expect(refused.headers.get('location')).toBe(`/c/pay/${session.id}`);
    expect(await (await fetch(String(session.url))).text()).toContain('The bank’s extra step was not passed.');
    await send(session.url, { ...good, number: '4000002760003184' });
    const passed = await send(step, { result: 'pass' });
    expect(passed.headers.get('location')).toContain(`/paid?session=${session.id}`);
    expect(await shop.stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: 'complete', payment_status: 'paid' });
    expect((await send(step, { result: 'pass' })).status).toBe(303);
    expect((await shop.stripe.charges.list({ payment_intent: step.split('/').pop() ?? '' })).data).toHaveLength(1);
  });

  it('says when the page has expired or never was', async () => {
    const session = await shop.newSession();
    await shop.stripe.checkout.sessions.expire(session.id);
    expect(await (await fetch(String(session.url))).text()).toContain('This payment page has expired');
    expect((await send(session.url, good)).status).toBe(410);
    expect((await fetch(`${shop.mock.url}/c/pay/cs_test_unknown`)).status).toBe(404);
  });

  it('shows the shop’s own words as words, never as markup', async () => {
    const session = await shop.newSession({ line_items: [{ quantity: 1, price_data: { currency: 'usd', unit_amount: 500, product_data: { name: '<img src=x onerror=alert(1)>"\'' } } }] });
    const text = await (await fetch(String(session.url))).text();
    expect(text).not.toContain('<img');
    expect(text).toContain('&#60;img src=x onerror=alert(1)&#62;');
  });
});
