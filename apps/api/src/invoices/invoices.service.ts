import { Inject, Injectable } from '@nestjs/common';
import type { InvoiceQuery, InvoiceView } from '@shared/invoices';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import type { QuerySource } from '../database/query-source.js';
import { ReadDb } from '../database/read-db.js';
import { notFound } from '../http/app-error.js';
import { INVOICE_COUNT, INVOICE_ROW_SELECT, INVOICE_SELECT, invoiceForCustomer, toInvoiceListRow, toInvoiceView, type InvoiceListRow, type InvoiceRow } from './invoice-view.js';

export interface InvoicePage {
  rows: InvoiceListRow[];
  total: number;
  page: number;
  size: number;
}

/** Reading invoices: for the office, for the job sheet, and for the customer they belong to. */
@Injectable()
export class InvoicesService {
  constructor(
    private readonly db: ReadDb,
    private readonly clock: Clock,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  today(): string {
    return shopDate(this.clock.now(), this.config.timeZone);
  }

  async list({ state, q, page, size }: InvoiceQuery): Promise<InvoicePage> {
    const like = q ? `%${q.replace(/[\\%_]/g, '\\$&')}%` : null;
    const where = `WHERE (:state = 'all' OR (:state = 'overdue' AND i.balanceMinor > 0 AND i.dueOn < :today) OR i.state = :state)
      AND (:like IS NULL OR i.number LIKE :like ESCAPE '\\' OR i.jobNumber LIKE :like ESCAPE '\\' OR i.customerName LIKE :like ESCAPE '\\')`;
    const filter = { today: this.today(), state, like };
    const rows = await this.db.all<InvoiceListRow & { overdue: number & boolean }>(`${INVOICE_ROW_SELECT} ${where} ORDER BY i.id DESC LIMIT :size OFFSET :from`, [{ ...filter, size, from: (page - 1) * size }]);
    const count = await this.db.one<{ total: number }>(`${INVOICE_COUNT} ${where}`, [filter]);
    return { rows: rows.map(toInvoiceListRow), total: count?.total ?? 0, page, size };
  }

  async ofJob(jobId: string): Promise<InvoiceView[]> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [jobId]))) throw notFound('job');
    const rows = await this.db.all<InvoiceRow>(`${INVOICE_SELECT} WHERE i.jobId = :jobId ORDER BY i.id DESC`, [{ today: this.today(), jobId }]);
    return rows.map(toInvoiceView);
  }

  one(invoiceId: string): Promise<InvoiceView> {
    return this.viewIn(this.db, invoiceId);
  }

  /** The invoice as it stands for this reader: the committed one outside a unit, the unit's own inside. */
  async viewIn(source: QuerySource, invoiceId: string): Promise<InvoiceView> {
    const [row] = await source.query<InvoiceRow[]>(`${INVOICE_SELECT} WHERE i.id = :invoiceId`, [{ today: this.today(), invoiceId }]);
    if (!row) throw notFound('invoice');
    return toInvoiceView(row);
  }

  async ofCustomer(actor: Actor, invoiceId: string): Promise<InvoiceView> {
    const row = await this.db.one<InvoiceRow>(`${INVOICE_SELECT} WHERE i.id = :invoiceId AND i.customerId = :customerId`, [{ today: this.today(), invoiceId, customerId: actor.customerId }]);
    if (!row) throw notFound('invoice');
    return invoiceForCustomer(toInvoiceView(row));
  }
}
