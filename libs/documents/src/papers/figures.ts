import { type Kind, formatQuantity, formatUsual, unitOf } from '@libs/quantities';
import type { Run } from '../press/blocks.js';
import type { PaperUnits } from './paper-model.js';
import { COMMON } from './words.js';

const isNumber = (value: number | null | undefined): value is number => typeof value === 'number' && Number.isFinite(value);
/** A true minus sign, as wide as a figure; a hyphen would read as a dash. */
const withMinus = (text: string) => text.replace(/^-/, '−');

/** The figure alone, for columns whose unit stands elsewhere. */
export function bareFigure(value: number | null | undefined, kind: Kind, units: PaperUnits, digits?: number): string {
  if (!isNumber(value)) return COMMON.none;
  return withMinus(digits === undefined ? formatUsual(value, kind, units, { unit: false }) : formatQuantity(value, kind, units, { unit: false, digits }));
}

/** The figure dark, its unit lighter. */
export function figureRuns(value: number | null | undefined, kind: Kind, units: PaperUnits, style: { bold?: boolean; digits?: number } = {}): Run[] {
  if (!isNumber(value)) return [{ text: COMMON.none, ink: 'muted' }];
  const unit = unitOf(kind, units);
  const figure: Run = { text: bareFigure(value, kind, units, style.digits), ...(style.bold ? { weight: 'bold' } : {}) };
  return unit === '' ? [figure] : [figure, { text: `${unit === '°' ? '' : '\u00a0'}${unit}`, ink: 'muted' }];
}

/** As a plate says it: four figures that count unless told, no empty decimals. */
export function plateWords(value: number | null | undefined, kind: Kind, units: PaperUnits, significant = 4): string {
  if (!isNumber(value)) return '';
  const text = formatQuantity(value, kind, units, { significant, unit: false });
  const unit = unitOf(kind, units);
  const short = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return withMinus(short) + (unit === '' ? '' : `\u00a0${unit}`);
}

/** A share of one as a percentage with its sign: 0.186 is '+18.6 %'. */
export function signedPercent(share: number): string {
  const text = formatQuantity(Math.abs(share), 'percent', 'si', { digits: 1, unit: false });
  return `${share < 0 && Number(text) !== 0 ? '−' : '+'}${text}\u00a0%`;
}

export function points(share: number): string {
  return formatQuantity(share, 'percent', 'si', { digits: 1, unit: false });
}

/** A figure never parts from the unit behind it at the end of a line. */
export const withUnits = (text: string) => text.replace(/(\d) (?=(?:[°%]|(?:[kMmµ]?[VAWΩT]|K|Hz|kVA|mm|µm|mm\/s|m|min|s|h|rpm|kg|g)(?![\p{L}\d])))/gu, '$1\u00a0');
