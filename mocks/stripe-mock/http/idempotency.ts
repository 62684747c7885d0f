import { createHash } from 'node:crypto';
import { ApiError } from './api-error.js';

const KEPT_FOR_MS = 24 * 3600 * 1000;
const PRUNE_EVERY_MS = 60_000;
const LONGEST_KEY = 255;

export interface SavedAnswer {
  print: string;
  atMs: number;
  requestId: string;
  status: number;
  body: string;
}

export const printOf = (method: string, path: string, body: string): string => createHash('sha256').update(`${method} ${path}\n${body}`).digest('hex');

/**
 * One answer for one key. The first request does the work; a repeat with the same parameters gets the same status and
 * body again, errors included; a repeat while the first is still at work is sent away.
 */
export class Idempotency {
  private readonly inFlight = new Map<string, string>();
  private prunedAtMs = 0;

  constructor(
    private readonly answers: Record<string, SavedAnswer>,
    private readonly nowMs: () => number,
  ) {}

  /** The saved answer, or undefined when the work is to be done now (and `finish` is to be called afterwards). */
  begin(key: string, print: string): SavedAnswer | undefined {
    if (key.length > LONGEST_KEY) throw this.refusal(400, `Idempotency keys may have at most ${LONGEST_KEY} characters.`);
    const saved = Object.hasOwn(this.answers, key) ? this.answers[key] : undefined;
    const fresh = saved && saved.atMs + KEPT_FOR_MS > this.nowMs() ? saved : undefined;
    const known = fresh?.print ?? this.inFlight.get(key);
    if (known !== undefined && known !== print) {
      throw this.refusal(400, `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`);
    }
    if (fresh) return fresh;
    if (this.inFlight.has(key)) {
      throw new ApiError(
        409,
        {
          type: 'invalid_request_error',
          code: 'idempotency_key_in_use',
          message: `There is currently another in-progress request using this Idempotent Key (that probably means you submitted twice, and the other request is still going through): ${key}. Please try again later.`,
        },
        false,
      );
    }
    this.inFlight.set(key, print);
    return undefined;
  }

  /** The work is over; without an answer (it had not begun, or was refused for its form) the key is free again. */
  finish(key: string, answer?: { requestId: string; status: number; body: string }): void {
    const print = this.inFlight.get(key);
    this.inFlight.delete(key);
    if (answer && print !== undefined) this.answers[key] = { print, atMs: this.nowMs(), ...answer };
    this.prune();
  }

  private prune(): void {
    if (this.prunedAtMs + PRUNE_EVERY_MS > this.nowMs()) return;
    this.prunedAtMs = this.nowMs();
    for (const [old, saved] of Object.entries(this.answers)) if (saved.atMs + KEPT_FOR_MS <= this.nowMs()) delete this.answers[old];
  }

  private refusal(status: number, message: string): ApiError {
    return new ApiError(status, { type: 'idempotency_error', message }, false);
  }
}
