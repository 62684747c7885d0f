import type { CoreGeometry, CoreTestInput } from '@libs/core-loss';
import type { Kind, UnitSystem } from '@libs/quantities';
import { CORE_CHECKS, type CoreTestReadings } from '@shared/core-tests';
import type { Entered } from '@shared/fields';
import { FormReader, typedFrom, untyped, type FormProblem, type Typed } from '../../lib/typed.js';

export type CoreCheck = (typeof CORE_CHECKS)[number];
export type Phase = 'before' | 'after';

/** Every figure of the bench: its path in the contract and what it is. One table for form, fields and conversion. */
export const BENCH_FIGURES = {
  'geometry.outerDiameterM': 'length',
  'geometry.innerDiameterM': 'length',
  'geometry.slotDepthM': 'length',
  'geometry.slots': 'count',
  'geometry.stackLengthM': 'length',
  'geometry.ducts': 'count',
  'geometry.ductWidthM': 'length',
  'geometry.stackingFactor': 'number',
  'geometry.densityKgPerM3': 'density',
  'target.fluxDensityT': 'flux-density',
  'reading.excitingTurns': 'count',
  'reading.searchTurns': 'count',
  'reading.searchVoltsV': 'voltage',
  'reading.formFactor': 'number',
  'reading.excitingA': 'current',
  'reading.wattsW': 'power',
  'reading.cableResistanceOhm': 'resistance',
  'reading.searchBurdenOhm': 'resistance',
  'reading.frequencyHz': 'frequency',
  'temperatures.ambientC': 'temperature',
  'temperatures.startC': 'temperature',
  'temperatures.meanC': 'temperature',
  'temperatures.coolestC': 'temperature',
  'temperatures.hottestC': 'temperature',
  'temperatures.hottestSlot': 'count',
  'temperatures.minutes': 'duration',
} as const satisfies Record<string, Kind>;
export type BenchFigure = keyof typeof BENCH_FIGURES;

type Figures<Part extends string> = { [Path in BenchFigure as Path extends `${Part}.${infer Name}` ? Name : never]: Typed };

export interface BenchValues {
  geometry: Figures<'geometry'> & { kind: CoreGeometry['kind'] };
  target: Figures<'target'> & { basis: CoreTestInput['target']['basis'] };
  frame: CoreTestInput['frame'];
  cablePath: CoreTestInput['cablePath'];
  reading: Figures<'reading'> & { voltmeter: 'average' | 'true-rms'; wattmeterLead: 'search' | 'exciting' };
  temperatures: Figures<'temperatures'>;
  instruments: { voltmeterId: string | null; ammeterId: string | null; wattmeterId: string | null; thermometerId: string | null; wattmeterRange: string; clampMeter: boolean };
  checks: Record<CoreCheck, boolean>;
  setup: { supplyId: string | null; cableId: string | null; parallelCables: number | null };
  remark: string;
  /** only asked for when a kept test is corrected */
  why: string;
}

export const METERS = ['voltmeterId', 'ammeterId', 'wattmeterId', 'thermometerId'] as const;

export interface BenchStart {
  /** of the bay's supply */
  readonly frequencyHz?: number;
  /** as the dismantling found it */
  readonly frameMaterial?: 'cast-iron' | 'steel' | 'aluminium';
}

/** What a test starts from: nothing read, the usual figures where a shop does not measure them. */
export function blankBench(system: UnitSystem, core: CoreGeometry | null, { frequencyHz = 50, frameMaterial = 'cast-iron' }: BenchStart = {}): BenchValues {
  const known = (field: Exclude<keyof CoreGeometry, 'kind'>, kind: Kind, otherwise?: number) => typedFrom(core?.[field] ?? otherwise, kind, system);
  const empty = () => untyped(system);
  return {
    geometry: {
      kind: core?.kind ?? 'stator',
      outerDiameterM: known('outerDiameterM', 'length'),
      innerDiameterM: known('innerDiameterM', 'length'),
      slotDepthM: known('slotDepthM', 'length'),
      slots: known('slots', 'count'),
      stackLengthM: known('stackLengthM', 'length'),
      ducts: known('ducts', 'count', 0),
      ductWidthM: known('ductWidthM', 'length', 0),
      stackingFactor: known('stackingFactor', 'number', 0.95),
      densityKgPerM3: known('densityKgPerM3', 'density', 7700),
    },
    target: { basis: 'standard', fluxDensityT: typedFrom(1.32, 'flux-density', system) },
    frame: { state: 'in-frame', material: frameMaterial },
    cablePath: core?.kind === 'armature' ? 'through-spider' : 'over-frame',
    reading: {
      excitingTurns: empty(),
      searchTurns: empty(),
      searchVoltsV: empty(),
      voltmeter: 'average',
      formFactor: empty(),
      excitingA: empty(),
      wattsW: empty(),
      wattmeterLead: 'search',
      cableResistanceOhm: empty(),
      searchBurdenOhm: empty(),
      frequencyHz: typedFrom(frequencyHz, 'frequency', system),
    },
    temperatures: { ambientC: empty(), startC: empty(), meanC: empty(), coolestC: empty(), hottestC: empty(), hottestSlot: empty(), minutes: empty() },
    instruments: { voltmeterId: null, ammeterId: null, wattmeterId: null, thermometerId: null, wattmeterRange: '', clampMeter: false },
    checks: Object.fromEntries(CORE_CHECKS.map((c) => [c, false])) as Record<CoreCheck, boolean>,
    setup: { supplyId: null, cableId: null, parallelCables: null },
    remark: '',
    why: '',
  };
}

/** A kept test, back in its form. */
export function benchFrom(readings: CoreTestReadings, system: UnitSystem): BenchValues {
  const blank = blankBench(system, readings.geometry);
  const back = <T extends object>(part: string, into: T, from: Record<string, unknown>): T => {
    const figures = Object.entries(BENCH_FIGURES).filter(([path]) => path.startsWith(`${part}.`));
    return { ...into, ...Object.fromEntries(figures.map(([path, kind]) => [path.slice(part.length + 1), typedFrom(from[path.slice(part.length + 1)] as number | undefined, kind, system)])) };
  };
  const { instruments, setup } = readings;
  return {
    geometry: { ...back('geometry', blank.geometry, readings.geometry), kind: readings.geometry.kind },
    target: { ...back('target', blank.target, readings.target), basis: readings.target.basis },
    frame: { ...readings.frame },
    cablePath: readings.cablePath,
    reading: { ...back('reading', blank.reading, readings.reading), voltmeter: readings.reading.voltmeter, wattmeterLead: readings.reading.wattmeterLead },
    temperatures: back('temperatures', blank.temperatures, readings.temperatures),
    instruments: {
      voltmeterId: instruments.voltmeterId ?? null,
      ammeterId: instruments.ammeterId ?? null,
      wattmeterId: instruments.wattmeterId ?? null,
      thermometerId: instruments.thermometerId ?? null,
      wattmeterRange: instruments.wattmeterRange ?? '',
      clampMeter: instruments.clampMeter,
    },
    checks: { ...readings.checks },
    setup: { supplyId: setup.supplyId ?? null, cableId: setup.cableId ?? null, parallelCables: setup.parallelCables ?? null },
    remark: readings.remark,
    why: '',
  };
}

/** The test after starts where the test before stood: size, set-up and meters, but no reading and no tick. */
export function afterFromBefore(before: CoreTestReadings, system: UnitSystem): BenchValues {
  const all = benchFrom(before, system);
  const blank = blankBench(system, before.geometry);
  const { excitingTurns, searchTurns, voltmeter, formFactor, wattmeterLead, cableResistanceOhm, searchBurdenOhm, frequencyHz } = all.reading;
  return {
    ...all,
    reading: { ...blank.reading, excitingTurns, searchTurns, voltmeter, formFactor, wattmeterLead, cableResistanceOhm, searchBurdenOhm, frequencyHz },
    temperatures: blank.temperatures,
    checks: blank.checks,
    remark: '',
  };
}

export interface BenchReadings {
  /** NaN stands where a figure is missing or cannot be read */
  readonly readings: CoreTestReadings;
  readonly entered: Entered;
  readonly problems: readonly FormProblem[];
}

/** The form as the contract wants it, with what was typed beside it, and what cannot be read. */
export function readBench(values: BenchValues): BenchReadings {
  const reader = new FormReader();
  const { geometry: g, reading: r, temperatures: t, instruments: i, setup: s } = values;
  const need = (path: BenchFigure, typed: Typed) => reader.need(path, typed, BENCH_FIGURES[path]);
  const may = <Name extends string>(path: BenchFigure, name: Name, typed: Typed): { [K in Name]?: number } => {
    const reading = reader.may(path, typed, BENCH_FIGURES[path]);
    return (reading === undefined ? {} : { [name]: reading }) as { [K in Name]?: number };
  };
  const onExciting = r.wattmeterLead === 'exciting';
  const readings: CoreTestReadings = {
    geometry: {
      kind: g.kind,
      outerDiameterM: need('geometry.outerDiameterM', g.outerDiameterM),
      innerDiameterM: need('geometry.innerDiameterM', g.innerDiameterM),
      slotDepthM: need('geometry.slotDepthM', g.slotDepthM),
      slots: need('geometry.slots', g.slots),
      stackLengthM: need('geometry.stackLengthM', g.stackLengthM),
      ducts: need('geometry.ducts', g.ducts),
      ductWidthM: need('geometry.ductWidthM', g.ductWidthM),
      stackingFactor: need('geometry.stackingFactor', g.stackingFactor),
      densityKgPerM3: need('geometry.densityKgPerM3', g.densityKgPerM3),
    },
    target: { basis: values.target.basis, fluxDensityT: need('target.fluxDensityT', values.target.fluxDensityT) },
    frame: { state: values.frame.state, material: values.frame.material },
    cablePath: values.cablePath,
    massBasis: 'back-iron',
    reading: {
      excitingTurns: need('reading.excitingTurns', r.excitingTurns),
      searchTurns: need('reading.searchTurns', r.searchTurns),
      searchVoltsV: need('reading.searchVoltsV', r.searchVoltsV),
      voltmeter: r.voltmeter,
      ...may('reading.formFactor', 'formFactor', r.formFactor),
      excitingA: need('reading.excitingA', r.excitingA),
      wattsW: need('reading.wattsW', r.wattsW),
      wattmeterLead: r.wattmeterLead,
      ...(onExciting ? may('reading.cableResistanceOhm', 'cableResistanceOhm', r.cableResistanceOhm) : {}),
      ...may('reading.searchBurdenOhm', 'searchBurdenOhm', r.searchBurdenOhm),
      frequencyHz: need('reading.frequencyHz', r.frequencyHz),
    },
    temperatures: {
      ambientC: need('temperatures.ambientC', t.ambientC),
      startC: need('temperatures.startC', t.startC),
      ...may('temperatures.meanC', 'meanC', t.meanC),
      ...may('temperatures.coolestC', 'coolestC', t.coolestC),
      ...may('temperatures.hottestC', 'hottestC', t.hottestC),
      ...may('temperatures.hottestSlot', 'hottestSlot', t.hottestSlot),
      minutes: need('temperatures.minutes', t.minutes),
    },
    instruments: {
      ...Object.fromEntries(METERS.flatMap((meter) => (i[meter] ? [[meter, i[meter]]] : []))),
      ...(i.wattmeterRange.trim() === '' ? {} : { wattmeterRange: i.wattmeterRange.trim() }),
      clampMeter: i.clampMeter,
    },
    checks: { ...values.checks },
    setup: { ...(s.supplyId ? { supplyId: s.supplyId } : {}), ...(s.cableId ? { cableId: s.cableId } : {}), ...(s.parallelCables ? { parallelCables: s.parallelCables } : {}) },
    remark: values.remark.trim(),
  };
  return { readings, entered: reader.entered, problems: reader.problems };
}

/** The readings as the library takes them; the set-up's choice and the remark are no part of the computation. */
export function coreTestInput(phase: Phase, readings: CoreTestReadings): CoreTestInput {
  const { setup: _setup, remark: _remark, ...rest } = readings;
  return { phase, ...rest };
}

const typedAt = (values: BenchValues, path: BenchFigure): Typed => {
  const [part, name] = path.split('.') as ['geometry', 'slots'];
  return values[part][name];
};
/** Whether something stands in this field: what is empty is missing, not wrong. */
export const isFilled = (values: BenchValues, path: string): boolean => !(path in BENCH_FIGURES) || typedAt(values, path as BenchFigure).text.trim() !== '';
