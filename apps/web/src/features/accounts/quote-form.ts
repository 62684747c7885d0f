import { formatMoney, MoneyError, parseMoney, totals, type Totals } from '@libs/money';
import type { QuoteLine, QuoteView } from '@shared/quotes';
import { quantityText, rateText } from '../../lib/money-words.js';
import type { FormProblem } from '../../lib/typed.js';
import { parseDecimal } from './decimal.js';
import { t } from './quote-text.js';

/** A line as it is typed. Its fields carry the contract's names, so that what the server finds lands on the same field. */
export interface LineForm {
  kind: QuoteLine['kind'];
  description: string;
  quantityThousandths: string;
  unit: string;
  unitPriceMinor: string;
  taxRateBasisPoints: string;
}
export interface QuoteForm {
  lines: LineForm[];
  validUntil: string | null;
  note: string;
}

export const emptyLine = (taxRate = ''): LineForm => ({ kind: 'labour', description: '', quantityThousandths: '1', unit: '', unitPriceMinor: '', taxRateBasisPoints: taxRate });
/** A form may lose no figure on its way: plain digits, no signs between thousands. */
export const plainMoney = (minor: number, currency: string): string => formatMoney(minor, currency, { group: '' });

export const formOf = (quote: Pick<QuoteView, 'lines' | 'validUntil' | 'note' | 'currency'>): QuoteForm => ({
  lines: quote.lines.map((line) => ({
    kind: line.kind,
    description: line.description,
    quantityThousandths: quantityText(line.quantityThousandths),
    unit: line.unit,
    unitPriceMinor: plainMoney(line.unitPriceMinor, quote.currency),
    taxRateBasisPoints: rateText(line.taxRateBasisPoints),
  })),
  validUntil: quote.validUntil,
  note: quote.note,
});

type Figures = Pick<QuoteLine, 'quantityThousandths' | 'unitPriceMinor' | 'taxRateBasisPoints'>;
type FigureName = keyof Figures;
type Read = { readonly ok: true; readonly value: number } | { readonly ok: false; readonly words: string };

/** One figure of a line, or what is wrong with it in words. */
export function readFigure(name: FigureName, text: string, currency: string): Read {
  if (name === 'unitPriceMinor') {
    const money = parseMoney(text, currency);
    if (!money.ok) return { ok: false, words: money.code === 'empty' ? t('needPrice') : money.words };
    return money.amountMinor < 0 ? { ok: false, words: t('noNegative') } : { ok: true, value: money.amountMinor };
  }
  const [digits, need] = name === 'quantityThousandths' ? ([3, t('needQuantity')] as const) : ([2, t('needRate')] as const);
  const decimal = parseDecimal(text, digits);
  if (decimal.ok) return { ok: true, value: decimal.whole };
  return { ok: false, words: decimal.reason === 'empty' ? need : decimal.reason === 'too-many-decimals' ? t('tooManyDecimals', { digits }) : t('onlyDigits') };
}

const FIGURES: readonly FigureName[] = ['quantityThousandths', 'unitPriceMinor', 'taxRateBasisPoints'];

function figuresOf(line: LineForm, currency: string): { readonly figures: Figures; readonly wrong: readonly (readonly [FigureName, string])[] } {
  const wrong: [FigureName, string][] = [];
  const figures = { quantityThousandths: Number.NaN, unitPriceMinor: Number.NaN, taxRateBasisPoints: Number.NaN };
  for (const name of FIGURES) {
    const read = readFigure(name, line[name], currency);
    if (read.ok) figures[name] = read.value;
    else wrong.push([name, read.words]);
  }
  return { figures, wrong };
}

/** What will be sent, and what stands in its way, field by field. */
export function readQuote(form: QuoteForm, currency: string): { readonly candidate: unknown; readonly problems: readonly FormProblem[] } {
  const problems: FormProblem[] = [];
  const lines = form.lines.map((line, i) => {
    const { figures, wrong } = figuresOf(line, currency);
    problems.push(...wrong.map(([name, message]) => ({ path: `lines.${i}.${name}`, message })));
    return { ...line, ...figures };
  });
  if (!form.validUntil) problems.push({ path: 'validUntil', message: t('needDay') });
  return { candidate: { lines, validUntil: form.validUntil ?? '', note: form.note }, problems };
}

export interface LiveTotals {
  /** net of each line, null while it cannot be reckoned */
  readonly netOfLine: readonly (number | null)[];
  readonly sums: Pick<Totals<Figures>, 'netMinor' | 'taxMinor' | 'grossMinor' | 'taxSummary'> | null;
  /** numbers of the lines, from 1, that the sums leave out */
  readonly leftOut: readonly number[];
}

/** Sums while they type. A line that is not complete is left out and named, never taken for nothing. */
export function liveTotals(lines: readonly LineForm[], currency: string): LiveTotals {
  const read = lines.map((line) => figuresOf(line, currency));
  const sumsOf = (of: readonly Figures[]) => {
    try {
      return totals(of);
    } catch (error) {
      if (error instanceof MoneyError) return null;
      throw error;
    }
  };
  const alone = read.map(({ figures, wrong }) => (wrong.length === 0 ? sumsOf([figures]) : null));
  const complete = read.filter((_, i) => alone[i] !== null);
  return {
    netOfLine: alone.map((sums) => sums?.netMinor ?? null),
    sums: complete.length === 0 ? null : sumsOf(complete.map((c) => c.figures)),
    leftOut: alone.flatMap((sums, i) => (sums === null ? [i + 1] : [])),
  };
}

/** Common practice: a quote holds for thirty days unless another day is given. */
const HOLDS_DAYS = 30;
export const usualLastDay = (today: string): string => new Date(Date.parse(`${today}T00:00:00Z`) + HOLDS_DAYS * 86_400_000).toISOString().slice(0, 10);
