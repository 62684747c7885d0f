import type { CustomerTerms } from '@shared/customers';

export interface TermsForm {
  terms: CustomerTerms['terms'];
  netDays: string;
  creditStop: boolean;
}

/** Who pays before collection has no days to pay; null when the days are no whole number from 0 to 180. */
export function termsOf({ terms, netDays, creditStop }: TermsForm, version: number): CustomerTerms | null {
  if (terms === 'prepayment') return { version, terms, netDays: 0, creditStop };
  const text = netDays.trim();
  if (!/^\d{1,3}$/.test(text) || Number(text) > 180) return null;
  return { version, terms, netDays: Number(text), creditStop };
}
