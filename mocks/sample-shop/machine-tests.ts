import type { BeforeVarnishReadingsInput, FinalTestReadingsInput, IncomingTestReadingsInput } from '@shared/machine-tests';
import { MACHINES } from './machines.js';

export type Meters = Readonly<Record<string, string>>;
type Insulation = IncomingTestReadingsInput['insulation'];

function insulation(machine: number, megohms: number, temperature: number): Insulation {
  const { nameplate } = MACHINES[machine]!;
  const volts = nameplate.ratedVoltageV!;
  const kind = nameplate.kind === 'dc' ? 'dc-armature' : nameplate.kind === 'ac-magnet' ? 'field' : volts > 1000 ? 'form-wound' : 'random-wound';
  return { windingKind: kind, ratedVoltageV: volts, testVoltsV: volts > 5000 ? 2500 : 500, resistanceOhm: megohms * 1e6, windingTemperatureC: temperature, correctionRule: 'halving' };
}

/** Resistances between leads at 20 °C, from the windings' own figures. */
const OHMS: Record<number, number> = { 1: 0.0131, 2: 0.0364, 3: 0.0711, 6: 0.2622, 7: 0.0589, 8: 21.1, 9: 0.062, 10: 0.7502, 11: 0.021, 12: 0.1523, 13: 1.12, 14: 0.262 };

function resistance(machine: number, temperature: number, faulty: boolean): IncomingTestReadingsInput['windingResistance'] {
  const ohms = OHMS[machine];
  if (ohms === undefined) return null;
  const warm = ohms * ((235 + temperature) / 255);
  const round = (value: number) => Number(value.toPrecision(5));
  const construction = MACHINES[machine]!.nameplate.ratedVoltageV! > 1000 ? 'form-wound' : 'random-wound';
  return { resistancesOhm: [round(warm * 1.002), round(warm * (faulty ? 1.064 : 1.005)), round(warm)], windingTemperatureC: temperature, construction };
}

/** As found: most of these came in burnt or earthed. */
export function incomingTest(machine: number, meters: Meters, megohms = 0.4): IncomingTestReadingsInput {
  return {
    insulation: insulation(machine, megohms, 20),
    windingResistance: resistance(machine, 20, megohms < 5),
    instruments: { insulationTesterId: meters['insulation-tester']!, microOhmmeterId: meters['micro-ohmmeter']! },
    remark: '',
  };
}

export function beforeVarnish(machine: number, meters: Meters): BeforeVarnishReadingsInput {
  return {
    insulation: insulation(machine, 900, 24),
    windingResistance: resistance(machine, 24, false),
    surgeDifferenceFraction: 0.03,
    surgePeakV: 2 * MACHINES[machine]!.nameplate.ratedVoltageV! + 1000,
    polarityRight: true,
    instruments: { insulationTesterId: meters['insulation-tester']!, microOhmmeterId: meters['micro-ohmmeter']!, surgeTesterId: meters['surge-tester']! },
    remark: '',
  };
}

interface Running {
  readonly volts: readonly [number, number, number];
  readonly amps: readonly [number, number, number];
  readonly watts: number;
  readonly ohms: number;
  readonly rpm: number;
  readonly shaftHeightMm: number;
  readonly vibration: readonly [number, number, number];
}

/** Machine 1 as in its own final test; the others by the same pattern from their nameplates. */
const RUNNING: Record<number, Running> = {
  1: { volts: [401, 400, 399], amps: [118.2, 118.0, 117.5], watts: 3960, ohms: 0.01332, rpm: 1499, shaftHeightMm: 315, vibration: [1.4, 1.1, 0.9] },
  9: { volts: [461, 460, 459], amps: [36.4, 36.2, 36.1], watts: 1710, ohms: 0.063, rpm: 1798, shaftHeightMm: 254, vibration: [1.2, 1.0, 0.8] },
  10: { volts: [400, 401, 400], amps: [8.6, 8.5, 8.5], watts: 520, ohms: 0.762, rpm: 1497, shaftHeightMm: 160, vibration: [0.9, 0.8, 0.7] },
};

export function finalTest(machine: number, meters: Meters): FinalTestReadingsInput {
  const { nameplate } = MACHINES[machine]!;
  const run = RUNNING[machine]!;
  return {
    insulation: insulation(machine, machine === 1 ? 2400 : 1800, 24),
    windingResistance: machine === 1 ? { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24, construction: 'random-wound' } : resistance(machine, 24, false),
    highPotential: { case: 'new-winding', ratedVoltageV: nameplate.ratedVoltageV!, ratedPowerW: nameplate.ratedPowerW, supply: 'ac', appliedVoltsV: 2 * nameplate.ratedVoltageV! + 1000, seconds: 60, held: true },
    noLoad: { points: [{ voltsV: [...run.volts], ampsA: [...run.amps], wattsW: run.watts }], lineResistanceOhm: run.ohms, frequencyHz: nameplate.ratedFrequencyHz!, speedRpm: run.rpm },
    vibration: { standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: run.shaftHeightMm / 1000, speedRpm: run.rpm, velocitiesMPerS: run.vibration.map((v) => v / 1000) },
    directionRight: true,
    bearings: { driveEndC: 62, nonDriveEndC: 58, ambientC: 24, changeInHalfHourK: 1, poles: nameplate.poles! },
    surgeDifferenceFraction: 0.04,
    instruments: {
      insulationTesterId: meters['insulation-tester']!,
      microOhmmeterId: meters['micro-ohmmeter']!,
      highPotentialTesterId: meters['high-potential-tester']!,
      surgeTesterId: meters['surge-tester']!,
      vibrationMeterId: meters['vibration-meter']!,
      wattmeterId: meters['wattmeter']!,
      ammeterId: meters['ammeter']!,
      voltmeterId: meters['voltmeter']!,
    },
    remark: '',
  };
}
