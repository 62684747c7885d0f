import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { GROWN_WORDS, partThatGrew } from './grown-part.js';
import { lossPartsAt, separateTwoFrequencies, type SeparationOptions } from './two-frequency-separation.js';

/** A core whose loss at 50 Hz has these two parts, read at 25 and 50 Hz. */
const core = (hysteresis: number, eddy: number, options: SeparationOptions = {}, fluxDensityT = 1.32) => {
  const parts = { hysteresisPerCycle: hysteresis / 50, eddyPerCycleHz: eddy / 2500 };
  const at = (frequencyHz: number) => ({ frequencyHz, fluxDensityT, wattsPerKg: lossPartsAt(parts, frequencyHz).total });
  return separateTwoFrequencies(at(25), at(50), options);
};
const sound = core(2, 1);

describe('Which part grew', () => {
  it('eddy loss alone is sheet insulation', () => {
    const answer = partThatGrew(sound, core(2, 1.8));
    expect(answer.outcome).toBe('sheet-insulation');
    expect(answer.words).toContain('sheet insulation');
    expect(answer.growth).toMatchObject({ eddy: expect.closeTo(0.8, 9), hysteresis: expect.closeTo(0, 9) });
  });
  it('hysteresis alone is cold work and strain', () => {
    const answer = partThatGrew(sound, core(2.8, 1));
    expect(answer.outcome).toBe('cold-work-and-strain');
    expect(answer.words).toContain('cold work and strain');
  });
  it('both together are said to be both', () => expect(partThatGrew(sound, core(2.8, 1.8)).outcome).toBe('both'));
  it('nothing is said to be nothing only where the readings are good enough to say it', () => {
    const good = { repeatRel: 0.001 };
    expect(partThatGrew(core(2, 1, good), core(2.01, 1.01, good)).outcome).toBe('neither');
    const rough = { repeatRel: 0.02 };
    expect(partThatGrew(core(2, 1, rough), core(2.01, 1.01, rough))).toMatchObject({ outcome: 'inconclusive', reasons: [{ code: 'within-uncertainty' }] });
  });
  it('a core that became better grew in neither part', () => {
    const good = { repeatRel: 0.001 };
    expect(partThatGrew(core(2, 1, good), core(1.8, 0.9, good)).outcome).toBe('neither');
  });
  it('a part that grew while the other cannot be told apart from it stays open', () => {
    const rough = { repeatRel: 0.02 };
    const answer = partThatGrew(core(2, 1, rough), core(2.25, 1.5, rough));
    expect(answer.outcome).toBe('inconclusive');
    expect(answer.growth).toBeDefined();
  });
  it('the answer does not hang on the frequency it is looked at', () => {
    for (const frequencyHz of [25, 50, 60]) expect(partThatGrew(sound, core(2, 1.9), { frequencyHz }).outcome).toBe('sheet-insulation');
  });
  it('every answer has words of its own', () => expect(new Set(Object.values(GROWN_WORDS)).size).toBe(5));
});

describe('When it cannot be told', () => {
  const same = separateTwoFrequencies({ frequencyHz: 50, fluxDensityT: 1.32, wattsPerKg: 3 }, { frequencyHz: 50, fluxDensityT: 1.32, wattsPerKg: 3 });
  it('one frequency before or after is named, and which of them', () => {
    expect(partThatGrew(same, sound)).toMatchObject({ outcome: 'inconclusive', reasons: [{ code: 'before-same-frequency' }] });
    expect(partThatGrew(sound, same)).toMatchObject({ outcome: 'inconclusive', reasons: [{ code: 'after-same-frequency' }] });
    expect(partThatGrew(same, same).reasons).toHaveLength(2);
    expect(partThatGrew(same, sound).growth).toBeUndefined();
  });
  it('two fluxes are not held against each other', () => {
    expect(partThatGrew(sound, core(2, 1.8, {}, 1.25))).toMatchObject({ outcome: 'inconclusive', reasons: [{ code: 'flux-differs' }] });
  });
  it('refuses options that cannot be', () => {
    for (const bad of [0, -1, NaN]) {
      expect(() => partThatGrew(sound, sound, { frequencyHz: bad })).toThrow(OutOfRangeError);
      expect(() => partThatGrew(sound, sound, { smallShare: bad })).toThrow(OutOfRangeError);
    }
  });
});

describe('What holds for every pair', () => {
  it('no part is named that did not grow, and where good readings do not tell, rough ones never do', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.5, max: 1.5, noNaN: true }), fc.double({ min: -0.5, max: 1.5, noNaN: true }), fc.double({ min: 0.0005, max: 0.006, noNaN: true }), (moreHysteresis, moreEddy, repeatRel) => {
        const { outcome } = partThatGrew(core(2, 1, { repeatRel }), core(2 + moreHysteresis, 1 + moreEddy, { repeatRel }));
        if (outcome === 'sheet-insulation') expect(moreEddy).toBeGreaterThan(Math.max(0, moreHysteresis));
        if (outcome === 'cold-work-and-strain') expect(moreHysteresis).toBeGreaterThan(Math.max(0, moreEddy));
        if (outcome === 'both') expect(Math.min(moreHysteresis, moreEddy)).toBeGreaterThan(0);
        if (outcome === 'neither') expect(Math.max(moreHysteresis, moreEddy)).toBeLessThan(0.3 + 1e-9);
        const worse = partThatGrew(core(2, 1, { repeatRel: repeatRel * 2 }), core(2 + moreHysteresis, 1 + moreEddy, { repeatRel: repeatRel * 2 })).outcome;
        if (outcome === 'inconclusive') expect(worse).toBe('inconclusive');
        if (worse === 'both') expect(outcome).toBe('both');
      }),
    );
  });
});
