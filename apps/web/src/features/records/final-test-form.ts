import { finalTestProblems, highPotentialLevel, type FinalTestReadings } from '@libs/machine-tests';
import type { UnitSystem } from '@libs/quantities';
import { demandedFinalTestParts } from '@shared/machine-tests';
import type { ReadingsOf } from '@shared/records';
import { FormReader, readTyped, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import { earlierTests, fullTestHeld } from './earlier-tests.js';
import {
  blankInsulation,
  insulationFrom,
  metersFrom,
  namedMeters,
  readInsulation,
  readResistance,
  resistanceFrom,
  startResistance,
  three,
  type InsulationValues,
  type Meters,
  type ResistanceValues,
  type Three,
} from './electrical-form.js';
import { isYes, yesNo, type RecordDefinition, type YesNo } from './record-definition.js';

type Final = ReadingsOf<'final-test'>;
type HighPotential = NonNullable<Final['highPotential']>;
type Vibration = NonNullable<Final['vibration']>;

export const FINAL_METERS = ['insulationTesterId', 'microOhmmeterId', 'highPotentialTesterId', 'surgeTesterId', 'voltmeterId', 'ammeterId', 'wattmeterId', 'vibrationMeterId', 'thermometerId'] as const;
/** Panels that may be left out; what is left out is recorded as not done. */
export const OPTIONAL_PARTS = ['windingResistance', 'highPotential', 'noLoad', 'vibration', 'bearings'] as const;
export type OptionalPart = (typeof OPTIONAL_PARTS)[number];

export interface NoLoadPointValues {
  voltsV: Three;
  ampsA: Three;
  wattsW: Typed;
}
export interface FinalValues {
  insulation: InsulationValues;
  done: Record<OptionalPart, boolean>;
  windingResistance: ResistanceValues;
  highPotential: { case: HighPotential['case']; ratedVoltageV: Typed; secondaryVoltsV: Typed; ratedPowerW: Typed; supply: 'ac' | 'dc'; appliedVoltsV: Typed; seconds: Typed; held: YesNo };
  noLoad: { points: NoLoadPointValues[]; lineResistanceOhm: Typed; frequencyHz: Typed; speedRpm: Typed; ratedVoltageV: Typed };
  vibration: { standard: Vibration['standard']; mounting: Vibration['mounting']; shaftHeightM: Typed; speedRpm: Typed; velocitiesMPerS: Typed[] };
  directionRight: YesNo;
  bearings: { driveEndC: Typed; nonDriveEndC: Typed; ambientC: Typed; changeInHalfHourK: Typed; poles: Typed };
  surgeDifferenceFraction: Typed;
  instruments: Meters;
  remark: string;
}

export const blankPoint = (system: UnitSystem): NoLoadPointValues => ({ voltsV: three(() => untyped(system)), ampsA: three(() => untyped(system)), wattsW: untyped(system) });

/** The library's names of the parts, as the panels are called here. */
const PART_OF = { 'winding-resistance': 'windingResistance', 'high-potential': 'highPotential', 'no-load': 'noLoad', vibration: 'vibration', bearings: 'bearings' } as const;

/** Shaft height in millimetres stands in the frame size of IEC frames: 315L is 315 mm. */
export function shaftHeightOf(frame: string): number | null {
  const match = /^(\d{2,3})\s?[A-Z]*\d?$/i.exec(frame.trim());
  const height = match ? Number(match[1]) : Number.NaN;
  return height >= 56 && height <= 900 && !/^\d{3}T/i.test(frame) ? height / 1000 : null;
}

export const finalTestForm: RecordDefinition<'final-test', FinalValues> = {
  kind: 'final-test',
  start: ({ job, records, system }) => {
    const { nameplate } = job.machine;
    const earlier = earlierTests(records, ['final-test', 'before-varnish-test', 'incoming-test']);
    const demanded = demandedFinalTestParts(nameplate.kind, job.route);
    const empty = () => untyped(system);
    return {
      insulation: blankInsulation(job.machine, system, earlier),
      done: Object.fromEntries(Object.entries(PART_OF).map(([part, name]) => [name, demanded.includes(part as keyof typeof PART_OF)])) as Record<OptionalPart, boolean>,
      windingResistance: startResistance(job.machine, system, earlier),
      highPotential: {
        case: job.route === 'recondition' ? 'reconditioned' : fullTestHeld(records) ? 'repeat' : 'new-winding',
        ratedVoltageV: typedFrom(earlier.insulation?.ratedVoltageV ?? nameplate.ratedVoltageV, 'voltage', system),
        secondaryVoltsV: empty(),
        ratedPowerW: typedFrom(nameplate.ratedPowerW, 'rated-power', system),
        supply: 'ac',
        appliedVoltsV: empty(),
        seconds: typedFrom(60, 'number', system),
        held: null,
      },
      noLoad: { points: [blankPoint(system)], lineResistanceOhm: empty(), frequencyHz: typedFrom(nameplate.ratedFrequencyHz, 'frequency', system), speedRpm: empty(), ratedVoltageV: empty() },
      vibration: { standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: typedFrom(shaftHeightOf(nameplate.frame), 'length', system), speedRpm: empty(), velocitiesMPerS: [empty(), empty(), empty()] },
      directionRight: null,
      bearings: { driveEndC: empty(), nonDriveEndC: empty(), ambientC: empty(), changeInHalfHourK: empty(), poles: typedFrom(nameplate.poles, 'count', system) },
      surgeDifferenceFraction: empty(),
      instruments: metersFrom(FINAL_METERS, {}),
      remark: '',
    };
  },
  from: (r, system) => {
    const empty = () => untyped(system);
    const volts = (si: number | null | undefined) => typedFrom(si, 'voltage', system);
    const { highPotential: h, noLoad: n, vibration: v, bearings: b } = r;
    return {
      insulation: insulationFrom(r.insulation, system),
      done: { windingResistance: r.windingResistance !== null, highPotential: h !== null, noLoad: n !== null, vibration: v !== null, bearings: b !== null },
      windingResistance: resistanceFrom(r.windingResistance, system),
      highPotential: {
        case: h?.case ?? 'new-winding',
        ratedVoltageV: volts(h?.ratedVoltageV ?? r.insulation.ratedVoltageV),
        secondaryVoltsV: volts(h?.secondaryVoltsV),
        ratedPowerW: typedFrom(h?.ratedPowerW, 'rated-power', system),
        supply: h?.supply ?? 'ac',
        appliedVoltsV: volts(h?.appliedVoltsV),
        seconds: typedFrom(h?.seconds ?? 60, 'number', system),
        held: yesNo(h ? h.held : null),
      },
      noLoad: {
        points: n
          ? n.points.map((p) => ({
              voltsV: p.voltsV.map(volts) as Three,
              ampsA: p.ampsA.map((a) => typedFrom(a, 'current', system)) as Three,
              wattsW: typedFrom(p.wattsW, 'power', system),
            }))
          : [blankPoint(system)],
        lineResistanceOhm: typedFrom(n?.lineResistanceOhm, 'resistance', system),
        frequencyHz: typedFrom(n?.frequencyHz, 'frequency', system),
        speedRpm: typedFrom(n?.speedRpm, 'speed', system),
        ratedVoltageV: volts(n?.ratedVoltageV),
      },
      vibration: {
        standard: v?.standard ?? 'iec-60034-14-2003',
        mounting: v?.mounting ?? 'free-suspension',
        shaftHeightM: typedFrom(v?.shaftHeightM, 'length', system),
        speedRpm: typedFrom(v?.speedRpm, 'speed', system),
        velocitiesMPerS: v ? v.velocitiesMPerS.map((x) => typedFrom(x, 'vibration-velocity', system)) : [empty(), empty(), empty()],
      },
      directionRight: yesNo(r.directionRight),
      bearings: {
        driveEndC: typedFrom(b?.driveEndC, 'temperature', system),
        nonDriveEndC: typedFrom(b?.nonDriveEndC, 'temperature', system),
        ambientC: typedFrom(b?.ambientC, 'temperature', system),
        changeInHalfHourK: typedFrom(b?.changeInHalfHourK, 'temperature-difference', system),
        poles: typedFrom(b?.poles, 'count', system),
      },
      surgeDifferenceFraction: typedFrom(r.surgeDifferenceFraction, 'percent', system),
      instruments: metersFrom(FINAL_METERS, r.instruments),
      remark: r.remark,
    };
  },
  read: (values) => {
    const reader = new FormReader();
    const { done } = values;
    const readings: Final = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      highPotential: done.highPotential ? readHighPotential(reader, values.highPotential) : null,
      noLoad: done.noLoad ? readNoLoad(reader, values.noLoad) : null,
      vibration: done.vibration ? readVibration(reader, values.vibration) : null,
      directionRight: isYes(values.directionRight),
      bearings: done.bearings
        ? {
            driveEndC: reader.need('bearings.driveEndC', values.bearings.driveEndC, 'temperature'),
            nonDriveEndC: reader.need('bearings.nonDriveEndC', values.bearings.nonDriveEndC, 'temperature'),
            ambientC: reader.need('bearings.ambientC', values.bearings.ambientC, 'temperature'),
            changeInHalfHourK: reader.need('bearings.changeInHalfHourK', values.bearings.changeInHalfHourK, 'temperature-difference'),
            poles: reader.need('bearings.poles', values.bearings.poles, 'count'),
          }
        : null,
      surgeDifferenceFraction: reader.may('surgeDifferenceFraction', values.surgeDifferenceFraction, 'percent') ?? null,
      instruments: namedMeters(values.instruments),
      remark: values.remark,
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
  check: (readings, { limits }) => finalTestProblems(finalReadings(readings), limits.machine).map(({ path, message }) => ({ path: atLead(path, readings), message })),
};

/** The library names the three volts or amperes of a point; the box is the first of them that cannot be. */
function atLead(path: string, { noLoad }: Final): string {
  const [, point, figure] = /^noLoad\.points\.(\d+)\.(voltsV|ampsA)$/.exec(path) ?? [];
  if (point === undefined) return path;
  const three = noLoad?.points[Number(point)]?.[figure as 'voltsV' | 'ampsA'] ?? [];
  return `${path}.${Math.max(0, three.findIndex((figureSi) => !(figureSi > 0)))}`;
}

/** The readings as the library takes them; the core is judged at its own gate, and only shown here. */
export function finalReadings({ instruments: _instruments, remark: _remark, ...readings }: Final): FinalTestReadings {
  return { ...readings, core: null };
}

const WOUND_ROTORS: readonly HighPotential['case'][] = ['wound-rotor', 'wound-rotor-reversing'];
export const asksSecondaryVolts = (of: HighPotential['case']): boolean => WOUND_ROTORS.includes(of);

function readHighPotential(reader: FormReader, h: FinalValues['highPotential']): HighPotential {
  const rotor = asksSecondaryVolts(h.case);
  if (h.held === null) reader.note('highPotential.held', 'Say whether it held.');
  return {
    case: h.case,
    ratedVoltageV: reader.need('highPotential.ratedVoltageV', h.ratedVoltageV, 'voltage'),
    ...(rotor ? { secondaryVoltsV: reader.need('highPotential.secondaryVoltsV', h.secondaryVoltsV, 'voltage') } : {}),
    ratedPowerW: reader.may('highPotential.ratedPowerW', h.ratedPowerW, 'rated-power') ?? null,
    supply: h.supply,
    appliedVoltsV: reader.need('highPotential.appliedVoltsV', h.appliedVoltsV, 'voltage'),
    seconds: reader.need('highPotential.seconds', h.seconds, 'number'),
    held: h.held === 'yes',
  };
}

function readNoLoad(reader: FormReader, n: FinalValues['noLoad']): NonNullable<Final['noLoad']> {
  const ratedVoltageV = reader.may('noLoad.ratedVoltageV', n.ratedVoltageV, 'voltage');
  type Point = NonNullable<Final['noLoad']>['points'][number];
  return {
    points: n.points.map((p, i): Point => ({
      voltsV: p.voltsV.map((v, j) => reader.need(`noLoad.points.${i}.voltsV.${j}`, v, 'voltage')) as Point['voltsV'],
      ampsA: p.ampsA.map((a, j) => reader.need(`noLoad.points.${i}.ampsA.${j}`, a, 'current')) as Point['ampsA'],
      wattsW: reader.need(`noLoad.points.${i}.wattsW`, p.wattsW, 'power'),
    })),
    lineResistanceOhm: reader.need('noLoad.lineResistanceOhm', n.lineResistanceOhm, 'resistance'),
    frequencyHz: reader.need('noLoad.frequencyHz', n.frequencyHz, 'frequency'),
    speedRpm: reader.may('noLoad.speedRpm', n.speedRpm, 'speed') ?? null,
    ...(ratedVoltageV === undefined ? {} : { ratedVoltageV }),
  };
}

/** Places that were left empty were not measured; one at least must be. What is wrong is said at the box it stands in. */
function readVibration(reader: FormReader, v: FinalValues['vibration']): Vibration {
  const velocities: number[] = [];
  v.velocitiesMPerS.forEach((typed, box) => {
    const reading = readTyped(typed, 'vibration-velocity');
    if (reading.state === 'wrong') reader.note(`vibration.velocitiesMPerS.${box}`, reading.words);
    if (reading.state === 'read') velocities.push(reader.need(`vibration.velocitiesMPerS.${velocities.length}`, typed, 'vibration-velocity'));
  });
  if (v.velocitiesMPerS.every((typed) => typed.text.trim() === '')) reader.note('vibration.velocitiesMPerS.0', 'Measure at least one place.');
  return {
    standard: v.standard,
    mounting: v.mounting,
    shaftHeightM: reader.may('vibration.shaftHeightM', v.shaftHeightM, 'length') ?? null,
    speedRpm: reader.may('vibration.speedRpm', v.speedRpm, 'speed') ?? null,
    velocitiesMPerS: velocities,
  };
}

/** The level that is asked, as soon as case and rated volts are known; null before. */
export function levelNow(readings: Pick<Final, 'highPotential'>, limits: Parameters<typeof highPotentialLevel>[1]) {
  const h = readings.highPotential;
  if (!h || !(h.ratedVoltageV > 0) || (asksSecondaryVolts(h.case) && !((h.secondaryVoltsV ?? 0) > 0)) || (h.ratedPowerW !== null && !(h.ratedPowerW > 0))) return null;
  return highPotentialLevel(h, limits);
}
