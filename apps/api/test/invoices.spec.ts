import { invoicePageSchema, invoiceViewSchema, type InvoiceView } from '@shared/invoices';
import type { QuoteView } from '@shared/quotes';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ReadDb } from '../src/database/read-db.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { approvedQuote, issuedInvoice, oneLine } from './approved-quote.js';
import { jobInShop, QUOTE, QUOTE_SUMS, shopProfile, type JobInShop } from './job-in-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let manager: Person;
let office: Person;
let customer: Person;
let other: Person;
let job: JobInShop;

beforeAll(async () => {
  shop = await openTestShop();
  shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  await shopProfile(shop);
  manager = await shop.person(['manager']);
  office = await shop.person(['office'], { name: 'Otto Rau' });
  job = await jobInShop(shop, manager);
  customer = await shop.person(['customer'], { customerId: job.customerId });
  other = await shop.person(['customer'], { customerId: (await jobInShop(shop, manager)).customerId });
});
afterAll(() => shop.close());

const pay = (invoice: InvoiceView, amountMinor: number, more: object = {}) => office.post(`/api/invoices/${invoice.id}/payments`, { version: invoice.version, kind: 'bank-transfer', amountMinor, receivedOn: '2026-03-03', reference: 'Statement 12', ...more });

describe('issuing an invoice', () => {
  it('copies the approved quote, gives the days of the customer’s terms, and sends the paper', async () => {
    await shop.postman();
    shop.mail.sent.length = 0;
    const quote = await approvedQuote(shop, manager, job);
    const invoice = (await office.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: 1, quoteId: quote.id }).expect(201)).body;
    expect(invoiceViewSchema.parse(invoice)).toMatchObject({ ...QUOTE_SUMS, state: 'open', lines: quote.lines, taxSummary: quote.taxSummary, paidMinor: 0, balanceMinor: 75_669, dueOn: '2026-04-02', overdue: false, quoteNumber: quote.number, version: 1 });
    await shop.postman();
    const mail = shop.mail.sent.at(-1)!;
    expect(mail.subject).toBe(`Kestrel Rewinds: invoice ${invoice.number} for job ${job.jobNumber}`);
    expect(mail.attachments.map((a) => a.filename)).toEqual([`invoice-${invoice.number}.pdf`]);
    expect(mail.text).toContain(`http://shop.test/portal/invoices/${invoice.id}`);
    expect(mail.text).toContain('Our account: Kestrel Rewinds, IBAN DE00 0000 0000');
    const model = JSON.parse((await shop.app.get(ReadDb).one<{ model: string }>('SELECT model FROM papers WHERE id = ?', [invoice.paperId]))!.model);
    expect(model).toMatchObject({ kind: 'invoice', number: invoice.number, terms: '30 days net', purchaseOrder: '4500017', approval: 'By purchase order by H. Brandt, 3 March 2026', grossMinor: 75_669, bank: { iban: 'DE00 0000 0000' } });
    expect((await customer.get(`/api/portal/invoices/${invoice.id}`).expect(200)).body).toEqual(invoice);
    expect((await office.get(`/api/jobs/${job.jobId}/invoices`)).body).toContainEqual(invoice);
  });

  it('needs an approved quote of this job, and the job as it was read', async () => {
    const draft = (await manager.post(`/api/jobs/${job.jobId}/quotes`, QUOTE)).body;
    const issue = (jobId: string, quoteId: string, jobVersion = 1) => office.post(`/api/jobs/${jobId}/invoices`, { jobVersion, quoteId });
    expect((await issue(job.jobId, draft.id)).body.code).toBe('STATE_NOT_RIGHT');
    const approved = await approvedQuote(shop, manager, job);
    expect((await issue((await jobInShop(shop, manager)).jobId, approved.id)).status).toBe(404);
    expect((await issue(job.jobId, 'ffffffff-0000')).status).toBe(404);
    expect((await issue(job.jobId, approved.id, 2)).body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { version: 1, number: job.jobNumber } });
    expect((await office.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: 1, quoteId: approved.id, grossMinor: 1 })).status).toBe(400);
    await customer.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: 1, quoteId: approved.id }).expect(403);
    await (await shop.person(['counter'])).post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: 1, quoteId: approved.id }).expect(403);
  });

  it('happens once a quote, and then the quote is not revised any more', async () => {
    const quote = await approvedQuote(shop, manager, job);
    const answers = await Promise.all([1, 2, 3, 4, 5].map(() => office.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: 1, quoteId: quote.id })));
    expect(answers.map((a) => a.status).sort()).toEqual([201, 409, 409, 409, 409]);
    const revise = await manager.post(`/api/quotes/${quote.id}/revision`, { version: quote.version });
    expect(revise.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: expect.stringContaining('was issued from this quote') });
  });

  it('gives numbers without gaps to twenty at once, although some of them fail', async () => {
    const last = (await issuedInvoice(shop, manager, job)).number;
    const jobs = await Promise.all(Array.from({ length: 20 }, () => jobInShop(shop, manager)));
    const quotes: QuoteView[] = [];
    for (const j of jobs) quotes.push(await approvedQuote(shop, manager, j, oneLine(1000)));
    const answers = await Promise.all(jobs.map((j, i) => office.post(`/api/jobs/${j.jobId}/invoices`, { jobVersion: i % 4 === 3 ? 9 : 1, quoteId: quotes[i]!.id })));
    const numbers = answers.filter((a) => a.status === 201).map((a) => Number(a.body.number.slice(-4))).sort((a, b) => a - b);
    expect(answers.filter((a) => a.status === 409)).toHaveLength(5);
    expect(numbers).toEqual(Array.from({ length: 15 }, (_, i) => Number(last.slice(-4)) + 1 + i));
  });

  it('turns the number’s year at midnight in the shop’s time zone, not in Greenwich', async () => {
    shop.clock.set(new Date('2026-12-31T22:59:00.000Z'));
    const late = await shop.person(['manager']);
    expect((await issuedInvoice(shop, late, await jobInShop(shop, late))).number).toMatch(/^R2026-/);
    shop.clock.set(new Date('2026-12-31T23:00:00.000Z'));
    const quote = (await late.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, validUntil: '2027-01-31' }).expect(201)).body;
    expect(quote.number).toBe('Q2027-0001');
    shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  });

  it('a prepayment customer’s invoice is due at once', async () => {
    const invoice = await issuedInvoice(shop, manager, await jobInShop(shop, manager, { terms: 'prepayment', netDays: 30 }));
    expect(invoice.dueOn).toBe('2026-03-03');
  });

  it('an issued invoice cannot be changed, not even in the database itself', async () => {
    const invoice = await issuedInvoice(shop, manager, job);
    const unit = shop.app.get(UnitOfWork);
    await expect(unit.run((m) => m.query('UPDATE invoices SET grossMinor = 1 WHERE id = ?', [invoice.id]))).rejects.toThrow('stays as issued');
    await expect(unit.run((m) => m.query('UPDATE invoice_lines SET netMinor = 1 WHERE invoiceId = ?', [invoice.id]))).rejects.toThrow('append only');
    await expect(unit.run((m) => m.query('DELETE FROM invoices WHERE id = ?', [invoice.id]))).rejects.toThrow('never deleted');
    expect((await office.get(`/api/invoices/${invoice.id}`)).body).toEqual(invoice);
  });
});

describe('recording money at the office', () => {
  it('a part leaves the rest open, the rest pays it, and each has its receipt', async () => {
    await shop.postman();
    shop.mail.sent.length = 0;
    const invoice = await issuedInvoice(shop, manager, job);
    const part = (await pay(invoice, 50_000).expect(201)).body as InvoiceView;
    expect(part).toMatchObject({ state: 'part-paid', paidMinor: 50_000, balanceMinor: 25_669, version: 2 });
    expect(part.payments).toEqual([expect.objectContaining({ kind: 'bank-transfer', amountMinor: 50_000, currency: 'EUR', receivedAt: '2026-03-03', reference: 'Statement 12', recordedBy: 'Otto Rau' })]);
    const whole = (await pay(part, 25_669, { kind: 'cash' }).expect(201)).body;
    expect(whole).toMatchObject({ state: 'paid', balanceMinor: 0, overdue: false });
    await shop.postman();
    const receipts = shop.mail.sent.filter((m) => m.subject.includes(`for invoice ${invoice.number}`));
    expect(receipts.map((m) => m.text.includes('paid in full'))).toEqual([false, true]);
    expect(receipts.every((m) => m.attachments[0]!.filename.startsWith('receipt-P2026-'))).toBe(true);
  });

  it('is refused for a paid invoice, for more than is owed, for a day to come, and to those who may not', async () => {
    const invoice = await issuedInvoice(shop, manager, job);
    const tooMuch = await pay(invoice, 75_670);
    expect(tooMuch.status).toBe(422);
    expect(tooMuch.body).toMatchObject({ code: 'AMOUNT_NOT_RIGHT', fields: [{ path: 'amountMinor' }] });
    expect(tooMuch.body.message).toContain('756.69');
    expect((await pay(invoice, 100, { receivedOn: '2026-03-04' })).body.fields[0].path).toBe('receivedOn');
    for (const bad of [0, -1, 0.5, 1e309]) expect((await pay(invoice, bad)).status).toBe(400);
    await manager.post('/api/invoices/ffffffff-0000/payments', { version: 1, kind: 'cash', amountMinor: 1, receivedOn: '2026-03-03' }).expect(404);
    await customer.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'cash', amountMinor: 1, receivedOn: '2026-03-03' }).expect(403);
    const paid = (await pay(invoice, 75_669).expect(201)).body;
    expect((await pay(paid, 1)).body.code).toBe('ALREADY_DONE');
    expect((await office.get(`/api/invoices/${invoice.id}`)).body.paidMinor).toBe(75_669);
  });

  it('by many at once is recorded once for the version that was read', async () => {
    const invoice = await issuedInvoice(shop, manager, job);
    const answers = await Promise.all(Array.from({ length: 10 }, () => pay(invoice, 1000)));
    expect(answers.map((a) => a.status).sort()).toEqual([201, ...Array<number>(9).fill(409)]);
    expect((await office.get(`/api/invoices/${invoice.id}`)).body.paidMinor).toBe(1000);
  });

  it('asked twice under one key is recorded once and answered alike', async () => {
    const invoice = await issuedInvoice(shop, manager, job);
    const body = { version: 1, kind: 'cash', amountMinor: 500, receivedOn: '2026-03-03', reference: '' };
    const [first, second] = [await office.post(`/api/invoices/${invoice.id}/payments`, body, 'till-click-0001'), await office.post(`/api/invoices/${invoice.id}/payments`, body, 'till-click-0001')];
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(second.body).toEqual(first.body);
    expect((await office.get(`/api/invoices/${invoice.id}`)).body.paidMinor).toBe(500);
  });
});

describe('looking for invoices', () => {
  it('finds them by state, number, job and customer, a page at a time', async () => {
    const mine = await jobInShop(shop, manager, { name: '100% _Wire\\ & Co' });
    const [open, part, paid] = [await issuedInvoice(shop, manager, mine), await issuedInvoice(shop, manager, mine), await issuedInvoice(shop, manager, mine)];
    await pay(part, 1).expect(201);
    await pay(paid, 75_669).expect(201);
    const list = async (query: string) => invoicePageSchema.parse((await office.get(`/api/invoices?${query}`).expect(200)).body);
    const numbers = async (query: string) => (await list(query)).rows.map((r) => r.number);
    const q = `q=${encodeURIComponent('100% _wire\\')}`;
    expect(await numbers(q)).toEqual([paid.number, part.number, open.number]);
    expect(await numbers(`${q}&state=open`)).toEqual([open.number]);
    expect(await numbers(`${q}&state=part-paid`)).toEqual([part.number]);
    expect(await numbers(`${q}&state=paid`)).toEqual([paid.number]);
    expect(await numbers(`q=${open.number}`)).toEqual([open.number]);
    expect(await list(`${q}&size=1&page=2`)).toMatchObject({ total: 3, page: 2, size: 1, rows: [{ number: part.number, balanceMinor: 75_668, customerName: '100% _Wire\\ & Co' }] });
    expect(await numbers('q=%25')).toHaveLength(3);
  });

  it('knows what is overdue: the day after it was due, and never what is paid', async () => {
    const mine = await jobInShop(shop, manager, { name: 'Late Payers' });
    const [late, paid] = [await issuedInvoice(shop, manager, mine), await issuedInvoice(shop, manager, mine)];
    await pay(paid, 75_669).expect(201);
    const overdue = async (now: string) => {
      shop.clock.set(new Date(now));
      const clerk = await shop.person(['office']);
      return ((await clerk.get('/api/invoices?state=overdue&q=Late+Payers')).body as { rows: { number: string; overdue: boolean }[] }).rows;
    };
    expect(await overdue('2026-04-02T21:59:00.000Z')).toEqual([]);
    expect(await overdue('2026-04-02T22:00:00.000Z')).toMatchObject([{ number: late.number, overdue: true }]);
    shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  });

  it('is for the office; the counter and the bench see no invoices', async () => {
    for (const role of ['counter', 'technician'] as const) await (await shop.person([role])).get('/api/invoices').expect(403);
  });

  it('another customer’s invoice and its papers are not there', async () => {
    const invoice = await issuedInvoice(shop, manager, job);
    await other.get(`/api/portal/invoices/${invoice.id}`).expect(404);
    await other.get(`/api/portal/papers/${invoice.paperId}/pdf`).expect(404);
    await customer.get(`/api/portal/papers/${invoice.paperId}/pdf`).expect(200);
    await customer.get(`/api/invoices/${invoice.id}`).expect(403);
  });
});
