import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { searchResultSchema, type JobSheet } from '@shared/jobs';
import { jobOfAddress } from '../src/search/search-query.js';
import { contains, startsWith } from '../src/search/like-pattern.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { Ids } from '../src/ids/ids.js';
import { Invoice } from '../src/invoices/invoice.entity.js';
import { Quote } from '../src/quotes/quote.entity.js';
import { bookedIn, NEW_CUSTOMER, PLATE, sheetOf } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let office: Person;
let job: JobSheet;
beforeAll(async () => {
  shop = await openTestShop();
  [counter, office] = [await shop.person(['counter']), await shop.person(['office'])];
  const book = (name: string, description: string, serial: string) =>
    bookedIn(counter, { customer: { kind: 'new', details: { ...NEW_CUSTOMER, name } }, machine: { kind: 'new', details: { description, nameplate: { ...PLATE, serial } } } });
  job = await sheetOf(counter, (await book('Hafenkai Bulk Terminal', '250 kW crane motor', 'HK-250-77')).id);
  await book('Kran & Kai', '11 kW 100% duty motor', 'AB_1');
  await book('Senngrund Dairy', 'Fan motor', 'XHK-250');
  await shop.app.get(UnitOfWork).run(async (em) => {
    const [quoteId, at] = [shop.app.get(Ids).next(), shop.clock.iso()];
    const money = { currency: 'EUR', netMinor: 100, taxMinor: 19, grossMinor: 119 };
    await em.insert(Quote, { id: quoteId, jobId: job.id, customerId: job.customer.id, number: 'Q2026-0001', revision: 1, state: 'approved', ...money, validUntil: '2026-04-01', note: '', sentAt: at, approvedHow: 'phone', approvedBy: 'Dörte Kai', approvedAt: at, purchaseOrder: '', notToExceedMinor: null, declineReason: null, createdByUserId: counter.userId!, createdAt: at, version: 1 });
    await em.insert(Invoice, { id: shop.app.get(Ids).next(), number: 'R2026-0042', jobId: job.id, customerId: job.customer.id, quoteId, ...money, issuedAt: at, issuedOn: '2026-03-02', dueOn: '2026-03-16', issuedByUserId: office.userId!, version: 1 });
  });
});
afterAll(() => shop.close());

const hits = async (q: string, by = counter) => searchResultSchema.parse((await by.get(`/api/search?q=${encodeURIComponent(q)}`).expect(200)).body).hits;

describe('the search box', () => {
  it('a job number, typed whole or begun, in small letters too, leads to the job', async () => {
    expect((await hits(job.number))[0]).toEqual({ kind: 'job', id: job.id, title: job.number, detail: 'Hafenkai Bulk Terminal · 250 kW crane motor', path: `/jobs/${job.id}` });
    expect((await hits(job.number.toLowerCase()))[0]!.id).toBe(job.id);
    expect((await hits('J2026')).filter((h) => h.kind === 'job')).toHaveLength(3);
    expect((await hits(job.number.slice(-4)))[0]!.id).toBe(job.id);
  });

  it('a scanned tag opens its job, by the bars and by the square code', async () => {
    expect((await hits(`http://shop.test/jobs/${job.id}`)).map((h) => h.id)).toEqual([job.id]);
    expect(await hits('http://shop.test/jobs/019f0000-0000-7000-8000-000000000000')).toEqual([]);
  });

  it('a serial stands before one that only holds it inside', async () => {
    expect((await hits('HK-250')).map((h) => h.title)).toEqual(['250 kW crane motor', 'Fan motor']);
    expect((await hits('hk-250-77'))[0]).toMatchObject({ kind: 'machine', path: `/counter/machines/${job.machine.id}` });
  });

  it('a customer is found by the beginning of any word of the name, the beginning of the whole name first', async () => {
    expect((await hits('kai')).filter((h) => h.kind === 'customer').map((h) => h.title)).toEqual(['Kran & Kai', 'Hafenkai Bulk Terminal']);
    expect((await hits('ha')).filter((h) => h.kind === 'customer').map((h) => h.title)).toEqual(['Hafenkai Bulk Terminal']);
  });

  it('an invoice number is found by who may read invoices, and by nobody else', async () => {
    expect(await hits('R2026-0042', office)).toEqual([expect.objectContaining({ kind: 'invoice', title: 'R2026-0042', detail: 'Hafenkai Bulk Terminal' })]);
    expect(await hits('R2026-0042')).toEqual([]);
  });

  it('gives twelve at most, each once', async () => {
    for (let i = 0; i < 15; i += 1) await bookedIn(counter);
    const found = await hits('J');
    expect(found).toHaveLength(12);
    expect(new Set(found.map((h) => h.id)).size).toBe(12);
  });

  it('signs that mean something to the database mean only themselves', async () => {
    expect((await hits('100%')).map((h) => h.title)).toEqual(['11 kW 100% duty motor']);
    expect((await hits('AB_1')).map((h) => h.kind)).toEqual(['machine']);
    expect((await hits('_')).map((h) => h.title)).toEqual(['11 kW 100% duty motor']);
    for (const typed of ["' OR 1=1--", '"*', 'NEAR(a b)', '\\', '%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%%', '(a+)+$']) expect((await counter.get(`/api/search?q=${encodeURIComponent(typed)}`)).status).toBe(200);
    expect(await hits("' OR 1=1--")).toEqual([]);
  });

  it('nothing typed, something twice, or a customer at the box is refused', async () => {
    await counter.get('/api/search?q=').expect(400);
    await counter.get('/api/search?q=a&q=b').expect(400);
    await counter.get('/api/search?q=a&limit=1000').expect(400);
    const portal = await shop.person(['customer'], { customerId: job.customer.id });
    await portal.get('/api/search?q=Senngrund').expect(403);
  });
});

describe('what was typed', () => {
  it('is taken literally in a pattern', () => {
    expect(contains('5%_\\')).toBe('%5\\%\\_\\\\%');
    expect(startsWith('a')).toBe('a%');
  });

  it('is an address of a job or not', () => {
    expect(jobOfAddress('https://shop.example/jobs/019f0000-aaaa?x=1')).toBe('019f0000-aaaa');
    expect(jobOfAddress('https://shop.example/jobs/../users')).toBeNull();
    expect(jobOfAddress('J2026-0001')).toBeNull();
  });
});
