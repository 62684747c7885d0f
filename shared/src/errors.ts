import { z } from 'zod';

/** Every refusal the API can give. The status of each stands in apps/api/src/http/error-status.ts, the words at the throw. */
export const ERROR_CODES = [
  'INPUT_NOT_VALID',
  'READINGS_NOT_VALID',
  'NOT_FOUND',
  'NOT_SIGNED_IN',
  'WRONG_NAME_OR_PASSWORD',
  'WRONG_SIGNATURE',
  'TOO_MANY_TRIES',
  'FORBIDDEN',
  'CROSS_SITE_REQUEST',
  'CHANGED_MEANWHILE',
  'GATE_SHUT',
  'MOVE_NOT_ALLOWED',
  'STEP_NOT_OPEN',
  'STATE_NOT_RIGHT',
  'SAME_PERSON',
  'ALREADY_DONE',
  'AMOUNT_NOT_RIGHT',
  'IDEMPOTENCY_KEY_REUSED',
  'STILL_RUNNING',
  'FILE_NOT_ACCEPTED',
  'FILE_TOO_LARGE',
  'NOT_MULTIPART',
  'PAYMENT_SERVICE_UNREACHABLE',
  'SIGNATURE_NOT_VALID',
  'TAKEN',
  'INTERNAL',
] as const;
export type ErrorCode = (typeof ERROR_CODES)[number];

/** One thing that is wrong, at the field it is wrong in. */
export const fieldProblemSchema = z.strictObject({ path: z.string(), code: z.string(), message: z.string() });
export type FieldProblem = z.infer<typeof fieldProblemSchema>;

/** One condition of a gate: met or not, in words, with the place where it is put right. */
export const gateConditionSchema = z.strictObject({
  code: z.string(),
  met: z.boolean(),
  words: z.string(),
  /** a place on the job sheet: 'core-test-before', 'quote', 'winding-as-found', ... */
  place: z.string().nullable(),
});
export type GateCondition = z.infer<typeof gateConditionSchema>;

/** The body of every answer that is not a success. */
export const errorBodySchema = z.strictObject({
  statusCode: z.number().int(),
  code: z.enum(ERROR_CODES),
  message: z.string(),
  requestId: z.string(),
  fields: z.array(fieldProblemSchema).optional(),
  /** what stands on the server now, when somebody else changed it meanwhile */
  current: z.unknown().optional(),
  conditions: z.array(gateConditionSchema).optional(),
});
export type ErrorBody = z.infer<typeof errorBodySchema>;
