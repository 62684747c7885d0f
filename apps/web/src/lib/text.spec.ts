import { describe, expect, it } from 'vitest';
import { defineText } from './text.js';

const t = defineText({ plain: 'As it is.', late: 'late by {days} days, {who}', money: 'costs {sum}' });

describe('defineText', () => {
  it('gives the words of a key', () => expect(t('plain')).toBe('As it is.'));
  it('fills the values in', () => expect(t('late', { days: 3, who: 'pump' })).toBe('late by 3 days, pump'));
  it('takes a value as it is, whatever signs it holds', () => expect(t('money', { sum: '$& {days}' })).toBe('costs $& {days}'));
  it('fails the compile for a key or a value that is missing', () => {
    // @ts-expect-error there is no such key
    expect(() => t('nothing')).toThrow();
    // @ts-expect-error the value is missing
    expect(t('late', { days: 3 })).toContain('undefined');
  });
});
