import type { GateCondition } from '@shared/errors';
import { condition } from './condition.js';
import { coreAfter, coreBefore, decisionAnswers, decisionOn, waiverAsked, waiverInForce, type CoreStanding } from './core-standing.js';
import type { JobFacts, RecordFact } from './job-facts.js';

const BEFORE = 'core-test-before';
const AFTER = 'core-test-after';
type Inconclusive = Extract<CoreStanding, { kind: 'inconclusive' }>;

/** The core test before is made, whatever it says; or it is waived, where something else than the test is the job. */
export function coreTestMade(facts: JobFacts): GateCondition {
  const made = (met: boolean, words: string) => condition('CORE_BEFORE', met, words, BEFORE);
  const isTheJob = facts.route === 'core-test-only';
  if (!isTheJob && waiverInForce(facts)) return made(true, 'Core test before waived and countersigned: the increase will not be established.');
  const core = coreBefore(facts);
  if (core.kind === 'not-valid') return made(false, `The core test${isTheJob ? '' : ' before'} is not valid; repeat it.`);
  if (core.kind !== 'missing') return made(true, isTheJob ? 'Core test made.' : 'Core test before made.');
  if (core.repairedSince) return made(false, 'The core was repaired since its test: test it again.');
  if (isTheJob) return made(false, 'Make the core test.');
  return made(false, waiverAsked(facts) ? 'The waiver of the core test before waits for a manager’s countersignature.' : 'Make the core test before, or ask for its waiver.');
}

/** Before the strip: the test is made, and a core that is damaged already has been talked about. */
export function coreBeforeConditions(facts: JobFacts): GateCondition[] {
  const made = coreTestMade(facts);
  const core = coreBefore(facts);
  if (!made.met || waiverInForce(facts)) return [made];
  if (core.kind === 'inconclusive') return [made, inconclusive(facts, core, { code: 'CORE_BEFORE_RELEASE', test: 'Core test before', place: BEFORE })];
  if (core.kind === 'does-not-conform') return [made, customerGoesOn(facts, core.record)];
  return [made];
}

function customerGoesOn(facts: JobFacts, record: RecordFact): GateCondition {
  const said = (met: boolean, words: string) => condition('CORE_BEFORE_DECISION', met, words, BEFORE);
  const decision = decisionOn(facts, BEFORE);
  if (!decisionAnswers(decision, record)) return said(false, 'The core does not conform before the repair: record the customer’s decision.');
  switch (decision?.detail['choice']) {
    case 'return-unrepaired':
      return said(false, 'The customer wants it back unrepaired: end the job.');
    case 'replace':
      return said(false, 'The customer wants it replaced: end the job.');
    case 'repair-and-retest':
      return said(true, 'The core was damaged before; the customer wants it repaired and tested again once the winding is out.');
    default:
      return said(true, 'The core was damaged before; the customer decided to go on.');
  }
}

/** Before the new winding goes in, and once more before the machine is ready. */
export function coreAfterConditions(facts: JobFacts): GateCondition[] {
  const stands = (met: boolean, words: string) => condition('CORE_AFTER', met, words, AFTER);
  const core = coreAfter(facts);
  switch (core.kind) {
    case 'missing':
      return [stands(false, core.repairedSince ? 'The core was repaired since its test: test it again.' : 'Make the core test after.')];
    case 'not-valid':
      return [stands(false, core.beforeCorrected ? 'The core test before was corrected since: correct the core test after too, so that it is judged anew.' : 'The core test after is not valid; repeat it. Its reasons stand in the record.')];
    case 'conforms':
      return [stands(true, 'Core test after conforms.')];
    case 'inconclusive':
      return [inconclusive(facts, core, { code: 'CORE_AFTER', test: 'Core test after', place: AFTER })];
    case 'does-not-conform':
      return [
        stands(core.concession !== undefined, core.concession ? 'The core does not conform; a manager signed a concession.' : 'The core does not conform: repair and retest it, or a manager signs a concession.'),
        customerAccepts(facts, core.record),
      ];
  }
}

function customerAccepts(facts: JobFacts, record: RecordFact): GateCondition {
  const decision = decisionOn(facts, AFTER);
  const answered = decisionAnswers(decision, record);
  const accepted = answered && decision?.detail['choice'] === 'accept-with-concession';
  const words = accepted ? 'The customer accepts the core as it is.' : answered ? 'The customer does not accept the core as it is: do as they answered, or record a new answer.' : 'Record the customer’s answer on the core that does not conform.';
  return condition('CUSTOMER_ANSWER', accepted, words, AFTER);
}

/** What the shop's decision rule lets an inconclusive test do: ask (repeat or release), accept, or refuse. */
function inconclusive(facts: JobFacts, core: Inconclusive, { code, test, place }: { code: string; test: string; place: string }): GateCondition {
  const is = (met: boolean, words: string) => condition(code, met, `${test} inconclusive: ${words}`, place);
  switch (facts.limits.core.decisionRule) {
    case 'accept':
      return is(true, 'accepted by the shop’s decision rule.');
    case 'refuse':
      return is(false, 'the shop’s decision rule asks for a repeat.');
    default:
      return core.releasedBy ? is(true, `released by ${core.releasedBy.byName}.`) : is(false, 'repeat it, or a manager releases it.');
  }
}
