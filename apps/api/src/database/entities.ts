import { LimitsVersion } from '../acceptance/limits-version.entity.js';
import { Attachment } from '../attachments/attachment.entity.js';
import { Session } from '../auth/session.entity.js';
import { BurnoutLoadJob } from '../burnouts/burnout-load-job.entity.js';
import { BurnoutLoad } from '../burnouts/burnout-load.entity.js';
import { Customer } from '../customers/customer.entity.js';
import { HistoryEntry } from '../history/history-entry.entity.js';
import { IdempotencyKey } from '../idempotency/idempotency-key.entity.js';
import { OvenHistoryRow } from '../insight/oven-history.entity.js';
import { InstrumentCalibration } from '../instruments/instrument-calibration.entity.js';
import { InstrumentCertificate } from '../instruments/instrument-certificate.entity.js';
import { Instrument } from '../instruments/instrument.entity.js';
import { InvoiceLineRow } from '../invoices/invoice-line.entity.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { Job } from '../jobs/job.entity.js';
import { Machine } from '../machines/machine.entity.js';
import { OutboxItem } from '../outbox/outbox-item.entity.js';
import { Paper } from '../papers/paper.entity.js';
import { CheckoutAttempt } from '../payments/checkout-attempt.entity.js';
import { PaymentEvent } from '../payments/payment-event.entity.js';
import { Payment } from '../payments/payment.entity.js';
import { QuoteLineRow } from '../quotes/quote-line.entity.js';
import { Quote } from '../quotes/quote.entity.js';
import { JobRecord } from '../records/job-record.entity.js';
import { RecordRevision } from '../records/record-revision.entity.js';
import { NumberSeries } from '../series/number-series.entity.js';
import { Setting } from '../shop/setting.entity.js';
import { SignOff } from '../sign-offs/sign-off.entity.js';
import { User } from '../users/user.entity.js';

/** Every table of the shop; no globs, so that build, tests and scripts see the same list. */
export const ENTITIES = [
  User, Session, Customer, Machine, Job, JobRecord, RecordRevision, SignOff, Attachment, Quote, QuoteLineRow, Invoice, InvoiceLineRow,
  Payment, CheckoutAttempt, PaymentEvent, Paper, Instrument, LimitsVersion, Setting, NumberSeries, OutboxItem, HistoryEntry, IdempotencyKey,
  BurnoutLoad, BurnoutLoadJob, OvenHistoryRow, InstrumentCalibration, InstrumentCertificate,
];
