import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useForm } from 'react-hook-form';
import { createMemoryRouter, RouterProvider, useNavigate } from 'react-router-dom';
import { beforeEach, describe, expect, it } from 'vitest';
import { DraftNotice, useDraft } from './draft.js';
import { TextField } from './fields.js';

const person = userEvent.setup();
beforeEach(() => localStorage.clear());

function Form({ basis }: { basis: number }) {
  const form = useForm<{ complaint: string }>({ defaultValues: { complaint: '' } });
  const draft = useDraft(form, 'book-in', { basis });
  const navigate = useNavigate();
  return (
    <>
      <DraftNotice form={form} draft={draft} />
      <TextField control={form.control} name="complaint" label="Complaint" />
      <button
        onClick={() => {
          draft.forget();
          void navigate('/saved');
        }}
      >
        Save
      </button>
      <button onClick={() => void navigate('/elsewhere')}>Elsewhere</button>
    </>
  );
}

function openForm({ who = 'u1', basis = 1 } = {}) {
  const client = new QueryClient();
  client.setQueryData(['me'], { id: who });
  const router = createMemoryRouter([
    { path: '/', element: <Form basis={basis} /> },
    { path: '/saved', element: <p>Saved.</p> },
    { path: '/elsewhere', element: <p>Elsewhere.</p> },
  ]);
  return render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
}
const complaint = () => screen.getByLabelText<HTMLInputElement>('Complaint');

describe('the draft of a form', () => {
  it('comes back after the page was lost, and says so', async () => {
    const { unmount } = openForm();
    await person.type(complaint(), 'hums, does not start');
    unmount();
    openForm();
    expect(complaint().value).toBe('hums, does not start');
    expect(screen.getByRole('status').textContent).toContain('is back');
  });

  it('is not there for the next person at the same tablet', async () => {
    const { unmount } = openForm({ who: 'u1' });
    await person.type(complaint(), 'hums');
    unmount();
    openForm({ who: 'u2' });
    expect(complaint().value).toBe('');
  });

  it('can be thrown away for a fresh start, for good', async () => {
    const { unmount } = openForm();
    await person.type(complaint(), 'hums');
    unmount();
    const again = openForm();
    await person.click(screen.getByRole('button', { name: 'Start afresh' }));
    expect(complaint().value).toBe('');
    again.unmount();
    openForm();
    expect(complaint().value).toBe('');
    expect(screen.queryByRole('status')).toBeNull();
  });

  it('is offered, not taken, where somebody else has saved a change since', async () => {
    const { unmount } = openForm({ basis: 1 });
    await person.type(complaint(), 'hums');
    unmount();
    openForm({ basis: 2 });
    expect(complaint().value).toBe('');
    await person.click(screen.getByRole('button', { name: 'Take the draft' }));
    expect(complaint().value).toBe('hums');
  });

  it('asks before the form is left with changes, and stays or goes as told', async () => {
    openForm();
    await person.type(complaint(), 'hums');
    await person.click(screen.getByRole('button', { name: 'Elsewhere' }));
    await person.click(await screen.findByRole('button', { name: 'Stay here' }));
    expect(complaint().value).toBe('hums');
    await person.click(screen.getByRole('button', { name: 'Elsewhere' }));
    await person.click(await screen.findByRole('button', { name: 'Leave' }));
    expect(await screen.findByText('Elsewhere.')).toBeDefined();
  });

  it('does not ask when the form was saved and goes on in the same breath', async () => {
    openForm();
    await person.type(complaint(), 'hums');
    await person.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Saved.')).toBeDefined();
    expect(screen.queryByText('Leave without saving?')).toBeNull();
    expect(Object.keys(localStorage).filter((key) => key.includes('draft'))).toEqual([]);
  });

  it('asks nothing of whoever typed nothing', async () => {
    openForm();
    await person.click(screen.getByRole('button', { name: 'Elsewhere' }));
    expect(await screen.findByText('Elsewhere.')).toBeDefined();
  });
});
