import { isDisputeReason } from '../objects/new-dispute.js';
import type { AgendaItem } from '../store/agenda.js';
import type { World } from '../world.js';
import { decide, disputable, openDispute, warnOfFraud } from './disputes.js';
import { settleDebit } from './payments.js';
import { failRefund, settleRefund } from './refunds.js';
import { expireSession } from './sessions.js';

/** What the service does by itself when the time has come. What has been overtaken by events is let go. */
export function actOnAgenda(world: World, item: AgendaItem): void {
  const { state } = world;
  const session = state.sessions.find(item.id);
  const refund = state.refunds.find(item.id);
  const charge = state.charges.find(item.id);
  const dispute = state.disputes.find(item.id);
  const intent = state.paymentIntents.find(item.id);
  if (item.kind === 'session.expire' && session?.status === 'open') expireSession(world, session);
  if (item.kind === 'refund.settle' && refund) settleRefund(world, refund);
  if (item.kind === 'refund.fail' && refund && refund.status !== 'failed') failRefund(world, refund, 'expired_or_canceled_card');
  if (item.kind === 'debit.settle' && intent) settleDebit(world, intent);
  if (item.kind === 'dispute.decide' && dispute && dispute.status.endsWith('under_review')) decide(world, dispute, item.detail === 'won' ? 'won' : 'lost');
  if (item.kind === 'fraud.warn' && charge) warnOfFraud(world, charge);
  if (item.kind === 'dispute.open' && charge && disputable(world, charge) > 0) {
    const plan: { reason: unknown; inquiry: unknown; share: unknown } = JSON.parse(item.detail ?? '{}');
    openDispute(world, charge, {
      amount: Math.ceil(charge.amount * (typeof plan.share === 'number' ? plan.share : 1)),
      reason: isDisputeReason(plan.reason) ? plan.reason : 'general',
      inquiry: plan.inquiry === true,
    });
  }
}
