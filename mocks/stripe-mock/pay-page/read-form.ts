import { TEXT } from './text.js';

/** What stands in the fields of the pay page; card details come back only when they are a test card's. */
export interface Typed {
  email: string;
  number: string;
  expiry: string;
  cvc: string;
  name: string;
  account: string;
}
export type Wrong = Partial<Record<keyof Typed, string>>;
export const NOTHING_TYPED: Typed = { email: '', number: '', expiry: '', cvc: '', name: '', account: '' };

export function typedIn(form: URLSearchParams): Typed {
  const field = (name: string) => (form.get(name) ?? '').trim().slice(0, 512);
  return { email: field('email'), number: field('number').replace(/[\s-]/g, ''), expiry: field('expiry'), cvc: field('cvc'), name: field('name'), account: field('account').replace(/\s/g, '') };
}

/** `12 / 34`, `12/34`, `1234`, `12 2034`: a month and a year, or nothing. */
export function expiryIn(text: string): { month: number; year: number } | undefined {
  const found = /^(\d{1,2})\s*[/\-. ]?\s*(\d{2}|\d{4})$/.exec(text);
  return found ? { month: Number(found[1]), year: Number(found[2]) } : undefined;
}

export function wrongIn(typed: Typed, method: 'card' | 'bank' | 'free'): Wrong {
  const wrong: Wrong = {};
  if (!/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(typed.email)) wrong.email = TEXT.missingEmail;
  if (method === 'free') return wrong;
  if (typed.name === '') wrong.name = TEXT.missingName;
  if (method === 'bank') return wrong;
  if (typed.number === '') wrong.number = TEXT.missingNumber;
  if (!expiryIn(typed.expiry)) wrong.expiry = TEXT.missingExpiry;
  if (typed.cvc === '') wrong.cvc = TEXT.missingCvc;
  return wrong;
}
