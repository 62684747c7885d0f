import { dayWords } from './day-words.js';
import { mailLayout } from './layout.js';
import { greeting } from './greeting.js';
import type { WrittenMail } from './written-mail.js';

export interface InvoiceMail {
  readonly shopName: string;
  readonly contactName: string;
  readonly invoiceNumber: string;
  readonly jobNumber: string;
  readonly machine: string;
  readonly gross: string;
  readonly nothingToPay: boolean;
  readonly dueOn: string;
  readonly prepayment: boolean;
  readonly bankLine: string;
  readonly portalUrl: string | null;
}

/** The invoice goes to the customer: how much, until when, and the ways to pay. */
export function invoiceMail(mail: InvoiceMail): WrittenMail {
  const pay = mail.portalUrl ? ['Pay by card in the portal, or by bank transfer.'] : [];
  const paragraphs = [
    greeting(mail.contactName),
    `Here is our invoice ${mail.invoiceNumber} for your ${mail.machine}, job ${mail.jobNumber}. It is attached.`,
    ...(mail.nothingToPay
      ? ['Nothing is to be paid.']
      : [
          `To pay: ${mail.gross}\nDue: ${dayWords(mail.dueOn)}\nPayment reference: ${mail.invoiceNumber}`,
          ...(mail.prepayment ? ['The machine can be collected once the invoice is paid.'] : []),
          [...pay, ...(mail.bankLine ? [`Our account: ${mail.bankLine}`] : [])].join('\n'),
        ].filter((p) => p !== '')),
  ];
  const label = mail.nothingToPay ? 'Look at the invoice' : 'Look at the invoice and pay';
  return {
    subject: `${mail.shopName}: invoice ${mail.invoiceNumber} for job ${mail.jobNumber}`,
    ...mailLayout({ shopName: mail.shopName, heading: `Invoice ${mail.invoiceNumber}`, paragraphs, ...(mail.portalUrl ? { link: { label, url: mail.portalUrl } } : {}) }),
  };
}

/** The shop's account in one line; '' where none is given. */
export const bankWords = (bank: { readonly accountHolder: string; readonly iban: string; readonly bic: string; readonly bankName: string } | null): string =>
  bank ? [bank.accountHolder, `IBAN ${bank.iban}`, ...(bank.bic ? [`BIC ${bank.bic}`] : []), bank.bankName].filter((part) => part !== '').join(', ') : '';
