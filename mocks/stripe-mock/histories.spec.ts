import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Charge } from './objects/stored.js';
import { refusalOf, shopBesideIt, type ShopBesideIt } from './shop-beside-it.js';

type Act =
  | { do: 'refund'; part: number }
  | { do: 'fail refund' }
  | { do: 'dispute'; inquiry: boolean; part: number }
  | { do: 'decide'; outcome: 'won' | 'lost' }
  | { do: 'wait'; seconds: number };

const acts = fc.array(
  fc.oneof(
    fc.record({ do: fc.constant('refund' as const), part: fc.integer({ min: 1, max: 100 }) }),
    fc.record({ do: fc.constant('fail refund' as const) }),
    fc.record({ do: fc.constant('dispute' as const), inquiry: fc.boolean(), part: fc.integer({ min: 1, max: 100 }) }),
    fc.record({ do: fc.constant('decide' as const), outcome: fc.constantFrom('won' as const, 'lost' as const) }),
    fc.record({ do: fc.constant('wait' as const), seconds: fc.integer({ min: 1, max: 90 }) }),
  ),
  { maxLength: 12 },
);
const cards = fc.constantFrom('4242424242424242', '4000000000007726', '4000000000005126', '4000000000000259', '4000000000001976', '4000000404000079');

describe('two hundred invented histories of a payment', () => {
  let shop: ShopBesideIt;
  beforeAll(async () => void (shop = await shopBesideIt({ webhookUrl: undefined })));
  afterAll(() => shop.close());

  it('never lose or make a cent, whatever happens after the payment', async () => {
    await fc.assert(
      fc.asyncProperty(cards, fc.integer({ min: 100, max: 2_000_000 }), acts, async (card, amount, history) => {
        const { charge: id } = await shop.paid(amount, card);
        for (const act of history) await carryOut(id, act);
        const charge = await shop.stripe.charges.retrieve(id);
        const { refunds, disputes, balanceTransactions } = shop.mock.state;
        const back = refunds.where((refund) => refund.charge === id && refund.status !== 'failed').reduce((sum, refund) => sum + refund.amount, 0);
        const taken = disputes.where((dispute) => dispute.charge === id && ['needs_response', 'under_review', 'lost'].includes(dispute.status)).reduce((sum, dispute) => sum + dispute.amount, 0);
        const sources = new Set([id, ...refunds.where((refund) => refund.charge === id).map((refund) => refund.id), ...disputes.where((dispute) => dispute.charge === id).map((dispute) => dispute.id)]);
        const lines = balanceTransactions.where((line) => sources.has(String(line.source)));
        expect(lines.reduce((sum, line) => sum + line.amount, 0)).toBe(amount - back - taken);
        expect(charge.amount_refunded).toBe(back);
        expect(charge.refunded).toBe(back === amount);
        expect(back + taken).toBeLessThanOrEqual(amount);
        for (const line of lines) expect(line.net).toBe(line.amount - line.fee);
      }),
      { numRuns: 200, seed: 20_261_201 },
    );
  });

  /** An act that the service rightly refuses is part of a history too. */
  async function carryOut(id: string, act: Act): Promise<void> {
    const { control, state } = shop.mock;
    const charge: Charge | undefined = state.charges.find(id);
    const share = (part: number) => Math.max(1, Math.floor(((charge?.amount ?? 0) * part) / 100));
    const refund = state.refunds.newestFirst().find((candidate) => candidate.charge === id && candidate.status !== 'failed');
    const dispute = state.disputes.newestFirst().find((candidate) => candidate.charge === id && !['won', 'lost', 'warning_closed'].includes(candidate.status));
    if (act.do === 'wait') await control.advance(act.seconds);
    if (act.do === 'fail refund' && refund) control.failRefund(refund.id);
    if (act.do === 'decide' && dispute) control.decideDispute(dispute.id, act.outcome);
    if (act.do === 'refund') {
      const asked = shop.stripe.refunds.create({ charge: id, amount: share(act.part) });
      const room = (charge?.amount ?? 0) - (charge?.amount_refunded ?? 0);
      const barred = state.disputes.where((candidate) => candidate.charge === id).some((candidate) => !candidate.is_charge_refundable);
      if (barred || share(act.part) > room) expect((await refusalOf(asked)).statusCode).toBe(400);
      else await asked;
    }
    if (act.do === 'dispute') {
      const claimed = state.disputes.where((candidate) => candidate.charge === id && !['won', 'warning_closed'].includes(candidate.status)).reduce((sum, candidate) => sum + candidate.amount, 0);
      const left = (charge?.amount ?? 0) - (charge?.amount_refunded ?? 0) - claimed;
      if (left > 0) control.dispute(id, { amount: share(act.part), inquiry: act.inquiry });
      else expect(() => control.dispute(id)).toThrow('nothing left to dispute');
    }
  }
});
