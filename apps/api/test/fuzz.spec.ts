import { recordListSchema } from '@shared/records';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { beforeVarnish, finalTest, incomingTest } from '../../../mocks/sample-shop/machine-tests.js';
import { HistoryService } from '../src/history/history.service.js';
import { approvedQuote, issuedInvoice } from './approved-quote.js';
import { fitting, pick, placesOf, seeded, withAt, type JsonSchema } from './from-schema.js';
import { HOSTILE_BODIES, HOSTILE_IDS, HOSTILE_JSON, HOSTILE_TEXTS, hostileQueries } from './hostile-values.js';
import { bookIn, NEW_CUSTOMER, PLATE } from './jobs-booking.js';
import { jobInShop, shopProfile, type JobInShop } from './job-in-shop.js';
import { BenchJob, staffAndMeters } from './job-on-the-bench.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';
import { allOf, expectNoFaults, faultOf, openWire, type Sent, type Wire } from './wire.js';

interface Operation {
  readonly method: string;
  readonly path: string;
  readonly queries: readonly string[];
  readonly body: JsonSchema | null;
}
const random = seeded(20260302);
let shop: TestShop;
let wire: Wire;
let manager: Person;
let customer: Person;
let job: JobInShop;
let operations: Operation[];
let known: string[];
/** what stands behind the first word of an address */
let behind: Record<string, string>;

beforeAll(async () => {
  shop = await openTestShop();
  wire = await openWire(shop);
  await shopProfile(shop);
  manager = await shop.person(['manager']);
  job = await jobInShop(shop, manager);
  customer = await shop.person(['customer'], { customerId: job.customerId });
  const invoice = await issuedInvoice(shop, manager, job);
  const quote = await approvedQuote(shop, manager, job);
  const { papers } = (await manager.get(`/api/jobs/${job.jobId}`)).body;
  known = [job.jobId, job.customerId, job.machineId, invoice.id, quote.id, papers[0].id, customer.userId!, '01900000-0000-7000-8000-000000000000'];
  const instrument = (await manager.post('/api/instruments', { tag: 'V1', kind: 'voltmeter', percentOfReading: 0.5, percentOfRange: 0.1, calibratedOn: '2026-01-01', dueOn: '2027-01-01' }).expect(201)).body;
  await manager.post('/api/instruments', { tag: 'a word', kind: 'ammeter', percentOfReading: 0.5, percentOfRange: 0.1, calibratedOn: '2026-01-01', dueOn: '2027-01-01' }).expect(201);
  behind = { jobs: job.jobId, customers: job.customerId, machines: job.machineId, quotes: quote.id, invoices: invoice.id, users: customer.userId!, instruments: instrument.id, papers: papers[0].id };
  operations = await operationsOf(manager);
});
afterAll(async () => {
  wire.close();
  await shop.close();
});

interface Documented {
  readonly parameters?: readonly { readonly name: string; readonly in: string }[];
  readonly requestBody?: { readonly content: Record<string, { readonly schema: JsonSchema }> };
}
async function operationsOf(person: Person): Promise<Operation[]> {
  const { paths } = (await person.get('/api/docs-json').expect(200)).body as { paths: Record<string, Record<string, Documented>> };
  return Object.entries(paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, o]) => ({
      method: method.toUpperCase(),
      path,
      queries: (o.parameters ?? []).filter((p) => p.in === 'query').map((p) => p.name),
      body: o.requestBody?.content['application/json']?.schema ?? null,
    })),
  );
}
/** Odd, but text: names like these are taken in, and stand on sheets and papers afterwards. */
const HARMLESS = HOSTILE_TEXTS.filter((text) => text.length < 40 && !/[\u0000-\u001f]|\p{Surrogate}/u.test(text));
const endsSessions = (o: Operation) => o.path.startsWith('/api/session/end');
const filled = (path: string, id: string) => path.replace(/\{\w+\}/g, id);
/** the address of something that is there */
const real = (path: string) => filled(path, behind[path.split('/').filter((word) => word !== 'portal')[2]!] ?? job.jobId);

const counts: Record<string, number> = {};
async function faultsOf(by: Person | null, requests: readonly Sent[]): Promise<string[]> {
  const faults: string[] = [];
  await allOf(requests, async (sent) => {
    const answer = await wire.send(by, sent);
    counts[answer.status] = (counts[answer.status] ?? 0) + 1;
    const fault = faultOf(answer);
    if (fault) faults.push(`${sent.method} ${sent.path.slice(0, 90)} ${(sent.body ?? '').slice(0, 160)} → ${fault}`);
  });
  return faults;
}

describe('whatever is sent, the answer is one of ours', () => {
  it('addresses with quotes, signs, other alphabets and halves of letters', async () => {
    const requests = operations.flatMap((o) => (o.path.includes('{') ? HOSTILE_IDS.map((id) => ({ method: o.method, path: filled(o.path, id), body: o.method === 'GET' ? undefined : '{}' })) : []));
    expect(requests.length).toBeGreaterThan(1000);
    expectNoFaults(await faultsOf(manager, requests));
    expectNoFaults(await faultsOf(customer, requests.filter((r) => r.path.includes('portal'))));
  });

  it('questions asked twice, with brackets, with no sense in them', async () => {
    const requests = operations
      .filter((o) => o.method === 'GET')
      .flatMap((o) => [...new Set([...(o.queries.length > 0 ? o.queries : ['q']), 'q'])].flatMap((name) => hostileQueries(name).map((query) => ({ method: 'GET', path: `${real(o.path)}?${query}` }))));
    expectNoFaults(await faultsOf(manager, requests));
    expectNoFaults(await faultsOf(customer, requests.filter((r) => r.path.includes('portal'))));
  });

  it('bodies that are no message at all', async () => {
    const large = (o: Operation) => ['/api/session', '/api/customers', '/api/jobs', '/api/payments/events', '/api/portal/quotes/{id}/approval'].includes(o.path);
    const requests = operations
      .filter((o) => o.method !== 'GET' && !endsSessions(o))
      .flatMap((o) => HOSTILE_BODIES.filter((body) => body.length < 1000 || large(o)).map((body) => ({ method: o.method, path: real(o.path), body })));
    expectNoFaults(await faultsOf(manager, requests));
    expectNoFaults(await faultsOf(customer, requests.filter((r) => /portal|session/.test(r.path))));
    expectNoFaults(await faultsOf(null, requests.filter((r) => /session|events/.test(r.path))));
  });

  it('the same under an idempotency key', async () => {
    const requests = ['/api/customers', `/api/jobs/${job.jobId}/quotes`].flatMap((path) => HOSTILE_BODIES.map((body, at) => ({ method: 'POST', path, body, headers: { 'idempotency-key': `hostile-${path.length}-${at}` } })));
    expectNoFaults(await faultsOf(manager, requests));
  });

  it('every message that is right but for one place, and every right one with names nobody has', async () => {
    const broken: Sent[] = [];
    for (const o of operations.filter((x) => x.body)) {
      for (let round = 0; round < 14; round += 1) {
        const message = fitting(o.body!, random, known, round % 2 === 0 ? ['a word'] : ['a word', ...HARMLESS]);
        const path = round % 7 === 0 ? filled(o.path, pick(random, known)) : real(o.path);
        broken.push({ method: o.method, path, body: JSON.stringify(message) });
        const mark = '"put here"';
        const place = pick(random, placesOf(message));
        const marked = JSON.stringify(withAt(message, place, 'put here'));
        for (let more = 0; more < 2; more += 1) broken.push({ method: o.method, path, body: marked.replace(mark, () => pick(random, HOSTILE_JSON)) });
        broken.push({ method: o.method, path, body: JSON.stringify({ ...(message as object), role: 'manager', id: known[0], customerId: known[1], createdBy: known[6], paid: true }) });
      }
    }
    expect(broken.length).toBeGreaterThan(2000);
    expectNoFaults(await faultsOf(manager, broken));
    expectNoFaults(await faultsOf(customer, broken.filter((r) => /portal|preferences/.test(r.path))));
  });

  it('a form, a text or a file where a message belongs', async () => {
    const types = ['application/x-www-form-urlencoded', 'text/plain', 'text/html', 'multipart/form-data; boundary=x', 'application/xml', 'application/json; charset=utf-7', 'APPLICATION/JSON', 'x', ''];
    const requests = operations.filter((o) => o.method !== 'GET' && !endsSessions(o)).flatMap((o) => types.map((type) => ({ method: o.method, path: real(o.path), body: 'name=a&name=b&__proto__[x]=1', headers: { 'content-type': type } })));
    expectNoFaults(await faultsOf(manager, requests));
  });

  it('the chain of the history is whole after all this', async () => {
    // had one of the requests ended the manager's session, all after it would have been refused for that
    await manager.get('/api/session').expect(200);
    expect((counts[200] ?? 0) + (counts[201] ?? 0)).toBeGreaterThan(400);
    expect(counts[400]).toBeGreaterThan(2000);
    expect(await shop.app.get(HistoryService).firstBreak()).toBeNull();
  });
});

describe('what is typed into a filter means just that', () => {
  it.each(["' OR 1=1--", '%', '_', '\\', '%%', '*', '" OR ""="', "') OR 1=1--"])('“%s” finds nothing more than what has it', async (typed) => {
    const q = encodeURIComponent(typed);
    for (const path of ['/api/customers?', '/api/machines?', '/api/jobs?state=all&', '/api/invoices?']) {
      const { rows } = (await manager.get(`${path}q=${q}`).expect(200)).body as { rows: { id: string }[] };
      // a job is also found by what only its sheet shows: the machine's serial, the customer's reference
      const whole = path.startsWith('/api/jobs') ? await Promise.all(rows.map(async (row) => [row, (await manager.get(`/api/jobs/${row.id}`).expect(200)).body])) : rows;
      expect({ path, rows: whole.filter((row) => !JSON.stringify(row).includes(JSON.stringify(typed).slice(1, -1))) }).toEqual({ path, rows: [] });
    }
  });
});

describe('what refers to something else', () => {
  it('a customer’s user of a customer nobody knows is refused at the field', async () => {
    const answer = await manager.post('/api/users', { name: 'Nobody', email: 'nobody@customers.test', roles: ['customer'], customerId: '01900000-0000-7000-8000-000000000000', password: 'a password long enough' });
    expect(answer.status).toBe(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ path: 'customerId', code: 'unknown' })]);
  });

  it('an instrument does not take the tag of another when it is changed', async () => {
    const input = { kind: 'voltmeter', percentOfReading: 0.5, percentOfRange: 0.1, calibratedOn: '2026-01-01', dueOn: '2027-01-01' };
    await manager.post('/api/instruments', { ...input, tag: 'TAKEN-1' }).expect(201);
    const other = (await manager.post('/api/instruments', { ...input, tag: 'TAKEN-2' }).expect(201)).body;
    const answer = await manager.put(`/api/instruments/${other.id}`, { ...input, tag: 'TAKEN-1', version: 1 });
    expect(answer.body).toMatchObject({ statusCode: 409, code: 'TAKEN', fields: [{ path: 'tag' }] });
    await manager.put(`/api/instruments/${other.id}`, { ...input, tag: 'TAKEN-2', serial: 'kept tag', version: 1 }).expect(200);
  });
});

describe('names of every alphabet, and signs that draw themselves', () => {
  it('stand on the papers and in the mail as they were typed', async () => {
    for (const name of HARMLESS) {
      const details = { description: name, nameplate: { ...PLATE, serial: name, frame: name } };
      const { id } = (await manager.post('/api/jobs', bookIn({ customer: { kind: 'new', details: { ...NEW_CUSTOMER, name, contactName: name, city: name } }, machine: { kind: 'new', details }, complaint: name })).expect(201)).body;
      const sheet = (await manager.get(`/api/jobs/${id}`).expect(200)).body;
      expect(sheet.complaint).toBe(name.trim());
      expect(sheet.customer.name).toBe(name.trim());
      for (const paper of sheet.papers) await manager.get(`/api/papers/${paper.id}/pdf`).expect(200).expect('content-type', 'application/pdf');
    }
    await shop.postman();
    expect(shop.mail.sent.filter((mail) => mail.subject.includes('received')).length).toBeGreaterThanOrEqual(HARMLESS.length);
  });

  it('half a character is refused at its field, since no database keeps it', async () => {
    const answer = await manager.post('/api/customers', { ...NEW_CUSTOMER, name: 'Oberau \uD800' });
    expect(answer.status).toBe(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ path: 'name' })]);
  });
});

describe('readings nobody can have read', () => {
  const EXTREMES = [0, -1, 5e-324, 9007199254740992, -1e308, 1e308];

  it('are refused at their field or judged not valid, and never break the sheet they stand on', async () => {
    const shopFloor = await staffAndMeters(shop);
    const meters = shopFloor.meters;
    const bench = await BenchJob.book(shopFloor, 1);
    const messages: [string, unknown][] = [
      ['core-test-before', bench.ring('1 before')],
      ['core-test-after', bench.ring('1 after')],
      ['incoming-test', incomingTest(1, meters)],
      ['before-varnish-test', beforeVarnish(1, meters)],
      ['final-test', finalTest(1, meters)],
    ];
    for (const [kind, readings] of messages) {
      const { jobId, customerId } = await jobInShop(shop, manager, {}, { step: 'ready' });
      const numbers = placesOf(readings).filter((place) => typeof place.reduce<unknown>((v, key) => (v as never)[key], readings) === 'number');
      const requests = numbers.flatMap((place) => EXTREMES.map((value) => ({ method: 'POST', path: `/api/jobs/${jobId}/records`, body: JSON.stringify({ record: { kind, readings: withAt(readings, place, value), entered: {} } }) })));
      expectNoFaults(await faultsOf(manager, requests));
      const owner = await shop.person(['customer'], { customerId });
      const reads = [`/api/jobs/${jobId}`, `/api/jobs/${jobId}/records`, `/api/jobs/${jobId}/history`, '/api/jobs', `/api/jobs.csv`].map((path) => ({ method: 'GET', path }));
      expectNoFaults([...(await faultsOf(manager, reads)), ...(await faultsOf(owner, [{ method: 'GET', path: `/api/portal/jobs/${jobId}` }, { method: 'GET', path: '/api/portal/machines' }]))]);
      const kept = recordListSchema.parse((await manager.get(`/api/jobs/${jobId}/records`)).body);
      expect(kept.length, kind).toBeGreaterThan(0);
      expect(kept.length, kind).toBeLessThan(requests.length);
      const certificate = await manager.post(`/api/jobs/${jobId}/certificate`, { jobVersion: 1 }).expect(201);
      await manager.get(`/api/papers/${certificate.body.id}/pdf`).expect(200);
    }
  });
});
