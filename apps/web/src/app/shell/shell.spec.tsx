import { ALL_PERMISSIONS, permissionsOf } from '@shared/roles';
import type { Me } from '@shared/session';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, Link, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { http } from '../../lib/http.js';
import { NotFoundPage } from '../routes/error-page.js';
import { isOpenTo, roomsOf } from './rooms.js';
import { setSingleKeys } from './single-keys.js';
import { Shell } from './shell.js';

const manager: Me = {
  id: 'u1234567',
  name: 'Mira Holt',
  email: 'mira@example.test',
  roles: ['manager'],
  permissions: ALL_PERMISSIONS.filter((p) => p !== 'portal.use'),
  customerId: null,
  preferences: { units: 'si', theme: 'dark' },
  shop: { name: 'A shop', timeZone: 'UTC', currency: 'EUR', demo: false, mailboxUrl: null },
};
const fetched = vi.fn<typeof fetch>();
const json = (body: unknown, status = 200) => new Response(JSON.stringify(body), { status });
const hit = (title: string) => ({ hits: [{ kind: 'job', id: 'job-0000', title, detail: 'Feed pump 2', path: `/jobs/${title}` }] });
const person = userEvent.setup();

function open(me: Me = manager) {
  const client = new QueryClient({ defaultOptions: { queries: { staleTime: Infinity, retry: false } } });
  client.setQueryData(['me'], me);
  const page = (words: string) => (
    <>
      <h1>{words}</h1>
      <Link to="/counter">On</Link>
    </>
  );
  const router = createMemoryRouter(
    [
      {
        path: '/',
        Component: Shell,
        children: [
          { path: 'floor', element: page('Floor page') },
          { path: 'counter', element: page('Counter page') },
          { path: 'jobs/:id', element: page('Job page') },
          { path: '*', Component: NotFoundPage },
        ],
      },
    ],
    { initialEntries: ['/floor'] },
  );
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return router;
}
/** Keys as a scanner sends them: all within a few milliseconds. */
function scanned(text: string) {
  act(() => {
    for (const key of [...text, 'Enter']) document.body.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
  });
}

beforeEach(() => {
  localStorage.clear();
  document.body.className = '';
  fetched.mockReset();
  fetched.mockImplementation(() => Promise.resolve(json({ hits: [] })));
  vi.stubGlobal('fetch', fetched);
  vi.stubGlobal('scrollTo', () => undefined);
});
afterEach(() => vi.unstubAllGlobals());

describe('the frame around every page', () => {
  it('shows each person the rooms they may enter', () => {
    const names = (roles: Me['roles']) => roomsOf({ ...manager, roles, permissions: permissionsOf(roles) }).map((room) => room.name);
    expect(names(['manager'])).toEqual(['Floor', 'Counter', 'Bay', 'Accounts', 'Insight', 'Shop']);
    expect(names(['technician'])).toEqual(['Floor', 'Bay', 'Insight', 'Shop']);
    expect(names(['customer'])).toEqual(['Overview', 'Your machines']);
  });

  it('keeps customers out of the shop’s pages, and says so instead of showing empty ones', async () => {
    const router = open({ ...manager, roles: ['customer'], permissions: permissionsOf(['customer']) });
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Your roles do not open this page');
    await act(() => router.navigate('/nowhere'));
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('There is nothing at this address');
    const staff = (path: string) => isOpenTo(manager, path);
    expect(['/floor', '/jobs/01a', '/', '/portal', '/portal/jobs/01a'].map(staff)).toEqual([true, true, true, false, false]);
  });

  it('takes the theme a person has chosen', () => {
    open();
    expect(document.body.classList.contains('bp6-dark')).toBe(true);
    expect(localStorage.getItem('loopbay.theme')).toBe('dark');
  });

  it('lets the keyboard skip to the content, and starts a new page at its content', async () => {
    open();
    await person.tab();
    expect(document.activeElement?.textContent).toBe('Skip to the content');
    await person.click(screen.getByRole('link', { name: 'On' }));
    await screen.findByText('Counter page');
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('main')));
  });

  it('says what to do at an address where there is nothing', async () => {
    const router = open();
    await act(() => router.navigate('/nowhere'));
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('There is nothing at this address');
    expect(screen.getByRole('link', { name: 'To the start' })).toBeDefined();
  });

  it('says that the shop’s computer does not answer, and stops saying so when it does', async () => {
    open();
    fetched.mockRejectedValue(new TypeError('Failed to fetch'));
    await act(() => http.get('/things', z.unknown()).catch(() => undefined));
    expect(screen.getByText(/does not answer/)).toBeDefined();
    fetched.mockImplementation(() => Promise.resolve(json({})));
    await act(() => http.get('/things', z.unknown()));
    expect(screen.queryByText(/does not answer/)).toBeNull();
  });

  it('takes a session up again over the page and then saves what was to be saved', async () => {
    open();
    let signedIn = false;
    fetched.mockImplementation((path, init) => {
      if (path === '/api/session' && init?.method === 'POST') {
        signedIn = true;
        return Promise.resolve(json(manager));
      }
      return Promise.resolve(signedIn ? json({ saved: true }) : json({ statusCode: 401, code: 'NOT_SIGNED_IN', message: 'Sign in.', requestId: 'r' }, 401));
    });
    let saved: Promise<unknown> = Promise.resolve();
    act(() => void (saved = http.post('/things', { complaint: 'hums' }, z.strictObject({ saved: z.boolean() }))));
    const dialog = await screen.findByRole('dialog', { name: 'Sign in again' });
    expect(within(dialog).getByLabelText<HTMLInputElement>('E-mail').value).toBe('mira@example.test');
    await person.type(within(dialog).getByLabelText('Password'), 'a long password');
    await person.click(within(dialog).getByRole('button', { name: 'Sign in' }));
    await expect(saved).resolves.toEqual({ saved: true });
    expect(screen.getByText('Floor page')).toBeDefined();
  });
});

describe('what a person sets for themselves', () => {
  it('changes the units on the server and at once on the page', async () => {
    open();
    fetched.mockImplementation((_, init) => Promise.resolve(json({ ...manager, preferences: JSON.parse(String(init?.body)) as unknown })));
    await person.click(screen.getByRole('button', { name: 'Signed in as Mira Holt' }));
    await person.click(await screen.findByRole('radio', { name: 'inch-pound' }));
    await waitFor(() => expect(screen.getByRole<HTMLInputElement>('radio', { name: 'inch-pound' }).checked).toBe(true));
    const [path, init] = fetched.mock.calls[0]!;
    expect([path, init?.method, init?.body]).toEqual(['/api/session/preferences', 'PUT', '{"units":"inch-pound","theme":"dark"}']);
  });

  it('goes light when light is chosen', async () => {
    open();
    fetched.mockImplementation((_, init) => Promise.resolve(json({ ...manager, preferences: JSON.parse(String(init?.body)) as unknown })));
    await person.click(screen.getByRole('button', { name: 'Signed in as Mira Holt' }));
    await person.click(await screen.findByRole('radio', { name: 'light' }));
    await waitFor(() => expect(document.body.classList.contains('bp6-dark')).toBe(false));
  });
});

describe('the search box', () => {
  const box = () => screen.findByRole('combobox');

  it('opens with a slash or with Ctrl K, and closes with Escape', async () => {
    open();
    await person.keyboard('/');
    expect((await box()) as HTMLInputElement).toHaveProperty('value', '');
    await person.keyboard('{Escape}');
    await waitFor(() => expect(screen.queryByRole('combobox')).toBeNull());
    await person.keyboard('{Control>}k{/Control}');
    expect(await box()).toBeDefined();
  });

  it('leaves the slash alone where single keys are turned off', async () => {
    open();
    act(() => setSingleKeys(false));
    await person.keyboard('/');
    expect(screen.queryByRole('combobox')).toBeNull();
    act(() => setSingleKeys(true));
  });

  it('goes to the chosen hit by arrow keys and Enter', async () => {
    fetched.mockImplementation(() => Promise.resolve(json({ hits: [...hit('26-0411').hits, { ...hit('26-0412').hits[0], id: 'job-0001' }] })));
    const router = open();
    await person.keyboard('/');
    await person.type(await box(), '26-04');
    await screen.findByText('2 found. Arrow keys choose, Enter opens.');
    await person.keyboard('{ArrowDown}{Enter}');
    await waitFor(() => expect(router.state.location.pathname).toBe('/jobs/26-0412'));
  });

  it('never opens a hit of an earlier question when Enter comes before the answer', async () => {
    let answer: (response: Response) => void = () => undefined;
    fetched.mockImplementation((path) => (String(path).endsWith('26-0412') ? new Promise((resolve) => (answer = resolve)) : Promise.resolve(json(hit('26-0')))));
    const router = open();
    await person.keyboard('/');
    await person.type(await box(), '26-0');
    await screen.findByText('1 found. Arrow keys choose, Enter opens.');
    await person.keyboard('412{Enter}');
    expect(router.state.location.pathname).toBe('/floor');
    act(() => answer(json(hit('26-0412'))));
    await waitFor(() => expect(router.state.location.pathname).toBe('/jobs/26-0412'));
  });

  it('opens the job of a tag that is scanned, wherever the focus is', async () => {
    fetched.mockImplementation(() => Promise.resolve(json(hit('26-0412'))));
    const router = open();
    scanned('26-0412');
    await waitFor(() => expect(router.state.location.pathname).toBe('/jobs/26-0412'));
    expect(String(fetched.mock.calls[0]![0])).toBe('/api/search?q=26-0412');
    await waitFor(() => expect(screen.queryByRole('combobox')).toBeNull());
  });

  it('keeps a scanned tag that nobody knows in view', async () => {
    const router = open();
    scanned('99-9999');
    expect(await screen.findByText('Nothing found for “99-9999”.')).toBeDefined();
    expect(router.state.location.pathname).toBe('/floor');
  });

  it('offers a customer no search of the shop', () => {
    open({ ...manager, roles: ['customer'], permissions: permissionsOf(['customer']) });
    expect(screen.queryByRole('button', { name: 'Find' })).toBeNull();
  });
});
