import type { CoreGeometry } from './core-geometry.js';
import type { CablePath, CorePhase, CoreTestInput, FrameMaterial, FrameState } from './core-test.js';

/** The cores and readings of the sample shop, an invented one: for the specs of this library only. */
const core = (kind: CoreGeometry['kind'], od: number, id: number, slotDepth: number, slots: number, stack: number, ducts: number, densityKgPerM3: number): CoreGeometry => ({
  kind,
  outerDiameterM: od / 1000,
  innerDiameterM: id / 1000,
  slotDepthM: slotDepth / 1000,
  slots,
  stackLengthM: stack / 1000,
  ducts,
  ductWidthM: ducts > 0 ? 0.01 : 0,
  stackingFactor: 0.95,
  densityKgPerM3,
});

export const SAMPLE_CORES = {
  1: core('stator', 530, 340, 44, 72, 370, 0, 7700),
  2: core('stator', 445, 280, 38, 60, 290, 0, 7700),
  3: core('stator', 400, 225, 34, 36, 230, 0, 7700),
  4: core('armature', 380, 170, 36, 46, 260, 2, 7750),
  6: core('stator', 1180, 850, 88, 96, 800, 14, 7700),
  7: core('stator', 466, 330, 36, 72, 300, 0, 7750),
  8: core('stator', 125, 75, 12.5, 24, 85, 0, 7800),
  9: core('stator', 419, 267, 34, 60, 241, 0, 7650),
  10: core('stator', 240, 155, 20, 48, 170, 0, 7750),
  11: core('armature', 388, 180, 36, 54, 310, 2, 7750),
  12: core('stator', 340, 218, 28, 48, 220, 0, 7700),
} as const satisfies Record<number, CoreGeometry>;
export type SampleCore = keyof typeof SAMPLE_CORES;

interface SetupRow {
  state: FrameState;
  material: FrameMaterial;
  path: CablePath;
}
const castIron: SetupRow = { state: 'in-frame', material: 'cast-iron', path: 'over-frame' };
const spider: SetupRow = { state: 'bare', material: 'none', path: 'through-spider' };
const SETUPS: Record<SampleCore, SetupRow> = {
  1: castIron,
  2: castIron,
  3: castIron,
  4: spider,
  6: { state: 'in-frame', material: 'steel', path: 'under-ribs' },
  7: castIron,
  8: castIron,
  9: castIron,
  10: { state: 'in-frame', material: 'aluminium', path: 'over-frame' },
  11: spider,
  12: castIron,
};

/** As read: turns, search volts, amps, watts; ambient, start, minutes, mean, hottest. */
export type SampleReading = readonly [
  core: SampleCore,
  phase: CorePhase,
  name: string,
  excitingTurns: number,
  searchTurns: number,
  searchVoltsV: number,
  excitingA: number,
  wattsW: number,
  ambientC: number,
  startC: number,
  minutes: number,
  meanC: number,
  hottestC: number,
];

export const SAMPLE_READINGS: readonly SampleReading[] = [
  [1, 'before', 'before', 24, 4, 20.99, 25.1, 102.1, 21, 21, 20, 26.9, 30.0],
  [1, 'after', 'after', 24, 4, 21.06, 25.4, 98.63, 22, 23, 20, 28.7, 31.3],
  [2, 'before', 'before', 24, 4, 14.38, 22, 67.7, 20, 20, 20, 26.8, 30.8],
  [2, 'after', 'after', 24, 4, 14.34, 22.6, 108.5, 22, 22, 20, 33.0, 47.2],
  [3, 'before', 'before', 20, 4, 13.72, 23.4, 65.73, 19, 19, 12, 23.0, 47.3],
  [3, 'after', 'after strip', 20, 4, 13.7, 23.3, 64.76, 21, 22, 12, 26.0, 48.8],
  [3, 'after', 'after repair', 20, 4, 13.71, 23.3, 61.91, 21, 21, 20, 27.3, 31.7],
  [4, 'before', 'before', 20, 2, 9.219, 30.8, 39.76, 22, 22, 15, 28.5, 33.7],
  [4, 'after', 'after', 20, 2, 9.233, 31, 41.44, 23, 23, 15, 29.8, 34.6],
  [6, 'before', 'before', 23, 1, 10.75, 36.2, 87.78, 18, 18, 45, 25.1, 28.7],
  [6, 'after', 'after', 23, 1, 10.71, 35.9, 88.25, 20, 21, 45, 28.1, 32.2],
  [7, 'after', 'after only', 20, 4, 10.71, 31.4, 80.76, 21, 21, 20, 29.4, 32.4],
  [9, 'before', 'before', 20, 4, 11.28, 23.1, 264.3, 21, 21, 20, 26.4, 29.3],
  [9, 'after', 'after, core warm', 20, 4, 11.27, 23, 251.5, 22, 71, 20, 65.0, 68.3],
  [9, 'after', 'after, repeat', 20, 4, 11.29, 23.2, 260.6, 21, 22, 20, 27.3, 30.3],
  [10, 'before', 'before', 20, 10, 10.67, 16.4, 37.43, 22, 22, 15, 27.8, 31.2],
  [10, 'after', 'after', 20, 10, 10.64, 16.2, 38.38, 21, 22, 15, 28.0, 31.7],
  [11, 'before', 'before', 18, 2, 10.99, 30.3, 47.03, 20, 20, 15, 25.6, 29.7],
  [11, 'after', 'after', 18, 2, 10.97, 30.1, 45.86, 22, 23, 15, 28.5, 33.0],
  [12, 'before', 'before', 16, 4, 8.096, 26.5, 40.01, 21, 21, 20, 27.2, 31.0],
  [12, 'after', 'after', 16, 4, 8.084, 26.6, 47.31, 22, 22, 20, 29.4, 35.5],
];

export function inputOf(row: SampleReading): CoreTestInput {
  const [number, phase, , excitingTurns, searchTurns, searchVoltsV, excitingA, wattsW, ambientC, startC, minutes, meanC, hottestC] = row;
  const { state, material, path } = SETUPS[number];
  // machine 9: the wattmeter sat on the exciting terminals, the loop cable measured 0.0528 ohm
  const lead = number === 9 ? ({ wattmeterLead: 'exciting', cableResistanceOhm: 0.0528 } as const) : ({ wattmeterLead: 'search' } as const);
  return {
    phase,
    geometry: SAMPLE_CORES[number],
    target: number === 6 ? { basis: 'supply', fluxDensityT: 1.0 } : { basis: 'standard', fluxDensityT: 1.32 },
    frame: { state, material },
    cablePath: path,
    massBasis: 'back-iron',
    reading: { excitingTurns, searchTurns, searchVoltsV, voltmeter: 'average', excitingA, wattsW, ...lead, frequencyHz: 50 },
    temperatures: { ambientC, startC, meanC, hottestC, minutes },
    instruments: { voltmeterId: 'v-1', ammeterId: 'a-1', wattmeterId: 'w-1', thermometerId: 't-1', wattmeterRange: '300 V 50 A', clampMeter: false },
    checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
  };
}

/** The readings of one core by their name in the table. */
export function sampleInput(number: SampleCore, name: string): CoreTestInput {
  const row = SAMPLE_READINGS.find((r) => r[0] === number && r[2] === name);
  if (!row) throw new Error(`The sample shop has no reading “${name}” of core ${number}.`);
  return inputOf(row);
}
