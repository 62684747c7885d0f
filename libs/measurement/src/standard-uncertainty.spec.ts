import fc from 'fast-check';
import { std } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { OutOfRangeError } from './out-of-range-error.js';
import { standardFromExpanded, standardFromInstrument, standardFromLimits, standardFromRepeats } from './standard-uncertainty.js';

describe('Uncertainty of a reading from what the maker says', () => {
  // Source: JCGM 100 type B (rectangular), computed: a class 0.5 meter at half scale errs by 1.0 % of reading at most, u 0.58 %.
  it('a class 0.5 meter at half scale is uncertain by 0.58 % of reading', () => {
    expect(standardFromInstrument({ accuracyClass: 0.5, range: 100 }, 50) / 50).toBeCloseTo(0.0058, 4);
  });
  it('percent of reading, of range, digits and resolution add up as stated', () => {
    const statement = { percentOfReading: 0.3, percentOfRange: 0.1, range: 300, digits: 2, resolution: 0.1 };
    const limit = 0.003 * 200 + 0.001 * 300 + 2 * 0.1;
    expect(standardFromInstrument(statement, 200)).toBeCloseTo(Math.sqrt(limit ** 2 / 3 + 0.01 / 12), 12);
    expect(standardFromInstrument(statement, -200)).toBe(standardFromInstrument(statement, 200));
  });
  it('a resolution alone is a rectangle of half a step', () => {
    expect(standardFromInstrument({ resolution: 1 }, 40)).toBeCloseTo(0.5 / Math.sqrt(3), 12);
  });
  it('a worse statement never gives a smaller uncertainty', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 5, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), fc.double({ min: 0, max: 500, noNaN: true }), (percent, more, reading) => {
        expect(standardFromInstrument({ percentOfReading: percent + more }, reading)).toBeGreaterThanOrEqual(standardFromInstrument({ percentOfReading: percent }, reading));
      }),
    );
  });
  it.each([
    ['nothing stated', {}, 10],
    ['a class without a range', { accuracyClass: 0.5 }, 10],
    ['a class with an empty range', { accuracyClass: 0.5, range: 0 }, 10],
    ['digits without a step', { digits: 2 }, 10],
    ['a negative percentage', { percentOfReading: -1 }, 10],
    ['a reading that is no number', { percentOfReading: 1 }, NaN],
    ['an endless reading', { percentOfReading: 1 }, Infinity],
  ])('%s is refused', (_words, statement, reading) => {
    expect(() => standardFromInstrument(statement, reading)).toThrow(OutOfRangeError);
  });
  it('a statement of no error at all is allowed', () => {
    expect(standardFromInstrument({ percentOfReading: 0 }, 10)).toBe(0);
  });
});

describe('Other ways to a standard uncertainty', () => {
  it('limits of ±1 give 0.577', () => expect(standardFromLimits(1)).toBeCloseTo(0.57735, 5));
  it('a certificate with U 0.5 at k 2 gives 0.25', () => expect(standardFromExpanded(0.5)).toBe(0.25));
  it('repeats agree with a second implementation, mathjs', () => {
    const readings = [102.1, 101.8, 102.4, 102.0, 101.9];
    expect(standardFromRepeats(readings)).toBeCloseTo((std(readings) as unknown as number) / Math.sqrt(5), 12);
  });
  it('refuses what cannot be', () => {
    expect(() => standardFromLimits(-1)).toThrow(OutOfRangeError);
    expect(() => standardFromLimits(NaN)).toThrow(OutOfRangeError);
    expect(() => standardFromExpanded(1, 0)).toThrow(OutOfRangeError);
    expect(() => standardFromExpanded(-1)).toThrow(OutOfRangeError);
    expect(() => standardFromRepeats([1])).toThrow(OutOfRangeError);
    expect(() => standardFromRepeats([1, NaN])).toThrow(OutOfRangeError);
    expect(standardFromLimits(0)).toBe(0);
  });
});
