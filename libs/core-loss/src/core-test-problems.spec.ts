import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CoreTestInput } from './core-test.js';
import { DEFAULT_CORE_LIMITS } from './core-limits.js';
import { coreTestProblems } from './core-test-problems.js';
import { evaluateCoreTest } from './evaluate-core-test.js';
import { sampleInput } from './sample-cores.fixture.js';

const good = sampleInput(1, 'before');
const reading = (r: Partial<CoreTestInput['reading']>): CoreTestInput => ({ ...good, reading: { ...good.reading, ...r } });
const temperatures = (t: Partial<CoreTestInput['temperatures']>): CoreTestInput => ({ ...good, temperatures: { ...good.temperatures, ...t } });

describe('A slip of the pen is found before it is stored', () => {
  it.each<[string, CoreTestInput, string, string]>([
    ['negative turns', reading({ excitingTurns: -24 }), 'reading.excitingTurns', 'turns'],
    ['a point set wrong: 209.9 volts', reading({ searchVoltsV: 209.9 }), 'reading.searchVoltsV', 'saturation'],
    ['more watts than volt-amperes', reading({ wattsW: 1021 }), 'reading.wattsW', 'power-factor'],
    ['a lead that fell off: 20 millivolts', reading({ searchVoltsV: 0.02, wattsW: 0.01 }), 'reading.searchVoltsV', 'no-flux'],
    ['amps in kiloamps', reading({ excitingA: 0.0251, wattsW: 0.01 }), 'reading.excitingA', 'field-low'],
    ['watts in kilowatts', reading({ wattsW: 0.1021 }), 'reading.wattsW', 'power-factor-low'],
    ['cable that takes all the watts', reading({ wattmeterLead: 'exciting', wattsW: 30, cableResistanceOhm: 0.06 }), 'reading.wattsW', 'reading'],
    ['millimetres typed as metres', { ...good, geometry: { ...good.geometry, outerDiameterM: 530 } }, 'geometry.outerDiameterM', 'too-large'],
    ['no target', { ...good, target: { basis: 'standard', fluxDensityT: 0 } }, 'target.fluxDensityT', 'target'],
    ['a target above saturation', { ...good, target: { basis: 'standard', fluxDensityT: 2.11 } }, 'target.fluxDensityT', 'target'],
    ['a NaN target', { ...good, target: { basis: 'standard', fluxDensityT: NaN } }, 'target.fluxDensityT', 'target'],
    ['a frame of nothing', { ...good, frame: { state: 'in-frame', material: 'none' } }, 'frame.material', 'frame-material'],
    ['a cable over the frame of a bare core', { ...good, frame: { state: 'bare', material: 'none' } }, 'cablePath', 'cable-path'],
    ['a stator with a spider', { ...good, cablePath: 'through-spider' }, 'cablePath', 'cable-path'],
    ['an armature in a frame', { ...sampleInput(4, 'before'), cablePath: 'under-ribs' }, 'cablePath', 'cable-path'],
    ['an arctic bay', temperatures({ ambientC: -41 }), 'temperatures.ambientC', 'temperature'],
    ['a bay like an oven', temperatures({ ambientC: 70.1 }), 'temperatures.ambientC', 'temperature'],
    ['a NaN start', temperatures({ startC: NaN }), 'temperatures.startC', 'temperature'],
    ['an endless mean', temperatures({ meanC: Infinity }), 'temperatures.meanC', 'temperature'],
    ['a hottest place cooler than the mean', temperatures({ hottestC: 26 }), 'temperatures.hottestC', 'order'],
    ['a coolest place warmer than the mean', temperatures({ coolestC: 28 }), 'temperatures.coolestC', 'order'],
    ['a hottest place cooler than the coolest', temperatures({ meanC: undefined, coolestC: 31, hottestC: 30 }), 'temperatures.hottestC', 'order'],
    ['slot 73 of 72', temperatures({ hottestSlot: 73 }), 'temperatures.hottestSlot', 'slot'],
    ['slot 0', temperatures({ hottestSlot: 0 }), 'temperatures.hottestSlot', 'slot'],
    ['half a slot', temperatures({ hottestSlot: 1.5 }), 'temperatures.hottestSlot', 'slot'],
    ['negative minutes', temperatures({ minutes: -1 }), 'temperatures.minutes', 'minutes'],
    ['a day of minutes', temperatures({ minutes: 601 }), 'temperatures.minutes', 'minutes'],
  ])('%s', (_words, input, path, code) => {
    const problems = coreTestProblems(input);
    expect(problems).toEqual([expect.objectContaining({ path, code })]);
    expect(problems[0]?.message).toMatch(/\.$/);
  });
  it('the edges of each range are inside', () => {
    for (const t of [{ ambientC: -40 }, { ambientC: 70 }, { startC: 200 }, { minutes: 0 }, { minutes: 600 }, { hottestSlot: 1 }, { hottestSlot: 72 }, { coolestC: 26.9 }, { hottestC: 26.9 }]) {
      expect(coreTestProblems(temperatures(t)), JSON.stringify(t)).toEqual([]);
    }
    expect(coreTestProblems({ ...good, target: { basis: 'standard', fluxDensityT: 2.1 } })).toEqual([]);
  });
  it('several slips are told at once', () => {
    const input = { ...reading({ excitingTurns: 0, wattsW: -1 }), temperatures: { ...good.temperatures, minutes: NaN } };
    expect(coreTestProblems(input).map((p) => p.path)).toEqual(['reading.excitingTurns', 'reading.wattsW', 'temperatures.minutes']);
  });
  it('what it lets through can be evaluated, and what it stops is refused: no figures in between', () => {
    const figure = fc.oneof(fc.double({ min: -5, max: 500 }), fc.integer({ min: 0, max: 150 }), fc.constantFrom(NaN, Infinity, -Infinity, 0, 5e-324, 1e-310, 1e308));
    fc.assert(
      fc.property(figure, figure, figure, figure, figure, (searchVoltsV, excitingA, wattsW, meanC, hottestC) => {
        const input = { ...reading({ searchVoltsV, excitingA, wattsW }), temperatures: { ...good.temperatures, meanC, hottestC } };
        if (coreTestProblems(input).length > 0) expect(() => evaluateCoreTest(input, DEFAULT_CORE_LIMITS)).toThrow();
        else {
          const r = evaluateCoreTest(input, DEFAULT_CORE_LIMITS);
          for (const value of [r.fluxDensityT, r.wattsPerKgReferred, r.expandedUncertaintyWPerKg, r.powerFactor]) expect(Number.isFinite(value) && value > 0).toBe(true);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
