import { describe, expect, it } from 'vitest';
import { readTyped, shownText, typedFrom } from './typed.js';

describe('a known figure in a field', () => {
  it('of 340 mm is shown in inches as far as it fits, and stays 340 mm until somebody types over it', () => {
    const outside = typedFrom(0.34, 'length', 'inch-pound');
    expect(shownText(outside, 'length', 'inch-pound')).toBe('13.3858');
    expect(readTyped(outside, 'length')).toMatchObject({ state: 'read', si: 0.34 });
    expect(shownText(outside, 'length', 'si')).toBe('340');
  });

  it('that is round in inches is kept and shown in inches', () => {
    // 1 in = 25.4 mm exactly (international inch, 1959)
    expect(typedFrom(0.034925, 'length', 'inch-pound')).toEqual({ text: '1.375', system: 'inch-pound' });
  });

  it('is never cut before its point, nor given noughts it does not have', () => {
    expect(shownText({ text: '32.0', system: 'si' }, 'temperature', 'inch-pound')).toBe('89.6');
    expect(shownText({ text: '123456789', system: 'si' }, 'voltage', 'inch-pound')).toBe('123456789');
  });

  it('that cannot be read is shown as it was typed', () => {
    expect(shownText({ text: 'about 47', system: 'si' }, 'power', 'inch-pound')).toBe('about 47');
  });
});
