import { errorBodySchema, type ErrorBody, type FieldProblem, type GateCondition } from '@shared/errors';
import type { z } from 'zod';

export type ApiErrorCode = ErrorBody['code'] | 'UNREACHABLE' | 'NOT_UNDERSTOOD';

/** What went wrong, as the server said it, or that it could not be reached (status 0). */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly code: ApiErrorCode,
    message: string,
    readonly requestId: string,
    readonly fields: readonly FieldProblem[] = [],
    readonly current: unknown = undefined,
    readonly conditions: readonly GateCondition[] = [],
  ) {
    super(message);
  }
}

/** Asks the person to sign in again over whatever is open; true when they did. */
type AskToSignIn = () => Promise<boolean>;
let askToSignIn: AskToSignIn | null = null;
let asking: Promise<boolean> | null = null;

/**
 * Who is asked when the session is over in the middle of something. Calls that were refused wait, and are made again
 * after the person signed in: a filled form stays as it is and is saved all the same.
 */
export function onSessionEnded(ask: AskToSignIn): () => void {
  askToSignIn = ask;
  return () => {
    if (askToSignIn === ask) askToSignIn = null;
  };
}

/** However many calls were refused at once, the person is asked once. */
function signedInAgain(): Promise<boolean> {
  if (!askToSignIn) return Promise.resolve(false);
  asking ??= askToSignIn().finally(() => {
    asking = null;
  });
  return asking;
}

const reach = new EventTarget();
/** Told after each call whether the server answered, for the banner that says so. */
export function onReach(listener: (reached: boolean) => void): () => void {
  const heard = (event: Event) => listener((event as CustomEvent<boolean>).detail);
  reach.addEventListener('reach', heard);
  return () => reach.removeEventListener('reach', heard);
}
const tell = (reached: boolean) => void reach.dispatchEvent(new CustomEvent('reach', { detail: reached }));

interface CallOptions {
  /** the same key for the same thing: a double tap or a retry makes it once */
  readonly idempotencyKey?: string;
  readonly signal?: AbortSignal;
}

const UNREACHABLE = 'The shop’s computer does not answer. What you typed is kept; try again in a moment.';

async function ask(method: string, path: string, body: unknown, options: CallOptions): Promise<unknown> {
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
    tell(false);
    throw new ApiError(0, 'UNREACHABLE', UNREACHABLE, '');
  });
  const text = await response.text();
  tell(true);
  if (!response.ok) throw toError(response.status, text);
  if (text === '') return undefined;
  const answer = readJson(text);
  if (answer === undefined) throw notUnderstood(response.status);
  return answer;
}

async function call(method: string, path: string, body: unknown, options: CallOptions): Promise<unknown> {
  try {
    return await ask(method, path, body, options);
  } catch (error) {
    const over = error instanceof ApiError && error.code === 'NOT_SIGNED_IN' && path !== '/session';
    if (!over || !(await signedInAgain())) throw error;
    return ask(method, path, body, options);
  }
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

const notUnderstood = (status: number) => new ApiError(status, 'NOT_UNDERSTOOD', 'The answer is not one this page understands. Reload the page: a newer one may be there.', '');

function toError(status: number, text: string): ApiError {
  const body = errorBodySchema.safeParse(readJson(text));
  if (body.success) {
    const { code, message, requestId, fields, current, conditions } = body.data;
    return new ApiError(status, code, message, requestId, fields ?? [], current, conditions ?? []);
  }
  // something in front of the server answers in its own way
  if (status === 413) return new ApiError(status, 'FILE_TOO_LARGE', 'That file is too large to be taken.', '');
  if (status >= 502 && status <= 504) return new ApiError(status, 'UNREACHABLE', UNREACHABLE, '');
  return new ApiError(status, 'INTERNAL', 'Something failed on the way. Nothing was half done; try again.', '');
}

/** An answer is parsed by the contract it was promised with; one that breaks it is an error, never half a screen. */
function parsed<S extends z.ZodType>(schema: S, answer: unknown): z.infer<S> {
  const result = schema.safeParse(answer);
  if (result.success) return result.data;
  console.error('An answer broke its contract.', result.error.issues);
  throw notUnderstood(200);
}

export const http = {
  async get<S extends z.ZodType>(path: string, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return parsed(schema, await call('GET', path, undefined, options));
  },
  async post<S extends z.ZodType>(path: string, body: unknown, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return parsed(schema, await call('POST', path, body ?? {}, options));
  },
  async put<S extends z.ZodType>(path: string, body: unknown, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    return parsed(schema, await call('PUT', path, body, options));
  },
  async send(method: 'POST' | 'PUT' | 'DELETE', path: string, body?: unknown, options: CallOptions = {}): Promise<void> {
    await call(method, path, body, options);
  },
  async upload<S extends z.ZodType>(path: string, file: File, schema: S, options: CallOptions = {}): Promise<z.infer<S>> {
    const form = new FormData();
    form.append('file', file, file.name);
    return parsed(schema, await call('POST', path, form, options));
  },
};

/** A key for one filled form: made once, sent with each try of it. On plain http in the shop there is no `randomUUID`. */
export const newKey = (): string => [...crypto.getRandomValues(new Uint8Array(16))].map((byte) => byte.toString(16).padStart(2, '0')).join('');
