import type { FastifyInstance } from 'fastify';
import { z } from 'zod';
import { isFromHere } from '../../from-here.js';
import { PAGE_HEADERS } from '../../look/page.js';
import { ApiError } from '../http/api-error.js';
import { isDisputeReason, type DisputeReason } from '../objects/new-dispute.js';
import type { World } from '../world.js';
import { controlPage } from './control-page.js';
import type { Control } from './control.js';

const number = (max: number) => z.coerce.number().int().min(0).max(max);
const count = z.union([z.literal(''), z.literal('all').transform(() => null), number(1_000_000)]).transform((value) => (value === '' ? null : value));
const id = z.string().min(1).max(120);
const reason = z.custom<DisputeReason>(isDisputeReason, 'not a reason for a dispute');

/** Every act of the control page and of the control API: its address, what it takes, what it does. */
const acts = (control: Control) => ({
  'clock/advance': act(z.object({ seconds: number(400 * 86_400) }), ({ seconds }) => control.advance(seconds)),
  settled: act(z.object({}), () => control.settled()),
  'webhooks/rules': act(
    z.object({ action: z.enum(['lose', 'repeat', 'delay', 'hold']), type: z.string().min(1).max(80).default('*'), left: count.default(null), copies: number(20).default(2), delayMs: number(86_400_000).default(60_000) }),
    (rule) => control.onEvents(rule),
  ),
  'webhooks/rules/clear': act(z.object({}), () => control.clearRules()),
  'webhooks/release': act(z.object({ order: z.union([z.enum(['as-they-happened', 'backwards']), z.array(z.string())]).default('as-they-happened') }), ({ order }) => control.release(order)),
  'webhooks/resend': act(z.object({ event: id }), ({ event }) => control.resend(event)),
  'webhooks/retry-now': act(z.object({}), () => control.retryNow()),
  faults: act(
    z.object({
      method: z.enum(['*', 'GET', 'POST', 'DELETE']).default('*'),
      path: z.string().startsWith('/v1').default('/v1'),
      kind: z.enum(['status', 'hang', 'reset']).default('status'),
      when: z.enum(['before', 'after']).default('before'),
      status: number(599).refine((value) => value >= 400).default(500),
      code: z.string().max(80).transform((value) => value || null).nullable().default(null),
      left: number(1000).default(1),
    }),
    (fault) => control.failCalls(fault),
  ),
  'faults/clear': act(z.object({}), () => control.clearFaults()),
  'faults/let-go': act(z.object({}), () => control.letGo()),
  'sessions/pay': act(z.object({ session: id, card: z.string().default('4242424242424242'), email: z.string().optional(), name: z.string().optional(), passStep: z.boolean().optional() }), (asked) =>
    control.payWithCard(asked.session, asked.card, {
      ...(asked.email === undefined ? {} : { email: asked.email }),
      ...(asked.name === undefined ? {} : { name: asked.name }),
      ...(asked.passStep === undefined ? {} : { passStep: asked.passStep }),
    }),
  ),
  'sessions/expire': act(z.object({ session: id }), ({ session }) => control.expire(session)),
  'disputes/open': act(z.object({ charge: id, reason: reason.default('fraudulent'), amount: number(99_999_999).optional(), inquiry: z.union([z.boolean(), z.stringbool()]).default(false) }), (asked) =>
    control.dispute(asked.charge, { reason: asked.reason, inquiry: asked.inquiry, ...(asked.amount === undefined ? {} : { amount: asked.amount }) }),
  ),
  'disputes/decide': act(z.object({ dispute: id, outcome: z.enum(['won', 'lost']) }), ({ dispute, outcome }) => control.decideDispute(dispute, outcome)),
  'refunds/fail': act(z.object({ refund: id, reason: z.string().optional() }), ({ refund, reason: why }) => control.failRefund(refund, why)),
  'refunds/settle': act(z.object({ refund: id }), ({ refund }) => control.settleRefund(refund)),
});

function act<S extends z.ZodType>(schema: S, work: (asked: z.output<S>) => unknown): (body: unknown) => Promise<unknown> {
  return async (body) => work(schema.parse(body));
}

export function controlRoutes(app: FastifyInstance, world: World, control: Control): void {
  app.addHook('onRequest', async (request, reply) => {
    void reply.headers(PAGE_HEADERS);
    if (request.method !== 'GET' && !isFromHere(request)) await reply.status(403).send({ error: { message: 'The control API answers its own page and programs on this machine only.' } });
  });
  app.addContentTypeParser('application/json', { parseAs: 'string' }, (_request, body, done) => {
    try {
      done(null, body === '' ? {} : JSON.parse(String(body)));
    } catch {
      done(new ApiError(400, { type: 'invalid_request_error', message: 'The body is not JSON.' }));
    }
  });

  app.get('/_control', async (_request, reply) => reply.type('text/html; charset=utf-8').send(controlPage(world, control)));
  app.get('/_control/state', async (_request, reply) =>
    reply.type('application/json').send(JSON.stringify({ now: world.clock.seconds(), rules: control.rules(), faults: control.faults(), agenda: world.agenda.pending(), ...world.state, secrets: undefined, behind: undefined, answers: undefined })),
  );
  for (const [path, carryOut] of Object.entries(acts(control))) {
    app.post(`/_control/${path}`, async (request, reply) => {
      const fromPage = typeof request.body === 'string';
      const body = fromPage ? Object.fromEntries([...new URLSearchParams(String(request.body))].filter(([, value]) => value !== '')) : (request.body ?? {});
      const result = await attempt(() => carryOut(body));
      if (fromPage && result.status === 200) return reply.redirect('/_control', 303);
      return reply.status(result.status).type('application/json').send(JSON.stringify(result.body));
    });
  }
}

async function attempt(work: () => Promise<unknown>): Promise<{ status: number; body: unknown }> {
  try {
    return { status: 200, body: (await work()) ?? { ok: true } };
  } catch (error) {
    if (error instanceof ApiError) return { status: error.status, body: { error: error.body } };
    if (error instanceof z.ZodError) return { status: 400, body: { error: { message: z.prettifyError(error) } } };
    throw error;
  }
}

