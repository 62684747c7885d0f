import type { QuoteView } from '@shared/quotes';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ApiError } from '../../../lib/http.js';
import { emptyLine, formOf } from '../quote-form.js';
import { QuoteEditor, type QuoteInput } from './quote-editor.js';

const quote: QuoteView = {
  id: 'quote-0001', jobId: 'job-00001', jobNumber: 'J2026-0013', customerId: 'customer1', customerName: 'Senngrund Dairy', number: 'Q2026-0012', revision: 1, state: 'draft', currency: 'EUR',
  lines: [
    { kind: 'labour', description: 'Clean, dip and bake', quantityThousandths: 6000, unit: 'h', unitPriceMinor: 7800, taxRateBasisPoints: 1900, netMinor: 46_800, taxMinor: 8892 },
    { kind: 'material', description: 'Bearings', quantityThousandths: 1000, unit: 'set', unitPriceMinor: 9400, taxRateBasisPoints: 1900, netMinor: 9400, taxMinor: 1786 },
  ],
  taxSummary: [{ taxRateBasisPoints: 1900, netMinor: 56_200, taxMinor: 10_678 }],
  netMinor: 56_200, taxMinor: 10_678, grossMinor: 66_878, validUntil: '2026-12-26', expired: false, note: '', sentAt: null, approval: null, declineReason: null, version: 1,
};
const saves = vi.fn<(input: QuoteInput, version: number) => void>();
const person = userEvent.setup();
beforeEach(() => {
  localStorage.clear();
  saves.mockClear();
});

function open({ of = null as QuoteView | null, error = null as unknown, onGone = vi.fn() } = {}) {
  const editor = (
    <QuoteEditor
      quote={of}
      start={of ? formOf(of) : { lines: [emptyLine()], validUntil: '2026-12-31', note: '' }}
      currency="EUR"
      draftKey="quote:spec"
      pending={false}
      error={error}
      onSave={(input, version) => saves(input, version)}
      onSaved={() => undefined}
      onGone={onGone}
    />
  );
  render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={createMemoryRouter([{ path: '/', element: editor }])} />
    </QueryClientProvider>,
  );
}
const field = (name: string) => screen.getByRole<HTMLInputElement>('textbox', { name });
const sums = () => screen.getAllByRole('status').map((s) => s.textContent).join(' ');
const fillLine = async (n: number, quantity: string, price: string) => {
  await person.type(field(`What it is for, line ${n}`), 'Rewind');
  await person.clear(field(`Quantity, line ${n}`));
  await person.type(field(`Quantity, line ${n}`), quantity);
  await person.type(field(`Price, line ${n}`), price);
};

describe('the quote editor', () => {
  it('adds up while they type, with a decimal comma', async () => {
    open();
    expect(sums()).toContain('the total stands here');
    await fillLine(1, '1,5', '85,33');
    await person.type(field('Tax %, line 1'), '19');
    expect(sums()).toContain('152.32');
    await person.click(screen.getByRole('button', { name: 'Save the draft' }));
    expect(saves).toHaveBeenCalledWith(expect.objectContaining({ lines: [expect.objectContaining({ quantityThousandths: 1500, unitPriceMinor: 8533, taxRateBasisPoints: 1900 })] }), 0);
  });

  it('keeps a price with letters in it as it was typed, says what is wrong with it, and sends nothing', async () => {
    open();
    await fillLine(1, '2', '85 or so');
    await person.type(field('Tax %, line 1'), '19');
    await person.click(screen.getByRole('button', { name: 'Save the draft' }));
    expect(field('Price, line 1').value).toBe('85 or so');
    expect(screen.getByRole('alert').textContent).toContain('Only digits');
    expect(field('Price, line 1').getAttribute('aria-invalid')).toBe('true');
    expect(saves).not.toHaveBeenCalled();
  });

  it('says which line the total leaves out, and gives a new line the tax of the one before', async () => {
    open({ of: quote });
    await person.click(screen.getByRole('button', { name: 'Add a line' }));
    expect(field('Tax %, line 3').value).toBe('19');
    expect(sums()).toContain('Without line 3');
    expect(sums()).toContain('668.78');
  });

  it('moves and takes out lines by buttons', async () => {
    open({ of: quote });
    await person.click(screen.getByRole('button', { name: 'Move line 2 up' }));
    expect(field('What it is for, line 1').value).toBe('Bearings');
    await person.click(screen.getByRole('button', { name: 'Take line 2 out' }));
    await person.click(screen.getByRole('button', { name: 'Save the draft' }));
    expect(saves.mock.calls[0]?.[0].lines.map((l) => l.description)).toEqual(['Bearings']);
  });

  it('shows both when somebody else saved it meanwhile, and saves mine over theirs only when told', async () => {
    const theirs: QuoteView = { ...quote, version: 2, lines: [{ ...quote.lines[0]!, unitPriceMinor: 8000, netMinor: 48_000, taxMinor: 9120 }, quote.lines[1]!], grossMinor: 68_306 };
    open({ of: quote, error: new ApiError(409, 'CHANGED_MEANWHILE', 'Somebody else changed this quote meanwhile.', 'r1', [], theirs) });
    const both = within(screen.getByRole('alert'));
    expect(both.getByRole('row', { name: /^Line 1/ }).textContent).toContain('at 80.00');
    expect(both.getByRole('row', { name: /^Line 1/ }).textContent).toContain('at 78.00');
    expect(both.queryByRole('row', { name: /^Line 2/ })).toBeNull();
    expect(both.getByRole('row', { name: /^Total/ }).textContent).toContain('683.06');
    await person.click(both.getByRole('button', { name: 'Keep mine and save' }));
    expect(saves).toHaveBeenCalledWith(expect.objectContaining({ validUntil: '2026-12-26' }), 2);
  });

  it('takes theirs when that is chosen', async () => {
    const theirs: QuoteView = { ...quote, version: 2, note: 'Bearings are in stock.' };
    open({ of: quote, error: new ApiError(409, 'CHANGED_MEANWHILE', 'Changed.', 'r1', [], theirs) });
    await person.click(screen.getByRole('button', { name: 'Take theirs' }));
    expect(screen.getByRole<HTMLTextAreaElement>('textbox', { name: /Note/ }).value).toBe('Bearings are in stock.');
    await person.click(screen.getByRole('button', { name: 'Save the draft' }));
    expect(saves).toHaveBeenCalledWith(expect.anything(), 2);
  });

  it('does not offer to save over a quote that was sent meanwhile', async () => {
    const onGone = vi.fn();
    const theirs: QuoteView = { ...quote, version: 2, state: 'sent', sentAt: '2026-12-01T10:00:00.000Z' };
    open({ of: quote, error: new ApiError(409, 'CHANGED_MEANWHILE', 'Changed.', 'r1', [], theirs), onGone });
    expect(screen.queryByRole('button', { name: 'Keep mine and save' })).toBeNull();
    await person.click(screen.getByRole('button', { name: 'Show it as it stands' }));
    expect(onGone).toHaveBeenCalledWith(theirs);
  });
});
