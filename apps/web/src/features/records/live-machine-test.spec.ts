import type { ReadingsOf } from '@shared/records';
import { describe, expect, it } from 'vitest';
import { sampleJob, SAMPLE_BAY, SAMPLE_LIMITS } from '../../../test/sample-job.js';
import { judgementsOf, runningBeforeVarnish, runningFinal } from './live-machine-test.js';
import type { RecordContext } from './record-definition.js';

const context: RecordContext = { job: sampleJob(12), records: [], limits: SAMPLE_LIMITS, bay: SAMPLE_BAY, system: 'si' };
/** Final test of the invented sample shop’s delivered motor. */
const readings: ReadingsOf<'final-test'> = {
  insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2400e6, windingTemperatureC: 24, correctionRule: 'halving' },
  windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24, construction: 'random-wound' },
  highPotential: { case: 'new-winding', ratedVoltageV: 400, ratedPowerW: 200e3, supply: 'ac', appliedVoltsV: 1800, seconds: 60, held: true },
  noLoad: { points: [{ voltsV: [401, 400, 399], ampsA: [118.2, 118, 117.5], wattsW: 3960 }], lineResistanceOhm: 0.0133, frequencyHz: 50, speedRpm: 1499 },
  vibration: { standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: 0.315, speedRpm: null, velocitiesMPerS: [0.0014, 0.0011, 0.0009] },
  directionRight: true,
  bearings: { driveEndC: 62, nonDriveEndC: 58, ambientC: 24, changeInHalfHourK: 1, poles: 4 },
  surgeDifferenceFraction: 0.04,
  instruments: {},
  remark: '',
};

describe('a machine test while it is typed', () => {
  it('lets the delivered motor conform in every part', () => {
    const running = runningFinal(readings, true, context)!;
    expect(running.verdict).toBe('conforms');
    expect(running.missing).toEqual([]);
    expect(running.judgements.every((j) => j.verdict === 'conforms')).toBe(true);
  });

  it('leaves a part that is not complete out, and says what is still to be done', () => {
    const half = { ...readings, noLoad: { ...readings.noLoad!, lineResistanceOhm: Number.NaN } };
    const running = runningFinal(half, true, context)!;
    expect(running.verdict).toBe('not-valid');
    expect(running.missing).toEqual(['no-load']);
    expect(judgementsOf(running, 'noLoad')).toEqual([]);
    expect(judgementsOf(running, 'vibration').map((j) => j.verdict)).toEqual(['conforms']);
  });

  it('judges no high potential before somebody said whether it held', () => {
    expect(judgementsOf(runningFinal(readings, null, context), 'highPotential')).toEqual([]);
    expect(judgementsOf(runningFinal({ ...readings, highPotential: { ...readings.highPotential!, held: false } }, false, context), 'highPotential').map((j) => j.verdict)).toEqual(['does-not-conform']);
  });

  it('has nothing to say before the insulation is read', () => {
    expect(runningFinal({ ...readings, insulation: { ...readings.insulation, resistanceOhm: Number.NaN } }, true, context)).toBeNull();
  });

  it('says vibration over the limit of its shaft height, and by how much', () => {
    const rough = { ...readings, vibration: { ...readings.vibration!, velocitiesMPerS: [0.0031] } };
    const [judged] = judgementsOf(runningFinal(rough, true, context), 'vibration');
    expect(judged).toMatchObject({ verdict: 'does-not-conform', measured: 0.0031, limit: 0.0028 }); // IEC 60034-14:2003, over 280 mm, free suspension
  });

  it('asks for surge and polarity before varnish', () => {
    const { insulation, windingResistance } = readings;
    const running = runningBeforeVarnish({ insulation, windingResistance, surgeDifferenceFraction: null, surgePeakV: null, polarityRight: null, instruments: {}, remark: '' }, context)!;
    expect(running.missing).toEqual(['surge', 'polarity']);
    const done = runningBeforeVarnish({ insulation, windingResistance, surgeDifferenceFraction: 0.03, surgePeakV: null, polarityRight: false, instruments: {}, remark: '' }, context)!;
    expect(judgementsOf(done, 'polarity').map((j) => j.verdict)).toEqual(['does-not-conform']);
  });
});
