import type { GateCondition } from '@shared/errors';
import { gateConditions, gateIsOpen } from './gates.js';
import type { JobFacts } from './job-facts.js';

export type DeliveryProblem = { readonly code: 'already' } | { readonly code: 'not-ready' } | { readonly code: 'gate-shut'; readonly conditions: readonly GateCondition[] };

/**
 * When a machine may go out: it is ready and everything but the signature itself is there, or it goes back unrepaired.
 * The signature comes last: once the machine is on the lorry, nobody can hold it for the money.
 */
export function deliveryProblem(facts: JobFacts): DeliveryProblem | null {
  if (facts.signOffs.some((s) => s.kind === 'delivery')) return { code: 'already' };
  if (facts.state === 'returned-unrepaired') return null;
  if (facts.state !== 'open' || facts.step !== 'ready') return { code: 'not-ready' };
  const conditions = gateConditions('released', facts).filter((c) => c.code !== 'DELIVERY_NOTE');
  return gateIsOpen(conditions) ? null : { code: 'gate-shut', conditions };
}
