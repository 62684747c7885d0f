import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { checked, problemsOf, showProblems } from './form-problems.js';

const schema = z.strictObject({ end: z.enum(['scrapped', 'replaced']), who: z.string().min(1, 'Who agreed?'), inner: z.strictObject({ volts: z.number() }) });

describe('what a contract finds wrong, at its fields', () => {
  it('asks for a choice that was not made, and keeps the contract’s own words', () => {
    const result = schema.safeParse({ end: null, who: '', inner: { volts: null } });
    expect(problemsOf(result.error!)).toEqual([
      { path: 'end', message: 'Choose one.' },
      { path: 'who', message: 'Who agreed?' },
      { path: 'inner.volts', message: 'Fill this in.' },
    ]);
  });

  it('puts the cursor into the first field, and says one thing at each', () => {
    const setError = vi.fn();
    showProblems([{ path: 'a', message: '1' }, { path: 'a', message: '2' }, { path: 'b', message: '3' }], setError);
    expect(setError.mock.calls.map(([path, error, options]) => [path, (error as { message: string }).message, (options as { shouldFocus: boolean }).shouldFocus])).toEqual([
      ['a', '1', true],
      ['b', '3', false],
    ]);
  });

  it('lets through what is right, as the contract tidied it', () => {
    const setError = vi.fn();
    expect(checked(z.strictObject({ who: z.string().trim() }), { who: ' Jan ' }, setError)).toEqual({ who: 'Jan' });
    expect(setError).not.toHaveBeenCalled();
  });
});
