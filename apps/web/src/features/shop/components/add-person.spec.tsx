import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { AddPerson } from './add-person.js';
import { EditPerson } from './edit-person.js';

const mira = { id: 'user-00001', name: 'Mira Talvik', email: 'talvik@kupferring.example', roles: ['technician' as const], customerId: null, customerName: null, disabled: false, version: 1 };
const sent: { path: string; body: Record<string, unknown> }[] = [];
let answers: { status: number; body: unknown }[] = [];
const person = userEvent.setup();
beforeEach(() => {
  sent.length = 0;
  answers = [];
  vi.stubGlobal('fetch', (path: string, init: RequestInit) => {
    if (init.body) sent.push({ path, body: JSON.parse(init.body as string) as Record<string, unknown> });
    const answer = init.body ? (answers.shift() ?? { status: 201, body: mira }) : { status: 200, body: { rows: [], total: 0, page: 1, size: 50 } };
    return Promise.resolve(new Response(JSON.stringify(answer.body), { status: answer.status }));
  });
});
const show = (what: React.ReactNode) => render(<QueryClientProvider client={new QueryClient()}>{what}</QueryClientProvider>);
const press = (name: string) => person.click(screen.getByRole('button', { name }));
const tick = (name: string) => person.click(screen.getByRole('checkbox', { name }));

describe('adding a person', () => {
  it('asks for a role, and goes on once one is ticked', async () => {
    const onClose = vi.fn();
    show(<AddPerson onClose={onClose} />);
    await person.type(screen.getByLabelText('Name'), 'Mira Talvik');
    await person.type(screen.getByLabelText('E-mail'), 'talvik@kupferring.example');
    await person.type(screen.getByLabelText('First password'), 'copper and patience');
    await press('Add');
    expect(await screen.findByText('At least one role.')).toBeDefined();
    expect(sent).toEqual([]);
    await tick('technician');
    await press('Add');
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(sent[0]?.body).toMatchObject({ roles: ['technician'], customerId: null });
  });

  it('says at the field that somebody has this e-mail, once, and keeps the rest', async () => {
    const words = 'Somebody signs in with this e-mail already.';
    answers = [{ status: 409, body: { statusCode: 409, code: 'TAKEN', message: words, requestId: 'r', fields: [{ path: 'email', code: 'taken', message: words }] } }];
    show(<AddPerson onClose={vi.fn()} />);
    await person.type(screen.getByLabelText('Name'), 'Mira Talvik');
    await person.type(screen.getByLabelText('E-mail'), 'talvik@kupferring.example');
    await person.type(screen.getByLabelText('First password'), 'copper and patience');
    await tick('technician');
    await press('Add');
    expect(await screen.findAllByText(words)).toHaveLength(1);
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Mira Talvik');
  });
});

describe('changing a person', () => {
  it('shows both when somebody else changed them meanwhile, and saves mine only when told', async () => {
    answers = [{ status: 409, body: { statusCode: 409, code: 'CHANGED_MEANWHILE', message: 'Somebody else changed this user meanwhile.', requestId: 'r', current: { name: 'Mira Talvik', roles: ['technician', 'counter'], disabled: false, version: 2 } } }];
    const onClose = vi.fn();
    show(<EditPerson user={mira} onClose={onClose} />);
    await tick('manager');
    await press('Save');
    const row = await screen.findByRole('row', { name: /^Roles/ });
    expect(row.textContent).toContain('counter, technician');
    expect(row.textContent).toContain('technician, manager');
    expect(screen.queryByRole('row', { name: /^Name/ })).toBeNull();
    await press('Keep mine and save');
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(sent.map((s) => s.body['version'])).toEqual([1, 2]);
  });
});
