import { DEFAULT_BURNOUT_LIMITS } from './limits.js';
import type { ReadingsOf } from './records.js';
import { describe, expect, it } from 'vitest';
import { burnoutProblems, judgeStrip, partLimit } from './burnout-limit.js';

const dismantling = (more: Partial<ReadingsOf<'dismantling'>> = {}): ReadingsOf<'dismantling'> => ({ rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'seen', fits: '', ...more });
const strip = (more: Partial<ReadingsOf<'strip'>> = {}): ReadingsOf<'strip'> => ({
  method: 'oven-burnout',
  ovenId: 'o1',
  commutatorOrSlipRingsOn: false,
  wiresCountedAtCut: 66,
  sampleCoilKept: true,
  partPeakC: 356,
  minutesAbove345C: 95,
  sensorPosition: 'tooth',
  explanation: '',
  ...more,
});

describe('the limit of a load', () => {
  // ANSI/EASA AR100-2015 clause 3.3: 370 °C organic, 400 °C inorganic core plate
  it('is 370 °C with an organic core plate and 400 °C with an inorganic one', () => {
    expect(partLimit(dismantling({ corePlate: 'organic' }), DEFAULT_BURNOUT_LIMITS).limitC).toBe(370);
    expect(partLimit(dismantling({ corePlate: 'inorganic' }), DEFAULT_BURNOUT_LIMITS).limitC).toBe(400);
  });
  it('counts an unknown core plate as organic (common practice)', () => {
    expect(partLimit(dismantling(), DEFAULT_BURNOUT_LIMITS)).toEqual({ limitC: 370, reason: 'core plate unknown, counted as organic' });
    expect(partLimit(undefined, DEFAULT_BURNOUT_LIMITS).limitC).toBe(370);
  });
  it('is that of an aluminium frame when that is lower (common practice)', () => {
    expect(partLimit(dismantling({ corePlate: 'inorganic', frameMaterial: 'aluminium' }), DEFAULT_BURNOUT_LIMITS)).toEqual({ limitC: 300, reason: 'aluminium frame' });
  });
});

describe('how the winding came out', () => {
  it('a part that stayed at its limit is within it, one degree more is over', () => {
    expect(judgeStrip(strip({ partPeakC: 370 }), dismantling(), DEFAULT_BURNOUT_LIMITS).verdict).toBe('conforms');
    expect(judgeStrip(strip({ partPeakC: 371 }), dismantling(), DEFAULT_BURNOUT_LIMITS).verdict).toBe('does-not-conform');
  });
  it('the overheated core of the saw mill’s motor is 76 °C over', () => {
    expect(judgeStrip(strip({ partPeakC: 446 }), dismantling(), DEFAULT_BURNOUT_LIMITS).result.overC).toBe(76);
  });
  it('without a part temperature a burnout cannot be judged, a cold pull needs none', () => {
    expect(judgeStrip(strip({ partPeakC: null }), dismantling(), DEFAULT_BURNOUT_LIMITS).verdict).toBe('not-valid');
    expect(judgeStrip(strip({ method: 'cold-pull', partPeakC: null }), dismantling(), DEFAULT_BURNOUT_LIMITS).verdict).toBe('conforms');
  });
});

describe('before anything goes into an oven', () => {
  it('nothing stands in the way of a part whose wires are counted and whose sample coil is kept', () => {
    expect(burnoutProblems(strip(), dismantling())).toEqual([]);
  });
  it.each([
    ['slip rings are still on', { commutatorOrSlipRingsOn: true }, 'rings-on'],
    ['the wires were not counted', { wiresCountedAtCut: null }, 'not-counted'],
    ['no sample coil was kept', { sampleCoilKept: false }, 'no-sample'],
    ['no oven is named', { ovenId: null }, 'no-oven'],
  ])('it is refused when %s', (_, change, code) => {
    expect(burnoutProblems(strip(change), dismantling()).map((p) => p.code)).toEqual([code]);
  });
  it('it is refused when nobody knows the core plate and the frame yet', () => {
    expect(burnoutProblems(strip(), undefined).map((p) => p.code)).toEqual(['limit-unknown']);
  });
  it('a pull needs none of it', () => {
    expect(burnoutProblems(strip({ method: 'cold-pull', wiresCountedAtCut: null, sampleCoilKept: false, ovenId: null }), undefined)).toEqual([]);
  });
});
