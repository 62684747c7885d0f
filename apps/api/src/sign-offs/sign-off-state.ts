import type { ErrorCode } from '@shared/errors';
import { coreAfter, coreBefore, decisionAnswers, decisionOn, validBefore, waiverAsked } from '../jobs/core-standing.js';
import { lastOf, signedFor, type JobFacts, type RecordFact } from '../jobs/job-facts.js';

export interface SignProblem {
  readonly code: ErrorCode;
  readonly words: string;
}
const problem = (code: ErrorCode, words: string): SignProblem => ({ code, words });

export function waiverProblem(facts: JobFacts): SignProblem | null {
  if (validBefore(facts)) return problem('STATE_NOT_RIGHT', 'There is a valid core test before; nothing is waived.');
  if (waiverAsked(facts)) return problem('ALREADY_DONE', 'The waiver is asked for already; it waits for a manager’s countersignature.');
  return null;
}

/** The one who asks does not countersign, unless the shop has said that one person may. */
export function countersignProblem(facts: JobFacts, waiverId: string, userId: string): SignProblem | null {
  const waiver = facts.signOffs.find((s) => s.id === waiverId);
  if (facts.signOffs.some((s) => s.kind === 'waiver-countersignature' && s.refersTo === waiverId)) return problem('ALREADY_DONE', 'This waiver is countersigned already.');
  if (waiver?.byUserId === userId && !facts.onePersonMayRelease) return problem('SAME_PERSON', 'Who asked for the waiver does not countersign it.');
  return null;
}

/** An answer is only recorded where there is a question: a core that does not conform. */
export function decisionProblem(facts: JobFacts, record: RecordFact, about: 'core-test-before' | 'core-test-after'): SignProblem | null {
  const core = about === 'core-test-before' ? coreBefore(facts) : coreAfter(facts);
  if (core.kind === 'missing' || core.record.id !== record.id) return problem('STATE_NOT_RIGHT', 'This is not the core test that counts any more; record the answer on the newest one.');
  if (core.kind !== 'does-not-conform') return problem('STATE_NOT_RIGHT', 'There is nothing to decide: only a core that does not conform asks for the customer’s decision.');
  return null;
}

export function concessionProblem(facts: JobFacts, record: RecordFact, decisionId: string): SignProblem | null {
  const core = coreAfter(facts);
  if (core.kind === 'missing' || core.record.id !== record.id) return problem('STATE_NOT_RIGHT', 'A newer core test counts now.');
  if (core.kind !== 'does-not-conform') return problem('STATE_NOT_RIGHT', 'A concession is for a core that does not conform.');
  if (core.concession) return problem('ALREADY_DONE', 'The concession is signed already.');
  const decision = decisionOn(facts, 'core-test-after');
  if (!decisionAnswers(decision, record) || decision?.id !== decisionId) return problem('STATE_NOT_RIGHT', 'Record the customer’s answer on this core test first.');
  if (decision.detail['choice'] !== 'accept-with-concession') return problem('STATE_NOT_RIGHT', 'The customer did not accept the core as it is.');
  return null;
}

export function inconclusiveProblem(facts: JobFacts, record: RecordFact): SignProblem | null {
  const core = record.kind === 'core-test-before' ? coreBefore(facts) : coreAfter(facts);
  if (core.kind !== 'inconclusive' || core.record.id !== record.id) return problem('STATE_NOT_RIGHT', 'Only the core test that counts, and only an inconclusive one, is released this way.');
  if (core.releasedBy) return problem('ALREADY_DONE', 'It is released already.');
  if (facts.limits.core.decisionRule === 'refuse') return problem('STATE_NOT_RIGHT', 'The shop’s decision rule does not let an inconclusive test pass: repeat it.');
  return null;
}

export function testedProblem(facts: JobFacts, record: RecordFact): SignProblem | null {
  if (record.kind !== 'final-test' || lastOf(facts, 'final-test')?.id !== record.id) return problem('STATE_NOT_RIGHT', 'Only the newest final test is signed.');
  return signedFor(facts, 'tested', record) ? problem('ALREADY_DONE', 'This final test is signed already.') : null;
}

export function secondPersonProblem(facts: JobFacts, record: RecordFact, userId: string): SignProblem | null {
  if (record.kind !== 'final-test' || lastOf(facts, 'final-test')?.id !== record.id) return problem('STATE_NOT_RIGHT', 'Only the newest final test is released.');
  const tested = signedFor(facts, 'tested', record);
  if (!tested) return problem('STATE_NOT_RIGHT', 'The technician signs first.');
  if (signedFor(facts, 'released-by-second', record)) return problem('ALREADY_DONE', 'This final test is released already.');
  if (record.verdict !== 'conforms') return problem('STATE_NOT_RIGHT', 'Only a final test that conforms is released.');
  return tested.byUserId === userId && !facts.onePersonMayRelease ? problem('SAME_PERSON', 'Who signed the test does not release it: a second person does.') : null;
}
