import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { drifting, steady } from '../sample-oven.fixture.js';
import { OvenPanel } from './oven-panel.js';

const person = userEvent.setup();
afterEach(() => vi.unstubAllGlobals());
const table = async () => {
  await person.click(screen.getByText(/^Job by job/));
  return screen.getByRole('table', { name: /newest first/ });
};

describe('an oven on the insight page', () => {
  it('says in a sentence that it spoke, draws it, and names each pattern by word', async () => {
    inShop(<OvenPanel insight={drifting} />);
    expect(screen.getByText(/^O2 spoke on/)).toBeDefined();
    const [picture] = screen.getAllByRole('img', { name: /^Oven O2/ });
    expect(picture!.textContent).toContain('8 in a row on one side');
    expect(picture!.querySelectorAll('path[data-mark]').length).toBeGreaterThan(5);
    const rows = within(await table()).getAllByRole('row');
    expect(rows).toHaveLength(31);
    expect(rows[2]!.textContent).toContain('over the limit of');
    expect(rows[6]!.textContent).toContain('2 of 3 beyond 2 sigma, same side');
  });

  it('leads from a figure to its job', async () => {
    inShop(<OvenPanel insight={drifting} />);
    expect(within(await table()).getByRole('link', { name: 'J2026-0004' }).getAttribute('href')).toBe('/jobs/job-j2026-0004');
  });

  it('a steady oven is said to be steady', () => {
    inShop(<OvenPanel insight={steady} />);
    expect(screen.getByText(/^O2 keeps as it was/)).toBeDefined();
  });

  it('with too few jobs says what is missing instead of drawing limits nobody can know', () => {
    inShop(<OvenPanel insight={{ ...steady, points: steady.points.slice(0, 3), chart: { outcome: 'too-few-points', message: 'A chart needs at least 8 points to say what is usual; there are 3.', basePoints: 3 } }} />);
    expect(screen.getByText(/needs at least 8 points/)).toBeDefined();
    expect(screen.queryByRole('img', { name: /^Oven O2/ })).toBeNull();
  });

  it('names what is left out and why', () => {
    inShop(<OvenPanel insight={{ ...steady, leftOut: [{ job: { id: 'job-0000099', number: 'J2026-0099', machine: 'pump motor' }, day: '2026-06-01', reason: 'not-valid' }] }} />);
    expect(screen.getByText(/no valid test after the burnout/)).toBeDefined();
  });

  it('says where each rule comes from, and that the chart’s limits are not the core’s', () => {
    inShop(<OvenPanel insight={steady} />);
    expect(screen.getByText(/They say what is usual for this oven, not what a core may have/)).toBeDefined();
    expect(screen.getAllByText(/NIST\/SEMATECH/).length).toBe(6);
  });
});

describe('figures of an older book', () => {
  it('are entered as lines; a wrong one is named and nothing is sent', async () => {
    const asked = server(() => [201, drifting]);
    inShop(<OvenPanel insight={steady} />);
    await person.click(screen.getByRole('button', { name: 'Enter figures of an older book' }));
    const box = await screen.findByLabelText('Day and change in %');
    await person.type(box, '2026-01-12 -2,2\nyesterday');
    await person.click(screen.getByRole('button', { name: 'Enter them' }));
    expect(await screen.findByText(/^Line 2: a day like/)).toBeDefined();
    expect(asked).toEqual([]);
    await person.clear(box);
    await person.type(box, '2026-01-12 -2,2');
    await person.click(screen.getByRole('button', { name: 'Enter them' }));
    await waitFor(() => expect(asked).toHaveLength(1));
    expect(asked[0]).toMatchObject({ method: 'POST', path: '/insight/ovens/O2/history', body: { rows: [{ day: '2026-01-12', change: -0.022, remark: '' }] } });
  });

  it('are taken back with a reason', async () => {
    const asked = server(() => refusal(409, 'ALREADY_DONE', 'This figure was taken back already.'));
    inShop(<OvenPanel insight={steady} />);
    await person.click(within(await table()).getAllByRole('button', { name: 'Take back' })[0]!);
    const dialog = await screen.findByRole('dialog');
    await person.click(within(dialog).getByRole('button', { name: 'Take back' }));
    expect(await within(dialog).findByRole('alert')).toBeDefined();
    expect(asked).toEqual([]);
    await person.type(within(dialog).getByLabelText('Why?'), 'Misread.');
    await person.click(within(dialog).getByRole('button', { name: 'Take back' }));
    expect(await within(dialog).findByText('This figure was taken back already.')).toBeDefined();
    expect(asked[0]).toMatchObject({ path: '/insight/history/entry-00020/withdrawal', body: { reason: 'Misread.' } });
  });

  it('are a manager’s to enter: a technician only looks', async () => {
    inShop(<OvenPanel insight={steady} />, { me: somebody(['technician']) });
    expect(screen.queryByRole('button', { name: 'Enter figures of an older book' })).toBeNull();
    expect(within(await table()).queryByRole('button', { name: 'Take back' })).toBeNull();
  });
});
