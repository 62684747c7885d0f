import { propagateDistributions, seededUniform } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hysteresisFromLoop, lossPartsAt, separateTwoFrequencies, type FrequencyReading, type Separation, type SeparationFigures, type SeparationOptions } from './two-frequency-separation.js';

const at = (frequencyHz: number, wattsPerKg: number, fluxDensityT = 1): FrequencyReading => ({ frequencyHz, wattsPerKg, fluxDensityT });
const figures = (s: Separation): SeparationFigures & { outcome: string } => {
  if (!('hysteresisPerCycle' in s)) throw new Error(`no figures: ${s.outcome}`);
  return s;
};
const separate = (low: FrequencyReading, high: FrequencyReading, options?: SeparationOptions) => figures(separateTwoFrequencies(low, high, options));

describe('Published two-frequency problems', () => {
  // Source: published two-frequency problem with its answer: 440 V 50 Hz 2500 W, 220 V 25 Hz 850 W; a = 18, b = 0.64.
  it('2500 W at 440 V and 50 Hz, 850 W at 220 V and 25 Hz: 900 W hysteresis and 1600 W eddy loss', () => {
    const s = separate(at(25, 850), at(50, 2500));
    expect(s.outcome).toBe('separated');
    expect(s.hysteresisPerCycle).toBeCloseTo(18, 10);
    expect(s.eddyPerCycleHz).toBeCloseTo(0.64, 10);
    expect(lossPartsAt(s, 50)).toEqual({ hysteresis: expect.closeTo(900, 9), eddy: expect.closeTo(1600, 9), total: expect.closeTo(2500, 9) });
  });
  // Source: Scilab textbook companion, file 1445/CH7/EX7.38: 25 Hz, 200 W half of it eddy loss; 600 W at 440 V 50 Hz.
  it('200 W at 25 Hz, half of each kind, become 600 W at twice volts and frequency', () => {
    const parts = { hysteresisPerCycle: 100 / 25, eddyPerCycleHz: 100 / 25 ** 2 };
    expect(lossPartsAt(parts, 50)).toEqual({ hysteresis: 200, eddy: 400, total: 600 });
  });
  // Source: published problem of a ring specimen at 1 T; its answer computed: a = 0.20 W/Hz, b = 0.0008 W/Hz².
  it('a ring specimen, 12 W at 50 Hz and 5.5 W at half of both: 10 W and 2 W', () => {
    const s = separate(at(25, 5.5), at(50, 12));
    expect(s.hysteresisPerCycle).toBeCloseTo(0.2, 12);
    expect(s.eddyPerCycleHz).toBeCloseTo(0.0008, 12);
    expect(lossPartsAt(s, 50)).toEqual({ hysteresis: expect.closeTo(10, 9), eddy: expect.closeTo(2, 9), total: expect.closeTo(12, 9) });
  });
  // Source: Scilab textbook companion, file 3753/CH6/EX6.6: loop of 94 squares of 0.1 Wb/m² by 20 A/m, 50 Hz, 7650 kg/m³.
  it('a loop of 94 squares is 188 J/m³ a cycle, 9400 W/m³ and 1.23 W/kg', () => {
    expect(94 * 0.1 * 20).toBeCloseTo(188, 9);
    expect(hysteresisFromLoop(188, 50, 1)).toBeCloseTo(9400, 9);
    expect(hysteresisFromLoop(188, 50, 7650)).toBeCloseTo(1.23, 2);
  });
});

describe('Measured steel and stators', () => {
  // Source: pyleecan material file of M-19 (Apache-2.0), 1.0 T; split computed.
  it('M-19 strip: 1.2488 and 0.2255 W/kg at 60 Hz', () => {
    const s = separate(at(50, 1.19727), at(60, 1.47431), { repeatRel: 0.002 });
    expect(s.outcome).toBe('separated');
    expect(s.hysteresisPerCycle).toBeCloseTo(0.0208135, 6);
    expect(s.eddyPerCycleHz).toBeCloseTo(6.2639e-5, 8);
    expect(lossPartsAt(s, 60).hysteresis).toBeCloseTo(1.2488, 4);
    expect(lossPartsAt(s, 60).eddy).toBeCloseTo(0.2255, 4);
  });
  // Source: pyleecan material file of M400-50A (Apache-2.0), 1.0 T at 50, 100 and 200 Hz; split computed.
  it('M400-50A strip: 0.905 and 0.585 W/kg at 50 Hz; at 200 Hz the two parts read 11 % high', () => {
    const s = separate(at(50, 1.49), at(100, 4.15));
    expect(s.hysteresisPerCycle).toBeCloseTo(0.0181, 4);
    expect(s.eddyPerCycleHz).toBeCloseTo(2.34e-4, 6);
    expect(lossPartsAt(s, 50)).toMatchObject({ hysteresis: expect.closeTo(0.905, 3), eddy: expect.closeTo(0.585, 3) });
    expect(lossPartsAt(s, 200).total).toBeCloseTo(12.98, 2);
    expect(lossPartsAt(s, 200).total / 11.7 - 1).toBeCloseTo(0.11, 2);
  });
  // Source: open dataset pfyhr/statordata (MIT), two real stator stacks; splits computed, 200 Hz measured.
  it.each([
    ['first stack at 1.0 T', 0.4933, 1.3158, 0.02356, 5.5e-5, 1.178, 0.138, 6.91, 6.68],
    ['second stack at 1.3 T', 0.7333, 1.9696, 0.034847, 9.09e-5, 1.742, 0.227, 10.61, 10.19],
  ])('%s: 20 and 50 Hz split it, and 200 Hz is met within 5 %%', (_words, p20, p50, a, b, hysteresis, eddy, predicted, measured) => {
    const s = separate(at(20, p20), at(50, p50));
    expect(s.outcome).toBe('separated');
    expect(s.hysteresisPerCycle).toBeCloseTo(a, 5);
    expect(s.eddyPerCycleHz).toBeCloseTo(b, 7);
    expect(lossPartsAt(s, 50)).toMatchObject({ hysteresis: expect.closeTo(hysteresis, 3), eddy: expect.closeTo(eddy, 3) });
    expect(lossPartsAt(s, 200).total).toBeCloseTo(predicted, 1);
    expect(lossPartsAt(s, 200).total / measured - 1).toBeLessThan(0.05);
  });
  // Source: same dataset, first stack: "1.3 T" was 1.3168 T at 20 Hz and 1.2994 T at 50 Hz.
  it('unequal flux passes for less eddy loss: uncorrected 6.4e-5, referred to one flux about 9e-5', () => {
    const [low, high] = [at(20, 0.7515857, 1.316826), at(50, 1.97463, 1.299376)];
    const blind = separate({ ...low, fluxDensityT: 1.3 }, { ...high, fluxDensityT: 1.3 });
    expect(blind.eddyPerCycleHz).toBeCloseTo(6.4e-5, 6);
    // the stack's own exponent at 20 Hz, from its neighbour of 1.192322 T and 0.6384415 W/kg
    const exponent = Math.log(0.7515857 / 0.6384415) / Math.log(1.316826 / 1.192322);
    const own = separate(low, high, { exponent, referredToT: 1.3 });
    expect(own.eddyPerCycleHz).toBeCloseTo(9.1e-5, 6);
    const usual = separate(low, high, { referredToT: 1.3 });
    expect(Math.abs(usual.eddyPerCycleHz - own.eddyPerCycleHz)).toBeLessThan(usual.uEddyPerCycleHz);
    expect(usual.eddyPerCycleHz).toBeGreaterThan(8.5e-5);
    expect(usual.referredToT).toBe(1.3);
  });
});

describe('How well the parts are known', () => {
  // Computed from b = (P₂/f₂ − P₁/f₁)/Δf: 0.5 % in each reading, 50 and 60 Hz, M-19: about 30 % of the eddy loss.
  it('0.5 % in each reading leaves the eddy loss uncertain by about 30 % with 50 and 60 Hz, far less with 25 and 50', () => {
    const near = separate(at(50, 1.19727), at(60, 1.47431), { repeatRel: 0.005 });
    expect(near.uEddyPerCycleHz / near.eddyPerCycleHz).toBeCloseTo(0.27, 2);
    const parts = { hysteresisPerCycle: near.hysteresisPerCycle, eddyPerCycleHz: near.eddyPerCycleHz };
    const far = separate(at(25, lossPartsAt(parts, 25).total), at(50, lossPartsAt(parts, 50).total), { repeatRel: 0.005 });
    expect(far.uEddyPerCycleHz / far.eddyPerCycleHz).toBeCloseTo(0.1, 1);
    expect(far.uEddyPerCycleHz).toBeLessThan(near.uEddyPerCycleHz / 2.4);
  });
  it('agrees with drawing every error', () => {
    const [low, high] = [{ ...at(25, 1.0, 1.28), powerFactor: 0.25 }, { ...at(50, 2.6, 1.34), powerFactor: 0.3 }];
    const options = { referredToT: 1.32, repeatRel: 0.006, commonRel: 0.02, phaseErrorRad: 0.002 };
    const s = separate(low, high, options);
    const draw = (pick: (s: SeparationFigures) => number) =>
      propagateDistributions(
        [0.006, 0.006, 0.02, 0.002, 0.3 / Math.sqrt(3)].map((standardUncertainty) => ({ kind: 'normal' as const, estimate: 0, standardUncertainty })),
        ([r1 = 0, r2 = 0, common = 0, phase = 0, slack = 0]) => {
          const wrong = (r: typeof low, repeat: number) => ({ ...r, wattsPerKg: r.wattsPerKg * (1 + repeat) * (1 + common) * (1 + Math.tan(Math.acos(r.powerFactor)) * phase) });
          return pick(separate(wrong(low, r1), wrong(high, r2), { ...options, exponent: 2 + slack }));
        },
        seededUniform(25),
        { trials: 15_000 },
      ).standardUncertainty;
    expect(draw((d) => d.eddyPerCycleHz) / s.uEddyPerCycleHz).toBeCloseTo(1, 1);
    expect(draw((d) => d.hysteresisPerCycle) / s.uHysteresisPerCycle).toBeCloseTo(1, 1);
    expect((2 * draw((d) => d.eddyShare)) / s.expandedUncertaintyShare).toBeCloseTo(1, 1);
  });
  it('what one part gains the other loses, unless all is shared', () => {
    expect(separate(at(25, 1), at(50, 2.6)).correlation).toBeLessThan(-0.8);
    expect(separate(at(25, 1), at(50, 2.6), { repeatRel: 0, commonRel: 0.05, exponentUncertainty: 0 }).correlation).toBeCloseTo(1, 9);
  });
});

describe('When two readings do not tell', () => {
  it('one frequency twice is named so', () => {
    expect(separateTwoFrequencies(at(50, 2), at(50, 2.1))).toMatchObject({ outcome: 'same-frequency' });
    expect(separateTwoFrequencies(at(50, 2), at(50.4, 2.1))).toMatchObject({ outcome: 'same-frequency' });
  });
  it('frequencies too close for the readings are named so, with the figures and their uncertainty', () => {
    const s = separateTwoFrequencies(at(50, 2), at(55, 2.26));
    expect(s.outcome).toBe('too-close');
    expect(figures(s).uEddyPerCycleHz).toBeGreaterThan(0);
    expect(figures(s).expandedUncertaintyShare).toBeGreaterThan(0.15);
    // the same frequencies with far better readings tell
    expect(separateTwoFrequencies(at(50, 2), at(55, 2.26), { repeatRel: 0.001 }).outcome).toBe('separated');
  });
  it('fluxes too far apart are not referred', () => {
    expect(separateTwoFrequencies(at(25, 1, 1.2), at(50, 2.6, 1.32), { referredToT: 1.32 })).toMatchObject({ outcome: 'flux-apart' });
    expect(separateTwoFrequencies(at(25, 1, 1.32 * 0.95), at(50, 2.6, 1.32), { referredToT: 1.32 }).outcome).toBe('separated');
  });
  it('a loss per cycle that falls with frequency is a wrong reading', () => {
    expect(separateTwoFrequencies(at(25, 1.5), at(50, 2.6))).toMatchObject({ outcome: 'not-physical', reasons: [{ code: 'eddy-negative' }] });
    expect(separateTwoFrequencies(at(25, 0.5), at(50, 2.6))).toMatchObject({ outcome: 'not-physical', reasons: [{ code: 'hysteresis-negative' }] });
  });
  it('an eddy part that is lost in its uncertainty is said to be', () => {
    expect(separateTwoFrequencies(at(25, 1.3), at(50, 2.61))).toMatchObject({ outcome: 'separated', notes: [{ code: 'eddy-near-zero' }] });
  });
  it('refuses readings that cannot be', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => separateTwoFrequencies(at(bad, 1), at(50, 2))).toThrow(OutOfRangeError);
      expect(() => separateTwoFrequencies(at(25, bad), at(50, 2))).toThrow(OutOfRangeError);
      expect(() => separateTwoFrequencies(at(25, 1), at(50, 2, bad))).toThrow(OutOfRangeError);
      expect(() => separateTwoFrequencies(at(25, 1), at(50, 2), { referredToT: bad })).toThrow(OutOfRangeError);
      expect(() => lossPartsAt({ hysteresisPerCycle: 1, eddyPerCycleHz: 1 }, bad)).toThrow(OutOfRangeError);
      expect(() => hysteresisFromLoop(1, bad, 7650)).toThrow(OutOfRangeError);
    }
    expect(() => separateTwoFrequencies(at(25, 1), at(50, 2), { repeatRel: -1 })).toThrow(OutOfRangeError);
    expect(() => separateTwoFrequencies(at(25, 1), at(50, 2), { phaseErrorRad: 0.01 })).toThrow(/power factor/);
    expect(() => separateTwoFrequencies({ ...at(25, 1), powerFactor: 1.2 }, at(50, 2))).toThrow(OutOfRangeError);
  });
});

describe('What holds for every separation', () => {
  const part = fc.double({ min: 1e-3, max: 1, noNaN: true });
  it('gives the parts back from which two readings were made, in either order', () => {
    fc.assert(
      fc.property(part, part, fc.integer({ min: 10, max: 60 }), fc.integer({ min: 40, max: 400 }), (hysteresisPerCycle, share, low, span) => {
        const parts = { hysteresisPerCycle, eddyPerCycleHz: (share * hysteresisPerCycle) / 50 };
        const [a, b] = [at(low, lossPartsAt(parts, low).total), at(low + span, lossPartsAt(parts, low + span).total)];
        const s = separate(a, b);
        expect(s.hysteresisPerCycle / hysteresisPerCycle).toBeCloseTo(1, 9);
        expect(s.eddyPerCycleHz / parts.eddyPerCycleHz).toBeCloseTo(1, 6);
        expect(separate(b, a)).toEqual(s);
        expect(s.expandedUncertaintyShare).toBeGreaterThan(0);
      }),
    );
  });
});
