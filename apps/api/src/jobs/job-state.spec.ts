import { ROUTES, ROUTE_STEPS } from '@shared/route';
import { describe, expect, it } from 'vitest';
import { condition } from './condition.js';
import { isEnded, moveProblem, stateAt } from './job-state.js';

const open = () => [];
const shut = () => [condition('QUOTE_APPROVED', false, 'Make a quote and send it.', 'quote')];

describe('moves of a job', () => {
  it.each(ROUTES)('on the route %s every step is reached by one step forward, and only so', (route) => {
    const steps = ROUTE_STEPS[route];
    steps.forEach((step, from) =>
      steps.forEach((to, target) => {
        const problem = moveProblem({ route, step, state: 'open' }, to, 'a reason', open);
        const expected = target === from ? 'same-step' : target > from + 1 ? 'skips-steps' : undefined;
        expect([step, to, problem?.code]).toEqual([step, to, expected]);
      }),
    );
  });

  it('a step of another route is none of this one', () => {
    expect(moveProblem({ route: 'core-test-only', step: 'received', state: 'open' }, 'rewind', 'why', open)).toEqual({ code: 'not-on-route' });
  });

  it('back needs a reason, and blanks are none', () => {
    const job = { route: 'rewind', step: 'dismantled', state: 'open' } as const;
    expect(moveProblem(job, 'received', '  ', open)).toEqual({ code: 'reason-missing' });
    expect(moveProblem(job, 'received', 'wrong machine', open)).toBeNull();
  });

  it('back asks no gate, forward does', () => {
    const job = { route: 'rewind', step: 'awaiting-approval', state: 'open' } as const;
    expect(moveProblem(job, 'dismantled', 'look again', shut)).toBeNull();
    expect(moveProblem(job, 'strip-and-burnout', '', shut)).toEqual({ code: 'gate-shut', conditions: shut() });
  });

  it.each([
    ['on-hold', 'on-hold'],
    ['released', 'ended'],
    ['returned-unrepaired', 'ended'],
    ['replaced', 'ended'],
    ['scrapped', 'ended'],
  ] as const)('a job that is %s does not move', (state, code) => {
    expect(moveProblem({ route: 'rewind', step: 'rewind', state }, 'before-varnish-test', 'why', open)).toEqual({ code });
  });

  it('the last step of a route ends the job, the others do not', () => {
    for (const route of ROUTES) for (const step of ROUTE_STEPS[route]) expect(stateAt(route, step)).toBe(step === 'released' ? 'released' : 'open');
  });

  it('open and on hold are the only states that go on', () => {
    expect(['open', 'on-hold', 'released', 'returned-unrepaired', 'replaced', 'scrapped'].map((s) => isEnded(s as never))).toEqual([false, false, true, true, true, true]);
  });
});
