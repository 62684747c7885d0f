import type { QuoteView } from '@shared/quotes';
import { calendarDay, momentOf } from './format.js';

type MoneyLineView = QuoteView['lines'][number];

const KINDS: Record<MoneyLineView['kind'], string> = { labour: 'Labour', material: 'Material', 'outside-work': 'Outside work', test: 'Test', other: 'Other' };
export const lineKindName = (kind: MoneyLineView['kind']): string => KINDS[kind];
export const LINE_KIND_OPTIONS = Object.entries(KINDS).map(([value, label]) => ({ value, label }));

/** A whole number of parts as it is written: 1500 thousandths are `1.5`, 750 hundredths `7.5`. */
const decimal = (whole: number, digits: number): string => {
  const text = String(whole).padStart(digits + 1, '0');
  return `${text.slice(0, -digits)}.${text.slice(-digits)}`.replace(/\.?0+$/, '');
};
/** `1.5` of 1500 thousandths. */
export const quantityText = (thousandths: number): string => decimal(thousandths, 3);
/** `1.5 h`. */
export const quantityWords = ({ quantityThousandths, unit }: Pick<MoneyLineView, 'quantityThousandths' | 'unit'>): string => `${quantityText(quantityThousandths)}${unit ? `\u00a0${unit}` : ''}`;
/** `19` of 1900 basis points. */
export const rateText = (basisPoints: number): string => decimal(basisPoints, 2);
/** `19 %`. */
export const rateWords = (basisPoints: number): string => `${rateText(basisPoints)}\u00a0%`;

/** When money came in: a transfer is known by its day alone, a card payment by the minute. */
export const receivedWords = (receivedAt: string): string => (/^\d{4}-\d{2}-\d{2}$/.test(receivedAt) ? calendarDay(receivedAt) : momentOf(receivedAt));
