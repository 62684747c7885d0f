/** Signs that may stand between two cells. */
export const SEPARATORS = [';', '\t', ',', '|'] as const;
export type Separator = (typeof SEPARATORS)[number];

/**
 * The cells of one row. A cell may stand in quotes, with a doubled quote inside for one; blanks about a cell are dropped. A
 * quote that is never closed ends with the row, so that one slip does not swallow the rest of the file.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `line` | text | one row, without its end |
 * | – | `separator` | – | semicolon, tab, comma or bar |
 *
 * @returns the cells, at least one
 *
 * Source: RFC 4180, read loosely. Standing: from memory.
 * @example
 * splitCells('12:00;"351,2"; ok', ';')
 * // → ['12:00', '351,2', 'ok']
 */
export function splitCells(line: string, separator: Separator): string[] {
  if (!line.includes('"')) return line.split(separator).map((cell) => cell.trim());
  const cells: string[] = [];
  let cell = '';
  let quoted = false;
  for (let i = 0; i < line.length; i += 1) {
    const sign = line[i]!;
    if (sign === '"') {
      if (quoted && line[i + 1] === '"') {
        cell += '"';
        i += 1;
      } else quoted = !quoted;
    } else if (sign === separator && !quoted) {
      cells.push(cell.trim());
      cell = '';
    } else cell += sign;
  }
  cells.push(cell.trim());
  return cells;
}
