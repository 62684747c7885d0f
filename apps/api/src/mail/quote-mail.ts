import { dayWords } from './day-words.js';
import { greeting } from './greeting.js';
import { mailLayout } from './layout.js';
import type { WrittenMail } from './written-mail.js';

export interface QuoteMail {
  readonly shopName: string;
  readonly shopPhone: string;
  readonly contactName: string;
  readonly quoteNumber: string;
  readonly revision: number;
  readonly jobNumber: string;
  readonly machine: string;
  /** with its currency */
  readonly gross: string;
  readonly validUntil: string;
  readonly note: string;
  /** null where nobody of the customer can sign in */
  readonly portalUrl: string | null;
}

/** The quote goes to the customer: what it is for, what it costs, until when, and how to answer. */
export function quoteMail(mail: QuoteMail): WrittenMail {
  const again = mail.revision > 1 ? ` (revision ${mail.revision}; it takes the place of the earlier one)` : '';
  const paragraphs = [
    greeting(mail.contactName),
    `Here is our quote ${mail.quoteNumber}${again} for your ${mail.machine}, our job ${mail.jobNumber}.`,
    `Total with tax: ${mail.gross}\nValid until: ${dayWords(mail.validUntil)}`,
    ...(mail.note ? [mail.note] : []),
    mail.portalUrl ? 'The quote is attached. Open the portal to approve or decline it; work begins once you have approved.' : `The quote is attached. Answer this mail${orCall(mail.shopPhone)} to approve or decline it; work begins once you have approved.`,
  ];
  const heading = `Quote ${mail.quoteNumber}`;
  return {
    subject: `${mail.shopName}: quote ${mail.quoteNumber}${mail.revision > 1 ? `, revision ${mail.revision}` : ''} for job ${mail.jobNumber}`,
    ...mailLayout({ shopName: mail.shopName, heading, paragraphs, ...(mail.portalUrl ? { link: { label: 'Look at the quote and answer', url: mail.portalUrl } } : {}) }),
  };
}

const orCall = (phone: string): string => (phone ? ` or call us (${phone})` : ' or call us');
