import { errorBodySchema, type ErrorBody, type FieldProblem, type GateCondition } from '@shared/errors';
import type { z } from 'zod';

/** What went wrong, as the server said it, or that it could not be reached. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly code: ErrorBody['code'] | 'UNREACHABLE',
    message: string,
    readonly requestId: string,
    readonly fields: readonly FieldProblem[] = [],
    readonly current: unknown = undefined,
    readonly conditions: readonly GateCondition[] = [],
  ) {
    super(message);
  }
}

/** Told to whoever listens when the session is over in the middle of something; the form stays as it is. */
const sessionEnded = new EventTarget();
export function onSessionEnded(listener: () => void): () => void {
  sessionEnded.addEventListener('ended', listener);
  return () => sessionEnded.removeEventListener('ended', listener);
}

interface CallOptions {
  /** the same key for the same thing: a double tap or a retry makes it once */
  readonly idempotencyKey?: string;
  readonly signal?: AbortSignal;
}

async function call(method: string, path: string, body: unknown, options: CallOptions): Promise<unknown> {
  const form = body instanceof FormData;
  const headers: Record<string, string> = { accept: 'application/json' };
  if (body !== undefined && !form) headers['content-type'] = 'application/json';
  if (options.idempotencyKey) headers['idempotency-key'] = options.idempotencyKey;
  const response = await fetch(`/api${path}`, {
    method,
    headers,
    credentials: 'same-origin',
    ...(body === undefined ? {} : { body: form ? body : JSON.stringify(body) }),
    ...(options.signal ? { signal: options.signal } : {}),
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiError(0, 'UNREACHABLE', 'The shop’s computer does not answer. What you typed is kept; try again in a moment.', '');
  });
  const text = await response.text();
  if (response.ok) return text === '' ? undefined : JSON.parse(text);
  const error = toError(response.status, text);
  if (error.code === 'NOT_SIGNED_IN' && path !== '/session') sessionEnded.dispatchEvent(new Event('ended'));
  throw error;
}

function toError(status: number, text: string): ApiError {
  try {
    const body = errorBodySchema.parse(JSON.parse(text));
    return new ApiError(status, body.code, body.message, body.requestId, body.fields ?? [], body.current, body.conditions ?? []);
  } catch {
    return new ApiError(status, status === 413 ? 'FILE_TOO_LARGE' : 'INTERNAL', status === 413 ? 'That file is too large to be taken.' : 'Something failed on the way. Nothing was half done; try again.', '');
  }
}

/** Answers are parsed by the contract they were promised with. */
export const http = {
  async get<S extends z.ZodType>(path: string, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return schema.parse(await call('GET', path, undefined, options));
  },
  async post<S extends z.ZodType>(path: string, body: unknown, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return schema.parse(await call('POST', path, body ?? {}, options));
  },
  async put<S extends z.ZodType>(path: string, body: unknown, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return schema.parse(await call('PUT', path, body, options));
  },
  async send(method: 'POST' | 'PUT' | 'DELETE', path: string, body?: unknown, options: CallOptions = {}): Promise<void> {
    await call(method, path, body, options);
  },
  async upload<S extends z.ZodType>(path: string, file: File, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    const form = new FormData();
    form.append('file', file, file.name);
    return schema.parse(await call('POST', path, form, options));
  },
};

/** A key for one filled form: made once, sent with each try of it. */
export const newKey = (): string => (crypto.randomUUID ? crypto.randomUUID() : `${Date.now().toString(36)}-${Math.random().toString(36).slice(2)}-key`);
