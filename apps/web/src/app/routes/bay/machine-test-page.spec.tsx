import { evaluateFinalTest, type FinalTestReadings } from '@libs/machine-tests';
import type { JobSheet } from '@shared/jobs';
import { recordInputSchema, type MakeRecord, type RecordKind, type RecordView } from '@shared/records';
import { act, cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { Route, Routes } from 'react-router-dom';
import { beforeEach, describe, expect, it } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { sampleJob, SAMPLE_BAY, SAMPLE_LIMITS } from '../../../../test/sample-job.js';
import { shopToday } from '../../../lib/format.js';
import { WorkPage } from './work-page.js';

/** The quarry motor of the invented sample shop: 200 kW, four poles, 400 V delta, frame 315L. */
function quarryJob(step: JobSheet['step']): JobSheet {
  const job = sampleJob(12, { step });
  return { ...job, machine: { ...job.machine, nameplate: { ...job.machine.nameplate, ratedPowerW: 200e3, ratedSpeedRpm: 1488, ratedCurrentA: 346, frame: '315L' } } };
}

const technician = somebody(['technician']);

interface Opened {
  readonly kept?: readonly RecordView[];
  readonly answer?: (record: MakeRecord['record'] | undefined) => readonly [number, unknown];
  readonly search?: string;
}
function open(kind: RecordKind, { kept = [], answer, search = '' }: Opened = {}) {
  const asked = server(({ method, path, body }) => {
    if (method === 'POST') return answer?.((body as MakeRecord).record) ?? [500, {}];
    if (path === '/bay') return [200, SAMPLE_BAY];
    if (path === '/limits/1') return [200, { version: 1, publishedAt: '2026-01-05T08:00:00.000Z', publishedBy: 'Rolf Steenbeck', note: '', set: SAMPLE_LIMITS }];
    return path.endsWith('/records') ? [200, kept] : [200, quarryJob('final-test')];
  });
  inShop(
    <Routes>
      <Route path="/jobs/:id/work/:kind" element={<WorkPage />} />
    </Routes>,
    { me: technician, at: `/jobs/job-0012/work/${kind}${search}` },
  );
  return asked;
}

const field = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
/** All in one go: what is drawn in between is nobody's concern here. */
const type = (figures: Readonly<Record<string, string>>) =>
  act(() => {
    for (const [name, text] of Object.entries(figures)) fireEvent.change(field(name), { target: { value: text } });
  });
// the pages are long: roles are asked for in one panel, never in the whole page
const labelled = (name: string) => within(document.querySelector<HTMLElement>(`[aria-label="${name}"]`)!);
const choose = (group: string, option: string) => fireEvent.click(labelled(group).getByText(option));
const standing = () => labelled('So far');
const panel = (name: string) => within([...document.querySelectorAll('h2')].find((h2) => h2.textContent === name)!.closest('section')!);
const leaveOrTake = (part: string) => fireEvent.click(panel(part).getByLabelText(`${part}: done`));
const ready = async () => (await screen.findByText(/^Save/)).closest('button')!;

/** The sample shop's own figures of this machine, as they are typed; a comma or a pasted unit here and there. */
const INSULATION = { 'insulation.resistanceOhm': '2.4 GΩ', 'insulation.windingTemperatureC': '24' };
const RESISTANCE = {
  'windingResistance.resistancesOhm.0': '13.31 mΩ',
  'windingResistance.resistancesOhm.1': '13,36 mΩ',
  'windingResistance.resistancesOhm.2': '13.28 mΩ',
  'windingResistance.windingTemperatureC': '24',
};
const NO_LOAD = {
  'noLoad.points.0.voltsV.0': '401',
  'noLoad.points.0.voltsV.1': '400',
  'noLoad.points.0.voltsV.2': '399',
  'noLoad.points.0.ampsA.0': '118.2',
  'noLoad.points.0.ampsA.1': '118',
  'noLoad.points.0.ampsA.2': '117,5',
  'noLoad.points.0.wattsW': '3960',
  'noLoad.lineResistanceOhm': '13.317 mΩ',
  'noLoad.speedRpm': '1499',
};
const VIBRATION = { 'vibration.velocitiesMPerS.0': '1.4', 'vibration.velocitiesMPerS.1': '1.1', 'vibration.velocitiesMPerS.2': '0,9' };
const BEARINGS = { 'bearings.driveEndC': '62', 'bearings.nonDriveEndC': '58', 'bearings.ambientC': '24', 'bearings.changeInHalfHourK': '1' };

function typeQuarryMotor() {
  type({ ...INSULATION, ...RESISTANCE, ...NO_LOAD, ...VIBRATION, surgeDifferenceFraction: '4' });
  fireEvent.click(screen.getByText(/^Take 1800/));
  choose('It held', 'yes');
  choose('Direction of rotation is right', 'yes');
  leaveOrTake('Bearings');
  type(BEARINGS);
}

const keptFrom = (record: MakeRecord['record'], change: Partial<RecordView> = {}): RecordView => {
  const { instruments: _instruments, remark: _remark, ...readings } = record.readings as unknown as FinalTestReadings & { instruments: unknown; remark: unknown };
  const result = evaluateFinalTest({ ...readings, core: null });
  return {
    id: 'rec-final-1',
    jobId: 'job-0012',
    kind: record.kind,
    ordinal: 1,
    revision: 1,
    verdict: result.verdict,
    readings: record.readings as unknown as Record<string, unknown>,
    entered: record.entered,
    result: result as unknown as Record<string, unknown>,
    calculation: result.calculation,
    limitsVersion: 1,
    instruments: [],
    reason: '',
    by: 'Jonas Wirth',
    at: '2026-03-28T09:12:00.000Z',
    contentHash: 'a'.repeat(64),
    version: 1,
    ...change,
  };
};

beforeEach(() => {
  localStorage.clear();
  localStorage.setItem(`loopbay.cautions.electrical.${technician.id}.${shopToday(new Date())}`, 'read');
});

describe('the final test at the bench', () => {
  // Source of the limits: IEEE 43-2013, ANSI/EASA AR100, IEC 60034-14:2003; each judgement names its own.
  it('the quarry motor conforms in every part, and is sent once with what was typed', async () => {
    let sent: MakeRecord['record'] | undefined;
    const asked = open('final-test', {
      answer: (record) => {
        sent = record;
        return [201, keptFrom(record!)];
      },
    });
    await ready();
    typeQuarryMotor();
    expect(standing().getByText('conforms')).toBeDefined();
    expect(standing().queryByText(/still to be done/)).toBeNull();
    expect(screen.queryByText('does not conform')).toBeNull();
    for (const name of ['Insulation resistance', 'Winding resistance', 'High potential', 'Surge comparison', 'No-load run', 'Vibration', 'Bearings']) expect(panel(name).getAllByText('conforms').length).toBeGreaterThan(0);
    fireEvent.click(await ready());
    await waitFor(() => expect(sent).toBeDefined());
    expect(recordInputSchema.safeParse(sent).error).toBeUndefined();
    expect(sent!.readings).toMatchObject({
      insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2.4e9, windingTemperatureC: 24 },
      windingResistance: { resistancesOhm: [0.01331, 0.01336, 0.01328] },
      highPotential: { case: 'new-winding', appliedVoltsV: 1800, seconds: 60, held: true },
      vibration: { shaftHeightM: 0.315, velocitiesMPerS: [1.4e-3, 1.1e-3, 0.9e-3] },
      directionRight: true,
      surgeDifferenceFraction: 0.04,
    });
    expect(sent!.entered['insulation.resistanceOhm']).toEqual({ text: '2.4 GΩ', unit: 'GΩ' });
    const posts = asked.filter((call) => call.method === 'POST');
    expect(posts).toHaveLength(1);
    expect(posts[0]!.idempotencyKey).toMatch(/^[\w-]{8,}$/);
  });

  it('damp insulation refuses the high-potential test in its own panel, and nothing is sent', async () => {
    const asked = open('final-test');
    await ready();
    typeQuarryMotor();
    type({ 'insulation.resistanceOhm': '12' });
    expect(panel('Insulation resistance').getAllByText('does not conform').length).toBeGreaterThan(0);
    expect(panel('High potential').getByRole('alert').textContent).toContain('no high-potential test');
    expect(screen.queryByText(/^Take 1800/)).toBeNull();
    fireEvent.click(await ready());
    await waitFor(() => expect(panel('High potential').getByRole('alert')).toBeDefined());
    expect(asked.filter((call) => call.method === 'POST')).toEqual([]);
    expect(field('highPotential.appliedVoltsV').value).toBe('1800');
  });

  it('vibration that was left out is named as still to be done, and the test is not valid', async () => {
    open('final-test');
    await ready();
    typeQuarryMotor();
    leaveOrTake('Vibration');
    expect(standing().getByText('not valid')).toBeDefined();
    expect(standing().getByText('still to be done: vibration')).toBeDefined();
    leaveOrTake('Vibration');
    expect(field('vibration.velocitiesMPerS.0').value).toBe('1.4');
    expect(standing().getByText('conforms')).toBeDefined();
  });

  it('lands what the server refuses at its field and keeps everything that was typed', async () => {
    open('final-test', { answer: () => refusal(422, 'READINGS_NOT_VALID', 'Some readings cannot be right; see the fields.', { fields: [{ path: 'record.readings.noLoad.points.0.wattsW', code: 'x', message: 'Check the watts.' }] }) });
    await ready();
    typeQuarryMotor();
    fireEvent.click(await ready());
    await waitFor(() => expect(field('noLoad.points.0.wattsW').getAttribute('aria-invalid')).toBe('true'));
    expect(field('noLoad.points.0.wattsW').value).toBe('3960');
    expect(field('windingResistance.resistancesOhm.1').value).toBe('13,36 mΩ');
  });

  it('negative amperes are named at their own lead, so that nobody searches for what stops the saving', async () => {
    const asked = open('final-test');
    await ready();
    typeQuarryMotor();
    type({ 'noLoad.points.0.ampsA.1': '-118' });
    fireEvent.click(await ready());
    await waitFor(() => expect(field('noLoad.points.0.ampsA.1').getAttribute('aria-invalid')).toBe('true'));
    expect(asked.filter((call) => call.method === 'POST')).toEqual([]);
  });

  it('letters at the third place are named there, though the second was passed over', async () => {
    const asked = open('final-test');
    await ready();
    typeQuarryMotor();
    type({ 'vibration.velocitiesMPerS.1': '', 'vibration.velocitiesMPerS.2': 'nine' });
    fireEvent.click(await ready());
    await waitFor(() => expect(field('vibration.velocitiesMPerS.2').getAttribute('aria-invalid')).toBe('true'));
    expect(asked.filter((call) => call.method === 'POST')).toEqual([]);
  });

  it('a correction asks why, and shows both values where somebody else was faster', async () => {
    const readings = { record: undefined as MakeRecord['record'] | undefined };
    open('final-test', { answer: (record) => [201, keptFrom((readings.record = record!))] });
    await ready();
    typeQuarryMotor();
    fireEvent.click(await ready());
    await waitFor(() => expect(readings.record).toBeDefined());
    cleanup();
    const mine = keptFrom(readings.record!);
    const theirs = keptFrom({ ...readings.record!, readings: { ...readings.record!.readings, directionRight: false } } as MakeRecord['record'], { revision: 2, version: 2 });
    const asked = open('final-test', { kept: [mine], search: '?amend=rec-final-1', answer: () => refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this meanwhile.', { current: theirs }) });
    const save = await ready();
    expect(save.textContent).toBe('Save the correction');
    fireEvent.click(save);
    expect(asked.filter((call) => call.method === 'POST')).toEqual([]);
    type({ why: 'Volts were read on another range.' });
    fireEvent.click(save);
    expect(await screen.findByText('Somebody else changed this meanwhile')).toBeDefined();
    const call = asked.find((c) => c.method === 'POST')!;
    expect(call.path).toBe('/records/rec-final-1/revisions');
    expect(call.body).toMatchObject({ version: 1, reason: 'Volts were read on another range.' });
    expect(field('insulation.resistanceOhm').value).toBe('2400');
  });
});

describe('the tests of a winding at the bench', () => {
  it('12 MΩ at 20 °C do not pass as found, and the incoming test has no high-potential panel', async () => {
    open('incoming-test');
    await ready();
    type({ 'insulation.resistanceOhm': '12', 'insulation.windingTemperatureC': '20' });
    expect(standing().getByText('does not conform')).toBeDefined();
    expect(panel('Insulation resistance').getByText(/3 MΩ at 40 °C by the halving rule/)).toBeDefined();
    choose('Carried to 40 °C by', 'thermosetting rule (2013)');
    expect(panel('Insulation resistance').getByText(/9.15 MΩ at 40 °C by the thermosetting rule of 2013/)).toBeDefined();
    expect(screen.queryByText('High potential')).toBeNull();
  });

  it('before varnish the surge comparison and the polarity are asked for, then the winding may go into the tank', async () => {
    open('before-varnish-test');
    await ready();
    type({ 'insulation.resistanceOhm': '900', 'insulation.windingTemperatureC': '24', ...RESISTANCE });
    expect(standing().getByText('still to be done: surge comparison, polarity')).toBeDefined();
    type({ surgeDifferenceFraction: '3', surgePeakV: '1.8 kV' });
    choose('Polarity and phase order right', 'yes');
    expect(standing().getByText('conforms')).toBeDefined();
    choose('Polarity and phase order right', 'no');
    expect(standing().getByText('does not conform')).toBeDefined();
  });
});
