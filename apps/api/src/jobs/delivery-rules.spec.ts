import { describe, expect, it } from 'vitest';
import { deliveryProblem } from './delivery-rules.js';
import { factsAt, signed } from './job-facts.fixture.js';

describe('when a machine may go out', () => {
  const ready = factsAt('rewind', 'ready', { certificateInForce: true });

  it('when it is ready and its certificate is there', () => {
    expect(deliveryProblem(ready)).toBeNull();
  });

  it('not before it is ready, nor on hold', () => {
    expect(deliveryProblem({ ...ready, step: 'final-test' })).toEqual({ code: 'not-ready' });
    expect(deliveryProblem({ ...ready, state: 'on-hold' })).toEqual({ code: 'not-ready' });
    expect(deliveryProblem({ ...ready, state: 'scrapped' })).toEqual({ code: 'not-ready' });
  });

  it('not twice', () => {
    expect(deliveryProblem({ ...ready, signOffs: [signed('delivery', null)] })).toEqual({ code: 'already' });
  });

  it('not while a customer who pays before collection has not paid', () => {
    const owes = { ...ready, customer: { terms: 'prepayment' as const, creditStop: false }, invoices: [{ number: 'R1', balanceMinor: 100 }] };
    expect(deliveryProblem(owes)).toMatchObject({ code: 'gate-shut' });
    expect(deliveryProblem({ ...owes, invoices: [{ number: 'R1', balanceMinor: 0 }] })).toBeNull();
  });

  it('not without its certificate', () => {
    expect(deliveryProblem({ ...ready, certificateInForce: false })).toMatchObject({ code: 'gate-shut' });
  });

  it('unrepaired as it is, when that is how the job ended', () => {
    expect(deliveryProblem({ ...ready, state: 'returned-unrepaired', step: 'awaiting-approval', certificateInForce: false })).toBeNull();
  });
});
