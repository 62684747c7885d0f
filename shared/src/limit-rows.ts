import { DEFAULT_CORE_LIMITS, type CoreLimitKey, type CoreLimits } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimitKey } from '@libs/machine-tests';
import type { Kind } from '@libs/quantities';
import { BURNOUT_LIMIT_NAMES, CORE_LIMIT_NAMES, MACHINE_LIMIT_NAMES } from './limit-names.js';

export type LimitGroup = 'core' | 'burnout' | 'machine';

/** One figure of the limits: where it stands in the set, what it is called, and what it may be at all. */
export interface LimitRow {
  readonly group: LimitGroup;
  readonly key: string;
  /** where its value stands in the set */
  readonly valuePath: string;
  /** where its source and standing stand; several figures of a core test share one */
  readonly sourcePath: string | null;
  readonly name: string;
  readonly kind: Kind;
  /** unit of the value as it is kept */
  readonly unit: string;
  /** kept value = figure of its kind × this: seconds are kept as seconds, and read in minutes like every time */
  readonly perShown: number;
  /** beyond these no shop can mean it */
  readonly least: number;
  readonly most: number;
}

type CoreFigure = Exclude<keyof CoreLimits, 'sources' | 'decisionRule'>;
const CORE: readonly (readonly [key: CoreFigure, source: CoreLimitKey | null, kind: Kind, unit: string, least: number, most: number])[] = [
  ['increaseLimit', 'increase', 'percent', '1', 0.01, 2],
  ['increaseWarn', 'increase', 'percent', '1', 0.005, 2],
  ['fallAsk', 'fall', 'percent', '1', 0.01, 1],
  ['absoluteWPerKg50', 'absolute', 'specific-loss', 'W/kg', 0.5, 60],
  ['absoluteWPerKg60', 'absolute', 'specific-loss', 'W/kg', 0.5, 60],
  ['hotSpotLimitK', 'hot-spot', 'temperature-difference', 'K', 1, 100],
  ['hotSpotWarnK', 'hot-spot', 'temperature-difference', 'K', 0.5, 100],
  ['referenceFluxT', 'hot-spot', 'flux-density', 'T', 0.3, 2],
  ['fluxTolerance', 'set-up', 'percent', '1', 0.001, 0.2],
  ['startTemperatureToleranceK', 'set-up', 'temperature-difference', 'K', 0.5, 50],
  ['hotSpotStartToleranceK', 'hot-spot-start', 'temperature-difference', 'K', 0.5, 50],
  ['hotSpotMinMinutes', 'hot-spot-start', 'duration', 'min', 1, 240],
  ['hotSpotMinFluxShare', 'hot-spot-start', 'percent', '1', 0.5, 1],
  ['minimumTargetT', null, 'flux-density', 'T', 0.3, 2],
  ['stopMeanC', 'stop', 'temperature', '°C', 40, 200],
  ['stopSpotOverMeanK', 'stop', 'temperature-difference', 'K', 5, 150],
  ['stopSpotC', 'stop', 'temperature', '°C', 50, 250],
  ['demandedFromPowerW', 'demanded', 'rated-power', 'W', 0, 1e6],
  ['demandedFromDiameterM', 'demanded', 'length', 'm', 0, 5],
  ['coverageFactor', null, 'number', '1', 1, 3],
];

/** Kinds and ranges of the machine's tests by their unit; the exceptions stand below. */
const BY_UNIT: Record<string, readonly [kind: Kind, least: number, most: number]> = {
  'Ω': ['resistance-mega', 1e6, 1e12],
  V: ['voltage', 100, 50_000],
  K: ['temperature-difference', 0.1, 120],
  'm/s': ['vibration-velocity', 1e-4, 0.05],
  s: ['duration', 1, 3600],
  '1': ['percent', 0.001, 1],
};
const APART: Partial<Record<MachineTestLimitKey, readonly [kind: Kind, least: number, most: number]>> = {
  polarizationIndex: ['number', 1, 10],
  highPotentialDcFactor: ['number', 1, 3],
  highPotentialFloorV: ['voltage', 0, 50_000],
  highPotentialRepeat: ['percent', 0.3, 1],
  highPotentialReconditioned: ['percent', 0.3, 1],
  highPotentialPartRewound: ['percent', 0.3, 1],
};

const coreRows: readonly LimitRow[] = CORE.map(([key, source, kind, unit, least, most]) => ({
  group: 'core',
  key,
  valuePath: `core.${key}`,
  sourcePath: source === null ? null : `core.sources.${source}`,
  name: CORE_LIMIT_NAMES[key],
  kind,
  unit,
  perShown: 1,
  least,
  most,
}));

const burnoutRows: readonly LimitRow[] = (Object.keys(BURNOUT_LIMIT_NAMES) as (keyof typeof BURNOUT_LIMIT_NAMES)[]).map((key) => ({
  group: 'burnout',
  key,
  valuePath: `burnout.${key}`,
  sourcePath: `burnout.sources.${key}`,
  name: BURNOUT_LIMIT_NAMES[key],
  kind: 'temperature',
  unit: '°C',
  perShown: 1,
  least: 60,
  most: 550,
}));

const machineRows: readonly LimitRow[] = (Object.entries(DEFAULT_MACHINE_TEST_LIMITS) as [MachineTestLimitKey, MachineTestLimit][]).map(([key, { unit }]) => {
  const [kind, least, most] = APART[key] ?? BY_UNIT[unit]!;
  return { group: 'machine', key, valuePath: `machine.${key}.value`, sourcePath: `machine.${key}`, name: MACHINE_LIMIT_NAMES[key], kind, unit, perShown: unit === 's' ? 60 : 1, least, most };
});

/** Every figure of the limits, in the order they are read. */
export const LIMIT_ROWS: readonly LimitRow[] = [...coreRows, ...burnoutRows, ...machineRows];

/** Where what an inconclusive result does at a gate stands: the one limit that is a word. */
export const RULE_PATH = 'core.decisionRule';

/** The sources of the core test's limits, in the order of their first figure. */
export const CORE_SOURCE_KEYS = Object.keys(DEFAULT_CORE_LIMITS.sources) as readonly CoreLimitKey[];
