import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { describe, expect, it } from 'vitest';
import { beforeRecord, beforeTestOf } from './before-test.js';
import { afterFromBefore, blankBench, type BenchValues } from './bench-form.js';
import { liveTest } from './live-test.js';
import { keptTest, sampleBefore } from '../../../test/sample-job.js';

const typed = (text: string) => ({ text, system: 'si' as const });
const before = beforeTestOf(keptTest('core-test-before', sampleBefore(12)));
const context = { phase: 'after' as const, limits: DEFAULT_CORE_LIMITS, before, ampsRising: false };
const fresh = (): BenchValues => afterFromBefore(sampleBefore(12), 'si');

describe('the bench while it is typed', () => {
  it('says what the search coil must read for the target before anything is read', () => {
    const live = liveTest(fresh(), context);
    expect(live.result).toBeNull();
    // 4.44288 f B A per turn, four turns, area of the sample shop’s machine 12: 2.0224 V each
    expect(live.flux?.wantedSearchVoltsV).toBeCloseTo(4 * 2.0224, 3);
    expect(live.flux?.fluxDensityT).toBeUndefined();
  });

  it('shows the flux as soon as volts are typed, long before there are watts', () => {
    const values = fresh();
    values.reading.searchVoltsV = typed('8.084');
    const live = liveTest(values, context);
    expect(live.result).toBeNull();
    expect(live.flux?.fluxDensityT).toBeCloseTo(1.3191, 4); // sample shop, machine 12 after
  });

  it('tells what is missing from what is wrong', () => {
    const values = fresh();
    values.reading.excitingTurns = typed('-16');
    const live = liveTest(values, context);
    expect([...live.wrong.keys()]).toEqual(['reading.excitingTurns']);
    expect(live.missing).toBe(6);
  });

  it('has nothing to draw and no flux to ask for while no size is typed', () => {
    const live = liveTest(blankBench('si', null), { ...context, phase: 'before', before: undefined });
    expect(live.geometry).toBeNull();
    expect(live.flux).toBeNull();
  });

  it('asks to switch off by the limits of the job, and when the current rises', () => {
    const values = fresh();
    values.temperatures.meanC = typed('60');
    values.temperatures.hottestC = typed('86');
    expect(liveTest(values, context).stop.map((r) => r.code)).toEqual(['stop-spot-over-mean']);
    expect(liveTest(values, { ...context, limits: { ...DEFAULT_CORE_LIMITS, stopSpotOverMeanK: 30 } }).stop).toEqual([]);
    expect(liveTest(fresh(), { ...context, ampsRising: true }).stop.map((r) => r.code)).toEqual(['stop-amps']);
  });

  it('holds an after test against no before test that is not valid or was made after the strip', () => {
    const good = keptTest('core-test-before', sampleBefore(12), undefined, 'rec-0001');
    const late = { ...keptTest('core-test-before', sampleBefore(12), undefined, 'rec-0003') };
    const strip = { ...good, id: 'rec-0002', kind: 'strip' as const };
    expect(beforeRecord([good, strip, late])?.id).toBe('rec-0001');
    expect(beforeRecord([{ ...good, verdict: 'not-valid' }])).toBeUndefined();
    expect(beforeRecord([])).toBeUndefined();
  });
});
