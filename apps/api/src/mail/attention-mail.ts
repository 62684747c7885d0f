import { mailLayout } from './layout.js';
import type { WrittenMail } from './written-mail.js';

/** To the shop itself: money that does not fit, which only a person can put right. */
export function attentionMail(mail: { readonly shopName: string; readonly invoiceNumber: string; readonly jobNumber: string; readonly what: string; readonly jobUrl: string }): WrittenMail {
  return {
    subject: `Look at invoice ${mail.invoiceNumber}: a payment does not fit`,
    ...mailLayout({
      shopName: mail.shopName,
      heading: `Invoice ${mail.invoiceNumber}, job ${mail.jobNumber}`,
      paragraphs: [mail.what, 'Look it up in your account at the payment service and settle it with the customer.'],
      link: { label: 'Open the job', url: mail.jobUrl },
    }),
  };
}
