import { describe, expect, it } from 'vitest';
import { condition } from './condition.js';
import { editProblem, endProblem, holdProblem, limitsProblem, refusalOfMove, resumeProblem } from './job-refusals.js';

const ENDS = ['released', 'returned-unrepaired', 'replaced', 'scrapped'] as const;

describe('what a refused move says', () => {
  it('a shut gate: the first thing that is missing, how many more, and the whole list', () => {
    const conditions = [condition('STRIP', true, 'Strip within its limit.', 'strip'), condition('QUOTE_APPROVED', false, 'Make a quote and send it.', 'quote'), condition('CORE_AFTER', false, 'Make the core test after.', 'core-test-after')];
    const refusal = refusalOfMove({ code: 'gate-shut', conditions });
    expect(refusal).toMatchObject({ code: 'GATE_SHUT', message: 'Not yet. Make a quote and send it. And 1 more.' });
    expect(refusal.details.conditions).toEqual(conditions);
    expect(refusalOfMove({ code: 'gate-shut', conditions: conditions.slice(0, 2) }).message).toBe('Not yet. Make a quote and send it.');
  });

  it('a reason that is missing: at its field', () => {
    expect(refusalOfMove({ code: 'reason-missing' })).toMatchObject({ code: 'INPUT_NOT_VALID', details: { fields: [{ path: 'why', code: 'reason-missing' }] } });
  });

  it.each([
    ['ended', 'The job has ended; nothing is done to it any more.'],
    ['on-hold', 'The job is on hold: let it go on first.'],
    ['not-on-route', 'This step is not on the route of this job.'],
    ['same-step', 'The job stands at this step already.'],
    ['skips-steps', 'A job goes forward one step at a time.'],
  ] as const)('%s: in words', (code, message) => {
    expect(refusalOfMove({ code })).toMatchObject({ code: 'MOVE_NOT_ALLOWED', message });
  });
});

describe('what can be done to a job in its state', () => {
  it('an open job can be held and ended, a held one resumed and ended', () => {
    expect([holdProblem('open'), endProblem('open'), resumeProblem('on-hold'), endProblem('on-hold')]).toEqual([null, null, null, null]);
    expect(holdProblem('on-hold')).toBe('The job is on hold already.');
    expect(resumeProblem('open')).toBe('The job is not on hold.');
  });

  it('nothing more can be done to one that has ended, but its reference may still come', () => {
    for (const state of ENDS) {
      for (const problem of [holdProblem(state), resumeProblem(state), endProblem(state)]) expect(problem).toBe('The job has ended; nothing is done to it any more.');
      expect(editProblem(state, ['customerReference'])).toBeNull();
      expect(editProblem(state, ['customerReference', 'promisedOn'])).toContain('only the customer’s reference');
    }
    expect(editProblem('on-hold', ['complaint', 'promisedOn'])).toBeNull();
  });

  it('only a job under older limits is moved to the newest', () => {
    expect(limitsProblem({ state: 'open', limitsVersion: 1 }, 2)).toBeNull();
    expect(limitsProblem({ state: 'open', limitsVersion: 2 }, 2)).toContain('newest limits already');
    expect(limitsProblem({ state: 'released', limitsVersion: 1 }, 2)).toContain('has ended');
  });
});
