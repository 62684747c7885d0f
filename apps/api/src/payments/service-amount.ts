/**
 * The payment service counts a few currencies in other units than ISO 4217 does: krona and shilling have no minor
 * unit any more but are sent as hundredths (the service's currency pages, "special cases").
 */
const SENT_AS_HUNDREDTHS = new Set(['ISK', 'UGX']);
/** Currencies of three decimals: banks move no thousandth, so the last digit must be 0. */
const LAST_DIGIT_ZERO = new Set(['BHD', 'JOD', 'KWD', 'OMR', 'TND']);

/** An amount of our minor units as the payment service takes it, or null where it cannot be paid through it. */
export function toServiceAmount(amountMinor: number, currency: string): number | null {
  if (!Number.isSafeInteger(amountMinor) || amountMinor <= 0) return null;
  if (LAST_DIGIT_ZERO.has(currency) && amountMinor % 10 !== 0) return null;
  return SENT_AS_HUNDREDTHS.has(currency) ? amountMinor * 100 : amountMinor;
}

/** What the payment service says in our minor units, or null where it names a part that our money does not have. */
export function fromServiceAmount(serviceAmount: number, currency: string): number | null {
  if (!SENT_AS_HUNDREDTHS.has(currency)) return serviceAmount;
  return serviceAmount % 100 === 0 ? serviceAmount / 100 : null;
}
