import type { CoreLimitKey, CoreLimits } from '@libs/core-loss';
import type { MachineTestLimit, MachineTestLimitKey } from '@libs/machine-tests';
import type { Kind } from '@libs/quantities';
import type { LimitsSet } from '@shared/limits';
import { BURNOUT_NAMES, CORE_NAMES, MACHINE_NAMES } from './limit-names.js';
import { t } from './text.js';

/** A figure in SI with its kind, or words where the limit is no figure. */
export type LimitValue = { readonly si: number; readonly kind: Kind } | { readonly words: string };
export interface LimitRow {
  readonly key: string;
  readonly name: string;
  readonly value: LimitValue;
  readonly source: string;
  readonly standing: string;
}

type CoreName = Exclude<keyof CoreLimits, 'sources'>;
const CORE: readonly (readonly [CoreName, Kind | null, CoreLimitKey | null])[] = [
  ['increaseLimit', 'percent', 'increase'],
  ['increaseWarn', 'percent', 'increase'],
  ['fallAsk', 'percent', 'fall'],
  ['absoluteWPerKg50', 'specific-loss', 'absolute'],
  ['absoluteWPerKg60', 'specific-loss', 'absolute'],
  ['hotSpotLimitK', 'temperature-difference', 'hot-spot'],
  ['hotSpotWarnK', 'temperature-difference', 'hot-spot'],
  ['referenceFluxT', 'flux-density', 'hot-spot'],
  ['fluxTolerance', 'percent', 'set-up'],
  ['startTemperatureToleranceK', 'temperature-difference', 'set-up'],
  ['hotSpotStartToleranceK', 'temperature-difference', 'hot-spot-start'],
  ['hotSpotMinMinutes', 'duration', 'hot-spot-start'],
  ['hotSpotMinFluxShare', 'percent', 'hot-spot-start'],
  ['minimumTargetT', 'flux-density', null],
  ['stopMeanC', 'temperature', 'stop'],
  ['stopSpotOverMeanK', 'temperature-difference', 'stop'],
  ['stopSpotC', 'temperature', 'stop'],
  ['demandedFromPowerW', 'rated-power', 'demanded'],
  ['demandedFromDiameterM', 'length', 'demanded'],
  ['coverageFactor', 'number', null],
  ['decisionRule', null, null],
];

export function standingWords(standing: string | undefined): string {
  if (standing === 'S' || standing === 'P' || standing === 'C') return t(`standing-${standing}`);
  return standing ?? '';
}

export function coreRows(core: CoreLimits): LimitRow[] {
  return CORE.map(([key, kind, sourceKey]) => {
    const source = sourceKey === null ? undefined : core.sources[sourceKey];
    const value = core[key];
    return {
      key,
      name: CORE_NAMES[key],
      value: typeof value === 'number' && kind !== null ? { si: value, kind } : { words: t(`rule-${core.decisionRule}`) },
      source: source?.source ?? t('noSource'),
      standing: standingWords(source?.standing),
    };
  });
}

export function burnoutRows({ source, standing, ...temperatures }: LimitsSet['burnout']): LimitRow[] {
  const names = Object.keys(BURNOUT_NAMES) as (keyof typeof BURNOUT_NAMES)[];
  return names.map((key) => ({ key, name: BURNOUT_NAMES[key], value: { si: temperatures[key], kind: 'temperature' }, source, standing }));
}

/** A limit of fraction 1 is a percentage, except where it counts times: an index, a factor. */
const TIMES: ReadonlySet<string> = new Set(['polarizationIndex', 'highPotentialDcFactor'] satisfies MachineTestLimitKey[]);

function machineValue(key: string, { value, unit }: MachineTestLimit): LimitValue {
  if (unit === 'Ω') return { si: value, kind: 'resistance-mega' };
  if (unit === 'V') return { si: value, kind: 'voltage' };
  if (unit === 'K') return { si: value, kind: 'temperature-difference' };
  if (unit === 'm/s') return { si: value, kind: 'vibration-velocity' };
  // durations are kept in minutes everywhere else
  if (unit === 's') return { si: value / 60, kind: 'duration' };
  if (unit === '1') return { si: value, kind: TIMES.has(key) ? 'number' : 'percent' };
  return { words: `${value} ${unit}` };
}

export function machineRows(machine: LimitsSet['machine']): LimitRow[] {
  return Object.entries(machine).map(([key, limit]) => ({
    key,
    name: MACHINE_NAMES[key as MachineTestLimitKey] ?? key,
    value: machineValue(key, limit),
    source: limit.source,
    standing: standingWords(limit.standing),
  }));
}
