import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { limitDifferences } from '@shared/limit-differences';
import { LIMIT_ROWS } from '@shared/limit-rows';
import { DEFAULT_BURNOUT_LIMITS, type LimitsVersionView } from '@shared/limits';
import { describe, expect, it } from 'vitest';
import { limitFormOf, onTopOf, readLimits, readSet, type LimitForm } from './limit-form.js';
import { LIMIT_SECTIONS } from './limit-sections.js';

const SET = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS } as unknown as LimitsVersionView['set'];
const FIRST: LimitsVersionView = { version: 1, publishedAt: '2026-03-02T09:00:00.000Z', publishedBy: 'Loopbay', note: 'As shipped.', set: SET };
const WORDS = { lookAtSource: 'Look at the source.' };

/** The form with some of its fields typed anew. */
function typed(form: LimitForm, changes: Record<string, unknown>): LimitForm {
  const copy = structuredClone(form) as unknown as Record<string, never>;
  for (const [path, value] of Object.entries(changes)) {
    const keys = path.split('.');
    const last = keys.pop()!;
    (keys.reduce<Record<string, unknown>>((v, key) => v[key] as Record<string, unknown>, copy))[last] = value;
  }
  return copy as unknown as LimitForm;
}
const si = (text: string) => ({ text, system: 'si' as const });
const read = (changes: Record<string, unknown>, system: 'si' | 'inch-pound' = 'si') => readLimits(typed(limitFormOf(FIRST, system), { note: 'Decided.', ...changes }), FIRST, WORDS);
const paths = (changes: Record<string, unknown>) => read(changes).problems.map((p) => p.path);

describe('the form of the limits', () => {
  it.each(['si', 'inch-pound'] as const)('filled from a version in %s units and not touched, is that version to the last digit', (system) => {
    const { input, problems } = read({}, system);
    expect(problems).toEqual([]);
    expect(limitDifferences(SET, input!.set)).toEqual([]);
  });

  it('shows every limit once', () => {
    const shown = LIMIT_SECTIONS.flatMap((s) => s.blocks.flatMap((b) => b.rows.map((r) => r.valuePath)));
    expect(shown).toHaveLength(LIMIT_ROWS.length);
    expect(new Set(shown).size).toBe(LIMIT_ROWS.length);
  });

  it('takes figures as they are typed: percent, a comma, minutes for what is kept in seconds', () => {
    const { input } = read({
      'set.core.increaseLimit': si('15'),
      'set.core.sources.increase.source': 'Shop practice: 15 %',
      'set.machine.highPotentialSeconds.value': si('1,5'),
      'set.machine.highPotentialSeconds.source': 'Shop practice',
      'set.burnout.inorganicC': { text: '734', system: 'inch-pound' },
      'confirmed.burnout_sources_inorganicC': true,
    });
    const set = input!.set as unknown as { core: { increaseLimit: number }; machine: Record<string, { value: number }>; burnout: { inorganicC: number } };
    expect(set.core.increaseLimit).toBeCloseTo(0.15, 12);
    expect(set.machine['highPotentialSeconds']!.value).toBe(90);
    // 734 °F is 390 °C
    expect(set.burnout.inorganicC).toBeCloseTo(390, 9);
    expect(input!.confirmedSources).toEqual(['burnout.sources.inorganicC']);
  });

  it('asks for the source of a changed figure, at the source', () => {
    expect(paths({ 'set.core.hotSpotLimitK': si('8') })).toEqual(['set.core.sources.hot-spot.source']);
    expect(paths({ 'set.core.hotSpotLimitK': si('8'), 'confirmed.core_sources_hot-spot': true })).toEqual([]);
  });

  it('names each gap at its field: a figure, a source, the note, a warning over its limit', () => {
    expect(paths({ 'set.machine.polarizationIndex.value': si(' ') })).toEqual(['set.machine.polarizationIndex.value']);
    expect(paths({ 'set.machine.polarizationIndex.value': si('two') })).toEqual(['set.machine.polarizationIndex.value']);
    expect(paths({ 'set.machine.polarizationIndex.source': '' })).toEqual(['set.machine.polarizationIndex.source']);
    expect(paths({ note: '' })).toEqual(['note']);
    expect(paths({ 'set.core.increaseWarn': si('30'), 'confirmed.core_sources_increase': true })).toEqual(['set.core.increaseWarn']);
  });
});

describe('several things wrong at once', () => {
  it('are told in the order they stand on the page', () => {
    expect(paths({ note: '', 'set.machine.polarizationIndex.value': si('two'), 'set.core.increaseLimit': si('x'), 'set.core.hotSpotLimitK': si('8') })).toEqual(['set.core.increaseLimit', 'set.core.sources.hot-spot.source', 'set.machine.polarizationIndex.value', 'note']);
  });
});

describe('a version published meanwhile', () => {
  const theirs: LimitsVersionView = { ...FIRST, version: 2, publishedBy: 'Mo Manager', set: structuredClone(SET) };
  const core = theirs.set['core'] as Record<string, unknown>;
  core['fallAsk'] = 0.08;
  core['hotSpotLimitK'] = 9;

  it('keeps what they changed and I did not, and mine where I did', () => {
    const mine = typed(limitFormOf(FIRST, 'si'), { note: 'Mine.', 'set.core.hotSpotLimitK': si('8'), 'set.core.sources.hot-spot.source': 'Shop practice: 8 K', 'set.core.decisionRule': 'refuse' });
    const merged = onTopOf(mine, FIRST, theirs, 'si');
    expect([merged.baseVersion, merged.note]).toEqual([2, 'Mine.']);
    expect(limitDifferences(theirs.set, readSet(merged, theirs.set)).map((d) => [d.path, d.from.value, d.to.value])).toEqual([
      ['core.hotSpotLimitK', 9, 8],
      ['core.hotSpotWarnK', 5, 5],
      ['core.referenceFluxT', 1.32, 1.32],
      ['core.decisionRule', null, null],
    ]);
    expect((readSet(merged, theirs.set)['core'] as Record<string, unknown>)['fallAsk']).toBe(0.08);
  });
});
