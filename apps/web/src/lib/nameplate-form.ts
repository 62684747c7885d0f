import type { UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';
import { typedFrom, untyped, type FormReader, type Typed } from './typed.js';

/** The nameplate as it is typed: figures with their units, everything else as it stands on the plate. */
export type NameplateForm = Omit<Nameplate, FigureName> & Record<FigureName, Typed>;

const FIGURES = {
  ratedPowerW: 'rated-power',
  ratedVoltageV: 'voltage',
  ratedFrequencyHz: 'frequency',
  ratedSpeedRpm: 'speed',
  ratedCurrentA: 'current',
  poles: 'count',
  powerFactor: 'number',
  efficiencyPercent: 'percent',
} as const;
type FigureName = keyof typeof FIGURES;
const FIGURE_NAMES = Object.keys(FIGURES) as FigureName[];

const TEXTS = ['maker', 'model', 'serial', 'frame', 'mounting', 'enclosure', 'ingressProtection', 'thermalClass', 'duty', 'bearingDriveEnd', 'bearingNonDriveEnd'] as const;

export function emptyNameplate(system: UnitSystem): NameplateForm {
  return {
    kind: 'induction',
    connection: 'unknown',
    explosiveAtmosphere: false,
    ...(Object.fromEntries(TEXTS.map((name) => [name, ''])) as Record<(typeof TEXTS)[number], string>),
    ...(Object.fromEntries(FIGURE_NAMES.map((name) => [name, untyped(system)])) as Record<FigureName, Typed>),
  };
}

/** A fraction of 1 as a percentage, without the dust of binary arithmetic: 0.07 is 7, not 7.000000000000001. */
const asPercent = (fraction: number) => Number((fraction * 100).toPrecision(12));

export function nameplateFormOf(nameplate: Nameplate, system: UnitSystem): NameplateForm {
  const figure = (name: FigureName) => typedFrom(name === 'efficiencyPercent' && nameplate[name] !== null ? Number((nameplate[name] / 100).toPrecision(12)) : nameplate[name], FIGURES[name], system);
  return { ...nameplate, ...(Object.fromEntries(FIGURE_NAMES.map((name) => [name, figure(name)])) as Record<FigureName, Typed>) };
}

/** What cannot be read on the plate stays null; a figure that is typed wrong is named at its own field. */
export function readNameplate(form: NameplateForm, reader: FormReader, path: string): Nameplate {
  const figure = (name: FigureName) => reader.may(`${path}.${name}`, form[name], FIGURES[name]) ?? null;
  const efficiency = figure('efficiencyPercent');
  return {
    ...form,
    ...(Object.fromEntries(FIGURE_NAMES.map((name) => [name, figure(name)])) as Record<FigureName, number | null>),
    efficiencyPercent: efficiency === null ? null : asPercent(efficiency),
  };
}
