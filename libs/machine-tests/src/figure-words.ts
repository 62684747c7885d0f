/** A figure in a sentence: three digits are enough there, the table beside it carries the rest. */
export function figureWords(value: number): string {
  if (value === 0) return '0';
  const size = Math.floor(Math.log10(Math.abs(value)));
  return String(Number(value.toFixed(Math.min(8, Math.max(0, 2 - size)))));
}

export const percentWords = (fraction: number): string => `${figureWords(fraction * 100)} %`;
export const megohmWords = (ohm: number): string => `${figureWords(ohm / 1e6)} MΩ`;
