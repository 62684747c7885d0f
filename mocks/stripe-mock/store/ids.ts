import { randomBytes } from 'node:crypto';

const LETTERS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** Letters without bias: bytes that would favour the first letters are thrown away. */
export function randomText(length: number): string {
  let text = '';
  while (text.length < length) {
    for (const byte of randomBytes(length)) if (byte < 248 && text.length < length) text += LETTERS[byte % 62];
  }
  return text;
}

const LENGTH_BY_PREFIX = { cs_test: 60, cus: 14, req: 14 } as const;

export type IdPrefix =
  | 'acct' | 'ch' | 'cs_test' | 'cus' | 'dp' | 'evt' | 'issfr' | 'li' | 'pi' | 'pm' | 'price' | 'prod' | 'py' | 'pyr' | 're' | 'req' | 'txn' | 'we' | 'whsec';

/** An id as the service writes it: a prefix that names the kind of object, then letters that mean nothing. */
export function newId(prefix: IdPrefix): string {
  const length = prefix in LENGTH_BY_PREFIX ? LENGTH_BY_PREFIX[prefix as keyof typeof LENGTH_BY_PREFIX] : 24;
  return `${prefix}_${randomText(length)}`;
}
