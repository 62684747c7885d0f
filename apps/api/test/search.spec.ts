import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { searchResultSchema, type SearchHit } from '@shared/jobs';
import { issuedInvoice, oneLine } from './approved-quote.js';
import { jobInShop, shopProfile, type JobInShop } from './job-in-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let manager: Person;
let quarry: JobInShop;
let dairy: JobInShop;
beforeAll(async () => {
  shop = await openTestShop();
  await shopProfile(shop);
  counter = await shop.person(['counter']);
  manager = await shop.person(['manager']);
  quarry = await jobInShop(shop, counter, { name: 'Steinmar Quarry & Lime' });
  dairy = await jobInShop(shop, counter, { name: 'Aaltje 100% Dairy' });
});
afterAll(() => shop.close());

const hits = async (q: string, by: Person = counter): Promise<SearchHit[]> => searchResultSchema.parse((await by.get(`/api/search?q=${encodeURIComponent(q)}`).expect(200)).body).hits;

describe('the search box', () => {
  it('a job number, typed whole or in small letters, leads to its sheet first', async () => {
    expect((await hits(quarry.jobNumber.toLowerCase()))[0]).toMatchObject({ kind: 'job', id: quarry.jobId, title: quarry.jobNumber, path: `/jobs/${quarry.jobId}` });
  });

  it('the last digits of a job number are enough', async () => {
    expect((await hits(dairy.jobNumber.slice(-4))).map((h) => h.id)).toContain(dairy.jobId);
  });

  it('a scanned tag, which types the address of its job, leads to that job alone', async () => {
    expect(await hits(`https://shop.example/jobs/${dairy.jobId}?from=tag`)).toEqual([expect.objectContaining({ kind: 'job', id: dairy.jobId })]);
    expect(await hits('https://shop.example/jobs/no-such-job')).toEqual([]);
  });

  it('a serial leads to the machine, a name to the customer', async () => {
    expect((await hits('mp-75-0117'))[0]).toMatchObject({ kind: 'machine', path: expect.stringMatching(/^\/counter\/machines\//) });
    expect((await hits('steinm'))[0]).toEqual({ kind: 'customer', id: quarry.customerId, title: 'Steinmar Quarry & Lime', detail: 'Murgen', path: `/counter/customers/${quarry.customerId}` });
  });

  it('a name that begins with what was typed stands before one that only holds it', async () => {
    const begins = await jobInShop(shop, counter, { name: 'Ring Works' });
    const holds = await jobInShop(shop, counter, { name: 'Spring Works' });
    const names = (await hits('ring w')).map((h) => h.id);
    expect(names).toEqual([begins.customerId, holds.customerId]);
  });

  it('a percent sign and an underscore mean themselves', async () => {
    expect((await hits('100%')).map((h) => h.id)).toEqual([dairy.customerId]);
    expect(await hits('_')).toEqual([]);
    expect(await hits("' OR 1=1 --")).toEqual([]);
  });

  it('never more than twelve hits, each once', async () => {
    for (let i = 0; i < 15; i += 1) await jobInShop(shop, counter, { name: `Pumphouse ${i}` });
    const found = await hits('pumphouse');
    expect(found).toHaveLength(12);
    expect(new Set(found.map((h) => `${h.kind} ${h.id}`)).size).toBe(12);
  });

  it('an invoice is found by those who may read invoices, and by nobody else', async () => {
    const job = await jobInShop(shop, counter, {}, { step: 'ready' });
    const invoice = await issuedInvoice(shop, manager, job, oneLine(10_000));
    const path = `/accounts/invoices/${invoice.id}`;
    expect((await hits(invoice.number, manager))[0]).toMatchObject({ kind: 'invoice', id: invoice.id, path });
    expect((await hits(invoice.number, await shop.person(['office'])))[0]).toMatchObject({ path });
    expect((await hits(invoice.number)).filter((h) => h.kind === 'invoice')).toEqual([]);
    expect((await hits(invoice.number, await shop.person(['technician']))).filter((h) => h.kind === 'invoice')).toEqual([]);
  });

  it('nothing typed, too much typed or something else beside it is refused; a customer has no such box', async () => {
    await counter.get('/api/search?q=%20').expect(400);
    await counter.get(`/api/search?q=${'a'.repeat(301)}`).expect(400);
    await counter.get('/api/search?q=a&as=manager').expect(400);
    await (await shop.person(['customer'], { customerId: dairy.customerId })).get('/api/search?q=dairy').expect(403);
    await shop.nobody.get('/api/search?q=dairy').expect(401);
  });
});
