import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { keptTest, sampleBefore, sampleJob, SAMPLE_LIMITS, SAMPLE_TECHNICIAN } from '../../../../test/sample-job.js';
import { meQuery } from '../../../lib/me.js';
import { KeptTest } from './kept-test.js';

/** Machine 12 of the invented sample shop after its burnout. */
const readings = () => {
  const before = sampleBefore(12);
  return { ...before, reading: { ...before.reading, searchVoltsV: 8.084, excitingA: 26.6, wattsW: 47.31 }, temperatures: { ambientC: 22, startC: 22, meanC: 29.4, hottestC: 35.5, hottestSlot: 31, minutes: 20 } };
};
const before = keptTest('core-test-before', sampleBefore(12), undefined, 'rec-0001');
const after = keptTest('core-test-after', readings(), sampleBefore(12), 'rec-0002');

function shown(differs = false, change: Partial<typeof after> = {}) {
  const client = new QueryClient();
  client.setQueryData(meQuery.queryKey, SAMPLE_TECHNICIAN);
  const record = { ...after, ...change };
  return render(
    <QueryClientProvider client={client}>
      <MemoryRouter>
        <KeptTest job={sampleJob(12)} phase="after" record={record} records={[before, record]} limits={SAMPLE_LIMITS} differs={differs} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

describe('a kept core test', () => {
  it('shows the server’s verdict, the strip with both tests, and the way back to the job', () => {
    shown();
    expect(screen.getAllByText('inconclusive').length).toBeGreaterThan(0);
    expect(screen.getAllByText('3.12 ± 0.22').length).toBeGreaterThan(0);
    expect(screen.getAllByText('3.70 ± 0.26').length).toBeGreaterThan(0);
    expect(screen.getAllByRole('link', { name: 'To the job J-0012' })[0]!.getAttribute('href')).toBe('/jobs/job-0012');
    expect(screen.getByRole('button', { name: 'Test once more' })).toBeDefined();
  });

  it('says so when the shop’s computer judged otherwise than the screen, and shows what counts', () => {
    const result = { ...after.result, valid: false, verdict: 'not-valid', validityReasons: [{ code: 'instrument-overdue', words: 'Out of calibration for more than thirty days: W-01.' }] };
    shown(true, { verdict: 'not-valid', result });
    expect(screen.getByText(/judged it differently from this screen/)).toBeDefined();
    expect(screen.getByText(/Out of calibration for more than thirty days: W-01/)).toBeDefined();
    expect(screen.getAllByText('not valid').length).toBeGreaterThan(0);
  });

  it('offers earlier revisions only where there are some', () => {
    const { unmount } = shown();
    expect(screen.queryByRole('link', { name: 'Earlier revisions' })).toBeNull();
    unmount();
    shown(false, { revision: 2 });
    expect(screen.getByRole('link', { name: 'Earlier revisions' }).getAttribute('href')).toBe('/records/rec-0002/revisions');
  });
});
