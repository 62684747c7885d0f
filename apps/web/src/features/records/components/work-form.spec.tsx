import type { ReadingsOf, RecordView } from '@shared/records';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { keptTest, sampleBefore, sampleJob, SAMPLE_BAY, SAMPLE_LIMITS, SAMPLE_TECHNICIAN } from '../../../../test/sample-job.js';
import { meQuery } from '../../../lib/me.js';
import type { FormKind } from '../record-definition.js';
import { KeptRecord } from './kept-record.js';
import { Revisions } from './revisions.js';
import { WorkForm } from './work-form.js';

const record = (kind: FormKind, readings: unknown, change: Partial<RecordView> = {}): RecordView => ({
  ...keptTest('core-test-before', sampleBefore(12)),
  id: `rec-${kind}-1`,
  kind,
  readings: readings as Record<string, unknown>,
  result: {},
  verdict: null,
  ...change,
});
const DISMANTLED: ReadingsOf<'dismantling'> = { rotorOut: true, corePlate: 'unknown', frameMaterial: 'aluminium', commutatorOrSlipRings: false, inspection: 'Bore clean.', fits: '' };

const onKept = vi.fn();
function shown(element: React.ReactNode) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  client.setQueryData(meQuery.queryKey, SAMPLE_TECHNICIAN);
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={createMemoryRouter([{ path: '/', element }])} />
    </QueryClientProvider>,
  );
}
const open = (kind: FormKind, records: RecordView[] = [], amend: RecordView | null = null) =>
  shown(<WorkForm kind={kind} context={{ job: sampleJob(12), records, limits: SAMPLE_LIMITS, bay: SAMPLE_BAY, system: 'si' }} amend={amend} onKept={onKept} />);
const field = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
const type = (name: string, text: string) => fireEvent.change(field(name), { target: { value: text } });
const save = () => fireEvent.click(screen.getByRole('button', { name: /^Save/ }));
const answering = (status: number, body: unknown) => {
  const fetched = vi.fn<typeof fetch>().mockImplementation(() => Promise.resolve(new Response(JSON.stringify(body), { status })));
  vi.stubGlobal('fetch', fetched);
  return fetched;
};

beforeEach(() => {
  localStorage.clear();
  onKept.mockClear();
});
afterEach(() => vi.unstubAllGlobals());

describe('the form of a record', () => {
  it('sends nothing while something is missing, and says it at each field', async () => {
    const fetched = answering(201, {});
    open('treatment');
    save();
    expect((await screen.findAllByText('Fill this in.')).length).toBe(2);
    expect(screen.getByText('Which varnish or resin?')).toBeDefined();
    expect(fetched).not.toHaveBeenCalled();
  });

  it('sends the readings in SI with what was typed beside them', async () => {
    const kept = record('treatment', {});
    const fetched = answering(201, kept);
    open('treatment');
    fireEvent.click(screen.getByRole('radio', { name: 'vacuum pressure' }));
    type('material', 'Polyester resin');
    type('bakeTemperatureC', '302 °F');
    type('bakeMinutes', '6 h');
    save();
    await waitFor(() => expect(onKept).toHaveBeenCalledWith(kept));
    const { record: sent } = JSON.parse(fetched.mock.calls[0]![1]!.body as string) as { record: { kind: string; readings: Record<string, unknown>; entered: Record<string, unknown> } };
    expect(sent.kind).toBe('treatment');
    expect(sent.readings).toMatchObject({ process: 'vacuum-pressure', bakeTemperatureC: 150, bakeMinutes: 360, cycles: 1 });
    expect(sent.entered['bakeTemperatureC']).toEqual({ text: '302 °F', unit: '°F' });
  });

  it('keeps everything typed when the server refuses, and lands its words on the field', async () => {
    answering(422, { statusCode: 422, code: 'READINGS_NOT_VALID', message: 'Some readings cannot be right.', requestId: 'r-9', fields: [{ path: 'record.readings.bakeMinutes', code: 'x', message: 'That is no bake.' }] });
    open('treatment');
    fireEvent.click(screen.getByRole('radio', { name: 'trickle' }));
    type('material', 'Polyester resin');
    type('bakeTemperatureC', '150');
    type('bakeMinutes', '2');
    save();
    await waitFor(() => expect(field('bakeMinutes').getAttribute('aria-invalid')).toBe('true'));
    expect(screen.getAllByText('That is no bake.').length).toBeGreaterThan(0);
    expect(field('material').value).toBe('Polyester resin');
  });

  it('corrects a kept record only with a reason, by its version', async () => {
    const kept = record('assembly', { bearingDriveEnd: '6313', bearingNonDriveEnd: '6312', grease: '', turnsFreely: true, words: '' }, { version: 3, revision: 2 });
    const fetched = answering(201, kept);
    open('assembly', [kept], kept);
    type('bearingDriveEnd', '6313/C3');
    save();
    expect(await screen.findByText('Say why: it is read beside the old revision.')).toBeDefined();
    expect(fetched).not.toHaveBeenCalled();
    type('why', 'Read the box again.');
    save();
    await waitFor(() => expect(onKept).toHaveBeenCalled());
    expect(fetched.mock.calls[0]![0]).toBe('/api/records/rec-assembly-1/revisions');
    expect(JSON.parse(fetched.mock.calls[0]![1]!.body as string)).toMatchObject({ version: 3, reason: 'Read the box again.', record: { readings: { bearingDriveEnd: '6313/C3' } } });
  });

  it('shows both values when somebody else corrected it meanwhile', async () => {
    const kept = record('assembly', { bearingDriveEnd: '6313', bearingNonDriveEnd: '6312', grease: '', turnsFreely: true, words: '' });
    const theirs = { ...kept, version: 2, readings: { ...kept.readings, bearingDriveEnd: '6314' } };
    answering(409, { statusCode: 409, code: 'CHANGED_MEANWHILE', message: 'Changed meanwhile.', requestId: 'r-2', current: theirs });
    open('assembly', [kept], kept);
    type('bearingDriveEnd', '6313/C3');
    type('why', 'Read the box again.');
    save();
    const row = await screen.findByRole('row', { name: /Bearing, drive end/ });
    expect(within(row).getAllByRole('cell').map((c) => c.textContent)).toEqual(['6314', '6313/C3']);
    fireEvent.click(screen.getByRole('button', { name: 'Take theirs' }));
    expect(field('bearingDriveEnd').value).toBe('6314');
  });

  it('saves every kind of record as it was brought back, letter by letter', async () => {
    const insulation = { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 900e6, windingTemperatureC: 24, correctionRule: 'halving' };
    const winding = { slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanFrom: 1, spanTo: 11, grouping: '', connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }], coilExtensionM: null, meanTurnM: null, leads: '', remark: '' };
    const all: [FormKind, unknown][] = [
      ['dismantling', DISMANTLED],
      ['incoming-test', { insulation, windingResistance: null, instruments: {}, remark: '' }],
      ['winding-as-found', winding],
      ['winding-as-wound', winding],
      ['strip', { method: 'warm-pull', ovenId: null, commutatorOrSlipRingsOn: false, wiresCountedAtCut: null, sampleCoilKept: true, partPeakC: 160, minutesAbove345C: 0, sensorPosition: 'tooth', explanation: '' }],
      ['core-repair', { methods: ['grind'], slotFrom: 11, slotTo: 15, words: 'Bore ground.' }],
      ['before-varnish-test', { insulation, windingResistance: null, surgeDifferenceFraction: 0.03, surgePeakV: null, polarityRight: true, instruments: {}, remark: '' }],
      ['final-test', { insulation, windingResistance: null, highPotential: null, noLoad: null, vibration: null, directionRight: true, bearings: null, surgeDifferenceFraction: null, instruments: {}, remark: '' }],
    ];
    for (const [kind, readings] of all) {
      const kept = record(kind, readings);
      const fetched = answering(201, kept);
      open(kind, [kept], kept);
      type('why', 'Looked at again.');
      save();
      await waitFor(() => expect(fetched, kind).toHaveBeenCalled());
      expect((JSON.parse(fetched.mock.calls[0]![1]!.body as string) as { record: unknown }).record, kind).toMatchObject({ kind, readings });
      cleanup();
    }
  });

  it('brings a draft back after the page was left', async () => {
    open('treatment');
    type('material', 'Polyester resin');
    document.body.innerHTML = '';
    open('treatment');
    await waitFor(() => expect(field('material').value).toBe('Polyester resin'));
    expect(screen.getByText(/Your draft of .* is back/)).toBeDefined();
  });
});

describe('strip and burnout on screen', () => {
  it('shows the limit of the part before anything is typed, and the verdict as the peak is typed', () => {
    open('strip', [record('dismantling', DISMANTLED)]);
    expect(screen.getByText('Limit of this load: 300.0 °C')).toBeDefined();
    expect(screen.getByText('aluminium frame')).toBeDefined();
    type('partPeakC', '278'); // the sample shop’s aluminium machine, stripped by pull
    expect(screen.getByText('conforms')).toBeDefined();
    type('partPeakC', '446');
    expect(screen.getByText('does not conform')).toBeDefined();
  });

  it('says in words why the oven stays shut', async () => {
    open('strip');
    fireEvent.click(screen.getByRole('radio', { name: 'oven burnout' }));
    fireEvent.click(screen.getByRole('checkbox', { name: 'Commutator or slip rings are still on' }));
    save();
    expect(await screen.findByText(/is not put into an oven/)).toBeDefined();
    expect(screen.getByText('Count the wires at the cut before burnout; afterwards they are gone.')).toBeDefined();
    expect(screen.getByText(/Record the dismantling first/)).toBeDefined();
  });
});

describe('the final test on screen', () => {
  it('offers the high-potential level, and fills it in on a tap', () => {
    open('final-test');
    expect(screen.getByText(/Level asked: 1800.0 V/)).toBeDefined();
    fireEvent.click(screen.getByRole('button', { name: 'Take 1800.0 V' }));
    expect(field('highPotential.appliedVoltsV').value).toBe('1800');
  });

  it('judges each part as it is typed, and says what is still to be done', () => {
    open('final-test');
    const running = within(screen.getByRole('region', { name: 'So far' }));
    expect(running.getByText(/Nothing to judge yet/)).toBeDefined();
    type('insulation.windingTemperatureC', '24');
    type('insulation.resistanceOhm', '2400');
    expect(running.getByText('not valid')).toBeDefined();
    expect(running.getByText('still to be done: winding resistance, high potential, no-load run, vibration, direction')).toBeDefined();
    expect(screen.getAllByText(/792 MΩ at 40 °C/).length).toBeGreaterThan(0); // 2400 × 0.5^1.6
  });

  it('refuses high potential before the insulation has passed, and offers no volts', () => {
    open('final-test');
    type('insulation.windingTemperatureC', '40');
    type('insulation.resistanceOhm', '2');
    expect(screen.getByText(/no high-potential test/)).toBeDefined();
    expect(screen.queryByRole('button', { name: /^Take/ })).toBeNull();
  });

  it('says where the high-potential level comes from, and what to be careful of', () => {
    open('final-test');
    const panel = within(screen.getByRole('heading', { name: 'High potential' }).closest('section')!);
    expect(panel.getByText(/^From .*MG 1/)).toBeDefined();
    expect(panel.getByText(/Barrier up/)).toBeDefined();
  });

  it('shows of each judgement its limit and where that comes from', () => {
    open('final-test');
    type('insulation.windingTemperatureC', '24');
    type('insulation.resistanceOhm', '2400');
    const panel = within(screen.getByRole('heading', { name: 'Insulation resistance' }).closest('section')!);
    expect(panel.getByText('Limits and where they come from')).toBeDefined();
    expect(panel.getAllByText(/^at least 5\.00 MΩ: IEEE 43/).length).toBeGreaterThan(0);
    expect(panel.getByText(/792 MΩ by halving, .* by the thermosetting rule/)).toBeDefined();
  });

  it('refuses high potential at the head of its panel', () => {
    open('final-test');
    type('insulation.windingTemperatureC', '40');
    type('insulation.resistanceOhm', '2');
    const panel = screen.getByRole('heading', { name: 'High potential' }).closest('section')!;
    const refusal = within(panel).getByText(/no high-potential test/);
    expect(refusal.compareDocumentPosition(within(panel).getByText('Rated volts')) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
  });

  it('tells winding loss from the rest, and friction from core with three low points', () => {
    open('final-test');
    type('insulation.windingTemperatureC', '24');
    type('insulation.resistanceOhm', '2400');
    const points = [[400, 11, 618.9], [240, 5.6, 327], [200, 4.7, 282.4], [160, 3.9, 246.5]] as const; // IEEE 112-2004 clause 5.5
    points.forEach(([volts, amps, watts], i) => {
      if (i > 0) fireEvent.click(screen.getByRole('button', { name: 'Another point at other volts' }));
      for (const j of [0, 1, 2]) {
        type(`noLoad.points.${i}.voltsV.${j}`, String(volts));
        type(`noLoad.points.${i}.ampsA.${j}`, String(amps));
      }
      type(`noLoad.points.${i}.wattsW`, String(watts));
    });
    type('noLoad.lineResistanceOhm', '0.6');
    type('noLoad.frequencyHz', '50');
    const panel = within(screen.getByRole('heading', { name: 'No-load run' }).closest('section')!);
    const figure = (name: RegExp) => panel.getByText(name).parentElement!.querySelector('dd')!.textContent;
    expect(figure(/^In the winding/)).toContain('108.9'); // 1.5 × 0.6 × 11²
    expect(figure(/^Rest/)).toContain('510.0'); // 618.9 − 108.9
    expect(parseFloat(figure(/^Friction and windage, from 3 low points/)!)).toBeCloseTo(180, 0);
    expect(parseFloat(figure(/^Core$/)!)).toBeCloseTo(330, 0);
  });

  it('lets an answer be put back to not done', () => {
    open('final-test');
    const direction = within(screen.getByRole('radiogroup', { name: 'Direction of rotation is right' }));
    type('insulation.windingTemperatureC', '24');
    type('insulation.resistanceOhm', '2400');
    const running = within(screen.getByRole('region', { name: 'So far' }));
    fireEvent.click(direction.getByRole('radio', { name: 'yes' }));
    expect(running.getByText(/still to be done/).textContent).not.toContain('direction');
    fireEvent.click(direction.getByRole('radio', { name: 'not done' }));
    expect(running.getByText(/still to be done/).textContent).toContain('direction');
  });

  it('asks for ten minutes only where the index says something', () => {
    open('final-test');
    expect(field('insulation.tenMinuteResistanceOhm')).toBeNull();
    fireEvent.click(within(screen.getByRole('radiogroup', { name: 'Winding' })).getByRole('radio', { name: 'form-wound' }));
    expect(field('insulation.tenMinuteResistanceOhm')).not.toBeNull();
  });

  it('echoes milliohms with digits enough to tell two windings apart', () => {
    open('final-test');
    type('windingResistance.resistancesOhm.0', '13.31 mΩ');
    type('windingResistance.resistancesOhm.1', '0.01328');
    expect(screen.getByText('read as 13.310 mΩ')).toBeDefined();
    expect(screen.getByText('read as 13.280 mΩ')).toBeDefined();
  });

  it('shows the core once more as its last test found it', () => {
    open('final-test', [keptTest('core-test-before', sampleBefore(12), undefined, 'rec-0001')]);
    expect(screen.getByText(/Core test of/)).toBeDefined();
    expect(screen.getByText('3.12')).toBeDefined();
  });
});

describe('the tests before it on screen', () => {
  it('an incoming test says that a winding as found is never high-potential tested', () => {
    open('incoming-test');
    expect(within(screen.getByRole('heading', { name: 'Insulation resistance' }).closest('section')!).getByText(/never high-potential tested/)).toBeDefined();
  });

  it('a surge test offers its usual peak, and takes it on a tap', () => {
    open('before-varnish-test');
    fireEvent.click(screen.getByRole('button', { name: 'Take 1800.0 V' })); // 2 × 400 + 1000
    expect(field('surgePeakV').value).toBe('1800');
  });

  it('test volts other than those asked are one tap from right', () => {
    open('incoming-test');
    expect(screen.queryByRole('button', { name: /^Take/ })).toBeNull();
    type('insulation.testVoltsV', '1000');
    fireEvent.click(screen.getByRole('button', { name: 'Take 500.0 V' }));
    expect(field('insulation.testVoltsV').value).toBe('500');
  });
});

describe('a kept record', () => {
  const kept = record('dismantling', DISMANTLED, { revision: 2, reason: 'Frame looked at again.' });

  it('says its readings in words, with ways to correct it and back to the job', () => {
    shown(<KeptRecord job={sampleJob(12)} record={kept} />);
    expect(screen.getByText('Core plate')).toBeDefined();
    expect(screen.getByText('aluminium')).toBeDefined();
    expect(screen.getByRole('button', { name: 'Correct with a reason' })).toBeDefined();
    expect(screen.queryByRole('button', { name: 'Record once more' })).toBeNull(); // a job has one dismantling
    expect(screen.getByRole('link', { name: 'To the job J-0012' }).getAttribute('href')).toBe('/jobs/job-0012');
    expect(screen.getByRole('link', { name: 'Revisions (2)' }).getAttribute('href')).toBe('/records/rec-dismantling-1/revisions');
  });

  it('lists its revisions with reason and change, youngest first', () => {
    shown(<Revisions revisions={[kept, { ...kept, revision: 1, reason: '', readings: { ...DISMANTLED, frameMaterial: 'cast-iron' } }]} />);
    expect(screen.getAllByRole('heading').map((h) => h.textContent)).toEqual(['Revision 2', 'Revision 1']);
    const row = screen.getByRole('row', { name: /Frame/ });
    expect(within(row).getAllByRole('cell').map((c) => c.textContent)).toEqual(['cast iron', 'aluminium']);
    expect(screen.getByText(/Frame looked at again/)).toBeDefined();
  });
});
