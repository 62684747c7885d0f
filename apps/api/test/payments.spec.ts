import type { InvoiceView, PaymentReturn } from '@shared/invoices';
import { paymentReturnSchema } from '@shared/invoices';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { ReadDb } from '../src/database/read-db.js';
import { LookRoundService } from '../src/payments/look-round.service.js';
import { issuedInvoice, oneLine } from './approved-quote.js';
import { jobInShop, shopProfile, type JobInShop } from './job-in-shop.js';
import { openPaymentTown, type PaymentTown } from './payment-town.js';
import type { Person } from './test-app.js';

const GOOD_CARD = '4242424242424242';
let town: PaymentTown;
let manager: Person;
let customer: Person;
let other: Person;
let job: JobInShop;

beforeAll(async () => {
  town = await openPaymentTown();
  await shopProfile(town.shop);
  manager = await town.shop.person(['manager', 'office']);
  job = await jobInShop(town.shop, manager);
  customer = await town.shop.person(['customer'], { customerId: job.customerId });
  other = await town.shop.person(['customer'], { customerId: (await jobInShop(town.shop, manager)).customerId });
});
afterAll(() => town.close());
afterEach(() => town.stripe.control.clearFaults());

const invoiceOf = (lines?: object[]) => issuedInvoice(town.shop, manager, job, lines);
const startPaying = (invoice: InvoiceView, who = customer) => who.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: invoice.version });
const now = async (invoice: InvoiceView): Promise<InvoiceView> => (await customer.get(`/api/portal/invoices/${invoice.id}`).expect(200)).body;
const comeBack = async (invoice: InvoiceView, sessionId: string, who = customer) => who.get(`/api/portal/invoices/${invoice.id}/payment-return?session_id=${sessionId}`);
const pageOf = async (invoice: InvoiceView): Promise<string> => (await startPaying(invoice).expect(201)).body.url.split('/').at(-1);
const sessionsOf = (invoice: InvoiceView) => town.stripe.state.sessions.where((s) => s.metadata?.['invoiceId'] === invoice.id);
const completed = (sessionId: string) => town.stripe.state.events.where((e) => e.type === 'checkout.session.completed' && (e.data.object as { id: string }).id === sessionId)[0]!;
const rows = <T>(sql: string, parameters: unknown[] = []) => town.shop.app.get(ReadDb).all<T>(sql, parameters);
/** pays on the service's page and answers the event the service made of it; nothing is delivered yet */
const paid = async (invoice: InvoiceView) => {
  const sessionId = await pageOf(invoice);
  expect(town.stripe.control.payWithCard(sessionId, GOOD_CARD).kind).toBe('succeeded');
  return { sessionId, event: completed(sessionId) };
};
const receiptsOf = async (invoice: InvoiceView) => {
  // a round that is under way may have begun before the receipt was promised: a second one has not
  await town.shop.postman();
  await town.shop.postman();
  return town.shop.mail.sent.filter((m) => m.subject.includes('receipt') && m.subject.endsWith(invoice.number));
};

describe('the way to the payment page', () => {
  it('asks for what the invoice owes, in the words and with the marks of this invoice', async () => {
    const invoice = await invoiceOf();
    const sessionId = await pageOf(invoice);
    const session = await town.look.checkout.sessions.retrieve(sessionId, { expand: ['line_items'] });
    expect(session).toMatchObject({ amount_total: 75_669, currency: 'eur', metadata: { invoiceId: invoice.id }, cancel_url: `http://shop.test/portal/invoices/${invoice.id}`, success_url: `http://shop.test/portal/invoices/${invoice.id}/paid?session_id={CHECKOUT_SESSION_ID}` });
    expect(session.line_items!.data[0]).toMatchObject({ description: `Invoice ${invoice.number}`, quantity: 1 });
    expect((await now(invoice)).state).toBe('open');
  });

  it('takes no amount, currency or invoice from outside', async () => {
    const invoice = await invoiceOf();
    for (const more of [{ amountMinor: 1 }, { currency: 'JPY' }, { invoiceId: invoice.id }]) expect((await customer.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: 1, ...more })).status).toBe(400);
    expect(sessionsOf(invoice)).toHaveLength(0);
  });

  it('many clicks at once and again later lead to one page', async () => {
    const invoice = await invoiceOf();
    const answers = await Promise.all(Array.from({ length: 64 }, () => startPaying(invoice)));
    const again = await startPaying(invoice);
    expect(new Set([...answers, again].map((a) => a.body.url)).size).toBe(1);
    expect(sessionsOf(invoice)).toHaveLength(1);
  });

  it('another customer’s invoice, and what is no invoice, are not there', async () => {
    const invoice = await invoiceOf();
    expect((await startPaying(invoice, other)).status).toBe(404);
    expect((await customer.post('/api/portal/invoices/ffffffff-0000/checkout', { version: 1 })).status).toBe(404);
    expect((await startPaying(invoice, manager)).status).toBe(403);
    expect(sessionsOf(invoice)).toHaveLength(0);
  });

  it('an invoice that changed meanwhile is shown as it is now, a paid one is not paid again', async () => {
    const invoice = await invoiceOf();
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'cash', amountMinor: 69, receivedOn: '2026-03-01' }).expect(201);
    const stale = await startPaying(invoice);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { balanceMinor: 75_600 } });
    const part = await now(invoice);
    const sessionId = await pageOf(part);
    expect(town.stripe.state.sessions.find(sessionId)!.amount_total).toBe(75_600);
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 2, kind: 'cash', amountMinor: 75_600, receivedOn: '2026-03-01' }).expect(201);
    expect((await startPaying(await now(invoice))).body.code).toBe('ALREADY_DONE');
  });

  it('when the office records money, the page for the old amount is closed and a new one asks for the rest', async () => {
    const invoice = await invoiceOf();
    const old = await pageOf(invoice);
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'cash', amountMinor: 669, receivedOn: '2026-03-01' }).expect(201);
    const fresh = await pageOf(await now(invoice));
    expect(town.stripe.state.sessions.find(old)!.status).toBe('expired');
    expect(town.stripe.state.sessions.find(fresh)).toMatchObject({ amount_total: 75_000, status: 'open' });
  });

  it('a page that expired is followed by a new one', async () => {
    const invoice = await invoiceOf();
    const old = await pageOf(invoice);
    town.stripe.control.expire(old);
    const fresh = await pageOf(invoice);
    expect(fresh).not.toBe(old);
    expect(town.stripe.state.sessions.find(fresh)!.status).toBe('open');
  });
});

describe('when the payment service is in trouble', () => {
  it('the customer is told in words, and the next click goes on under the same key', async () => {
    const invoice = await invoiceOf();
    town.stripe.control.failCalls({ method: 'POST', path: '/v1/checkout/sessions', kind: 'reset', when: 'before', left: 3 });
    const down = await startPaying(invoice);
    expect(down.status).toBe(503);
    expect(down.body).toMatchObject({ code: 'PAYMENT_SERVICE_UNREACHABLE', message: expect.stringContaining('Nothing is lost') });
    town.stripe.control.clearFaults();
    const sessionId = await pageOf(invoice);
    expect(sessionsOf(invoice).map((s) => s.id)).toEqual([sessionId]);
    expect(await rows('SELECT attempt FROM checkout_attempts WHERE invoiceId = ?', [invoice.id])).toEqual([{ attempt: 1 }]);
  });

  it('a failure told after the page was made leads to that page, not to a second one', async () => {
    const invoice = await invoiceOf();
    town.stripe.control.failCalls({ method: 'POST', path: '/v1/checkout/sessions', status: 500, when: 'after', left: 1 });
    const sessionId = await pageOf(invoice);
    expect(sessionsOf(invoice).map((s) => s.id)).toEqual([sessionId]);
    town.stripe.control.payWithCard(sessionId, GOOD_CARD);
    expect((await comeBack(invoice, sessionId)).body.outcome).toBe('paid');
    expect((await now(invoice)).paidMinor).toBe(75_669);
  });

  it('a failure told before anything was made is tried again with a key of its own', async () => {
    const invoice = await invoiceOf();
    town.stripe.control.failCalls({ method: 'POST', path: '/v1/checkout/sessions', status: 500, when: 'before', left: 3 });
    expect((await startPaying(invoice)).status).toBe(503);
    const sessionId = await pageOf(invoice);
    expect(sessionsOf(invoice).map((s) => s.id)).toEqual([sessionId]);
  });

  it('the same click under one idempotency key works once the service is back', async () => {
    const invoice = await invoiceOf();
    town.stripe.control.failCalls({ status: 503, left: 20 });
    await customer.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: 1 }, 'pay-click-00001').expect(503);
    town.stripe.control.clearFaults();
    await customer.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: 1 }, 'pay-click-00001').expect(201);
  });
});

describe('an event of the payment service', () => {
  it('delivered ten times at once pays once, mails one receipt, and is remembered', async () => {
    const invoice = await invoiceOf();
    const { event } = await paid(invoice);
    const answers = await Promise.all(Array.from({ length: 10 }, () => town.deliver(event)));
    expect(answers.map((a) => a.status)).toEqual(Array(10).fill(200));
    const after = await now(invoice);
    expect(after).toMatchObject({ state: 'paid', paidMinor: 75_669, balanceMinor: 0, payments: [{ kind: 'card', amountMinor: 75_669, reference: 'visa ending 4242', recordedBy: 'Payment service' }] });
    const receipts = await receiptsOf(invoice);
    expect(receipts).toHaveLength(1);
    expect(receipts[0]!.attachments[0]!.content.subarray(0, 5).toString()).toBe('%PDF-');
    expect(await rows('SELECT outcome FROM payment_events WHERE id = ?', [event.id])).toEqual([{ outcome: 'paid' }]);
    expect((await town.deliver(event)).status).toBe(200);
  });

  it('every event of a payment, in any order and twice, leaves one payment', async () => {
    for (const order of ['as they happened', 'backwards'] as const) {
      const invoice = await invoiceOf();
      const first = town.stripe.state.events.all().length;
      await paid(invoice);
      const events = town.stripe.state.events.all().slice(first);
      expect(events.length).toBeGreaterThan(3);
      for (const event of [...(order === 'backwards' ? [...events].reverse() : events), ...events]) expect((await town.deliver(event)).status).toBe(200);
      expect((await now(invoice)).payments).toHaveLength(1);
      expect(await receiptsOf(invoice)).toHaveLength(1);
    }
  });

  it.each([
    ['without a signature', { signature: null }],
    ['with an old scheme’s signature only', { signature: 'old scheme' }],
    ['signed with another secret', { secret: 'whsec_somebody_else' }],
    ['signed more than five minutes ago', { at: new Date(Date.now() - 3_600_000) }],
    ['signed in the future', { at: new Date(Date.now() + 86_400_000) }],
    ['altered by one byte', { body: 'altered' }],
    ['written anew by somebody in between', { body: 'rewritten' }],
    ['as another content type', { type: 'text/plain' }],
  ])('%s is refused and changes nothing', async (_, wrong: { signature?: string | null; secret?: string; at?: Date; body?: string; type?: string }) => {
    const invoice = await invoiceOf();
    const { event } = await paid(invoice);
    const text = JSON.stringify(event, null, 2);
    const made = {
      ...wrong,
      ...(wrong.signature === 'old scheme' ? { signature: `t=${Math.floor(town.shop.clock.now().getTime() / 1000)},v0=${'0'.repeat(64)}` } : {}),
      ...(wrong.body === 'altered' ? { body: text.replace('"type"', '"tyqe"') } : wrong.body === 'rewritten' ? { body: JSON.stringify(event) } : {}),
    };
    const answer = await town.deliver(event, made);
    expect([400, 415]).toContain(answer.status);
    expect(answer.text).not.toMatch(/whsec|Error:|at .*\.ts/);
    expect(await now(invoice)).toMatchObject({ state: 'open', paidMinor: 0 });
    expect(await rows('SELECT id FROM payment_events WHERE id = ?', [event.id])).toEqual([]);
  });

  it('says nothing that counts: a forged amount or invoice in it is not believed', async () => {
    const [invoice, victim] = [await invoiceOf(), await invoiceOf()];
    const sessionId = await pageOf(invoice);
    const forged = { id: 'evt_forged1', object: 'event', type: 'checkout.session.completed', data: { object: { id: sessionId, object: 'checkout.session', payment_status: 'paid', amount_total: 75_669, metadata: { invoiceId: victim.id } } } };
    expect((await town.deliver(forged)).status).toBe(200);
    expect([(await now(invoice)).paidMinor, (await now(victim)).paidMinor]).toEqual([0, 0]);
  });

  it('of a kind nobody knows, or about somebody else’s business, is remembered and does nothing', async () => {
    for (const [i, object] of [{ id: 'x_1', object: 'unheard.of' }, { object: 'balance' }, { id: 'pi_nobody', object: 'payment_intent' }, { id: 'cs_test_nobody', object: 'checkout.session' }].entries()) {
      const event = { id: `evt_unknown${i}`, object: 'event', type: 'unheard.of', data: { object } };
      expect((await town.deliver(event)).status).toBe(200);
      expect(await rows('SELECT type FROM payment_events WHERE id = ?', [event.id])).toEqual([{ type: 'unheard.of' }]);
    }
    const foreign = await town.look.checkout.sessions.create({ mode: 'payment', success_url: 'http://elsewhere.test', line_items: [{ quantity: 1, price_data: { currency: 'eur', unit_amount: 500, product_data: { name: 'Not ours' } } }] });
    town.stripe.control.payWithCard(foreign.id, GOOD_CARD);
    expect((await town.deliver(completed(foreign.id))).status).toBe(200);
    expect(await rows('SELECT outcome FROM payment_events WHERE objectId = ?', [foreign.id])).toEqual([{ outcome: 'not-ours' }]);
  });

  it('that is signed but no event is refused, thin events too', async () => {
    for (const text of [{ hello: 'world' }, { id: 'evt_1', object: 'v2.core.event', type: 'v1.billing', data: {} }, [], 'text']) expect((await town.deliver(text)).status).toBe(400);
  });

  it('is asked for again while the service cannot be asked what happened, and then pays', async () => {
    const invoice = await invoiceOf();
    const { event } = await paid(invoice);
    town.stripe.control.failCalls({ method: 'GET', status: 500, left: 20 });
    expect((await town.deliver(event)).status).toBe(503);
    expect(await rows('SELECT id FROM payment_events WHERE id = ?', [event.id])).toEqual([]);
    town.stripe.control.clearFaults();
    expect((await town.deliver(event)).status).toBe(200);
    expect((await now(invoice)).state).toBe('paid');
  });

  it('about another amount than we asked for is for a person: told once, nothing booked', async () => {
    const invoice = await invoiceOf();
    const { event, sessionId } = await paid(invoice);
    const session = town.stripe.state.sessions.find(sessionId)!;
    const intent = town.stripe.state.paymentIntents.find(session.payment_intent as string)!;
    intent.amount_received = 1;
    for (const again of [1, 2]) {
      expect((await town.deliver({ ...event, id: `${event.id}${again}` })).status).toBe(200);
      expect(await now(invoice)).toMatchObject({ state: 'open', paidMinor: 0 });
    }
    await town.shop.postman();
    const told = town.shop.mail.sent.filter((m) => m.to === 'office@shop.test' && m.subject.includes(invoice.number));
    expect(told).toHaveLength(1);
    expect(told[0]!.text).toContain('is not the amount asked for');
    expect((await startPaying(invoice)).status).toBe(201);
  });

  it('about a refund tells a person, once', async () => {
    const invoice = await invoiceOf();
    const { event, sessionId } = await paid(invoice);
    await town.deliver(event);
    await town.look.refunds.create({ payment_intent: town.stripe.state.sessions.find(sessionId)!.payment_intent as string, amount: 100 });
    const refund = town.stripe.state.events.where((e) => e.type === 'refund.created').at(-1)!;
    for (let i = 0; i < 3; i += 1) expect((await town.deliver(refund)).status).toBe(200);
    await town.shop.postman();
    expect(town.shop.mail.sent.filter((m) => m.to === 'office@shop.test' && m.subject.includes(invoice.number))).toHaveLength(1);
  });
});

describe('coming back from the payment page', () => {
  it('after paying, before any event, pays the invoice at once; the event that follows changes nothing', async () => {
    const invoice = await invoiceOf();
    const { sessionId, event } = await paid(invoice);
    const [first, second] = await Promise.all([comeBack(invoice, sessionId), comeBack(invoice, sessionId)]);
    expect(paymentReturnSchema.parse(first.body)).toMatchObject({ outcome: 'paid', invoice: { state: 'paid' } });
    expect(second.body.outcome).toBe('paid');
    await town.deliver(event);
    expect((await now(invoice)).payments).toHaveLength(1);
    expect(await receiptsOf(invoice)).toHaveLength(1);
  });

  it('without paying changes nothing', async () => {
    const invoice = await invoiceOf();
    const sessionId = await pageOf(invoice);
    expect((await comeBack(invoice, sessionId)).body as PaymentReturn).toMatchObject({ outcome: 'not-paid', invoice: { state: 'open', paidMinor: 0, version: 1 } });
  });

  it('with a declined card changes nothing, and another card pays', async () => {
    const invoice = await invoiceOf();
    const sessionId = await pageOf(invoice);
    expect(town.stripe.control.payWithCard(sessionId, '4000000000000002').kind).toBe('declined');
    expect((await comeBack(invoice, sessionId)).body.outcome).toBe('not-paid');
    town.stripe.control.payWithCard(sessionId, GOOD_CARD);
    expect((await comeBack(invoice, sessionId)).body.outcome).toBe('paid');
  });

  it('with another invoice’s page, another customer’s page, or none is not there', async () => {
    const [invoice, second] = [await invoiceOf(), await invoiceOf()];
    const { sessionId } = await paid(invoice);
    expect((await comeBack(second, sessionId)).status).toBe(404);
    expect((await comeBack(invoice, sessionId, other)).status).toBe(404);
    expect((await comeBack(invoice, 'cs_test_nobody')).status).toBe(404);
    expect((await comeBack(invoice, 'nonsense')).status).toBe(400);
    expect((await now(second)).paidMinor).toBe(0);
  });

  it('while the service is down says that nothing is lost, and shows a booked payment all the same', async () => {
    const invoice = await invoiceOf();
    const { sessionId, event } = await paid(invoice);
    town.stripe.control.failCalls({ method: 'GET', status: 500, left: 20 });
    expect((await comeBack(invoice, sessionId)).body).toMatchObject({ code: 'PAYMENT_SERVICE_UNREACHABLE', message: expect.stringContaining('If you have paid, nothing is lost') });
    town.stripe.control.clearFaults();
    await town.deliver(event);
    town.stripe.control.failCalls({ method: 'GET', status: 500, left: 20 });
    expect((await comeBack(invoice, sessionId)).body.outcome).toBe('paid');
  });
});

describe('the look-round of every minute', () => {
  const later = (ms: number) => town.shop.clock.forward(ms);
  const lookRound = () => town.shop.app.get(LookRoundService).reconcile();

  it('finds money whose event was lost', async () => {
    const invoice = await invoiceOf();
    await paid(invoice);
    await lookRound();
    expect((await now(invoice)).state).toBe('open');
    later(61_000);
    await lookRound();
    expect((await now(invoice)).state).toBe('paid');
    expect(await receiptsOf(invoice)).toHaveLength(1);
  });

  it('finds a page whose answer never reached us, and the money paid on it', async () => {
    const invoice = await invoiceOf();
    town.stripe.control.failCalls({ method: 'POST', path: '/v1/checkout/sessions', kind: 'reset', when: 'after', left: 1 });
    town.stripe.control.failCalls({ status: 503, left: 20 });
    await startPaying(invoice).expect(503);
    town.stripe.control.clearFaults();
    const [session] = sessionsOf(invoice);
    town.stripe.control.payWithCard(session!.id, GOOD_CARD);
    later(61_000);
    await lookRound();
    expect((await now(invoice)).state).toBe('paid');
  });

  it('closes what expired and keeps what is open', async () => {
    const [left, open] = [await invoiceOf(), await invoiceOf()];
    const [gone, stays] = [await pageOf(left), await pageOf(open)];
    town.stripe.control.expire(gone);
    later(61_000);
    await lookRound();
    const state = async (id: string) => (await rows<{ state: string }>('SELECT state FROM checkout_attempts WHERE sessionId = ?', [id]))[0]!.state;
    expect([await state(gone), await state(stays)]).toEqual(['expired', 'open']);
  });

  it('closes a page that asks for more than is owed by now', async () => {
    const invoice = await invoiceOf();
    const page = await pageOf(invoice);
    town.stripe.control.failCalls({ status: 500, left: 9 });
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'cash', amountMinor: 75_669, receivedOn: '2026-03-01' }).expect(201);
    await new Promise((done) => setTimeout(done, 100));
    town.stripe.control.clearFaults();
    later(61_000);
    await lookRound();
    expect(town.stripe.state.sessions.find(page)!.status).toBe('expired');
  });
});

describe('money that came in twice', () => {
  it('by transfer and by card is booked in full, and a person is told to give the rest back', async () => {
    const invoice = await invoiceOf();
    const { event } = await paid(invoice);
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'bank-transfer', amountMinor: 75_669, receivedOn: '2026-03-01' }).expect(201);
    await town.deliver(event);
    await expect.poll(async () => (await now(invoice)).paidMinor).toBe(151_338);
    expect(await now(invoice)).toMatchObject({ state: 'paid', balanceMinor: -75_669, overdue: false });
    await town.shop.postman();
    expect(town.shop.mail.sent.some((m) => m.to === 'office@shop.test' && m.text.includes(`Invoice ${invoice.number} is paid 756.69`))).toBe(true);
  });
});

describe('the service and the shop by themselves', () => {
  it('what was paid at the service is what the shop has booked, to the cent', async () => {
    await town.shop.app.get(LookRoundService).reconcile();
    const booked = await rows<{ paymentIntentId: string; amountMinor: number }>("SELECT paymentIntentId, amountMinor FROM payments WHERE kind = 'card' ORDER BY paymentIntentId");
    for (const { paymentIntentId, amountMinor } of booked) expect(town.stripe.state.paymentIntents.find(paymentIntentId)).toMatchObject({ status: 'succeeded', amount: amountMinor });
    const charges = town.stripe.state.charges.where((c) => c.status === 'succeeded');
    const perInvoice = new Map<string, number>();
    for (const charge of charges) perInvoice.set(charge.metadata['invoiceId'] ?? '', (perInvoice.get(charge.metadata['invoiceId'] ?? '') ?? 0) + 1);
    perInvoice.delete('');
    expect([...perInvoice.values()].every((n) => n === 1)).toBe(true);
  });
});

describe('currencies without and with three decimals', () => {
  it.each([
    ['JPY', 500, 'jpy', 500],
    ['BHD', 5120, 'bhd', 5120],
    ['ISK', 500, 'isk', 50_000],
  ])('%s %i is exact on the page, in the book and on the receipt', async (currency, amountMinor, sent, sentAmount) => {
    await shopProfile(town.shop, { currency });
    const invoice = await invoiceOf(oneLine(amountMinor));
    const { event, sessionId } = await paid(invoice);
    expect(town.stripe.state.sessions.find(sessionId)).toMatchObject({ currency: sent, amount_total: sentAmount });
    await town.deliver(event);
    expect(await now(invoice)).toMatchObject({ state: 'paid', currency, paidMinor: amountMinor });
    const written = { JPY: '500', BHD: '5.120', ISK: '500' }[currency]!;
    expect((await receiptsOf(invoice))[0]!.text).toContain(`We have received ${written}\u00a0${currency} by card`);
    await shopProfile(town.shop);
  });

  it('a single fils cannot be paid by card: the customer is told how else', async () => {
    await shopProfile(town.shop, { currency: 'BHD' });
    const invoice = await invoiceOf(oneLine(5125));
    const answer = await startPaying(invoice);
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'AMOUNT_NOT_RIGHT', message: expect.stringContaining('Pay by bank transfer') });
    await shopProfile(town.shop);
  });

  it('an amount below the service’s smallest is paid otherwise too', async () => {
    const answer = await startPaying(await invoiceOf(oneLine(10)));
    expect(answer.body.code).toBe('AMOUNT_NOT_RIGHT');
  });
});
