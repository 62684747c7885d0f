import { describe, expect, it } from 'vitest';
import { DEFAULT_MACHINE_TEST_LIMITS as LIMITS, beforeVarnishProblems, evaluateBeforeVarnish, evaluateIncomingTest, incomingTestProblems, type InsulationReading, type MachineTest, type TestJudgement } from './index.js';
import { beforeVarnish, insulation } from './quarry-motor.fixture.js';

const of = (judgements: TestJudgement[], test: MachineTest) => judgements.find((j) => j.test === test);
const incoming = (more: Partial<InsulationReading>) => evaluateIncomingTest({ insulation: { ...insulation, ...more }, windingResistance: null });

describe('The incoming test', () => {
  it('12 MΩ at 20 °C is 3 MΩ at 40 °C: a random-wound stator is asked for 5', () => {
    const { judgements, verdict, derived } = incoming({ resistanceOhm: 12e6, windingTemperatureC: 20 });
    expect(derived.insulation.correctedTo40Ohm).toBeCloseTo(3e6, 3);
    expect(of(judgements, 'insulation-resistance')).toMatchObject({ measured: 3e6, unit: 'Ω', limit: 5e6, verdict: 'does-not-conform', standing: 'S' });
    expect(of(judgements, 'insulation-resistance')!.words).toMatch(/3 MΩ at 40 °C by the halving rule.*dry the winding/);
    expect(verdict).toBe('does-not-conform');
  });
  it('the same reading passes by the rule of 2013, which the words name', () => {
    const { judgements, verdict } = incoming({ resistanceOhm: 12e6, windingTemperatureC: 20, correctionRule: 'thermosetting' });
    expect(verdict).toBe('conforms');
    expect(of(judgements, 'insulation-resistance')!.words).toMatch(/9.15 MΩ at 40 °C by the thermosetting rule of 2013/);
  });
  it('exactly at the limit conforms', () => {
    expect(incoming({ resistanceOhm: 5e6, windingTemperatureC: 40 }).verdict).toBe('conforms');
    expect(incoming({ resistanceOhm: 4.99e6, windingTemperatureC: 40 }).verdict).toBe('does-not-conform');
  });
  it('an old winding is not asked for what a new one must reach', () => {
    expect(of(incoming({ resistanceOhm: 50e6, windingTemperatureC: 40 }).judgements, 'insulation-new-winding')).toBeUndefined();
  });
  it('a resistance that was not measured is named as not done; demanded, it makes the test not valid', () => {
    expect(incoming({})).toMatchObject({ notDone: ['winding-resistance'], missing: [], verdict: 'conforms', calculation: 'machine-tests/1' });
    const demanded = evaluateIncomingTest({ insulation, windingResistance: null }, LIMITS, ['winding-resistance']);
    expect(demanded).toMatchObject({ missing: ['winding-resistance'], verdict: 'not-valid' });
  });

  const form = { windingKind: 'form-wound', ratedVoltageV: 6600, testVoltsV: 5000, windingTemperatureC: 40 } as const;
  it('a form-wound winding is judged by its polarization index, too', () => {
    const { judgements, verdict } = incoming({ ...form, resistanceOhm: 1000e6, tenMinuteResistanceOhm: 1900e6 });
    expect(of(judgements, 'polarization-index')).toMatchObject({ measured: 1.9, limit: 2, verdict: 'does-not-conform' });
    expect(verdict).toBe('does-not-conform');
    expect(incoming({ ...form, resistanceOhm: 1000e6, tenMinuteResistanceOhm: 2000e6 }).verdict).toBe('conforms');
  });
  it('over 5000 MΩ the index is shown and not judged, and never on a random-wound stator', () => {
    const high = incoming({ ...form, resistanceOhm: 5001e6, tenMinuteResistanceOhm: 5002e6 });
    expect(of(high.judgements, 'polarization-index')).toBeUndefined();
    expect(high.derived.insulation.polarizationIndex).toBeCloseTo(1.0002, 4);
    expect(of(incoming({ tenMinuteResistanceOhm: 2500e6 }).judgements, 'polarization-index')).toBeUndefined();
  });

  // Source: common practice, quoted from ANSI/EASA AR100-2020: 2 % random, 1 % form-wound.
  it.each([
    ['random-wound', 'conforms'], ['form-wound', 'does-not-conform'], ['concentric', 'conforms'],
  ] as const)('ohms 1.04 %% apart in a %s winding: %s', (construction, verdict) => {
    const result = evaluateIncomingTest({ insulation, windingResistance: { resistancesOhm: [0.512, 0.508, 0.518], windingTemperatureC: 22, construction } });
    expect(of(result.judgements, 'winding-resistance-balance')!.verdict).toBe(verdict);
    expect(result.derived.windingResistance!.unbalanceFraction).toBeCloseTo(0.0104, 4);
  });
  it('concentric coils beyond 2 % ask, the others fail', () => {
    const apart = (construction: 'random-wound' | 'concentric') =>
      evaluateIncomingTest({ insulation, windingResistance: { resistancesOhm: [1, 1, 1.05], windingTemperatureC: 22, construction } }).verdict;
    expect([apart('random-wound'), apart('concentric')]).toEqual(['does-not-conform', 'inconclusive']);
  });
});

describe('What is wrong with the readings is said box by box', () => {
  it.each<[Partial<Record<keyof InsulationReading, unknown>>, string, string]>([
    [{ ratedVoltageV: 0 }, 'insulation.ratedVoltageV', 'not-positive'],
    [{ ratedVoltageV: NaN }, 'insulation.ratedVoltageV', 'not-positive'],
    [{ testVoltsV: -500 }, 'insulation.testVoltsV', 'not-positive'],
    [{ resistanceOhm: 0 }, 'insulation.resistanceOhm', 'not-positive'],
    [{ resistanceOhm: Infinity }, 'insulation.resistanceOhm', 'not-positive'],
    [{ windingTemperatureC: 9, correctionRule: 'thermosetting' }, 'insulation.windingTemperatureC', 'winding-temperature'],
    [{ windingTemperatureC: NaN }, 'insulation.windingTemperatureC', 'winding-temperature'],
    [{ correctionRule: 'none' }, 'insulation.correctionRule', 'correction-rule'],
    [{ tenMinuteResistanceOhm: 0 }, 'insulation.tenMinuteResistanceOhm', 'not-positive'],
  ])('%j', (wrong, path, code) => {
    const readings = { insulation: { ...insulation, ...wrong } as InsulationReading, windingResistance: null };
    expect(incomingTestProblems(readings)).toMatchObject([{ path, code }]);
    expect(() => evaluateIncomingTest(readings)).toThrow(incomingTestProblems(readings)[0]!.message);
  });
  it('the second of three resistances is named by its place', () => {
    const windingResistance = { resistancesOhm: [1, NaN, 1] as [number, number, number], windingTemperatureC: 300, construction: 'random-wound' as const };
    expect(incomingTestProblems({ insulation, windingResistance }).map((p) => p.path)).toEqual(['windingResistance.resistancesOhm.1', 'windingResistance.windingTemperatureC']);
  });
  it('test volts outside the table warn and refuse nothing', () => {
    const result = incoming({ testVoltsV: 1000 });
    expect(incomingTestProblems({ insulation: { ...insulation, testVoltsV: 1000 }, windingResistance: null })).toEqual([]);
    expect(result.warnings).toMatchObject([{ path: 'insulation.testVoltsV', code: 'test-volts' }]);
    expect(incoming({}).warnings).toEqual([]);
  });
});

describe('The test before varnish', () => {
  it('the quarry motor goes into the tank', () => {
    const { judgements, verdict, notDone } = evaluateBeforeVarnish(beforeVarnish);
    expect(judgements.map((j) => [j.test, j.verdict])).toEqual([
      ['insulation-resistance', 'conforms'], ['insulation-new-winding', 'conforms'], ['winding-resistance-balance', 'conforms'], ['surge-difference', 'conforms'], ['polarity', 'conforms'],
    ]);
    expect([verdict, notDone]).toEqual(['conforms', []]);
  });
  it('a new winding of 90 MΩ at 40 °C stays out: the standard would let it pass, the shop does not', () => {
    const { judgements, verdict } = evaluateBeforeVarnish({ ...beforeVarnish, insulation: { ...insulation, resistanceOhm: 90e6, windingTemperatureC: 40 } });
    expect(of(judgements, 'insulation-resistance')!.verdict).toBe('conforms');
    expect(of(judgements, 'insulation-new-winding')).toMatchObject({ verdict: 'does-not-conform', standing: 'P' });
    expect(verdict).toBe('does-not-conform');
  });
  it('an armature is asked for the standard only', () => {
    const { judgements } = evaluateBeforeVarnish({ ...beforeVarnish, insulation: { ...insulation, windingKind: 'dc-armature', ratedVoltageV: 440, resistanceOhm: 60e6 } });
    expect(of(judgements, 'insulation-new-winding')).toBeUndefined();
  });
  it.each([[0.1, 1800, 'conforms'], [0.101, 1800, 'does-not-conform'], [0.03, 1500, 'inconclusive'], [0.03, null, 'conforms'], [0.2, 900, 'does-not-conform']] as const)('waves %d apart at a peak of %s V: %s', (surgeDifferenceFraction, surgePeakV, verdict) => {
    expect(evaluateBeforeVarnish({ ...beforeVarnish, surgeDifferenceFraction, surgePeakV }).verdict).toBe(verdict);
  });
  it('a dummy rotor that stalls sends the winding back', () => {
    const { judgements, verdict } = evaluateBeforeVarnish({ ...beforeVarnish, polarityRight: false });
    expect(verdict).toBe('does-not-conform');
    expect(of(judgements, 'polarity')).toMatchObject({ measured: null, limit: null, words: expect.stringMatching(/reversed.*before varnish/) });
  });
  it('what was not done is named, and makes the test not valid where it is demanded', () => {
    const bare = { ...beforeVarnish, windingResistance: null, surgeDifferenceFraction: null, surgePeakV: null, polarityRight: null };
    expect(evaluateBeforeVarnish(bare).notDone).toEqual(['winding-resistance', 'surge', 'polarity']);
    expect(evaluateBeforeVarnish(bare, LIMITS, ['polarity', 'insulation'])).toMatchObject({ missing: ['polarity'], verdict: 'not-valid' });
  });
  it('surge figures that cannot be are named', () => {
    expect(beforeVarnishProblems({ ...beforeVarnish, surgeDifferenceFraction: NaN, surgePeakV: -1 }).map((p) => p.path)).toEqual(['surgeDifferenceFraction', 'surgePeakV']);
    expect(beforeVarnishProblems({ ...beforeVarnish, surgeDifferenceFraction: 0, surgePeakV: null })).toEqual([]);
    expect(() => evaluateBeforeVarnish({ ...beforeVarnish, surgePeakV: 0 })).toThrow(/peak volts/);
  });
});
