import type { InvoiceView } from '@shared/invoices';
import type { QuoteView } from '@shared/quotes';
import type { Me } from '@shared/session';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { PayButton } from './pay-button.js';
import { QuoteAnswer } from './quote-answer.js';

const me: Me = {
  id: 'user-00001', name: 'Anneke Voss', email: 'voss@senngrund.example', roles: ['customer'], permissions: ['portal.use', 'profile.own'], customerId: 'customer1',
  preferences: { units: 'si', theme: 'light' }, shop: { name: 'Kupferring Rewind Works', timeZone: 'Europe/Berlin', currency: 'EUR', demo: false, mailboxUrl: null },
};
const quote: QuoteView = {
  id: 'quote-0001', jobId: 'job-00001', jobNumber: 'J2026-0013', customerId: 'customer1', customerName: 'Senngrund Dairy', number: 'Q2026-0012', revision: 1, state: 'sent', currency: 'EUR',
  lines: [], taxSummary: [], netMinor: 68_200, taxMinor: 12_958, grossMinor: 81_158, validUntil: '2026-12-26', expired: false, note: '', sentAt: '2026-11-29T10:11:00.000Z', approval: null, declineReason: null, version: 4,
};
const invoice: InvoiceView = {
  id: 'invoice-001', number: 'R2026-0002', jobId: 'job-00001', jobNumber: 'J2026-0008', customerId: 'customer1', customerName: 'Senngrund Dairy', quoteNumber: 'Q2026-0008', state: 'open', currency: 'EUR',
  lines: [], taxSummary: [], netMinor: 236_045, taxMinor: 44_849, grossMinor: 280_894, paidMinor: 0, balanceMinor: 280_894, issuedAt: '2026-11-26T09:00:00.000Z', dueOn: '2026-12-26', overdue: false, payments: [], paperId: null, version: 2,
};

const calls: { path: string; body: unknown }[] = [];
let answer: () => Promise<Response>;
const json = (body: unknown, status = 200) => Promise.resolve(new Response(JSON.stringify(body), { status }));
const person = userEvent.setup();
beforeEach(() => {
  calls.length = 0;
  vi.stubGlobal('fetch', (path: string, init: RequestInit) => {
    if (init.method !== 'POST') return json({ statusCode: 404, code: 'NOT_FOUND', message: 'There is no such job.', requestId: 'r' }, 404);
    calls.push({ path, body: JSON.parse(init.body as string) });
    return answer();
  });
});

function show(what: ReactNode) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false, staleTime: Infinity } } });
  client.setQueryData(['me'], me);
  render(
    <QueryClientProvider client={client}>
      <MemoryRouter>{what}</MemoryRouter>
    </QueryClientProvider>,
  );
}
const press = (name: RegExp) => person.click(screen.getByRole('button', { name }));

describe('the customer’s answer to a quote', () => {
  it('needs a name before it approves', async () => {
    show(<QuoteAnswer quote={quote} />);
    await press(/^Approve/);
    await press(/^Yes, approve/);
    expect(await screen.findByText('Type your name.')).toBeDefined();
    expect(calls).toEqual([]);
  });

  it('approves in two taps with a name, naming the version that was seen', async () => {
    answer = () => json({ ...quote, state: 'approved', version: 5, approval: { how: 'portal', by: 'Anneke Voss', at: '2026-12-01T10:00:00.000Z', purchaseOrder: '', notToExceedMinor: null } });
    show(<QuoteAnswer quote={quote} />);
    await press(/^Approve/);
    await person.type(screen.getByLabelText('Your name'), 'Anneke Voss');
    await press(/^Yes, approve/);
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(calls).toEqual([{ path: '/api/portal/quotes/quote-0001/approval', body: { version: 4, name: 'Anneke Voss', purchaseOrder: '' } }]);
  });

  it('keeps the name and says why when the shop refuses', async () => {
    answer = () => json({ statusCode: 409, code: 'STATE_NOT_RIGHT', message: 'A newer revision has taken this quote’s place: only the newest can be approved.', requestId: 'r' }, 409);
    show(<QuoteAnswer quote={quote} />);
    await press(/^Approve/);
    await person.type(screen.getByLabelText('Your name'), 'Anneke Voss');
    await press(/^Yes, approve/);
    expect((await screen.findByRole('alert')).textContent).toContain('only the newest can be approved');
    expect(screen.getByLabelText<HTMLInputElement>('Your name').value).toBe('Anneke Voss');
  });

  it('is declined with a reason', async () => {
    answer = () => json({ ...quote, state: 'declined', version: 5, declineReason: 'We buy a new one.' });
    show(<QuoteAnswer quote={quote} />);
    await press(/^Decline$/);
    await press(/^Decline it/);
    expect(calls).toEqual([]);
    await person.type(screen.getByLabelText(/^Why/), 'We buy a new one.');
    await press(/^Decline it/);
    await waitFor(() => expect(calls[0]?.body).toEqual({ version: 4, reason: 'We buy a new one.' }));
  });

  it('cannot be given to a quote that is out of force, past its day, or answered', () => {
    const buttons = () => screen.queryAllByRole('button');
    show(<QuoteAnswer quote={{ ...quote, state: 'superseded' }} />);
    show(<QuoteAnswer quote={{ ...quote, expired: true }} />);
    show(<QuoteAnswer quote={{ ...quote, state: 'declined', declineReason: 'Too dear.' }} />);
    expect(buttons()).toEqual([]);
    expect(screen.getByText('This quote is out of force')).toBeDefined();
    expect(screen.getByText(/held until 26 Dec 2026/)).toBeDefined();
    expect(screen.getByText(/Too dear\./)).toBeDefined();
  });
});

describe('paying an invoice', () => {
  it('asks for the payment page once, however often it is tapped', async () => {
    answer = () => new Promise(() => undefined);
    show(<PayButton invoice={invoice} />);
    const button = screen.getByRole('button', { name: /^Pay/ });
    await person.dblClick(button);
    await person.click(button);
    expect(calls).toEqual([{ path: '/api/portal/invoices/invoice-001/checkout', body: { version: 2 } }]);
  });

  it('sends no amount: what is paid is the shop’s to say', async () => {
    answer = () => new Promise(() => undefined);
    show(<PayButton invoice={invoice} />);
    await press(/^Pay/);
    expect(JSON.stringify(calls[0]?.body)).not.toContain('280');
  });

  it('says so when the amount has changed meanwhile, and can be tapped again', async () => {
    answer = () => json({ statusCode: 409, code: 'CHANGED_MEANWHILE', message: 'Somebody else changed this invoice meanwhile.', requestId: 'r', current: { ...invoice, version: 3 } }, 409);
    show(<PayButton invoice={invoice} />);
    await press(/^Pay/);
    expect(within(await screen.findByRole('alert')).getByText(/The amount has changed meanwhile/)).toBeDefined();
    expect(screen.getByRole<HTMLButtonElement>('button', { name: /^Pay/ }).disabled).toBe(false);
  });

  it('says what else can be done when the payment service does not answer', async () => {
    answer = () => json({ statusCode: 503, code: 'PAYMENT_SERVICE_UNREACHABLE', message: 'The payment service does not answer right now.', requestId: 'r' }, 503);
    show(<PayButton invoice={invoice} />);
    await press(/^Pay/);
    expect((await screen.findByRole('alert')).textContent).toContain('does not answer right now');
    expect(screen.getByText(/bank transfer/)).toBeDefined();
  });
});
