import { dayWords } from '../mail/day-words.js';
import { greeting } from '../mail/greeting.js';
import { mailLayout } from '../mail/layout.js';
import type { WrittenMail } from '../mail/written-mail.js';

export interface AcknowledgementMail {
  readonly shopName: string;
  readonly shopPhone: string;
  readonly contactName: string;
  readonly jobNumber: string;
  readonly machine: string;
  readonly serial: string;
  readonly complaint: string;
  readonly accessories: string;
  readonly customerReference: string;
  readonly promisedOn: string | null;
  /** null where nobody of the customer can sign in */
  readonly portalUrl: string | null;
}

/** The machine is in the house: what came, what is wrong with it, and what happens next. */
export function acknowledgementMail(mail: AcknowledgementMail): WrittenMail {
  const facts = [
    `Machine: ${mail.machine}${mail.serial ? `, serial ${mail.serial}` : ''}`,
    `Complaint: ${mail.complaint}`,
    ...(mail.accessories ? [`Came with it: ${mail.accessories}`] : []),
    ...(mail.customerReference ? [`Your reference: ${mail.customerReference}`] : []),
    mail.promisedOn ? `Promised for: ${dayWords(mail.promisedOn)}` : 'Promised for: we tell you when the machine has been tested',
  ];
  const paragraphs = [
    greeting(mail.contactName),
    `We have your machine. It is our job ${mail.jobNumber}; say this number when you ask for it.`,
    facts.join('\n'),
    `We test it first and then send you a quote. No winding comes out before you approve it. If something above is not right, answer this mail${mail.shopPhone ? ` or call us (${mail.shopPhone})` : ''}.`,
  ];
  return {
    subject: `${mail.shopName}: job ${mail.jobNumber} received`,
    ...mailLayout({ shopName: mail.shopName, heading: `Job ${mail.jobNumber} received`, paragraphs, ...(mail.portalUrl ? { link: { label: 'Follow the job', url: mail.portalUrl } } : {}) }),
  };
}
