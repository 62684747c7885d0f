import { recordInputSchema, type ReadingsOf } from '@shared/records';
import { describe, expect, it } from 'vitest';
import { keptTest, sampleBefore, sampleJob, SAMPLE_BAY, SAMPLE_LIMITS } from '../../../test/sample-job.js';
import { finalTestForm, levelNow, shaftHeightOf } from './final-test-form.js';
import { problemsIn, type FormKind, type RecordContext, type RecordDefinition } from './record-definition.js';
import { stripForm, stripLimit } from './strip-form.js';
import { differencesOf, windingAsFoundForm, windingAsWoundForm } from './winding-form.js';
import { beforeVarnishForm, incomingTestForm } from './winding-test-forms.js';
import { assemblyForm, coreRepairForm, dismantlingForm, treatmentForm } from './workshop-forms.js';

const typed = (text: string, system: 'si' | 'inch-pound' = 'si') => ({ text, system });
const recorded = (kind: FormKind, readings: unknown) => ({ ...keptTest('core-test-before', sampleBefore(12)), id: `rec-${kind}`, kind, readings: readings as Record<string, unknown>, result: {}, verdict: null });
const context = (records: RecordContext['records'] = []): RecordContext => ({ job: sampleJob(12), records, limits: SAMPLE_LIMITS, bay: SAMPLE_BAY, system: 'si' });
const pathsOf = <K extends FormKind, V>(definition: RecordDefinition<K, V>, values: V, at = context()) => problemsIn(definition, definition.read(values), at).map((p) => p.path);

/** The winding of the invented sample shop’s machine 12. */
const WINDING: ReadingsOf<'winding-as-found'> = {
  slots: 48,
  poles: 4,
  layers: 2,
  coils: 48,
  turnsPerCoil: 12,
  spanFrom: 1,
  spanTo: 11,
  grouping: '4-4-4',
  connection: 'delta',
  circuits: 2,
  wires: [{ strands: 4, bareDiameterM: 0.00106 }],
  coilExtensionM: 0.085,
  meanTurnM: 0.975,
  leads: '6',
  remark: '',
};
const DISMANTLED: ReadingsOf<'dismantling'> = { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'Bore clean.', fits: '' };
const STRIPPED: ReadingsOf<'strip'> = { method: 'oven-burnout', ovenId: 'o2', commutatorOrSlipRingsOn: false, wiresCountedAtCut: 96, sampleCoilKept: true, partPeakC: 368, minutesAbove345C: 150, sensorPosition: 'tooth', explanation: '' };
/** Final test of the sample shop’s delivered 200 kW motor. */
const DELIVERED: ReadingsOf<'final-test'> = {
  insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2400e6, windingTemperatureC: 24, correctionRule: 'halving' },
  windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328], windingTemperatureC: 24, construction: 'random-wound' },
  highPotential: { case: 'new-winding', ratedVoltageV: 400, ratedPowerW: 200e3, supply: 'ac', appliedVoltsV: 1800, seconds: 60, held: true },
  noLoad: { points: [{ voltsV: [401, 400, 399], ampsA: [118.2, 118, 117.5], wattsW: 3960 }], lineResistanceOhm: 0.0133, frequencyHz: 50, speedRpm: 1499 },
  vibration: { standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: 0.315, speedRpm: null, velocitiesMPerS: [0.0014, 0.0011, 0.0009] },
  directionRight: true,
  bearings: { driveEndC: 62, nonDriveEndC: 58, ambientC: 24, changeInHalfHourK: 1, poles: 4 },
  surgeDifferenceFraction: 0.04,
  instruments: { insulationTesterId: 'inst-i-01' },
  remark: '',
};

describe('every record form', () => {
  const kept: readonly [RecordDefinition<FormKind, never>, Record<string, unknown>][] = [
    [dismantlingForm as never, DISMANTLED],
    [windingAsFoundForm as never, WINDING],
    [windingAsWoundForm as never, WINDING],
    [stripForm as never, STRIPPED],
    [coreRepairForm as never, { methods: ['grind', 'etch'], slotFrom: 11, slotTo: 15, words: 'Bore, 40 mm from the non-drive end.' }],
    [incomingTestForm as never, { insulation: DELIVERED.insulation, windingResistance: null, instruments: {}, remark: '' }],
    [beforeVarnishForm as never, { insulation: { ...DELIVERED.insulation, tenMinuteResistanceOhm: 4000e6 }, windingResistance: DELIVERED.windingResistance, surgeDifferenceFraction: 0.03, surgePeakV: 1800, polarityRight: true, instruments: {}, remark: '' }],
    [treatmentForm as never, { process: 'vacuum-pressure', material: 'Polyester resin', batch: '', bakeTemperatureC: 150, bakeMinutes: 360, cycles: 1 }],
    [assemblyForm as never, { bearingDriveEnd: '6313', bearingNonDriveEnd: '6312', grease: '', turnsFreely: true, words: '' }],
    [finalTestForm as never, DELIVERED],
  ];

  it('gives a kept record back as the very readings it was kept with, in both unit systems', () => {
    for (const [definition, readings] of kept) {
      for (const system of ['si', 'inch-pound'] as const) expect(definition.read(definition.from(readings as never, system)).readings, definition.kind).toEqual(readings);
    }
  });

  it('reads what the contract takes, and then finds nothing in the way', () => {
    const at = context([recorded('dismantling', DISMANTLED)]);
    for (const [definition, readings] of kept) {
      expect(recordInputSchema.safeParse({ kind: definition.kind, readings, entered: {} }).success, definition.kind).toBe(true);
      expect(pathsOf(definition, definition.from(readings as never, 'si'), at), definition.kind).toEqual([]);
    }
  });

  it('names what is missing in an untouched form by the path of its reading', () => {
    expect(pathsOf(dismantlingForm, dismantlingForm.start(context()))).toEqual(['corePlate', 'frameMaterial', 'inspection', 'rotorOut']);
    expect(pathsOf(treatmentForm, treatmentForm.start(context()))).toEqual(['bakeTemperatureC', 'bakeMinutes', 'process', 'material']);
    expect(pathsOf(coreRepairForm, coreRepairForm.start(context()))).toEqual(['methods', 'words']);
    expect(pathsOf(windingAsFoundForm, windingAsFoundForm.start(context()))).toEqual(['coils', 'turnsPerCoil', 'spanTo', 'circuits', 'wires.0.strands', 'wires.0.bareDiameterM']);
    expect(pathsOf(finalTestForm, finalTestForm.start(context()))).toContain('noLoad.points.0.voltsV.2');
  });
});

describe('figures as a shop types them', () => {
  it('takes milliohms, a decimal comma and inches, and keeps what was typed', () => {
    const values = finalTestForm.from(DELIVERED, 'si');
    values.windingResistance.resistancesOhm[0] = typed('13,31 mΩ');
    values.vibration.velocitiesMPerS[0] = typed('0.055 in/s');
    values.insulation.windingTemperatureC = typed('75.2', 'inch-pound');
    const { readings, entered, problems } = finalTestForm.read(values);
    expect(problems).toEqual([]);
    expect(readings.windingResistance!.resistancesOhm[0]).toBeCloseTo(0.01331, 12);
    expect(readings.vibration!.velocitiesMPerS[0]).toBeCloseTo(0.001397, 9); // 1 in = 25.4 mm
    expect(readings.insulation.windingTemperatureC).toBeCloseTo(24, 9); // (75.2 − 32)/1.8
    expect(entered['windingResistance.resistancesOhm.0']).toEqual({ text: '13,31 mΩ', unit: 'mΩ' });
  });

  it('says letters at the box they stand in, even where empty boxes are left out', () => {
    const values = finalTestForm.from(DELIVERED, 'si');
    values.vibration.velocitiesMPerS = [typed('1.4'), typed(''), typed('high')];
    expect(finalTestForm.read(values).problems).toEqual([{ path: 'vibration.velocitiesMPerS.2', message: expect.stringContaining('not a number') as string }]);
    values.vibration.velocitiesMPerS = [typed('1.4'), typed(''), typed('0.9')];
    expect(finalTestForm.read(values).readings.vibration!.velocitiesMPerS).toEqual([0.0014, 0.0009]);
  });

  it('records a panel that was left out as not done, whatever was typed in it', () => {
    const values = finalTestForm.from(DELIVERED, 'si');
    values.done.bearings = false;
    values.bearings.driveEndC = typed('nonsense');
    expect(finalTestForm.read(values)).toMatchObject({ readings: { bearings: null }, problems: [] });
  });

  it('never takes for granted that a winding held', () => {
    const values = finalTestForm.from(DELIVERED, 'si');
    values.highPotential.held = null;
    expect(pathsOf(finalTestForm, values)).toEqual(['highPotential.held']);
  });
});

describe('the final test', () => {
  it('demands of an induction motor what the shop demands, and leaves the bearings to choice', () => {
    expect(finalTestForm.start(context()).done).toEqual({ windingResistance: true, highPotential: true, noLoad: true, vibration: true, bearings: false });
  });

  it('offers the level of twice the rated volts and a thousand, 65 % of it for a reconditioned winding', () => {
    const level = (of: 'new-winding' | 'reconditioned') => levelNow({ highPotential: { ...DELIVERED.highPotential!, case: of } }, SAMPLE_LIMITS.machine)?.voltsV;
    expect(level('new-winding')).toBe(1800); // 2 × 400 + 1000
    expect(level('reconditioned')).toBe(1170); // 0.65 × 1800
    expect(levelNow({ highPotential: { ...DELIVERED.highPotential!, ratedVoltageV: Number.NaN } }, SAMPLE_LIMITS.machine)).toBeNull();
    expect(levelNow({ highPotential: { ...DELIVERED.highPotential!, case: 'wound-rotor' } }, SAMPLE_LIMITS.machine)).toBeNull();
  });

  it('refuses high potential on a winding whose insulation did not pass', () => {
    const values = finalTestForm.from({ ...DELIVERED, insulation: { ...DELIVERED.insulation, resistanceOhm: 2e6 } }, 'si');
    const problems = problemsIn(finalTestForm, finalTestForm.read(values), context());
    expect(problems.map((p) => p.path)).toEqual(['highPotential']);
    expect(problems[0]!.message).toContain('no high-potential test');
  });

  it('reads the shaft height from an IEC frame size and from no other', () => {
    expect(['315L', '225S', '80', '560'].map(shaftHeightOf)).toEqual([0.315, 0.225, 0.08, 0.56]);
    expect(['405T', '', 'special', '12'].map(shaftHeightOf)).toEqual([null, null, null, null]);
  });
});

describe('strip and burnout', () => {
  const limit = (dismantling: Partial<ReadingsOf<'dismantling'>> | null) => stripLimit(context(dismantling ? [recorded('dismantling', { ...DISMANTLED, ...dismantling })] : []));

  it('holds the part to the lowest of core plate and frame; unknown counts as organic', () => {
    expect(limit(null)).toMatchObject({ limitC: 370, reason: 'core plate unknown, counted as organic', dismantled: false });
    expect(limit({ corePlate: 'organic' })).toMatchObject({ limitC: 370, reason: 'organic core plate' });
    expect(limit({ corePlate: 'inorganic' })).toMatchObject({ limitC: 400, reason: 'inorganic core plate' });
    expect(limit({ corePlate: 'inorganic', frameMaterial: 'aluminium' })).toMatchObject({ limitC: 300, reason: 'aluminium frame' });
  });

  it('keeps the oven shut without the dismantling, the count, the sample coil, the oven’s name, or with slip rings on', () => {
    const bare: ReadingsOf<'strip'> = { ...STRIPPED, ovenId: null, commutatorOrSlipRingsOn: true, wiresCountedAtCut: null, sampleCoilKept: false };
    const inTheWay = (readings: ReadingsOf<'strip'>, at = context()) => pathsOf(stripForm, stripForm.from(readings, 'si'), at).sort();
    expect(inTheWay(bare)).toEqual(['commutatorOrSlipRingsOn', 'method', 'ovenId', 'sampleCoilKept', 'wiresCountedAtCut']);
    expect(inTheWay({ ...bare, method: 'cold-pull' })).toEqual([]);
    expect(inTheWay(STRIPPED, context([recorded('dismantling', DISMANTLED)]))).toEqual([]);
  });

  it('names no oven for a winding that was pulled', () => {
    const values = stripForm.from(STRIPPED, 'si');
    expect(stripForm.read({ ...values, method: 'warm-pull' }).readings.ovenId).toBeNull();
  });
});

describe('the winding as wound', () => {
  const found = context([recorded('winding-as-found', WINDING)]);

  it('starts as a copy of the winding as found, with the lengths to be measured anew', () => {
    const { readings } = windingAsWoundForm.read(windingAsWoundForm.start(found));
    expect(readings).toEqual({ ...WINDING, coilExtensionM: null, meanTurnM: null });
  });

  it('asks before less copper goes in than came out', () => {
    const thinner = { ...WINDING, wires: [{ strands: 4, bareDiameterM: 0.001 }] };
    expect(differencesOf(WINDING, thinner)!.filter((d) => d.is === 'ask').map((d) => d.item)).toEqual(['copper']);
    expect(differencesOf(WINDING, WINDING)!.every((d) => d.is === 'same')).toBe(true);
  });

  it('compares nothing while one of the two cannot be', () => {
    expect(differencesOf(null, WINDING)).toBeNull();
    expect(differencesOf(WINDING, { ...WINDING, coils: Number.NaN })).toBeNull();
  });

  it('refuses counts that do not agree', () => {
    const values = windingAsFoundForm.from(WINDING, 'si');
    values.coils = typed('47');
    expect(pathsOf(windingAsFoundForm, values)).toEqual(['coils']);
  });
});
