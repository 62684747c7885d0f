import type { PortalHome, PortalJob } from '@shared/portal';
import type { StateTone } from '../../components/state-mark.js';
import { t } from './text.js';

interface StateWords {
  readonly tone: StateTone;
  readonly words: string;
}
type Quote = Pick<PortalJob['quotes'][number], 'state' | 'validUntil'>;
type Invoice = Pick<PortalHome['invoicesToPay'][number], 'state' | 'overdue'>;
const TONES = { draft: 'open', sent: 'waiting', approved: 'good', declined: 'bad', superseded: 'quiet' } as const;

export const quoteStateWords = (quote: Quote, today: string): StateWords =>
  quote.state === 'sent' && quote.validUntil < today ? { tone: 'bad', words: t('expired') } : { tone: TONES[quote.state], words: t(quote.state) };

export function invoiceStateWords({ state, overdue }: Invoice): StateWords {
  if (state === 'paid') return { tone: 'good', words: t('paid') };
  return overdue ? { tone: 'bad', words: t('overdue') } : { tone: 'waiting', words: t(state) };
}

const PAPERS: Record<string, string> = {
  acknowledgement: t('acknowledgement'),
  quote: t('paper-quote'),
  invoice: t('paper-invoice'),
  receipt: t('receipt'),
  certificate: t('certificate'),
  'delivery-note': t('delivery-note'),
};
export const paperName = (kind: string): string => PAPERS[kind] ?? t('paper');
