import type { InvoiceView } from '@shared/invoices';
import type { QuoteView } from '@shared/quotes';
import type { StateTone } from '../../components/state-mark.js';
import { t } from './text.js';

export interface StateWords {
  readonly tone: StateTone;
  readonly words: string;
}

const QUOTE_TONES = { draft: 'open', sent: 'waiting', approved: 'good', declined: 'bad', superseded: 'quiet' } as const satisfies Record<QuoteView['state'], StateTone>;

/** How a quote stands, in words; one that ran out while it waited says so. */
export function quoteStateWords({ state, expired }: Pick<QuoteView, 'state' | 'expired'>): StateWords {
  if (state === 'sent' && expired) return { tone: 'bad', words: t('expired') };
  return { tone: QUOTE_TONES[state], words: t(state) };
}

export function invoiceStateWords({ state, overdue }: Pick<InvoiceView, 'state' | 'overdue'>): StateWords {
  if (state === 'paid') return { tone: 'good', words: t('paid') };
  if (overdue) return { tone: 'bad', words: t(state === 'part-paid' ? 'overdue-part-paid' : 'overdue') };
  return { tone: state === 'part-paid' ? 'waiting' : 'open', words: t(state) };
}

/** Number as it stands on the paper: a revision carries its number behind it. */
export const quotePaperNumber = ({ number, revision }: Pick<QuoteView, 'number' | 'revision'>): string => (revision === 1 ? number : `${number}-r${revision}`);
