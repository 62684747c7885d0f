import { describe, expect, it } from 'vitest';
import { differencesOf, theirsOf } from './facts-conflict.js';
import { stepsBehind, type FactsForm } from './move-form.js';

const mine: FactsForm = { complaint: 'Trips.', accessories: 'key', contamination: 'none', contaminationWords: '', promisedOn: '2026-12-04', customerReference: '' };

describe('two people at one job', () => {
  it('shows only what differs, each in words', () => {
    const current = { ...mine, contamination: 'food', promisedOn: null, version: 7, step: 'rewind', state: 'open' };
    const theirs = theirsOf(current)!;
    expect(theirs.version).toBe(7);
    expect(differencesOf(theirs.form, mine)).toEqual([
      { label: 'Contamination', theirs: 'food', yours: 'none' },
      { label: 'Promise', theirs: 'no date given', yours: '4 Dec 2026' },
    ]);
  });

  it('says that it cannot read what it does not know', () => {
    expect(theirsOf({ version: 7 })).toBeNull();
    expect(theirsOf(undefined)).toBeNull();
  });

  it('moves back along its own route, the nearest step first', () => {
    expect(stepsBehind('core-test-only', 'ready')).toEqual(['core-test-before', 'received']);
    expect(stepsBehind('rewind', 'received')).toEqual([]);
  });
});
