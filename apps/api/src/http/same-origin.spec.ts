import { describe, expect, it } from 'vitest';
import { assertSameOrigin } from './same-origin.js';

const ask = (more: Partial<{ method: string; path: string; origin: string | undefined; host: string | undefined }>) => () =>
  assertSameOrigin({ method: 'POST', path: '/api/jobs', origin: 'https://shop.example', host: 'shop.example', ...more }, 'https://shop.example', '/api/payments/events');

describe('a request that changes something', () => {
  it('is taken from our own page, at the public address or the one the tablet was pointed at', () => {
    expect(ask({})).not.toThrow();
    expect(ask({ origin: 'http://192.168.1.20:3000', host: '192.168.1.20:3000' })).not.toThrow();
  });
  it.each([
    ['another site', { origin: 'https://evil.example' }],
    ['another port of the same machine', { origin: 'http://localhost:4000', host: 'localhost:3000' }],
    ['a page without origin', { origin: 'null' }],
    ['nobody says where it comes from', { origin: undefined }],
    ['nonsense', { origin: '::::' }],
  ])('is refused when it comes from %s', (_, more) => {
    expect(ask(more)).toThrow('did not come from this shop');
  });
  it('reading needs no origin, and the payment service’s events carry a signature instead', () => {
    expect(ask({ method: 'GET', origin: undefined })).not.toThrow();
    expect(ask({ path: '/api/payments/events', origin: undefined })).not.toThrow();
  });
});
