import type { GateCondition } from '@shared/errors';
import { GATE_BEFORE, type Gate, type Step } from '@shared/route';
import { coreAfter, coreBefore, decisionAnswers, decisionOn, waiverAsked, waiverInForce } from './core-standing.js';
import { lastOf, recordsOf, signedFor, type JobFacts, type RecordFact } from './job-facts.js';

/** The gates of a job: a list of conditions, each met or not, in words that say what is missing and where it is put right. */
const condition = (code: string, met: boolean, words: string, place: string | null): GateCondition => ({ code, met, words, place });

export function gateConditions(gate: Gate, facts: JobFacts): GateCondition[] {
  switch (gate) {
    case 'strip-may-start':
      return [quoteApproved(facts), windingCopied(facts), ...coreBeforeConditions(facts)];
    case 'burnout-may-start':
      return burnoutConditions(facts);
    case 'rewind-may-start':
      return [...stripConditions(facts), ...coreAfterConditions(facts)];
    case 'treatment-may-start':
      return [beforeVarnish(facts)];
    case 'ready':
      return readyConditions(facts);
    case 'released':
      return releasedConditions(facts);
  }
}

export const gateIsOpen = (conditions: readonly GateCondition[]): boolean => conditions.every((c) => c.met);

/** What stands between a job and a step: the work of the step it is at, and the gate where there is one. */
export function conditionsBefore(step: Step, facts: JobFacts): GateCondition[] {
  const gate = GATE_BEFORE[step];
  return [...ownWork(facts), ...(gate ? gateConditions(gate, facts) : [])];
}

/** The record that the open step is there for. */
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
      return coreBeforeConditions(facts).slice(0, 1);
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
  const approved = facts.quotes.some((q) => q.state === 'approved');
  const sent = facts.quotes.some((q) => q.state === 'sent');
  const declined = facts.quotes.some((q) => q.state === 'declined');
  const words = approved ? 'Quote approved.' : sent ? 'The quote waits for the customer’s approval.' : declined ? 'The customer declined the quote: revise it, or end the job.' : 'Make a quote and send it.';
  return condition('QUOTE_APPROVED', approved, words, 'quote');
}

function windingCopied(facts: JobFacts): GateCondition {
  const found = lastOf(facts, 'winding-as-found');
  return condition('WINDING_AS_FOUND', found !== undefined, found ? 'Winding as found recorded.' : 'Record the winding as found: connection, span, grouping, extensions, leads.', 'winding-as-found');
}

function coreBeforeConditions(facts: JobFacts): GateCondition[] {
  const place = 'core-test-before';
  if (waiverInForce(facts)) return [condition('CORE_BEFORE', true, 'Core test before waived and countersigned: the increase will not be established.', place)];
  const core = coreBefore(facts);
  if (core.kind === 'missing') {
    const words = waiverAsked(facts) ? 'The waiver of the core test before waits for a manager’s countersignature.' : 'Make the core test before, or ask for its waiver.';
    return [condition('CORE_BEFORE', false, words, place)];
  }
  if (core.kind === 'not-valid') return [condition('CORE_BEFORE', false, 'The core test before is not valid; repeat it.', place)];
  const made = condition('CORE_BEFORE', true, 'Core test before made.', place);
  if (core.kind === 'conforms') return [made];
  const decision = decisionOn(facts, 'core-test-before');
  const decided = decisionAnswers(decision, core.record) && decision?.detail['choice'] !== 'return-unrepaired' && decision?.detail['choice'] !== 'replace';
  const words = decided ? 'The core was damaged before; the customer decided to go on.' : 'The core does not conform before the repair: record the customer’s decision.';
  return [made, condition('CORE_BEFORE_DECISION', decided, words, place)];
}

function burnoutConditions(facts: JobFacts): GateCondition[] {
  const strip = lastOf(facts, 'strip');
  const dismantling = lastOf(facts, 'dismantling');
  return [
    condition('LIMIT_KNOWN', dismantling !== undefined, dismantling ? 'Core plate and frame are known, so the limit is.' : 'Record the dismantling: core plate and frame set the limit.', 'dismantling'),
    condition('RINGS_OFF', strip ? strip.readings['commutatorOrSlipRingsOn'] !== true : dismantling?.readings['commutatorOrSlipRings'] !== true, 'Nothing with a commutator or slip rings on goes into an oven.', 'strip'),
  ];
}

function stripConditions(facts: JobFacts): GateCondition[] {
  const strip = lastOf(facts, 'strip');
  if (!strip) return [condition('STRIP', false, 'Record how the winding came out.', 'strip')];
  const within = strip.verdict === 'conforms';
  const explained = typeof strip.readings['explanation'] === 'string' && strip.readings['explanation'].length > 0;
  const words = within ? 'Strip within its limit.' : explained ? 'Strip over its limit, explained: the core test decides.' : 'The strip was over its limit or has no part temperature: explain it in the record.';
  return [condition('STRIP', within || explained, words, 'strip')];
}

function coreAfterConditions(facts: JobFacts): GateCondition[] {
  const place = 'core-test-after';
  const core = coreAfter(facts);
  switch (core.kind) {
    case 'missing':
      return [condition('CORE_AFTER', false, 'Make the core test after.', place)];
    case 'not-valid':
      return [condition('CORE_AFTER', false, 'The core test after is not valid; repeat it. Its reasons stand in the record.', place)];
    case 'conforms':
      return [condition('CORE_AFTER', true, 'Core test after conforms.', place)];
    case 'inconclusive':
      return [inconclusive(facts, core.releasedBy !== undefined, place)];
    case 'does-not-conform':
      return concessionConditions(facts, core.record, core.concession !== undefined);
  }
}

function inconclusive(facts: JobFacts, released: boolean, place: string): GateCondition {
  const rule = facts.limits.core.decisionRule;
  const met = rule === 'accept' || released;
  const words =
    rule === 'accept'
      ? 'Core test after inconclusive: accepted by the shop’s decision rule.'
      : released
        ? 'Core test after inconclusive: released by a manager.'
        : rule === 'refuse'
          ? 'Core test after inconclusive: the shop’s decision rule asks for a repeat.'
          : 'Core test after inconclusive: repeat it, or a manager releases it.';
  return condition('CORE_AFTER', met, words, place);
}

function concessionConditions(facts: JobFacts, record: RecordFact, conceded: boolean): GateCondition[] {
  const decision = decisionOn(facts, 'core-test-after');
  const answered = decisionAnswers(decision, record);
  return [
    condition('CORE_AFTER', conceded, conceded ? 'The core does not conform; a manager signed a concession.' : 'The core does not conform: repair and retest it, or a manager signs a concession.', 'core-test-after'),
    condition('CUSTOMER_ANSWER', answered, answered ? 'The customer’s answer is recorded.' : 'Record the customer’s answer on the core that does not conform.', 'core-test-after'),
  ];
}

function beforeVarnish(facts: JobFacts): GateCondition {
  const test = lastOf(facts, 'before-varnish-test');
  const met = test?.verdict === 'conforms';
  const words = !test ? 'Make the test before varnish.' : met ? 'Test before varnish conforms.' : 'The test before varnish does not conform: after varnish a wrong connection scraps the winding.';
  return condition('BEFORE_VARNISH', met, words, 'before-varnish-test');
}

function readyConditions(facts: JobFacts): GateCondition[] {
  if (facts.route === 'core-test-only') return coreBeforeConditions(facts).slice(0, 1);
  const test = lastOf(facts, 'final-test');
  if (!test) return [condition('FINAL_TEST', false, 'Make the final test.', 'final-test')];
  const conforms = test.verdict === 'conforms';
  const tested = signedFor(facts, 'tested', test);
  const released = facts.signOffs.find((s) => s.kind === 'released-by-second' && s.recordId === test.id && s.contentHash === test.contentHash);
  const second = released !== undefined && (facts.onePersonMayRelease || released.byUserId !== tested?.byUserId);
  const overdue = [...new Set(recordsOf(facts, 'final-test').slice(-1).flatMap((r) => r.overdueInstruments))];
  return [
    condition('FINAL_TEST', conforms, conforms ? 'Final test conforms.' : 'The final test does not conform, or a part of it is missing.', 'final-test'),
    condition('INSTRUMENTS', overdue.length === 0, overdue.length === 0 ? 'Instruments in calibration on the day.' : `Out of calibration on the day: ${overdue.join(', ')}.`, 'final-test'),
    condition('TESTED', tested !== undefined, tested ? `Signed by ${tested.byName}.` : 'The technician signs the final test.', 'final-test'),
    condition('SECOND_PERSON', second, second ? `Released by ${released.byName}.` : 'A second person releases the final test.', 'final-test'),
  ];
}

function releasedConditions(facts: JobFacts): GateCondition[] {
  const delivery = facts.signOffs.find((s) => s.kind === 'delivery');
  const conditions = [
    condition('CERTIFICATE', facts.certificateInForce, facts.certificateInForce ? 'Certificate issued.' : 'Issue the certificate.', 'certificate'),
    condition('DELIVERY_NOTE', delivery !== undefined, delivery ? 'Delivery note signed.' : 'Have the delivery note signed.', 'delivery'),
  ];
  if (facts.customer.terms === 'prepayment') {
    const paid = facts.invoices.length > 0 && facts.invoices.every((i) => i.balanceMinor <= 0);
    conditions.push(condition('PAID', paid, paid ? 'Paid.' : facts.invoices.length === 0 ? 'This customer pays before collection: issue the invoice.' : 'This customer pays before collection: the invoice is open.', 'money'));
  }
  if (facts.customer.creditStop) {
    const lifted = facts.signOffs.some((s) => s.kind === 'credit-lift');
    conditions.push(condition('CREDIT_STOP', lifted, lifted ? 'Credit stop lifted for this delivery.' : 'The customer is on credit stop: a manager decides.', 'money'));
  }
  return conditions;
}
