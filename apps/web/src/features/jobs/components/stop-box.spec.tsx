import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { jobSheet } from '../job-sheet.fixture.js';
import { StopBox } from './stop-box.js';

const person = userEvent.setup();
const box = (job = jobSheet(), me = somebody()) => inShop(<StopBox job={job} hrefOf={(place) => `/jobs/${job.id}?step=${place}#work`} />, { me });
const open = { step: 'rewind' as const, open: true, conditions: [{ code: 'CORE_AFTER', met: true, words: 'Core test after conforms.', place: 'core-test-after' }] };
const moved = (body: unknown) => (body as { to: string }).to;

afterEach(() => vi.unstubAllGlobals());

describe('what stops a job', () => {
  it('says what is missing, leads to the place where it is put right, and keeps the button shut', () => {
    box();
    expect(screen.getByRole('heading').textContent).toContain('One condition for Rewind is missing');
    expect(screen.getByRole('link', { name: /inconclusive/ }).getAttribute('href')).toBe('/jobs/01a1e84e-0012?step=core-test-after#work');
    expect(screen.queryByRole('link', { name: 'Strip within its limit.' })).toBeNull();
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Move on to Rewind' }).disabled).toBe(true);
  });

  it('puts what is missing before what is met', () => {
    box();
    expect(screen.getAllByRole('listitem').map((li) => li.textContent)[0]).toContain('inconclusive');
  });

  it('moves on when nothing is missing, once for a double tap', async () => {
    let arrive = () => undefined as void;
    const onTheWay = new Promise<void>((resolve) => (arrive = resolve));
    const asked = server(async () => {
      await onTheWay;
      return [200, jobSheet({ step: 'rewind', version: 13, next: null })];
    });
    box(jobSheet({ next: open }));
    await person.dblClick(screen.getByRole('button', { name: 'Move on to Rewind' }));
    const posts = asked.filter((a) => a.method === 'POST');
    expect(posts).toHaveLength(1);
    expect(posts[0]).toMatchObject({ path: '/jobs/01a1e84e-0012/moves', body: { version: 12, to: 'rewind', why: '' } });
    expect(posts[0]?.idempotencyKey).toMatch(/^[\w-]{8,100}$/);
    arrive();
  });

  it('shows the server’s own list when a gate shut in the meantime', async () => {
    server(() => refusal(409, 'GATE_SHUT', 'Not yet. The core test before was corrected since.', { conditions: [{ code: 'CORE_AFTER', met: false, words: 'The core test before was corrected since: correct the core test after too.', place: 'core-test-after' }] }));
    box(jobSheet({ next: open }));
    await person.click(screen.getByRole('button', { name: 'Move on to Rewind' }));
    const alert = await screen.findByRole('alert');
    expect(alert.textContent).toContain('Not yet.');
    expect(alert.textContent).toContain('correct the core test after too.');
  });

  it('moves back only with a reason, and keeps the reason when the server does not answer', async () => {
    const asked = server(() => undefined);
    box();
    await person.click(screen.getByRole('button', { name: 'Move back…' }));
    await person.selectOptions(await screen.findByLabelText('Back to'), 'core-test-before');
    await person.type(screen.getByLabelText('Why'), 'Meter was on the wrong range');
    await person.click(screen.getByRole('button', { name: 'Move back' }));
    await screen.findByText(/does not answer/);
    expect(moved(asked.find((a) => a.method === 'POST')?.body)).toBe('core-test-before');
    expect(screen.getByLabelText<HTMLInputElement>('Why').value).toBe('Meter was on the wrong range');
  });

  it('says who is waited for while a job is on hold, and offers to let it go on', () => {
    box(jobSheet({ state: 'on-hold', holdReason: 'Bearing 6314/C3 ordered.', waitingFor: 'part' }));
    expect(screen.getByRole('heading').textContent).toBe('On hold: waits for a part');
    expect(screen.getByText('Bearing 6314/C3 ordered.')).toBeDefined();
    expect(screen.getByRole('button', { name: 'Let it go on…' })).toBeDefined();
    expect(screen.queryByRole('button', { name: /Move on/ })).toBeNull();
  });

  it('asks why and for whom before a job is put on hold', async () => {
    const asked = server(() => [200, jobSheet()]);
    box();
    await person.click(screen.getByRole('button', { name: 'Put on hold…' }));
    await person.click(await screen.findByRole('button', { name: 'Put on hold' }));
    await waitFor(() => expect(screen.getByText('Choose one.')).toBeDefined());
    expect(asked.filter((a) => a.method === 'POST')).toEqual([]);
  });

  it('leaves the release to the counter and the manager', () => {
    const ready = jobSheet({ step: 'ready', next: { step: 'released', open: true, conditions: [] } });
    box(ready, somebody(['technician']));
    expect(screen.queryByRole('button', { name: 'Release the job' })).toBeNull();
    expect(screen.getByText('The counter or a manager releases a job.')).toBeDefined();
  });

  it('offers nothing on a job that has ended', () => {
    box(jobSheet({ state: 'scrapped', next: null }));
    expect(screen.getByRole('heading').textContent).toBe('This job has ended: scrapped');
    expect(screen.queryByRole('button')).toBeNull();
  });
});
