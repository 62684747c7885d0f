import { Agent, request, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';
import { errorBodySchema } from '@shared/errors';
import { expect } from 'vitest';
import type { Person, TestShop } from './test-app.js';

export interface Answer {
  readonly status: number;
  readonly headers: IncomingHttpHeaders;
  readonly text: string;
  readonly ms: number;
}
export interface Sent {
  readonly method: string;
  /** exactly as it goes over the wire */
  readonly path: string;
  readonly body?: string | undefined;
  readonly headers?: Record<string, string>;
}

/** Requests byte for byte as written: no address is tidied up, no header is added but what a browser of ours would send. */
export async function openWire(shop: TestShop, { listening = false } = {}) {
  if (!listening) await shop.app.listen(0, '127.0.0.1');
  const { port } = shop.app.getHttpServer().address() as AddressInfo;
  const agent = new Agent({ keepAlive: true, maxSockets: 64 });
  const send = (by: Person | null, { method, path, body, headers = {} }: Sent) =>
    new Promise<Answer>((done, failed) => {
      const begun = performance.now();
      const bytes = body === undefined ? undefined : Buffer.from(body);
      const own = { origin: shop.config.publicUrl, ...by?.carries(), ...(bytes ? { 'content-type': 'application/json', 'content-length': String(bytes.length) } : {}), ...headers };
      const r = request({ host: '127.0.0.1', port, agent, method, path, headers: own }, (answer) => {
        const chunks: Buffer[] = [];
        answer.on('data', (c: Buffer) => chunks.push(c));
        answer.on('error', failed);
        answer.on('end', () => done({ status: answer.statusCode!, headers: answer.headers, text: Buffer.concat(chunks).toString('latin1'), ms: performance.now() - begun }));
      });
      r.on('error', failed);
      r.end(bytes);
    });
  return { port, send, close: () => agent.destroy() };
}
export type Wire = Awaited<ReturnType<typeof openWire>>;

/** So many at a time, begun in the order given. */
export async function allOf<T>(items: readonly T[], work: (item: T) => Promise<void>, atOnce = 12): Promise<void> {
  const rest = items.values();
  await Promise.all(Array.from({ length: atOnce }, async () => {
    for (const item of rest) await work(item);
  }));
}

const INSIDE = /node_modules|\n\s+at |\.ts:\d|\.js:\d|SQLITE_|QueryFailed|savepoint|FST_ERR/i;

/** What is wrong with an answer, whatever was asked; null when it keeps the house's rules. */
export function faultOf({ status, headers, text, ms }: Answer): string | null {
  // the payment service is not there in these tests, and that is said in so many words
  if (status >= 500 && !text.includes('"PAYMENT_SERVICE_UNREACHABLE"')) return `status ${status}`;
  if (ms > 20_000) return `took ${Math.round(ms)} ms`;
  const type = String(headers['content-type'] ?? '');
  if (headers['x-content-type-options'] !== 'nosniff') return 'no nosniff';
  if (!headers['x-request-id']) return 'no x-request-id';
  if (status < 400) return /^(application\/json|text\/)/.test(type) && !/charset=utf-8/i.test(type) ? `no charset: ${type}` : null;
  if (INSIDE.test(text)) return 'shows its inside';
  if (type !== 'application/json; charset=utf-8') return `content-type ${type}`;
  const parsed = errorBodySchema.safeParse(JSON.parse(Buffer.from(text, 'latin1').toString('utf8')));
  if (!parsed.success) return `no body of ours: ${parsed.error.message}`;
  if (parsed.data.requestId !== headers['x-request-id']) return 'requestId differs from x-request-id';
  if (parsed.data.statusCode !== status) return 'statusCode differs from the status';
  return null;
}

export const expectNoFaults = (faults: readonly string[]) => expect([...new Set(faults)].slice(0, 25)).toEqual([]);
