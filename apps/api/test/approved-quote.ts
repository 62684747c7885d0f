import type { InvoiceView } from '@shared/invoices';
import type { QuoteView } from '@shared/quotes';
import { ReadDb } from '../src/database/read-db.js';
import { QUOTE, type JobInShop } from './job-in-shop.js';
import type { Person, TestShop } from './test-app.js';

/** A quote of this job, sent and approved by purchase order; `lines` say what it costs. */
export async function approvedQuote(shop: TestShop, manager: Person, job: JobInShop, lines: object[] = QUOTE.lines): Promise<QuoteView> {
  const validUntil = shop.clock.iso().slice(0, 4) + '-12-31';
  const quote = (await manager.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, validUntil, lines }).expect(201)).body as QuoteView;
  await manager.post(`/api/quotes/${quote.id}/send`, { version: 1 }).expect(201);
  const approval = { version: 2, how: 'purchase-order', approvedBy: 'H. Brandt', approvedAt: shop.clock.iso(), purchaseOrder: '4500017', notToExceedMinor: null };
  return (await manager.post(`/api/quotes/${quote.id}/approval-for-customer`, approval).expect(201)).body as QuoteView;
}

export async function issuedInvoice(shop: TestShop, manager: Person, job: JobInShop, lines?: object[]): Promise<InvoiceView> {
  const quote = await approvedQuote(shop, manager, job, lines);
  const { version } = (await shop.app.get(ReadDb).one<{ version: number }>('SELECT version FROM jobs WHERE id = ?', [job.jobId]))!;
  return (await manager.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: version, quoteId: quote.id }).expect(201)).body as InvoiceView;
}

/** One line without tax, so that the total is the price. */
export const oneLine = (unitPriceMinor: number) => [{ kind: 'labour', description: 'Rewind stator', quantityThousandths: 1000, unit: '', unitPriceMinor, taxRateBasisPoints: 0 }];
