import type { InvoiceView } from '@shared/invoices';
import type { QuoteView } from '@shared/quotes';
import sharp from 'sharp';
import { finalTest, type Meters } from '../../../mocks/sample-shop/machine-tests.js';
import { ringTest } from '../../../mocks/sample-shop/ring-tests.js';
import { ReadDb } from '../src/database/read-db.js';
import { jobInShop, QUOTE, type JobInShop } from './job-in-shop.js';
import type { Staff } from './job-on-the-bench.js';
import type { Person, TestShop } from './test-app.js';

/** A customer with everything a customer can have; `mark` stands in all that is theirs. */
export interface CustomerLife {
  readonly job: JobInShop;
  readonly person: Person;
  readonly invoice: InvoiceView;
  readonly quotes: { readonly approved: QuoteView; readonly sent: QuoteView; readonly draft: QuoteView };
  readonly photoId: string;
  readonly documentId: string;
  readonly sessionId: string;
  /** every identifier of theirs that stands anywhere in the database */
  readonly identifiers: readonly string[];
}

export async function customerLife(shop: TestShop, { staff, meters }: { staff: Staff; meters: Meters }, mark: string): Promise<CustomerLife> {
  const { manager } = staff;
  const job = await jobInShop(
    shop,
    manager,
    { name: `${mark} Works`, contactName: `${mark} Contact`, email: `${mark.toLowerCase()}@customers.test`, phone: mark, addressLine1: `${mark} Lane`, city: mark, taxNumber: mark },
    { step: 'ready', complaint: `${mark} complaint`, accessories: `${mark} shaft key`, customerReference: `${mark}-REF`, contaminationWords: `${mark} oil` },
  );
  const { nameplate } = (await manager.get(`/api/machines/${job.machineId}`).expect(200)).body;
  await manager.put(`/api/machines/${job.machineId}`, { version: 1, description: `${mark} motor`, nameplate: { ...nameplate, serial: `${mark}-1` } }).expect(200);
  const { voltmeter, ammeter, wattmeter, thermometer } = meters as Record<string, string>;
  const instruments = { voltmeterId: voltmeter!, ammeterId: ammeter!, wattmeterId: wattmeter!, thermometerId: thermometer! };
  const record = (kind: string, readings: object) => staff.technician.post(`/api/jobs/${job.jobId}/records`, { record: { kind, readings, entered: {} } }).expect(201);
  await record('dismantling', { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: `${mark} inspection`, fits: mark });
  await record('core-test-before', { ...ringTest('1 before', instruments), remark: `${mark} remark` });
  await record('strip', { method: 'cold-pull', ovenId: null, commutatorOrSlipRingsOn: false, wiresCountedAtCut: 48, sampleCoilKept: true, partPeakC: null, minutesAbove345C: null, explanation: `${mark} strip` });
  await record('core-test-after', { ...ringTest('1 after', instruments), remark: `${mark} remark` });
  await record('final-test', { ...finalTest(1, meters), remark: `${mark} remark` });

  const draft = async () => (await manager.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, lines: [{ ...QUOTE.lines[0], description: `${mark} rewind` }], note: `${mark} note`, validUntil: `${shop.clock.iso().slice(0, 4)}-12-31` }).expect(201)).body as QuoteView;
  const send = async (quote: QuoteView) => (await manager.post(`/api/quotes/${quote.id}/send`, { version: quote.version }).expect(201)).body as QuoteView;
  const quotes = { approved: await send(await draft()), sent: await send(await draft()), draft: await draft() };
  await manager
    .post(`/api/quotes/${quotes.approved.id}/approval-for-customer`, { version: quotes.approved.version, how: 'phone', approvedBy: `${mark} Boss`, approvedAt: shop.clock.iso(), purchaseOrder: `${mark}-PO`, notToExceedMinor: 98_765_43 })
    .expect(201);
  const { version } = (await manager.get(`/api/jobs/${job.jobId}`).expect(200)).body;
  const issued = (await manager.post(`/api/jobs/${job.jobId}/invoices`, { jobVersion: version, quoteId: quotes.approved.id }).expect(201)).body as InvoiceView;
  const invoice = (await manager.post(`/api/invoices/${issued.id}/payments`, { version: issued.version, kind: 'cash', amountMinor: 1234, receivedOn: shop.clock.iso().slice(0, 10), reference: `${mark} cash` }).expect(201)).body as InvoiceView;
  const picture = await sharp({ create: { width: 8, height: 8, channels: 3, background: '#b87333' } }).png().toBuffer();
  const attach = async (bytes: Buffer, name: string) => (await staff.counter.post(`/api/jobs/${job.jobId}/attachments`).attach('file', bytes, name).expect(201)).body.id as string;
  const photoId = await attach(picture, `${mark}.png`);
  const documentId = await attach(Buffer.from(`%PDF-1.7\n%${mark}\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n`), `${mark}.pdf`);
  await staff.counter.post(`/api/jobs/${job.jobId}/tag`).expect(201);
  await manager.post(`/api/jobs/${job.jobId}/certificate`, { jobVersion: version }).expect(201);

  const person = await shop.person(['customer'], { customerId: job.customerId, name: `${mark} User`, email: `user.${mark.toLowerCase()}@customers.test` });
  await person.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: invoice.version }).expect(201);
  const db = shop.app.get(ReadDb);
  const { sessionId } = (await db.one<{ sessionId: string }>('SELECT sessionId FROM checkout_attempts WHERE invoiceId = ?', [invoice.id]))!;
  return { job, person, invoice, quotes, photoId, documentId, sessionId, identifiers: await identifiersOf(db, job) };
}

async function identifiersOf(db: ReadDb, { jobId, customerId, machineId }: JobInShop): Promise<string[]> {
  const ofJob = ['job_records', 'sign_offs', 'attachments', 'quotes', 'invoices', 'papers', 'outbox', 'history'].map((table) => `SELECT id FROM ${table} WHERE jobId = '${jobId}'`);
  const deeper = [
    `SELECT v.id FROM record_revisions v JOIN job_records r ON r.id = v.recordId WHERE r.jobId = '${jobId}'`,
    `SELECT l.id FROM quote_lines l JOIN quotes q ON q.id = l.quoteId WHERE q.jobId = '${jobId}'`,
    `SELECT l.id FROM invoice_lines l JOIN invoices i ON i.id = l.invoiceId WHERE i.jobId = '${jobId}'`,
    ...['payments', 'checkout_attempts', 'users'].map((table) => `SELECT id FROM ${table} WHERE customerId = '${customerId}'`),
    `SELECT s.id FROM sessions s JOIN users u ON u.id = s.userId WHERE u.customerId = '${customerId}'`,
  ];
  const rows = await db.all<{ id: string }>([...ofJob, ...deeper].join(' UNION '));
  return [jobId, customerId, machineId, ...rows.map((row) => row.id)];
}
