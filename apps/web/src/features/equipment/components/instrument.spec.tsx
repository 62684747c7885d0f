import type { CalibrationView, InstrumentDetail, InstrumentDue, MeasuredRow } from '@shared/calibrations';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server } from '../../../../test/in-shop.js';
import { CalibrationDialog } from './calibration-dialog.js';
import { CalibrationList } from './calibration-list.js';
import { DoubtNotice } from './doubt-notice.js';
import { DueList } from './due-list.js';
import { InstrumentFacts } from './instrument-facts.js';
import { MeasuredList } from './measured-list.js';

const person = userEvent.setup({ applyAccept: false });
const W01: InstrumentDue = {
  id: '01900000-w01', tag: 'W-01', kind: 'wattmeter', description: 'low power factor', serial: 'W0932', percentOfReading: 0.3, percentOfRange: 0.1, rangeText: '0 to 600 W', calibratedOn: '2025-03-10', dueOn: '2026-03-10', certificateNumber: 'K-25-0120', version: 4, standing: 'due-soon', daysLeft: 8, notCounted: false,
};
const FIRST: CalibrationView = {
  id: '01900000-c01', calibratedOn: '2025-03-10', dueOn: '2026-03-10', certificateNumber: 'K-25-0120', laboratory: '', asFound: 'not-stated', asFoundWords: '', percentOfReading: 0.3, percentOfRange: 0.1, doubtFrom: null, superseded: false, by: '', at: '2025-03-10T00:00:00.000Z', certificate: null,
};
const OUTSIDE: CalibrationView = { ...FIRST, id: '01900000-c02', calibratedOn: '2026-02-27', dueOn: '2027-02-27', asFound: 'outside', asFoundWords: 'Read 2.1 % high at 400 W.', doubtFrom: '2025-03-10', by: 'Tess Technician', certificate: { id: '01900000-f01', name: 'K-26-0120.pdf', sizeBytes: 48_000, by: 'Tess Technician', at: '2026-02-28T08:00:00.000Z' } };
const DETAIL: InstrumentDetail = { instrument: W01, calibrations: [FIRST] };
const input = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
const type = (name: string, text: string) => fireEvent.change(input(name), { target: { value: text } });

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('what is due', () => {
  it('tells days and standing in words, and leads to the instrument', async () => {
    server(() => [200, [{ ...W01, tag: 'B-01', standing: 'overdue', daysLeft: -6 }, W01]]);
    inShop(<DueList />);
    const [, first, second] = await screen.findAllByRole('row');
    expect(first!.textContent).toContain('overdue by 6 days');
    expect(second!.textContent).toContain('due in 8 days');
    expect(within(second!).getByRole('link').getAttribute('href')).toBe(`/bay/instruments/${W01.id}`);
  });

  it('says so when nothing is', async () => {
    server(() => [200, []]);
    inShop(<DueList />);
    expect(await screen.findByText('Nothing is due within thirty days.')).toBeDefined();
  });

  it('an instrument past its days of grace is to be put aside', () => {
    inShop(<InstrumentFacts instrument={{ ...W01, standing: 'overdue', daysLeft: -41, notCounted: true }} />);
    expect(screen.getByText(/Put it aside/)).toBeDefined();
    expect(screen.getByText('10 Mar 2026, overdue by 41 days')).toBeDefined();
  });
});

describe('entering a calibration', () => {
  const onClose = vi.fn();
  const onReadAgain = vi.fn();
  const open = () => inShop(<CalibrationDialog instrument={W01} onReadAgain={onReadAgain} onClose={onClose} />);
  async function filled() {
    type('calibratedOn', '2026-02-27');
    type('dueOn', '2027-02-27');
    type('certificateNumber', 'K-26-0120');
    await person.click(screen.getByRole('radio', { name: 'outside its limits of error' }));
  }
  const enter = () => person.click(screen.getByRole('button', { name: 'Enter it' }));
  beforeEach(() => {
    onClose.mockReset();
    onReadAgain.mockReset();
  });

  it('found outside asks what was off, then sends all of it once', async () => {
    const asked = server(() => [201, DETAIL]);
    open();
    await filled();
    await enter();
    expect(await screen.findByText(/Say what was off, and by how much/)).toBeDefined();
    expect(asked).toHaveLength(0);
    type('asFoundWords', 'Read 2.1 % high at 400 W.');
    await enter();
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(asked[0]).toMatchObject({ method: 'POST', path: `/instruments/${W01.id}/calibrations`, body: { version: 4, calibratedOn: '2026-02-27', asFound: 'outside', asFoundWords: 'Read 2.1 % high at 400 W.', percentOfReading: 0.3 } });
    expect(localStorage.length).toBe(0);
  });

  it('when somebody else changed the instrument, says what it is now and keeps what was typed', async () => {
    server(() => refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this instrument meanwhile.', { current: { ...W01, dueOn: '2027-01-31' } }));
    open();
    await filled();
    type('asFoundWords', 'x');
    await enter();
    expect(await screen.findByText(/due on 31 Jan 2027 now/)).toBeDefined();
    expect(input('certificateNumber').value).toBe('K-26-0120');
    await person.click(screen.getByRole('button', { name: 'Read it again' }));
    expect(onReadAgain).toHaveBeenCalled();
  });
});

describe('the calibrations of an instrument', () => {
  it('are told with what was found, by whom, and their certificate to save', () => {
    inShop(<CalibrationList instrumentId={W01.id} calibrations={[OUTSIDE, FIRST]} mayEdit />);
    const [newest, oldest] = screen.getAllByRole('article');
    expect(newest!.textContent).toContain('outside its limits of error');
    expect(newest!.textContent).toContain('Read 2.1 % high at 400 W.');
    expect(within(newest!).getByRole('link', { name: /K-26-0120\.pdf/ }).getAttribute('href')).toBe(`/api/instruments/${W01.id}/certificates/01900000-f01`);
    expect(oldest!.textContent).toContain('From the register, before it kept a history');
    expect(within(oldest!).getByRole('button', { name: 'Add the certificate (PDF) of 10 Mar 2025' })).toBeDefined();
  });

  it('take a PDF, and send nothing else', async () => {
    const asked = server(() => [201, DETAIL]);
    inShop(<CalibrationList instrumentId={W01.id} calibrations={[FIRST]} mayEdit />);
    const picker = document.querySelector<HTMLInputElement>('input[type="file"]')!;
    await person.upload(picker, new File(['x'], 'scan.png', { type: 'image/png' }));
    expect(await screen.findByText('A certificate is taken as PDF.')).toBeDefined();
    expect(asked).toHaveLength(0);
    await person.upload(picker, new File(['%PDF-1.7'], 'K-25.pdf', { type: 'application/pdf' }));
    await waitFor(() => expect(asked).toHaveLength(1));
    expect(asked[0]).toMatchObject({ method: 'POST', path: `/instruments/${W01.id}/calibrations/${FIRST.id}/certificate` });
    expect((asked[0]!.body as FormData).get('file')).toBeInstanceOf(File);
    expect(screen.queryByText('A certificate is taken as PDF.')).toBeNull();
  });
});

describe('an instrument found outside its limits of error', () => {
  it('leads to the records in doubt, from the calibration before to this one', () => {
    inShop(<DoubtNotice calibrations={[OUTSIDE, FIRST]} />);
    expect(screen.getByText(/between 10 Mar 2025 and 27 Feb 2026 is in doubt: Read 2\.1 % high/)).toBeDefined();
    expect(screen.getByRole('link', { name: 'Show the records in doubt' }).getAttribute('href')).toBe('/?from=2025-03-10&to=2026-02-27');
  });
  it('with no calibration known before, doubts everything until then', () => {
    inShop(<DoubtNotice calibrations={[{ ...OUTSIDE, doubtFrom: null }]} />);
    expect(screen.getByText(/until 27 Feb 2026 is in doubt/)).toBeDefined();
  });
  it('says nothing of an entry that was put right later', () => {
    inShop(<DoubtNotice calibrations={[{ ...OUTSIDE, superseded: true }]} />);
    expect(screen.queryByText(/in doubt/)).toBeNull();
  });
});

describe('what was measured with it', () => {
  const ROW: MeasuredRow = { recordId: '01900000-r01', kind: 'core-test-after', ordinal: 2, revision: 1, superseded: true, verdict: 'inconclusive', at: '2026-02-20T10:00:00.000Z', by: 'Tess Technician', jobId: '01900000-j12', jobNumber: 'J2026-0012', jobState: 'released', customerName: 'Murgen Paperboard', machine: '30 kW 4-pole', certificateNumber: 'C2026-0004', dueOnThen: '2026-03-10', overdueThen: false };

  it('is asked for by the period in the address, and leads to job and record', async () => {
    const asked = server(() => [200, { rows: [ROW], total: 1, page: 1, size: 25 }]);
    const { router } = inShop(<MeasuredList instrumentId={W01.id} />, { at: '/?from=2025-03-10&to=2026-02-27' });
    const row = (await screen.findAllByRole('row'))[1]!;
    expect(asked[0]!.path).toBe(`/instruments/${W01.id}/records?from=2025-03-10&to=2026-02-27&page=1&size=25`);
    expect(within(row).getByRole('link', { name: 'J2026-0012' }).getAttribute('href')).toBe('/jobs/01900000-j12');
    expect(within(row).getByRole('link', { name: 'Core test after no. 2' }).getAttribute('href')).toBe('/records/01900000-r01/revisions');
    expect(row.textContent).toContain('inconclusive');
    expect(row.textContent).toContain('C2026-0004');
    expect(row.textContent).toContain('corrected since to another instrument');
    await person.click(screen.getByRole('button', { name: 'All of them' }));
    expect(router.state.location.search).toBe('');
  });

  it('says so when the period holds nothing', async () => {
    server(() => [200, { rows: [], total: 0, page: 1, size: 25 }]);
    inShop(<MeasuredList instrumentId={W01.id} />, { at: '/?from=2026-03-01' });
    expect(await screen.findByText('Nothing was measured with it in this period')).toBeDefined();
  });
});
