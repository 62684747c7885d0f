import { ringDrawing, spineDrawing, stripDrawing, type Drawing } from '@libs/drawings';
import { PDFDocument } from 'pdf-lib';
import { describe, expect, it } from 'vitest';
import { FONTS } from '../../test/paper-fonts.js';
import { readTextBack } from '../../test/read-text-back.js';
import type { PageCanvas } from './page-canvas.js';
import { paintDrawing } from './paint-drawing.js';
import { printPages } from './print-pages.js';
import { Typeface } from './typeface.js';

const BOX = { x: 50, y: 60, widthPt: 200, heightPt: 180 };
const FRAME = { widthPt: 300, heightPt: 300, marginPt: { top: 0, right: 0, bottom: 0, left: 0 } };
const FACTS = { title: '', author: '', subject: '', issuedAt: new Date('2026-11-27T13:05:00.000Z') };
const printed = (drawing: Drawing) => printPages([{ marks: [{ kind: 'drawing', ...BOX, drawing }] }], FRAME, FACTS, new Typeface(FONTS));

const bar = { label: 'before', value: 3.12, uncertainty: 0.22, words: '3.12 ± 0.22' };
const strip = stripDrawing({ before: bar, after: [{ ...bar, label: 'after', value: 3.7 }], limit: { value: 3.74, words: 'limit +20 %' }, increase: { figure: '+18.6 %', interval: '16.2 to 21.0' }, unit: 'W/kg' });
const ring = ringDrawing({
  geometry: { kind: 'stator', outerDiameterM: 0.34, innerDiameterM: 0.218, slotDepthM: 0.028, slots: 48, stackLengthM: 0.22, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 },
  turns: 16,
  reading: { figure: '3.70', unit: 'W/kg', below: '1.32 T, 50 Hz' },
  heat: new Map([[7, 6.1]]),
  heatFullK: 10,
  hottestSlot: 7,
});
const spine = spineDrawing({ variant: 'mini', sheets: [{ id: 'a', label: 'A', state: 'done', gate: 'none' }, { id: 'b', label: 'B', state: 'open', gate: 'none' }, { id: 'c', label: 'C', state: 'to-come', gate: 'none' }] });

describe('painting a drawing on paper', () => {
  it.each([['ring', ring], ['strip', strip], ['spine', spine]] as const)('paints every shape of the %s, and a page that opens', async (_name, drawing) => {
    const file = await PDFDocument.load(await printed(drawing));
    expect(file.getPageCount()).toBe(1);
    const words = readTextBack(await printed(drawing)).join('\n');
    for (const shape of drawing.shapes) if (shape.kind === 'text' && shape.text !== '') expect(words).toContain(shape.text);
  });

  it('keeps words inside the drawing, however long they are', () => {
    const typeface = new Typeface(FONTS);
    const long = 'a very long name of a test that nobody would ever give '.repeat(3);
    const drawing: Drawing = {
      ...spine,
      width: 200,
      height: 40,
      shapes: (['start', 'middle', 'end'] as const).map((anchor, index) => ({ kind: 'text', x: [10, 60, 190][index] ?? 0, y: 20, text: long, size: 12, weight: 700, anchor, ink: 'text' })),
    };
    const seen: { x: number; width: number }[] = [];
    const canvas = { typeface, path: () => undefined, text: (text: string, x: number, _y: number, size: number, weight: 'regular' | 'bold') => seen.push({ x, width: typeface.widthOf(text, size, weight) }) };
    paintDrawing(canvas as unknown as PageCanvas, drawing, BOX);
    expect(seen).toHaveLength(3);
    for (const { x, width } of seen) {
      expect(x).toBeGreaterThanOrEqual(BOX.x - 0.01);
      expect(x + width).toBeLessThanOrEqual(BOX.x + BOX.widthPt + 0.01);
    }
  });

  it('prints nothing of a drawing that has no size', async () => {
    expect(readTextBack(await printed({ ...strip, width: 0 })).join('')).toBe('');
  });
});
