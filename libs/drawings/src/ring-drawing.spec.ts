import type { CoreGeometry } from '@libs/core-loss';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, radiiOf, textExtent, textsOf, wordsOf } from './drawn-extent.fixture.js';
import { ringDrawing, type RingDrawingInput } from './ring-drawing.js';

/** 400 by 260 mm, 36 slots 35 mm deep: an invented core. */
const stator: CoreGeometry = { kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.035, slots: 36, stackLengthM: 0.3, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 };
const armature: CoreGeometry = { ...stator, kind: 'armature', outerDiameterM: 0.38, innerDiameterM: 0.17, slotDepthM: 0.036, slots: 46 };
const centre = { x: 150, y: 132 };
const ring = (over: Partial<RingDrawingInput> = {}) => ringDrawing({ geometry: stator, turns: 5, reading: { figure: '2.41', unit: 'W/kg', below: '1.32 T, 50 Hz' }, cableWords: '5 turns, 22.3 V each', ...over });
const slotPaths = (drawing: ReturnType<typeof ring>, slot: number) => drawing.shapes.flatMap((s) => (s.kind === 'path' && s.mark === `slot-${slot}` ? [s] : []));
const cables = (drawing: ReturnType<typeof ring>) => drawing.shapes.filter((s) => s.kind === 'path' && s.stroke === 'copper');

describe('ringDrawing', () => {
  it('draws every radius of a stator in one scale', () => {
    const [yoke, tooth] = slotPaths(ring(), 1).map((s) => radiiOf(s.d, centre));
    const scale = Math.max(...yoke!) / 0.2;
    expect(Math.min(...yoke!) / scale).toBeCloseTo(0.26 / 2 + 0.035, 3);
    expect(Math.min(...tooth!) / scale).toBeCloseTo(0.26 / 2, 3);
  });

  it('puts the slots of an armature on the outside and its back iron inside', () => {
    const [yoke, tooth] = slotPaths(ring({ geometry: armature }), 1).map((s) => radiiOf(s.d, centre));
    const scale = Math.max(...tooth!) / 0.19;
    expect(Math.max(...yoke!) / scale).toBeCloseTo(0.19 - 0.036, 3);
    expect(Math.min(...yoke!) / scale).toBeCloseTo(0.085, 3);
  });

  it('draws as many slots as the core has', () => {
    const marks = new Set(ring().shapes.map((s) => s.mark).filter(Boolean));
    expect(marks.size).toBe(36);
  });

  it('leads each turn of the cable through the middle and past the outside', () => {
    const drawn = cables(ring({ turns: 7 }));
    expect(drawn).toHaveLength(7);
    for (const turn of drawn) {
      const [inside, outside] = radiiOf(turn.kind === 'path' ? turn.d : '', centre);
      expect(inside).toBeLessThan((0.13 / 0.2) * 112);
      expect(outside).toBeGreaterThan(112);
    }
  });

  it('thins out more turns than can be told apart and says how many there are', () => {
    const many = ring({ turns: 41, cableWords: undefined });
    expect(cables(many)).toHaveLength(24);
    expect(wordsOf(many)).toContain('41 turns');
    expect(many.description).toContain('41 turns of the loop cable (24 drawn)');
  });

  it('keeps neighbouring turns apart at the inside, where they are closest', () => {
    const ends = cables(ring({ turns: 30 })).map((s) => (s.kind === 'path' ? /^M([\d.-]+) ([\d.-]+)/.exec(s.d)!.slice(1).map(Number) : []));
    const width = cables(ring({ turns: 30 }))[0]!;
    const gaps = ends.slice(1).map((p, i) => Math.hypot(p[0]! - ends[i]![0]!, p[1]! - ends[i]![1]!));
    expect(Math.min(...gaps)).toBeGreaterThan((width.kind === 'path' ? width.strokeWidth! : 0) + 0.3);
  });

  it('draws no cable where no turns are planned', () => {
    expect(cables(ring({ turns: 0 }))).toHaveLength(0);
    expect(cables(ring({ turns: Number.NaN }))).toHaveLength(0);
  });

  it('writes the reading in the bore, and beside the core where the bore is too narrow', () => {
    const figure = (d: ReturnType<typeof ring>) => textsOf(d).find((t) => t.text === '2.41')!;
    expect(figure(ring()).x).toBe(centre.x);
    const narrow = ring({ geometry: { ...stator, innerDiameterM: 0.06 } });
    expect(figure(narrow).anchor).toBe('end');
    expect(outOfFrame(narrow)).toEqual([]);
  });

  it('keeps the reading clear of the cable, in a wide bore and in a narrow one', () => {
    for (const geometry of [stator, armature]) {
      const drawing = ring({ geometry, turns: 24 });
      const inside = Math.min(...cables(drawing).map((s) => (s.kind === 'path' ? radiiOf(s.d, centre)[0]! : 0)));
      const lines = textsOf(drawing).filter((t) => t.x === centre.x && Math.abs(t.y - centre.y) < 50);
      expect(lines).toHaveLength(3);
      // the cable comes in at the lower right: the corner of the words that lies there is the one it could touch
      for (const e of lines.map(textExtent)) expect(Math.hypot(e.right - centre.x, Math.max(0, e.bottom - centre.y))).toBeLessThan(inside);
    }
  });

  it('keeps all words inside the frame', () => {
    for (const drawing of [ring(), ring({ geometry: armature }), ring({ geometry: null }), ring({ geometry: { ...stator, slotDepthM: 0.2 } })]) expect(outOfFrame(drawing)).toEqual([]);
  });

  it('paints a slot at the limit as failing, a cool one as steel, and marks the hottest', () => {
    const hot = ring({ heat: new Map([[9, 5], [10, 11.8], [11, 0.4]]), heatFullK: 10, hottestSlot: 10 });
    expect(slotPaths(hot, 10)[0]!.fill).toEqual({ from: 'unsure', to: 'fails', share: 1 });
    expect(slotPaths(hot, 11)[0]!.fill).toMatchObject({ to: 'steel' });
    expect(slotPaths(hot, 9)[0]!.fill).toMatchObject({ to: 'unsure' });
    expect(hot.shapes.some((s) => s.kind === 'circle' && s.mark === 'slot-10')).toBe(true);
    expect(hot.table?.rows).toEqual([['9', '5.0'], ['10', '11.8'], ['11', '0.4']]);
  });

  it('gives its table and its words in inches and °F to whoever reads them', () => {
    const inches = ring({ units: 'inch-pound', heat: new Map([[10, 10]]) });
    expect(inches.table).toEqual({ columns: ['slot', '°F over mean'], rows: [['10', '18.0']] });
    expect(inches.description).toContain('outside 15.75 in');
  });

  it('says what is missing instead of drawing a core that cannot be', () => {
    expect(wordsOf(ring({ geometry: null })).join(' ')).toContain('size');
    const noIron = ring({ geometry: { ...stator, slotDepthM: 0.08 } });
    expect(noIron.shapes.some((s) => s.mark)).toBe(false);
    expect(noIron.description).not.toBe('');
    const missing = ring({ geometry: { ...stator, outerDiameterM: Number.NaN } });
    expect(missing.description).toContain('outside diameter');
  });

  it('ignores a hottest slot the core does not have', () => {
    expect(ring({ hottestSlot: 99 }).shapes.some((s) => s.kind === 'circle')).toBe(false);
  });

  it('never writes anything but finite numbers, whatever is typed', () => {
    const figure = fc.oneof(fc.double({ min: 0.001, max: 3, noNaN: true }), fc.constantFrom(Number.NaN, Infinity, -1, 0));
    fc.assert(
      fc.property(fc.constantFrom('stator' as const, 'armature' as const), figure, figure, figure, fc.integer({ min: 0, max: 200 }), fc.integer({ min: 0, max: 90 }), (kind, outerDiameterM, innerDiameterM, slotDepthM, slots, turns) => {
        const drawing = ring({ geometry: { ...stator, kind, outerDiameterM, innerDiameterM, slotDepthM, slots }, turns, heat: new Map([[1, 3]]), hottestSlot: 1 });
        expect(faultsOf(drawing.shapes)).toEqual([]);
      }),
      { numRuns: 150 },
    );
  });
});
