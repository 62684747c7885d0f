import type { CoreGeometry } from '@libs/core-loss';
import type { CoreTestReadings } from '@shared/core-tests';

const mm = (value: number) => value / 1000;
const core = (kind: CoreGeometry['kind'], od: number, id: number, slotDepth: number, slots: number, stack: number, ducts: number, rho: number): CoreGeometry => ({
  kind,
  outerDiameterM: mm(od),
  innerDiameterM: mm(id),
  slotDepthM: mm(slotDepth),
  slots,
  stackLengthM: mm(stack),
  ducts,
  ductWidthM: ducts > 0 ? mm(10) : 0,
  stackingFactor: 0.95,
  densityKgPerM3: rho,
});

/** Core sizes by machine, as measured in the bay. */
export const CORES: Record<number, CoreGeometry> = {
  1: core('stator', 530, 340, 44, 72, 370, 0, 7700),
  2: core('stator', 445, 280, 38, 60, 290, 0, 7700),
  3: core('stator', 400, 225, 34, 36, 230, 0, 7700),
  4: core('armature', 380, 170, 36, 46, 260, 2, 7750),
  6: core('stator', 1180, 850, 88, 96, 800, 14, 7700),
  7: core('stator', 466, 330, 36, 72, 300, 0, 7750),
  9: core('stator', 419, 267, 34, 60, 241, 0, 7650),
  10: core('stator', 240, 155, 20, 48, 170, 0, 7750),
  11: core('armature', 388, 180, 36, 54, 310, 2, 7750),
  12: core('stator', 340, 218, 28, 48, 220, 0, 7700),
};

interface SetUp {
  readonly frame: CoreTestReadings['frame'];
  readonly cablePath: CoreTestReadings['cablePath'];
  readonly targetT: number;
  readonly exciting: number;
  readonly search: number;
  readonly lead: 'search' | 'exciting';
}
const inCastIron: Pick<SetUp, 'frame' | 'cablePath'> = { frame: { state: 'in-frame', material: 'cast-iron' }, cablePath: 'over-frame' };
const SETUPS: Record<number, SetUp> = {
  1: { ...inCastIron, targetT: 1.32, exciting: 24, search: 4, lead: 'search' },
  2: { ...inCastIron, targetT: 1.32, exciting: 24, search: 4, lead: 'search' },
  3: { ...inCastIron, targetT: 1.32, exciting: 20, search: 4, lead: 'search' },
  4: { frame: { state: 'bare', material: 'none' }, cablePath: 'through-spider', targetT: 1.32, exciting: 20, search: 2, lead: 'search' },
  6: { frame: { state: 'in-frame', material: 'steel' }, cablePath: 'under-ribs', targetT: 1, exciting: 23, search: 1, lead: 'search' },
  7: { ...inCastIron, targetT: 1.32, exciting: 20, search: 4, lead: 'search' },
  9: { ...inCastIron, targetT: 1.32, exciting: 20, search: 4, lead: 'exciting' },
  10: { frame: { state: 'in-frame', material: 'aluminium' }, cablePath: 'over-frame', targetT: 1.32, exciting: 20, search: 10, lead: 'search' },
  11: { frame: { state: 'bare', material: 'none' }, cablePath: 'through-spider', targetT: 1.32, exciting: 18, search: 2, lead: 'search' },
  12: { ...inCastIron, targetT: 1.32, exciting: 16, search: 4, lead: 'search' },
};

export interface InstrumentIds {
  readonly voltmeterId: string;
  readonly ammeterId: string;
  readonly wattmeterId: string;
  readonly thermometerId: string;
}
/** volts on the search coil, amperes, watts as read; ambient, start, minutes, mean, hottest, slot of the hottest */
export type RingRow = readonly [volts: number, amps: number, watts: number, ambient: number, start: number, minutes: number, mean: number, hottest: number, slot: number];

/** The readings of the sample shop's ring tests. */
export const RING = {
  '1 before': [20.99, 25.1, 102.1, 21, 21, 20, 26.9, 30.0, 17],
  '1 after': [21.06, 25.4, 98.63, 22, 23, 20, 28.7, 31.3, 17],
  '2 before': [14.38, 22, 67.7, 20, 20, 20, 26.8, 30.8, 31],
  '2 after': [14.34, 22.6, 108.5, 22, 22, 20, 33.0, 47.2, 44],
  '3 before': [13.72, 23.4, 65.73, 19, 19, 12, 23.0, 47.3, 13],
  '3 after strip': [13.7, 23.3, 64.76, 21, 22, 12, 26.0, 48.8, 13],
  '3 after repair': [13.71, 23.3, 61.91, 21, 21, 20, 27.3, 31.7, 12],
  '4 before': [9.219, 30.8, 39.76, 22, 22, 15, 28.5, 33.7, 8],
  '4 after': [9.233, 31, 41.44, 23, 23, 15, 29.8, 34.6, 8],
  '6 before': [10.75, 36.2, 87.78, 18, 18, 45, 25.1, 28.7, 60],
  '6 after': [10.71, 35.9, 88.25, 20, 21, 45, 28.1, 32.2, 60],
  '7 after': [10.71, 31.4, 80.76, 21, 21, 20, 29.4, 32.4, 5],
  '9 before': [11.28, 23.1, 264.3, 21, 21, 20, 26.4, 29.3, 22],
  '9 after warm': [11.27, 23, 251.5, 22, 71, 20, 65.0, 68.3, 22],
  '9 after': [11.29, 23.2, 260.6, 21, 22, 20, 27.3, 30.3, 22],
  '10 before': [10.67, 16.4, 37.43, 22, 22, 15, 27.8, 31.2, 40],
  '10 after': [10.64, 16.2, 38.38, 21, 22, 15, 28.0, 31.7, 40],
  '11 before': [10.99, 30.3, 47.03, 20, 20, 15, 25.6, 29.7, 26],
  '11 after': [10.97, 30.1, 45.86, 22, 23, 15, 28.5, 33.0, 26],
  '12 before': [8.096, 26.5, 40.01, 21, 21, 20, 27.2, 31.0, 9],
  '12 after': [8.084, 26.6, 47.31, 22, 22, 20, 29.4, 35.5, 9],
} as const satisfies Record<string, RingRow>;
export type RingTest = keyof typeof RING;

/** Loop cable of machine 9, measured: its wattmeter sat on the exciting terminals. */
const CABLE_OHM_9 = 0.0528;

/** One ring test of the sample shop as the bench would send it. */
export function ringTest(test: RingTest, instruments: InstrumentIds): CoreTestReadings {
  const machine = Number(test.split(' ')[0]);
  const setup = SETUPS[machine]!;
  const [volts, amps, watts, ambient, start, minutes, mean, hottest, slot] = RING[test];
  return {
    geometry: CORES[machine]!,
    target: { basis: setup.targetT === 1.32 ? 'standard' : 'supply', fluxDensityT: setup.targetT },
    frame: setup.frame,
    cablePath: setup.cablePath,
    massBasis: 'back-iron',
    reading: {
      excitingTurns: setup.exciting,
      searchTurns: setup.search,
      searchVoltsV: volts,
      voltmeter: 'average',
      excitingA: amps,
      wattsW: watts,
      wattmeterLead: setup.lead,
      ...(setup.lead === 'exciting' ? { cableResistanceOhm: CABLE_OHM_9 } : {}),
      frequencyHz: 50,
    },
    temperatures: { ambientC: ambient, startC: start, meanC: mean, hottestC: hottest, hottestSlot: slot, minutes },
    instruments: { ...instruments, clampMeter: false },
    checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
    setup: { supplyId: 's1', cableId: setup.exciting * amps > 600 ? 'c25' : 'c10' },
    remark: '',
  };
}
