import type { PaymentIntent, PaymentMethod } from '../objects/stored.js';

export interface ErrorBody {
  type: 'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error';
  message: string;
  code?: string;
  decline_code?: string;
  advice_code?: string;
  param?: string;
  charge?: string;
  payment_intent?: PaymentIntent;
  payment_method?: PaymentMethod;
  request_log_url?: string;
}

/** An answer that is an error. `kept` says whether an idempotency key remembers it: only when the work had begun. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
    readonly kept = true,
  ) {
    super(body.message);
  }
}

export const invalid = (message: string, more: Partial<ErrorBody> = {}): ApiError =>
  new ApiError(400, { type: 'invalid_request_error', message, ...more });

export const missing = (kind: string, id: string, param = 'id'): ApiError =>
  new ApiError(404, { type: 'invalid_request_error', code: 'resource_missing', message: `No such ${kind}: '${id}'`, param });

/** A reference in a parameter that leads nowhere: the address is right, the parameter is not. */
export const missingRef = (kind: string, id: string, param: string): ApiError =>
  invalid(`No such ${kind}: '${id}'`, { code: 'resource_missing', param });
