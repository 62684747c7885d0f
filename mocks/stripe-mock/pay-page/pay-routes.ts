import type { FastifyInstance, FastifyReply } from 'fastify';
import { PAGE_HEADERS } from '../../look/page.js';
import { faultOf, type CardFault } from '../cards/card-details.js';
import { TEST_ACCOUNTS, TEST_ROUTING_NUMBER, testAccount } from '../cards/test-accounts.js';
import { testCard } from '../cards/test-cards.js';
import { methodFromAccount, methodFromCard } from '../engine/payment-methods.js';
import { finishStep } from '../engine/payments.js';
import { completeFree, paySession } from '../engine/sessions.js';
import { sessionOf } from '../engine/session-outcome.js';
import { NO_BILLING } from '../objects/new-payment-method.js';
import type { PaymentIntent, PaymentMethod, Session } from '../objects/stored.js';
import type { World } from '../world.js';
import { payPage, spaced, standing, type PayFace } from './pay-view.js';
import { expiryIn, NOTHING_TYPED, typedIn, wrongIn, type Typed, type Wrong } from './read-form.js';
import { receiptPage, stepPage } from './step-view.js';
import { declineWords, TEXT } from './text.js';

type Id = { Params: { id: string } };

export function payRoutes(app: FastifyInstance, world: World, changed: () => void): void {
  const { state } = world;
  app.addHook('onRequest', async (_request, reply) => void reply.headers(PAGE_HEADERS));

  app.get<Id>('/c/pay/:id', async (request, reply) => {
    world.agenda.runDue();
    const session = state.sessions.find(request.params.id);
    if (session?.status !== 'open') return show(reply, session ? 200 : 404, overFace(session));
    return show(reply, 200, payPage(faceOf(session, {})));
  });

  app.post<Id>('/c/pay/:id', async (request, reply) => {
    world.agenda.runDue();
    const session = state.sessions.find(request.params.id);
    if (!session || session.status === 'expired') return show(reply, session ? 410 : 404, overFace(session));
    // A second press of the same button lands where the first one did.
    if (session.status === 'complete') return goOn(reply, session);
    const form = new URLSearchParams(String(request.body ?? ''));
    const outcome = press(session, form);
    changed();
    if (outcome === 'paid') return goOn(reply, session);
    if (typeof outcome === 'string') return reply.redirect(outcome, 303);
    return show(reply, outcome.failure ? 402 : outcome.filled ? 200 : 422, payPage(outcome));
  });

  app.get<Id>('/c/step/:id', async (request, reply) => {
    const intent = state.paymentIntents.find(request.params.id);
    if (!intent) return show(reply, 404, overFace(undefined));
    return intent.status === 'requires_action' ? show(reply, 200, stepPage(intent)) : show(reply, 200, stepOver(intent));
  });

  app.post<Id>('/c/step/:id', async (request, reply) => {
    const intent = state.paymentIntents.find(request.params.id);
    if (!intent) return show(reply, 404, overFace(undefined));
    const back = intent.next_action?.redirect_to_url?.return_url ?? null;
    const passed = new URLSearchParams(String(request.body ?? '')).get('result') === 'pass';
    const result = finishStep(world, intent, passed);
    changed();
    const session = sessionOf(world, intent);
    if (session?.status === 'complete') return goOn(reply, session);
    if (session) return reply.redirect(`/c/pay/${session.id}`, 303);
    if (!result) return show(reply, 200, stepOver(intent));
    if (back) return reply.redirect(withOutcome(back, intent, result.kind !== 'declined'), 303);
    const declined = result.kind === 'declined' ? result.error : undefined;
    return show(reply, 200, declined ? standing(TEXT.failedTitle, declineWords(declined.code, declined.decline_code)) : standing(TEXT.doneTitle, TEXT.paidBody));
  });

  app.get<Id>('/c/receipt/:id', async (request, reply) => {
    const charge = state.charges.find(request.params.id);
    return charge ? show(reply, 200, receiptPage(charge)) : show(reply, 404, overFace(undefined));
  });

  function faceOf(session: Session, more: Partial<PayFace>): PayFace {
    const error = state.paymentIntents.find(session.payment_intent)?.last_payment_error;
    return {
      session,
      lines: state.lineItems[session.id] ?? [],
      description: state.intentOrders[session.id]?.description ?? null,
      typed: NOTHING_TYPED,
      wrong: {},
      failure: error ? declineWords(error.code, error.decline_code) : undefined,
      ...more,
    };
  }

  /** What pressing a button leads to: paid, an address to go on to, or the page again. */
  function press(session: Session, form: URLSearchParams): 'paid' | string | PayFace {
    const typed = { ...typedIn(form), ...(session.customer_email ? { email: session.customer_email } : {}) };
    const bankOpen = form.get('method') === 'bank';
    const again = (more: Partial<PayFace>) => faceOf(session, { typed: showable(typed), bankOpen, failure: undefined, ...more });
    const fill = form.get('fill');
    if (fill) return again(filledWith(fill, typed));
    const method = session.amount_total === 0 ? 'free' : bankOpen ? 'bank' : 'card';
    const wrong = { ...wrongIn(typed, method), ...(method === 'card' ? wrongCard(typed) : {}) };
    if (method === 'bank' && !testAccount(typed.account)) wrong.account = TEXT.unknownAccount;
    if (Object.keys(wrong).length > 0) return again({ wrong });
    const payer = { email: typed.email, name: typed.name || null };
    if (method === 'free') {
      completeFree(world, session, payer);
      return 'paid';
    }
    const { attempt } = paySession(world, session, methodIn(typed, method), payer);
    if (attempt.kind === 'declined') return again({ failure: declineWords(attempt.error.code, attempt.error.decline_code) });
    return attempt.kind === 'needs-step' ? `/c/step/${session.payment_intent}` : 'paid';
  }

  function methodIn(typed: Typed, method: 'card' | 'bank'): PaymentMethod {
    const billing = { ...NO_BILLING, email: typed.email, name: typed.name };
    if (method === 'bank') return methodFromAccount(world, typed.account, TEST_ROUTING_NUMBER, billing);
    const expiry = expiryIn(typed.expiry) ?? { month: 0, year: 0 };
    return methodFromCard(world, { number: typed.number, expMonth: expiry.month, expYear: expiry.year, cvc: typed.cvc }, billing);
  }

  /** The number and the rest are looked at apart, so that both can be marked at once. */
  function wrongCard(typed: Typed): Wrong {
    const expiry = expiryIn(typed.expiry);
    const now = new Date(world.clock.nowMs());
    const today = { year: now.getUTCFullYear(), month: now.getUTCMonth() + 1 };
    const wrong: Wrong = {};
    const mark = (field: keyof Wrong, fault: CardFault | undefined) => {
      if (fault) wrong[field] = declineWords(fault.code, fault.declineCode);
    };
    const [anyNumber, anyDate] = [testCard(typed.number)?.number ?? '4242424242424242', { expMonth: 12, expYear: today.year + 1 }];
    if (typed.number !== '') mark('number', faultOf({ number: typed.number, ...anyDate }, today));
    if (expiry) mark('expiry', faultOf({ number: anyNumber, expMonth: expiry.month, expYear: expiry.year }, today));
    if (typed.cvc !== '') mark('cvc', faultOf({ number: anyNumber, ...anyDate, cvc: typed.cvc }, today));
    return wrong;
  }

  function filledWith(number: string, typed: Typed): Partial<PayFace> {
    const card = testCard(number);
    const account = TEST_ACCOUNTS.find((candidate) => candidate.number === number);
    const name = typed.name || 'Test Holder';
    if (account) return { typed: { ...typed, name, account: account.number }, filled: account.listed };
    if (!card) return {};
    const year = String((new Date(world.clock.nowMs()).getUTCFullYear() + 3) % 100).padStart(2, '0');
    return { typed: { ...typed, name, number: spaced(card.number), expiry: `12 / ${year}`, cvc: card.brand === 'amex' ? '1234' : '123' }, filled: card.listed ?? card.alias };
  }

  function overFace(session: Session | undefined): string {
    if (!session) return standing(TEXT.unknownTitle, TEXT.unknownBody);
    const shop = session.success_url ? { href: landing(session), text: TEXT.toShop } : null;
    if (session.status === 'expired') return standing(TEXT.expiredTitle, TEXT.expiredBody, session.cancel_url ? { href: session.cancel_url, text: TEXT.toShopUnpaid } : null);
    return session.payment_status === 'unpaid' ? standing(TEXT.orderedTitle, TEXT.orderedBody, shop) : standing(TEXT.paidTitle, TEXT.paidBody, shop);
  }

  function stepOver(intent: PaymentIntent): string {
    const session = sessionOf(world, intent);
    return standing(TEXT.stepOver, TEXT.stepOverBody, session ? { href: `/c/pay/${session.id}`, text: TEXT.toPayPage } : null);
  }
}

/** A number that is not a test card's is not sent back to the browser. */
function showable(typed: Typed): Typed {
  const card = testCard(typed.number);
  return card ? { ...typed, number: spaced(card.number) } : { ...typed, number: '', cvc: '' };
}

const landing = (session: Session): string => (session.success_url ?? '').replaceAll('{CHECKOUT_SESSION_ID}', session.id);

function goOn(reply: FastifyReply, session: Session): FastifyReply {
  return session.success_url ? reply.redirect(landing(session), 303) : reply.redirect(`/c/pay/${session.id}`, 303);
}

function withOutcome(address: string, intent: PaymentIntent, succeeded: boolean): string {
  const url = new URL(address);
  url.searchParams.set('payment_intent', intent.id);
  url.searchParams.set('payment_intent_client_secret', intent.client_secret ?? '');
  url.searchParams.set('redirect_status', succeeded ? 'succeeded' : 'failed');
  return url.href;
}

function show(reply: FastifyReply, status: number, text: string): FastifyReply {
  return reply.status(status).type('text/html; charset=utf-8').send(text);
}
