import { formatMoney } from '@libs/money';

/** An amount as it stands in a sentence: figures and currency, which do not part at the end of a line. */
export const amountWords = (minor: number, currency: string): string => `${formatMoney(minor, currency)}\u00a0${currency}`;
