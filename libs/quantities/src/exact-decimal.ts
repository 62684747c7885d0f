/**
 * Fractions of whole numbers, so that 25.4 mm to the inch stays 25.4 and a reading that is shown in another unit comes
 * back as the same double it was. Floating point alone cannot do that: x / 0.0254 * 0.0254 is not always x.
 */
export interface Exact {
  n: bigint;
  d: bigint;
}

const ten = (power: number) => 10n ** BigInt(power);

/** Reads `-12.5e-3`: point, optional sign, optional exponent. The caller has made sure of the form. */
export function exactFromText(text: string): Exact {
  const [mantissa = '', exponentText = '0'] = text.toLowerCase().split('e');
  const [whole = '', part = ''] = mantissa.replace(/^[+-]/, '').split('.');
  const digits = BigInt(whole + part || '0');
  const exponent = Number(exponentText) - part.length;
  const n = mantissa.startsWith('-') ? -digits : digits;
  return exponent >= 0 ? { n: n * ten(exponent), d: 1n } : { n, d: ten(-exponent) };
}

/** The decimal a person would write for this double, exactly; not its binary tail. */
export const exactFromNumber = (value: number): Exact => exactFromText(String(value));

export const times = (a: Exact, b: Exact): Exact => ({ n: a.n * b.n, d: a.d * b.d });
export const over = (a: Exact, b: Exact): Exact => (b.n < 0n ? { n: -a.n * b.d, d: a.d * -b.n } : { n: a.n * b.d, d: a.d * b.n });
export const plus = (a: Exact, b: Exact): Exact => ({ n: a.n * b.d + b.n * a.d, d: a.d * b.d });
export const minus = (a: Exact, b: Exact): Exact => ({ n: a.n * b.d - b.n * a.d, d: a.d * b.d });

const roundedQuotient = (n: bigint, d: bigint) => (2n * n + d) / (2n * d); // half up, for n >= 0
const abs = (n: bigint) => (n < 0n ? -n : n);

/** The whole-number digits and the power of ten of `value` to so many significant digits, half away from zero. */
export function significantDigits(value: Exact, significant: number): { negative: boolean; digits: string; exponent: number } {
  const n = abs(value.n);
  if (n === 0n) return { negative: false, digits: '0', exponent: 0 };
  let exponent = n.toString().length - value.d.toString().length;
  const scaled = (shift: number) => (shift >= 0 ? roundedQuotient(n * ten(shift), value.d) : roundedQuotient(n, value.d * ten(-shift)));
  const below = exponent >= 0 ? n < value.d * ten(exponent) : n * ten(-exponent) < value.d;
  if (below) exponent -= 1;
  let digits = scaled(significant - 1 - exponent).toString();
  if (digits.length > significant) {
    exponent += 1;
    digits = digits.slice(0, significant); // 9.99 rounded up to 10.0
  }
  return { negative: value.n < 0n, digits, exponent };
}

/** The double nearest to a fraction. Forty digits are more than any double needs to be told from its neighbour. */
export function nearestNumber(value: Exact): number {
  const { negative, digits, exponent } = significantDigits(value, 40);
  const size = Number(`${digits}e${exponent - digits.length + 1}`);
  return negative && size !== 0 ? -size : size;
}

/** Plain decimal text with so many digits behind the point, half away from zero. */
export function fixedText(value: Exact, digits: number): string {
  const scaled = roundedQuotient(abs(value.n) * ten(digits), value.d).toString().padStart(digits + 1, '0');
  const text = digits === 0 ? scaled : `${scaled.slice(0, -digits)}.${scaled.slice(-digits)}`;
  return value.n < 0n && /[1-9]/.test(text) ? `-${text}` : text;
}

/** Decimal text with so many significant digits; a power of ten is written only where zeros would fill the line. */
export function significantText(value: Exact, significant: number, keepZeros: boolean): string {
  const { negative, digits, exponent } = significantDigits(value, significant);
  if (digits === '0') return keepZeros ? (0).toFixed(significant - 1) : '0';
  const kept = keepZeros ? digits : digits.replace(/0+$/, '');
  const sign = negative ? '-' : '';
  if (exponent > 20 || exponent < -12) {
    return `${sign}${kept[0]}${kept.length > 1 ? `.${kept.slice(1)}` : ''}e${exponent}`;
  }
  if (exponent < 0) return `${sign}0.${'0'.repeat(-exponent - 1)}${kept}`;
  const whole = kept.slice(0, exponent + 1).padEnd(exponent + 1, '0');
  const part = kept.slice(exponent + 1);
  return `${sign}${whole}${part ? `.${part}` : ''}`;
}
