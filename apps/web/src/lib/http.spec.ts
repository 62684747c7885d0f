import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { ApiError, http, newKey, onReach, onSessionEnded } from './http.js';

const thing = z.strictObject({ id: z.string() });
const answer = (status: number, body?: unknown) => new Response(body === undefined ? null : typeof body === 'string' ? body : JSON.stringify(body), { status });
const refusal = (statusCode: number, code: string, more: object = {}) => answer(statusCode, { statusCode, code, message: 'Words.', requestId: 'r-1', ...more });
const fetched = vi.fn<typeof fetch>();

beforeEach(() => {
  fetched.mockReset();
  vi.stubGlobal('fetch', fetched);
  vi.spyOn(console, 'error').mockImplementation(() => undefined);
});
afterEach(() => vi.restoreAllMocks());

const failure = async (promise: Promise<unknown>): Promise<ApiError> => {
  const error = await promise.then(
    () => undefined,
    (e: unknown) => e,
  );
  expect(error).toBeInstanceOf(ApiError);
  return error as ApiError;
};

describe('the http client', () => {
  it('sends JSON to our own server with the key of the form', async () => {
    fetched.mockResolvedValue(answer(201, { id: 'a' }));
    await expect(http.post('/things', { name: 'pump' }, thing, { idempotencyKey: 'key-of-the-form' })).resolves.toEqual({ id: 'a' });
    const [path, init] = fetched.mock.calls[0]!;
    expect(path).toBe('/api/things');
    expect(init).toMatchObject({ method: 'POST', credentials: 'same-origin', body: '{"name":"pump"}', headers: { 'content-type': 'application/json', 'idempotency-key': 'key-of-the-form' } });
  });

  it('refuses an answer that breaks its contract', async () => {
    fetched.mockResolvedValue(answer(200, { id: 7 }));
    expect((await failure(http.get('/things/a', thing))).code).toBe('NOT_UNDERSTOOD');
    fetched.mockResolvedValue(answer(200, '<!doctype html>'));
    expect((await failure(http.get('/things/a', thing))).code).toBe('NOT_UNDERSTOOD');
  });

  it('keeps what the server said: code, words, fields, request number, what stands there now', async () => {
    fetched.mockResolvedValue(refusal(409, 'CHANGED_MEANWHILE', { current: { name: 'theirs' }, fields: [{ path: 'name', code: 'changed', message: 'Changed.' }] }));
    const error = await failure(http.put('/things/a', {}, thing));
    expect(error).toMatchObject({ status: 409, code: 'CHANGED_MEANWHILE', message: 'Words.', requestId: 'r-1', current: { name: 'theirs' }, fields: [{ path: 'name', code: 'changed', message: 'Changed.' }] });
  });

  it('says that the shop’s computer does not answer, and that what was typed is kept', async () => {
    fetched.mockRejectedValue(new TypeError('Failed to fetch'));
    const reached: boolean[] = [];
    const stop = onReach((r) => reached.push(r));
    const error = await failure(http.get('/things/a', thing));
    expect(error).toMatchObject({ status: 0, code: 'UNREACHABLE' });
    expect(error.message).toContain('What you typed is kept');
    fetched.mockResolvedValue(answer(200, { id: 'a' }));
    await http.get('/things/a', thing);
    expect(reached).toEqual([false, true]);
    stop();
  });

  it('takes a proxy that has lost its server for a server that does not answer', async () => {
    fetched.mockResolvedValue(answer(502, '<h1>Bad gateway</h1>'));
    expect((await failure(http.get('/things/a', thing))).code).toBe('UNREACHABLE');
  });

  it('lets a call that was given up be given up', async () => {
    fetched.mockRejectedValue(new DOMException('gone', 'AbortError'));
    await expect(http.get('/things/a', thing)).rejects.toBeInstanceOf(DOMException);
  });

  it('asks to sign in once for all calls that were refused, then makes them again', async () => {
    let signedIn = false;
    fetched.mockImplementation(() => Promise.resolve(signedIn ? answer(200, { id: 'a' }) : refusal(401, 'NOT_SIGNED_IN')));
    const asked = vi.fn(() => {
      signedIn = true;
      return Promise.resolve(true);
    });
    const stop = onSessionEnded(asked);
    await expect(Promise.all([http.get('/things/a', thing), http.post('/things', { name: 'kept' }, thing)])).resolves.toEqual([{ id: 'a' }, { id: 'a' }]);
    expect(asked).toHaveBeenCalledTimes(1);
    expect(fetched.mock.calls.filter(([, init]) => init?.body === '{"name":"kept"}')).toHaveLength(2);
    stop();
  });

  it('does not ask to sign in when the sign-in itself is refused, or nobody listens', async () => {
    fetched.mockImplementation(() => Promise.resolve(refusal(401, 'NOT_SIGNED_IN')));
    expect((await failure(http.get('/things/a', thing))).code).toBe('NOT_SIGNED_IN');
    const asked = vi.fn(() => Promise.resolve(true));
    const stop = onSessionEnded(asked);
    expect((await failure(http.get('/session', thing))).code).toBe('NOT_SIGNED_IN');
    expect(asked).not.toHaveBeenCalled();
    stop();
  });

  it('makes keys the server takes, and never the same twice', () => {
    const keys = new Set(Array.from({ length: 100 }, newKey));
    expect(keys.size).toBe(100);
    for (const key of keys) expect(key).toMatch(/^[\w-]{8,100}$/);
  });
});
