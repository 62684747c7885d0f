import { formatMoney } from '@libs/money';
import type { QuoteView } from '@shared/quotes';
import { moneyOf } from '../lib/format.js';
import { lineKindName, quantityWords, rateWords } from '../lib/money-words.js';
import { defineText } from '../lib/text.js';
import './money-lines.css';

const t = defineText({
  what: 'What',
  quantity: 'Quantity',
  price: 'Price',
  tax: 'Tax',
  amount: 'Amount',
  net: 'Net',
  taxOf: 'Tax {rate} on {net}',
  total: 'Total with tax',
  times: '{quantity} at {price}',
});

/** The lines of a quote or an invoice with their sums; on a phone each line stands in two rows. */
export function MoneyLines({ of, caption }: { readonly of: Pick<QuoteView, 'lines' | 'taxSummary' | 'netMinor' | 'grossMinor' | 'currency'>; readonly caption: string }) {
  const { currency } = of;
  const figure = (minor: number) => formatMoney(minor, currency);
  return (
    <table className="lb-money-lines">
      <caption className="visually-hidden">{caption}</caption>
      <thead>
        <tr>
          <th scope="col">{t('what')}</th>
          <th scope="col" className="number wide-only">{t('quantity')}</th>
          <th scope="col" className="number wide-only">{t('price')}</th>
          <th scope="col" className="number wide-only">{t('tax')}</th>
          <th scope="col" className="number">{t('amount')}</th>
        </tr>
      </thead>
      <tbody>
        {of.lines.map((line, i) => (
          <tr key={i}>
            <td>
              {line.description}
              <span className="lb-line-kind muted">{lineKindName(line.kind)}</span>
              <span className="narrow-only muted num">{t('times', { quantity: quantityWords(line), price: figure(line.unitPriceMinor) })}</span>
            </td>
            <td className="number num wide-only">{quantityWords(line)}</td>
            <td className="number num wide-only">{figure(line.unitPriceMinor)}</td>
            <td className="number num wide-only">{rateWords(line.taxRateBasisPoints)}</td>
            <td className="number num">{figure(line.netMinor)}</td>
          </tr>
        ))}
      </tbody>
      <tbody className="lb-money-sums">
        <tr>
          <th scope="row">{t('net')}</th>
          <td className="number num" colSpan={4}>{figure(of.netMinor)}</td>
        </tr>
        {of.taxSummary.map((tax) => (
          <tr key={tax.taxRateBasisPoints}>
            <th scope="row">{t('taxOf', { rate: rateWords(tax.taxRateBasisPoints), net: figure(tax.netMinor) })}</th>
            <td className="number num" colSpan={4}>{figure(tax.taxMinor)}</td>
          </tr>
        ))}
        <tr className="lb-money-total">
          <th scope="row">{t('total')}</th>
          <td className="number num" colSpan={4}>{moneyOf(of.grossMinor, currency)}</td>
        </tr>
      </tbody>
    </table>
  );
}
