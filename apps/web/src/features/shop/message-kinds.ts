import { t } from './text.js';

const KINDS: Record<string, string> = {
  'mail.acknowledgement': 'Receipt of a machine',
  'mail.quote': 'Quote',
  'mail.quote-approved': 'Approval',
  'mail.invoice': 'Invoice',
  'mail.receipt': 'Receipt of payment',
  'mail.payment-attention': 'Payment that needs a look',
};
/** What a message was about; a kind that is not known here is still a message. */
export const messageKind = (kind: string): string => KINDS[kind] ?? t('kindOther');
