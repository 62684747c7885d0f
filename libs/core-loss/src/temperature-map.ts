import { OutOfRangeError } from '@libs/quantities';
import type { Reason } from './core-test.js';

/** Temperatures read over the bore (or the outside of an armature): one row a slot, one column a place along the core. */
export interface TemperatureMap {
  /** Slots of the core: the map closes round the bore behind the last one. */
  slots: number;
  /** The slots that were read, rising; all of them, or every second, third … */
  slotNumbers: readonly number[];
  /** Places along the core, rising, from the end that the shop measures from. */
  axialM: readonly number[];
  /** `celsius[row][column]`; null where nothing was read or there is no iron, such as a duct. */
  celsius: readonly (readonly (number | null)[])[];
}

/**
 * What a rise is counted from.
 *
 * - `mean`: the mean of the map, or the core's mean as read otherwise
 * - `ambient`: the air of the bay
 * - `start`: the core before it was excited, one figure or a map of the same places
 * - `adjacent`: the core beside each place, the middle value within so many slots to either side; no standard says how far that is
 */
export type MapReference =
  | { kind: 'mean'; meanC?: number }
  | { kind: 'ambient'; ambientC: number }
  | { kind: 'start'; startC: number | readonly (readonly (number | null)[])[] }
  | { kind: 'adjacent'; slotsEachSide?: number };

/** Rises in K at the places of a map; null where nothing was read or nothing is known to count from. */
export type RiseMap = (number | null)[][];

const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
const COLDEST = -60;
const HOTTEST = 800;
/** Slots to either side that count as adjacent when nothing is said: wider than a usual spot, narrower than the bore. */
export const ADJACENT_SLOTS = 6;
/** Fewer readings beside a place than this say nothing about its surroundings. */
const LEAST_NEIGHBOURS = 3;

/**
 * Everything that is wrong with a map. It never throws.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `map` | °C, m | anything |
 *
 * @returns an empty list when the map can be used; a map with holes can
 *
 * Standing: common practice.
 * @example
 * mapProblems({ slots: 36, slotNumbers: [1, 2], axialM: [0.05], celsius: [[25], [NaN]] }).map((p) => p.code)
 * // → ['temperature']
 */
export function mapProblems(map: TemperatureMap): Reason[] {
  const problems: Reason[] = [];
  const say = (code: string, words: string) => void problems.push({ code, words });
  const { slots, slotNumbers, axialM, celsius } = map;
  const rising = (values: readonly number[]) => values.every((v, i) => i === 0 || v > (values[i - 1] ?? v));
  if (!(Number.isInteger(slots) && slots >= 3 && slots <= 1000)) say('slots', 'Count the slots: a whole number, 3 or more.');
  else if (!(slotNumbers.length > 0 && slotNumbers.every((s) => Number.isInteger(s) && s >= 1 && s <= slots) && rising(slotNumbers))) {
    say('slot-numbers', `Number the slots that were read from 1 to ${slots}, rising, each once.`);
  }
  if (!(axialM.length > 0 && axialM.every((x) => finite(x) && x >= 0) && rising(axialM))) say('axial', 'Give the places along the core from one end, rising, each once.');
  if (celsius.length !== slotNumbers.length || celsius.some((row) => row.length !== axialM.length)) {
    say('shape', 'The readings need one row for each slot and one figure (or a hole) for each place along the core.');
  }
  const read = celsius.flat().filter((t) => t !== null);
  if (read.some((t) => !(finite(t) && t >= COLDEST && t <= HOTTEST))) say('temperature', `A reading must be a temperature from ${COLDEST} to ${HOTTEST} °C; leave a hole where nothing was read.`);
  if (read.length === 0) say('empty', 'Nothing was read yet.');
  return problems;
}

function checkedMap(map: TemperatureMap): TemperatureMap {
  const [problem] = mapProblems(map);
  if (problem) throw new OutOfRangeError(problem.code, problem.words);
  return map;
}

const mean = (values: readonly number[]) => values.reduce((sum, v) => sum + v, 0) / values.length;
const middle = (values: readonly number[]) => {
  const sorted = [...values].sort((a, b) => a - b);
  const half = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? (sorted[half] ?? NaN) : ((sorted[half - 1] ?? NaN) + (sorted[half] ?? NaN)) / 2;
};

/** Slots from one to the other the short way round. */
const slotsApart = (a: number, b: number, slots: number) => Math.min(Math.abs(a - b), slots - Math.abs(a - b));

function adjacentC(map: TemperatureMap, row: number, column: number, each: number): number | null {
  const here = map.slotNumbers[row] ?? 0;
  const beside = map.slotNumbers.flatMap((slot, i) => {
    const value = map.celsius[i]?.[column];
    return i !== row && slotsApart(slot, here, map.slots) <= each && finite(value) ? [value] : [];
  });
  return beside.length >= LEAST_NEIGHBOURS ? middle(beside) : null;
}

const given = (value: number | undefined, field: string, words: string): number => {
  if (!finite(value)) throw new OutOfRangeError(field, words);
  return value;
};

/**
 * Rises over a reference, place by place.
 *
 * `ΔT = T − T_ref`, T_ref by the kind of reference
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | T | `map.celsius` | °C | with holes where nothing was read |
 * | T_ref | `reference` | °C | mean, ambient, start or adjacent |
 *
 * Over the mean a warm core is no faulty core. Over ambient or start the core's own rise is in the figure. Over the adjacent core a broad warm
 * zone disappears: the middle value of the places within 6 slots to either side, at the same place along the core.
 *
 * @returns K; null where nothing was read, and for `adjacent` where fewer than three places beside it were
 * @throws OutOfRangeError when the map or the reference cannot be used
 *
 * Source: the kinds of reference that hot-spot limits are stated over. Standing: common practice; how far adjacent reaches is the product's own.
 * @example
 * riseMap({ slots: 36, slotNumbers: [1, 2, 3], axialM: [0.1], celsius: [[24], [36], [null]] }, { kind: 'mean' })
 * // → [[-6], [6], [null]]
 */
export function riseMap(map: TemperatureMap, reference: MapReference): RiseMap {
  const from = referenceFor(checkedMap(map), reference);
  return map.celsius.map((row, i) =>
    row.map((value, j) => {
      const base = from(i, j);
      return value === null || base === null ? null : value - base;
    }),
  );
}

function referenceFor(map: TemperatureMap, reference: MapReference): (row: number, column: number) => number | null {
  switch (reference.kind) {
    case 'mean': {
      const all = map.celsius.flat().filter(finite);
      const meanC = reference.meanC === undefined ? mean(all) : given(reference.meanC, 'meanC', 'The mean of the core must be a temperature.');
      return () => meanC;
    }
    case 'ambient': {
      const ambientC = given(reference.ambientC, 'ambientC', 'Read the ambient temperature.');
      return () => ambientC;
    }
    case 'start': {
      const { startC } = reference;
      if (typeof startC === 'number') {
        const one = given(startC, 'startC', 'Read the core before it is excited.');
        return () => one;
      }
      if (startC.length !== map.celsius.length || startC.some((row) => row.length !== map.axialM.length)) {
        throw new OutOfRangeError('startC', 'The map of the start needs the same places as the map of the test.');
      }
      return (row, column) => {
        const value = startC[row]?.[column];
        return value === null || value === undefined ? null : given(value, 'startC', 'A reading of the start must be a temperature.');
      };
    }
    case 'adjacent': {
      const each = reference.slotsEachSide ?? ADJACENT_SLOTS;
      if (!(Number.isInteger(each) && each >= 1)) throw new OutOfRangeError('slotsEachSide', 'Adjacent reaches over a whole number of slots, 1 or more.');
      return (row, column) => adjacentC(map, row, column, each);
    }
  }
}

/**
 * The hottest place of each slot, for the ring drawing.
 *
 * @returns rise in K by slot number; a slot without any reading is left out
 * @throws OutOfRangeError as `riseMap`
 *
 * Standing: common practice.
 * @example
 * [...heatBySlot({ slots: 36, slotNumbers: [1, 2], axialM: [0.1, 0.2], celsius: [[24, 25], [27, 28]] }, { kind: 'ambient', ambientC: 20 })]
 * // → [[1, 5], [2, 8]]
 */
export function heatBySlot(map: TemperatureMap, reference: MapReference): Map<number, number> {
  const rises = riseMap(map, reference);
  return new Map(
    map.slotNumbers.flatMap((slot, i): [number, number][] => {
      const known = (rises[i] ?? []).filter(finite);
      return known.length > 0 ? [[slot, Math.max(...known)]] : [];
    }),
  );
}
