/** A spreadsheet would take such a cell for a formula: an apostrophe in front makes it text. */
const FORMULA = /^[=+\-@\t\r\0＝＋－＠]/;

/** One cell by RFC 4180: quoted where it holds a comma, a quote or a line break. */
export function csvCell(value: string | number | boolean | null): string {
  const text = value === null ? '' : String(value);
  const safe = typeof value === 'string' && FORMULA.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

export const csvLine = (cells: readonly (string | number | boolean | null)[]): string => `${cells.map(csvCell).join(',')}\r\n`;
