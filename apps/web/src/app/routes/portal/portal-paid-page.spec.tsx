import type { InvoiceView } from '@shared/invoices';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { PortalPaidPage } from './portal-paid-page.js';

const invoice: InvoiceView = {
  id: 'invoice-001', number: 'R2026-0002', jobId: 'job-00001', jobNumber: 'J2026-0008', customerId: 'customer1', customerName: 'Senngrund Dairy', quoteNumber: 'Q2026-0008', state: 'open', currency: 'EUR',
  lines: [], taxSummary: [], netMinor: 236_045, taxMinor: 44_849, grossMinor: 280_894, paidMinor: 0, balanceMinor: 280_894, issuedAt: '2026-11-26T09:00:00.000Z', dueOn: '2026-12-26', overdue: false, payments: [], paperId: null, version: 2,
};
const outcomes: string[] = [];
let asked = 0;
beforeEach(() => {
  vi.useFakeTimers();
  asked = 0;
  outcomes.length = 0;
  vi.stubGlobal('fetch', () => {
    const outcome = outcomes[Math.min(asked, outcomes.length - 1)];
    asked += 1;
    const now = outcome === 'paid' ? { ...invoice, state: 'paid', paidMinor: 280_894, balanceMinor: 0, version: 3 } : invoice;
    return Promise.resolve(new Response(JSON.stringify({ outcome, invoice: now })));
  });
});
afterEach(() => vi.useRealTimers());

async function comeBack(search = '?session_id=cs_test_abc', ...said: string[]) {
  outcomes.push(...said);
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  client.setQueryData(['me'], { id: 'u', shop: { demo: false } });
  const router = createMemoryRouter([{ path: '/portal/invoices/:id/paid', Component: PortalPaidPage }], { initialEntries: [`/portal/invoices/invoice-001/paid${search}`] });
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  await pass(50);
}
const pass = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms));
const page = () => document.body.textContent;

describe('coming back from the payment page', () => {
  it('says that the money is there when the shop says so', async () => {
    await comeBack(undefined, 'paid');
    expect(page()).toContain('Paid. Thank you.');
    expect(screen.queryByRole('button', { name: /^Pay/ })).toBeNull();
  });

  it('asks again by itself while the bank has not confirmed, and then says paid', async () => {
    await comeBack(undefined, 'not-yet', 'not-yet', 'paid');
    expect(page()).toContain('has not confirmed the payment yet');
    expect(screen.queryByRole('button', { name: /^Pay/ })).toBeNull();
    await pass(6000);
    expect(page()).toContain('Paid. Thank you.');
    expect(asked).toBe(3);
  });

  it('gives up asking after a while, says not to pay twice, and asks again when told', async () => {
    await comeBack(undefined, 'not-yet');
    await pass(120_000);
    expect(asked).toBe(6);
    expect(page()).toContain('Do not pay a second time');
    act(() => screen.getByRole('button', { name: 'Ask again' }).click());
    await pass(50);
    expect(asked).toBe(7);
  });

  it('offers to pay again when nothing was paid', async () => {
    await comeBack(undefined, 'not-paid');
    expect(page()).toContain('Nothing was paid');
    expect(screen.getByRole('button', { name: /^Pay/ })).toBeDefined();
  });

  it('claims nothing for an address without a payment, and asks nobody', async () => {
    await comeBack('?session_id=paid-i-promise', 'paid');
    expect(page()).toContain('does not name a payment');
    expect(asked).toBe(0);
  });
});
