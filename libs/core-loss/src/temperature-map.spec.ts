import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findHotSpots, type HotSpotLimits, type HotSpotMap } from './hot-spots.js';
import { heatBySlot, mapProblems, riseMap, type MapReference, type TemperatureMap } from './temperature-map.js';

type Cells = (number | null)[][];
/** A whole core at 25 °C with some places warmer: `[slot, column, °C]`. */
function core(warm: readonly (readonly [number, number, number | null])[] = [], slots = 36, axialM = [0.02, 0.06, 0.1, 0.14]): TemperatureMap {
  const celsius: Cells = Array.from({ length: slots }, () => axialM.map(() => 25));
  for (const [slot, column, value] of warm) celsius[slot - 1]![column] = value;
  return { slots, slotNumbers: Array.from({ length: slots }, (_, i) => i + 1), axialM, celsius };
}
const over25: MapReference = { kind: 'mean', meanC: 25 };
const limits: HotSpotLimits = { limitK: 10, warnK: 5, fluxDensityT: 1.32, referenceFluxT: 1.32, expandedUncertaintyK: 1 };
const told = (map: HotSpotMap) => {
  if (map.outcome !== 'told') throw new Error(map.reasons.map((r) => r.code).join());
  return map;
};
const find = (map: TemperatureMap, reference = over25, over: Partial<HotSpotLimits> = {}) => told(findHotSpots(map, reference, { ...limits, ...over }));

describe('Rises over four kinds of reference', () => {
  const map = core([[5, 1, 41], [9, 0, null]]);
  it('over the mean: of the map itself, or of the core as read otherwise', () => {
    const mean = map.celsius.flat().filter((t): t is number => t !== null).reduce((s, t, _i, all) => s + t / all.length, 0);
    expect(riseMap(map, { kind: 'mean' })[4]![1]).toBeCloseTo(41 - mean, 9);
    expect(riseMap(map, over25)[4]![1]).toBe(16);
  });
  it('over ambient and over the start the core’s own rise is in the figure', () => {
    expect(riseMap(map, { kind: 'ambient', ambientC: 20 })[0]![0]).toBe(5);
    expect(riseMap(map, { kind: 'start', startC: 21 })[4]![1]).toBe(20);
    const start: Cells = map.celsius.map((row) => row.map(() => 22));
    start[4]![1] = null;
    expect(riseMap(map, { kind: 'start', startC: start })[0]![0]).toBe(3);
    expect(riseMap(map, { kind: 'start', startC: start })[4]![1]).toBeNull();
  });
  it('over the adjacent core a narrow spot stays and a broad warm zone disappears', () => {
    const zone = core([...Array.from({ length: 18 }, (_, i) => [i + 1, 0, 31] as const), [9, 0, 43]]);
    expect(riseMap(zone, { kind: 'adjacent' })[8]![0]).toBe(12);
    expect(riseMap(zone, { kind: 'adjacent' })[4]![0]).toBe(0);
    expect(riseMap(zone, over25)[4]![0]).toBe(6);
  });
  it('adjacent reaches round the bore, and says nothing where too little was read beside', () => {
    expect(riseMap(core([[36, 2, 40], [1, 2, 25]]), { kind: 'adjacent' })[35]![2]).toBe(15);
    const lonely: TemperatureMap = { slots: 36, slotNumbers: [1, 12, 24], axialM: [0.1], celsius: [[30], [25], [25]] };
    expect(riseMap(lonely, { kind: 'adjacent' })).toEqual([[null], [null], [null]]);
  });
  it('a hole stays a hole', () => {
    for (const reference of [over25, { kind: 'mean' }, { kind: 'ambient', ambientC: 20 }, { kind: 'adjacent' }] as MapReference[]) expect(riseMap(map, reference)[8]![0]).toBeNull();
  });
  it('the hottest of each slot goes to the ring', () => {
    const heat = heatBySlot(map, over25);
    expect(heat.get(5)).toBe(16);
    expect(heat.get(9)).toBe(0);
    expect(heatBySlot({ ...map, celsius: map.celsius.map((row, i) => (i === 8 ? row.map(() => null) : row)) }, over25).has(9)).toBe(false);
  });
});

describe('Hot spots of a map', () => {
  // Source: sample shop, machine 3: rub at the bore, slots 11 to 15, 40 mm from the end, 24.3 K over the mean.
  it('a rub over slots 11 to 15 is one spot with its slots, its place and its peak', () => {
    const rub = [[11, 0, 31], [12, 0, 38], [12, 1, 35], [13, 1, 49.3], [14, 1, 40], [14, 0, 33], [15, 2, 31]] as const;
    const { spots, hottestSlot } = find(core(rub, 36, [0.02, 0.04, 0.08, 0.12]));
    expect(spots).toHaveLength(1);
    expect(spots[0]).toMatchObject({ slotsInWords: '11–15', fromAxialM: 0.02, toAxialM: 0.08, peakSlot: 13, peakAxialM: 0.04, places: 7, verdict: 'does-not-conform', touchesHole: false });
    expect(spots[0]!.peakK).toBeCloseTo(24.3, 9);
    expect(hottestSlot).toBe(13);
  });
  it('a spot over the last and the first slot is one spot', () => {
    const { spots } = find(core([[35, 1, 33], [36, 1, 38], [1, 1, 36], [2, 1, 32]]));
    expect(spots.map((s) => [s.fromSlot, s.toSlot, s.slotsInWords, s.peakSlot])).toEqual([[35, 2, '35–2', 36]]);
  });
  it('two spots apart are two, hottest first, each with its own verdict', () => {
    const { spots } = find(core([[5, 0, 33], [20, 3, 38], [21, 2, 34]]));
    expect(spots.map((s) => [s.slotsInWords, s.verdict])).toEqual([['20–21', 'does-not-conform'], ['5', 'conforms']]);
  });
  it('a peak within its uncertainty of the limit is inconclusive', () => expect(find(core([[5, 0, 34.5]])).spots[0]!.verdict).toBe('inconclusive'));
  it('the limit goes with flux squared', () => {
    const half = find(core([[5, 0, 32]]), over25, { fluxDensityT: 0.9 });
    expect(half.limitK).toBeCloseTo(10 * (0.9 / 1.32) ** 2, 12);
    expect(half.warnK).toBeCloseTo(5 * (0.9 / 1.32) ** 2, 12);
    expect(half.spots[0]!.verdict).toBe('does-not-conform');
    expect(find(core([[5, 0, 32]])).spots[0]!.verdict).toBe('conforms');
  });
  it('a sound core has none, and its hottest place is still told', () => {
    const sound = find(core([[7, 2, 28]]));
    expect(sound.spots).toEqual([]);
    expect(sound).toMatchObject({ hottestK: 3, hottestSlot: 7, hottestAxialM: 0.1, placesRead: 144, placesMissing: 0, notes: [] });
  });
  it('a ring that is warm all round is said to be so', () => {
    const { spots } = find(core(Array.from({ length: 36 }, (_, i) => [i + 1, 3, 32] as const)));
    expect(spots.map((s) => s.slotsInWords)).toEqual(['all round']);
  });
  it('a spot beside a hole may be larger, and a hole does not join two spots', () => {
    const at = find(core([[5, 1, 38], [6, 1, null], [7, 1, 38], [6, 0, null], [6, 2, null]]));
    expect(at.spots).toHaveLength(2);
    expect(at.spots.every((s) => s.touchesHole)).toBe(true);
    expect(at.notes.map((n) => n.code)).toEqual(['spot-at-hole']);
  });
  it('every second slot is enough, and what lies between is said', () => {
    const slotNumbers = Array.from({ length: 18 }, (_, i) => 2 * i + 1);
    const map: TemperatureMap = { slots: 36, slotNumbers, axialM: [0.05], celsius: slotNumbers.map((s) => [s === 35 || s === 1 ? 37 : 25]) };
    const found = find(map);
    expect(found.spots.map((s) => s.slotsInWords)).toEqual(['35–1']);
    expect(found.notes.map((n) => n.code)).toEqual(['slots-not-read']);
  });
  it('two parts of the bore with a gap between are not joined over it', () => {
    const slotNumbers = [1, 2, 3, 4, 20, 21, 22, 23];
    const found = find({ slots: 36, slotNumbers, axialM: [0.05], celsius: slotNumbers.map((s) => [s === 4 || s === 20 || s === 23 || s === 1 ? 37 : 25]) });
    expect(found.spots.map((s) => s.slotsInWords).sort()).toEqual(['1', '20', '23', '4']);
  });
  it('a map full of holes tells nothing, and says so', () => {
    const map = core();
    const holes = { ...map, celsius: map.celsius.map((row, i) => row.map((t) => (i < 20 ? null : t))) };
    expect(findHotSpots(holes, over25, limits)).toMatchObject({ outcome: 'not-told', reasons: [{ code: 'too-many-holes' }] });
  });
});

describe('What holds for every map', () => {
  const cells = fc.array(fc.array(fc.option(fc.double({ min: 20, max: 60, noNaN: true }), { freq: 6 }), { minLength: 3, maxLength: 3 }), { minLength: 12, maxLength: 12 });
  const mapOf = (celsius: Cells): TemperatureMap => ({ slots: 12, slotNumbers: celsius.map((_, i) => i + 1), axialM: [0.1, 0.2, 0.3], celsius });
  it('every warm place belongs to exactly one spot, and no cool one to any', () => {
    fc.assert(
      fc.property(cells, (celsius) => {
        const found = findHotSpots(mapOf(celsius), { kind: 'ambient', ambientC: 20 }, { ...limits, limitK: 20, warnK: 15 });
        if (found.outcome !== 'told') return;
        const warm = celsius.flat().filter((t) => t !== null && t - 20 > 15).length;
        expect(found.spots.reduce((sum, s) => sum + s.places, 0)).toBe(warm);
        for (const spot of found.spots) expect(spot.peakK).toBeGreaterThan(15);
      }),
    );
  });
  it('turning the core turns the spots and changes nothing else', () => {
    fc.assert(
      fc.property(cells, fc.integer({ min: 1, max: 11 }), (celsius, by) => {
        const of = (c: Cells) => findHotSpots(mapOf(c), { kind: 'ambient', ambientC: 20 }, { ...limits, limitK: 20, warnK: 15 });
        const [still, turned] = [of(celsius), of([...celsius.slice(by), ...celsius.slice(0, by)])];
        expect(turned.outcome).toBe(still.outcome);
        if (still.outcome !== 'told' || turned.outcome !== 'told') return;
        const shape = (m: typeof still) => m.spots.map((s) => `${s.places} ${s.peakK} ${s.verdict} ${s.touchesHole} ${(s.toSlot - s.fromSlot + 12) % 12}`).sort();
        expect(shape(turned)).toEqual(shape(still));
      }),
    );
  });
});

describe('A map that cannot be', () => {
  const good = core();
  it.each<[string, TemperatureMap, string]>([
    ['no slots', { ...good, slots: 2 }, 'slots'],
    ['slots that are not a count', { ...good, slots: NaN }, 'slots'],
    ['a slot twice', { ...good, slotNumbers: good.slotNumbers.map((s) => (s === 2 ? 1 : s)) }, 'slot-numbers'],
    ['a slot beyond the last', { ...good, slotNumbers: good.slotNumbers.map((s) => s + 1) }, 'slot-numbers'],
    ['places along the core that go back', { ...good, axialM: [0.1, 0.05, 0.2, 0.3] }, 'axial'],
    ['a place that is no number', { ...good, axialM: [0.1, NaN, 0.2, 0.3] }, 'axial'],
    ['a row too few', { ...good, celsius: good.celsius.slice(1) }, 'shape'],
    ['a reading that is no number', core([[3, 0, NaN]]), 'temperature'],
    ['an endless reading', core([[3, 0, Infinity]]), 'temperature'],
    ['nothing read', { ...good, celsius: good.celsius.map((row) => row.map(() => null)) }, 'empty'],
  ])('%s is named', (_words, map, code) => {
    expect(mapProblems(map).map((p) => p.code)).toContain(code);
    expect(() => riseMap(map, over25)).toThrow(OutOfRangeError);
    expect(() => findHotSpots(map, over25, limits)).toThrow(OutOfRangeError);
  });
  it('a good one has no problem', () => expect(mapProblems(good)).toEqual([]));
  it('references and limits that cannot be are refused', () => {
    expect(() => riseMap(good, { kind: 'mean', meanC: NaN })).toThrow(OutOfRangeError);
    expect(() => riseMap(good, { kind: 'ambient', ambientC: NaN })).toThrow(OutOfRangeError);
    expect(() => riseMap(good, { kind: 'start', startC: NaN })).toThrow(OutOfRangeError);
    expect(() => riseMap(good, { kind: 'start', startC: [[1]] })).toThrow(/same places/);
    expect(() => riseMap(good, { kind: 'adjacent', slotsEachSide: 0 })).toThrow(OutOfRangeError);
    for (const over of [{ limitK: 0 }, { warnK: 11 }, { warnK: NaN }, { fluxDensityT: NaN }, { referenceFluxT: 0 }, { expandedUncertaintyK: -1 }]) {
      expect(() => findHotSpots(good, over25, { ...limits, ...over }), JSON.stringify(over)).toThrow(OutOfRangeError);
    }
  });
});
