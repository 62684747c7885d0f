import { invoiceViewSchema, paymentReturnSchema } from '@shared/invoices';
import { portalHomeSchema, portalJobSchema, portalMachinesSchema } from '@shared/portal';
import { quoteViewSchema } from '@shared/quotes';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ReadDb } from '../src/database/read-db.js';
import { customerLife, type CustomerLife } from './customer-life.js';
import { handlersOf, type Handler } from './handlers.js';
import { shopProfile } from './job-in-shop.js';
import { staffAndMeters } from './job-on-the-bench.js';
import { openPaymentTown, type PaymentTown } from './payment-town.js';
import { allOf, openWire, type Answer, type Sent, type Wire } from './wire.js';

const [MINE, THEIRS] = ['ASHGROVE', 'BLACKTHORN'];
const STAFF_NAMES = ['Tess Technician', 'Sam Second', 'Mo Manager'];
const ABSENT = '01900000-0000-7000-8000-000000000000';
let town: PaymentTown;
let wire: Wire;
let mine: CustomerLife;
let theirs: CustomerLife;
let portal: Handler[];

beforeAll(async () => {
  town = await openPaymentTown();
  town.shop.clock.set(new Date('2026-03-02T09:00:00.000Z'));
  wire = await openWire(town.shop, { listening: true });
  await shopProfile(town.shop);
  const people = await staffAndMeters(town.shop);
  mine = await customerLife(town.shop, people, MINE);
  theirs = await customerLife(town.shop, people, THEIRS);
  portal = handlersOf(town.shop).filter((h) => h.needs === 'portal.use');
});
afterAll(async () => {
  wire.close();
  await town.close();
});

const BODIES: Record<string, object> = { approval: { version: 2, name: 'Somebody' }, decline: { version: 2, reason: 'Too dear' }, checkout: { version: 2 } };
/** The request a handler takes, about this identifier. */
function about(h: Handler, id: string, sessionId = theirs.sessionId): Sent {
  const path = h.path.replace(':id', id);
  if (h.method !== 'get') return { method: h.method.toUpperCase(), path, body: JSON.stringify(BODIES[h.path.split('/').at(-1)!]) };
  return { method: 'GET', path: h.path.endsWith('payment-return') ? `${path}?session_id=${sessionId}` : path };
}
const withoutRequestId = ({ status, text }: Answer) => ({ status, text: text.replace(/"requestId":"[^"]+"/, '') });

describe('a customer with the identifiers of another', () => {
  it('there are identifiers of everything, and every handler of the portal is walked', () => {
    expect(theirs.identifiers.length).toBeGreaterThan(45);
    expect(portal.length).toBeGreaterThanOrEqual(12);
    expect(portal.filter((h) => h.method !== 'get').every((h) => h.path.split('/').at(-1)! in BODIES)).toBe(true);
  });

  it('is told at every address of the portal just what stands there for an identifier nobody has', async () => {
    for (const h of portal.filter((x) => x.path.includes(':id'))) {
      const unknown = withoutRequestId(await wire.send(mine.person, about(h, ABSENT, 'cs_test_nobody')));
      expect(unknown.status, h.path).toBe(404);
      await allOf(theirs.identifiers, async (id) => {
        const answer = await wire.send(mine.person, about(h, id));
        expect({ h: `${h.method} ${h.path}`, ...withoutRequestId(answer) }).toEqual({ h: `${h.method} ${h.path}`, ...unknown });
      });
    }
  });

  it('gets no word of a payment page of another, not even under an invoice of their own', async () => {
    const path = `/api/portal/invoices/${mine.invoice.id}/payment-return?session_id=`;
    const [theirPage, noPage] = [await wire.send(mine.person, { method: 'GET', path: path + theirs.sessionId }), await wire.send(mine.person, { method: 'GET', path: `${path}cs_test_nobody` })];
    expect(theirPage.status).toBe(404);
    expect(withoutRequestId(theirPage)).toEqual(withoutRequestId(noPage));
  });

  it('changes nothing of it: quote, invoice and payment page stand as before', async () => {
    const db = town.shop.app.get(ReadDb);
    expect(await db.all('SELECT state, version FROM quotes WHERE customerId = ? ORDER BY number', [theirs.job.customerId])).toEqual([{ state: 'approved', version: 3 }, { state: 'sent', version: 2 }, { state: 'draft', version: 1 }]);
    expect(await db.all('SELECT attempt, state FROM checkout_attempts WHERE customerId = ?', [theirs.job.customerId])).toEqual([{ attempt: 1, state: 'open' }]);
    expect((await db.one<{ n: number }>('SELECT COUNT(*) AS n FROM history WHERE actorId = ?', [mine.person.userId]))!.n).toBe(0);
  });

  it('is refused at every address of the staff, with their own identifiers and with those of others', async () => {
    const staffOnly = handlersOf(town.shop).filter((h) => h.needs !== 'public' && h.needs !== 'portal.use' && h.needs !== 'profile.own');
    expect(staffOnly.length).toBeGreaterThan(50);
    const requests = staffOnly.flatMap((h) => [theirs.job.jobId, mine.job.jobId, theirs.invoice.id, theirs.photoId].map((id) => ({ method: h.method.toUpperCase(), path: h.path.replace(/:\w+/g, id), body: h.method === 'get' ? undefined : '{}' })));
    await allOf(requests, async (sent) => {
      const answer = await wire.send(mine.person, sent);
      expect(`${sent.method} ${sent.path} ${answer.status}`).toBe(`${sent.method} ${sent.path} 403`);
      expect(answer.text).not.toMatch(new RegExp(`${THEIRS}|${MINE}`, 'i'));
    });
  });
});

describe('what a customer reads of their own', () => {
  const own = (): [string, { parse(body: unknown): unknown }][] => [
    ['/api/portal', portalHomeSchema],
    ['/api/portal/machines', portalMachinesSchema],
    [`/api/portal/jobs/${mine.job.jobId}`, portalJobSchema],
    [`/api/portal/quotes/${mine.quotes.approved.id}`, quoteViewSchema],
    [`/api/portal/quotes/${mine.quotes.sent.id}`, quoteViewSchema],
    [`/api/portal/invoices/${mine.invoice.id}`, invoiceViewSchema],
    [`/api/portal/invoices/${mine.invoice.id}/payment-return?session_id=${mine.sessionId}`, paymentReturnSchema],
  ];
  const read = async (path: string) => {
    const answer = await wire.send(mine.person, { method: 'GET', path });
    expect(answer.status, path).toBe(200);
    return Buffer.from(answer.text, 'latin1').toString('utf8');
  };
  const keysOf = (value: unknown): string[] => (typeof value === 'object' && value !== null ? Object.entries(value).flatMap(([key, inner]) => [...(Array.isArray(value) ? [] : [key]), ...keysOf(inner)]) : []);

  it('has nothing in it of anybody else, not a name and not an identifier', async () => {
    for (const [path, schema] of own()) {
      const text = await read(path);
      schema.parse(JSON.parse(text));
      expect(text, path).toContain(MINE);
      expect(text.toUpperCase(), path).not.toContain(THEIRS);
      for (const id of theirs.identifiers) expect(text, path).not.toContain(id);
    }
  });

  it('has no key of the inside: no users, hashes, costs or notes of the shop', async () => {
    const INSIDE = /userId|password|hash|sha|session|token|storedName|cost|margin|internal|terms|creditStop|lastError|attempt|holdReason|waitingFor|verificationCode|instrument|readings|byName/i;
    for (const [path] of own()) expect(keysOf(JSON.parse(await read(path))).filter((key) => INSIDE.test(key)), path).toEqual([]);
  });

  it('does not say who of the shop did what, nor the limit that was named on the phone', async () => {
    for (const [path] of own()) {
      const text = await read(path);
      for (const name of STAFF_NAMES) expect(text, path).not.toContain(name);
      expect(text, path).not.toContain('9876543');
    }
    const stale = await wire.send(mine.person, { method: 'POST', path: `/api/portal/invoices/${mine.invoice.id}/checkout`, body: '{"version":1}' });
    expect(stale.status).toBe(409);
    for (const name of STAFF_NAMES) expect(stale.text).not.toContain(name);
  });

  it('papers and photos open, but neither the shop’s tag nor a supplier’s document nor a draft', async () => {
    const db = town.shop.app.get(ReadDb);
    const papers = await db.all<{ id: string; kind: string }>('SELECT id, kind FROM papers WHERE jobId = ?', [mine.job.jobId]);
    expect([...new Set(papers.map((p) => p.kind))].sort()).toEqual(['certificate', 'invoice', 'quote', 'receipt', 'tag']);
    for (const { id, kind } of papers) {
      const answer = await wire.send(mine.person, { method: 'GET', path: `/api/portal/papers/${id}/pdf` });
      expect(`${kind} ${answer.status}`).toBe(`${kind} ${kind === 'tag' ? 404 : 200}`);
    }
    for (const end of ['', '/thumb']) {
      expect((await wire.send(mine.person, { method: 'GET', path: `/api/portal/attachments/${mine.photoId}${end}` })).status).toBe(200);
      expect((await wire.send(mine.person, { method: 'GET', path: `/api/portal/attachments/${mine.documentId}${end}` })).status).toBe(404);
    }
    expect((await wire.send(mine.person, { method: 'GET', path: `/api/portal/quotes/${mine.quotes.draft.id}` })).status).toBe(404);
  });
});
