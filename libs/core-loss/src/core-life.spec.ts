import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coreLife, type CoreVisit, type LifeLimits } from './core-life.js';

let count = 0;
const visit = (date: string, wattsPerKg: number, over: Partial<CoreVisit> = {}): CoreVisit => ({
  id: `t-${(count += 1)}`, date, phase: 'after', wattsPerKg, expandedUncertaintyRel: 0.02, referredToT: 1.32, frequencyHz: 50, frame: { state: 'bare', material: 'none' }, valid: true, ...over,
});
const limits: LifeLimits = { increaseLimit: 0.2, fallAsk: 0.1 };
const codes = (life: ReturnType<typeof coreLife>) => life.points.map((p) => p.flags.map((f) => f.code));

describe('A core over its visits', () => {
  it('that kept its loss is steady', () => {
    const life = coreLife([visit('2012-01-10', 3), visit('2018-06-01', 3.1), visit('2026-03-14', 2.95)], limits);
    expect(life.trend).toBe('steady');
    expect(life.points[1]!.sinceFirst!.change).toBeCloseTo(1 / 30, 9);
    expect(life.points[2]!.sinceLast!.change).toBeCloseTo(2.95 / 3.1 - 1, 9);
    expect(codes(life)).toEqual([['first'], [], []]);
  });
  it('that rose in one step is said to have risen, and at which visit', () => {
    const life = coreLife([visit('2012-01-10', 3), visit('2018-06-01', 4.2), visit('2026-03-14', 4.2)], limits);
    expect(life.trend).toBe('rose');
    expect(codes(life)[1]).toContain('rose');
    expect(codes(life)[2]).toEqual(['crept']);
  });
  it('that worsened a little at every rewind has crept over the limit though no visit passed it', () => {
    const life = coreLife([visit('2010-01-10', 3), visit('2015-01-10', 3.35), visit('2020-01-10', 3.7), visit('2026-01-10', 4.05)], limits);
    expect(life.trend).toBe('crept');
    expect(life.points.every((p) => !p.flags.some((f) => f.code === 'rose'))).toBe(true);
    expect(codes(life)[3]).toEqual(['crept']);
  });
  it('whose change touches the limit is inconclusive', () => expect(coreLife([visit('2012-01-10', 3), visit('2020-01-10', 3.6)], limits).trend).toBe('inconclusive'));
  it('that fell a lot asks about the first test', () => {
    const life = coreLife([visit('2012-01-10', 4), visit('2020-01-10', 3)], limits);
    expect(life.trend).toBe('fell');
    expect(life.words).toContain('first test');
  });
  it('visits are put in order of their day, before comes before after', () => {
    const life = coreLife([visit('2026-03-14', 3.2), visit('2026-03-14', 3.1, { phase: 'before' }), visit('2011-01-01', 3)], limits);
    expect(life.points.map((p) => p.visit.wattsPerKg)).toEqual([3, 3.1, 3.2]);
    expect(life.first!.wattsPerKg).toBe(3);
    expect(life.last!.wattsPerKg).toBe(3.2);
  });
  it('what tests share cancels between them', () => {
    const two = [visit('2012-01-10', 3, { expandedUncertaintyRel: 0.07 }), visit('2020-01-10', 3.3, { expandedUncertaintyRel: 0.07 })];
    const apart = coreLife(two, limits).points[1]!.sinceFirst!.expandedUncertainty;
    const shared = coreLife(two, { ...limits, sharedRel: 0.06 }).points[1]!.sinceFirst!.expandedUncertainty;
    expect(apart).toBeCloseTo(1.1 * 0.07 * Math.SQRT2, 9);
    expect(shared).toBeCloseTo(1.1 * Math.sqrt(2 * (0.07 ** 2 - 0.06 ** 2)), 9);
  });
});

describe('What cannot be compared is shown and says why', () => {
  it.each<[string, Partial<CoreVisit>, string]>([
    ['a test that is not valid', { valid: false }, 'not-valid'],
    ['another flux', { referredToT: 1.0 }, 'other-flux'],
    ['another frequency', { frequencyHz: 60 }, 'other-frequency'],
    ['in the frame instead of bare', { frame: { state: 'in-frame', material: 'cast-iron' } }, 'other-frame'],
  ])('%s', (_words, over, code) => {
    const life = coreLife([visit('2012-01-10', 3), visit('2020-01-10', 5, over), visit('2026-01-10', 3.05)], limits);
    expect(life.points[1]).toMatchObject({ comparable: false, flags: [{ code }] });
    expect(life.points[1]!.sinceFirst).toBeUndefined();
    expect(life.trend).toBe('steady');
    expect(life.points[2]!.sinceLast!.change).toBeCloseTo(3.05 / 3 - 1, 9);
  });
  it('one test, or none, tells nothing', () => {
    expect(coreLife([], limits)).toMatchObject({ trend: 'not-told', points: [] });
    expect(coreLife([visit('2012-01-10', 3)], limits)).toMatchObject({ trend: 'not-told' });
    expect(coreLife([visit('2012-01-10', 3, { valid: false })], limits)).toMatchObject({ trend: 'not-told', points: [{ comparable: false }] });
    expect(coreLife([visit('2012-01-10', 3), visit('2013-01-10', 3, { frequencyHz: 60 })], limits).trend).toBe('not-told');
  });
});

describe('What holds for every life', () => {
  it('nobody is left out, the input is not touched, and order of entry does not matter', () => {
    const year = fc.integer({ min: 1990, max: 2040 });
    fc.assert(
      fc.property(fc.uniqueArray(year, { minLength: 1, maxLength: 8 }), fc.array(fc.double({ min: 1, max: 9, noNaN: true }), { minLength: 8, maxLength: 8 }), (years, losses) => {
        const visits = years.map((y, i) => visit(`${y}-05-01`, losses[i]!));
        const copy = structuredClone(visits);
        const life = coreLife(visits, limits);
        expect(visits).toEqual(copy);
        expect(life.points).toHaveLength(visits.length);
        expect(coreLife([...visits].reverse(), limits)).toEqual(life);
      }),
    );
  });
  it('refuses figures that cannot be', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => coreLife([visit('2012-01-10', bad)], limits)).toThrow(OutOfRangeError);
      expect(() => coreLife([visit('2012-01-10', 3, { referredToT: bad })], limits)).toThrow(OutOfRangeError);
      expect(() => coreLife([visit('2012-01-10', 3, { frequencyHz: bad })], limits)).toThrow(OutOfRangeError);
      expect(() => coreLife([], { ...limits, increaseLimit: bad })).toThrow(OutOfRangeError);
    }
    expect(() => coreLife([visit('12.1.2012', 3)], limits)).toThrow(/2026-03-14/);
    expect(() => coreLife([visit('2012-01-10', 3, { expandedUncertaintyRel: 1 })], limits)).toThrow(OutOfRangeError);
    expect(() => coreLife([], { ...limits, sharedRel: NaN })).toThrow(OutOfRangeError);
  });
});
