import { recordInputSchema } from '@shared/records';
import { describe, expect, it } from 'vitest';
import type { Typed } from '../../lib/typed.js';
import { finalTestForm, type FinalValues } from './final-test-form.js';
import { levelFor } from './high-potential-form.js';
import { testVoltsFor } from './insulation-form.js';
import { liveTest } from './live-test.js';
import { blankPoint } from './no-load-form.js';
import { CONTEXT, keptRecord, LIMITS, QUARRY_JOB } from './quarry-motor.fixture.js';
import { shaftHeightOf } from './running-form.js';
import { beforeVarnishForm, incomingTestForm } from './winding-test-forms.js';

const typed = (text: string): Typed => ({ text, system: 'si' });
const jobOf = (change: object) => ({ ...CONTEXT, job: { ...QUARRY_JOB, machine: { ...QUARRY_JOB.machine, nameplate: { ...QUARRY_JOB.machine.nameplate, ...change } } } });

/** The sample shop's readings of its first machine, as a person types them. */
function quarryMotor(): FinalValues {
  const v = finalTestForm.start(CONTEXT);
  return {
    ...v,
    insulation: { ...v.insulation, resistanceOhm: typed('2400'), windingTemperatureC: typed('24') },
    windingResistance: { ...v.windingResistance, resistancesOhm: [typed('13.31'), typed('13,36'), typed('13.28')], windingTemperatureC: typed('24') },
    highPotential: { ...v.highPotential, appliedVoltsV: typed('1800'), held: 'yes' },
    noLoad: { ...v.noLoad, points: [{ voltsV: [typed('401'), typed('400'), typed('399')], ampsA: [typed('118.2'), typed('118'), typed('117,5')], wattsW: typed('3960') }], lineResistanceOhm: typed('13.317'), speedRpm: typed('1499') },
    vibration: { ...v.vibration, velocitiesMPerS: [typed('1.4'), typed('1.1'), typed('0,9')], speedRpm: typed('1499') },
    directionRight: 'yes',
    done: { ...v.done, bearings: true },
    bearings: { ...v.bearings, driveEndC: typed('62'), nonDriveEndC: typed('58'), ambientC: typed('24'), changeInHalfHourK: typed('1') },
    surgeDifferenceFraction: typed('4'),
  };
}

describe('the forms of the machine tests', () => {
  it('take rated volts, test volts, frequency, shaft height and poles from the nameplate, and no reading', () => {
    const v = finalTestForm.start(CONTEXT);
    expect(v.insulation).toMatchObject({ windingKind: 'random-wound', ratedVoltageV: typed('400'), testVoltsV: typed('500'), resistanceOhm: typed(''), windingTemperatureC: typed('') });
    expect(v.windingResistance.unit).toBe('milliohm');
    expect(v.highPotential).toMatchObject({ case: 'new-winding', ratedVoltageV: typed('400'), ratedPowerW: typed('200'), seconds: typed('60'), appliedVoltsV: typed(''), held: null });
    expect(v.noLoad).toMatchObject({ frequencyHz: typed('50'), speedRpm: typed(''), lineResistanceOhm: typed('') });
    expect(v.vibration).toMatchObject({ shaftHeightM: typed('315'), mounting: 'free-suspension' });
    expect(v.bearings.poles).toEqual(typed('4'));
    expect(v.done).toEqual({ windingResistance: true, highPotential: true, noLoad: true, vibration: true, bearings: false });
  });

  it.each([
    ['315L', 0.315], ['80', 0.08], ['225S', 0.225], ['250M', 0.25], ['280 M', 0.28], ['160M', 0.16], ['560', 0.56],
    ['405T', null], ['', null], ['B3', null], ['45', null],
  ])('the frame %s has the shaft height %s', (frame, height) => {
    expect(shaftHeightOf(frame)).toBe(height);
  });

  it('a machine of 6.6 kV is form-wound and tested with 2500 V at least; a magnet coil is a field', () => {
    expect(incomingTestForm.start(jobOf({ ratedVoltageV: 6600 })).insulation).toMatchObject({ windingKind: 'form-wound', testVoltsV: typed('2500') });
    expect(incomingTestForm.start(jobOf({ kind: 'ac-magnet' })).insulation.windingKind).toBe('field');
    expect(testVoltsFor(typed('6.6 kV'))).toEqual({ leastV: 2500, mostV: 5000 });
    expect(testVoltsFor(typed('four hundred'))).toBeNull();
  });

  it('take the winding over from an earlier test of the job, and again no reading', () => {
    const incoming = liveTest['incoming-test'](
      { ...incomingTestForm.start(CONTEXT), insulation: { ...incomingTestForm.start(CONTEXT).insulation, ratedVoltageV: typed('690'), resistanceOhm: typed('12'), windingTemperatureC: typed('20'), correctionRule: 'thermosetting' }, done: { windingResistance: false } },
      CONTEXT,
    ).readings;
    const records = [keptRecord({ id: 'r1', kind: 'incoming-test', readings: incoming as unknown as Record<string, unknown> })];
    const v = beforeVarnishForm.start({ ...CONTEXT, records });
    expect(v.insulation).toMatchObject({ ratedVoltageV: typed('690'), correctionRule: 'thermosetting', resistanceOhm: typed(''), windingTemperatureC: typed('') });
  });

  it('a pasted unit is read and kept as it was typed', () => {
    const v = incomingTestForm.start(CONTEXT);
    const { readings, entered, problems } = incomingTestForm.read({ ...v, insulation: { ...v.insulation, resistanceOhm: typed('2.4 GΩ'), windingTemperatureC: typed('24,0') }, done: { windingResistance: false } });
    expect(problems).toEqual([]);
    expect(readings.insulation).toMatchObject({ resistanceOhm: 2.4e9, windingTemperatureC: 24 });
    expect(entered['insulation.resistanceOhm']).toEqual({ text: '2.4 GΩ', unit: 'GΩ' });
    expect(readings.windingResistance).toBeNull();
  });

  it('milliohms are kept as ohms, with a decimal comma too', () => {
    const { readings, entered } = finalTestForm.read(quarryMotor());
    expect(readings.windingResistance!.resistancesOhm).toEqual([0.01331, 0.01336, 0.01328]);
    expect(entered['windingResistance.resistancesOhm.1']).toEqual({ text: '13,36', unit: 'mΩ' });
  });

  it('name every missing figure by its path in the contract', () => {
    const v = finalTestForm.start(CONTEXT);
    expect(liveTest['final-test'](v, CONTEXT).problems.map((p) => p.path)).toEqual([
      'insulation.resistanceOhm',
      'insulation.windingTemperatureC',
      'windingResistance.resistancesOhm.0',
      'windingResistance.resistancesOhm.1',
      'windingResistance.resistancesOhm.2',
      'windingResistance.windingTemperatureC',
      'highPotential.appliedVoltsV',
      'highPotential.held',
      'noLoad.points.0.voltsV.0',
      'noLoad.points.0.voltsV.1',
      'noLoad.points.0.voltsV.2',
      'noLoad.points.0.ampsA.0',
      'noLoad.points.0.ampsA.1',
      'noLoad.points.0.ampsA.2',
      'noLoad.points.0.wattsW',
      'noLoad.lineResistanceOhm',
      'vibration.velocitiesMPerS.0',
    ]);
  });

  it('letters in a field of volts are named there, and negative amperes at their own lead', () => {
    const v = quarryMotor();
    const live = liveTest['final-test']({ ...v, noLoad: { ...v.noLoad, points: [{ ...v.noLoad.points[0]!, ampsA: [typed('118'), typed('-118'), typed('118')] }] }, insulation: { ...v.insulation, testVoltsV: typed('five') } }, CONTEXT);
    expect(live.problems.map((p) => p.path)).toEqual(expect.arrayContaining(['insulation.testVoltsV', 'noLoad.points.0.ampsA.1']));
    expect(live.evaluation).toBeNull();
  });

  it('a gap between two vibration readings is asked for, empty places behind the last are not', () => {
    const v = quarryMotor();
    const places = (...texts: string[]) => liveTest['final-test']({ ...v, vibration: { ...v.vibration, velocitiesMPerS: texts.map(typed) } }, CONTEXT);
    expect(places('1.4', '', '').problems).toEqual([]);
    expect(places('1.4', '', '').readings.vibration!.velocitiesMPerS).toEqual([1.4e-3]);
    expect(places('1.4', '', '0.9').problems.map((p) => p.path)).toEqual(['vibration.velocitiesMPerS.1']);
  });

  it('a test comes back from the record into the form and out again as the same', () => {
    const first = finalTestForm.read(quarryMotor()).readings;
    expect(finalTestForm.read(finalTestForm.from(first, 'si')).readings).toEqual(first);
    expect(finalTestForm.read(finalTestForm.from(first, 'inch-pound')).readings).toEqual(first);
    const v = beforeVarnishForm.start(CONTEXT);
    const varnish = beforeVarnishForm.read({ ...v, insulation: { ...v.insulation, resistanceOhm: typed('900'), windingTemperatureC: typed('24') }, done: { windingResistance: false }, surgeDifferenceFraction: typed('3'), surgePeakV: typed('1.8 kV'), polarityRight: 'no' }).readings;
    expect(varnish).toMatchObject({ surgeDifferenceFraction: 0.03, surgePeakV: 1800, polarityRight: false, windingResistance: null });
    expect(beforeVarnishForm.read(beforeVarnishForm.from(varnish, 'si')).readings).toEqual(varnish);
  });
});

describe('the test as it stands while it is typed', () => {
  // Source: the sample shop's own figures; limits: IEEE 43-2013, ANSI/EASA AR100, IEC 60034-14:2003, each named in its judgement.
  it('the quarry motor conforms in every part and is what the contract takes', () => {
    const live = liveTest['final-test'](quarryMotor(), CONTEXT);
    expect(live.problems).toEqual([]);
    expect(live.evaluation!.verdict).toBe('conforms');
    expect(live.evaluation!.judgements.map((j) => j.test)).toEqual([
      'insulation-resistance', 'insulation-new-winding', 'winding-resistance-balance', 'high-potential', 'surge-difference', 'no-load-current-balance', 'vibration', 'direction', 'bearing-rise',
    ]);
    expect(live.evaluation!.judgements.every((j) => j.verdict === 'conforms')).toBe(true);
    expect(recordInputSchema.safeParse({ kind: 'final-test', readings: live.readings, entered: live.entered }).success).toBe(true);
  });

  it('the level that is offered is the level the library asks for, with its source', () => {
    const { highPotential } = quarryMotor();
    expect(levelFor(highPotential, LIMITS.machine)).toMatchObject({ voltsV: 1800, words: '2 × 400 V + 1000 V', source: expect.stringContaining('AR100') as string });
    expect(levelFor({ ...highPotential, case: 'wound-rotor' }, LIMITS.machine)).toBeNull();
    expect(levelFor({ ...highPotential, case: 'wound-rotor', secondaryVoltsV: typed('205') }, LIMITS.machine)!.voltsV).toBe(1410);
    expect(levelFor({ ...highPotential, ratedVoltageV: typed('') }, LIMITS.machine)).toBeNull();
  });

  it('insulation that is not typed yet, or did not pass, refuses high potential', () => {
    const v = quarryMotor();
    const withOhms = (text: string) => liveTest['final-test']({ ...v, insulation: { ...v.insulation, resistanceOhm: typed(text) } }, CONTEXT);
    expect(withOhms('2400').highPotentialRefused).toBeNull();
    expect(withOhms('').highPotentialRefused).toBe('insulation-first');
    expect(withOhms('12')).toMatchObject({ highPotentialRefused: 'insulation-failed', problems: [{ path: 'highPotential' }] });
    expect(withOhms('12').evaluation!.verdict).toBe('not-valid');
  });

  it('vibration that was left out is missing, bearings that were left out are only not done', () => {
    const v = quarryMotor();
    const live = liveTest['final-test']({ ...v, done: { ...v.done, vibration: false, bearings: false } }, CONTEXT);
    expect(live.problems).toEqual([]);
    expect(live.evaluation).toMatchObject({ verdict: 'not-valid', missing: ['vibration'], notDone: ['vibration', 'bearings', 'core'] });
  });

  it('a half-typed part waits and does not stop the others from being judged', () => {
    const v = quarryMotor();
    const live = liveTest['final-test']({ ...v, noLoad: { ...v.noLoad, points: [...v.noLoad.points, blankPoint('si')] } }, CONTEXT);
    expect([...live.unfinished]).toEqual(['noLoad']);
    expect(live.evaluation!.missing).toEqual(['no-load']);
    expect(live.evaluation!.judgements.find((j) => j.test === 'vibration')!.verdict).toBe('conforms');
  });

  it('three low points part friction from core, at the figures of the library’s own example', () => {
    const at = (volts: string, amps: string, watts: string) => ({ voltsV: [typed(volts), typed(volts), typed(volts)], ampsA: [typed(amps), typed(amps), typed(amps)], wattsW: typed(watts) }) as FinalValues['noLoad']['points'][number];
    const v = quarryMotor();
    const points = [at('400', '11', '618.9'), at('240', '5.6', '327'), at('200', '4.7', '282.4'), at('160', '3.9', '246.5'), at('120', '3.3', '219.5')];
    const live = liveTest['final-test']({ ...v, noLoad: { ...v.noLoad, unit: 'ohm', lineResistanceOhm: typed('0.6'), points } }, CONTEXT);
    const { separation } = (live.evaluation!.derived as { noLoad: { separation: unknown } }).noLoad;
    expect(separation).toMatchObject({ pointsInFit: 4, frictionAndWindageW: expect.closeTo(180.02, 1) as number, coreLossW: expect.closeTo(329.98, 1) as number });
  });

  it('a full test that held is repeated at less', () => {
    const readings = finalTestForm.read(quarryMotor()).readings as unknown as Record<string, unknown>;
    const records = [keptRecord({ id: 'r9', kind: 'final-test', readings })];
    const v = finalTestForm.start({ ...CONTEXT, records });
    expect(v.highPotential.case).toBe('repeat');
    expect(levelFor(v.highPotential, LIMITS.machine)!.voltsV).toBe(1440);
  });
});
