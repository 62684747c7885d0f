import { seededUniform } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lossFromHeating } from './heating.js';
import { localLossFromWarming, type LocalLoss, type WarmingPoint } from './local-loss.js';

const line = (kelvinPerMinute: number, minutes: readonly number[] = [0, 0.5, 1, 1.5, 2], startC = 22): WarmingPoint[] => minutes.map((m) => ({ minutes: m, celsius: startC + kelvinPerMinute * m }));
const every = (from: number, to: number, step: number) => Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step);
const why = (loss: LocalLoss) => (loss.outcome === 'told' ? 'told' : loss.reasons[0]!.code);
const told = (loss: LocalLoss) => {
  if (loss.outcome !== 'told') throw new Error(why(loss));
  return loss;
};

describe('Local loss from the rate of rise', () => {
  // Source: heat balance with 460, 480 and 490 J/(kg·K) (computed).
  it.each([[460, 7.67], [480, 8], [490, 8.17]])('1 kelvin a minute at %d J/(kg·K) is %d W/kg', (specificHeat, loss) => {
    expect(told(localLossFromWarming(line(1), { specificHeat })).wattsPerKg).toBeCloseTo(loss, 2);
  });
  it('is the heat balance of the single slope, told with its uncertainty and what it leaves out', () => {
    const loss = told(localLossFromWarming(line(2)));
    expect(loss.wattsPerKg).toBeCloseTo(lossFromHeating(2), 9);
    expect(loss.expandedUncertainty).toBeGreaterThan(0);
    expect(loss.expandedUncertainty).toBeLessThan(loss.wattsPerKg);
    expect(loss.notes.map((n) => n.code)).toEqual(['least-value']);
    expect(loss.points).toBe(5);
  });
  it('later readings of a longer run do not count', () => {
    const long = [...line(1.5, every(0, 3, 0.5)), { minutes: 10, celsius: 27 }, { minutes: 20, celsius: 28 }];
    expect(told(localLossFromWarming(long)).wattsPerKg).toBeCloseTo(12, 9);
  });
  it('more readings make it surer', () => {
    const few = told(localLossFromWarming(line(1, every(0, 2, 0.5))));
    const many = told(localLossFromWarming(line(1, every(0, 2, 0.1))));
    expect(many.expandedUncertainty).toBeLessThan(few.expandedUncertainty);
  });
  it('its interval holds the truth 95 times of 100 when the readings scatter', () => {
    const uniform = seededUniform(30);
    const score = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
    let held = 0;
    for (let i = 0; i < 600; i += 1) {
      const loss = localLossFromWarming(line(4, every(0, 3, 0.25)).map((p) => ({ ...p, celsius: p.celsius + 0.2 * score() })), { readingK: 0.2 });
      if (loss.outcome === 'told' && Math.abs(loss.wattsPerKg - 32) <= loss.expandedUncertainty) held += 1;
    }
    expect(held / 600).toBeGreaterThan(0.94);
  });
});

describe('When it cannot be told', () => {
  it('readings that begin late are named so: by then heat flows', () => expect(why(localLossFromWarming(line(1, [2, 2.3, 2.6, 2.9])))).toBe('too-late'));
  it('too few', () => {
    expect(why(localLossFromWarming([]))).toBe('too-few');
    expect(why(localLossFromWarming(line(1, [0, 1, 2])))).toBe('too-few');
    expect(why(localLossFromWarming(line(1, [0, 5, 10, 15])))).toBe('too-few');
  });
  it('too short', () => expect(why(localLossFromWarming(line(1, [0, 0.1, 0.2, 0.3])))).toBe('too-short'));
  it('a place that cools', () => expect(why(localLossFromWarming(line(-1)))).toBe('not-warming'));
  it('scatter that hides the slope', () => {
    expect(why(localLossFromWarming(line(0.05)))).toBe('too-noisy');
    expect(why(localLossFromWarming(line(0)))).toBe('too-noisy');
    expect(why(localLossFromWarming([22, 24, 21, 25, 22].map((celsius, i) => ({ minutes: i * 0.5, celsius }))))).toBe('too-noisy');
  });
  // A spot of 10 mm loses its heat with a time constant of a quarter of a minute: 25/(7700·480) = 6.8e-6 m²/s (computed).
  it('a place that bends over within the first minutes', () => {
    const bent = every(0, 3, 0.25).map((minutes) => ({ minutes, celsius: 22 + 8 * (1 - Math.exp(-minutes / 0.8)) }));
    expect(why(localLossFromWarming(bent))).toBe('bent');
    expect(0.01 ** 2 / (25 / (7700 * 480))).toBeCloseTo(15, 0);
  });
});

describe('What holds for every warming', () => {
  it('twice the slope is twice the loss, wherever the core started', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 30, noNaN: true }), fc.double({ min: 0, max: 60, noNaN: true }), (slope, start) => {
        const [once, twice] = [told(localLossFromWarming(line(slope, undefined, start))), told(localLossFromWarming(line(2 * slope, undefined, start)))];
        expect(twice.wattsPerKg / once.wattsPerKg).toBeCloseTo(2, 6);
        expect(once.wattsPerKg).toBeCloseTo(lossFromHeating(slope), 6);
      }),
    );
  });
  it('refuses readings that cannot be', () => {
    expect(() => localLossFromWarming([{ minutes: NaN, celsius: 20 }])).toThrow(OutOfRangeError);
    expect(() => localLossFromWarming([{ minutes: -1, celsius: 20 }])).toThrow(OutOfRangeError);
    expect(() => localLossFromWarming([{ minutes: 0, celsius: NaN }])).toThrow(OutOfRangeError);
    expect(() => localLossFromWarming(line(1, [0, 1, 1, 2]))).toThrow(/follow one another/);
    for (const over of [{ withinMinutes: 3.1 }, { withinMinutes: 0 }, { withinMinutes: NaN }, { specificHeat: 399 }, { specificHeat: NaN }, { readingK: 0 }, { readingK: NaN }]) {
      expect(() => localLossFromWarming(line(1), over), JSON.stringify(over)).toThrow(OutOfRangeError);
    }
  });
});
