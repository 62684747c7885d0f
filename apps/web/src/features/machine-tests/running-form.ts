import type { UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';
import type { ReadingsOf } from '@shared/records';
import { typedFrom, untyped, type FormReader, type Typed } from '../../lib/typed.js';
import { isTyped } from './test-form.js';

type Vibration = NonNullable<ReadingsOf<'final-test'>['vibration']>;
type Bearings = NonNullable<ReadingsOf<'final-test'>['bearings']>;

export interface VibrationValues {
  standard: Vibration['standard'];
  mounting: Vibration['mounting'];
  shaftHeightM: Typed;
  speedRpm: Typed;
  velocitiesMPerS: Typed[];
}
export const MOST_PLACES = 12;
const USUAL_PLACES = 3;

/**
 * The shaft height that an IEC frame size names in millimetres, 0.315 of `315L`; null of anything else.
 * A NEMA frame is three digits with a T or U: its first two over four are the height in inches, and are not guessed here.
 */
export function shaftHeightOf(frame: string): number | null {
  const height = /^(\d{2,3})\s?[SML]?[1-4]?$/i.exec(frame.trim())?.[1];
  const millimetres = Number(height);
  return height !== undefined && millimetres >= 56 && millimetres <= 630 ? millimetres / 1000 : null;
}

export const startVibration = (nameplate: Nameplate, system: UnitSystem): VibrationValues => ({
  standard: 'iec-60034-14-2003',
  mounting: 'free-suspension',
  shaftHeightM: typedFrom(shaftHeightOf(nameplate.frame), 'length', system),
  speedRpm: untyped(system),
  velocitiesMPerS: Array.from({ length: USUAL_PLACES }, () => untyped(system)),
});

export const vibrationFrom = (v: Vibration | null, system: UnitSystem): VibrationValues => ({
  standard: v?.standard ?? 'iec-60034-14-2003',
  mounting: v?.mounting ?? 'free-suspension',
  shaftHeightM: typedFrom(v?.shaftHeightM, 'length', system),
  speedRpm: typedFrom(v?.speedRpm, 'speed', system),
  velocitiesMPerS: v ? v.velocitiesMPerS.map((x) => typedFrom(x, 'vibration-velocity', system)) : Array.from({ length: USUAL_PLACES }, () => untyped(system)),
});

/** Empty places behind the last one were not measured; one in between is a gap, and is asked for. */
export function readVibration(reader: FormReader, v: VibrationValues): Vibration {
  const measured = v.velocitiesMPerS.slice(0, Math.max(1, v.velocitiesMPerS.findLastIndex(isTyped) + 1));
  return {
    standard: v.standard,
    mounting: v.mounting,
    shaftHeightM: reader.may('vibration.shaftHeightM', v.shaftHeightM, 'length') ?? null,
    speedRpm: reader.may('vibration.speedRpm', v.speedRpm, 'speed') ?? null,
    velocitiesMPerS: measured.map((typed, i) => reader.need(`vibration.velocitiesMPerS.${i}`, typed, 'vibration-velocity')),
  };
}

export type BearingValues = Record<keyof Bearings, Typed>;
const BEARING_KINDS = { driveEndC: 'temperature', nonDriveEndC: 'temperature', ambientC: 'temperature', changeInHalfHourK: 'temperature-difference', poles: 'count' } as const satisfies Record<keyof Bearings, string>;
const BEARING_NAMES = Object.keys(BEARING_KINDS) as (keyof Bearings)[];

export const bearingsFrom = (b: Bearings | null, system: UnitSystem): BearingValues =>
  Object.fromEntries(BEARING_NAMES.map((name) => [name, typedFrom(b?.[name], BEARING_KINDS[name], system)])) as BearingValues;
export const startBearings = (nameplate: Nameplate, system: UnitSystem): BearingValues => ({ ...bearingsFrom(null, system), poles: typedFrom(nameplate.poles, 'count', system) });
export const readBearings = (reader: FormReader, values: BearingValues): Bearings =>
  Object.fromEntries(BEARING_NAMES.map((name) => [name, reader.need(`bearings.${name}`, values[name], BEARING_KINDS[name])])) as Bearings;
