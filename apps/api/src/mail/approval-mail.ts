import { mailLayout } from './layout.js';
import { greeting } from './greeting.js';
import type { WrittenMail } from './written-mail.js';

export interface ApprovalMail {
  readonly shopName: string;
  readonly contactName: string;
  readonly quoteNumber: string;
  readonly jobNumber: string;
  readonly machine: string;
  readonly gross: string;
  readonly how: 'portal' | 'phone' | 'purchase-order';
  readonly approvedBy: string;
  /** as the shop's clock showed it */
  readonly approvedAt: string;
  readonly purchaseOrder: string;
  /** with its currency; null where no limit was named */
  readonly notToExceed: string | null;
  readonly portalUrl: string | null;
}

const HOW = { portal: 'in the portal', phone: 'by phone', 'purchase-order': 'by purchase order' } as const;

/** The customer reads back what was approved, by whom and how, so that a misunderstanding shows before work begins. */
export function approvalMail(mail: ApprovalMail): WrittenMail {
  const facts = [
    `Total with tax: ${mail.gross}`,
    `Approved by: ${mail.approvedBy}, ${HOW[mail.how]}, ${mail.approvedAt}`,
    ...(mail.purchaseOrder ? [`Purchase order: ${mail.purchaseOrder}`] : []),
    ...(mail.notToExceed ? [`Not to exceed: ${mail.notToExceed}`] : []),
  ];
  const paragraphs = [
    greeting(mail.contactName),
    `Thank you. Our quote ${mail.quoteNumber} for your ${mail.machine} (job ${mail.jobNumber}) is approved.`,
    facts.join('\n'),
    'If this is not what you meant, tell us at once: the strip cannot be undone.',
  ];
  return {
    subject: `${mail.shopName}: quote ${mail.quoteNumber} approved`,
    ...mailLayout({ shopName: mail.shopName, heading: `Quote ${mail.quoteNumber} approved`, paragraphs, ...(mail.portalUrl ? { link: { label: 'Follow the job', url: mail.portalUrl } } : {}) }),
  };
}
