import fc from 'fast-check';
import { VERDICTS } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { DEFAULT_CORE_LIMITS, type CoreLimits } from './core-limits.js';
import type { BeforeTest, CoreTestInput, JudgedTest } from './core-test.js';
import { CORE_LOSS_CALCULATION, evaluateCoreTest } from './evaluate-core-test.js';
import { DEFAULT_READING_UNCERTAINTY } from './reading-uncertainty.js';
import { sampleInput } from './sample-cores.fixture.js';

const limits = DEFAULT_CORE_LIMITS;
const first = sampleInput(1, 'before');
const second = sampleInput(1, 'after');
const asBefore = (input: CoreTestInput): BeforeTest => ({ input, result: evaluateCoreTest(input, limits) });
const before = asBefore(first);
const judge = (input: CoreTestInput, test: JudgedTest, against: BeforeTest | 'waived' | undefined = before, under: CoreLimits = limits) =>
  evaluateCoreTest(input, under, against).judgements.find((j) => j.test === test);
const codes = (reasons: readonly { code: string }[] | undefined) => (reasons ?? []).map((r) => r.code);
const reasonsAgainst = (input: CoreTestInput, against: BeforeTest = before) => codes(evaluateCoreTest(input, limits, against).comparison?.reasons);
const withReading = (input: CoreTestInput, reading: Partial<CoreTestInput['reading']>): CoreTestInput => ({ ...input, reading: { ...input.reading, ...reading } });
const withTemperatures = (input: CoreTestInput, temperatures: Partial<CoreTestInput['temperatures']>): CoreTestInput => ({ ...input, temperatures: { ...input.temperatures, ...temperatures } });
/** The same core with its volts set for a share of the target flux, watts and amps following roughly. */
const atShare = (input: CoreTestInput, share: number): CoreTestInput => {
  const now = evaluateCoreTest(input, limits).fluxShareOfTarget;
  return withReading(input, { searchVoltsV: (input.reading.searchVoltsV * share) / now, wattsW: input.reading.wattsW * (share / now) ** 2 });
};

describe('A test stands when its set-up was right', () => {
  it.each([
    [0.949, false], [0.9501, true], [1, true], [1.0499, true], [1.051, false],
  ])('at %d of the target flux: %s', (share, valid) => {
    const r = evaluateCoreTest(atShare(first, share), limits);
    expect(r.valid).toBe(valid);
    if (!valid) {
      expect(codes(r.validityReasons)).toEqual(['flux-off-target']);
      expect(r.verdict).toBe('not-valid');
    }
  });
  it('exactly 5 % off target is still inside', () => {
    expect(evaluateCoreTest(atShare(first, 0.95), limits).valid).toBe(true);
    expect(evaluateCoreTest(atShare(first, 1.05), limits).valid).toBe(true);
  });
  it.each([[0.9, true], [0.899, false]])('a target of %d T: %s', (fluxDensityT, valid) => {
    const aimed = { ...first, target: { basis: 'supply' as const, fluxDensityT } };
    const r = evaluateCoreTest(withReading(aimed, { searchVoltsV: (first.reading.searchVoltsV * fluxDensityT) / before.result.fluxDensityT }), limits);
    expect(r.valid).toBe(valid);
    if (!valid) expect(codes(r.validityReasons)).toEqual(['target-too-low']);
  });
  it.each([['rotorOut', 'rotor-in'], ['leadsOpen', 'leads-closed'], ['parallelsOpened', 'parallels-closed']] as const)('without the check %s it is not valid', (check, code) => {
    const r = evaluateCoreTest({ ...first, checks: { ...first.checks, [check]: false } }, limits);
    expect(codes(r.validityReasons)).toEqual([code]);
    expect(r.verdict).toBe('not-valid');
  });
  it.each([['onePointEarthed', 'not-earthed'], ['throughBoltsMeasured', 'through-bolts'], ['boreClear', 'bore-not-clear'], ['barrierUp', 'no-barrier']] as const)('without the check %s it warns', (check, code) => {
    const r = evaluateCoreTest({ ...first, checks: { ...first.checks, [check]: false } }, limits);
    expect(r.valid).toBe(true);
    expect(codes(r.warnings)).toContain(code);
  });
  it('a before test without a hot-spot reading still stands, and says so', () => {
    const r = evaluateCoreTest(withTemperatures(first, { meanC: undefined, hottestC: undefined }), limits);
    expect(r).toMatchObject({ valid: true, verdict: 'conforms' });
    expect(r.judgements.find((j) => j.test === 'hot-spot')).toMatchObject({ verdict: 'not-valid', reasons: [{ code: 'hot-spot-not-read' }] });
    expect(codes(r.warnings)).toContain('hot-spot-not-read');
    expect(r.hotSpotK).toBeUndefined();
  });
  it('an after test without a hot-spot reading is not valid', () => {
    const r = evaluateCoreTest(withTemperatures(second, { hottestC: undefined }), limits, before);
    expect(r.verdict).toBe('not-valid');
    expect(r.increaseEstablished).toBe(true);
  });
  it('the result names the calculation that made it', () => {
    expect(before.result.calculation).toBe(CORE_LOSS_CALCULATION);
    expect(CORE_LOSS_CALCULATION).toMatch(/^core-loss\/\d+$/);
  });
});

describe('After is held against before only in the same set-up', () => {
  it('the same set-up compares', () => expect(reasonsAgainst(second)).toEqual([]));
  it.each<[string, CoreTestInput, string[]]>([
    ['another frequency', withReading(second, { frequencyHz: 50.3 }), ['frequency-changed']],
    ['out of the frame', { ...second, frame: { state: 'bare', material: 'none' }, cablePath: 'bore-and-outside' }, ['frame-changed', 'cable-path-changed']],
    ['another frame material', { ...second, frame: { state: 'in-frame', material: 'steel' } }, ['frame-changed']],
    ['another cable path', { ...second, cablePath: 'under-ribs' }, ['cable-path-changed']],
    ['another stacking factor', { ...second, geometry: { ...second.geometry, stackingFactor: 0.94 } }, ['geometry-changed']],
    ['another wattmeter', { ...second, instruments: { ...second.instruments, wattmeterId: 'w-2' } }, ['wattmeter-changed']],
    ['no wattmeter named', { ...second, instruments: { ...second.instruments, wattmeterId: undefined } }, ['wattmeter-not-named']],
    ['another range', { ...second, instruments: { ...second.instruments, wattmeterRange: '150 V 50 A' } }, ['wattmeter-range-changed']],
    ['a clamp meter', { ...second, instruments: { ...second.instruments, clampMeter: true } }, ['clamp-changed']],
    ['the lead on the terminals', withReading(second, { wattmeterLead: 'exciting', wattsW: 650, cableResistanceOhm: 0.06 }), ['wattmeter-lead-changed']],
    ['another target', { ...second, target: { basis: 'winding', fluxDensityT: 1.36 } }, ['target-changed']],
  ])('%s: not valid', (_words, input, expected) => {
    expect(reasonsAgainst(input)).toEqual(expected);
    const r = evaluateCoreTest(input, limits, before);
    expect(r.verdict).toBe('not-valid');
    expect(r.increaseEstablished).toBe(false);
    expect(r.judgements[0]).toMatchObject({ test: 'increase', verdict: 'not-valid' });
    for (const reason of r.comparison?.reasons ?? []) expect(reason.words).toMatch(/\.$/);
  });
  it.each([[31, []], [11, []], [31.1, ['start-temperature']], [10.9, ['start-temperature']]])('a start at %d °C against 21 °C: %j', (startC, expected) => {
    expect(reasonsAgainst(withTemperatures(second, { startC, ambientC: startC }))).toEqual(expected);
  });
  it('85 kilolines and 1.32 T are one target to the trade', () => {
    expect(reasonsAgainst({ ...second, target: { basis: 'standard', fluxDensityT: 1.3175 } })).toEqual([]);
  });
  it('flux off target in either test spoils it', () => {
    expect(reasonsAgainst(atShare(second, 0.94))).toEqual(['after-not-valid']);
    expect(reasonsAgainst(second, asBefore(atShare(first, 0.94)))).toEqual(['before-not-valid']);
  });
  it('an after test is no before test', () => {
    expect(reasonsAgainst(second, asBefore(second))).toContain('before-phase');
  });
  it('a before test that does not conform by its hot spot can still be compared with', () => {
    expect(reasonsAgainst(sampleInput(3, 'after repair'), asBefore(sampleInput(3, 'before')))).toEqual([]);
  });
  it('other turns, or another voltmeter, are said but spoil nothing; the voltmeter costs certainty', () => {
    const turns = withReading(second, { excitingTurns: 25, excitingA: (25.4 * 24) / 25, wattsW: (98.63 * 24) / 25 });
    const r = evaluateCoreTest(turns, limits, before);
    expect(r.comparison?.valid).toBe(true);
    expect(codes(r.warnings)).toContain('turns-changed');
    const same = evaluateCoreTest(second, limits, before);
    const other = evaluateCoreTest({ ...second, instruments: { ...second.instruments, voltmeterId: 'v-2' } }, limits, before);
    expect(r.comparison?.ratio).toBeCloseTo(same.comparison?.ratio ?? NaN, 9);
    expect(codes(other.warnings)).toContain('voltmeter-changed');
    expect(other.comparison?.expandedUncertainty).toBeGreaterThan(1.3 * (same.comparison?.expandedUncertainty ?? NaN));
  });
  it('an after test with neither before test nor waiver is not valid', () => {
    const r = evaluateCoreTest(second, limits);
    expect(r.judgements[0]).toMatchObject({ test: 'increase', verdict: 'not-valid', reasons: [{ code: 'no-before-test' }] });
    expect(r.verdict).toBe('not-valid');
  });
  it('both are referred to the target of the before test', () => {
    const r = evaluateCoreTest(atShare(second, 1.04), limits, asBefore(atShare(first, 0.96)));
    const plain = evaluateCoreTest(second, limits, before);
    expect(r.comparison?.ratio).toBeCloseTo(plain.comparison?.ratio ?? NaN, 9);
    expect(r.comparison?.expandedUncertainty).toBeGreaterThan((plain.comparison?.expandedUncertainty ?? NaN) * 1.2);
  });
});

describe('Increase and fall', () => {
  /** The before test of core 1 again as after test, with its watts changed. */
  const times = (factor: number): CoreTestInput => withReading({ ...first, phase: 'after' }, { wattsW: first.reading.wattsW * factor });
  it.each([
    [1.1, 'conforms'], [1.175, 'conforms'], [1.18, 'inconclusive'], [1.2, 'inconclusive'], [1.22, 'inconclusive'], [1.23, 'does-not-conform'], [1.5, 'does-not-conform'],
  ])('%d times the watts: %s', (factor, verdict) => {
    expect(judge(times(factor), 'increase')?.verdict).toBe(verdict);
  });
  it('exactly at the limit conforms when nothing is uncertain', () => {
    const sure = Object.fromEntries(Object.entries(DEFAULT_READING_UNCERTAINTY).map(([k, v]) => [k, typeof v === 'number' ? 0 : v])) as unknown as typeof DEFAULT_READING_UNCERTAINTY;
    const verdict = (factor: number) => evaluateCoreTest(times(factor), limits, before, sure).judgements[0]?.verdict;
    expect(verdict(1.2)).toBe('conforms');
    expect(verdict(1.2001)).toBe('does-not-conform');
  });
  it.each([[1.1, false], [1.101, true]])('%d times the watts warns: %s', (factor, warns) => {
    expect(codes(evaluateCoreTest(times(factor), limits, before).warnings).includes('increase-warn')).toBe(warns);
  });
  it.each([[0.97, 'conforms', false], [0.9, 'conforms', false], [0.899, 'shown-not-judged', true]])('%d times the watts: fall %s, asks %s', (factor, verdict, asks) => {
    const r = evaluateCoreTest(times(factor), limits, before);
    expect(r.judgements.find((j) => j.test === 'fall')?.verdict).toBe(verdict);
    expect(codes(r.warnings).includes('fall-beyond')).toBe(asks);
    expect(r.verdict).toBe('conforms');
  });
  it('a core that did not fall has no judgement of a fall', () => {
    expect(judge(times(1.02), 'fall')).toBeUndefined();
  });
  it('the decision rule never changes a verdict', () => {
    for (const decisionRule of ['ask', 'accept', 'refuse'] as const) {
      expect(evaluateCoreTest(times(1.2), { ...limits, decisionRule }, before).verdict).toBe('inconclusive');
    }
  });
  it('more watts never get a better verdict', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 2, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (factor, more) => {
        const low = evaluateCoreTest(times(factor), limits, before);
        const high = evaluateCoreTest(times(factor + more), limits, before);
        expect(high.comparison?.increase ?? NaN).toBeGreaterThanOrEqual(low.comparison?.increase ?? NaN);
        expect(VERDICTS.indexOf(high.verdict)).toBeGreaterThanOrEqual(VERDICTS.indexOf(low.verdict));
      }),
    );
  });
});

describe('The hot spot is judged over the mean', () => {
  // limit at the flux of this core: 10 K × (B / 1.32 T)²; U = 1 K
  const limit = before.result.hotSpotLimitK ?? NaN;
  const spot = (overMean: number, more: Partial<CoreTestInput['temperatures']> = {}) => withTemperatures(first, { meanC: 27, hottestC: 27 + overMean, ...more });
  it.each([
    [3, 'conforms'], [limit - 1.0001, 'conforms'], [limit - 0.99, 'inconclusive'], [limit, 'inconclusive'], [limit + 0.99, 'inconclusive'], [limit + 1.0001, 'does-not-conform'],
  ])('%d K: %s', (overMean, verdict) => {
    expect(judge(spot(overMean), 'hot-spot')?.verdict).toBe(verdict);
  });
  it('what it is over ambient does not matter', () => {
    expect(judge(withTemperatures(first, { meanC: 40, hottestC: 43 }), 'hot-spot')?.verdict).toBe('conforms');
  });
  it.each([[15, 'conforms'], [14.9, 'not-valid'], [0, 'not-valid']])('after %d minutes a small spot: %s', (minutes, verdict) => {
    expect(judge(spot(3, { minutes }), 'hot-spot')?.verdict).toBe(verdict);
  });
  it('a short run condemns but never clears', () => {
    expect(judge(spot(20, { minutes: 5 }), 'hot-spot')).toMatchObject({ verdict: 'does-not-conform', reasons: [{ code: 'over-before-time' }] });
    expect(judge(spot(10, { minutes: 5 }), 'hot-spot')).toMatchObject({ verdict: 'not-valid', reasons: [{ code: 'too-short' }] });
  });
  it.each([[26, 'conforms'], [26.1, 'not-valid'], [16, 'conforms'], [15.9, 'not-valid']])('a start at %d °C with 21 °C around: %s', (startC, verdict) => {
    expect(judge(spot(3, { startC }), 'hot-spot')?.verdict).toBe(verdict);
  });
  it('a warm start is no test even of a large spot', () => {
    expect(judge(spot(20, { startC: 60 }), 'hot-spot')?.verdict).toBe('not-valid');
    expect(judge(spot(20, { startC: 60, minutes: 5 }), 'hot-spot')?.verdict).toBe('not-valid');
  });
  it('below 95 % of the target flux it is not judged', () => {
    expect(codes(judge(atShare(first, 0.94), 'hot-spot')?.reasons)).toEqual(['hot-spot-flux']);
    expect(judge(atShare(first, 0.951), 'hot-spot')?.verdict).toBe('conforms');
  });
  it('a spot above the warning mark is said', () => {
    expect(codes(evaluateCoreTest(spot(5.2), limits).warnings)).toContain('hot-spot-warn');
    expect(codes(evaluateCoreTest(spot(4.9), limits).warnings)).not.toContain('hot-spot-warn');
  });
  it('the stop rule is said on the record', () => {
    expect(codes(evaluateCoreTest(spot(26), limits).warnings)).toContain('stop-spot-over-mean');
    expect(codes(evaluateCoreTest(withTemperatures(first, { meanC: 91, hottestC: 112 }), limits).warnings)).toEqual(expect.arrayContaining(['stop-mean', 'stop-spot']));
  });
});

describe('Absolute W/kg is judged only where it means something', () => {
  const bare: CoreTestInput = { ...sampleInput(7, 'after only'), frame: { state: 'bare', material: 'none' }, cablePath: 'bore-and-outside' };
  const watts = (perKg: number, input = bare) => {
    const now = evaluateCoreTest(input, limits, 'waived').judgements.find((j) => j.test === 'absolute')?.measured ?? NaN;
    return withReading(input, { wattsW: (input.reading.wattsW * perKg) / now });
  };
  // the limit 7.2 W/kg at 50 Hz; U about 7 %
  it.each([[4.18, 'conforms'], [6.69, 'conforms'], [6.9, 'inconclusive'], [7.2, 'inconclusive'], [7.5, 'inconclusive'], [7.8, 'does-not-conform']])('%d W/kg at 50 Hz: %s', (perKg, verdict) => {
    expect(judge(watts(perKg), 'absolute', 'waived')?.verdict).toBe(verdict);
  });
  it('at 60 Hz the trade figure is 4 W/lb, 8.8 W/kg', () => {
    const sixty = withReading(bare, { frequencyHz: 60, searchVoltsV: bare.reading.searchVoltsV * 1.2 });
    expect(judge(watts(7.8, sixty), 'absolute', 'waived')).toMatchObject({ verdict: 'conforms', limit: 8.8 });
    expect(judge(watts(9.6, sixty), 'absolute', 'waived')?.verdict).toBe('does-not-conform');
  });
  it('a core that fails it fails the test when the before test is waived', () => {
    expect(evaluateCoreTest(watts(8), limits, 'waived').verdict).toBe('does-not-conform');
  });
  it.each<[string, CoreTestInput, string]>([
    ['in the frame', sampleInput(7, 'after only'), 'in-frame'],
    ['an armature', { ...sampleInput(4, 'after') }, 'armature'],
    ['a clamp meter', { ...bare, instruments: { ...bare.instruments, clampMeter: true } }, 'clamp-meter'],
    ['a true-rms meter without form factor', withReading(bare, { voltmeter: 'true-rms' }), 'form-factor-assumed'],
    ['at 1.00 T', { ...atShare({ ...bare, target: { basis: 'supply', fluxDensityT: 1 } }, 1) }, 'flux-away'],
    ['at 40 Hz', withReading(bare, { frequencyHz: 40, searchVoltsV: bare.reading.searchVoltsV * 0.8 }), 'frequency-away'],
  ])('%s: shown, not judged', (_words, input, code) => {
    const found = judge(input, 'absolute', 'waived');
    expect(found?.verdict).toBe('shown-not-judged');
    expect(codes(found?.reasons)).toContain(code);
    expect(found?.measured).toBeGreaterThan(0);
  });
  it('a true-rms meter with its form factor is judged', () => {
    expect(judge(withReading(bare, { voltmeter: 'true-rms', formFactor: 1.111 }), 'absolute', 'waived')?.verdict).toBe('conforms');
  });
  it('where a before test exists, the comparison governs', () => {
    expect(codes(judge({ ...second, frame: { state: 'bare', material: 'none' }, cablePath: 'bore-and-outside' }, 'absolute')?.reasons)).toEqual(['comparison-governs']);
    expect(codes(judge({ ...bare, phase: 'before' }, 'absolute', undefined)?.reasons)).toEqual(['comparison-governs']);
  });
  it('far above the figure it is said even when it is not judged', () => {
    expect(codes(evaluateCoreTest(watts(8, sampleInput(7, 'after only')), limits, 'waived').warnings)).toContain('absolute-above');
  });
});

describe('Every judgement carries its source and standing, and none claims a standard', () => {
  it('of an after test', () => {
    for (const j of evaluateCoreTest(second, limits, before).judgements) {
      expect(j.source).toMatch(/^Common practice/);
      expect(j.standing).toBe('P');
    }
  });
  it('the shop may change limits and their sources', () => {
    const strict: CoreLimits = { ...limits, hotSpotLimitK: 5, sources: { ...limits.sources, 'hot-spot': { source: 'Customer specification 12', standing: 'C' } } };
    expect(judge(withTemperatures(first, { meanC: 27, hottestC: 34 }), 'hot-spot', undefined, strict)).toMatchObject({ verdict: 'does-not-conform', source: 'Customer specification 12', standing: 'C' });
  });
});

describe('What cannot be evaluated is refused with its path', () => {
  it('a before test that cannot be is named as the before test', () => {
    expect(() => evaluateCoreTest(second, limits, { ...before, input: withReading(first, { wattsW: NaN }) })).toThrow(/^The before test: /);
  });
  it.each<[string, CoreTestInput, string]>([
    ['no watts', withReading(first, { wattsW: 0 }), 'reading.wattsW'],
    ['NaN volts', withReading(first, { searchVoltsV: NaN }), 'reading.searchVoltsV'],
    ['endless amps', withReading(first, { excitingA: Infinity }), 'reading.excitingA'],
    ['a slot deeper than the core', { ...first, geometry: { ...first.geometry, slotDepthM: 0.2 } }, 'geometry.slotDepthM'],
    ['a NaN temperature', withTemperatures(first, { ambientC: NaN }), 'temperatures.ambientC'],
  ])('%s', (_words, input, path) => {
    expect(() => evaluateCoreTest(input, limits)).toThrow(OutOfRangeError);
    try {
      evaluateCoreTest(input, limits);
    } catch (error) {
      expect((error as OutOfRangeError).field).toBe(path);
    }
  });
});
