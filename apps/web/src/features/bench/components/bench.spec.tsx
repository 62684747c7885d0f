import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { meQuery } from '../../../lib/me.js';
import { keptTest, sampleBefore, sampleJob, SAMPLE_BAY, SAMPLE_LIMITS, SAMPLE_TECHNICIAN, type SampleMachine } from '../../../../test/sample-job.js';
import { Bench } from './bench.js';

/** Readings of the invented sample shop: machine 12 after its burnout, and machine 2 after an oven that ran too hot. */
const AFTER = {
  12: { searchVoltsV: '8.084', excitingA: '26.6', wattsW: '47.31', ambientC: '22', startC: '22', meanC: '29.4', hottestC: '35.5', minutes: '20' },
  2: { searchVoltsV: '14.34', excitingA: '22.6', wattsW: '108.5', ambientC: '22', startC: '22', meanC: '33.0', hottestC: '47.2', minutes: '20' },
} as const;

const onKept = vi.fn();
function openBench(machine: SampleMachine, phase: 'before' | 'after' = 'after') {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  client.setQueryData(meQuery.queryKey, SAMPLE_TECHNICIAN);
  const before = keptTest('core-test-before', sampleBefore(machine));
  const bench = <Bench job={sampleJob(machine)} phase={phase} records={phase === 'after' ? [before] : []} limits={SAMPLE_LIMITS} bay={SAMPLE_BAY} amend={null} onKept={onKept} />;
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={createMemoryRouter([{ path: '/', element: bench }])} />
    </QueryClientProvider>,
  );
}
const field = (name: string) => document.querySelector<HTMLInputElement>(`input[name="${name}"]`)!;
const type = (name: string, text: string) => fireEvent.change(field(name), { target: { value: text } });
const said = (name: string) => (field(name).getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent ?? '').join(' ');
const tickAll = () => screen.getAllByRole('checkbox').filter((c) => c.tagName === 'BUTTON').forEach((c) => fireEvent.click(c));
function read(machine: SampleMachine) {
  const { searchVoltsV, excitingA, wattsW, ...temperatures } = AFTER[machine];
  for (const [name, text] of Object.entries({ searchVoltsV, excitingA, wattsW })) type(`reading.${name}`, text);
  for (const [name, text] of Object.entries(temperatures)) type(`temperatures.${name}`, text);
  tickAll();
}
const result = () => within(screen.getByRole('region', { name: 'Result' }));

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('the core-test bench', () => {
  it('calls machine 12 inconclusive at +18.6 %, since the limit lies inside the interval', () => {
    openBench(12);
    read(12);
    expect(result().getAllByText('+18.6 %').length).toBeGreaterThan(0);
    expect(result().getAllByText('inconclusive').length).toBe(2); // the test, and its increase
    expect(result().getByText('± 2.4 points (k = 2): +16.2 % to +21.0 %', { selector: '.lb-strip-wide text' })).toBeDefined();
    expect(result().getAllByText('3.70 ± 0.26').length).toBeGreaterThan(0);
  });

  it('calls machine 2, burnt by its oven, not conforming', () => {
    openBench(2);
    read(2);
    expect(result().getAllByText('+61.2 %').length).toBeGreaterThan(0);
    expect(result().getAllByText('does not conform').length).toBeGreaterThanOrEqual(2);
    expect(result().queryByText('inconclusive')).toBeNull();
  });

  it('shows the reading of the test before beside each field', () => {
    openBench(2);
    expect(said('reading.searchVoltsV')).toContain('before: 14.38 V');
    expect(said('reading.wattsW')).toContain('before: 67.7 W');
    expect(said('temperatures.startC')).toContain('before: 20 °C');
  });

  it('keeps letters in a number field as typed and says what to do', async () => {
    openBench(12);
    const person = userEvent.setup();
    await person.type(field('reading.wattsW'), 'about 47');
    await person.tab();
    expect(field('reading.wattsW').value).toBe('about 47');
    expect(field('reading.wattsW').getAttribute('aria-invalid')).toBe('true');
    expect(said('reading.wattsW')).toContain('is not a number');
    expect(result().getByText('No result yet')).toBeDefined();
  });

  it('refuses negative turns in words and draws no cable for them', () => {
    openBench(12);
    expect(screen.getByRole('img', { name: /16 turns of the loop cable/ })).toBeDefined();
    type('reading.excitingTurns', '-16');
    expect(said('reading.excitingTurns')).toContain('Count the exciting turns: a whole number, 1 or more.');
    expect(screen.queryByRole('img', { name: /turns of the loop cable/ })).toBeNull();
  });

  it('draws what is wrong with a slot deeper than the core, and keeps everything that was typed', () => {
    openBench(12);
    type('reading.wattsW', '47.31');
    type('geometry.slotDepthM', '90');
    expect(screen.getByRole('img', { name: /nothing is left for the back iron/ })).toBeDefined();
    expect(said('geometry.slotDepthM')).toContain('nothing is left for the back iron');
    expect(field('geometry.slotDepthM').value).toBe('90');
    expect(field('reading.wattsW').value).toBe('47.31');
    expect(field('geometry.outerDiameterM').value).toBe('340');
  });

  it('says why a test with an unticked check is not valid, and sounds the stop when a spot runs away', () => {
    openBench(12);
    read(12);
    fireEvent.click(screen.getByRole('checkbox', { name: 'Rotor out' }));
    expect(result().getByText(/A rotor inside takes flux and watts of its own/)).toBeDefined();
    type('temperatures.hottestC', '60');
    expect(screen.getByRole('alert').textContent).toContain('Switch off: a spot is more than 25 K over the mean.');
  });

  it('offers set-ups for a first test and takes turns and supply from the one that is chosen', () => {
    openBench(12, 'before');
    const offers = within(screen.getByRole('radiogroup', { name: 'Possible set-ups' })).getAllByRole('radio');
    expect(offers.length).toBeGreaterThan(1);
    expect(offers[0]!.textContent).toContain('best');
    expect(offers[0]!.textContent).toContain('The fewest turns that leave room');
    fireEvent.click(offers[0]!);
    expect(field('reading.excitingTurns').value).toBe(/^(\d+) turns/.exec(offers[0]!.textContent!)![1]);
    expect(Number(field('reading.searchTurns').value)).toBeGreaterThan(0);
  });

  it('does not send a test that lacks something, and puts the cursor where it lacks', async () => {
    const fetched = vi.fn();
    vi.stubGlobal('fetch', fetched);
    openBench(12);
    fireEvent.click(screen.getByRole('button', { name: 'Save the test' }));
    await waitFor(() => expect(document.activeElement).toBe(field('reading.searchVoltsV')));
    expect(said('reading.searchVoltsV')).toContain('Fill this in.');
    expect(fetched).not.toHaveBeenCalled();
  });

  it('sends readings with what was typed, and lands a refusal of the server on its field with everything kept', async () => {
    const fetched = vi.fn<typeof fetch>().mockImplementation(() =>
      Promise.resolve(
        new Response(JSON.stringify({ statusCode: 422, code: 'READINGS_NOT_VALID', message: 'Some readings cannot be right; see the fields.', requestId: 'r-1', fields: [{ path: 'record.readings.reading.wattsW', code: 'x', message: 'Check the watts.' }] }), { status: 422 }),
      ),
    );
    vi.stubGlobal('fetch', fetched);
    openBench(12);
    read(12);
    fireEvent.click(screen.getByRole('button', { name: 'Save the test' }));
    await waitFor(() => expect(said('reading.wattsW')).toContain('Check the watts.'));
    const [url, init] = fetched.mock.calls[0]!;
    expect(url).toBe('/api/jobs/job-0012/records');
    expect((init!.headers as Record<string, string>)['idempotency-key']).toMatch(/^[\w-]{8,}$/);
    const { record } = JSON.parse(init!.body as string) as { record: { kind: string; readings: { reading: { wattsW: number } }; entered: Record<string, unknown> } };
    expect(record.kind).toBe('core-test-after');
    expect(record.readings.reading.wattsW).toBe(47.31);
    expect(record.entered['reading.wattsW']).toEqual({ text: '47.31', unit: 'W' });
    expect(field('reading.wattsW').value).toBe('47.31');
    expect(onKept).not.toHaveBeenCalled();
  });

  it('gives the kept test of the server on, with the verdict that stood on the screen', async () => {
    const kept = keptTest('core-test-after', { ...sampleBefore(12) }, sampleBefore(12), 'rec-after-1');
    vi.stubGlobal('fetch', vi.fn<typeof fetch>().mockImplementation(() => Promise.resolve(new Response(JSON.stringify(kept), { status: 201 }))));
    openBench(12);
    read(12);
    fireEvent.click(screen.getByRole('button', { name: 'Save the test' }));
    await waitFor(() => expect(onKept).toHaveBeenCalled());
    expect(onKept.mock.calls.at(-1)).toEqual([expect.objectContaining({ id: 'rec-after-1' }), 'inconclusive']);
  });
});
