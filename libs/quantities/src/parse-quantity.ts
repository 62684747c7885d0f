import { exactInside } from './convert-quantity.js';
import { exactFromText, nearestNumber, type Exact } from './exact-decimal.js';
import { dimensionOfKind, shownUnit, unitOf, wordsOfKind, type Kind, type UnitSystem } from './kinds.js';
import { dimensionOf, findUnit, type Unit } from './units.js';

export type ParseCode =
  | 'empty'
  | 'letters'
  | 'not-a-number'
  | 'two-separators'
  | 'ambiguous-separator'
  | 'fraction'
  | 'unknown-unit'
  | 'wrong-dimension'
  | 'not-whole'
  | 'not-finite';

export type ParseResult =
  | { ok: true; si: number; unit: string; entered: string }
  | { ok: false; code: ParseCode; words: string };

type Failure = Extract<ParseResult, { ok: false }>;
const no = (code: ParseCode, words: string): Failure => ({ ok: false, code, words });
const isFailure = (value: Exact | Failure): value is Failure => 'ok' in value;

const VULGAR: Record<string, string> = { '½': '1/2', '¼': '1/4', '¾': '3/4', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8' };

const tidy = (text: string) =>
  text
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => ` ${VULGAR[sign]}`)
    .replace(/[\u00a0\u2009\u202f\t]/g, ' ')
    .replace(/[\u2212\u2012]/g, '-')
    .replace(/\u2044/g, '/')
    .replace(/’/g, "'")
    .trim();

/** Splits `1.2e3 kV` into figure and unit: the figure ends at the first sign that no figure holds. */
function split(text: string): [figure: string, unit: string] {
  const figure = /^[0-9.,/+\- ]*(?:'(?=\d{3})[0-9.,/+\- ]*)*/.exec(text)?.[0] ?? '';
  const power = /\d$/.test(figure) ? (/^[eE][+-]?\d+/.exec(text.slice(figure.length))?.[0] ?? '') : '';
  return [(figure + power).trim(), text.slice(figure.length + power.length).trim()];
}

const FRACTION = /^([+-]?)\s*(?:(\d+)(?:\s+|\s*-\s*))?(\d+)\s*\/\s*(\d+)$/;

/** Parts of an inch, as on a rule: `3/8`, `1 3/8`, `1-3/8`. */
function readFraction(text: string): Exact | Failure {
  const match = FRACTION.exec(text);
  if (!match) return no('not-a-number', 'Write a fraction as 1 3/8.');
  const [, sign, whole = '0', top = '0', bottom = '1'] = match;
  const d = BigInt(bottom);
  if (d === 0n) return no('not-a-number', 'Nothing can be divided by 0.');
  const n = BigInt(whole) * d + BigInt(top);
  return { n: sign === '-' ? -n : n, d };
}

/** Turns the figure into a plain decimal with a point, or says why it could be read in two ways. */
function readDecimal(text: string): Exact | Failure {
  const match = /^([+-]?)\s*([^eE]*?)(?:[eE]([+-]?\d+))?$/.exec(text);
  const [, sign = '', found = '', power = '0'] = match ?? [];
  let body = found;
  if (!match || !/\d/.test(body)) return no('not-a-number', 'Write a number, such as 12.5.');
  if (/[+\-/]/.test(body)) return no('not-a-number', 'Write one number, with its sign in front.');
  if (/[ ']/.test(body)) {
    if (!/^\d{1,3}(?:[ ']\d{3})+(?:[.,]\d*)?$/.test(body)) return no('not-a-number', 'There is a gap in the middle of the number.');
    body = body.replace(/[ ']/g, '').replace(',', '.');
  }
  const commas = body.split(',').length - 1;
  const points = body.split('.').length - 1;
  const twice = no('two-separators', `“${text}” has two decimal signs. Use one comma or one point.`);
  if (commas > 0 && points > 0) {
    if (/^\d{1,3}(?:,\d{3})+\.\d*$/.test(body)) body = body.replaceAll(',', '');
    else if (/^\d{1,3}(?:\.\d{3})+,\d*$/.test(body)) body = body.replaceAll('.', '').replace(',', '.');
    else return twice;
  } else if (commas + points > 1) {
    if (!/^\d{1,3}(?:,\d{3})+$|^\d{1,3}(?:\.\d{3})+$/.test(body)) return twice;
    body = body.replace(/[.,]/g, '');
  } else if (commas === 1) {
    if (/^[1-9]\d{0,2},\d{3}$/.test(body)) {
      const [whole, part] = body.split(',');
      return no('ambiguous-separator', `“${text}” can be ${whole}${part} or ${whole}.${part}. Write the one you mean without the comma.`);
    }
    body = body.replace(',', '.');
  }
  if (Math.abs(Number(power)) > 400 || body.length > 400) return no('not-finite', 'The number is too large or too small to be a reading.');
  return exactFromText(`${sign}${body}e${Number(power)}`);
}

function readUnit(text: string, kind: Kind, system: UnitSystem): Unit | Failure {
  if (text === '') return shownUnit(kind, system);
  const dimension = dimensionOfKind(kind);
  const found = findUnit(text, dimension);
  if (found) return found;
  const hint = unitOf(kind, system);
  const ask = hint === '' ? `Write ${wordsOfKind(kind)} without a unit.` : `This field takes ${wordsOfKind(kind)} in ${hint}.`;
  if (hint === '') return no('letters', `“${text}” does not belong here. ${ask}`);
  const other = dimensionOf(text);
  if (other && other !== dimension) return no('wrong-dimension', `${text} measures ${other}. ${ask}`);
  if (/\d/.test(text)) return no('letters', `“${text}” is not a number. ${ask}`);
  return no('unknown-unit', `“${text}” is no unit known here. ${ask}`);
}

/**
 * Reads what a person typed or pasted. A comma or a point may be the decimal sign; thousands may be marked where that
 * cannot be mistaken; the unit may stand behind (`12,5 mm`, `0.5in`, `85 kl/in2`) and then counts instead of the
 * system's own; inches may be written as fractions (`1 3/8`). Nothing is guessed: `1,750` is refused with words.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `text` | as typed | any text |
 * | – | `kind` | – | one of `KINDS` |
 * | – | `system` | – | `'si'` or `'inch-pound'`: the unit when none is typed |
 *
 * @returns `{ ok: true, si, unit, entered }`, or `{ ok: false, code, words }` with words that say what to do
 *
 * Source: conversion as `toSi`. Standing: exact by definition.
 * @example
 * parseQuantity('1 3/8', 'length', 'inch-pound')
 * // → { ok: true, si: 0.034925, unit: 'in', entered: '1 3/8' }
 * @example
 * parseQuantity('12,5 mm', 'length', 'inch-pound')
 * // → { ok: true, si: 0.0125, unit: 'mm', entered: '12,5 mm' }
 */
export function parseQuantity(text: string, kind: Kind, system: UnitSystem): ParseResult {
  const entered = text.trim();
  if (entered === '') return no('empty', `Fill in ${wordsOfKind(kind)}.`);
  const [figure, unitText] = split(tidy(text));
  if (!/\d/.test(figure)) return no('letters', `“${entered}” is not a number. Write ${wordsOfKind(kind)} in figures.`);
  const unit = readUnit(unitText, kind, system);
  if ('ok' in unit) return unit;
  const fraction = figure.includes('/');
  if (fraction && unit.symbol !== 'in') return no('fraction', 'Fractions are read in inches only. Write a decimal number.');
  const value = fraction ? readFraction(figure) : readDecimal(figure);
  if (isFailure(value)) return value;
  const si = nearestNumber(exactInside(value, unit));
  if (!Number.isFinite(si)) return no('not-finite', 'The number is too large to be a reading.');
  if (kind === 'count' && !Number.isInteger(si)) return no('not-whole', 'Write a whole number.');
  return { ok: true, si: si === 0 ? 0 : si, unit: unit.symbol, entered };
}
