import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, wordsOf } from './drawn-extent.fixture.js';
import { stripDrawing, type StripBar, type StripDrawingInput } from './strip-drawing.js';

const before: StripBar = { label: 'before', value: 2.03, uncertainty: 0.14, words: '2.03 ± 0.14' };
const after: StripBar = { label: 'after', value: 2.41, uncertainty: 0.17, words: '2.41 ± 0.17' };
const strip = (over: Partial<StripDrawingInput> = {}) =>
  stripDrawing({ before, after: [after], limit: { value: 2.436, words: 'limit +20 % (2.44)' }, increase: { figure: '+18.7 %', interval: '± 2.4 points' }, unit: 'W/kg', ...over });
const bars = (drawing: ReturnType<typeof strip>) => drawing.shapes.flatMap((s) => (s.kind === 'rect' ? [s] : []));
const hatch = (drawing: ReturnType<typeof strip>) => drawing.shapes.find((s) => s.kind === 'hatch');
const whiskers = (drawing: ReturnType<typeof strip>) => drawing.shapes.flatMap((s) => (s.kind === 'path' && s.stroke === 'text' ? [[...s.d.matchAll(/[ML]([\d.]+)/g)].map((m) => Number(m[1]))] : []));

describe('stripDrawing', () => {
  it('draws both bars from one zero in one scale', () => {
    const [first, second] = bars(strip());
    expect(first!.x).toBe(second!.x);
    expect(second!.width / first!.width).toBeCloseTo(2.41 / 2.03, 6);
  });

  it('gives each bar its own uncertainty in the same scale', () => {
    const drawing = strip();
    const perWatt = bars(drawing)[0]!.width / 2.03;
    const [first, second] = whiskers(drawing);
    expect((Math.max(...first!) - Math.min(...first!)) / perWatt).toBeCloseTo(0.28, 2);
    expect((Math.max(...second!) - Math.min(...second!)) / perWatt).toBeCloseTo(0.34, 2);
  });

  it('hatches the zone from the limit on', () => {
    const drawing = strip();
    const zone = hatch(drawing);
    const perWatt = bars(drawing)[0]!.width / 2.03;
    expect(zone?.kind === 'hatch' && (zone.x - bars(drawing)[0]!.x) / perWatt).toBeCloseTo(2.436, 2);
  });

  it('lets the limit be seen through a bar that passes it', () => {
    const drawing = strip({ after: [{ ...after, value: 3, words: '3.00 ± 0.2' }] });
    const line = drawing.shapes.findIndex((s) => s.kind === 'path' && s.stroke === 'fails');
    const lastBar = drawing.shapes.findLastIndex((s) => s.kind === 'rect');
    expect(line).toBeGreaterThan(lastBar);
  });

  it('says that the increase is not established where there is no test before', () => {
    const drawing = strip({ before: null, increase: null });
    expect(wordsOf(drawing)).toContain('Increase not established: there is no test before.');
    expect(bars(drawing)).toHaveLength(1);
  });

  it('says that the test after is to come where there is only one before', () => {
    const drawing = strip({ after: [], increase: null });
    expect(wordsOf(drawing)).toContain('The test after is still to come.');
    expect(drawing.table?.rows).toHaveLength(1);
  });

  it('says so where there is no test at all', () => {
    const drawing = strip({ before: null, after: [], increase: null });
    expect(wordsOf(drawing)).toEqual(['No core test yet.']);
    expect(drawing.table).toBeUndefined();
  });

  it('draws without a limit where none applies', () => {
    expect(hatch(strip({ limit: null }))).toBeUndefined();
  });

  it('grows by a row for each repeat and keeps its words inside the frame', () => {
    const repeated = strip({ after: [after, { ...after, label: 'after, 2nd' }, { ...after, label: 'after repair' }] });
    expect(bars(repeated)).toHaveLength(4);
    expect(repeated.height).toBeGreaterThan(strip().height);
    for (const drawing of [strip(), repeated, strip({ before: null, after: [], increase: null }), strip({ limit: { value: 0.3, words: 'limit 0.30 W/kg' } })]) {
      expect(outOfFrame(drawing)).toEqual([]);
      expect(faultsOf(drawing.shapes)).toEqual([]);
    }
  });

  it('fits a phone with its words over the bars, in the same proportions', () => {
    const narrow = strip({ narrow: true, after: [after, { ...after, label: 'after repair', value: 12.06, words: '12.06 ± 0.84' }] });
    expect(narrow.width).toBe(340);
    expect(outOfFrame(narrow)).toEqual([]);
    expect(faultsOf(narrow.shapes)).toEqual([]);
    expect(bars(narrow)[1]!.width / bars(narrow)[0]!.width).toBeCloseTo(2.41 / 2.03, 6);
    for (const empty of [strip({ narrow: true, before: null, increase: null }), strip({ narrow: true, before: null, after: [], increase: null })]) expect(outOfFrame(empty)).toEqual([]);
  });

  it('keeps the words of a limit that lies at the very edge inside the frame', () => {
    for (const narrow of [true, false]) {
      expect(outOfFrame(strip({ narrow, limit: { value: 0.05, words: 'limit 0.05 W/kg, shop practice' } }))).toEqual([]);
      expect(outOfFrame(strip({ narrow, limit: { value: 9, words: 'limit 9.00 W/kg, shop practice' } }))).toEqual([]);
    }
  });

  it('tells the same in words', () => {
    expect(strip().description).toBe('before 2.03 ± 0.14 W/kg; after 2.41 ± 0.17 W/kg. limit +20 % (2.44). Increase +18.7 % ± 2.4 points.');
  });

  it('refuses a bar whose value is no number', () => {
    expect(() => strip({ after: [{ ...after, value: Number.NaN }] })).toThrow(RangeError);
  });
});
