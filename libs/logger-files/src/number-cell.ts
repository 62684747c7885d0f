import type { TemperatureUnit } from './temperature-unit.js';
import { unitFromText } from './temperature-unit.js';

export type DecimalMark = '.' | ',';

/** A reading as it stands in its cell, with the unit behind it, null where there is none. */
export interface ReadCell {
  readonly value: number;
  readonly unit: TemperatureUnit | null;
}

/** A cell that holds no reading. */
export type NoReading = 'empty' | 'text' | 'other-decimal-mark';

const NUMBER = /^([+\-−]?[\d.,'\u00a0\u202f ]*\d[.,]?(?:[eE][+-]?\d+)?)\s*(.*)$/;
const PLAIN: Record<DecimalMark, RegExp> = { '.': /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/, ',': /^[+-]?(?:\d+,?\d*|,\d+)(?:[eE][+-]?\d+)?$/ };
const GROUPED: Record<DecimalMark, RegExp> = {
  '.': /^[+-]?\d{1,3}(?:[,'\u00a0\u202f ]\d{3})+(?:\.\d*)?$/,
  ',': /^[+-]?\d{1,3}(?:[.'\u00a0\u202f ]\d{3})+(?:,\d*)?$/,
};

/**
 * The reading in one cell, with the unit behind it where there is one: `351.2`, `351,2 °C`, `1 051,5`.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `cell` | text | as `splitCells` gives it |
 * | – | `mark` | – | the decimal mark of the file |
 *
 * @returns the value, or why there is none: `empty`; `text` such as `OL` or `----`; a number with the other decimal mark, which
 *   may be a thousandfold off and is not guessed
 *
 * Source: own.
 * @example
 * readNumberCell('351,2 °C', ',')
 * // → { value: 351.2, unit: 'C' }
 */
export function readNumberCell(cell: string, mark: DecimalMark): ReadCell | NoReading {
  if (cell === '') return 'empty';
  if (mark === '.' && PLAIN['.'].test(cell)) return { value: Number(cell), unit: null };
  const parts = NUMBER.exec(cell);
  if (!parts) return 'text';
  const [, rawFigure, tail] = parts as unknown as [string, string, string];
  const unit = tail === '' ? null : unitFromText(tail);
  if (tail !== '' && unit === null) return 'text';
  const figure = rawFigure.trim().replace('−', '-');
  const value = figureIn(figure, mark);
  if (value !== null) return { value, unit };
  return figureIn(figure, mark === '.' ? ',' : '.') === null ? 'text' : 'other-decimal-mark';
}

function figureIn(figure: string, mark: DecimalMark): number | null {
  if (!PLAIN[mark].test(figure) && !GROUPED[mark].test(figure)) return null;
  const bare = figure.replace(/['\u00a0\u202f ]/g, '').replaceAll(mark === '.' ? ',' : '.', '').replace(',', '.');
  const value = Number(bare);
  return Number.isFinite(value) ? value : null;
}

/**
 * Which decimal mark cells show: the mark that reads more of them. A cell with three figures behind its only mark, such as
 * `1.234`, is taken for a fraction only where the other cells do not speak against it.
 *
 * @returns null where every cell is whole, so that either may follow
 */
export function decimalMarkOf(cells: readonly string[]): DecimalMark | null {
  const figures = cells.map((cell) => NUMBER.exec(cell)?.[1]?.trim() ?? '');
  const sure = (mark: DecimalMark) => figures.filter((f) => new RegExp(`\\${mark}\\d*$`).test(f) && figureIn(f, mark) !== null && !GROUPED[mark === '.' ? ',' : '.'].test(f)).length;
  const maybe = (mark: DecimalMark) => figures.filter((f) => f.includes(mark) && figureIn(f, mark) !== null).length;
  const [dots, commas] = [sure('.'), sure(',')];
  if (dots !== commas) return dots > commas ? '.' : ',';
  const [dotsMaybe, commasMaybe] = [maybe('.'), maybe(',')];
  if (dotsMaybe === 0 && commasMaybe === 0) return null;
  return commasMaybe > dotsMaybe ? ',' : '.';
}
