import { useQuery, QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { ApiError } from '../lib/http.js';
import { ConfirmDialog } from './confirm-dialog.js';
import { Answer, Empty } from './faces.js';
import { Conditions, ConflictNotice, ErrorNotice } from './notices.js';
import { SignDialog } from './sign-dialog.js';

const person = userEvent.setup();

describe('an error on screen', () => {
  it('says what happened, that what was typed is kept, and the number to name', () => {
    render(<ErrorNotice error={new ApiError(409, 'MOVE_NOT_ALLOWED', 'This job is on hold; resume it first.', 'req-7')} />);
    const words = screen.getByRole('alert').textContent;
    expect(words).toContain('This job is on hold; resume it first.');
    expect(words).toContain('What you typed is still here.');
    expect(words).toContain('Request number req-7');
  });

  it('says the same words once, whether they are the error’s own or a field’s', () => {
    render(<ErrorNotice error={new ApiError(422, 'READINGS_NOT_VALID', 'Choose the oven.', 'r', ['ovenId', 'method', 'batch'].map((path, i) => ({ path, code: 'x', message: i < 2 ? 'Choose the oven.' : 'Name the batch.' })))} />);
    expect(screen.getAllByText('Choose the oven.')).toHaveLength(1);
    expect(screen.getAllByRole('listitem').map((li) => li.textContent)).toEqual(['Name the batch.']);
  });

  it('lists the conditions of a shut gate, each met or missing in words', () => {
    const conditions = [
      { code: 'a', met: true, words: 'Quote approved', place: null },
      { code: 'b', met: false, words: 'A valid core test before', place: 'core-test-before' },
    ];
    render(<ErrorNotice error={new ApiError(409, 'GATE_SHUT', 'The gate is shut.', 'r', [], undefined, conditions)} />);
    expect(screen.getByRole('img', { name: 'met' })).toBeDefined();
    expect(within(screen.getByText('A valid core test before').closest('li')!).getByRole('img', { name: 'missing' })).toBeDefined();
  });

  it('leads from a missing condition to its place, and from a met one nowhere', () => {
    render(
      <Conditions
        conditions={[
          { code: 'a', met: true, words: 'Quote approved', place: 'quote' },
          { code: 'b', met: false, words: 'Core test before', place: 'core-test-before' },
        ]}
        linkOf={(place, words) => <a href={`#${place}`}>{words}</a>}
      />,
    );
    expect(screen.getAllByRole('link').map((a) => a.getAttribute('href'))).toEqual(['#core-test-before']);
  });

  it('says nothing where there is none', () => {
    const { container } = render(<ErrorNotice error={null} />);
    expect(container.textContent).toBe('');
  });
});

describe('a conflict', () => {
  it('shows both values and lets the person decide', async () => {
    const take = vi.fn();
    const keep = vi.fn();
    render(<ConflictNotice differences={[{ label: 'Promised on', theirs: '3 Dec 2026', yours: '5 Dec 2026' }]} onTakeTheirs={take} onKeepMine={keep} />);
    const row = screen.getByRole('row', { name: /Promised on/ });
    expect(within(row).getAllByRole('cell').map((c) => c.textContent)).toEqual(['3 Dec 2026', '5 Dec 2026']);
    await person.click(screen.getByRole('button', { name: 'Take theirs' }));
    await person.click(screen.getByRole('button', { name: 'Keep mine and save' }));
    expect([take.mock.calls.length, keep.mock.calls.length]).toEqual([1, 1]);
  });
});

describe('the four faces of a question', () => {
  function Jobs({ ask }: { ask: () => Promise<string[]> }) {
    const query = useQuery({ queryKey: ['jobs'], queryFn: ask });
    return (
      <Answer query={query} isEmpty={(jobs) => jobs.length === 0} empty={<Empty title="No job waits">Book one in.</Empty>}>
        {(jobs) => <p>{jobs.join(', ')}</p>}
      </Answer>
    );
  }
  const open = (ask: () => Promise<string[]>) =>
    render(
      <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
        <Jobs ask={ask} />
      </QueryClientProvider>,
    );

  it('waits, then shows what there is', async () => {
    let answer: (jobs: string[]) => void = () => undefined;
    open(() => new Promise((resolve) => (answer = resolve)));
    expect(screen.getByRole('status')).toBeDefined();
    answer(['26-0412']);
    expect(await screen.findByText('26-0412')).toBeDefined();
  });

  it('says what to do where there is nothing', async () => {
    open(() => Promise.resolve([]));
    expect(await screen.findByText('No job waits')).toBeDefined();
    expect(screen.getByText('Book one in.')).toBeDefined();
  });

  it('never shows a failure as an empty list, and tries again when told', async () => {
    const ask = vi.fn<() => Promise<string[]>>().mockRejectedValueOnce(new ApiError(500, 'INTERNAL', 'Something failed here.', 'req-9')).mockResolvedValue(['26-0412']);
    open(ask);
    expect((await screen.findByRole('alert')).textContent).toContain('Something failed here.');
    expect(screen.getByRole('alert').textContent).toContain('req-9');
    expect(screen.queryByText('No job waits')).toBeNull();
    await person.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('26-0412')).toBeDefined();
  });
});

describe('a signature', () => {
  const sign = (error: unknown = null) => {
    const onSign = vi.fn();
    render(
      <SignDialog open title="Sign the core test" pending={false} error={error} onSign={onSign} onClose={() => undefined}>
        <p>You sign that the readings are as read.</p>
      </SignDialog>,
    );
    return onSign;
  };

  it('asks for the person’s own password at the moment of signing', async () => {
    const onSign = sign();
    await person.click(screen.getByRole('button', { name: 'Sign' }));
    expect(onSign).not.toHaveBeenCalled();
    expect(screen.getByRole('alert').textContent).toBe('Type your password to sign.');
    await person.type(screen.getByLabelText('Your own password'), 'a long password{Enter}');
    expect(onSign).toHaveBeenCalledWith('a long password');
  });

  it('says at the field that the password is wrong', () => {
    sign(new ApiError(403, 'WRONG_SIGNATURE', 'Wrong.', 'r', [{ path: 'password', code: 'wrong', message: 'That is not your password.' }]));
    expect(screen.getByRole('alert').textContent).toBe('That is not your password.');
    expect(screen.getByLabelText('Your own password').getAttribute('aria-invalid')).toBe('true');
  });
});

describe('a question before an act', () => {
  it('leaves the checking to the form’s own words, never to the browser’s', () => {
    render(<ConfirmDialog open title="Hold this job?" confirm="Hold" onConfirm={vi.fn()} onClose={vi.fn()} />);
    expect(screen.getByRole('dialog').querySelector('form')!.noValidate).toBe(true);
  });

  it('acts on Enter, and on nothing else', async () => {
    const act = vi.fn();
    const close = vi.fn();
    render(<ConfirmDialog open title="Scrap this job?" confirm="Scrap" onConfirm={act} onClose={close} />);
    await person.click(screen.getByRole('button', { name: 'Not now' }));
    expect([act.mock.calls.length, close.mock.calls.length]).toEqual([0, 1]);
    await person.click(screen.getByRole('button', { name: 'Scrap' }));
    expect(act).toHaveBeenCalledTimes(1);
  });
});
