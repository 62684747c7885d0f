import type { ReadingsOf, RecordView } from '@shared/records';
import { describe, expect, it } from 'vitest';
import { keptTest, sampleBefore, sampleJob, SAMPLE_BAY, SAMPLE_LIMITS } from '../../../test/sample-job.js';
import { finalTestForm } from './final-test-form.js';
import type { FormKind, RecordContext } from './record-definition.js';
import { beforeVarnishForm, incomingTestForm } from './winding-test-forms.js';

const recorded = (kind: FormKind, readings: unknown): RecordView => ({ ...keptTest('core-test-before', sampleBefore(12)), id: `rec-${kind}`, kind, readings: readings as Record<string, unknown>, result: {}, verdict: null });
const context = (records: RecordView[] = [], route: 'rewind' | 'recondition' = 'rewind'): RecordContext => ({ job: { ...sampleJob(12), route }, records, limits: SAMPLE_LIMITS, bay: SAMPLE_BAY, system: 'si' });

const INCOMING: ReadingsOf<'incoming-test'> = {
  insulation: { windingKind: 'form-wound', ratedVoltageV: 6600, testVoltsV: 2500, resistanceOhm: 2400e6, windingTemperatureC: 24, correctionRule: 'thermosetting', tenMinuteResistanceOhm: 4800e6 },
  windingResistance: { resistancesOhm: [0.5, 0.5, 0.5], windingTemperatureC: 24, construction: 'form-wound' },
  instruments: {},
  remark: '',
};
const highPotential = { case: 'new-winding', ratedVoltageV: 6600, ratedPowerW: null, supply: 'ac', appliedVoltsV: 14_200, seconds: 60, held: true } as const; // 2 × 6600 + 1000
const finalTest = (change: object = {}) => recorded('final-test', { ...INCOMING, highPotential: { ...highPotential, ...change }, noLoad: null, vibration: null, directionRight: null, bearings: null, surgeDifferenceFraction: null });

describe('a test of a machine that was tested earlier on this job', () => {
  it('takes over what the winding is and its rated volts, and never a reading', () => {
    const { insulation, windingResistance } = beforeVarnishForm.start(context([recorded('incoming-test', INCOMING)]));
    expect(insulation).toMatchObject({ windingKind: 'form-wound', correctionRule: 'thermosetting', ratedVoltageV: { text: '6600' }, testVoltsV: { text: '2500' } });
    expect(windingResistance.construction).toBe('form-wound');
    expect([insulation.resistanceOhm.text, insulation.windingTemperatureC.text, insulation.tenMinuteResistanceOhm.text, windingResistance.resistancesOhm[0].text]).toEqual(['', '', '', '']);
  });

  it('starts from the nameplate where nothing was tested yet', () => {
    expect(incomingTestForm.start(context()).insulation).toMatchObject({ windingKind: 'random-wound', ratedVoltageV: { text: '400' }, testVoltsV: { text: '500' } });
  });

  it('puts the earlier rated volts under high potential as well', () => {
    expect(finalTestForm.start(context([recorded('incoming-test', INCOMING)])).highPotential.ratedVoltageV.text).toBe('6600');
  });
});

describe('a second final test', () => {
  it('starts as a repeat once a full high-potential test held', () => {
    expect(finalTestForm.start(context()).highPotential.case).toBe('new-winding');
    expect(finalTestForm.start(context([finalTest()])).highPotential.case).toBe('repeat');
  });

  it('stays the first full test where the one before did not hold, was of an old winding, or was left out', () => {
    expect(finalTestForm.start(context([finalTest({ held: false })])).highPotential.case).toBe('new-winding');
    expect(finalTestForm.start(context([finalTest({ case: 'reconditioned' })])).highPotential.case).toBe('new-winding');
    const leftOut = finalTest();
    expect(finalTestForm.start(context([{ ...leftOut, readings: { ...leftOut.readings, highPotential: null } }])).highPotential.case).toBe('new-winding');
  });

  it('of a reconditioned machine stays at the level of an old winding', () => {
    expect(finalTestForm.start(context([finalTest()], 'recondition')).highPotential.case).toBe('reconditioned');
  });
});
