import { act, fireEvent, render, screen } from '@testing-library/react';
import { FormProvider, useForm } from 'react-hook-form';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { blankBench, type BenchValues } from '../bench-form.js';
import { BenchField } from './bench-field.js';
import { FluxTimer } from './flux-timer.js';

function Clock() {
  const form = useForm<BenchValues>({ defaultValues: blankBench('si', null) });
  return (
    <FormProvider {...form}>
      <BenchField name="temperatures.minutes" label="Full flux for" />
      <FluxTimer storageKey="job-0012.core-test-after" />
    </FormProvider>
  );
}
const minutes = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Full flux for' }).value;

beforeEach(() => {
  localStorage.clear();
  vi.useFakeTimers({ now: new Date('2026-03-18T09:00:00Z') });
});
afterEach(() => vi.useRealTimers());

describe('the clock at full flux', () => {
  it('counts, and stopping it fills in the full minutes', () => {
    render(<Clock />);
    fireEvent.click(screen.getByRole('button', { name: 'Full flux: start the clock' }));
    act(() => void vi.advanceTimersByTime(20 * 60_000 + 31_000));
    fireEvent.click(screen.getByRole('button', { name: 'Stop at 20:31' }));
    expect(minutes()).toBe('20');
  });

  it('goes on through a reload of the page', () => {
    const { unmount } = render(<Clock />);
    fireEvent.click(screen.getByRole('button', { name: 'Full flux: start the clock' }));
    unmount();
    vi.setSystemTime(new Date('2026-03-18T09:15:00Z'));
    render(<Clock />);
    expect(screen.getByRole('button', { name: 'Stop at 15:00' })).toBeDefined();
  });
});
