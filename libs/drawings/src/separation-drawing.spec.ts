import { partThatGrew, separateTwoFrequencies, type Separation } from '@libs/core-loss';
import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, wordsOf } from './drawn-extent.fixture.js';
import { overlapping } from './overlapping-words.fixture.js';
import { separationDrawing, type SeparationDrawingInput } from './separation-drawing.js';

const at = (frequencyHz: number, wattsPerKg: number) => ({ frequencyHz, fluxDensityT: 1.32, wattsPerKg });
/** An invented core: 2.6 W/kg at 50 Hz before, with its eddy part nearly doubled after. */
const before = separateTwoFrequencies(at(25, 1.1), at(50, 2.6));
const after = separateTwoFrequencies(at(25, 1.4), at(50, 3.8));
const oneFrequency = separateTwoFrequencies(at(50, 2.6), at(50, 2.6));
const tooClose = separateTwoFrequencies(at(50, 2.6), at(54, 2.85));
const answer = partThatGrew(before, after).words;
const draw = (over: Partial<SeparationDrawingInput> = {}) => {
  const drawing = separationDrawing({ before, after, answer, ...over });
  if (!drawing) throw new Error('the plot stays hidden');
  return drawing;
};
const marked = (drawing: ReturnType<typeof draw>, mark: string) => drawing.shapes.find((s) => s.mark === mark)!;
const points = (d: string) => [...d.matchAll(/[ML]([\d.-]+) ([\d.-]+)/g)].map((m) => ({ x: Number(m[1]), y: Number(m[2]) }));
const line = (drawing: ReturnType<typeof draw>, mark: string) => {
  const shape = marked(drawing, mark);
  return shape.kind === 'path' ? points(shape.d) : [];
};

describe('separationDrawing', () => {
  it('stays hidden until a test has two frequencies', () => {
    expect(separationDrawing({ before: null, after: null })).toBeNull();
    expect(separationDrawing({ before: oneFrequency, after: null })).toBeNull();
    expect(separationDrawing({ before: oneFrequency, after: oneFrequency })).toBeNull();
    expect(separationDrawing({ before, after: null })).not.toBeNull();
    expect(separationDrawing({ before: oneFrequency, after })).not.toBeNull();
  });
  it('leads each line from no frequency, where it is hysteresis, through both readings', () => {
    const drawing = draw();
    for (const name of ['before', 'after']) {
      const [zero, low] = line(drawing, `${name}-hysteresis`);
      const [from, high] = line(drawing, `${name}-eddy`);
      expect(zero!.x).toBe(40);
      expect(from).toEqual(low);
      // one straight line
      expect((low!.y - zero!.y) / (low!.x - zero!.x)).toBeCloseTo((high!.y - low!.y) / (high!.x - low!.x), 1);
    }
  });
  it('draws hysteresis and slope in one scale for both tests', () => {
    const drawing = draw();
    const rise = (name: string) => { const [a, b] = line(drawing, `${name}-eddy`); return a!.y - b!.y; };
    const slope = (s: Separation) => ('points' in s ? s.eddyPerCycleHz : NaN);
    expect(rise('after') / rise('before')).toBeCloseTo(slope(after) / slope(before), 1);
  });
  it('tells before from after by their shape, not by colour alone', () => {
    const drawing = draw();
    expect(marked(drawing, 'before-50').kind).toBe('circle');
    expect(marked(drawing, 'after-50').kind).toBe('rect');
  });
  it('says both parts with their uncertainty, and which of them grew', () => {
    const drawing = draw();
    expect(drawing.description).toContain('before: hysteresis 1.80');
    expect(drawing.description).toMatch(/eddy 0\.80 ± 0\.\d\d W\/kg at 50 Hz/);
    expect(drawing.description).toContain('sheet insulation');
    expect(drawing.table?.rows).toHaveLength(4);
    expect(drawing.table?.rows[1]![2]).toBe('52.00');
  });
  it('says why readings that lie too close do not tell, and keeps their parts to itself', () => {
    const drawing = draw({ after: tooClose, answer: undefined });
    expect(drawing.description).toContain('after: the parts cannot be told at 54 Hz.');
    expect(drawing.description).toContain('too close');
    expect(drawing.description).not.toMatch(/after: hysteresis/);
  });
  it('gives its figures per pound to whoever reads pounds', () => {
    const drawing = draw({ units: 'inch-pound' });
    expect(drawing.table?.columns[2]).toBe('mJ/lb a cycle');
    expect(Number(drawing.table?.rows[1]![2])).toBeCloseTo(52 * 0.45359237, 2);
    expect(drawing.description).toContain('W/lb');
  });
  it('keeps its words inside the frame and off each other, wide and narrow', () => {
    for (const narrow of [false, true]) {
      for (const drawing of [draw({ narrow }), draw({ narrow, after: null, answer: undefined }), draw({ narrow, after: tooClose }), draw({ narrow, units: 'inch-pound' })]) {
        expect(outOfFrame(drawing)).toEqual([]);
        expect(overlapping(drawing)).toEqual([]);
        expect(faultsOf(drawing.shapes)).toEqual([]);
        expect(drawing.width).toBe(narrow ? 340 : 560);
      }
    }
  });
  it('draws a core without hysteresis from its own zero', () => {
    const drawing = draw({ before: separateTwoFrequencies(at(25, 0.64), at(50, 2.6)), after: null, answer: undefined });
    expect(faultsOf(drawing.shapes)).toEqual([]);
    expect(line(drawing, 'before-hysteresis')[0]!.y).toBeLessThanOrEqual(210);
    expect(wordsOf(drawing).join(' ')).toContain('before');
  });
});
