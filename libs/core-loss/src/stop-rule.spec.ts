import { describe, expect, it } from 'vitest';
import { DEFAULT_CORE_LIMITS } from './core-limits.js';
import { ringTestDemand, stopReasons } from './stop-rule.js';

const stop = (watched: Parameters<typeof stopReasons>[0]) => stopReasons(watched, DEFAULT_CORE_LIMITS).map((r) => r.code);

describe('When to switch off (common practice)', () => {
  it.each([
    [{}, []],
    [{ meanC: 90 }, []],
    [{ meanC: 90.1 }, ['stop-mean']],
    [{ hottestC: 110 }, []],
    [{ hottestC: 110.1 }, ['stop-spot']],
    [{ meanC: 40, hottestC: 65 }, []],
    [{ meanC: 40, hottestC: 65.1 }, ['stop-spot-over-mean']],
    [{ ampsRising: true }, ['stop-amps']],
    [{ ampsRising: false }, []],
    [{ meanC: 95, hottestC: 125, ampsRising: true }, ['stop-mean', 'stop-spot', 'stop-spot-over-mean', 'stop-amps']],
  ])('%j: %j', (watched, expected) => {
    expect(stop(watched)).toEqual(expected);
  });
});

describe('When a ring test is demanded (common practice)', () => {
  const demand = (machine: Parameters<typeof ringTestDemand>[0]) => ringTestDemand(machine, DEFAULT_CORE_LIMITS);
  it('from 7.5 kW up, from 180 mm up, or when the customer asks', () => {
    expect(demand({ ratedPowerW: 7500 })).toBe('demanded');
    expect(demand({ ratedPowerW: 7499, outerDiameterM: 0.179 })).toBe('not-demanded');
    expect(demand({ ratedPowerW: 1000, outerDiameterM: 0.18 })).toBe('demanded');
    expect(demand({ ratedPowerW: 750, outerDiameterM: 0.125, customerAsks: true })).toBe('demanded');
  });
  it('nothing known is not a no', () => {
    expect(demand({})).toBe('unknown');
    expect(demand({ customerAsks: false })).toBe('unknown');
  });
});
