import type { QuoteView } from '@shared/quotes';
import { quoteViewSchema } from '@shared/quotes';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ReadDb } from '../src/database/read-db.js';
import { jobInShop, QUOTE, QUOTE_SUMS, shopProfile, type JobInShop } from './job-in-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let customer: Person;
let other: Person;
let job: JobInShop;

beforeAll(async () => {
  shop = await openTestShop();
  shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  await shopProfile(shop);
  counter = await shop.person(['counter'], { name: 'Ines Feld' });
  job = await jobInShop(shop, counter);
  customer = await shop.person(['customer'], { customerId: job.customerId });
  other = await shop.person(['customer'], { customerId: (await jobInShop(shop, counter)).customerId });
});
afterAll(() => shop.close());

const draft = async (at = job): Promise<QuoteView> => (await counter.post(`/api/jobs/${at.jobId}/quotes`, QUOTE).expect(201)).body;
const sent = async (at = job): Promise<QuoteView> => {
  const quote = await draft(at);
  return (await counter.post(`/api/quotes/${quote.id}/send`, { version: quote.version }).expect(201)).body;
};
const approval = (quote: QuoteView, more: object = {}) => ({ version: quote.version, name: 'H. Brandt', purchaseOrder: '', ...more });

describe('a quote', () => {
  it('is reckoned by the shop, line by line, to the cent (hand calculation)', async () => {
    const quote = await draft();
    expect(quoteViewSchema.parse(quote)).toMatchObject({ ...QUOTE_SUMS, state: 'draft', revision: 1, currency: 'EUR', version: 1 });
    expect(quote.lines.map((l) => [l.netMinor, l.taxMinor])).toEqual([[12_800, 2432], [48_990, 9308], [1999, 140]]);
    expect(quote.taxSummary).toEqual([{ taxRateBasisPoints: 700, netMinor: 1999, taxMinor: 140 }, { taxRateBasisPoints: 1900, netMinor: 61_790, taxMinor: 11_740 }]);
    expect((await counter.get(`/api/quotes/${quote.id}`).expect(200)).body).toEqual(quote);
    expect((await counter.get(`/api/jobs/${job.jobId}/quotes`).expect(200)).body).toContainEqual(quote);
  });

  it('takes no sums, states or prices from outside', async () => {
    for (const more of [{ grossMinor: 1 }, { state: 'approved' }, { currency: 'USD' }]) {
      const answer = await counter.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, ...more });
      expect(answer.status).toBe(400);
    }
    const line = QUOTE.lines[0];
    for (const bad of [{ netMinor: 1 }, { quantityThousandths: -1 }, { quantityThousandths: 0 }, { quantityThousandths: 1.5 }, { unitPriceMinor: -5 }, { unitPriceMinor: 0.1 }, { unitPriceMinor: 2 ** 53 }, { unitPriceMinor: '100' }, { taxRateBasisPoints: 10_001 }, { unitPriceMinor: null }]) {
      const answer = await counter.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, lines: [{ ...line, ...bad }] });
      expect([JSON.stringify(bad), answer.status]).toEqual([JSON.stringify(bad), 400]);
    }
    const huge = await counter.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, lines: [{ ...line, quantityThousandths: 1_000_000_000, unitPriceMinor: 99_999_999_999 }] });
    expect(huge.status).toBe(422);
    expect(huge.body.code).toBe('AMOUNT_NOT_RIGHT');
  });

  it('is valid until a day that has not passed in the shop’s time zone', async () => {
    shop.clock.set(new Date('2026-03-02T23:30:00.000Z'));
    const late = await counter.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, validUntil: '2026-03-02' });
    expect(late.status).toBe(400);
    expect(late.body.fields[0].path).toBe('validUntil');
    await counter.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, validUntil: '2026-03-03' }).expect(201);
    shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  });

  it('changes only while it is a draft, and only as the version that was read', async () => {
    const quote = await draft();
    const changed = { lines: [QUOTE.lines[0]], validUntil: '2026-04-01', note: '', version: 1 };
    const second = await counter.put(`/api/quotes/${quote.id}`, changed).expect(200);
    expect(second.body).toMatchObject({ grossMinor: 15_232, version: 2, validUntil: '2026-04-01' });
    const stale = await counter.put(`/api/quotes/${quote.id}`, changed);
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { version: 2, grossMinor: 15_232 } });
    await counter.post(`/api/quotes/${quote.id}/send`, { version: 2 }).expect(201);
    const late = await counter.put(`/api/quotes/${quote.id}`, { ...changed, version: 3 });
    expect(late.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: 'This quote has been sent: make a new revision to change it.' });
  });

  it('numbers run without gaps, also when some quotes fail', async () => {
    const numbers = (await Promise.all(Array.from({ length: 12 }, (_, i) => counter.post(`/api/jobs/${i % 3 === 2 ? 'ffffffff-0000' : job.jobId}/quotes`, QUOTE)))).filter((a) => a.status === 201).map((a) => a.body.number as string);
    const sequence = numbers.map((n) => Number(n.slice(-4))).sort((a, b) => a - b);
    expect(sequence).toEqual(Array.from({ length: 8 }, (_, i) => sequence[0]! + i));
    expect(numbers[0]).toMatch(/^Q2026-\d{4}$/);
  });
});

describe('a quote that is sent', () => {
  it('reaches the customer once, with its paper and the way to answer', async () => {
    await shop.postman();
    shop.mail.sent.length = 0;
    const quote = await draft();
    await Promise.all([1, 2, 3].map(() => counter.post(`/api/quotes/${quote.id}/send`, { version: 1 })));
    await shop.postman();
    expect(shop.mail.sent).toHaveLength(1);
    const [mail] = shop.mail.sent;
    expect(mail).toMatchObject({ subject: `Kestrel Rewinds: quote ${quote.number} for job ${job.jobNumber}` });
    expect(mail!.text).toContain(`http://shop.test/portal/quotes/${quote.id}`);
    expect(mail!.text).toContain('756.69\u00a0EUR');
    expect(mail!.attachments).toHaveLength(1);
    expect(mail!.attachments[0]!.filename).toBe(`quote-${quote.number}.pdf`);
    expect(mail!.attachments[0]!.content.subarray(0, 5).toString()).toBe('%PDF-');
  });

  it('is seen by its customer and by nobody else’s; a draft by no customer at all', async () => {
    const quote = await sent();
    expect((await customer.get(`/api/portal/quotes/${quote.id}`).expect(200)).body).toEqual(quote);
    const hidden = await draft();
    for (const [person, id] of [[other, quote.id], [customer, hidden.id], [customer, 'ffffffff-0000']] as const) {
      expect((await person.get(`/api/portal/quotes/${id}`)).status).toBe(404);
      expect((await person.post(`/api/portal/quotes/${id}/approval`, approval(quote))).status).toBe(404);
      expect((await person.post(`/api/portal/quotes/${id}/decline`, { version: quote.version, reason: 'Too dear' })).status).toBe(404);
    }
    expect((await counter.get(`/api/quotes/${quote.id}`)).body.state).toBe('sent');
    await customer.get(`/api/quotes/${quote.id}`).expect(403);
    await customer.post(`/api/quotes/${quote.id}/send`, { version: 1 }).expect(403);
  });

  it('its paper is its customer’s alone', async () => {
    const quote = await sent();
    const paper = await shop.app.get(ReadDb).one<{ id: string }>('SELECT id FROM papers WHERE subjectId = ?', [quote.id]);
    await customer.get(`/api/portal/papers/${paper!.id}/pdf`).expect(200);
    await other.get(`/api/portal/papers/${paper!.id}/pdf`).expect(404);
  });

  it('is approved in the portal by exactly one of many clicks, read back by mail and kept in the history', async () => {
    shop.mail.sent.length = 0;
    const quote = await sent();
    const answers = await Promise.all(Array.from({ length: 16 }, () => customer.post(`/api/portal/quotes/${quote.id}/approval`, approval(quote, { purchaseOrder: '4500017' }))));
    expect(answers.map((a) => a.status).sort()).toEqual([201, ...Array<number>(15).fill(409)]);
    expect(answers.filter((a) => a.status === 409).every((a) => a.body.code === 'ALREADY_DONE')).toBe(true);
    const now = (await counter.get(`/api/quotes/${quote.id}`)).body;
    expect(now).toMatchObject({ state: 'approved', approval: { how: 'portal', by: 'H. Brandt', purchaseOrder: '4500017', notToExceedMinor: null } });
    await shop.postman();
    const approved = shop.mail.sent.filter((m) => m.subject.includes('approved'));
    expect(approved).toHaveLength(1);
    expect(approved[0]!.text).toContain('Approved by: H. Brandt, in the portal, 3 March 2026, 10:00');
    const events = await shop.app.get(ReadDb).all<{ event: string }>('SELECT event FROM history WHERE subjectId = ? ORDER BY seq', [quote.id]);
    expect(events.map((e) => e.event)).toEqual(['quote.drafted', 'quote.sent', 'quote.approved']);
  });

  it('is declined with a reason and cannot be approved afterwards', async () => {
    const quote = await sent();
    await customer.post(`/api/portal/quotes/${quote.id}/decline`, { version: quote.version, reason: 'We buy a new motor.' }).expect(201);
    expect((await counter.get(`/api/quotes/${quote.id}`)).body).toMatchObject({ state: 'declined', declineReason: 'We buy a new motor.' });
    const late = await customer.post(`/api/portal/quotes/${quote.id}/approval`, approval(quote));
    expect(late.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: 'This quote has been declined: the shop makes a new revision.' });
  });

  it('cannot be approved in the portal after its last day; on the last day it can', async () => {
    const [first, second] = [await sent(), await sent()];
    const before = shop.clock.now();
    shop.clock.set(new Date('2026-03-31T21:55:00.000Z'));
    const lastMinute = await shop.person(['customer'], { customerId: job.customerId });
    await lastMinute.post(`/api/portal/quotes/${first.id}/approval`, approval(first)).expect(201);
    shop.clock.set(new Date('2026-03-31T22:05:00.000Z'));
    const late = await lastMinute.post(`/api/portal/quotes/${second.id}/approval`, approval(second));
    expect(late.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: expect.stringContaining('past its last day') });
    expect((await lastMinute.get(`/api/portal/quotes/${second.id}`)).body).toMatchObject({ state: 'sent', expired: true });
    shop.clock.set(before);
  });

  it('is approved by phone with a limit that covers it, and not with a smaller one', async () => {
    const quote = await sent();
    const byPhone = { version: quote.version, how: 'phone', approvedBy: 'H. Brandt', approvedAt: '2026-03-03T10:00:00+01:00', purchaseOrder: '', notToExceedMinor: 75_668 };
    const short = await counter.post(`/api/quotes/${quote.id}/approval-for-customer`, byPhone);
    expect(short.status).toBe(422);
    expect(short.body).toMatchObject({ code: 'AMOUNT_NOT_RIGHT', fields: [{ path: 'notToExceedMinor' }] });
    expect(short.body.message).toContain('756.68');
    const done = await counter.post(`/api/quotes/${quote.id}/approval-for-customer`, { ...byPhone, notToExceedMinor: 75_669 }).expect(201);
    expect(done.body.approval).toEqual({ how: 'phone', by: 'H. Brandt', at: '2026-03-03T09:00:00.000Z', purchaseOrder: '', notToExceedMinor: 75_669 });
    const technician = await shop.person(['technician']);
    await technician.post(`/api/quotes/${quote.id}/approval-for-customer`, byPhone).expect(403);
  });

  it('to a customer without a portal asks for an answer by mail or phone', async () => {
    shop.mail.sent.length = 0;
    await sent(await jobInShop(shop, counter));
    await shop.postman();
    expect(shop.mail.sent.at(-1)!.text).toContain('Answer this mail or call us (+49 7000 1)');
    expect(shop.mail.sent.at(-1)!.html).not.toContain('href');
  });
});

describe('a revision of a quote', () => {
  it('takes over lines and number, and the older one cannot be approved any more', async () => {
    const quote = await sent();
    const next = (await counter.post(`/api/quotes/${quote.id}/revision`, { version: quote.version }).expect(201)).body as QuoteView;
    expect(next).toMatchObject({ number: quote.number, revision: 2, state: 'draft', lines: quote.lines, ...QUOTE_SUMS });
    const old = await customer.post(`/api/portal/quotes/${quote.id}/approval`, approval(quote));
    expect(old.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: 'A newer revision has taken this quote’s place: only the newest can be approved.' });
    const seen = (await customer.get(`/api/portal/quotes/${quote.id}`).expect(200)).body;
    expect(seen.state).toBe('superseded');
    await customer.post(`/api/portal/quotes/${quote.id}/approval`, approval(seen)).expect(409);
    await counter.post(`/api/quotes/${quote.id}/approval-for-customer`, { version: seen.version, how: 'purchase-order', approvedBy: 'H. Brandt', approvedAt: '2026-03-03T08:58:00Z', purchaseOrder: '4500017', notToExceedMinor: null }).expect(409);
    await counter.post(`/api/quotes/${quote.id}/revision`, { version: seen.version }).expect(409);
    const again = (await counter.post(`/api/quotes/${next.id}/send`, { version: 1 }).expect(201)).body;
    await customer.post(`/api/portal/quotes/${next.id}/approval`, approval(again)).expect(201);
    const papers = await shop.app.get(ReadDb).all<{ number: string; supersededBy: string | null }>(
      'SELECT p.number, n.number AS supersededBy FROM papers p LEFT JOIN papers n ON n.id = p.supersededById WHERE p.subjectId IN (?, ?) ORDER BY p.id',
      [quote.id, next.id],
    );
    expect(papers).toEqual([{ number: quote.number, supersededBy: `${quote.number}-r2` }, { number: `${quote.number}-r2`, supersededBy: null }]);
  });

  it('made by two people at once exists once', async () => {
    const quote = await sent();
    const answers = await Promise.all([1, 2, 3, 4].map(() => counter.post(`/api/quotes/${quote.id}/revision`, { version: quote.version })));
    expect(answers.map((a) => a.status).sort()).toEqual([201, 409, 409, 409]);
    const rows = await shop.app.get(ReadDb).all('SELECT id FROM quotes WHERE number = ?', [quote.number]);
    expect(rows).toHaveLength(2);
  });

  it('is not made of a draft: that one is changed itself', async () => {
    const quote = await draft();
    const answer = await counter.post(`/api/quotes/${quote.id}/revision`, { version: 1 });
    expect(answer.body).toMatchObject({ code: 'STATE_NOT_RIGHT', message: 'This quote is still a draft: change the draft itself.' });
  });
});
