import type { UnitSystem } from '@libs/quantities';
import { permissionsOf, type Role } from '@shared/roles';
import type { Me } from '@shared/session';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { vi } from 'vitest';
import { UnitsProvider } from '../src/components/units.js';

/** Somebody of a shop, for tests of what a screen shows and asks. */
export const somebody = (roles: readonly Role[] = ['manager'], units: UnitSystem = 'si'): Me => ({
  id: 'u1234567',
  name: 'Rolf Steenbeck',
  email: 'manager@kupferring.example',
  roles: [...roles],
  permissions: permissionsOf(roles),
  customerId: null,
  preferences: { units, theme: 'light' },
  shop: { name: 'Kupferring Rewind Works', timeZone: 'Europe/Berlin', currency: 'EUR', demo: false, mailboxUrl: null },
});

interface Asked {
  readonly method: string;
  readonly path: string;
  readonly body: unknown;
  readonly idempotencyKey: string | null;
}
type Answer = readonly [status: number, body: unknown];

/** Answers the screen's calls by hand and keeps what was asked. Undefined stands for a server that cannot be reached. */
export function server(answer: (asked: Asked) => Answer | undefined | Promise<Answer>) {
  const asked: Asked[] = [];
  vi.stubGlobal('fetch', async (url: string, init: RequestInit = {}) => {
    const headers = new Headers(init.headers);
    const call: Asked = { method: init.method ?? 'GET', path: url.replace(/^\/api/, ''), body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : (init.body ?? null), idempotencyKey: headers.get('idempotency-key') };
    asked.push(call);
    const found = await answer(call);
    if (!found) throw new TypeError('Failed to fetch');
    return new Response(JSON.stringify(found[1]), { status: found[0] });
  });
  return asked;
}

export const refusal = (status: number, code: string, message: string, more: object = {}): Answer => [status, { statusCode: status, code, message, requestId: 'r-1', ...more }];

/** Draws a part of a screen for somebody, at an address. */
export function inShop(children: ReactNode, { me = somebody(), at = '/' }: { readonly me?: Me; readonly at?: string } = {}) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  client.setQueryData(['me'], me);
  const router = createMemoryRouter([{ path: '*', element: <UnitsProvider value={me.preferences.units}>{children}</UnitsProvider> }], { initialEntries: [at] });
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return { router, client };
}
