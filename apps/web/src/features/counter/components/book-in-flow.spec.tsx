import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server } from '../../../../test/in-shop.js';
import { emptyBookIn } from '../book-in-form.js';
import { BookInFlow } from './book-in-flow.js';

const person = userEvent.setup();
const onBooked = vi.fn();
const dairy = { id: '01a16268-dairy', name: 'Senngrund Dairy', city: 'Senngrund', email: 'voss@senngrund.example', openJobs: 1, machines: 1 };
const separator = { id: '01a16268-sep11', customerId: dairy.id, customerName: dairy.name, description: '11 kW 4-pole separator motor', serial: 'SD-S11', visits: 1, lastJobNumber: 'J2026-0008' };
const page = (rows: unknown[]): readonly [number, unknown] => [200, { rows, total: rows.length, page: 1, size: 8 }];

/** The shop's lists; what happens to the booking itself is the test's own. */
const shop = (booking: () => readonly [number, unknown] | undefined) =>
  server(({ method, path }) => {
    if (method === 'POST') return booking();
    if (path.startsWith('/customers?')) return page([dairy]);
    if (path.startsWith('/machines?')) return page([separator]);
    return refusal(404, 'NOT_FOUND', 'There is no such thing.');
  });

async function untilLastPanel() {
  inShop(<BookInFlow start={emptyBookIn('si')} draftKey="book-in" onBooked={onBooked} />);
  await person.type(screen.getByLabelText('Whose machine is it?'), 'dairy');
  await person.click(await screen.findByRole('radio', { name: /Senngrund Dairy/ }));
  await person.click(await screen.findByRole('radio', { name: /separator/ }));
  await person.type(await screen.findByLabelText(/What is wrong with it/), 'Noisy, then tripped.');
  await person.selectOptions(screen.getByLabelText('Contamination'), 'food');
  await person.click(screen.getByRole('button', { name: 'Next' }));
}
const book = () => person.click(screen.getByRole('button', { name: 'Book in' }));

beforeEach(() => {
  localStorage.clear();
  onBooked.mockReset();
});
afterEach(() => vi.unstubAllGlobals());

describe('booking a machine in at the counter', () => {
  it('books a known machine of a known customer in four short panels', async () => {
    const asked = shop(() => [201, { id: '01a231e9-0015', number: 'J2026-0015' }]);
    await untilLastPanel();
    await book();
    await waitFor(() => expect(onBooked).toHaveBeenCalledWith('01a231e9-0015'));
    expect(asked.find((a) => a.method === 'POST')?.body).toMatchObject({ customer: { kind: 'known', customerId: dairy.id }, machine: { kind: 'known', machineId: separator.id }, complaint: 'Noisy, then tripped.', contamination: 'food' });
    expect(localStorage.length).toBe(0);
  });

  it('keeps all that was typed when the shop’s computer does not answer, and sends the same booking again', async () => {
    let reachable = false;
    const asked = shop(() => (reachable ? [201, { id: '01a231e9-0015', number: 'J2026-0015' }] : undefined));
    await untilLastPanel();
    await book();
    expect(await screen.findByText(/does not answer/)).toBeDefined();
    expect(screen.getByRole('button', { name: /What came with it/ }).textContent).toContain('Noisy, then tripped.');
    expect(screen.getByRole('button', { name: /Customer/ }).textContent).toContain('Senngrund Dairy');
    reachable = true;
    await book();
    await waitFor(() => expect(onBooked).toHaveBeenCalled());
    const posts = asked.filter((a) => a.method === 'POST');
    expect(posts).toHaveLength(2);
    expect(posts[0]?.idempotencyKey).toBe(posts[1]?.idempotencyKey);
  });

  it('opens the panel in which the server found something wrong, with its words at the field', async () => {
    shop(() => refusal(400, 'INPUT_NOT_VALID', 'Something is not right.', { fields: [{ path: 'complaint', code: 'too_long', message: 'At most 600 characters.' }] }));
    await untilLastPanel();
    await book();
    const complaint = await screen.findByLabelText<HTMLTextAreaElement>(/What is wrong with it/);
    await waitFor(() => expect(complaint.getAttribute('aria-invalid')).toBe('true'));
    expect(complaint.value).toBe('Noisy, then tripped.');
    expect(screen.getByText('At most 600 characters.')).toBeDefined();
  });

  it('asks for the customer before anything else', async () => {
    shop(() => undefined);
    inShop(<BookInFlow start={emptyBookIn('si')} draftKey="book-in" onBooked={onBooked} />);
    await person.click(screen.getByRole('button', { name: 'Next' }));
    expect(await screen.findByText('Choose the customer, or enter a new one.')).toBeDefined();
    expect(screen.queryByLabelText('Which machine?')).toBeNull();
  });

  it('takes what was looked for as the name of a new customer, whose machine is then a new one', async () => {
    server(() => page([]));
    inShop(<BookInFlow start={emptyBookIn('si')} draftKey="book-in" onBooked={onBooked} />);
    await person.type(screen.getByLabelText('Whose machine is it?'), 'Hollerbach Mill');
    expect(await screen.findByText('Nobody found for “Hollerbach Mill”.')).toBeDefined();
    await person.click(screen.getByRole('button', { name: 'Enter a new customer' }));
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Hollerbach Mill');
    await person.type(screen.getByLabelText('E-mail'), 'mill@hollerbach.example');
    await person.click(screen.getByRole('button', { name: 'Next' }));
    expect(await screen.findByLabelText('What it is')).toBeDefined();
  });

  it('brings a booking back after a reload', async () => {
    shop(() => undefined);
    await untilLastPanel();
    document.body.innerHTML = '';
    inShop(<BookInFlow start={emptyBookIn('si')} draftKey="book-in" onBooked={onBooked} />);
    expect(await screen.findByText(/Your draft of .* is back/)).toBeDefined();
    expect(screen.getByRole('button', { name: /Machine/ }).textContent).toContain('separator motor');
  });
});
