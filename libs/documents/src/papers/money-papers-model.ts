import type { JobPaperBase } from './paper-model.js';

export interface MoneyLineOnPaper {
  readonly description: string;
  readonly quantityThousandths: number;
  readonly unit: string;
  readonly unitPriceMinor: number;
  readonly taxRateBasisPoints: number;
  readonly netMinor: number;
  readonly taxMinor: number;
}

export interface TaxOnPaper {
  readonly taxRateBasisPoints: number;
  readonly netMinor: number;
  readonly taxMinor: number;
}

/** Lines and sums as they were computed and stored; the paper adds nothing up. */
export interface SumsOnPaper {
  readonly currency: string;
  readonly lines: readonly MoneyLineOnPaper[];
  readonly taxSummary: readonly TaxOnPaper[];
  readonly netMinor: number;
  readonly taxMinor: number;
  readonly grossMinor: number;
}

export interface QuoteModel extends JobPaperBase, SumsOnPaper {
  readonly kind: 'quote';
  readonly revision: number;
  /** a calendar day, YYYY-MM-DD */
  readonly validUntil: string;
  readonly note: string;
  /** where the customer answers; null where there is no portal user */
  readonly answerUrl: string | null;
}

export interface BankOnPaper {
  readonly accountHolder: string;
  readonly iban: string;
  readonly bic: string;
  readonly bankName: string;
}

export interface InvoiceModel extends JobPaperBase, SumsOnPaper {
  readonly kind: 'invoice';
  readonly quoteNumber: string;
  /** how and by whom the quote was approved, in words; '' where nothing is recorded */
  readonly approval: string;
  readonly purchaseOrder: string;
  /** the day of supply, YYYY-MM-DD; null where it is the day of issue */
  readonly suppliedOn: string | null;
  /** YYYY-MM-DD */
  readonly dueOn: string;
  /** '30 days net' */
  readonly terms: string;
  /** what the customer writes on the transfer */
  readonly paymentReference: string;
  readonly bank: BankOnPaper | null;
  readonly payUrl: string | null;
  readonly note: string;
}

export interface ReceiptModel extends JobPaperBase {
  readonly kind: 'receipt';
  readonly invoiceNumber: string;
  readonly currency: string;
  readonly payment: {
    readonly kind: 'card' | 'bank-transfer' | 'cash';
    readonly amountMinor: number;
    readonly receivedAt: string;
    readonly reference: string;
    /** '' where the payment service recorded it */
    readonly recordedBy: string;
  };
  readonly invoiceGrossMinor: number;
  /** all payments of the invoice, this one included */
  readonly paidMinor: number;
  readonly balanceMinor: number;
}
