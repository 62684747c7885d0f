export type Decimal = { readonly ok: true; readonly whole: number } | { readonly ok: false; readonly reason: 'empty' | 'not-a-number' | 'too-many-decimals' };

/**
 * A typed decimal as a whole number of parts: comma or point, `digits` behind it at most. 1,5 with three digits is 1500.
 * Signs between thousands are not taken: 1.500 hours would be read as one and a half by one person and as many by another.
 */
export function parseDecimal(text: string, digits: number): Decimal {
  const bare = text.trim().replace(/\s*%$/, '');
  if (bare === '') return { ok: false, reason: 'empty' };
  const form = /^(\d{1,9})(?:[.,](\d+))?$/.exec(bare);
  if (!form) return { ok: false, reason: 'not-a-number' };
  const decimals = (form[2] ?? '').replace(/0+$/, '');
  if (decimals.length > digits) return { ok: false, reason: 'too-many-decimals' };
  return { ok: true, whole: Number(form[1]! + decimals.padEnd(digits, '0')) };
}
