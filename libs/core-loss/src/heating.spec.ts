import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { lossFromHeating, meanRiseEstimateK } from './heating.js';

describe('Loss and warming', () => {
  // Source: heat balance with 460, 480 and 490 J/(kg·K) (computed).
  it.each([[460, 7.67], [480, 8], [490, 8.17]])('1 kelvin a minute at %d J/(kg·K) is %d W/kg', (heat, loss) => {
    expect(lossFromHeating(1, heat)).toBeCloseTo(loss, 2);
  });
  it('2 W/kg is a quarter kelvin a minute, 10 W/kg one and a quarter', () => {
    expect(lossFromHeating(0.25)).toBeCloseTo(2, 12);
    expect(lossFromHeating(1.25)).toBeCloseTo(10, 12);
  });
  it('3 W/kg for 30 minutes lifts the mean by 11 K at most, and by less with the cooling guessed', () => {
    expect((3 / lossFromHeating(1)) * 30).toBeCloseTo(11.25, 2);
    expect(meanRiseEstimateK(3, 30)).toBeLessThan(11.25);
  });
  // Source: common practice, 4 W/kg warms a whole core about 8 K in 20 minutes.
  it('4 W/kg warms a core about 8 K in 20 minutes', () => {
    expect(meanRiseEstimateK(4, 20)).toBeCloseTo(8, 12);
  });
  it('nothing warms nothing, and nonsense is refused', () => {
    expect(lossFromHeating(0)).toBe(0);
    expect(meanRiseEstimateK(0, 20)).toBe(0);
    for (const bad of [-1, NaN, Infinity]) {
      expect(() => lossFromHeating(bad)).toThrow(OutOfRangeError);
      expect(() => meanRiseEstimateK(bad, 1)).toThrow(OutOfRangeError);
      expect(() => meanRiseEstimateK(1, bad)).toThrow(OutOfRangeError);
    }
  });
});
