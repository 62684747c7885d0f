import type { QuoteView } from '@shared/quotes';
import type { Difference } from '../../components/notices.js';
import { calendarDay, moneyOf } from '../../lib/format.js';
import { quantityWords, rateWords } from '../../lib/money-words.js';
import { formOf, liveTotals, plainMoney, type LineForm, type QuoteForm } from './quote-form.js';
import { t } from './quote-text.js';

const wordsOf = (line: LineForm | undefined): string =>
  line
    ? t('lineWords', { description: line.description, quantity: `${line.quantityThousandths}${line.unit ? ` ${line.unit}` : ''}`, price: line.unitPriceMinor, rate: line.taxRateBasisPoints })
    : t('noLine');

const asTyped = (line: QuoteView['lines'][number], currency: string): string =>
  t('lineWords', { description: line.description, quantity: quantityWords(line).replace('\u00a0', ' '), price: plainMoney(line.unitPriceMinor, currency), rate: rateWords(line.taxRateBasisPoints).replace('\u00a0%', '') });

/** What differs between the quote as somebody else saved it and the form as it is typed; equal lines are left out. */
export function quoteDifferences(theirs: QuoteView, mine: QuoteForm): Difference[] {
  const differences: Difference[] = [];
  for (let i = 0; i < Math.max(theirs.lines.length, mine.lines.length); i += 1) {
    const [their, my] = [theirs.lines[i], mine.lines[i]];
    const difference = { label: t('conflictLine', { n: i + 1 }), theirs: their ? asTyped(their, theirs.currency) : t('noLine'), yours: wordsOf(my) };
    if (difference.theirs !== difference.yours) differences.push(difference);
  }
  const day = (date: string | null) => (date ? calendarDay(date) : '–');
  if (theirs.validUntil !== mine.validUntil) differences.push({ label: t('validUntil'), theirs: day(theirs.validUntil), yours: day(mine.validUntil) });
  if (theirs.note.trim() !== mine.note.trim()) differences.push({ label: t('note'), theirs: theirs.note || '–', yours: mine.note || '–' });
  const gross = liveTotals(mine.lines, theirs.currency).sums?.grossMinor;
  const total = { label: t('conflictTotal'), theirs: moneyOf(theirs.grossMinor, theirs.currency), yours: gross === undefined ? '–' : moneyOf(gross, theirs.currency) };
  if (total.theirs !== total.yours) differences.push(total);
  return differences;
}

/** The form holds what somebody else saved and nothing else: nothing has to be decided. */
export const isSame = (theirs: QuoteView, mine: QuoteForm): boolean => JSON.stringify(formOf(theirs)) === JSON.stringify(mine);
