import { mailLayout } from './layout.js';
import { greeting } from './greeting.js';
import type { WrittenMail } from './written-mail.js';

export interface ReceiptMail {
  readonly shopName: string;
  readonly contactName: string;
  readonly receiptNumber: string;
  readonly invoiceNumber: string;
  readonly jobNumber: string;
  readonly amount: string;
  readonly kind: 'card' | 'bank-transfer' | 'cash';
  readonly balance: string;
  readonly standing: 'paid' | 'part-paid' | 'overpaid';
  readonly portalUrl: string | null;
}

const KIND = { card: 'by card', 'bank-transfer': 'by bank transfer', cash: 'in cash' } as const;

/** Money has come in: how much, for what, and what is left. */
export function receiptMail(mail: ReceiptMail): WrittenMail {
  const left = {
    paid: 'The invoice is paid in full. Thank you.',
    'part-paid': `Still to pay: ${mail.balance}.`,
    overpaid: `This is ${mail.balance} more than the invoice asks for. We will be in touch about it.`,
  }[mail.standing];
  const paragraphs = [greeting(mail.contactName), `We have received ${mail.amount} ${KIND[mail.kind]} for invoice ${mail.invoiceNumber}, job ${mail.jobNumber}. The receipt is attached.`, left];
  return {
    subject: `${mail.shopName}: receipt ${mail.receiptNumber} for invoice ${mail.invoiceNumber}`,
    ...mailLayout({ shopName: mail.shopName, heading: `Receipt ${mail.receiptNumber}`, paragraphs, ...(mail.portalUrl ? { link: { label: 'Look at the invoice', url: mail.portalUrl } } : {}) }),
  };
}
