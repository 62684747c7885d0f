import type { BeforeVarnishReadings, FinalTestReadings, InsulationReading } from './index.js';

/** The quarry motor of the sample shop: 200 kW, 400 V delta, 50 Hz, four poles, frame 315. Constructed, not measured. */
export const insulation: InsulationReading = { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2400e6, windingTemperatureC: 24, correctionRule: 'halving' };

export const beforeVarnish: BeforeVarnishReadings = {
  insulation: { ...insulation, resistanceOhm: 900e6 },
  windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24, construction: 'random-wound' },
  surgeDifferenceFraction: 0.03,
  surgePeakV: 1800,
  polarityRight: true,
};

export const finalTest: FinalTestReadings = {
  insulation,
  windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24, construction: 'random-wound' },
  highPotential: { case: 'new-winding', ratedVoltageV: 400, ratedPowerW: 200e3, supply: 'ac', appliedVoltsV: 1800, seconds: 60, held: true },
  noLoad: { points: [{ voltsV: [401, 400, 399], ampsA: [118.2, 118, 117.5], wattsW: 3960 }], lineResistanceOhm: 0.0133167, frequencyHz: 50, speedRpm: 1499 },
  vibration: { standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: 0.315, speedRpm: 1499, velocitiesMPerS: [1.4e-3, 1.1e-3, 0.9e-3] },
  directionRight: true,
  bearings: { driveEndC: 62, nonDriveEndC: 58, ambientC: 24, changeInHalfHourK: 1, poles: 4 },
  core: { wattsPerKg: 2.84, verdict: 'conforms' },
  surgeDifferenceFraction: 0.04,
};
