import type { GateCondition } from '@shared/errors';
import { GATE_BEFORE, GATES, type Gate, type Route, type Step } from '@shared/route';
import { condition } from './condition.js';
import { coreAfterConditions, coreBeforeConditions, coreTestMade } from './core-conditions.js';
import { lastOf, recordsOf, signedFor, type JobFacts } from './job-facts.js';

/** The gates of a job: a list of conditions, each met or not, in words that say what is missing and where it is put right. */
export function gateConditions(gate: Gate, facts: JobFacts): GateCondition[] {
  switch (gate) {
    case 'strip-may-start':
      return [quoteApproved(facts), windingCopied(facts), ...coreBeforeConditions(facts)];
    case 'burnout-may-start':
      return burnoutConditions(facts);
    case 'rewind-may-start':
      return [stripWithinLimit(facts), ...coreAfterConditions(facts)];
    case 'treatment-may-start':
      return [beforeVarnish(facts)];
    case 'ready':
      return readyConditions(facts);
    case 'released':
      return releasedConditions(facts);
  }
}

export const gateIsOpen = (conditions: readonly GateCondition[]): boolean => conditions.every((c) => c.met);

/** Which gates a route has: only a rewind goes through the oven, and only what can be recorded on the route is asked for. */
export const gatesOf = (route: Route): readonly Gate[] => (route === 'rewind' ? GATES : ['ready', 'released']);

/** The step a gate stands in front of; the burnout gate stands inside its step. */
export const stepBehind = (gate: Gate): Step | null => (Object.entries(GATE_BEFORE).find(([, g]) => g === gate)?.[0] as Step | undefined) ?? null;

/** What stands between a job and a step: the work of the step it is at, and the gate where there is one. */
export function conditionsBefore(step: Step, facts: JobFacts): GateCondition[] {
  const gate = GATE_BEFORE[step];
  const all = [...ownWork(facts), ...(gate && gatesOf(facts.route).includes(gate) ? gateConditions(gate, facts) : [])];
  return all.filter((c, at) => all.findIndex((other) => other.code === c.code) === at);
}

/** What the open step is there for. */
function ownWork(facts: JobFacts): GateCondition[] {
  const made = (kind: Parameters<typeof lastOf>[1], code: string, met: string, missing: string) => {
    const record = lastOf(facts, kind);
    return [condition(code, record !== undefined, record ? met : missing, kind)];
  };
  switch (facts.step) {
    case 'incoming-test':
      return made('incoming-test', 'INCOMING_TEST', 'Incoming test recorded.', 'Record the incoming test.');
    case 'dismantled':
      return made('dismantling', 'DISMANTLING', 'Dismantling recorded.', 'Record the dismantling: rotor out, core plate, frame.');
    case 'core-test-before':
      return [coreTestMade(facts)];
    case 'awaiting-approval':
      return [quoteApproved(facts)];
    case 'strip-and-burnout':
      return made('strip', 'STRIPPED', 'Strip recorded.', 'Record how the winding came out.');
    case 'rewind':
      return facts.route === 'rewind' ? made('winding-as-wound', 'AS_WOUND', 'Winding as wound recorded.', 'Record the winding as wound.') : [];
    case 'treatment':
      return made('treatment', 'TREATMENT', 'Treatment recorded.', 'Record the treatment: material, batch, bake.');
    case 'assembly':
      return made('assembly', 'ASSEMBLY', 'Assembly recorded.', 'Record the assembly.');
    default:
      return [];
  }
}

function quoteApproved(facts: JobFacts): GateCondition {
  const is = (state: string) => facts.quotes.some((q) => q.state === state);
  const words = is('approved')
    ? 'Quote approved.'
    : is('sent')
      ? 'The quote waits for the customer’s approval.'
      : is('declined')
        ? 'The customer declined the quote: revise it, or end the job.'
        : 'Make a quote and send it.';
  return condition('QUOTE_APPROVED', is('approved'), words, 'quote');
}

function windingCopied(facts: JobFacts): GateCondition {
  const found = lastOf(facts, 'winding-as-found');
  return condition('WINDING_AS_FOUND', found !== undefined, found ? 'Winding as found recorded.' : 'Record the winding as found: connection, span, grouping, extensions, leads.', 'winding-as-found');
}

/** What is looked at before anything goes into an oven; the strip record itself is refused without it. */
function burnoutConditions(facts: JobFacts): GateCondition[] {
  const strip = lastOf(facts, 'strip');
  const dismantling = lastOf(facts, 'dismantling');
  if (strip && strip.readings['method'] !== 'oven-burnout') return [condition('NO_OVEN', true, 'Stripped without an oven.', 'strip')];
  const ringsOn = strip ? strip.readings['commutatorOrSlipRingsOn'] === true : dismantling?.readings['commutatorOrSlipRings'] === true;
  const counted = typeof strip?.readings['wiresCountedAtCut'] === 'number';
  const kept = strip?.readings['sampleCoilKept'] === true;
  return [
    condition('LIMIT_KNOWN', dismantling !== undefined, dismantling ? 'Core plate and frame are known, so the limit is.' : 'Record the dismantling: core plate and frame set the limit.', 'dismantling'),
    condition('RINGS_OFF', !ringsOn, ringsOn ? 'Take the commutator or slip rings off: nothing goes into an oven with them on.' : 'No commutator or slip rings on.', 'strip'),
    condition('WIRES_COUNTED', counted, counted ? 'Wires counted at the cut.' : 'Count the wires at the cut before burnout; afterwards they are gone.', 'strip'),
    condition('SAMPLE_KEPT', kept, kept ? 'Sample coil kept.' : 'Keep a sample coil before burnout.', 'strip'),
  ];
}

function stripWithinLimit(facts: JobFacts): GateCondition {
  const strip = lastOf(facts, 'strip');
  if (!strip) return condition('STRIP', false, 'Record how the winding came out.', 'strip');
  const within = strip.verdict === 'conforms';
  const explained = typeof strip.readings['explanation'] === 'string' && strip.readings['explanation'].trim().length > 0;
  const what = strip.verdict === 'does-not-conform' ? 'over its limit' : 'without a part temperature';
  const words = within ? 'Strip within its limit.' : explained ? `Strip ${what}, explained: the core test decides.` : `The strip was ${what}: explain it in the record.`;
  return condition('STRIP', within || explained, words, 'strip');
}

function beforeVarnish(facts: JobFacts): GateCondition {
  const test = lastOf(facts, 'before-varnish-test');
  const met = test?.verdict === 'conforms';
  const words = !test ? 'Make the test before varnish.' : met ? 'Test before varnish conforms.' : 'The test before varnish does not conform: after varnish a wrong connection scraps the winding.';
  return condition('BEFORE_VARNISH', met, words, 'before-varnish-test');
}

/** A core record may have been corrected since the rewind gate was passed: the core is looked at once more. */
function readyConditions(facts: JobFacts): GateCondition[] {
  if (facts.route === 'core-test-only') return [coreTestMade(facts)];
  return [...(facts.route === 'rewind' ? coreAfterConditions(facts) : []), ...finalTestConditions(facts)];
}

function finalTestConditions(facts: JobFacts): GateCondition[] {
  const place = 'final-test';
  const test = lastOf(facts, 'final-test');
  if (!test) return [condition('FINAL_TEST', false, 'Make the final test.', place)];
  const conforms = test.verdict === 'conforms';
  const tested = signedFor(facts, 'tested', test);
  const released = signedFor(facts, 'released-by-second', test);
  const second = tested !== undefined && released !== undefined && (facts.onePersonMayRelease || released.byUserId !== tested.byUserId);
  const overdue = [...new Set(recordsOf(facts, 'final-test').slice(-1).flatMap((r) => r.overdueInstruments))];
  return [
    condition('FINAL_TEST', conforms, conforms ? 'Final test conforms.' : 'The final test does not conform, or a part of it is missing.', place),
    condition('INSTRUMENTS', overdue.length === 0, overdue.length === 0 ? 'Instruments in calibration on the day.' : `Out of calibration on the day: ${overdue.join(', ')}.`, place),
    condition('TESTED', tested !== undefined, tested ? `Signed by ${tested.byName}.` : 'The technician signs the final test.', place),
    condition('SECOND_PERSON', second, second ? `Released by ${released.byName}.` : 'A second person releases the final test.', place),
  ];
}

function releasedConditions(facts: JobFacts): GateCondition[] {
  const delivered = facts.signOffs.some((s) => s.kind === 'delivery');
  const conditions = [
    condition('CERTIFICATE', facts.certificateInForce, facts.certificateInForce ? 'Certificate issued.' : 'Issue the certificate.', 'certificate'),
    condition('DELIVERY_NOTE', delivered, delivered ? 'Delivery note signed.' : 'Have the delivery note signed.', 'delivery'),
  ];
  if (facts.customer.terms === 'prepayment') {
    const paid = facts.invoices.length > 0 && facts.invoices.every((i) => i.balanceMinor <= 0);
    const words = paid ? 'Paid.' : facts.invoices.length === 0 ? 'This customer pays before collection: issue the invoice.' : 'This customer pays before collection: the invoice is open.';
    conditions.push(condition('PAID', paid, words, 'money'));
  }
  if (facts.customer.creditStop) {
    const lifted = facts.signOffs.some((s) => s.kind === 'credit-lift');
    conditions.push(condition('CREDIT_STOP', lifted, lifted ? 'Credit stop lifted for this delivery.' : 'The customer is on credit stop: a manager decides.', 'money'));
  }
  return conditions;
}
