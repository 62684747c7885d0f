import { findHotSpots, riseMap, type TemperatureMap } from '@libs/core-loss';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, wordsOf } from './drawn-extent.fixture.js';
import { overlapping } from './overlapping-words.fixture.js';
import { unrolledBoreDrawing, type UnrolledBoreInput } from './unrolled-bore-drawing.js';

type Warm = readonly (readonly [slot: number, place: number, celsius: number | null])[];
const axialM = [0.02, 0.06, 0.1, 0.14];
/** An invented core of 36 slots at 25 °C. */
function mapOf(warm: Warm, slotNumbers = Array.from({ length: 36 }, (_, i) => i + 1)): TemperatureMap {
  const celsius = slotNumbers.map((slot) => axialM.map((_x, place) => { const w = warm.find(([s, p]) => s === slot && p === place); return w ? w[2] : 25; }));
  return { slots: 36, slotNumbers, axialM, celsius };
}
const reference = { kind: 'mean', meanC: 25 } as const;
function bore(warm: Warm = [], over: Partial<UnrolledBoreInput> = {}, slotNumbers?: number[]) {
  const map = mapOf(warm, slotNumbers);
  const found = findHotSpots(map, reference, { limitK: 10, warnK: 5, fluxDensityT: 1.32, referenceFluxT: 1.32, expandedUncertaintyK: 1 });
  return unrolledBoreDrawing({ map, rises: riseMap(map, reference), heatFullK: 10, spots: found.outcome === 'told' ? found.spots : [], ...over });
}
const RUB: Warm = [[11, 0, 31], [12, 0, 38], [13, 1, 49.3], [14, 1, 40], [15, 1, 31]];
const SEAM: Warm = [[35, 1, 33], [36, 1, 38], [1, 1, 36], [2, 1, 32]];
const at = (drawing: ReturnType<typeof bore>, mark: string) => drawing.shapes.filter((s) => s.mark === mark);
const rects = (drawing: ReturnType<typeof bore>, mark: string) => at(drawing, mark).flatMap((s) => (s.kind === 'rect' ? [s] : []));
const FIELD = { left: 44, right: 556, top: 26, bottom: 176 };

describe('unrolledBoreDrawing', () => {
  it('lays every place of the map down once, side by side, over the whole bore', () => {
    const cells = bore().shapes.flatMap((s) => (s.kind === 'rect' && s.mark?.startsWith('slot-') ? [s] : []));
    expect(cells).toHaveLength(36 * 4);
    const area = cells.reduce((sum, c) => sum + c.width * c.height, 0);
    expect(area).toBeCloseTo((FIELD.right - FIELD.left) * (FIELD.bottom - FIELD.top), 3);
  });
  it('paints a place at its limit as failing and a cool one as steel', () => {
    const drawing = bore(RUB);
    expect(rects(drawing, 'slot-13-place-2')[0]!.fill).toEqual({ from: 'unsure', to: 'fails', share: 1 });
    expect(rects(drawing, 'slot-30-place-2')[0]!.fill).toMatchObject({ to: 'steel' });
  });
  it('hatches a place that was not read and says how many', () => {
    const drawing = bore([[5, 2, null], [6, 2, null]]);
    expect(at(drawing, 'slot-5-place-3').map((s) => s.kind)).toEqual(['hatch']);
    expect(drawing.description).toContain('2 places were not read (hatched).');
    expect(drawing.table?.rows[4]![3]).toBe('–');
  });
  it('hatches the slots between readings that no place covers', () => {
    const slotNumbers = [1, 2, 3, 4, 5, 6, 20, 21, 22, 23, 24, 25];
    const drawing = bore([], {}, slotNumbers);
    const hatch = drawing.shapes.flatMap((s) => (s.kind === 'hatch' ? [s] : []));
    const slot = (FIELD.right - FIELD.left) / 36;
    expect(hatch.reduce((sum, h) => sum + h.width, 0)).toBeCloseTo(24 * slot, 6);
    for (const h of hatch) expect(h.height).toBe(150);
  });
  it('lays every second slot twice as wide, and the one at the seam at both edges', () => {
    const slotNumbers = Array.from({ length: 18 }, (_, i) => 2 * i + 1);
    const drawing = bore([], {}, slotNumbers);
    const cells = drawing.shapes.flatMap((s) => (s.kind === 'rect' && s.mark?.startsWith('slot-') ? [s] : []));
    expect(cells.reduce((sum, c) => sum + c.width * c.height, 0)).toBeCloseTo((FIELD.right - FIELD.left) * 150, 3);
    expect(rects(drawing, 'slot-1-place-1')).toHaveLength(2);
    expect(drawing.shapes.some((s) => s.kind === 'hatch')).toBe(false);
  });
  it('frames a spot, marks its hottest place, and names its slots, its length and its rise', () => {
    const drawing = bore(RUB);
    const [frame] = rects(drawing, 'spot-1');
    const slot = (FIELD.right - FIELD.left) / 36;
    expect(frame!.x).toBeCloseTo(FIELD.left + 10 * slot, 6);
    expect(frame!.width).toBeCloseTo(5 * slot, 6);
    expect(frame!.stroke).toBe('fails');
    const peak = at(drawing, 'spot-1').find((s) => s.kind === 'circle');
    expect(peak?.kind === 'circle' && peak.cx).toBeCloseTo(FIELD.left + 12.5 * slot, 6);
    expect(drawing.description).toContain('Slots 11–15, 20 mm to 60 mm: 24.3 K over the mean, hottest at slot 13.');
  });
  it('frames a spot that runs over the last slot at both edges', () => {
    const frames = rects(bore(SEAM), 'spot-1');
    expect(frames).toHaveLength(2);
    expect(Math.min(...frames.map((f) => f.x))).toBeCloseTo(FIELD.left, 6);
    expect(Math.max(...frames.map((f) => f.x + f.width))).toBeCloseTo(FIELD.right, 6);
    expect(bore(SEAM).description).toContain('Slots 35–2, at 60 mm');
  });
  it('a ring that is warm all round is one frame over the whole width', () => {
    const frames = rects(bore(Array.from({ length: 36 }, (_, i) => [i + 1, 3, 32] as const)), 'spot-1');
    expect(frames).toHaveLength(1);
    expect(frames[0]!.width).toBeCloseTo(FIELD.right - FIELD.left, 6);
  });
  it('says that a sound core has no spot, with its warmest place', () => {
    expect(bore([[7, 2, 28]]).description).toBe('No hot spot. The warmest place is 3.0 K over the mean.');
  });
  it('gives lengths and rises in inches and °F to whoever reads them', () => {
    const drawing = bore(RUB, { units: 'inch-pound' });
    expect(drawing.description).toContain('Slots 11–15, 0.79 in to 2.36 in: 43.7 °F over the mean');
    expect(drawing.table?.columns[1]).toBe('0.79 in');
  });
  it('keeps its words inside the frame and off each other, wide and narrow', () => {
    const many: Warm = [2, 6, 10, 14, 18, 22, 26, 30].map((slot, i) => [slot, i % 4, 40] as const);
    for (const narrow of [false, true]) {
      for (const warm of [[], RUB, SEAM, many]) {
        const drawing = bore(warm, { narrow, endWords: 'drive end' });
        expect(outOfFrame(drawing)).toEqual([]);
        expect(overlapping(drawing)).toEqual([]);
        expect(faultsOf(drawing.shapes)).toEqual([]);
      }
    }
    expect(wordsOf(bore(many)).join(' ')).toContain('2 more spots.');
  });
  it('says what is wrong with a map instead of drawing it', () => {
    const drawing = unrolledBoreDrawing({ map: { ...mapOf([]), slots: 2 }, rises: [], heatFullK: 10 });
    expect(drawing.description).toContain('Count the slots');
    expect(drawing.shapes.every((s) => s.kind === 'text')).toBe(true);
    expect(outOfFrame(drawing)).toEqual([]);
  });
  it('refuses full heat of nothing and a rise that is no number', () => {
    const map = mapOf([]);
    for (const heatFullK of [0, -1, NaN]) expect(() => unrolledBoreDrawing({ map, rises: riseMap(map, reference), heatFullK })).toThrow(RangeError);
    expect(() => unrolledBoreDrawing({ map, rises: map.celsius.map((row) => row.map(() => NaN)), heatFullK: 10 })).toThrow(RangeError);
  });
  it('never writes anything but finite numbers, and covers the bore whatever was read', () => {
    const slots = fc.uniqueArray(fc.integer({ min: 1, max: 36 }), { minLength: 1, maxLength: 36 }).map((s) => s.sort((a, b) => a - b));
    fc.assert(
      fc.property(slots, (slotNumbers) => {
        const drawing = bore([], {}, slotNumbers);
        expect(faultsOf(drawing.shapes)).toEqual([]);
        const covered = drawing.shapes.reduce((sum, s) => sum + ((s.kind === 'rect' && s.mark?.startsWith('slot-')) || s.kind === 'hatch' ? s.width * s.height : 0), 0);
        expect(covered / ((FIELD.right - FIELD.left) * 150)).toBeCloseTo(1, 6);
      }),
      { numRuns: 80 },
    );
  });
});
