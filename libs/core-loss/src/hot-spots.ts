import { judgeUpperLimit, type Verdict } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import { scaledHotSpotLimitK } from './core-judgements.js';
import type { Reason } from './core-test.js';
import { riseMap, type MapReference, type TemperatureMap } from './temperature-map.js';

export interface HotSpotLimits {
  /** As stated, at the reference flux. */
  limitK: number;
  /** Places above this are part of a spot; the limit itself when left out. */
  warnK?: number;
  fluxDensityT: number;
  referenceFluxT: number;
  expandedUncertaintyK: number;
}

/** One connected warm place. */
export interface HotSpot {
  /** First and last slot, going round with the numbers: 70 to 2 runs over the last slot. */
  fromSlot: number;
  toSlot: number;
  /** '11–15', '70–2', '7', or 'all round'. */
  slotsInWords: string;
  fromAxialM: number;
  toAxialM: number;
  peakK: number;
  peakSlot: number;
  peakAxialM: number;
  /** Places of the map that belong to it. */
  places: number;
  verdict: Verdict;
  /** It touches a place that was not read: it may be larger than it looks. */
  touchesHole: boolean;
}

export type HotSpotMap =
  | { outcome: 'told'; limitK: number; warnK: number; spots: HotSpot[]; hottestK: number; hottestSlot: number; hottestAxialM: number; placesRead: number; placesMissing: number; notes: Reason[] }
  | { outcome: 'not-told'; reasons: Reason[] };

interface Place {
  row: number;
  column: number;
}
/** Less of the map than this leaves room for a spot that nobody looked at. */
const LEAST_SHARE_READ = 0.5;

/** From each slot that was read to the next one, going round, in slots. */
const stepsRound = ({ slotNumbers, slots }: TemperatureMap) =>
  slotNumbers.map((slot, i) => (i + 1 < slotNumbers.length ? (slotNumbers[i + 1] ?? slot) - slot : (slotNumbers[0] ?? slot) + slots - slot));

/** Whether each row lies beside the next one, going round: a step well over the usual one is a gap that nobody looked into. */
function touching(map: TemperatureMap): boolean[] {
  const steps = stepsRound(map);
  const usual = [...steps].sort((a, b) => a - b)[Math.floor((steps.length - 1) / 2)] ?? 1;
  return steps.map((step) => map.slotNumbers.length >= 3 ? step <= 1.5 * usual : step <= 2);
}

/** The places beside one, corners included; the first row lies beside the last where the map closes round the bore. */
function beside({ row, column }: Place, touches: readonly boolean[], columns: number): Place[] {
  const rows = touches.length;
  const before = (row - 1 + rows) % rows;
  const reached = [row, ...(touches[row] ? [(row + 1) % rows] : []), ...(touches[before] ? [before] : [])];
  return [...new Set(reached)].flatMap((r) =>
    [column - 1, column, column + 1].filter((c) => c >= 0 && c < columns && !(r === row && c === column)).map((c) => ({ row: r, column: c })),
  );
}

function regions(rises: readonly (readonly (number | null)[])[], thresholdK: number, touches: readonly boolean[]): Place[][] {
  const columns = rises[0]?.length ?? 0;
  const seen = new Set<number>();
  const key = ({ row, column }: Place) => row * columns + column;
  const warm = ({ row, column }: Place) => (rises[row]?.[column] ?? -Infinity) > thresholdK;
  const found: Place[][] = [];
  rises.forEach((cells, row) =>
    cells.forEach((_rise, column) => {
      if (!warm({ row, column }) || seen.has(key({ row, column }))) return;
      const region: Place[] = [{ row, column }];
      seen.add(key({ row, column }));
      for (let i = 0; i < region.length; i += 1) {
        for (const next of beside(region[i] as Place, touches, columns)) {
          if (seen.has(key(next)) || !warm(next)) continue;
          seen.add(key(next));
          region.push(next);
        }
      }
      found.push(region);
    }),
  );
  return found;
}

/** First and last row of a region, going round: it starts behind the longest run of slots that it does not touch. */
function rowsOf(region: readonly Place[], map: TemperatureMap, touches: readonly boolean[]): { from: number; to: number; all: boolean } {
  const used = [...new Set(region.map((p) => p.row))].sort((a, b) => a - b);
  const slot = (row: number | undefined) => map.slotNumbers[row ?? 0] ?? 0;
  if (used.length === map.slotNumbers.length && used.length >= 3 && touches.every(Boolean)) return { from: 0, to: used.length - 1, all: true };
  let span = { from: used[0] ?? 0, to: used.at(-1) ?? 0 };
  let longest = slot(used[0]) + map.slots - slot(used.at(-1));
  used.slice(1).forEach((row, i) => {
    const before = used[i] ?? row;
    if (slot(row) - slot(before) > longest) {
      longest = slot(row) - slot(before);
      span = { from: row, to: before };
    }
  });
  return { ...span, all: false };
}

/**
 * Hot spots of a temperature map: connected places warmer than the warning, each with its slots, its place along the core, its peak and a
 * verdict. The limit is scaled with flux squared, as for a single reading. A spot that crosses from the last slot to the first is one spot.
 *
 * `L = L₀·(B/B₀)²`; places touch by sides or corners; verdict of the peak: `ΔT_peak ± U` against L
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | ΔT | `map`, `reference` | K | as `riseMap` |
 * | L₀ | `limits.limitK`, `.warnK` | K | more than 0, the warning not above the limit |
 * | B, B₀ | `limits.fluxDensityT`, `.referenceFluxT` | T | more than 0 |
 * | U | `limits.expandedUncertaintyK` | K | 0 or more |
 *
 * @returns `told` with the spots, hottest first (none is an empty list), or `not-told` when less than half of the places give a rise
 * @throws OutOfRangeError when map, reference or limits cannot be used
 *
 * Source: hot-spot rules of the bay. Standing: common practice.
 * @example
 * const celsius = Array.from({ length: 36 }, (_, i) => [i >= 34 || i < 1 ? 40 : 25, 25])
 * const map = { slots: 36, slotNumbers: celsius.map((_, i) => i + 1), axialM: [0.04, 0.12], celsius }
 * const found = findHotSpots(map, { kind: 'mean', meanC: 25 }, { limitK: 10, fluxDensityT: 1.32, referenceFluxT: 1.32, expandedUncertaintyK: 1 })
 * found.spots.map((s) => [s.slotsInWords, s.peakK, s.verdict])
 * // → [['35–1', 15, 'does-not-conform']]
 */
export function findHotSpots(map: TemperatureMap, reference: MapReference, limits: HotSpotLimits): HotSpotMap {
  const rises = riseMap(map, reference);
  for (const field of ['limitK', 'fluxDensityT', 'referenceFluxT'] as const) {
    if (!(Number.isFinite(limits[field]) && limits[field] > 0)) throw new OutOfRangeError(field, `${field} must be a number, more than 0.`);
  }
  const { expandedUncertaintyK } = limits;
  if (!(Number.isFinite(expandedUncertaintyK) && expandedUncertaintyK >= 0)) throw new OutOfRangeError('expandedUncertaintyK', 'An uncertainty must be 0 or more.');
  const stated = limits.warnK ?? limits.limitK;
  if (!(stated > 0 && stated <= limits.limitK)) throw new OutOfRangeError('warnK', 'The warning lies above 0 and not above the limit.');
  const limitK = scaledHotSpotLimitK(limits.limitK, limits.fluxDensityT, limits.referenceFluxT);
  const warnK = scaledHotSpotLimitK(stated, limits.fluxDensityT, limits.referenceFluxT);
  const known = rises.flatMap((row, i) => row.flatMap((rise, j) => (rise === null ? [] : [{ rise, row: i, column: j }])));
  const places = map.slotNumbers.length * map.axialM.length;
  if (known.length < LEAST_SHARE_READ * places || known.length === 0) {
    return { outcome: 'not-told', reasons: [{ code: 'too-many-holes', words: `Only ${known.length} of ${places} places give a rise. Read the others, or take another reference.` }] };
  }
  const touches = touching(map);
  const spots = regions(rises, warnK, touches).map((region): HotSpot => spotOf(map, rises, region, touches, limitK, expandedUncertaintyK));
  const hottest = known.reduce((best, next) => (next.rise > best.rise ? next : best));
  const unread = map.slots - map.slotNumbers.length;
  const notes: Reason[] = [];
  if (unread > 0) notes.push({ code: 'slots-not-read', words: `${unread} of ${map.slots} slots were not read: a narrow spot may lie between.` });
  if (spots.some((s) => s.touchesHole)) notes.push({ code: 'spot-at-hole', words: 'A spot reaches to a place that was not read: it may be larger.' });
  return {
    outcome: 'told',
    limitK,
    warnK,
    spots: spots.sort((a, b) => b.peakK - a.peakK),
    hottestK: hottest.rise,
    hottestSlot: map.slotNumbers[hottest.row] ?? 0,
    hottestAxialM: map.axialM[hottest.column] ?? 0,
    placesRead: known.length,
    placesMissing: places - known.length,
    notes,
  };
}

function spotOf(map: TemperatureMap, rises: readonly (readonly (number | null)[])[], region: readonly Place[], touches: readonly boolean[], limitK: number, expandedUncertaintyK: number): HotSpot {
  const riseAt = ({ row, column }: Place) => rises[row]?.[column] ?? -Infinity;
  const peak = region.reduce((best, next) => (riseAt(next) > riseAt(best) ? next : best));
  const { from, to, all } = rowsOf(region, map, touches);
  const slot = (row: number) => map.slotNumbers[row] ?? 0;
  const along = region.map((p) => map.axialM[p.column] ?? 0);
  const peakK = riseAt(peak);
  return {
    fromSlot: slot(from),
    toSlot: slot(to),
    slotsInWords: all ? 'all round' : from === to ? String(slot(from)) : `${slot(from)}–${slot(to)}`,
    fromAxialM: Math.min(...along),
    toAxialM: Math.max(...along),
    peakK,
    peakSlot: slot(peak.row),
    peakAxialM: map.axialM[peak.column] ?? 0,
    places: region.length,
    verdict: judgeUpperLimit(peakK, expandedUncertaintyK, limitK),
    touchesHole: region.some((p) => beside(p, touches, map.axialM.length).some((q) => rises[q.row]?.[q.column] === null)),
  };
}
