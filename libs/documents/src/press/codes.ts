import bwipjs from 'bwip-js/generic';
import type { Ink } from './inks.js';
import type { PathMark } from './marks.js';

/** The modules of a code: rows of dark (true) and light. */
export type Modules = readonly (readonly boolean[])[];

/** QR code (ISO/IEC 18004), byte mode where it must, error level M: a quarter of a soiled label may be lost before it fails. */
export function qrModules(text: string): Modules {
  const [symbol] = bwipjs.raw('qrcode', asUtf8(text), 'eclevel=M');
  if (!symbol || !('pixs' in symbol)) throw new Error('No QR code came of this text.');
  const { pixs, pixx, pixy } = symbol;
  return Array.from({ length: pixy }, (_, row) => Array.from({ length: pixx }, (_cell, column) => pixs[row * pixx + column] === 1));
}

/** Code 128 (ISO/IEC 15417): the widths of bars and spaces by turns, beginning with a bar. */
export function code128Widths(text: string): readonly number[] {
  const [symbol] = bwipjs.raw('code128', text, '');
  if (!symbol || !('sbs' in symbol)) throw new Error('No bar code came of this text.');
  return symbol.sbs;
}

// The encoder takes one character for one byte.
const asUtf8 = (text: string) => String.fromCharCode(...new TextEncoder().encode(text));

/** More bytes than this make modules too fine for a label. */
const MOST_BYTES = 400;

/** One filled path for all dark modules, so that no hair of white shows between them; null where the text is too long for a code that can be read. The quiet zone is the caller's. */
export function qrMark(text: string, x: number, y: number, sizePt: number, ink: Ink = 'text'): PathMark | null {
  if (text === '' || asUtf8(text).length > MOST_BYTES) return null;
  const modules = qrModules(text);
  let d = '';
  modules.forEach((row, rowIndex) => {
    for (let column = 0; column < row.length; column += 1) {
      if (!row[column]) continue;
      let end = column + 1;
      while (row[end]) end += 1;
      d += `M${column} ${rowIndex}H${end}V${rowIndex + 1}H${column}Z`;
      column = end;
    }
  });
  return { kind: 'path', x, y, scale: sizePt / modules.length, d, fill: ink };
}

/** 0.19 mm (7.5 mil): the finest module a hand scanner is sure of. */
const FINEST_MODULE_PT = 0.54;

/** Bars of a Code 128 in a width, quiet zones of ten modules left free inside it; null where the text is not plain or too long. */
export function code128Mark(text: string, x: number, y: number, widthPt: number, heightPt: number): PathMark | null {
  if (!/^[\x20-\x7e]{1,80}$/.test(text)) return null;
  const widths = code128Widths(text);
  const modules = widths.reduce((sum, width) => sum + width, 0);
  const scale = widthPt / (modules + 20);
  if (scale < FINEST_MODULE_PT) return null;
  let d = '';
  let at = 0;
  widths.forEach((width, index) => {
    if (index % 2 === 0) d += `M${at} 0H${at + width}V${(heightPt / scale).toFixed(3)}H${at}Z`;
    at += width;
  });
  return { kind: 'path', x: x + 10 * scale, y, scale, d, fill: 'text' };
}
