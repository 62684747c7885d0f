import { testCard } from '../cards/test-cards.js';
import { decide, openDispute } from '../engine/disputes.js';
import { methodFromCard } from '../engine/payment-methods.js';
import { finishStep, type Attempt } from '../engine/payments.js';
import { failRefund, settleRefund } from '../engine/refunds.js';
import { expireSession, paySession } from '../engine/sessions.js';
import { missing } from '../http/api-error.js';
import type { Fault, Faults } from '../http/faults.js';
import { NO_BILLING } from '../objects/new-payment-method.js';
import type { DisputeReason } from '../objects/new-dispute.js';
import type { Dispute, Refund, Session } from '../objects/stored.js';
import type { Delivery, DeliveryRule } from '../webhooks/delivery.js';
import type { Webhooks } from '../webhooks/webhooks.js';
import type { World } from '../world.js';

export interface Control {
  /** Let time pass on the service's clock; whatever falls due on the way happens, webhooks included. */
  advance(seconds: number): Promise<void>;
  /** Resolves when no webhook is on its way. */
  settled(): Promise<void>;
  /** Lose, repeat, delay or hold the next events of a type. */
  onEvents(rule: Partial<DeliveryRule> & Pick<DeliveryRule, 'action'>): void;
  clearRules(): void;
  release(order?: 'as-they-happened' | 'backwards' | readonly string[]): Promise<void>;
  resend(eventId: string): Promise<void>;
  retryNow(): Promise<void>;
  /** Let the next calls fail: with a status, by hanging, by breaking off; before the work or after it. */
  failCalls(fault: Partial<Fault>): void;
  clearFaults(): void;
  /** Calls that hang go on. */
  letGo(): void;
  payWithCard(sessionId: string, number: string, payer?: { email?: string; name?: string; passStep?: boolean }): Attempt;
  expire(sessionId: string): Session;
  dispute(charge: string, facts?: { reason?: DisputeReason; amount?: number; inquiry?: boolean }): Dispute;
  decideDispute(disputeId: string, outcome: 'won' | 'lost'): Dispute;
  failRefund(refundId: string, reason?: string): Refund;
  settleRefund(refundId: string): Refund;
  deliveries(): Delivery[];
  faults(): Fault[];
  rules(): DeliveryRule[];
}

interface Parts {
  world: World;
  webhooks: Webhooks;
  faults: Faults;
  changed: () => void;
}

export function controlOf({ world, webhooks, faults, changed }: Parts): Control {
  const { state } = world;
  const need = <T>(kind: string, id: string, found: T | undefined): T => {
    if (found === undefined) throw missing(kind, id);
    return found;
  };
  const andKeep = <T>(value: T): T => {
    changed();
    return value;
  };

  return {
    async advance(seconds) {
      world.agenda.advance(seconds * 1000);
      changed();
      await webhooks.settled();
    },
    settled: () => webhooks.settled(),
    onEvents({ action, type = '*', left = null, copies = 2, delayMs = 60_000 }) {
      webhooks.rules.push({ action, type, left, copies, delayMs });
    },
    clearRules() {
      webhooks.rules = [];
    },
    async release(order = 'as-they-happened') {
      webhooks.release(order);
      await webhooks.settled();
    },
    async resend(eventId) {
      webhooks.resend(need('event', eventId, state.events.find(eventId)));
      await webhooks.settled();
    },
    async retryNow() {
      webhooks.retryNow();
      await webhooks.settled();
    },
    failCalls({ method = '*', path = '/v1', kind = 'status', when = 'before', status = 500, code = null, left = 1 }) {
      faults.list.push({ method, path, kind, when, status, code, left });
    },
    clearFaults() {
      faults.list = [];
      faults.letGo();
    },
    letGo: () => faults.letGo(),
    payWithCard(sessionId, number, { email = 'customer@example.com', name = 'Test Holder', passStep } = {}) {
      world.agenda.runDue();
      const session = need('checkout.session', sessionId, state.sessions.find(sessionId));
      const cvc = testCard(number)?.brand === 'amex' ? '1234' : '123';
      const method = methodFromCard(world, { number, expMonth: 12, expYear: new Date(world.clock.nowMs()).getUTCFullYear() + 3, cvc }, { ...NO_BILLING, email, name });
      const { attempt, intent } = paySession(world, session, method, { email, name });
      const outcome = attempt.kind === 'needs-step' && passStep !== undefined ? finishStep(world, intent, passStep) : undefined;
      return andKeep(outcome ?? attempt);
    },
    expire(sessionId) {
      const session = need('checkout.session', sessionId, state.sessions.find(sessionId));
      expireSession(world, session);
      return andKeep(session);
    },
    dispute(id, { reason = 'fraudulent', amount, inquiry = false } = {}) {
      const charge = state.charges.find(id) ?? state.charges.find(state.paymentIntents.find(id)?.latest_charge);
      return andKeep(openDispute(world, need('charge', id, charge), { reason, amount, inquiry }));
    },
    decideDispute(id, outcome) {
      const dispute = need('dispute', id, state.disputes.find(id));
      decide(world, dispute, outcome);
      return andKeep(dispute);
    },
    failRefund(id, reason = 'expired_or_canceled_card') {
      const refund = need('refund', id, state.refunds.find(id));
      failRefund(world, refund, reason);
      return andKeep(refund);
    },
    settleRefund(id) {
      const refund = need('refund', id, state.refunds.find(id));
      settleRefund(world, refund);
      return andKeep(refund);
    },
    deliveries: () => state.deliveries.newestFirst(),
    faults: () => faults.list,
    rules: () => webhooks.rules,
  };
}
