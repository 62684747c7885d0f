import Database from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { databaseFile } from '../src/database/data-folder.js';
import { HistoryService } from '../src/history/history.service.js';
import { approvedQuote } from './approved-quote.js';
import { pick, seeded } from './from-schema.js';
import { jobInShop, QUOTE, shopProfile } from './job-in-shop.js';
import { bookedIn, bookIn, NEW_CUSTOMER, PLATE, sheetOf } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';
import { allOf, faultOf, openWire, type Answer, type Wire } from './wire.js';

const AT_ONCE = 40;
let shop: TestShop;
let wire: Wire;
let manager: Person;
let people: Person[];
/** The file as anybody else would open it, beside the running shop. */
let disk: Database.Database;

beforeAll(async () => {
  shop = await openTestShop();
  wire = await openWire(shop);
  await shopProfile(shop);
  manager = await shop.person(['manager']);
  people = [manager, ...(await Promise.all([shop.person(['manager']), shop.person(['manager']), shop.person(['manager'])]))];
  disk = new Database(databaseFile(shop.config.dataDir), { readonly: true, fileMustExist: true });
});
afterAll(async () => {
  disk.close();
  wire.close();
  await shop.close();
});

const send = (by: Person, method: string, path: string, body: object) => wire.send(by, { method, path, body: JSON.stringify(body) });
const bodyOf = (answer: Answer) => JSON.parse(Buffer.from(answer.text, 'latin1').toString('utf8')) as Record<string, unknown>;
const column = <T>(sql: string, ...parameters: unknown[]) => disk.prepare<unknown[], T>(sql).pluck().all(...parameters);
const numbersOf = (table: string) => column<string>(`SELECT DISTINCT number FROM ${table} WHERE number NOT LIKE 'J2026-9%' ORDER BY number`);
const gapFree = (letter: string, count: number) => Array.from({ length: count }, (_, i) => `${letter}2026-${String(i + 1).padStart(4, '0')}`);

interface Wish {
  readonly kind: 'customer' | 'bad-customer' | 'job' | 'job-undone' | 'quote' | 'quote-of-nothing' | 'invoice' | 'invoice-stale';
  readonly at: number;
}

describe('three hundred requests at once, a third of them bound to fail', () => {
  const kept = new Map<string, string[]>();
  const refused: string[] = [];
  const faults: string[] = [];
  const statuses: Record<string, number> = {};

  beforeAll(async () => {
    const random = seeded(4711);
    const target = await jobInShop(shop, manager, { name: 'Standing customer' });
    const other = await bookedIn(manager);
    const quotes: { id: string }[] = [];
    for (let i = 0; i < 25; i += 1) quotes.push(await approvedQuote(shop, manager, target));
    const jobVersion = (await sheetOf(manager, target.jobId)).version;
    const shares: [Wish['kind'], number][] = [['customer', 60], ['bad-customer', 25], ['job', 60], ['job-undone', 45], ['quote', 50], ['quote-of-nothing', 15], ['invoice', 25], ['invoice-stale', 20]];
    const wishes: Wish[] = shares.flatMap(([kind, count]) => Array.from({ length: count }, (_, at) => ({ kind, at })));
    const shuffled = wishes.map((wish) => ({ wish, key: random() })).sort((a, b) => a.key - b.key).map(({ wish }) => wish);
    expect(shuffled).toHaveLength(300);

    const calls: Record<Wish['kind'], (by: Person, at: number) => Promise<Answer>> = {
      customer: (by, at) => send(by, 'POST', '/api/customers', { ...NEW_CUSTOMER, name: `Kept customer ${at}` }),
      'bad-customer': (by, at) => send(by, 'POST', '/api/customers', { ...NEW_CUSTOMER, name: `Phantom customer ${at}`, email: 'none' }),
      job: (by, at) => send(by, 'POST', '/api/jobs', bookIn({ customer: { kind: 'new', details: { ...NEW_CUSTOMER, name: `Kept by job ${at}` } }, complaint: `kept ${at}` })),
      // fails in the middle of its unit: customer and machine are written by then
      'job-undone': (by, at) => send(by, 'POST', '/api/jobs', bookIn({ customer: { kind: 'new', details: { ...NEW_CUSTOMER, name: `Phantom by job ${at}` } }, machine: { kind: 'new', details: { description: 'Phantom machine', nameplate: PLATE } }, warrantyOfJobId: other.id })),
      quote: (by, at) => send(by, 'POST', `/api/jobs/${target.jobId}/quotes`, { ...QUOTE, note: `kept ${at}` }),
      'quote-of-nothing': (by) => send(by, 'POST', '/api/jobs/01900000-0000-7000-8000-000000000000/quotes', { ...QUOTE, note: 'phantom' }),
      invoice: (by, at) => send(by, 'POST', `/api/jobs/${target.jobId}/invoices`, { jobVersion, quoteId: quotes[at]!.id }),
      'invoice-stale': (by, at) => send(by, 'POST', `/api/jobs/${target.jobId}/invoices`, { jobVersion: jobVersion + 1, quoteId: quotes[at]!.id }),
    };
    await allOf(
      shuffled,
      async ({ kind, at }) => {
        const answer = await calls[kind](pick(random, people), at);
        const fault = faultOf(answer);
        if (fault) faults.push(`${kind}: ${fault}`);
        statuses[`${kind} ${answer.status}`] = (statuses[`${kind} ${answer.status}`] ?? 0) + 1;
        if (answer.status === 201) kept.set(kind, [...(kept.get(kind) ?? []), bodyOf(answer)['id'] as string]);
        else refused.push(kind);
      },
      AT_ONCE,
    );
  });

  it('each is answered as it would be alone, and none is told of locks', () => {
    expect(faults).toEqual([]);
    expect(statuses).toEqual({ 'customer 201': 60, 'bad-customer 400': 25, 'job 201': 60, 'job-undone 400': 45, 'quote 201': 50, 'quote-of-nothing 404': 15, 'invoice 201': 25, 'invoice-stale 409': 20 });
    expect(refused).toHaveLength(105);
  });

  it('what was acknowledged stands in the file, and nothing else', () => {
    expect(column<string>("SELECT id FROM customers WHERE name LIKE 'Kept customer%'").sort()).toEqual(kept.get('customer')!.sort());
    expect(column<string>("SELECT id FROM jobs WHERE complaint LIKE 'kept %'").sort()).toEqual(kept.get('job')!.sort());
    expect(column<string>("SELECT id FROM quotes WHERE note LIKE 'kept %'").sort()).toEqual(kept.get('quote')!.sort());
    expect(column<string>('SELECT id FROM invoices').sort()).toEqual(kept.get('invoice')!.sort());
    expect(column<string>("SELECT name FROM customers WHERE name LIKE 'Phantom%' UNION ALL SELECT description FROM machines WHERE description LIKE 'Phantom%' UNION ALL SELECT words FROM history WHERE words LIKE '%Phantom%'")).toEqual([]);
  });

  it('whatever belongs together is there together: paper, mail and history of each', () => {
    const without = (table: string, condition: string) => column<string>(`SELECT t.id FROM ${table} t WHERE t.id IN (${[...kept.values()].flat().map((id) => `'${id}'`).join(', ')}) AND (${condition}) <> 1`);
    expect(without('jobs', "SELECT COUNT(*) FROM papers p WHERE p.subjectId = t.id AND p.kind = 'acknowledgement'")).toEqual([]);
    expect(without('jobs', "SELECT COUNT(*) FROM outbox o WHERE o.jobId = t.id AND o.kind = 'mail.acknowledgement'")).toEqual([]);
    expect(without('jobs', "SELECT COUNT(*) FROM history h WHERE h.subjectId = t.id AND h.event = 'job.booked-in'")).toEqual([]);
    expect(without('customers', "SELECT COUNT(*) FROM history h WHERE h.subjectId = t.id AND h.event = 'customer.created'")).toEqual([]);
    expect(without('quotes', "SELECT COUNT(*) FROM history h WHERE h.subjectId = t.id AND h.event = 'quote.drafted'")).toEqual([]);
    expect(without('invoices', "SELECT COUNT(*) FROM history h WHERE h.subjectId = t.id AND h.event = 'invoice.issued'")).toEqual([]);
    expect(without('invoices', "SELECT COUNT(*) FROM papers p WHERE p.id = t.paperId AND p.kind = 'invoice' AND p.number = t.number")).toEqual([]);
    expect(without('invoices', 'SELECT SUM(l.netMinor + l.taxMinor) = t.grossMinor FROM invoice_lines l WHERE l.invoiceId = t.id')).toEqual([]);
    expect(without('quotes', 'SELECT SUM(l.netMinor + l.taxMinor) = t.grossMinor FROM quote_lines l WHERE l.quoteId = t.id')).toEqual([]);
  });

  it('numbers follow each other without a gap: what failed gave its number back', () => {
    expect(numbersOf('jobs')).toEqual(gapFree('J', 61));
    expect(numbersOf('quotes')).toEqual(gapFree('Q', 75));
    expect(numbersOf('invoices')).toEqual(gapFree('R', 25));
  });

  it('the file is whole, every reference leads somewhere, and the history is one chain', async () => {
    expect(disk.pragma('integrity_check', { simple: true })).toBe('ok');
    expect(disk.pragma('foreign_key_check')).toEqual([]);
    expect(column('SELECT COUNT(*) - MAX(seq) FROM history')).toEqual([0]);
    expect(await shop.app.get(HistoryService).firstBreak()).toBeNull();
  });
});

describe('thirty people change the same thing at once, all having read the same version', () => {
  /** One is taken; all others are told how it stands now. */
  const oneWins = async (calls: readonly (() => Promise<Answer>)[], lost: readonly string[] = ['CHANGED_MEANWHILE']): Promise<Answer> => {
    const answers = await Promise.all(calls.map((call) => call()));
    const winners = answers.filter((a) => a.status < 300);
    expect(answers.filter((a) => a.status >= 300).map((a) => bodyOf(a)['code']).filter((code) => !lost.includes(String(code)))).toEqual([]);
    expect(winners).toHaveLength(1);
    return winners[0]!;
  };
  const thirty = (call: (by: Person, at: number) => Promise<Answer>) => Array.from({ length: 30 }, (_, at) => () => call(people[at % people.length]!, at));

  it('a customer’s details: one is taken, and it is the one that stands there', async () => {
    const { id } = bodyOf(await send(manager, 'POST', '/api/customers', { ...NEW_CUSTOMER, name: 'Changed by many' })) as { id: string };
    const won = bodyOf(await oneWins(thirty((by, at) => send(by, 'PUT', `/api/customers/${id}`, { ...NEW_CUSTOMER, name: `Changed by ${at}`, version: 1 }))));
    expect(disk.prepare('SELECT name, version FROM customers WHERE id = ?').get(id)).toEqual({ name: won['name'], version: 2 });
  });

  it('a job: edit, hold and move count as one change', async () => {
    const { id } = await bookedIn(manager);
    const edit = { complaint: 'x', accessories: '', contamination: 'none', contaminationWords: '', promisedOn: null, customerReference: '' };
    await oneWins(thirty((by, at) => [() => send(by, 'PUT', `/api/jobs/${id}`, { ...edit, complaint: `edit ${at}`, version: 1 }), () => send(by, 'POST', `/api/jobs/${id}/hold`, { version: 1, reason: `hold ${at}`, waitingFor: 'part' }), () => send(by, 'POST', `/api/jobs/${id}/moves`, { version: 1, to: 'incoming-test' })][at % 3]!()));
    expect(column('SELECT version FROM jobs WHERE id = ?', id)).toEqual([2]);
    expect(column("SELECT COUNT(*) FROM history WHERE jobId = ? AND event IN ('job.changed', 'job.held', 'job.moved')", id)).toEqual([1]);
  });

  it('a quote is sent once: one paper, one mail', async () => {
    const { jobId } = await jobInShop(shop, manager);
    const { id } = (await manager.post(`/api/jobs/${jobId}/quotes`, QUOTE).expect(201)).body;
    await oneWins(thirty((by) => send(by, 'POST', `/api/quotes/${id}/send`, { version: 1 })), ['CHANGED_MEANWHILE', 'STATE_NOT_RIGHT', 'ALREADY_DONE']);
    expect(column('SELECT COUNT(*) FROM papers WHERE subjectId = ?', id)).toEqual([1]);
    expect(column("SELECT COUNT(*) FROM outbox WHERE jobId = ? AND kind = 'mail.quote'", jobId)).toEqual([1]);
  });

  it('a quote is approved or declined, never both', async () => {
    const job = await jobInShop(shop, manager);
    const customer = await shop.person(['customer'], { customerId: job.customerId });
    const { id } = (await manager.post(`/api/jobs/${job.jobId}/quotes`, QUOTE).expect(201)).body;
    await manager.post(`/api/quotes/${id}/send`, { version: 1 }).expect(201);
    await oneWins(
      thirty((_, at) => (at % 2 ? send(customer, 'POST', `/api/portal/quotes/${id}/approval`, { version: 2, name: `Person ${at}` }) : send(customer, 'POST', `/api/portal/quotes/${id}/decline`, { version: 2, reason: `Reason ${at}` }))),
      ['CHANGED_MEANWHILE', 'STATE_NOT_RIGHT', 'ALREADY_DONE'],
    );
    expect(column("SELECT COUNT(*) FROM history WHERE subjectId = ? AND event IN ('quote.approved', 'quote.declined')", id)).toEqual([1]);
  });

  it('a record is corrected once a version, and keeps every revision it ever had', async () => {
    const { jobId } = await jobInShop(shop, manager, {}, { step: 'dismantled' });
    const readings = { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'as found', fits: '' };
    const record = (await manager.post(`/api/jobs/${jobId}/records`, { record: { kind: 'dismantling', readings, entered: {} } }).expect(201)).body;
    await oneWins(thirty((by, at) => send(by, 'POST', `/api/records/${record.id}/revisions`, { version: 1, reason: `seen by ${at}`, record: { kind: 'dismantling', readings: { ...readings, inspection: `as found by ${at}` }, entered: {} } })));
    expect(column('SELECT revision FROM record_revisions WHERE recordId = ? ORDER BY revision', record.id)).toEqual([1, 2]);
  });

  it('a record there is one of is made once, though thirty make it', async () => {
    const { jobId } = await jobInShop(shop, manager, {}, { step: 'dismantled' });
    const readings = { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'as found', fits: '' };
    await oneWins(thirty((by) => send(by, 'POST', `/api/jobs/${jobId}/records`, { record: { kind: 'dismantling', readings, entered: {} } })), ['STEP_NOT_OPEN']);
    expect(column('SELECT COUNT(*) FROM job_records WHERE jobId = ?', jobId)).toEqual([1]);
  });

  it('an invoice is issued once from a quote, and takes one number', async () => {
    const job = await jobInShop(shop, manager);
    const quote = await approvedQuote(shop, manager, job);
    const { version } = await sheetOf(manager, job.jobId);
    const before = numbersOf('invoices').length;
    await oneWins(thirty((by) => send(by, 'POST', `/api/jobs/${job.jobId}/invoices`, { jobVersion: version, quoteId: quote.id })), ['ALREADY_DONE', 'CHANGED_MEANWHILE']);
    expect(numbersOf('invoices')).toEqual(gapFree('R', before + 1));
  });

  it('two managers who take the role from each other at once leave one', async () => {
    const [first, second] = [await shop.person(['manager']), await shop.person(['manager'])];
    const versions = Object.fromEntries(((await manager.get('/api/users')).body as { id: string; version: number }[]).map((u) => [u.id, u.version]));
    for (const other of people.slice(1)) await manager.put(`/api/users/${other.userId}`, { version: versions[other.userId!], name: 'Done', roles: ['counter'], disabled: false }).expect(200);
    await first.put(`/api/users/${manager.userId}`, { version: versions[manager.userId!], name: 'Done', roles: ['counter'], disabled: false }).expect(200);
    const answers = await Promise.all([send(first, 'PUT', `/api/users/${second.userId}`, { version: 1, name: 'Second', roles: ['counter'], disabled: false }), send(second, 'PUT', `/api/users/${first.userId}`, { version: 1, name: 'First', roles: ['counter'], disabled: false })]);
    expect(answers.map((a) => a.status).sort()).not.toEqual([200, 200]);
    expect(column("SELECT COUNT(*) FROM users WHERE disabledAt IS NULL AND roles LIKE '%manager%'")).toEqual([1]);
  });
});
