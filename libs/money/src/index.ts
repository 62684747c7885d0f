export { currencyDigits } from './currency.js';
export { formatMoney, type MoneyFormat } from './format-money.js';
export { lineAmounts, type LineAmounts, type PricedLine } from './line-amounts.js';
export { MoneyError } from './money-error.js';
export { parseMoney, type ParsedMoney } from './parse-money.js';
export { allocate, discounted, type Discounted } from './shares.js';
export { totals, type TaxOfRate, type Totals } from './totals.js';
