import { evaluateCoreTest, DEFAULT_CORE_LIMITS, type CoreTestInput } from '@libs/core-loss';
import type { RecordKind } from '@shared/records';
import { describe, expect, it } from 'vitest';
import { countingAfter, countingBefore, coreResultOf, type CoreRecord } from './core-figures.js';
import { coreStrip } from './core-strip.js';

/** Machine 12 of the invented sample shop: 3.120 W/kg before, 3.700 W/kg after, +18.6 % with 16.2 to 21.0. */
const before: CoreTestInput = {
  phase: 'before',
  geometry: { kind: 'stator', outerDiameterM: 0.34, innerDiameterM: 0.218, slotDepthM: 0.028, slots: 48, stackLengthM: 0.22, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 },
  target: { basis: 'standard', fluxDensityT: 1.32 },
  frame: { state: 'in-frame', material: 'cast-iron' },
  cablePath: 'over-frame',
  massBasis: 'back-iron',
  reading: { excitingTurns: 16, searchTurns: 4, searchVoltsV: 8.096, voltmeter: 'average', excitingA: 26.5, wattsW: 40.01, wattmeterLead: 'search', frequencyHz: 50 },
  temperatures: { ambientC: 21, startC: 21, meanC: 27.2, hottestC: 31.0, minutes: 20 },
  instruments: { voltmeterId: 'v-1', wattmeterId: 'w-1', clampMeter: false },
  checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
};
const after: CoreTestInput = { ...before, phase: 'after', reading: { ...before.reading, searchVoltsV: 8.084, excitingA: 26.6, wattsW: 47.31 }, temperatures: { ambientC: 22, startC: 22, meanC: 29.4, hottestC: 35.5, minutes: 20 } };
const beforeResult = evaluateCoreTest(before, DEFAULT_CORE_LIMITS);
const afterResult = evaluateCoreTest(after, DEFAULT_CORE_LIMITS, { input: before, result: beforeResult });

const record = (id: string, kind: RecordKind, result: object = {}, verdict: string | null = null): CoreRecord => ({ id, kind, verdict, result: result as Record<string, unknown> });
const first = record('01', 'core-test-before', beforeResult, beforeResult.verdict);
const strip = record('02', 'strip');
const last = record('03', 'core-test-after', afterResult, afterResult.verdict);

describe('the core before and after, as the job sheet draws it', () => {
  it('shows machine 12 with its increase, its interval and the limit over its before test', () => {
    const drawn = coreStrip([first, strip, last], 'si');
    expect(drawn.before?.words).toBe('3.12 ± 0.22');
    expect(drawn.after.map((bar) => bar.words)).toEqual(['3.70 ± 0.26']);
    expect(drawn.increase).toEqual({ figure: '+18.6 %', interval: '+16.2 % to +21.0 %' });
    expect(drawn.limit?.words).toBe('limit +20 % (3.74)');
    expect(drawn.unit).toBe('W/kg');
  });

  it('gives the same bars in watts per pound', () => {
    const drawn = coreStrip([first, strip, last], 'inch-pound');
    // 1 lb = 0.45359237 kg exactly: NIST Special Publication 811, appendix B
    expect(drawn.before?.value).toBeCloseTo(beforeResult.wattsPerKgReferred * 0.45359237, 9);
    expect(drawn.unit).toBe('W/lb');
    expect(drawn.increase?.figure).toBe('+18.6 %');
  });

  it('waits for the test after', () => {
    expect(coreStrip([first], 'si')).toMatchObject({ after: [], increase: null, limit: null });
    expect(coreStrip([], 'si')).toMatchObject({ before: null, after: [], increase: null });
  });

  it('draws no bar for a test that is not valid, and says that nothing can be compared', () => {
    const notValid = record('01', 'core-test-before', beforeResult, 'not-valid');
    expect(coreStrip([notValid], 'si').before).toBeNull();
    const warm = { ...afterResult, increaseEstablished: false };
    expect(coreStrip([first, strip, record('03', 'core-test-after', warm, 'inconclusive')], 'si').increase).toEqual({ figure: '', interval: 'Increase not established: the two tests cannot be compared.' });
  });

  it('keeps every valid test after, the last one named last', () => {
    const repair = record('05', 'core-test-after', afterResult, 'conforms');
    expect(coreStrip([first, strip, last, repair], 'si').after.map((bar) => bar.label)).toEqual(['after, no. 1', 'after']);
  });
});

describe('which core tests count', () => {
  it('takes the last valid test before the strip, and no test that came after it', () => {
    const notValid = record('015', 'core-test-before', beforeResult, 'not-valid');
    const tooLate = record('04', 'core-test-before', beforeResult, 'conforms');
    expect(countingBefore([first, notValid, strip, tooLate])?.id).toBe('01');
    expect(countingAfter([last, record('05', 'core-test-after', afterResult)])?.id).toBe('05');
    expect(countingBefore([])).toBeUndefined();
  });

  it('cannot tell from a result it does not know', () => {
    expect(coreResultOf(record('01', 'core-test-before', { wattsPerKgReferred: 'much' }))).toBeNull();
    expect(coreResultOf(record('01', 'strip', beforeResult))).toBeNull();
  });
});
