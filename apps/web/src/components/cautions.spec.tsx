import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SAMPLE_TECHNICIAN } from '../../test/sample-job.js';
import { meQuery } from '../lib/me.js';
import { Cautions } from './cautions.js';

function shown(person = SAMPLE_TECHNICIAN, topic: 'core' | 'oven' = 'core') {
  const client = new QueryClient();
  client.setQueryData(meQuery.queryKey, person);
  return render(
    <QueryClientProvider client={client}>
      <Cautions topic={topic} title="Core test" heading="Before you start" lines={['Barrier up.']}>
        <p>the bench</p>
      </Cautions>
    </QueryClientProvider>,
  );
}
const read = () => fireEvent.click(screen.getByRole('button', { name: /^Read/ }));

beforeEach(() => {
  localStorage.clear();
  vi.useFakeTimers({ now: new Date('2026-03-18T09:00:00Z') });
});
afterEach(() => vi.useRealTimers());

describe('the cautions', () => {
  it('stand before the work, and say who decides', () => {
    shown();
    expect(screen.queryByText('the bench')).toBeNull();
    expect(screen.getByText(/Local codes and a licensed or qualified person decide/)).toBeDefined();
    read();
    expect(screen.getByText('the bench')).toBeDefined();
  });

  it('are read once a day by each person for each kind of work', () => {
    const first = shown();
    read();
    first.unmount();
    const second = shown();
    expect(screen.getByText('the bench')).toBeDefined();
    second.unmount();
    const other = shown({ ...SAMPLE_TECHNICIAN, id: 'user-0004' });
    expect(screen.queryByText('the bench')).toBeNull();
    other.unmount();
    const oven = shown(SAMPLE_TECHNICIAN, 'oven');
    expect(screen.queryByText('the bench')).toBeNull();
    oven.unmount();
    vi.setSystemTime(new Date('2026-03-19T09:00:00Z'));
    shown();
    expect(screen.queryByText('the bench')).toBeNull();
  });
});
