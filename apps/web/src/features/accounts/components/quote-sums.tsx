import { formatMoney } from '@libs/money';
import { useWatch, type Control } from 'react-hook-form';
import { moneyOf } from '../../../lib/format.js';
import { rateWords } from '../../../lib/money-words.js';
import { liveTotals, type QuoteForm } from '../quote-form.js';
import { t } from '../quote-text.js';

/** What the quote comes to as it is typed. The server reckons it again when it is saved. */
export function QuoteSums({ control, currency }: { readonly control: Control<QuoteForm>; readonly currency: string }) {
  const lines = useWatch({ control, name: 'lines' });
  const { sums, leftOut } = liveTotals(lines, currency);
  if (!sums) return <p className="muted" role="status">{t('noTotal')}</p>;
  return (
    <div className="lb-quote-sums" role="status">
      <dl>
        <div>
          <dt>{t('net')}</dt>
          <dd className="num">{formatMoney(sums.netMinor, currency)}</dd>
        </div>
        {sums.taxSummary.map((tax) => (
          <div key={tax.taxRateBasisPoints}>
            <dt>{t('taxOf', { rate: rateWords(tax.taxRateBasisPoints) })}</dt>
            <dd className="num">{formatMoney(tax.taxMinor, currency)}</dd>
          </div>
        ))}
        <div className="lb-quote-total">
          <dt>{t('total')}</dt>
          <dd className="num">{moneyOf(sums.grossMinor, currency)}</dd>
        </div>
      </dl>
      {leftOut.length > 0 && <p className="lb-left-out">{t('leftOut', { lines: leftOut.join(', ') })}</p>}
    </div>
  );
}
