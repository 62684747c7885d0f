import { Injectable } from '@nestjs/common';
import type { PortalHome, PortalJob, portalMachinesSchema } from '@shared/portal';
import type { QuoteView } from '@shared/quotes';
import type { z } from 'zod';
import type { Actor } from '../auth/actor.js';
import { ReadDb } from '../database/read-db.js';
import { notFound } from '../http/app-error.js';
import { INVOICE_ROW_SELECT, toInvoiceListRow, type InvoiceListRow } from '../invoices/invoice-view.js';
import { InvoicesService } from '../invoices/invoices.service.js';
import { QUOTE_ROW_SELECT } from '../quotes/quote-view.js';
import { corePair, type KeptCoreTest } from './core-pair.js';

export type PortalMachines = z.infer<typeof portalMachinesSchema>;
type JobRow = PortalHome['jobs'][number];
type QuoteRow = Pick<QuoteView, 'id' | 'number' | 'revision' | 'jobId' | 'jobNumber' | 'customerName' | 'state' | 'currency' | 'grossMinor' | 'validUntil'>;
type FlatInvoice = InvoiceListRow & { overdue: number & boolean };

const JOB_COLUMNS = 'j.id, j.number, m.description AS machine, j.route, j.step, j.state, j.promisedOn, j.receivedAt';
const JOBS = 'FROM jobs j JOIN machines m ON m.id = j.machineId';

/** What a customer sees: their own machines, jobs, quotes, invoices and papers. Every statement names the customer. */
@Injectable()
export class PortalService {
  constructor(
    private readonly db: ReadDb,
    private readonly invoices: InvoicesService,
  ) {}

  async home({ customerId }: Actor): Promise<PortalHome> {
    const today = this.invoices.today();
    const customer = await this.db.one<{ name: string }>('SELECT name FROM customers WHERE id = ?', [customerId]);
    if (!customer) throw notFound('customer');
    const invoices = await this.db.all<FlatInvoice>(`${INVOICE_ROW_SELECT} WHERE i.customerId = :customerId AND i.balanceMinor > 0 ORDER BY i.dueOn, i.id`, [{ today, customerId }]);
    return {
      customerName: customer.name,
      quotesToAnswer: await this.db.all<QuoteRow>(`${QUOTE_ROW_SELECT} WHERE q.customerId = ? AND q.state = 'sent' AND q.validUntil >= ? ORDER BY q.validUntil, q.id`, [customerId, today]),
      invoicesToPay: invoices.map(toInvoiceListRow),
      jobs: await this.db.all<JobRow>(`SELECT ${JOB_COLUMNS} ${JOBS} WHERE j.customerId = ? ORDER BY (j.state NOT IN ('open', 'on-hold')), j.receivedAt DESC, j.id DESC LIMIT 200`, [customerId]),
    };
  }

  async job({ customerId }: Actor, jobId: string): Promise<PortalJob> {
    const job = await this.db.one<JobRow & { complaint: string }>(`SELECT ${JOB_COLUMNS}, j.complaint ${JOBS} WHERE j.id = ? AND j.customerId = ?`, [jobId, customerId]);
    if (!job) throw notFound('job');
    const own = [jobId, customerId];
    const invoices = await this.db.all<FlatInvoice>(`${INVOICE_ROW_SELECT} WHERE i.jobId = :jobId AND i.customerId = :customerId ORDER BY i.id DESC`, [{ today: this.invoices.today(), jobId, customerId }]);
    return {
      ...job,
      quotes: await this.db.all<QuoteRow>(`${QUOTE_ROW_SELECT} WHERE q.jobId = ? AND q.customerId = ? AND q.state <> 'draft' ORDER BY q.createdAt DESC, q.id DESC`, own),
      invoices: invoices.map(toInvoiceListRow),
      // the tag is the shop's own
      papers: await this.db.all<PortalJob['papers'][number]>(
        `SELECT p.id, p.kind, p.number, p.issuedAt, n.number AS supersededBy FROM papers p LEFT JOIN papers n ON n.id = p.supersededById
         WHERE p.jobId = ? AND p.customerId = ? AND p.kind <> 'tag' ORDER BY p.id DESC`,
        own,
      ),
      photos: await this.db.all<PortalJob['photos'][number]>("SELECT id, name, mime FROM attachments WHERE jobId = ? AND customerId = ? AND mime LIKE 'image/%' ORDER BY addedAt, id", own),
      core: corePair(await this.coreTests(jobId, customerId)),
    };
  }

  async machines({ customerId }: Actor): Promise<PortalMachines> {
    const rows = await this.db.all<{ id: string; description: string; serial: string; visits: string }>(
      `SELECT m.id, m.description, m.serial,
         (SELECT json_group_array(json_object('jobId', j.id, 'jobNumber', j.number, 'receivedAt', j.receivedAt, 'wattsPerKgBefore', ${lastWattsPerKg('core-test-before')}, 'wattsPerKgAfter', ${lastWattsPerKg('core-test-after')}) ORDER BY j.receivedAt DESC)
          FROM jobs j WHERE j.machineId = m.id AND j.customerId = m.customerId) AS visits
       FROM machines m WHERE m.customerId = ? ORDER BY m.description, m.id`,
      [customerId],
    );
    return rows.map((row) => ({ ...row, visits: JSON.parse(row.visits) as PortalMachines[number]['visits'] }));
  }

  private async coreTests(jobId: string, customerId: string | null): Promise<KeptCoreTest[]> {
    const rows = await this.db.all<{ kind: KeptCoreTest['kind']; verdict: string | null; readings: string; result: string }>(
      `SELECT r.kind, v.verdict, v.readings, v.result FROM job_records r JOIN record_revisions v ON v.recordId = r.id AND v.revision = r.revision JOIN jobs j ON j.id = r.jobId
       WHERE r.jobId = ? AND j.customerId = ? AND r.kind IN ('core-test-before', 'core-test-after') ORDER BY r.ordinal`,
      [jobId, customerId],
    );
    return rows.map((row) => ({ ...row, readings: JSON.parse(row.readings) as KeptCoreTest['readings'], result: JSON.parse(row.result) as KeptCoreTest['result'] }));
  }
}

/** The last figure of a visit that a valid test gave. */
const lastWattsPerKg = (kind: KeptCoreTest['kind']): string =>
  `(SELECT r.wattsPerKg FROM job_records r WHERE r.jobId = j.id AND r.kind = '${kind}' AND r.verdict <> 'not-valid' ORDER BY r.ordinal DESC LIMIT 1)`;
