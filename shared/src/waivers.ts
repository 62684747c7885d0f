import { z } from 'zod';
import { idField, lineField, requiredLine, textField, versionField } from './fields.js';
import { signaturePassword } from './session.js';

/** Why there is no core test before; a typed reason, never an invented reading. */
export const WAIVER_REASONS = ['came-in-stripped', 'earth-fault', 'supply-too-small', 'below-size-rule'] as const;

export const askWaiverSchema = z.strictObject({ reason: z.enum(WAIVER_REASONS), words: requiredLine(400, 'Say what the case is.') });
export type AskWaiver = z.infer<typeof askWaiverSchema>;

export const countersignSchema = z.strictObject({ password: signaturePassword, remark: lineField(400).default('') });
export type Countersign = z.infer<typeof countersignSchema>;

export const ANSWER_CHANNELS = ['phone', 'e-mail', 'in-person', 'portal'] as const;

/** The customer's answer to a decision (a core that does not conform, before strip or before rewind). */
export const recordDecisionSchema = z.strictObject({
  recordId: idField,
  about: z.enum(['core-test-before', 'core-test-after']),
  choice: z.enum(['go-on', 'repair-and-retest', 'accept-with-concession', 'replace', 'return-unrepaired']),
  answeredBy: requiredLine(80, 'Who answered?'),
  channel: z.enum(ANSWER_CHANNELS),
  words: textField(1000).default(''),
});
export type RecordDecision = z.infer<typeof recordDecisionSchema>;

/** A manager's concession: the core does not conform, and the customer's recorded answer accepts it. */
export const signConcessionSchema = z.strictObject({
  recordId: idField,
  decisionId: idField,
  reason: requiredLine(600, 'Say why this is accepted.'),
  password: signaturePassword,
});
export type SignConcession = z.infer<typeof signConcessionSchema>;

export const SIGN_OFF_KINDS = ['waiver', 'waiver-countersignature', 'decision', 'concession', 'tested', 'released-by-second', 'inconclusive-release', 'credit-lift', 'delivery'] as const;
export const signOffSchema = z.strictObject({
  id: idField,
  kind: z.enum(SIGN_OFF_KINDS),
  recordId: idField.nullable(),
  by: z.string(),
  byRoles: z.string(),
  at: z.string(),
  reason: z.string(),
  detail: z.record(z.string(), z.unknown()),
  contentHash: z.string(),
  version: versionField,
});
export type SignOff = z.infer<typeof signOffSchema>;

/** A manager lets an inconclusive core test pass, with a reason. */
export const releaseInconclusiveSchema = z.strictObject({ reason: requiredLine(600, 'Say why it may pass.'), password: signaturePassword });
export type ReleaseInconclusive = z.infer<typeof releaseInconclusiveSchema>;
/** A manager lifts the credit stop for this one delivery. */
export const liftCreditSchema = z.strictObject({ reason: requiredLine(600, 'Say why.'), password: signaturePassword });
export type LiftCredit = z.infer<typeof liftCreditSchema>;
/** The tester's and the second person's signature under a record, for the revision that was read. */
export const signRecordSchema = z.strictObject({ version: versionField, password: signaturePassword });
export type SignRecord = z.infer<typeof signRecordSchema>;
