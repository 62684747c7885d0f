import type { FastifyInstance, FastifyReply, FastifyRequest } from 'fastify';
import { z } from 'zod';
import { newId } from '../store/ids.js';
import { API_VERSION, type World } from '../world.js';
import { ApiError, invalid } from './api-error.js';
import { authorise } from './authorise.js';
import { expandInto, type Hidden, type Lookup } from './expand.js';
import type { Fault, Faults } from './faults.js';
import { BadForm, decodeForm } from './form-body.js';
import { Idempotency, printOf } from './idempotency.js';
import { parseParams } from './params.js';

export interface ApiParts {
  world: World;
  faults: Faults;
  secretKey: string;
  find: Lookup;
  hidden: Hidden;
  changed: () => void;
}
type Method = 'GET' | 'POST' | 'DELETE';
export type Operation = <S extends z.ZodObject>(method: Method, path: string, schema: S, work: (params: z.output<S>, id: string) => unknown) => void;

interface Answer {
  status: number;
  body: string;
  kept: boolean;
}

/** The way every call of the API takes: key, faults, idempotency, parameters, work, expansion, answer. */
export function apiOn(app: FastifyInstance, parts: ApiParts): Operation {
  const { world, faults } = parts;
  const idempotency = new Idempotency(world.state.answers, () => world.clock.nowMs());

  app.setNotFoundHandler(async (request, reply) => {
    const requestId = newId('req');
    await answerWith(reply, requestId, () => {
      authorise(request.headers.authorization, parts.secretKey);
      throw new ApiError(404, { type: 'invalid_request_error', message: `Unrecognized request URL (${request.method}: ${pathOf(request)}). The demo payment service does not have it.` }, false);
    });
  });

  return (method, path, schema, work) => {
    app.route<{ Params: { id?: string } }>({
      method,
      url: path,
      handler: async (request, reply) => {
        const requestId = newId('req');
        const raw = method === 'POST' ? String(request.body ?? '') : queryOf(request);
        const key = method === 'POST' ? textHeader(request, 'idempotency-key') : undefined;
        const fault = faults.take(method, pathOf(request));
        if (key) void reply.header('idempotency-key', key);

        const begun = attempt(() => {
          authorise(request.headers.authorization, parts.secretKey);
          if (fault?.when === 'before' && fault.kind === 'status') throw faultError(fault);
          return key ? idempotency.begin(key, printOf(method, pathOf(request), raw)) : undefined;
        });
        if ('refusal' in begun) return send(reply, requestId, begun.refusal);
        if (begun.value) {
          void reply.header('idempotent-replayed', 'true').header('original-request', begun.value.requestId);
          return send(reply, requestId, { status: begun.value.status, body: begun.value.body, kept: false });
        }
        if (fault?.when === 'before' && (await goneWrong(fault, request, reply))) {
          if (key) idempotency.finish(key);
          return reply;
        }
        const done = carryOut(parts, { requestId, key: key ?? null, raw, id: request.params.id ?? '' }, schema, work);
        const answer = fault?.when === 'after' && fault.kind === 'status' ? answerOf(faultError(fault)) : done;
        if (key && fault?.when !== 'after') idempotency.finish(key, answer.kept ? { requestId, ...answer } : undefined);
        parts.changed();
        const gone = fault?.when === 'after' && (await goneWrong(fault, request, reply));
        if (key && fault?.when === 'after') idempotency.finish(key, answer.kept ? { requestId, ...answer } : undefined);
        return gone ? reply : send(reply, requestId, answer);
      },
    });
  };

  /** A call that hangs or breaks off; true when there is nobody left to answer. */
  async function goneWrong(fault: Fault, request: FastifyRequest, reply: FastifyReply): Promise<boolean> {
    if (fault.kind === 'status') return false;
    if (fault.kind === 'hang' && (await faults.hang((tell) => request.raw.socket.once('close', tell))) === 'let-go') return false;
    reply.hijack();
    request.raw.socket.destroy();
    return true;
  }
}

function carryOut<S extends z.ZodObject>(
  parts: ApiParts,
  call: { requestId: string; key: string | null; raw: string; id: string },
  schema: S,
  work: (params: z.output<S>, id: string) => unknown,
): Answer {
  const { world } = parts;
  world.agenda.runDue();
  world.request = { id: call.requestId, idempotency_key: call.key };
  try {
    const { expand, ...form } = decodeForm(call.raw);
    const paths = expand === undefined ? [] : parseParams(z.object({ expand: z.array(z.string()) }), { expand }).expand;
    const params = parseParams(schema, form);
    const value = expandInto(work(params, call.id), paths, parts.find, parts.hidden);
    return { status: 200, body: JSON.stringify(value, null, 2), kept: true };
  } catch (error) {
    if (error instanceof BadForm) return answerOf(new ApiError(400, { type: 'invalid_request_error', message: error.message }, false));
    if (error instanceof ApiError) return answerOf(error);
    process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
    return answerOf(new ApiError(500, { type: 'api_error', message: 'The demo payment service failed. Its log says why.' }));
  } finally {
    world.request = null;
  }
}

function attempt<T>(work: () => T): { value: T } | { refusal: Answer } {
  try {
    return { value: work() };
  } catch (error) {
    if (error instanceof ApiError) return { refusal: answerOf(error) };
    throw error;
  }
}

async function answerWith(reply: FastifyReply, requestId: string, work: () => never): Promise<void> {
  const result = attempt(work);
  if ('refusal' in result) await send(reply, requestId, result.refusal);
}

const answerOf = (error: ApiError): Answer => ({ status: error.status, body: JSON.stringify({ error: error.body }, null, 2), kept: error.kept });

function faultError(fault: Fault): ApiError {
  const type = fault.status >= 500 || fault.status === 429 ? 'api_error' : 'invalid_request_error';
  const code = fault.code ?? (fault.status === 429 ? 'rate_limit' : undefined);
  return new ApiError(fault.status, { type, message: 'An error was asked for through the control page.', ...(code ? { code } : {}) }, fault.when === 'after' && fault.status !== 429);
}

function send(reply: FastifyReply, requestId: string, answer: Answer): FastifyReply {
  return reply
    .status(answer.status)
    .header('request-id', requestId)
    .header('stripe-version', API_VERSION)
    .header('cache-control', 'no-store')
    .type('application/json')
    .send(answer.body);
}

const pathOf = (request: FastifyRequest): string => request.url.split('?', 1)[0] ?? '';
const queryOf = (request: FastifyRequest): string => request.url.slice(pathOf(request).length + 1);

function textHeader(request: FastifyRequest, name: string): string | undefined {
  const value = request.headers[name];
  return typeof value === 'string' && value !== '' ? value : undefined;
}

/** Forms are what the API speaks; the raw text is kept because the idempotency print is taken of it. */
export function takeForms(app: FastifyInstance): void {
  app.addContentTypeParser('application/x-www-form-urlencoded', { parseAs: 'string' }, (_request, body, done) => done(null, body));
  app.addContentTypeParser('*', { parseAs: 'string' }, (_request, body, done) => {
    if (body === '') done(null, '');
    else done(invalid('The API takes bodies of type application/x-www-form-urlencoded.'));
  });
}
