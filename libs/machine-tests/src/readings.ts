import type { Verdict } from '@libs/measurement';

export type InsulatedWinding = 'random-wound' | 'form-wound' | 'dc-armature' | 'field';
/** `halving`: the general rule before 2013; `thermosetting`: IEEE 43-2013. They differ much: the report names the rule. */
export type CorrectionRule = 'halving' | 'thermosetting';

export interface InsulationReading {
  windingKind: InsulatedWinding;
  /** Line to line, or DC volts of a DC winding. */
  ratedVoltageV: number;
  testVoltsV: number;
  /** After one minute. */
  resistanceOhm: number;
  windingTemperatureC: number;
  correctionRule: CorrectionRule;
  tenMinuteResistanceOhm?: number | undefined;
}

export interface WindingResistanceReading {
  /** Between the three pairs of leads. */
  resistancesOhm: [number, number, number];
  windingTemperatureC: number;
  construction: 'random-wound' | 'form-wound' | 'concentric';
}

export interface IncomingTestReadings {
  insulation: InsulationReading;
  windingResistance: WindingResistanceReading | null;
}

export interface BeforeVarnishReadings {
  insulation: InsulationReading;
  windingResistance: WindingResistanceReading | null;
  /** Area between two waves over the area of the wave: 0.03 is 3 %. */
  surgeDifferenceFraction: number | null;
  surgePeakV: number | null;
  /** A dummy rotor turned one way in every position. */
  polarityRight: boolean | null;
}

export type HighPotentialCase = 'new-winding' | 'repeat' | 'reconditioned' | 'part-rewound' | 'wound-rotor' | 'wound-rotor-reversing';

export interface HighPotentialReading {
  case: HighPotentialCase;
  /** The volts of the winding that is tested, line to line. */
  ratedVoltageV: number;
  /** Of a wound rotor, between slip rings at standstill. */
  secondaryVoltsV?: number | undefined;
  ratedPowerW: number | null;
  supply: 'ac' | 'dc';
  appliedVoltsV: number;
  seconds: number;
  held: boolean;
}

/** One setting of the no-load run: three line volts, three line amperes, watts in. */
export interface NoLoadPoint {
  voltsV: [number, number, number];
  ampsA: [number, number, number];
  wattsW: number;
}

export interface NoLoadReading {
  points: NoLoadPoint[];
  /** Between two leads, winding as warm as in the run. */
  lineResistanceOhm: number;
  frequencyHz: number;
  speedRpm: number | null;
  /** Of the winding that is fed; left out, it is the volts of the insulation reading. A wound rotor needs it. */
  ratedVoltageV?: number | undefined;
}

export interface VibrationReading {
  standard: 'iec-60034-14-2003' | 'nema-mg1';
  mounting: 'free-suspension' | 'rigid';
  /** Of the IEC table; A unless told. B is for machines with special needs. NEMA knows no grades. */
  grade?: 'A' | 'B' | undefined;
  shaftHeightM: number | null;
  speedRpm: number | null;
  /** rms by IEC, peak by NEMA. */
  velocitiesMPerS: number[];
}

export interface BearingReading {
  driveEndC: number;
  nonDriveEndC: number;
  ambientC: number;
  changeInHalfHourK: number;
  poles: number;
}

export interface FinalTestReadings {
  insulation: InsulationReading;
  windingResistance: WindingResistanceReading | null;
  highPotential: HighPotentialReading | null;
  noLoad: NoLoadReading | null;
  vibration: VibrationReading | null;
  directionRight: boolean | null;
  bearings: BearingReading | null;
  /** Taken over from the core test after burnout. */
  core: { wattsPerKg: number | null; verdict: Verdict | null } | null;
  /** Surge comparison of the finished winding, where one was made. */
  surgeDifferenceFraction?: number | null | undefined;
}

/** The parts a shop or a customer may demand of a final test. */
export const FINAL_TEST_PARTS = ['insulation', 'winding-resistance', 'high-potential', 'no-load', 'vibration', 'direction', 'bearings', 'core'] as const;
export type FinalTestPart = (typeof FINAL_TEST_PARTS)[number];

export const BEFORE_VARNISH_PARTS = ['insulation', 'winding-resistance', 'surge', 'polarity'] as const;
export type BeforeVarnishPart = (typeof BEFORE_VARNISH_PARTS)[number];
