import type { InstrumentView } from '@shared/instruments';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { SAMPLE_BAY } from '../../../../test/sample-job.js';
import { InstrumentDialog } from './instrument-dialog.js';
import { InstrumentList } from './instrument-list.js';

const onClose = vi.fn();
const open = (instrument: InstrumentView | null) =>
  render(
    <QueryClientProvider client={new QueryClient()}>
      <InstrumentDialog instrument={instrument} onClose={onClose} />
    </QueryClientProvider>,
  );
const field = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
const type = (name: string, text: string) => fireEvent.change(field(name), { target: { value: text } });
const answering = (status: number, body: unknown) => {
  const fetched = vi.fn<typeof fetch>().mockImplementation(() => Promise.resolve(new Response(JSON.stringify(body), { status })));
  vi.stubGlobal('fetch', fetched);
  return fetched;
};
afterEach(() => vi.unstubAllGlobals());

describe('the register of instruments', () => {
  it('puts what is overdue on top, by word and mark', () => {
    render(
      <MemoryRouter>
        <InstrumentList instruments={SAMPLE_BAY.instruments} onEdit={null} />
      </MemoryRouter>,
    );
    const rows = screen.getAllByRole('row').slice(1);
    expect(rows.slice(0, 3).map((r) => within(r).getAllByRole('cell').at(-1)!.textContent)).toEqual(['overdue', 'due soon', 'in calibration']);
  });

  it('adds an instrument as it was typed', async () => {
    const fetched = answering(201, { ...SAMPLE_BAY.instruments[0]!, tag: 'V-02' });
    open(null);
    type('tag', 'V-02');
    type('kind', 'voltmeter');
    type('percentOfReading', '0,5');
    type('percentOfRange', '0');
    type('calibratedOn', '2026-01-10');
    type('dueOn', '2027-01-10');
    fireEvent.click(screen.getByRole('button', { name: 'Keep it' }));
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(JSON.parse(fetched.mock.calls[0]![1]!.body as string)).toMatchObject({ tag: 'V-02', kind: 'voltmeter', percentOfReading: 0.5, percentOfRange: 0, dueOn: '2027-01-10' });
  });

  it('says at each field what is missing and sends nothing', async () => {
    const fetched = answering(201, {});
    open(null);
    fireEvent.click(screen.getByRole('button', { name: 'Keep it' }));
    expect(await screen.findByText('The tag on the instrument.')).toBeDefined();
    expect(fetched).not.toHaveBeenCalled();
  });

  it('lands a tag that is taken on its field, with everything kept', async () => {
    answering(409, { statusCode: 409, code: 'TAKEN', message: 'An instrument has this tag already.', requestId: 'r-3', fields: [{ path: 'tag', code: 'taken', message: 'An instrument has this tag already.' }] });
    open(SAMPLE_BAY.instruments[2]!);
    type('tag', 'V-01');
    fireEvent.click(screen.getByRole('button', { name: 'Keep it' }));
    await waitFor(() => expect(field('tag').getAttribute('aria-invalid')).toBe('true'));
    expect(field('tag').value).toBe('V-01');
    expect(field('certificateNumber').value).toBe('K-2231');
  });
});
