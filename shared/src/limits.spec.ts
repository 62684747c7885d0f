import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { describe, expect, it } from 'vitest';
import { differenceWords, limitDifferences, sourcesToLookAt } from './limit-differences.js';
import { ORDERED_PATHS } from './limit-order.js';
import { CORE_LIMIT_NAMES, MACHINE_LIMIT_NAMES } from './limit-names.js';
import { LIMIT_ROWS } from './limit-rows.js';
import { limitWords, sourceOf, standingWords, valueOf } from './limit-values.js';
import { asKept, DEFAULT_BURNOUT_LIMITS, limitsSetSchema, publishLimitsSchema, type LimitsToPublish } from './limits.js';

const SHIPPED = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS };
const { source: _line, standing: _standings, ...burnout } = DEFAULT_BURNOUT_LIMITS;
const SET = { ...SHIPPED, burnout } as unknown as LimitsToPublish;

/** A copy with another value at one place. */
function withAt(set: unknown, path: string, value: unknown): LimitsToPublish {
  const copy = structuredClone(set) as Record<string, never>;
  const keys = path.split('.');
  const last = keys.pop()!;
  const holder = keys.reduce<Record<string, unknown>>((v, key) => v[key] as Record<string, unknown>, copy);
  if (value === undefined) delete holder[last];
  else holder[last] = value;
  return copy as unknown as LimitsToPublish;
}
const refusals = (set: unknown) => {
  const result = limitsSetSchema.safeParse(set);
  return result.success ? [] : result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
};

describe('the table of the limits', () => {
  it('holds every figure the shop is judged by, each with a name, a value and a range it lies in', () => {
    const figures = Object.keys(DEFAULT_CORE_LIMITS).length - 2 + Object.keys(DEFAULT_MACHINE_TEST_LIMITS).length + 3;
    expect(LIMIT_ROWS).toHaveLength(figures);
    expect(LIMIT_ROWS.map((row) => row.name)).toEqual(expect.arrayContaining([...Object.values(MACHINE_LIMIT_NAMES), CORE_LIMIT_NAMES.increaseLimit]));
    for (const row of LIMIT_ROWS) {
      const value = valueOf(SHIPPED, row);
      expect(value, row.valuePath).toBeGreaterThanOrEqual(row.least);
      expect(value, row.valuePath).toBeLessThanOrEqual(row.most);
    }
  });

  it('has a source with a standing for all but the two the shop alone decides', () => {
    expect(LIMIT_ROWS.filter((row) => sourceOf(SHIPPED, row) === undefined).map((row) => row.key)).toEqual(['minimumTargetT', 'coverageFactor']);
    for (const row of LIMIT_ROWS) expect(['S', 'P', 'C', undefined]).toContain(sourceOf(SHIPPED, row)?.standing);
  });

  it('orders only figures there are', () => {
    expect(ORDERED_PATHS.filter((path) => !LIMIT_ROWS.some((row) => row.valuePath === path))).toEqual([]);
  });

  it('reads a limit in its own unit, seconds in minutes as every time', () => {
    const words = (key: string) => {
      const row = LIMIT_ROWS.find((r) => r.key === key)!;
      return limitWords(valueOf(SHIPPED, row)!, row).replace(/[\u00a0\u202f]/g, ' ');
    };
    expect(words('increaseLimit')).toBe('20.0 %');
    expect(words('absoluteWPerKg60')).toBe('8.80 W/kg');
    expect(words('insulationFormOhm')).toBe('100 MΩ');
    expect(words('highPotentialSeconds')).toBe('1 min');
    expect(standingWords('P')).toBe('common practice');
  });
});

describe('a set of limits', () => {
  it('as shipped is taken as it is', () => {
    expect(refusals(SET)).toEqual([]);
  });

  it.each([
    ['core.increaseLimit', undefined, 'A figure is needed.'],
    ['core.hotSpotLimitK', '10', 'A figure is needed.'],
    ['core.increaseLimit', 20, /^Between 1\.0.% and 200\.0.%\.$/],
    ['machine.insulationNewWindingOhm.value', 100, /^Between 1.MΩ and/],
    ['machine.polarizationIndex.standing', 'X', 'Standard, common practice, or the customer’s contract.'],
    ['machine.polarizationIndex.source', '  ', 'Say where this limit comes from: standard and clause, or the shop’s practice.'],
    ['core.sources.increase.source', '', 'Say where this limit comes from: standard and clause, or the shop’s practice.'],
    ['core.decisionRule', 'guess', 'Ask, let it pass, or hold it back.'],
    ['burnout.aluminiumFrameC', Number.NaN, 'A figure is needed.'],
  ])('is refused at %s when it is %j', (path, value, words) => {
    const found = refusals(withAt(SET, path, value));
    expect(found).toHaveLength(1);
    expect(found[0]!.startsWith(`${path}: `)).toBe(true);
    expect(found[0]!.slice(path.length + 2)).toMatch(typeof words === 'string' ? new RegExp(`^${words.replace(/[.?]/g, '\\$&')}$`) : words);
  });

  it('with a warning at or over its limit is refused at the warning', () => {
    expect(refusals(withAt(SET, 'core.increaseWarn', 0.2))).toEqual(['core.increaseWarn: Must be below: increase over the before test, at most.']);
    expect(refusals(withAt(SET, 'core.hotSpotWarnK', 12))).toEqual(['core.hotSpotWarnK: Must be below: hot spot over the core mean, at most.']);
  });

  it('that would let an organic core plate grow hotter than an inorganic one is refused', () => {
    expect(refusals(withAt(SET, 'burnout.organicOrUnknownC', 410))).toEqual(['burnout.organicOrUnknownC: Not above: part, core plate inorganic, at most.']);
    expect(refusals(withAt(SET, 'burnout.organicOrUnknownC', 400))).toEqual([]);
  });

  it('that asks less of a large machine’s vibration than of a small one’s is refused', () => {
    expect(refusals(withAt(SET, 'machine.vibrationFreeTo132.value', 2.5e-3))).toEqual(['machine.vibrationFreeTo132.value: Not above: vibration, free, over 132 to 280 mm.']);
  });

  it('with a unit of its own, or something nobody knows, is refused', () => {
    expect(refusals(withAt(SET, 'machine.polarizationIndex.unit', 'V'))[0]).toMatch(/^machine\.polarizationIndex\.unit/);
    expect(refusals(withAt(SET, 'core.extra', 1))).not.toEqual([]);
    expect(refusals(withAt(SET, 'machine.vibrationNemaRigid', undefined))[0]).toMatch(/^machine\.vibrationNemaRigid/);
  });

  it('is published only with a note', () => {
    const result = publishLimitsSchema.safeParse({ baseVersion: 1, note: ' ', set: SET });
    expect(result.error?.issues.map((i) => [i.path.join('.'), i.message])).toEqual([['note', 'Say why the limits change, and who decided it.']]);
  });

  it('keeps the strip’s sources in one line for its records', () => {
    const kept = asKept(withAt(SET, 'burnout.sources.aluminiumFrameC.source', 'Frame maker’s letter'));
    expect(kept.burnout.source).toBe('ANSI/EASA AR100-2015 clause 3.3 (core plate); Frame maker’s letter (frame)');
    expect(kept.burnout.standing).toBe('S core plate, P frame');
  });
});

describe('what differs between two versions', () => {
  it('is nothing when nothing differs', () => {
    expect(limitDifferences(SHIPPED, asKept(SET))).toEqual([]);
  });

  it('is told figure by figure, with both values in words', () => {
    const to = withAt(withAt(SET, 'core.hotSpotLimitK', 8), 'core.decisionRule', 'refuse');
    const differences = limitDifferences(SET, to);
    expect(differences.map((d) => differenceWords(d).replace(/[\u00a0\u202f]/g, ' '))).toEqual(['Hot spot over the core mean, at most: 10.0 K → 8.0 K', 'An inconclusive result at a gate: ask a person → hold it back']);
    expect(differences[0]).toMatchObject({ path: 'core.hotSpotLimitK', group: 'core', valueChanged: true, sourceChanged: false, from: { value: 10, standing: 'P' }, to: { value: 8 } });
  });

  it('a source written anew shows at every figure that stands on it', () => {
    const to = withAt(SET, 'core.sources.increase', { source: 'Contract with the paper mill', standing: 'C' });
    expect(limitDifferences(SET, to).map((d) => [d.path, d.valueChanged, d.sourceChanged])).toEqual([
      ['core.increaseLimit', false, true],
      ['core.increaseWarn', false, true],
    ]);
    expect(differenceWords(limitDifferences(SET, to)[0]!)).toBe('Increase over the before test, at most: source noted anew');
  });

  it('a version of earlier days without sources of its own for a strip falls back to their one line', () => {
    const { sources: _sources, ...older } = DEFAULT_BURNOUT_LIMITS;
    const found = limitDifferences({ ...SHIPPED, burnout: older }, SHIPPED);
    expect(found.map((d) => d.path)).toEqual(['burnout.organicOrUnknownC', 'burnout.inorganicC', 'burnout.aluminiumFrameC']);
    expect(found[0]!.from.source).toBe(DEFAULT_BURNOUT_LIMITS.source);
  });

  it('a changed figure asks for its source, unless somebody says that it still stands', () => {
    const to = withAt(SET, 'core.increaseLimit', 0.15);
    expect(sourcesToLookAt(SET, to, [])).toEqual(['core.sources.increase']);
    expect(sourcesToLookAt(SET, to, ['core.sources.increase'])).toEqual([]);
    expect(sourcesToLookAt(SET, withAt(to, 'core.sources.increase.source', 'Shop practice since March'), [])).toEqual([]);
    expect(sourcesToLookAt(SET, withAt(SET, 'core.coverageFactor', 2.5), [])).toEqual([]);
  });
});
