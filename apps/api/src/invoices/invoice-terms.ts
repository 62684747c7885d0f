import { addDays } from '../clock/shop-date.js';

export interface PaymentTerms {
  readonly terms: 'prepayment' | 'account';
  readonly netDays: number;
}

/** The day an invoice is due: at once before collection, else so many days on the calendar. */
export const dueDate = (issuedOn: string, { terms, netDays }: PaymentTerms): string => (terms === 'prepayment' ? issuedOn : addDays(issuedOn, netDays));

/** The terms as they stand on the invoice. */
export function termsWords({ terms, netDays }: PaymentTerms): string {
  if (terms === 'prepayment') return 'Payable before collection';
  if (netDays === 0) return 'Due at once';
  return netDays === 1 ? '1 day net' : `${netDays} days net`;
}
