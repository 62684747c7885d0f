import type Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { refusalOf, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

describe('money that goes back', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt()));
  afterAll(() => shop.close());
  const linesOf = async (source: string) => (await shop.stripe.balanceTransactions.list({ source })).data;

  it('goes back in parts, never more than was paid', async () => {
    const { intent, charge } = await shop.paid(10_000);
    const first = await shop.stripe.refunds.create({ payment_intent: intent.id, amount: 2_500, reason: 'requested_by_customer', metadata: { credit_note: 'cn_1' } });
    expect(first).toMatchObject({ object: 'refund', status: 'succeeded', amount: 2_500, charge, metadata: { credit_note: 'cn_1' }, reason: 'requested_by_customer' });
    const over = await refusalOf(shop.stripe.refunds.create({ payment_intent: intent.id, amount: 7_501 }));
    expect(over).toMatchObject({ statusCode: 400, param: 'amount' });
    expect(over.message).toBe('Refund amount ($75.01) is greater than unrefunded amount on charge ($75.00)');
    await shop.stripe.refunds.create({ charge });
    expect(await shop.stripe.charges.retrieve(charge, { expand: ['refunds'] })).toMatchObject({ amount_refunded: 10_000, refunded: true, refunds: { data: [{ amount: 7_500 }, { amount: 2_500 }] } });
    expect((await refusalOf(shop.stripe.refunds.create({ charge }))).code).toBe('charge_already_refunded');
    expect((await shop.stripe.refunds.list({ payment_intent: intent.id })).data.map((refund) => refund.amount)).toEqual([7_500, 2_500]);
  });

  it('needs something that was paid', async () => {
    const session = await shop.newSession();
    shop.mock.control.payWithCard(session.id, '4000000000000002');
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect((await refusalOf(shop.stripe.refunds.create({ payment_intent: String(intent) }))).message).toContain('does not have a successful charge');
    expect((await refusalOf(shop.stripe.refunds.create({}))).code).toBe('parameter_missing');
  });

  it('waits with the card made for it, then arrives', async () => {
    const { intent } = await shop.paid(10_000, '4000000000007726');
    const refund = await shop.stripe.refunds.create({ payment_intent: intent.id });
    expect(refund.status).toBe('pending');
    await shop.mock.control.advance(31);
    expect((await shop.stripe.refunds.retrieve(refund.id)).status).toBe('succeeded');
    expect(shop.types()).toContain('refund.updated');
  });

  it('comes back when the bank cannot place it, even after it had succeeded', async () => {
    const { intent, charge } = await shop.paid(10_000, '4000000000005126');
    const refund = await shop.stripe.refunds.create({ payment_intent: intent.id, amount: 4_000 });
    expect(refund.status).toBe('succeeded');
    await shop.mock.control.advance(61);
    const after = await shop.stripe.refunds.retrieve(refund.id);
    expect(after).toMatchObject({ status: 'failed', failure_reason: 'expired_or_canceled_card' });
    expect((await linesOf(refund.id)).map((line) => [line.type, line.net])).toEqual([['refund_failure', 4_000], ['refund', -4_000]]);
    expect(await shop.stripe.charges.retrieve(charge)).toMatchObject({ amount_refunded: 0, refunded: false });
    expect(shop.types()).toContain('refund.failed');
    expect((await refusalOf(shop.stripe.refunds.cancel(refund.id))).statusCode).toBe(400);
  });

  it('is taken by a chargeback with a fee, and given back without it when the shop wins', async () => {
    const { charge } = await shop.paid(4_200, '4000000000000259');
    await shop.mock.control.advance(6);
    const dispute = (await shop.stripe.disputes.list({ charge })).data[0];
    expect(dispute).toMatchObject({ status: 'needs_response', amount: 4_200, reason: 'fraudulent', is_charge_refundable: false, network_reason_code: '10.4', payment_method_details: { card: { case_type: 'chargeback' } } });
    // 42.00 and a fee of 15.00: what the service itself books for such a test charge.
    expect(dispute?.balance_transactions.map((line) => line.net)).toEqual([-5_700]);
    expect((await refusalOf(shop.stripe.refunds.create({ charge }))).code).toBe('charge_disputed');
    const answered = await shop.stripe.disputes.update(String(dispute?.id), { evidence: { uncategorized_text: 'winning_evidence' } });
    expect(answered).toMatchObject({ status: 'under_review', evidence_details: { has_evidence: true, submission_count: 1 } });
    await shop.mock.control.advance(6);
    const won = await shop.stripe.disputes.retrieve(String(dispute?.id));
    expect(won.status).toBe('won');
    expect(won.balance_transactions.map((line) => line.net)).toEqual([-5_700, 4_200]);
    const types = shop.types();
    for (const type of ['charge.dispute.created', 'charge.dispute.funds_withdrawn', 'charge.dispute.updated', 'charge.dispute.funds_reinstated', 'charge.dispute.closed']) expect(types).toContain(type);
  });

  it('stays away when the evidence is poor or the shop gives in', async () => {
    const poor = await shop.paid(4_200, '4000000000002685');
    const given = await shop.paid(4_300, '4000000000000259');
    await shop.mock.control.advance(6);
    const [first, second] = await Promise.all([poor, given].map(async ({ charge }) => (await shop.stripe.disputes.list({ charge })).data[0]));
    await shop.stripe.disputes.update(String(first?.id), { evidence: { uncategorized_text: 'losing_evidence' }, submit: true });
    await shop.mock.control.advance(6);
    expect((await shop.stripe.disputes.retrieve(String(first?.id))).status).toBe('lost');
    expect((await shop.stripe.disputes.close(String(second?.id))).status).toBe('lost');
    expect((await refusalOf(shop.stripe.disputes.close(String(second?.id)))).statusCode).toBe(400);
  });

  it('does not move for an inquiry, which a full refund settles', async () => {
    const { charge } = await shop.paid(4_200, '4000000000001976');
    await shop.mock.control.advance(6);
    const inquiry = (await shop.stripe.disputes.list({ charge })).data[0];
    expect(inquiry).toMatchObject({ status: 'warning_needs_response', is_charge_refundable: true, balance_transactions: [] });
    await shop.stripe.refunds.create({ charge });
    expect((await shop.stripe.disputes.retrieve(String(inquiry?.id))).status).toBe('warning_closed');
  });

  it('is taken after all when an inquiry grows into a chargeback', async () => {
    const { charge } = await shop.paid(6_000);
    const inquiry = shop.mock.control.dispute(charge, { reason: 'product_not_received', inquiry: true });
    shop.mock.control.decideDispute(inquiry.id, 'lost');
    const grown = await shop.stripe.disputes.retrieve(inquiry.id);
    expect(grown).toMatchObject({ status: 'needs_response', is_charge_refundable: false });
    expect(grown.balance_transactions.map((line) => line.net)).toEqual([-7_500]);
  });

  it('adds up: the balance is the sum of its lines, and each line is amount less fee', async () => {
    const lines: Stripe.BalanceTransaction[] = [];
    for await (const line of shop.stripe.balanceTransactions.list({ limit: 100 })) lines.push(line);
    expect(lines.length).toBeGreaterThan(10);
    for (const line of lines) {
      expect(line.net).toBe(line.amount - line.fee);
      expect(line.fee_details.reduce((sum, part) => sum + part.amount, 0)).toBe(line.fee);
    }
    const balance = await shop.stripe.balance.retrieve();
    const total = [...balance.available, ...balance.pending].reduce((sum, part) => sum + part.amount, 0);
    expect(total).toBe(lines.reduce((sum, line) => sum + line.net, 0));
  });
});
