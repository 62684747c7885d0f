import type { FloorRow } from '@shared/jobs';
import { render, screen, within } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { QueueList } from './queue-list.js';

const row = (number: string, change: Partial<FloorRow>): FloorRow => ({
  id: `job-${number.slice(2)}`,
  number,
  customerName: 'Corvel Plastics',
  machine: '37 kW 4-pole extruder motor',
  route: 'rewind',
  step: 'core-test-after',
  state: 'open',
  holdReason: null,
  waitingFor: null,
  promisedOn: '2026-04-02',
  receivedAt: '2026-03-14T07:30:00.000Z',
  late: false,
  coreVerdict: null,
  ...change,
});
const shown = (rows: FloorRow[], at = '/bay') =>
  render(
    <MemoryRouter initialEntries={[at]}>
      <QueueList rows={rows} total={rows.length} />
    </MemoryRouter>,
  );

describe('the queue on screen', () => {
  it('leads from each job to the next record by one button, and to the job by its number', () => {
    shown([row('J-0015', { step: 'core-test-before' })]);
    expect(screen.getByRole('link', { name: 'Core test before' }).getAttribute('href')).toBe('/jobs/job-0015/work/core-test-before');
    expect(screen.getByRole('link', { name: 'J-0015' }).getAttribute('href')).toBe('/jobs/job-0015');
  });

  it('says late and the core’s verdict in words', () => {
    shown([row('J-0012', { late: true, coreVerdict: 'inconclusive' })]);
    const item = within(screen.getByRole('listitem'));
    expect(item.getByText('late')).toBeDefined();
    expect(item.getByText('inconclusive')).toBeDefined();
  });

  it('keeps jobs on hold in sight with their reason and without a button', () => {
    shown([row('J-0002', { state: 'on-hold', holdReason: 'Customer asked' })]);
    expect(screen.getByRole('heading', { name: 'On hold (1)' })).toBeDefined();
    expect(screen.getByText(/Customer asked/)).toBeDefined();
    expect(screen.queryByRole('link', { name: 'Core test after' })).toBeNull();
  });

  it('says so when nothing waits, and when nothing waits at the step that is asked for', () => {
    const { unmount } = shown([]);
    expect(screen.getByText('Nothing waits for the bay')).toBeDefined();
    unmount();
    shown([row('J-0012', {})], '/bay?step=rewind');
    expect(screen.getByText('Nothing waits at this step')).toBeDefined();
    expect(screen.getByRole('link', { name: 'Core test after (1)' }).getAttribute('href')).toBe('/bay?step=core-test-after');
  });
});
